#include "tests/outside/method_response.h"

#include <cmath>

namespace cornerwright::outside {
namespace {

constexpr WideComplex j{0.0L, 1.0L};

/// exp(x) - 1 without loss near 0.
WideComplex expm1(WideComplex x) {
    const Wide half = std::sin(x.imag() / 2.0L);
    return {std::expm1(x.real()) * std::cos(x.imag()) - 2.0L * half * half,
            std::exp(x.real()) * std::sin(x.imag())};
}

/// The table of section kinds.
WideComplex section_at(const Section& section, WideComplex s) {
    const Wide w = section.corner_rad_s;
    const auto quadratic = [&](Wide damping) {
        return s * s / (w * w) + 2.0L * damping * s / w + 1.0L;
    };
    switch (section.kind) {
    case SectionKind::gain:
        return static_cast<Wide>(section.gain);
    case SectionKind::integrator:
        return 1.0L / s;
    case SectionKind::pi:
        return 1.0L + w / s;
    case SectionKind::lead:
    case SectionKind::lag:
        return (s / static_cast<Wide>(section.zero_rad_s) + 1.0L) /
               (s / static_cast<Wide>(section.pole_rad_s) + 1.0L);
    case SectionKind::real_zero:
        return s / static_cast<Wide>(section.zero_rad_s) + 1.0L;
    case SectionKind::real_pole:
        return 1.0L / (s / static_cast<Wide>(section.pole_rad_s) + 1.0L);
    case SectionKind::complex_zeros:
        return quadratic(section.damping);
    case SectionKind::complex_poles:
        return 1.0L / quadratic(section.damping);
    case SectionKind::notch:
        return quadratic(section.zero_damping) / quadratic(section.pole_damping);
    case SectionKind::washout:
        break;
    }
    return (s / w) / (s / w + 1.0L);
}

/// The frequency at which tustin_at_corners is exact; 0 where a section stays unwarped.
Wide own_corner(const Section& section) {
    switch (section.kind) {
    case SectionKind::gain:
    case SectionKind::integrator:
    case SectionKind::pi:
        return 0.0L;
    case SectionKind::lead:
    case SectionKind::lag:
        return std::sqrt(static_cast<Wide>(section.zero_rad_s) *
                         static_cast<Wide>(section.pole_rad_s));
    case SectionKind::real_zero:
        return section.zero_rad_s;
    case SectionKind::real_pole:
        return section.pole_rad_s;
    default:
        break;
    }
    return section.corner_rad_s;
}

WideComplex tustin_at(const Section& section, WideComplex d, Wide exact_at, Wide period) {
    const Wide scale =
        exact_at > 0.0L ? exact_at / std::tan(exact_at * period / 2.0L) : 2.0L / period;
    return section_at(section, scale * d / (d + 2.0L));
}

/// z = exp(s Ts) for each root, roots at infinity to z = -1, equal in size where the rule says.
WideComplex matched_at(const Section& section, WideComplex d, Wide period) {
    const RootForm roots = roots_of(section);
    const auto product = [&](WideComplex at) {
        WideComplex value = 1.0L;
        for (const Complex& zero : roots.zeros)
            value *= at - expm1(WideComplex(zero) * period);
        for (const Complex& pole : roots.poles)
            value /= at - expm1(WideComplex(pole) * period);
        const int surplus =
            static_cast<int>(roots.poles.size()) - static_cast<int>(roots.zeros.size());
        return value * std::pow(at + 2.0L, surplus);
    };
    const bool at_dc = section.kind != SectionKind::integrator && section.kind != SectionKind::pi &&
                       section.kind != SectionKind::washout;
    if (at_dc)
        return product(d) * section_at(section, 0.0L) / product(0.0L);
    const Wide w = section.kind == SectionKind::integrator
                       ? 0.1L / period
                       : static_cast<Wide>(section.corner_rad_s);
    const Wide size =
        std::abs(section_at(section, j * w)) / std::abs(product(expm1(j * w * period)));
    return product(d) * size;
}

} // namespace

WideComplex method_response(const Project& project, double w_rad_s) {
    const Wide period = project.sampling->sample_period_s;
    const WideComplex d = expm1(j * static_cast<Wide>(w_rad_s) * period);
    WideComplex value = 1.0L;
    for (const Section& section : project.compensator) {
        if (!section.enabled)
            continue;
        switch (project.realisation->method) {
        case Method::tustin:
            value *= tustin_at(section, d, 0.0L, period);
            break;
        case Method::tustin_at_corners:
            value *= tustin_at(section, d, own_corner(section), period);
            break;
        case Method::tustin_at:
            value *= tustin_at(section, d, project.realisation->match_rad_s, period);
            break;
        case Method::matched_roots:
            value *= matched_at(section, d, period);
            break;
        case Method::step_invariant:
            value *= HeldModel(roots_of(section), static_cast<double>(period)).step_equivalent(d);
            break;
        case Method::ramp_invariant:
            value *= HeldModel(roots_of(section), static_cast<double>(period)).ramp_equivalent(d);
            break;
        }
    }
    return value;
}

} // namespace cornerwright::outside
