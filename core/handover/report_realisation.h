#pragma once

#include "core/engine/assessment.h"
#include "core/project/project.h"

#include <string>

namespace cornerwright {

/// The part of the review report on sampling, coefficients, what the number format costs and the
/// step with output limits, as HTML. Empty for a project that does not sample.
std::string realisation_markup(const Project& project, const Assessment& assessment);

} // namespace cornerwright
