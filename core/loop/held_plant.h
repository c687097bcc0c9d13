#pragma once

#include "core/numerics/root_form.h"

#include <vector>

namespace cornerwright {

/// First-order blocks in a row as matrices: x' = A x + B v, y = C x + D v, lower triangular, roots
/// kept as they are.
struct BlockChain {
    std::size_t order = 0;
    ComplexVector matrix; ///< A, row by row
    ComplexVector input;
    ComplexVector output;
    double direct = 0.0;
    ComplexVector slope_output; ///< C A
    double slope_direct = 0.0;  ///< C B

    /// x + A x + B v in place of x.
    void add_rate(ComplexVector& state, double v) const;
    /// y = C x + D v.
    double out(const ComplexVector& state, double v) const;
    /// y' for a held v.
    double slope(const ComplexVector& state, double v) const;
};

/// `form` is proper.
BlockChain block_chain(const RootForm& form);

/// A plant behind a held input, advanced exactly from point to point of a sample period.
class HeldPlant {
  public:
    /// Points at least every eighth of the period and at `switches_s` (times in [0, period) at
    /// which an input may change), closer behind those where the plant's own modes ask for it.
    HeldPlant(const RootForm& plant, double period_s, std::vector<double> switches_s);

    struct Piece {
        double begin_s = 0.0;
        double length_s = 0.0;
        bool may_jump = false; ///< it begins at a switch
        std::size_t step = 0;
    };
    const std::vector<Piece>& pieces() const { return pieces_; }
    const BlockChain& chain() const { return chain_; }
    void advance(const Piece& piece, double input, ComplexVector& state) const;

  private:
    struct Step {
        double length_s = 0.0;
        ComplexVector matrix; ///< exp(A length), row by row
        ComplexVector input;
    };
    std::size_t step_of(double length_s);

    BlockChain chain_;
    std::vector<Piece> pieces_;
    std::vector<Step> steps_;
};

} // namespace cornerwright
