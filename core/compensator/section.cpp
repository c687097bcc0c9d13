#include "core/compensator/section.h"

#include "core/numerics/error.h"

#include <array>
#include <charconv>
#include <cmath>

namespace cornerwright {
namespace {

using enum SectionKind;

constexpr std::array all_kinds{gain,          integrator, pi,        lead,
                               lag,           real_zero,  real_pole, complex_zeros,
                               complex_poles, notch,      washout};

constexpr SectionParameter gain_value{"gain", &Section::gain, ParameterBound::not_zero, false};
constexpr SectionParameter corner{"corner_rad_s", &Section::corner_rad_s,
                                  ParameterBound::above_zero, true};
constexpr SectionParameter zero{"zero_rad_s", &Section::zero_rad_s, ParameterBound::above_zero,
                                true};
constexpr SectionParameter pole{"pole_rad_s", &Section::pole_rad_s, ParameterBound::above_zero,
                                true};
constexpr SectionParameter zeros_damping{"damping", &Section::damping,
                                         ParameterBound::zero_or_above, false};
constexpr SectionParameter poles_damping{"damping", &Section::damping, ParameterBound::above_zero,
                                         false};
constexpr SectionParameter notch_zero_damping{"zero_damping", &Section::zero_damping,
                                              ParameterBound::zero_or_above, false};
constexpr SectionParameter notch_pole_damping{"pole_damping", &Section::pole_damping,
                                              ParameterBound::above_zero, false};

constexpr std::array gain_parameters{gain_value};
constexpr std::array corner_parameters{corner};
constexpr std::array zero_pole_parameters{zero, pole};
constexpr std::array zero_parameters{zero};
constexpr std::array pole_parameters{pole};
constexpr std::array complex_zeros_parameters{corner, zeros_damping};
constexpr std::array complex_poles_parameters{corner, poles_damping};
constexpr std::array notch_parameters{corner, notch_zero_damping, notch_pole_damping};

std::string text_of(double value) {
    std::array<char, 32> buffer{};
    const auto end = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value);
    return {buffer.data(), end.ptr};
}

std::string_view words_of(ParameterBound bound) {
    switch (bound) {
    case ParameterBound::not_zero:
        return "other than zero";
    case ParameterBound::above_zero:
        return "above zero";
    case ParameterBound::zero_or_above:
        break;
    }
    return "of zero or above";
}

bool holds(ParameterBound bound, double value) {
    if (!std::isfinite(value))
        return false;
    switch (bound) {
    case ParameterBound::not_zero:
        return value != 0.0;
    case ParameterBound::above_zero:
        return value > 0.0;
    case ParameterBound::zero_or_above:
        break;
    }
    return value >= 0.0;
}

[[noreturn]] void refuse(const Section& section, const std::string& expected,
                         const std::string& found) {
    throw InputError(
        {}, expected + " in the section \"" + std::string(name_of(section.kind)) + "\"", found);
}

/// Roots of s^2 + 2 damping w s + w^2, without cancellation where damping is far above 1.
void append_second_order_roots(ComplexVector& roots, double w, double damping) {
    if (damping < 1.0) {
        const double imaginary = w * std::sqrt((1.0 - damping) * (1.0 + damping));
        roots.emplace_back(-damping * w, imaginary);
        roots.emplace_back(-damping * w, -imaginary);
        return;
    }
    const double far = w * (damping + std::sqrt((damping - 1.0) * (damping + 1.0)));
    roots.emplace_back(-far, 0.0);
    roots.emplace_back(-w * (w / far), 0.0);
}

} // namespace

std::string_view name_of(SectionKind kind) {
    switch (kind) {
    case gain:
        return "gain";
    case integrator:
        return "integrator";
    case pi:
        return "pi";
    case lead:
        return "lead";
    case lag:
        return "lag";
    case real_zero:
        return "real_zero";
    case real_pole:
        return "real_pole";
    case complex_zeros:
        return "complex_zeros";
    case complex_poles:
        return "complex_poles";
    case notch:
        return "notch";
    case washout:
        break;
    }
    return "washout";
}

std::span<const SectionKind> all_section_kinds() {
    return all_kinds;
}

std::span<const SectionParameter> parameters_of(SectionKind kind) {
    switch (kind) {
    case gain:
        return gain_parameters;
    case integrator:
        return {};
    case pi:
    case washout:
        return corner_parameters;
    case lead:
    case lag:
        return zero_pole_parameters;
    case real_zero:
        return zero_parameters;
    case real_pole:
        return pole_parameters;
    case complex_zeros:
        return complex_zeros_parameters;
    case complex_poles:
        return complex_poles_parameters;
    case notch:
        break;
    }
    return notch_parameters;
}

void check(const Section& section) {
    for (const SectionParameter& parameter : parameters_of(section.kind)) {
        const double value = section.*parameter.value;
        if (!holds(parameter.bound, value))
            refuse(section,
                   std::string(parameter.key) + " " + std::string(words_of(parameter.bound)),
                   text_of(value));
    }
    const std::string values = "zero " + text_of(section.zero_rad_s) + " and pole " +
                               text_of(section.pole_rad_s) + " rad/s";
    if (section.kind == lead && section.pole_rad_s <= section.zero_rad_s)
        refuse(section, "the pole above the zero", values);
    if (section.kind == lag && section.pole_rad_s >= section.zero_rad_s)
        refuse(section, "the pole below the zero", values);
    if (section.kind == notch && section.zero_damping >= section.pole_damping)
        refuse(section, "zero_damping below pole_damping",
               text_of(section.zero_damping) + " and " + text_of(section.pole_damping));
}

RootForm roots_of(const Section& section) {
    const double w = section.corner_rad_s;
    RootForm form;
    switch (section.kind) {
    case gain:
        form.gain = section.gain;
        break;
    case integrator:
        form.poles = {0.0};
        break;
    case pi:
        form = {{-w}, {0.0}, 1.0};
        break;
    case lead:
    case lag:
        form = {
            {-section.zero_rad_s}, {-section.pole_rad_s}, section.pole_rad_s / section.zero_rad_s};
        break;
    case real_zero:
        form = {{-section.zero_rad_s}, {}, 1.0 / section.zero_rad_s};
        break;
    case real_pole:
        form = {{}, {-section.pole_rad_s}, section.pole_rad_s};
        break;
    case complex_zeros:
        append_second_order_roots(form.zeros, w, section.damping);
        form.gain = 1.0 / w / w;
        break;
    case complex_poles:
        append_second_order_roots(form.poles, w, section.damping);
        form.gain = w * w;
        break;
    case notch:
        append_second_order_roots(form.zeros, w, section.zero_damping);
        append_second_order_roots(form.poles, w, section.pole_damping);
        break;
    case washout:
        form = {{0.0}, {-w}, 1.0};
        break;
    }
    return form;
}

double characteristic_rad_s(const Section& section) {
    switch (section.kind) {
    case gain:
    case integrator:
        return 0.0;
    case lead:
    case lag:
        return std::sqrt(section.zero_rad_s) * std::sqrt(section.pole_rad_s);
    case real_zero:
        return section.zero_rad_s;
    case real_pole:
        return section.pole_rad_s;
    case pi:
    case complex_zeros:
    case complex_poles:
    case notch:
    case washout:
        break;
    }
    return section.corner_rad_s;
}

} // namespace cornerwright
