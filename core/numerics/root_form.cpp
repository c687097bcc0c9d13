#include "core/numerics/root_form.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

/// Angle of jw - root for a real root, of the product over the pair for one of a conjugate pair
/// (half of it, so that both members together give the whole).
double factor_angle(Complex root, double w) {
    const double left = std::atan2(w - root.imag(), -root.real());
    if (root.imag() == 0.0)
        return left;
    // The members of a pair start from +-a at w = 0 and their sum from 0 (left) or 2 pi (right).
    // Shifting the member whose angle jumps across +-pi right of the axis keeps the sum continuous.
    if (root.real() > 0.0 && left < 0.0)
        return left + 2.0 * std::numbers::pi;
    return left;
}

} // namespace

Complex evaluate(const RootForm& form, Complex s) {
    Complex value = form.gain;
    const std::size_t pairs = std::min(form.zeros.size(), form.poles.size());
    for (std::size_t i = 0; i < pairs; ++i)
        value *= (s - form.zeros[i]) / (s - form.poles[i]);
    for (std::size_t i = pairs; i < form.zeros.size(); ++i)
        value *= s - form.zeros[i];
    for (std::size_t i = pairs; i < form.poles.size(); ++i)
        value /= s - form.poles[i];
    return value;
}

RootForm operator*(const RootForm& left, const RootForm& right) {
    RootForm product = left;
    product.zeros.insert(product.zeros.end(), right.zeros.begin(), right.zeros.end());
    product.poles.insert(product.poles.end(), right.poles.begin(), right.poles.end());
    product.gain *= right.gain;
    return product;
}

LogResponse evaluate_log(const RootForm& form, double w) {
    LogResponse result{std::log(std::abs(form.gain)), form.gain < 0.0 ? std::numbers::pi : 0.0};
    for (const Complex& zero : form.zeros) {
        result.log_magnitude += std::log(std::abs(Complex(0.0, w) - zero));
        result.phase_rad += factor_angle(zero, w);
    }
    for (const Complex& pole : form.poles) {
        result.log_magnitude -= std::log(std::abs(Complex(0.0, w) - pole));
        result.phase_rad -= factor_angle(pole, w);
    }
    return result;
}

} // namespace cornerwright
