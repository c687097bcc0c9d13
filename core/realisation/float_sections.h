#pragma once

#include "core/realisation/section_coefficients.h"

#include <span>
#include <vector>

namespace cornerwright {

/// The sections with their coefficients rounded to double or single precision, whichever the
/// format says. A pole or zero at z = 1 stays there: its coefficients are rounded on one common
/// grid so that their sum is exactly 0. Throws InputError where a coefficient leaves the range of
/// the format.
std::vector<DiscreteSection> float_sections(std::span<const SectionCoefficients> sections,
                                            const Realisation& realisation);

} // namespace cornerwright
