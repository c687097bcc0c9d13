#pragma once

#include "core/numerics/root_iteration.h"

namespace cornerwright {

/// prod(s - root) over `roots` times (s - repeated_root)^repeated, for a root (real) that occurs so
/// often that it is worth a power.
struct FactorList {
    ComplexVector roots;
    double repeated_root = 0.0;
    int repeated = 0;

    std::size_t degree() const { return roots.size() + static_cast<std::size_t>(repeated); }
};

/// F(s) = prod(s - left) + gain * prod(s - right), the characteristic equation of a loop, kept in
/// factors: expanding it would lose the digits of roots that are decades apart.
/// F may have any degree down to the point where everything cancels (gain = -1 with as many factors
/// on both sides takes the leading terms away).
class FactoredSum : public RootProblem {
  public:
    /// Factors that stand on both sides exactly are taken out and kept as `common_roots`.
    FactoredSum(FactorList left, FactorList right, double gain);

    const ComplexVector& common_roots() const { return common_roots_; }

    /// Both products at `s` with their derivatives, without the gain, all divided by the same power
    /// of two, so that nothing overflows.
    struct Sides {
        Complex left, left_derivative;
        Complex right, right_derivative;
        int exponent = 0;
    };
    Sides sides(Complex s) const;

    const FactorList& left() const { return left_; }
    const FactorList& right() const { return right_; }
    double gain() const { return gain_; }

    std::size_t count() const override { return count_; }
    ComplexVector start() const override;
    CoarseStep coarse(Complex s) const override;
    PreciseStep precise(const PreciseComplex& s) const override;
    double log_noise(Complex s) const override;
    double log_leading() const override { return log_leading_; }

  private:
    void take_out_common_factors();
    void find_degree();

    FactorList left_, right_;
    ComplexVector common_roots_;
    double gain_ = 0.0;
    std::size_t count_ = 0;
    double log_leading_ = 0.0;
    double start_centre_ = 0.0;
    std::vector<double> log_sizes_; ///< of the coefficients about `start_centre_`, for the start
};

/// All roots of the sum, common ones included, with their uncertainties; see solve_roots.
SolvedRoots roots_of_sum(const FactoredSum& sum, const ComplexVector& warm_start = {});

} // namespace cornerwright
