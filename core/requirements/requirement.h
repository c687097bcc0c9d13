#pragma once

#include "core/numerics/figure.h"

#include <optional>
#include <span>
#include <string>
#include <string_view>

namespace cornerwright {

enum class Measure {
    phase_margin,
    gain_margin,
    gain_reduction_margin,
    delay_margin,
    sensitivity_peak,
    complementary_peak,
    control_effort_peak,
    bandwidth,
    disturbance_rejection,
    roll_off,
    overshoot,
    peak_time,
    rise_time,
    settling_time,
    steady_state_error,
    control_peak,
    disturbance_peak,
};

enum class ErrorInput { step, ramp, parabola };

/// One requirement of the project, judged for every plant case on every loop.
struct Requirement {
    Measure measure = Measure::phase_margin;
    std::optional<double> at_least; ///< in the unit of the measure
    std::optional<double> at_most;
    double band_percent = 2.0;           ///< settling_time
    ErrorInput input = ErrorInput::step; ///< steady_state_error
    double up_to_rad_s = 0.0;            ///< disturbance_rejection, > 0
    double from_rad_s = 0.0;             ///< roll_off, > 0

    bool operator==(const Requirement&) const = default;
};

enum class MeasureUnit { deg, db, rad_s, s, percent, plain };

/// The word of the project file: "phase_margin".
std::string_view name_of(Measure measure);
std::span<const Measure> all_measures();
MeasureUnit unit_of(Measure measure);
/// Suffix of the limit keys: "_deg", "_db", "_rad_s", "_s", "_percent", "".
std::string_view key_suffix(MeasureUnit unit);
/// As people write it: "deg", "dB", "rad/s", "s", "%", "".
std::string_view symbol_of(MeasureUnit unit);
std::string_view name_of(ErrorInput input);

enum class State { met, unmet, undetermined };
std::string_view name_of(State state);

} // namespace cornerwright
