#pragma once

namespace cornerwright {

enum class Ground { system, light, dark };

/// Style and palette of the whole program, on the wished ground. May be called again at any time.
void applyAppearance(Ground ground);

} // namespace cornerwright
