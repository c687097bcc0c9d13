#pragma once

#include "core/loop/loop.h"
#include "core/loop/loop_figures.h"

#include <span>

namespace cornerwright {

/// C, P (held and delayed as the loop's definition says), L, S, T at one frequency.
struct LoopPoint {
    double w_rad_s = 0.0;
    Complex compensator;
    Complex plant;
    Complex loop;
    Complex sensitivity;
    Complex complementary;
};

/// The loop at given frequencies (> 0; realised: up to pi/Ts). Throws InputError for a frequency
/// outside a measurement or above pi/Ts.
std::vector<LoopPoint> loop_points(const DesignLoop& loop, std::span<const double> w_rad_s);
std::vector<LoopPoint> loop_points(const RealisedLoop& loop, std::span<const double> w_rad_s);

/// Figures, stability, error constants and curves of one loop, everything that follows from the
/// frequency response and the open loop's roots. For a model without delay the caller passes the
/// closed-loop poles that decide stability; they are not looked at otherwise.
struct FrequencyAssessment {
    Stability stability;
    FrequencyFigures figures;
    SteadyStateErrors steady_state_error;
    LoopCurves curves;
    std::vector<std::string> remarks;
};

FrequencyAssessment assess_frequency(const DesignLoop& loop, const FigureRequest& request,
                                     const ComplexVector& closed_loop_poles);
FrequencyAssessment assess_frequency(const RealisedLoop& loop, const FigureRequest& request,
                                     const ComplexVector& closed_loop_poles_z);

} // namespace cornerwright
