#pragma once

#include "core/compensator/chain.h"

#include <string>
#include <vector>

namespace cornerwright {

/// The compensator as algebra in s, a line a section: "  lead "phase lift": (s/20 + 1)/(s/100 +
/// 1)". Sections that are switched off are left out.
std::vector<std::string> transfer_function_words(const Chain& chain);

/// One section as algebra in s.
std::string algebra_of(const Section& section);

} // namespace cornerwright
