#pragma once

#include "core/numerics/root_form.h"

namespace cornerwright {

/// Where the signals of a step response end on a stable loop: T, C S and P S at s = 0 (or at
/// z - 1 = 0 for forms in z - 1). Delays do not matter.
struct SteadyValues {
    double y = 0.0;
    double u = 0.0;
    double y_disturbance = 0.0;
    bool finite = true; ///< false: a root at 0 of one cancels one of the other, a signal runs away
};

SteadyValues steady_values(const RootForm& compensator, const RootForm& plant);

} // namespace cornerwright
