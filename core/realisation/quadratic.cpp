#include "core/realisation/quadratic.h"

#include <cmath>

namespace cornerwright {

QuadraticRoots quadratic_roots(const std::array<long double, 3>& c) {
    if (c[0] == 0.0L && c[1] == 0.0L)
        return {{}, static_cast<double>(c[2])};
    if (c[0] == 0.0L)
        return {{static_cast<double>(-c[2] / c[1])}, static_cast<double>(c[1])};

    const double leading = static_cast<double>(c[0]);
    const long double middle = -c[1] / (2.0L * c[0]);
    const long double product = c[2] / c[0];
    // Fused, so that a near-double root does not lose the digits of the difference.
    const long double discriminant = std::fma(middle, middle, -product);
    if (discriminant < 0.0L) {
        const Complex root(static_cast<double>(middle),
                           static_cast<double>(std::sqrt(-discriminant)));
        return {{root, std::conj(root)}, leading};
    }
    const long double far = middle + std::copysign(std::sqrt(discriminant), middle);
    if (far == 0.0L)
        return {{0.0, 0.0}, leading};
    return {{static_cast<double>(far), static_cast<double>(product / far)}, leading};
}

} // namespace cornerwright
