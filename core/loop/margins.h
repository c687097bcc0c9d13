#pragma once

#include "core/loop/crossings.h"
#include "core/loop/loop_figures.h"

namespace cornerwright {

/// Fills crossings, phase, gain, gain reduction and delay margin from all crossings, with standard
/// deviations where the measurement tells its random error.
void add_margins(const LoopCurve& curve, const Crossings& crossings, FrequencyFigures& figures);

} // namespace cornerwright
