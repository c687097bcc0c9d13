#pragma once

#include "core/loop/loop_curve.h"

#include <optional>
#include <string>

namespace cornerwright {

/// Closed-loop poles outside the stable region by Nyquist's criterion, Z = N + P.
struct NyquistCount {
    std::optional<int> unstable_poles; ///< Z; empty: could not be determined
    bool on_boundary = false;          ///< the curve goes through -1
    std::string reason;                ///< why not determined
};

/// Turns of 1 + L along the curve, in steps halved until each is under 60 degrees. Poles on the
/// axis are passed on the right; below the first point the curve is closed by the integrators of L,
/// above the last by |L| < 1.
/// Source: H. Nyquist, Regeneration theory, Bell System Technical Journal 11 (1932); indentation as
/// in every textbook, e.g. K. Ogata, Modern Control Engineering (citations from memory).
NyquistCount nyquist_count(const LoopCurve& curve);

} // namespace cornerwright
