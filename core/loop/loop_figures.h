#pragma once

#include "core/numerics/complex.h"
#include "core/numerics/figure.h"

#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// Figures whose definition carries a number of the user's; results stand in the same order.
struct FigureRequest {
    std::vector<double> settling_bands_percent; ///< beside the 2 % that is always computed
    std::vector<double> rejection_up_to_rad_s;
    std::vector<double> roll_off_from_rad_s;

    bool operator==(const FigureRequest&) const = default;
};

struct Stability {
    std::optional<bool> stable; ///< empty: could not be determined
    std::string reason;         ///< why not determined, or why not stable where that needs a word

    bool operator==(const Stability&) const = default;
};

/// What the loop's frequency response tells: crossings, margins and peaks, as defined in the
/// contract and computed from the formulas even where the loop is unstable.
struct FrequencyFigures {
    Figure phase_margin_deg;
    Figure phase_margin_at_rad_s;
    Figure gain_margin_db;
    Figure gain_margin_at_rad_s;
    Figure gain_reduction_margin_db;
    Figure gain_reduction_margin_at_rad_s;
    Figure delay_margin_s;
    std::vector<double> crossovers_rad_s;
    std::vector<double> phase_crossings_rad_s;
    Figure sensitivity_peak_db;
    Figure sensitivity_peak_at_rad_s;
    Figure complementary_peak_db;
    Figure complementary_peak_at_rad_s;
    Figure control_effort_peak_db;
    Figure control_effort_peak_at_rad_s;
    Figure bandwidth_rad_s;
    std::vector<Figure> rejections_db; ///< as in the request
    std::vector<Figure> rejections_at_rad_s;
    std::vector<Figure> roll_offs_db;
    std::vector<Figure> roll_offs_at_rad_s;

    bool operator==(const FrequencyFigures&) const = default;
};

/// lim e(t) for unit step, ramp and parabola, from the error constants.
struct SteadyStateErrors {
    Figure step;
    Figure ramp;
    Figure parabola;

    bool operator==(const SteadyStateErrors&) const = default;
};

/// What the unit step on the reference (and on the disturbance) tells.
struct TimeFigures {
    Figure overshoot_percent;
    Figure peak_time_s;
    Figure rise_time_s;
    Figure settling_time_s;               ///< 2 % band
    std::vector<Figure> settling_times_s; ///< as in the request
    Figure control_peak;
    Figure disturbance_peak;

    bool operator==(const TimeFigures&) const = default;
};

/// Every figure of one loop of one case.
struct LoopFigures {
    Stability stability;
    FrequencyFigures frequency;
    SteadyStateErrors steady_state_error;
    TimeFigures time;
    ComplexVector closed_loop_poles; ///< rad/s, or z where `poles_in_z`
    std::string
        closed_loop_poles_note; ///< why there are none, or which of infinitely many these are
    bool poles_in_z = false;
    std::vector<std::string>
        remarks; ///< sentences for the user: aliasing neglected, few points, ...

    bool operator==(const LoopFigures&) const = default;
};

/// Responses for drawing, all on one grid. Phases are unwrapped and continuous.
struct LoopCurves {
    std::vector<double> w_rad_s;
    ComplexVector plant;
    ComplexVector compensator;
    ComplexVector loop;
    std::vector<double> plant_db;
    std::vector<double> plant_phase_deg;
    std::vector<double> loop_db;
    std::vector<double> loop_phase_deg;
    std::vector<double> sensitivity_db;
    std::vector<double> complementary_db;
    std::vector<double> control_effort_db;

    bool operator==(const LoopCurves&) const = default;
};

/// Time responses for drawing and export: unit step on the reference (y, u) and on the disturbance.
/// Times may stand twice where a signal jumps.
struct StepCurves {
    std::vector<double> t_s;
    std::vector<double> y;
    std::vector<double> u;
    std::vector<double> y_disturbance;
    std::string note; ///< "from the fit, misfit 0.4 dB", or why there is none

    bool operator==(const StepCurves&) const = default;
};

} // namespace cornerwright
