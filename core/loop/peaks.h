#pragma once

#include "core/loop/loop_curve.h"
#include "core/loop/loop_figures.h"

namespace cornerwright {

/// ln|S|, ln|T| and ln|C S| on the points of a curve.
struct CurveLevels {
    std::vector<double> sensitivity;
    std::vector<double> complementary;
    std::vector<double> control_effort;
};

CurveLevels levels_of(const LoopCurve& curve);

/// Fills the three peaks, bandwidth, disturbance rejections and roll-offs. Local maxima are
/// bracketed by the sign of the exact slope on the points and polished; what is only approached at
/// 0 or infinity stands there.
void add_peaks(const LoopCurve& curve, const CurveLevels& levels, const FigureRequest& request,
               FrequencyFigures& figures);

} // namespace cornerwright
