#pragma once

#include "core/project/project.h"
#include "widgets/parts/quantity.h"

#include <cstddef>

namespace cornerwright {

// Edits of the requirements as values: each gives a new project and touches nothing else.

/// A requirement of the measure with a limit to start from; `crossover_rad_s` scales those that
/// are frequencies or times.
Requirement newRequirement(Measure measure, double crossover_rad_s);

Project withRequirementAdded(const Project& project, const Requirement& requirement);
Project withRequirementChanged(const Project& project, std::size_t index,
                               const Requirement& requirement);
Project withRequirementRemoved(const Project& project, std::size_t index);

/// How the limits of a measure are typed.
QuantityKind quantityOf(MeasureUnit unit);

/// Why the requirement cannot stand, in one sentence; empty where it can.
QString problemOf(const Requirement& requirement);

} // namespace cornerwright
