#pragma once

#include "core/numerics/complex.h"

#include <array>

namespace cornerwright {

/// Roots of a polynomial of degree two or less, and its first coefficient that is not zero (0 where
/// all are).
struct QuadraticRoots {
    ComplexVector roots;
    double leading = 0.0;
};

/// Roots of c[0] d^2 + c[1] d + c[2] without cancellation between them; a root at 0 is exactly 0,
/// a complex pair exactly conjugate. Leading zeros lower the degree.
QuadraticRoots quadratic_roots(const std::array<long double, 3>& c);

} // namespace cornerwright
