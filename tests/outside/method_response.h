#pragma once

#include "core/project/project.h"
#include "tests/outside/held_model.h"

namespace cornerwright::outside {

/// The compensator as the project's method makes it, unrounded, at z = exp(jw Ts): each section
/// from its definition, not from roots or coefficients of the program.
WideComplex method_response(const Project& project, double w_rad_s);

} // namespace cornerwright::outside
