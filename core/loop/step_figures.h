#pragma once

#include "core/loop/loop_figures.h"
#include "core/loop/step_signal.h"

namespace cornerwright {

/// The three signals of the contract: y and u after a unit step on the reference, y after one on
/// the disturbance.
struct StepSignals {
    StepSignal y;
    StepSignal u;
    StepSignal y_disturbance;
    bool control_has_impulse = false; ///< u holds an impulse at t = 0 (improper compensator)
};

/// Figures by their definitions in terms of the signals.
TimeFigures time_figures(const StepSignals& signals, const FigureRequest& request);

/// All of them undetermined for one reason.
TimeFigures no_time_figures(const FigureRequest& request, const std::string& reason);

/// The same figures with a remark on each determined one.
TimeFigures with_note(TimeFigures figures, const std::string& note);

} // namespace cornerwright
