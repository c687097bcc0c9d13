#pragma once

#include "core/loop/step_figures.h"

namespace cornerwright {

/// A loop C(s) P(s) exp(-s (dead_time + control_delay)) whose dead time belongs to the plant and
/// whose control delay stands between compensator and plant.
struct DelayedLoop {
    RootForm compensator;
    RootForm plant;
    double dead_time_s = 0.0;
    double control_delay_s = 0.0; ///< dead_time_s + control_delay_s > 0

    double delay_s() const { return dead_time_s + control_delay_s; }
};

/// How far the history is followed.
struct HistoryLimits {
    double until_s = 0.0; ///< 0: until the rest is told by the rightmost closed-loop poles
};

/// Step signals by the method of steps: within each delay the loop is driven by its own past, which
/// is known, so that the states advance by matrix exponentials with the past as a polynomial over
/// each short interval. Once only the rightmost closed-loop poles are left, their modes go on from
/// there; that they agree with the history is checked where they meet. Returns nothing where the
/// loop has more zeros than poles, or where neither settles within the work allowed.
/// Source: R. Bellman, K. L. Cooke, Differential-Difference Equations, ch. 3 and 4 (citation from
/// memory).
std::optional<StepSignals> delayed_step(const DelayedLoop& loop, const HistoryLimits& limits = {});

} // namespace cornerwright
