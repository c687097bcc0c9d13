#pragma once

namespace cornerwright {

enum class Ground { system, light, dark };

/// Style and palette of the whole program, on the wished ground.
void applyAppearance(Ground ground);

} // namespace cornerwright
