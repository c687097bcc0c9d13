#pragma once

#include "core/plant/plant_case.h"

#include <complex>
#include <span>
#include <vector>

namespace cornerwright {

/// A rational function with dead time while it is being built from what the user wrote:
///     gain * prod(s - zero) / prod(s - pole) * exp(-s dead_time).
/// Extended precision, so that s/31 + 1 gives the root -31 exactly and s^2 + 0.2 s + 0.01 a double
/// root after rounding to double. Complex roots stand in exact conjugate pairs. A gain of 0 means
/// that the whole is zero; it has no roots then.
struct Factored {
    long double gain = 0.0L;
    std::vector<std::complex<long double>> zeros;
    std::vector<std::complex<long double>> poles;
    long double dead_time = 0.0L;

    bool is_zero() const { return gain == 0.0L; }
};

/// A polynomial, lowest power first, as gain * prod(s - root); zero where all coefficients are.
/// Roots at 0 are exact, orders 1 and 2 in closed form, higher ones by `polynomial_roots`.
Factored from_coefficients(std::span<const long double> lowest_first);

Factored operator*(const Factored& left, const Factored& right);

/// Roots side by side, nothing cancelled. The denominator is neither zero nor delayed.
Factored operator/(const Factored& numerator, const Factored& denominator);

/// The sum of terms of one and the same dead time over their least common denominator. Factors that
/// all terms share are kept as they are.
Factored sum(std::span<const Factored> terms);

/// Rounded to double.
PlantModel to_model(const Factored& factored);

} // namespace cornerwright
