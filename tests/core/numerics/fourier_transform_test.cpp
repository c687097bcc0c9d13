#include "core/numerics/fourier_transform.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numbers>
#include <random>

namespace cornerwright {
namespace {

ComplexVector random_values(std::size_t count) {
    std::mt19937 random(static_cast<unsigned>(count)); // seeded: the same values in every run
    std::normal_distribution<double> normal;
    ComplexVector values(count);
    for (Complex& value : values)
        value = {normal(random), normal(random)};
    return values;
}

/// The sum of the definition, in long double.
ComplexVector by_definition(const ComplexVector& values) {
    const std::size_t count = values.size();
    ComplexVector result(count);
    for (std::size_t k = 0; k < count; ++k) {
        std::complex<long double> sum = 0.0L;
        for (std::size_t n = 0; n < count; ++n) {
            const long double angle = -2.0L * std::numbers::pi_v<long double> *
                                      static_cast<long double>(k * n % count) /
                                      static_cast<long double>(count);
            sum += std::complex<long double>(values[n]) *
                   std::complex<long double>(std::cos(angle), std::sin(angle));
        }
        result[k] = Complex(sum);
    }
    return result;
}

double distance(const ComplexVector& a, const ComplexVector& b) {
    double sum = 0.0;
    for (std::size_t i = 0; i < a.size(); ++i)
        sum += std::norm(a[i] - b[i]);
    return std::sqrt(sum);
}

double length(const ComplexVector& a) {
    return distance(a, ComplexVector(a.size(), 0.0));
}

TEST(FourierTransform, EqualsTheSumOfItsDefinitionForAnyLength) {
    for (const std::size_t count :
         {1U, 2U, 3U, 4U, 5U, 7U, 8U, 12U, 97U, 128U, 250U, 1000U, 1021U}) {
        const ComplexVector values = random_values(count);
        ComplexVector transformed = values;
        FourierTransform(count).forward(transformed);
        const ComplexVector expected = by_definition(values);
        EXPECT_LE(distance(transformed, expected),
                  1e-14 * length(expected) * std::log2(2.0 + double(count)))
            << "length " << count;
    }
}

/// Parseval: sum |X|^2 = N sum |x|^2, here at lengths whose definition would take too long.
TEST(FourierTransform, KeepsTheEnergy) {
    for (const std::size_t count : {std::size_t{65536}, std::size_t{100003}}) {
        const ComplexVector values = random_values(count);
        ComplexVector transformed = values;
        FourierTransform(count).forward(transformed);
        const double before = std::sqrt(static_cast<double>(count)) * length(values);
        EXPECT_NEAR(length(transformed) / before, 1.0, 1e-13);
    }
}

} // namespace
} // namespace cornerwright
