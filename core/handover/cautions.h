#pragma once

#include <string>
#include <vector>

namespace cornerwright {

/// The standing cautions, one sentence each. They accompany coefficients wherever these leave the
/// program.
std::vector<std::string> cautions();

} // namespace cornerwright
