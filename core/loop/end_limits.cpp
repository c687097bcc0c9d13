#include "core/loop/end_limits.h"

#include <cmath>

namespace cornerwright {
namespace {

/// Limit of |gain| p^-order.
double limit_of(double gain, int order, End end) {
    if (order == 0)
        return std::abs(gain);
    const bool grows = (order > 0) == (end == End::zero);
    return grows ? HUGE_VAL : 0.0;
}

} // namespace

EndLimits limits_towards(const Asymptote& compensator, const Asymptote& loop, End end, bool turns) {
    const double loop_limit = limit_of(loop.gain, loop.order, end);
    if (loop_limit == HUGE_VAL) {
        // C S goes to C/L.
        const double inverse_plant =
            limit_of(compensator.gain / loop.gain, compensator.order - loop.order, end);
        return {0.0, 1.0, inverse_plant};
    }
    const double compensator_limit = limit_of(compensator.gain, compensator.order, end);
    if (loop_limit == 0.0)
        return {1.0, 0.0, compensator_limit};
    const double distance = turns ? std::abs(1.0 - loop_limit) : std::abs(1.0 + loop.gain);
    const double sensitivity = distance == 0.0 ? HUGE_VAL : 1.0 / distance;
    return {sensitivity, sensitivity * loop_limit, compensator_limit * sensitivity};
}

} // namespace cornerwright
