#pragma once

#include "core/loop/locus_tracker.h"
#include "core/loop/root_locus.h"

namespace cornerwright {

/// Where branches go through the imaginary axis between neighbouring states, ascending by factor,
/// frequency and factor polished to rounding. A branch that runs along the axis or starts on it
/// does not cross there.
std::vector<AxisCrossing> axis_crossings(const LocusEquation& equation,
                                         const std::vector<LocusState>& states);

} // namespace cornerwright
