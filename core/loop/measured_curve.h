#pragma once

#include "core/loop/loop_curve.h"

namespace cornerwright {

/// The curve of a loop whose plant is a measurement: C exact, the plant joined between its points.
/// Throws InputError where fewer than two points can be used.
std::unique_ptr<LoopCurve> measured_curve(const DesignLoop& loop, const MeasuredPlant& plant);

/// The same with the difference equation, up to the smaller of pi/Ts and the last frequency.
std::unique_ptr<LoopCurve> measured_curve(const RealisedLoop& loop, const MeasuredPlant& plant);

} // namespace cornerwright
