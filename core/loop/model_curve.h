#pragma once

#include "core/loop/loop_curve.h"

namespace cornerwright {

/// The curve of a loop whose plant is a model.
std::unique_ptr<LoopCurve> model_curve(const DesignLoop& loop, const PlantModel& plant,
                                       const ComplexVector& closed_loop_poles);

/// On (0, pi/Ts], with the exact sampled plant. Throws InputError as `sample_plant` does.
std::unique_ptr<LoopCurve> model_curve(const RealisedLoop& loop,
                                       const ComplexVector& closed_loop_poles_z);

} // namespace cornerwright
