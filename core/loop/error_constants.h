#pragma once

#include "core/loop/loop_curve.h"
#include "core/loop/loop_figures.h"

namespace cornerwright {

/// lim e(t) for a unit step, ramp and parabola t^2/2 from the error constants lim s^k L (realised:
/// lim ((z-1)/Ts)^k L); infinite where the error grows without end. Of a measurement only what the
/// declared integrators settle. Says nothing of stability.
SteadyStateErrors steady_state_errors(const LoopCurve& curve);

} // namespace cornerwright
