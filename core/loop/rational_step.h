#pragma once

#include "core/loop/step_figures.h"

namespace cornerwright {

/// A loop C(s) P(s) without delay: signals as modal sums over its closed-loop poles, exact at any
/// spread of time constants.
StepSignals rational_step(const RootForm& compensator, const RootForm& plant,
                          const ComplexVector& closed_loop_poles);

} // namespace cornerwright
