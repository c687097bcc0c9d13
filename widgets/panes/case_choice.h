#pragma once

#include "core/engine/assessment.h"

#include <initializer_list>
#include <set>

namespace cornerwright {

/// The cases that stand for a requirement of one of these measures: the worst one of each. They
/// are drawn full where the others are faint. Indices into the cases of the assessment.
std::set<std::size_t> worstCases(const Assessment& assessment,
                                 std::initializer_list<Measure> measures);

} // namespace cornerwright
