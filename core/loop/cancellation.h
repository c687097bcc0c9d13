#pragma once

#include "core/numerics/root_form.h"

#include <optional>
#include <string>

namespace cornerwright {

enum class RootPlane { s, z_minus_1 };

/// The first factor that stands above and below the fraction bar of L = C P and lies on or outside
/// the stability boundary, as a person writes it: "s", "(s - 4)", "(s^2 + 900)", "(z - 1)". Such a
/// factor hides a mode that no feedback moves. Roots count as the same within 1e-12 of their size.
std::optional<std::string> hidden_factor(const RootForm& loop, RootPlane plane);

} // namespace cornerwright
