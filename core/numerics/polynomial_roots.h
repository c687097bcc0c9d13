#pragma once

#include "core/numerics/complex.h"

#include <span>

namespace cornerwright {

/// All roots of a real polynomial, coefficients highest power first: ascending by real part, then
/// imaginary part, conjugate pairs exact, roots at zero exactly zero. Leading zeros are skipped; a
/// constant (or nothing) has no roots. Roots closer together than the rounding of the coefficients
/// can tell are returned as one multiple root. Coefficients must be finite; the frequency scale is
/// taken out first, so they may span hundreds of decades.
ComplexVector polynomial_roots(std::span<const double> coefficients);

} // namespace cornerwright
