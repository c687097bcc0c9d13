#pragma once

#include "core/loop/loop.h"
#include "core/project/project.h"

#include <filesystem>
#include <string>

namespace cornerwright {

/// A plant that came out of a tolerance run as a case of the project, under a name that no case has
/// yet. A model is kept by its roots. A measured one is written beside as a text table, into
/// `folder`, from which the project's measurements are named; throws WriteError then.
PlantCase kept_case(const Project& project, const LoopPlant& plant, const std::string& name,
                    const std::filesystem::path& folder);

} // namespace cornerwright
