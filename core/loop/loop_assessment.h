#pragma once

#include "core/loop/loop.h"
#include "core/loop/loop_figures.h"

#include <string>

namespace cornerwright {

/// Figures and curves of one loop of one case.
struct LoopAssessment {
    LoopFigures figures;
    LoopCurves curves;
    StepCurves step;

    bool operator==(const LoopAssessment&) const = default;
};

/// Every figure and curve of one loop, from its poles, its frequency response and, where it is
/// stable, its step.
LoopAssessment assess_loop(const DesignLoop& loop, const FigureRequest& request);
LoopAssessment assess_loop(const RealisedLoop& loop, const FigureRequest& request);

/// All figures "not determined" for one reason, in the shape that `request` asks for.
LoopAssessment undetermined_loop(const FigureRequest& request, const std::string& reason);

} // namespace cornerwright
