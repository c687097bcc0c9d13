#pragma once

#include "core/loop/loop_curve.h"
#include "core/loop/loop_figures.h"

#include <string>
#include <vector>

namespace cornerwright {

/// Sentences that a careful colleague would say of this loop: conditional stability, too few points
/// over a resonance, phase steps that may hide a turn, a sign that may be wrong, aliasing.
std::vector<std::string> remarks_on(const LoopCurve& curve, const MeasuredPlant* plant,
                                    const Stability& stability, const FrequencyFigures& figures);

} // namespace cornerwright
