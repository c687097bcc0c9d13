#pragma once

#include "core/project/project.h"

#include <random>

namespace cornerwright::practice {

/// A project with every kind of plant case in it: two measured units (one with a fit), a formula
/// with dead time and roots; sampled, realised, judged by ten requirements.
Project mixed_project();

/// One random thing that a user may do to a project: move a number, switch, add or drop a section,
/// change a limit, a requirement, the clock, the realisation, a case or a word.
Project edited(const Project& project, std::mt19937& random);

} // namespace cornerwright::practice
