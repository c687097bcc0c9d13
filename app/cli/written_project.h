#pragma once

#include "core/project/project.h"

#include <string>

namespace cornerwright::cli {

/// Saves a project that was read from `from` to `to`, whose measurements then are named from there.
/// Throws WriteError.
void write_project(Project project, const std::string& from, const std::string& to);

} // namespace cornerwright::cli
