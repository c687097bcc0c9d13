#pragma once

#include "core/numerics/complex.h"
#include "core/project/project.h"

#include <span>

namespace cornerwright {

/// C(jw) H(jw) of the project's design loop: what a loop gain measured with this compensator holds
/// besides the plant. H is the hold and the computation delay as the project's sampling says.
/// Infinite where C has a pole on the axis.
ComplexVector loop_without_plant(const Project& project, std::span<const double> w_rad_s);

} // namespace cornerwright
