#pragma once

#include <numbers>

namespace cornerwright {

/// dB of a natural logarithm of a magnitude: 20 / ln 10.
inline constexpr double db_per_neper = 20.0 / std::numbers::ln10;
inline constexpr double deg_per_rad = 180.0 / std::numbers::pi;

} // namespace cornerwright
