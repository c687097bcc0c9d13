#pragma once

#include "core/loop/loop_curve.h"

namespace cornerwright {

/// L, S, T and their logarithms from C and the held, delayed P at one frequency.
CurvePoint point_of_loop(double w_rad_s, const ResponseSample& compensator,
                         const ResponseSample& plant);

/// The pure delay and the hold (0: none) laid over a plant's response.
struct HoldAndDelay {
    double delay_s = 0.0;
    double hold_s = 0.0;

    void apply(double w_rad_s, ResponseSample& plant) const;
    /// Slope of the whole lag: delay and half the hold.
    double lag_s() const { return delay_s + 0.5 * hold_s; }
};

} // namespace cornerwright
