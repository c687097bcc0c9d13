#pragma once

#include "core/numerics/root_form.h"

#include <utility>
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

/// A plant behind a held input, followed exactly through a sample period.
class HeldPlant {
  public:
    /// Points at least every eighth of the period and at `switches_s` (times in [0, period) at
    /// which an input may change), closer behind those where the plant's own modes ask for it.
    HeldPlant(const RootForm& plant, double period_s, std::vector<double> switches_s);

    /// y and its slope at a time after the begin of a segment, from the states at the begin and the
    /// input held since.
    struct Outlet {
        double after_s = 0.0;
        ComplexVector value;
        double value_input = 0.0;
        ComplexVector slope;
        double slope_input = 0.0;
    };
    /// The part of a period from one switch to the next: the states are followed from end to end
    /// only, whatever is read in between.
    struct Segment {
        double begin_s = 0.0;
        std::vector<Outlet> outlets; ///< ascending, the last one at the end
        ComplexVector matrix;        ///< exp(A length), row by row
        ComplexVector input;
    };
    const std::vector<Segment>& segments() const { return segments_; }
    const BlockChain& chain() const { return chain_; }
    /// Points at which y is read in a period.
    std::size_t points() const { return points_; }
    void advance(const Segment& segment, double input, ComplexVector& state) const;
    /// y and its slope.
    std::pair<double, double> read(const Outlet& outlet, double input,
                                   const ComplexVector& state) const;

  private:
    struct Step {
        double length_s = 0.0;
        ComplexVector matrix;
        ComplexVector input;
    };
    const Step& step_of(double length_s);
    void lengthen(Segment& segment, const Step& by) const;
    Outlet outlet_of(const Segment& segment, double after_s) const;

    BlockChain chain_;
    std::vector<Segment> segments_;
    std::vector<Step> steps_;
    std::size_t points_ = 0;
};

} // namespace cornerwright
