#pragma once

#include "tests/outside/reference_case.h"

#include <string>
#include <vector>

namespace cornerwright::outside {

/// Every figure of `reference.expected` against the assessment; one sentence for each that is
/// farther off than allowed, or missing, or more than there should be.
///
/// Allowed differences, the larger of relative and absolute:
///
/// | figures | design loop | realised loop |
/// |---|---|---|
/// | frequencies, delay margin, steady-state error | 1e-6 relative | the same |
/// | dB, deg | 1e-4 | the same |
/// | place of the sensitivity and complementary peak | 1e-4 relative | the same |
/// | closed-loop poles | 1e-6 of the modulus | 1e-8 |
/// | overshoot | 0.2 %, 0.05 points | 1 %, 0.1 points |
/// | peak time, rise time, control and disturbance peak | 0.2 % | 1 %; times an eighth of the
/// period | | settling time | 1 % | 1 %, an eighth of the period | | headroom, worst | 1e-4 | |
///
/// A case may set other ones by "figure", "case|loop|figure" or "requirement|index|key": `rel`,
/// `abs` (a list: one for each pole), `complete_to` (phase crossings above it are not compared),
/// `optional` (crossings that may be listed or not, |L| being 0 or under 1e-6 there).
std::vector<std::string> differences(const ReferenceCase& reference, const Json& assessment);

} // namespace cornerwright::outside
