#pragma once

#include "core/numerics/root_form.h"

#include <span>
#include <string>
#include <string_view>

namespace cornerwright {

enum class SectionKind {
    gain,
    integrator,
    pi,
    lead,
    lag,
    real_zero,
    real_pole,
    complex_zeros,
    complex_poles,
    notch,
    washout,
};

/// One factor of the compensator. Which numbers count depends on the kind (`parameters_of`); the
/// others keep their defaults.
struct Section {
    SectionKind kind = SectionKind::gain;
    double gain = 1.0;
    double corner_rad_s = 1.0;
    double zero_rad_s = 1.0;
    double pole_rad_s = 10.0;
    double damping = 1.0;
    double zero_damping = 0.1;
    double pole_damping = 0.7;
    std::string label;
    bool enabled = true;
    bool locked = false;

    bool operator==(const Section&) const = default;
};

enum class ParameterBound { not_zero, above_zero, zero_or_above };

/// One number of a section: how the project file calls it, which member holds it, what it may be.
struct SectionParameter {
    std::string_view key; ///< as in the project file, unit included: "zero_rad_s"
    double Section::*value;
    ParameterBound bound;
    bool is_frequency; ///< rad/s, shown in Hz or rad/s as the user chooses
};

/// The word of the project file: "lead".
std::string_view name_of(SectionKind kind);
/// Every kind, in the order of the project-file table.
std::span<const SectionKind> all_section_kinds();
/// The numbers of a kind, in the order in which the project file writes them.
std::span<const SectionParameter> parameters_of(SectionKind kind);

/// Throws InputError (no place) where a number breaks its bound, a lead has pole <= zero, a lag
/// pole >= zero, or a notch zero_damping >= pole_damping.
void check(const Section& section);

/// Transfer function of the section in factored form, from the table in the project-file format.
/// `enabled` is not looked at.
RootForm roots_of(const Section& section);

/// The frequency that stands for the section, rad/s: its corner; sqrt(zero pole) for lead and lag;
/// the only corner of a real zero or pole. 0 for a gain and an integrator, which have none.
double characteristic_rad_s(const Section& section);

} // namespace cornerwright
