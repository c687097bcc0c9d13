#include "core/numerics/polynomial_roots.h"

#include "core/numerics/root_iteration.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

constexpr double half_ulp = 0x1p-53;

/// A polynomial with non-zero first and last coefficient, lowest power first.
class PolynomialProblem : public RootProblem {
  public:
    explicit PolynomialProblem(std::vector<double> ascending)
        : coefficients_(std::move(ascending)) {}

    std::size_t count() const override { return coefficients_.size() - 1; }

    ComplexVector start() const override {
        std::vector<double> log_sizes;
        for (const double coefficient : coefficients_)
            log_sizes.push_back(std::log(std::abs(coefficient)));
        return newton_polygon_points(log_sizes);
    }

    /// Horner's rule; outside the unit circle on the reversed polynomial, so that nothing
    /// overflows.
    CoarseStep coarse(Complex s) const override {
        const std::size_t n = count();
        const bool outside = std::norm(s) > 1.0;
        const Complex t = outside ? inverse(s) : s;
        const double size = std::abs(t);
        Complex value = 0.0;
        Complex derivative = 0.0;
        double sum = 0.0;
        for (std::size_t k = 0; k <= n; ++k) {
            const double coefficient = coefficients_[outside ? k : n - k];
            derivative = times(derivative, t) + value;
            value = times(value, t) + coefficient;
            sum = sum * size + std::abs(coefficient);
        }
        // p = s^n q(1/s) gives p/p' = s q / (n q - q'/s).
        const double degree = static_cast<double>(n);
        const Complex slope =
            outside ? times(degree * value - times(t, derivative), t) : derivative;
        const double unit = half_ulp * sum / std::abs(slope);
        return {value / slope, 4.0 * (degree + 1.0) * unit, unit};
    }

    PreciseStep precise(const PreciseComplex& s) const override {
        PreciseComplex value{coefficients_.back(), 0.0};
        PreciseComplex derivative{};
        const double size = std::abs(s.value);
        double sum = std::abs(coefficients_.back());
        for (std::size_t k = count(); k-- > 0;) {
            derivative = derivative * s + value;
            value = value * s + PreciseComplex{coefficients_[k], 0.0};
            sum = sum * size + std::abs(coefficients_[k]);
        }
        const Complex slope = derivative.rounded();
        const Complex newton = value.rounded() / slope;
        const double terms = 8.0 * static_cast<double>(count() + 1) * half_ulp;
        return {newton, terms * terms * sum / std::abs(slope) + 16.0 * half_ulp * std::abs(newton)};
    }

    double log_noise(Complex s) const override {
        const double log_size = std::log(std::abs(s));
        double sum = std::abs(coefficients_.front());
        for (std::size_t k = 1; k < coefficients_.size(); ++k)
            if (coefficients_[k] != 0.0)
                sum += std::exp(std::log(std::abs(coefficients_[k])) +
                                static_cast<double>(k) * log_size);
        return std::log(half_ulp * sum);
    }

    double log_leading() const override { return std::log(std::abs(coefficients_.back())); }

  private:
    std::vector<double> coefficients_;
};

} // namespace

ComplexVector polynomial_roots(std::span<const double> coefficients) {
    while (!coefficients.empty() && coefficients.front() == 0.0)
        coefficients = coefficients.subspan(1);
    ComplexVector roots;
    while (!coefficients.empty() && coefficients.back() == 0.0) {
        roots.emplace_back(0.0);
        coefficients = coefficients.first(coefficients.size() - 1);
    }
    if (coefficients.size() < 2)
        return roots;

    // s = 2^e x with the product of the x near 1; a power of two costs no rounding.
    const std::size_t n = coefficients.size() - 1;
    const int leading = std::ilogb(coefficients.front());
    const int e = (std::ilogb(coefficients.back()) - leading) / static_cast<int>(n);
    std::vector<double> scaled(n + 1);
    for (std::size_t k = 0; k <= n; ++k)
        scaled[k] = std::ldexp(coefficients[n - k],
                               e * (static_cast<int>(k) - static_cast<int>(n)) - leading);
    for (const Complex& x : solve_roots(PolynomialProblem(std::move(scaled))).roots)
        roots.emplace_back(std::ldexp(x.real(), e), std::ldexp(x.imag(), e));
    std::sort(roots.begin(), roots.end(), [](Complex left, Complex right) {
        return left.real() != right.real() ? left.real() < right.real()
                                           : left.imag() < right.imag();
    });
    return roots;
}

} // namespace cornerwright
