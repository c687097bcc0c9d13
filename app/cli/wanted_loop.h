#pragma once

#include "core/loop/loop.h"
#include "core/project/project.h"

#include <string>
#include <variant>

namespace cornerwright::cli {

using WantedLoop = std::variant<DesignLoop, RealisedLoop>;

/// The loop called `loop` ("design" or "realised") of the case called `plant_case`. Throws
/// UsageError where the project has no such case, or no realisation; InputError where the case or
/// the realisation cannot be used.
WantedLoop wanted_loop(const Project& project, const std::string& plant_case,
                       const std::string& loop);

} // namespace cornerwright::cli
