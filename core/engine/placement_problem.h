#pragma once

#include "core/placement/problem.h"
#include "core/project/project.h"

namespace cornerwright {

/// What placement and section design work on. Cases without a usable plant are left out; a missing
/// fit leaves time figures undetermined there as everywhere.
PlacementProblem placement_problem_of(const Project& project);

} // namespace cornerwright
