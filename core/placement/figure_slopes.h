#pragma once

#include "core/placement/compensator_slopes.h"
#include "core/placement/problem.h"

#include <optional>
#include <vector>

namespace cornerwright {

/// d figure / d ln(parameter) of a frequency-response figure, in the figure's unit, from how the
/// loop moves at the frequency where the figure is measured:
///   crossings move so that |L| = 1 or arg L = -180 deg stays true, peaks by the envelope theorem.
/// The delay margin, which is judged without a place, finds its own.
/// Empty where the measure is not one of the frequency response, or where it stands at no frequency
/// (a supremum at 0 or at infinity).
std::optional<std::vector<double>> figure_slopes(const PlacementLoop& loop, Measure measure,
                                                 const Figure& judged_at_rad_s,
                                                 const CompensatorSlopes& slopes);

} // namespace cornerwright
