#pragma once

#include "core/loop/loop_curve.h"

namespace cornerwright {

enum class End { zero, infinity };

/// |S|, |T| and |C S| approached at an end of the axis, from the asymptotes of C and L there. Where
/// L goes to a constant and `turns` for ever (dead time, hold), the suprema over its phase.
EndLimits limits_towards(const Asymptote& compensator, const Asymptote& loop, End end, bool turns);

} // namespace cornerwright
