#include "core/placement/free_parameters.h"

#include <cmath>

namespace cornerwright {
namespace {

/// d ln(s^2 + 2 d w s + w^2) by ln w and by ln d.
Complex quadratic_by_corner(double w, double damping, Complex s) {
    return (2.0 * damping * w * s + 2.0 * w * w) / (s * s + 2.0 * damping * w * s + w * w);
}
Complex quadratic_by_damping(double w, double damping, Complex s) {
    return 2.0 * damping * w * s / (s * s + 2.0 * damping * w * s + w * w);
}

Complex notch_derivative(const Section& section, double Section::*value, Complex s) {
    const double w = section.corner_rad_s;
    if (value == &Section::zero_damping)
        return quadratic_by_damping(w, section.zero_damping, s);
    if (value == &Section::pole_damping)
        return -quadratic_by_damping(w, section.pole_damping, s);
    return quadratic_by_corner(w, section.zero_damping, s) -
           quadratic_by_corner(w, section.pole_damping, s);
}

/// Of s^2/w^2 + 2 d s/w + 1: the quadratic above over w^2.
Complex normalised_derivative(const Section& section, double Section::*value, Complex s) {
    if (value == &Section::damping)
        return quadratic_by_damping(section.corner_rad_s, section.damping, s);
    return quadratic_by_corner(section.corner_rad_s, section.damping, s) - 2.0;
}

Complex log_derivative(const Section& section, double Section::*value, Complex s) {
    const double w = section.corner_rad_s;
    switch (section.kind) {
    case SectionKind::gain:
        return 1.0;
    case SectionKind::integrator:
        return 0.0;
    case SectionKind::pi:
        return w / (s + w);
    case SectionKind::lead:
    case SectionKind::lag:
    case SectionKind::real_zero:
    case SectionKind::real_pole:
        return value == &Section::zero_rad_s ? -s / (s + section.zero_rad_s)
                                             : s / (s + section.pole_rad_s);
    case SectionKind::complex_zeros:
        return normalised_derivative(section, value, s);
    case SectionKind::complex_poles:
        return -normalised_derivative(section, value, s);
    case SectionKind::notch:
        return notch_derivative(section, value, s);
    case SectionKind::washout:
        break;
    }
    return -w / (s + w);
}

} // namespace

std::vector<FreeParameter> free_parameters(const Chain& chain) {
    std::vector<FreeParameter> parameters;
    for (std::size_t i = 0; i < chain.size(); ++i) {
        if (!chain[i].enabled || chain[i].locked)
            continue;
        for (const SectionParameter& parameter : parameters_of(chain[i].kind)) {
            if (chain[i].*parameter.value != 0.0)
                parameters.push_back({i, parameter});
        }
    }
    return parameters;
}

std::vector<double> logarithms_of(const Chain& chain,
                                  const std::vector<FreeParameter>& parameters) {
    std::vector<double> logarithms;
    for (const FreeParameter& free : parameters)
        logarithms.push_back(std::log(std::abs(chain[free.section].*free.parameter.value)));
    return logarithms;
}

Chain with_logarithms(Chain chain, const std::vector<FreeParameter>& parameters,
                      const std::vector<double>& logarithms) {
    for (std::size_t i = 0; i < parameters.size(); ++i) {
        double& value = chain[parameters[i].section].*parameters[i].parameter.value;
        value = std::copysign(std::exp(logarithms[i]), value);
    }
    return chain;
}

ComplexVector log_derivatives(const Chain& chain, const std::vector<FreeParameter>& parameters,
                              Complex s) {
    ComplexVector derivatives;
    for (const FreeParameter& free : parameters)
        derivatives.push_back(log_derivative(chain[free.section], free.parameter.value, s));
    return derivatives;
}

} // namespace cornerwright
