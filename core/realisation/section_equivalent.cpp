#include "core/realisation/section_equivalent.h"

#include "core/realisation/hold_equivalent.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// z = -1 in d = z - 1.
constexpr double half_rate = -2.0;

/// Zeros (or, for an improper section, poles) at z = -1 that stand for those at infinity.
void append_half_rate_roots(RootForm& form) {
    while (form.zeros.size() < form.poles.size())
        form.zeros.emplace_back(half_rate);
    while (form.poles.size() < form.zeros.size())
        form.poles.emplace_back(half_rate);
}

/// s = scale (z - 1)/(z + 1): s - r = (scale - r)(d - 2r/(scale - r))/(z + 1).
RootForm bilinear(const RootForm& continuous, double scale) {
    RootForm result;
    Complex gain = continuous.gain;
    for (const Complex& zero : continuous.zeros) {
        result.zeros.push_back(2.0 * zero / (scale - zero));
        gain *= scale - zero;
    }
    for (const Complex& pole : continuous.poles) {
        result.poles.push_back(2.0 * pole / (scale - pole));
        gain /= scale - pole;
    }
    result.gain = gain.real();
    append_half_rate_roots(result);
    return result;
}

/// The scale of the bilinear map: exact at w where w > 0, else 2/Ts.
double bilinear_scale(double exact_at_rad_s, double period) {
    if (exact_at_rad_s <= 0.0)
        return 2.0 / period;
    return exact_at_rad_s / std::tan(exact_at_rad_s * period / 2.0);
}

/// Where tustin_at_corners is exact; 0 for the sections it leaves unwarped.
double warped_corner(const Section& section) {
    const bool unwarped =
        section.kind == SectionKind::pi || section.kind == SectionKind::integrator;
    return unwarped ? 0.0 : characteristic_rad_s(section);
}

bool holds_zero(const ComplexVector& roots) {
    return std::ranges::any_of(roots, [](const Complex& root) { return root == 0.0; });
}

RootForm matched(const Section& section, double period) {
    const RootForm continuous = roots_of(section);
    RootForm result;
    for (const Complex& zero : continuous.zeros)
        result.zeros.push_back(complex_expm1(zero * period));
    for (const Complex& pole : continuous.poles)
        result.poles.push_back(complex_expm1(pole * period));
    append_half_rate_roots(result);

    if (!holds_zero(continuous.zeros) && !holds_zero(continuous.poles)) {
        result.gain = evaluate(continuous, 0.0).real() / evaluate(result, 0.0).real();
        return result;
    }
    // At s = 0 the section is 0 or infinite: matched in size at its own corner instead.
    const double corner = characteristic_rad_s(section);
    const double w = corner > 0.0 ? corner : 0.1 / period;
    result.gain = std::abs(evaluate(continuous, Complex(0.0, w))) /
                  std::abs(evaluate(result, complex_expm1(Complex(0.0, w * period))));
    return result;
}

} // namespace

Complex complex_expm1(Complex x) {
    const double half_sine = std::sin(x.imag() / 2.0);
    return {std::expm1(x.real()) * std::cos(x.imag()) - 2.0 * half_sine * half_sine,
            std::exp(x.real()) * std::sin(x.imag())};
}

RootForm discrete_equivalent(const Section& section, const Realisation& realisation,
                             double sample_period_s) {
    switch (realisation.method) {
    case Method::tustin:
        return bilinear(roots_of(section), bilinear_scale(0.0, sample_period_s));
    case Method::tustin_at_corners:
        return bilinear(roots_of(section), bilinear_scale(warped_corner(section), sample_period_s));
    case Method::tustin_at:
        return bilinear(roots_of(section),
                        bilinear_scale(realisation.match_rad_s, sample_period_s));
    case Method::matched_roots:
        return matched(section, sample_period_s);
    case Method::step_invariant:
        return step_equivalent(section, sample_period_s);
    case Method::ramp_invariant:
        break;
    }
    return ramp_equivalent(section, sample_period_s);
}

} // namespace cornerwright
