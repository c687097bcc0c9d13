#pragma once

#include "core/compensator/section.h"

#include <vector>

namespace cornerwright {

/// The ordered sections of a compensator.
using Chain = std::vector<Section>;

/// C(s): the product of the enabled sections, roots side by side in the order of the chain.
RootForm roots_of(const Chain& chain);

} // namespace cornerwright
