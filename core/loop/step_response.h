#pragma once

#include "core/loop/loop.h"
#include "core/loop/loop_figures.h"

namespace cornerwright {

struct TimeAssessment {
    TimeFigures figures;
    StepCurves curves;
};

/// Step figures and curves of a stable loop. `closed_loop_poles` as from `closed_loop_poles`: a
/// start for the modal form, checked by it. A measured plant goes through its fit and says so, or
/// comes back undetermined. The design loop replaces the hold by a delay of half its period.
TimeAssessment assess_time(const DesignLoop& loop, const FigureRequest& request,
                           const ComplexVector& closed_loop_poles);
TimeAssessment assess_time(const RealisedLoop& loop, const FigureRequest& request,
                           const ComplexVector& closed_loop_poles_z);

/// The curves alone, `points` of them evenly spaced over [0, until_s], for stable and unstable
/// loops.
StepCurves step_curves(const DesignLoop& loop, double until_s, int points);
StepCurves step_curves(const RealisedLoop& loop, double until_s, int points);

} // namespace cornerwright
