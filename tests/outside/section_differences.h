#pragma once

#include "tests/outside/reference_case.h"

#include <string>
#include <vector>

namespace cornerwright::outside {

/// The realised figures of model plants worked out again from the `b` and `a` of the handover
/// alone: frequencies, margins, peaks and poles within 1e-6 relative and 1e-4 dB or deg. For
/// float64 also the response of those sections against the method's own, worked out here from the
/// continuous sections, to 1e-8 over three decades below pi/Ts. One sentence for each difference.
std::vector<std::string> section_differences(const Assessed& assessed);

} // namespace cornerwright::outside
