#pragma once

#include "core/numerics/complex.h"

namespace cornerwright {

/// A rational function kept in factored form: gain * prod(s - zero) / prod(s - pole).
/// Coefficients are real: complex roots stand in conjugate pairs. Roots are never expanded to
/// coefficients for evaluation; a product of many sections would lose its digits that way.
struct RootForm {
    ComplexVector zeros;
    ComplexVector poles;
    double gain = 1.0;

    bool is_proper() const { return zeros.size() <= poles.size(); }
    bool is_strictly_proper() const { return zeros.size() < poles.size(); }

    bool operator==(const RootForm&) const = default;
};

/// Value at `s`. Numerator and denominator factors are taken in turn, so that intermediate products
/// stay within range for any order this program meets. Infinite where `s` is a pole.
Complex evaluate(const RootForm& form, Complex s);

/// The product of two functions, roots side by side (nothing is cancelled).
RootForm operator*(const RootForm& left, const RootForm& right);

/// ln|F| and the unwrapped angle of F on the positive imaginary axis.
struct LogResponse {
    double log_magnitude = 0.0; ///< natural logarithm
    double phase_rad = 0.0;     ///< accumulated over the roots, continuous in w, not wrapped
};

/// F(jw) for w > 0 as logarithm and accumulated angle. Each real root left of the axis contributes
/// an angle in (0, pi/2), right of it in (pi/2, pi); each conjugate pair one in (0, pi) or (pi, 2
/// pi) (left or right), so that the sum is continuous in w without any unwrapping. Poles subtract.
/// A negative gain adds pi.
LogResponse evaluate_log(const RootForm& form, double w);

} // namespace cornerwright
