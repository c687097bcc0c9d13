#pragma once

#include "core/project/project.h"

#include <QString>

#include <cstddef>

namespace cornerwright {

// Edits of the plant cases as values: each gives a new project and touches nothing else.

/// `wanted`, or "wanted 2", "wanted 3" ... where a case of the project has that name already.
/// `except` is a case whose own name does not count.
QString freeCaseName(const Project& project, const QString& wanted,
                     std::size_t except = static_cast<std::size_t>(-1));

Project withCaseAdded(const Project& project, const PlantCase& plantCase);
Project withCaseRemoved(const Project& project, std::size_t index);
Project withCaseRenamed(const Project& project, std::size_t index, const QString& name);

} // namespace cornerwright
