#pragma once

#include "core/numerics/factored_sum.h"

namespace cornerwright {

/// F(s) = prod(s - left) + gain * prod(s - right) * exp(-s delay): the characteristic equation of a
/// loop with dead time, a quasi-polynomial with infinitely many roots.
struct DelayedSum {
    FactoredSum sum;
    double delay = 0.0; ///< > 0

    /// As FactoredSum::sides, the exponential on the right.
    FactoredSum::Sides sides(Complex s) const;
    CoarseStep coarse(Complex s) const;
    /// F'/F, for the argument principle.
    Complex logarithmic_derivative(Complex s) const;
};

/// A rectangle symmetric about the real axis.
struct SymmetricRectangle {
    double real_low = 0.0, real_high = 0.0;
    double imag_high = 0.0;

    bool contains(Complex s) const {
        return s.real() >= real_low && s.real() <= real_high && std::abs(s.imag()) <= imag_high;
    }
};

struct RootsInside {
    ComplexVector roots;    ///< ascending by real part, then imaginary part; pairs exact
    bool confirmed = false; ///< their number agrees with the argument principle
};

/// Every root of F inside the rectangle, as far as Newton's method from many starts finds them; the
/// argument principle on the edge tells whether any is missing.
RootsInside roots_inside(const DelayedSum& function, const SymmetricRectangle& rectangle);

/// Number of roots inside by the argument principle; -1 where a root lies on the edge.
int count_roots_inside(const DelayedSum& function, const SymmetricRectangle& rectangle);

/// The rectangle right of -decay/delay that holds every root there; where there are infinitely many
/// (as many factors right as left) it ends at `imag_limit`.
SymmetricRectangle rightmost_rectangle(const DelayedSum& function, double decay, double imag_limit);

} // namespace cornerwright
