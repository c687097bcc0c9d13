#pragma once

#include "core/numerics/compensated.h"

#include <vector>

namespace cornerwright {

/// What a root problem says at a point in plain double precision.
struct CoarseStep {
    Complex newton;        ///< F/F'
    double rounding = 0.0; ///< size of the error of `newton` from the evaluation
    double data = 0.0;     ///< how far half a unit in the last place of the data moves the root

    bool settled() const { return std::abs(newton) <= rounding; }
};

/// What it says with F and F' computed at about twice the precision.
struct PreciseStep {
    Complex newton;
    double rounding = 0.0; ///< size of the error of `newton`
};

/// An analytic function F with real coefficients of which `count` roots are wanted.
class RootProblem {
  public:
    virtual ~RootProblem() = default;

    virtual std::size_t count() const = 0;
    /// `count` distinct points.
    virtual ComplexVector start() const = 0;
    virtual CoarseStep coarse(Complex s) const = 0;
    virtual PreciseStep precise(const PreciseComplex& s) const = 0;
    /// ln of what half a unit in the last place of the data makes of |F|.
    virtual double log_noise(Complex s) const = 0;
    /// ln of the size of the leading coefficient.
    virtual double log_leading() const = 0;
};

struct SolvedRoots {
    ComplexVector roots;             ///< ascending by real part, then imaginary part; pairs exact
    std::vector<double> uncertainty; ///< absolute, from one rounding of the data
};

/// Simultaneous iteration for all roots, polished with residuals at twice the precision. Roots that
/// the rounding of the data cannot tell apart come out as one multiple root. `warm_start` (used
/// where its size fits) never changes a bit of the answer: where the polished roots are not safely
/// away from every rounding boundary the work is done again from the problem's own start.
/// Source: O. Aberth, Iteration methods for finding all zeros of a polynomial simultaneously, Math.
/// Comp. 27 (1973) (citation from memory).
SolvedRoots solve_roots(const RootProblem& problem, const ComplexVector& warm_start = {});

/// The plain iteration alone: moves `roots` until each is settled; false where `limit` rounds were
/// not enough.
bool iterate_roots(const RootProblem& problem, ComplexVector& roots, int limit = 100);

/// Points on the circles of the Newton polygon for a polynomial with these coefficients (ln of
/// their sizes, lowest power first, -infinity for zero; the last finite).
/// Source: D. A. Bini, Numerical computation of polynomial zeros by means of Aberth's method,
/// Numer. Algorithms 13 (1996) (citation from memory).
ComplexVector newton_polygon_points(const std::vector<double>& log_sizes);

} // namespace cornerwright
