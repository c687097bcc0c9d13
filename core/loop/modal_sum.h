#pragma once

#include "core/numerics/root_form.h"

#include <vector>

namespace cornerwright {

/// Re of exp(rate t) * (coefficients[0] + coefficients[1] t + ...). A conjugate pair stands as one
/// mode with the factor 2 already in its coefficients.
struct Mode {
    Complex rate; ///< rad/s, imag >= 0
    ComplexVector coefficients;
};

/// The inverse Laplace transform of a rational function as a sum of modes.
struct ModalSum {
    std::vector<Mode> modes;

    double value(double t) const;
    double slope(double t) const;
    double curvature(double t) const;
    /// How far the sum can lie from the straight line between its values at `begin` and `end`.
    double deviation_from_line(double begin, double end) const;
    /// A bound of what is not constant, at t and later; infinite where a mode does not decay.
    double envelope(double t) const;
    /// What remains as t grows: the part with rate exactly 0.
    double constant() const;
};

/// Partial fractions of `form` (impulses at t = 0 of an improper one left out). Roots that stand on
/// both sides alike cancel. Poles that crowd about a point, repeated ones among them, are taken
/// together: exp(centre t) times a power series in t, whose coefficients come from residues at
/// twice double precision.
ModalSum modal_sum(const RootForm& form);

} // namespace cornerwright
