#include "core/loop/cancellation.h"

#include "core/numerics/number_text.h"

#include <cmath>

namespace cornerwright {
namespace {

constexpr double sameness = 1e-12;
constexpr double boundary = 1e-9; ///< as for closed-loop poles

bool is_outside(Complex root, RootPlane plane) {
    if (plane == RootPlane::s)
        return root.real() >= -boundary * std::abs(root);
    // |1 + d| - 1 without losing the digits of a small d.
    const double excess = 2.0 * root.real() + std::norm(root);
    return excess >= -2.0 * boundary;
}

std::string signed_term(double value, const std::string& symbol) {
    constexpr int digits = 6;
    const std::string sign = value < 0.0 ? " - " : " + ";
    return sign + number_text(std::abs(value), digits) + symbol;
}

std::string factor_text(Complex root, RootPlane plane) {
    const std::string variable = plane == RootPlane::s ? "s" : "z";
    const Complex place = plane == RootPlane::s ? root : root + 1.0;
    if (place == 0.0)
        return variable;
    if (place.imag() == 0.0)
        return "(" + variable + signed_term(-place.real(), "") + ")";
    std::string text = "(" + variable + "^2";
    if (place.real() != 0.0)
        text += signed_term(-2.0 * place.real(), " " + variable);
    return text + signed_term(std::norm(place), "") + ")";
}

} // namespace

std::optional<std::string> hidden_factor(const RootForm& loop, RootPlane plane) {
    for (const Complex& pole : loop.poles) {
        if (pole.imag() < 0.0 || !is_outside(pole, plane))
            continue;
        for (const Complex& zero : loop.zeros)
            if (std::abs(zero - pole) <= sameness * std::abs(pole))
                return factor_text(pole, plane);
    }
    return std::nullopt;
}

} // namespace cornerwright
