#pragma once

#include "core/loop/loop_curve.h"

namespace cornerwright {

/// Places where |L| = 1, and where L is real and negative (w = 0 and pi/Ts included), ascending and
/// polished to the last digits.
struct Crossings {
    std::vector<CurvePoint> gain;
    std::vector<CurvePoint> phase;
};

/// All of them between the ends of the curve. Between neighbouring points ln|L| and the accumulated
/// phase are split at their extrema, found by the sign of their exact slopes, so that a pair of
/// crossings between two points is not missed. Where phase crossings go on without end, those up to
/// the curve's listed end and the first beyond.
Crossings crossings_of(const LoopCurve& curve);

} // namespace cornerwright
