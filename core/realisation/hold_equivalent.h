#pragma once

#include "core/compensator/section.h"

namespace cornerwright {

/// The section behind a zero-order hold, sampled: the same response to a step. Roots in d = z - 1.
/// The section must be proper.
/// Source: G. F. Franklin, J. D. Powell, M. L. Workman, Digital Control of Dynamic Systems, 3rd
/// ed., ch. 6 (citation from memory).
RootForm step_equivalent(const Section& section, double sample_period_s);

/// The section behind a first-order (triangle) hold, sampled: the same response to a ramp. Roots in
/// d = z - 1. The section must be proper. Source: as above.
RootForm ramp_equivalent(const Section& section, double sample_period_s);

} // namespace cornerwright
