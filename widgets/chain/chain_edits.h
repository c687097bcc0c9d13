#pragma once

#include "core/project/project.h"

#include <cstddef>

namespace cornerwright {

// Edits of the chain as values: each gives a new project and touches nothing else.

Project withSectionAdded(const Project& project, const Section& section, std::size_t before);
Project withSectionChanged(const Project& project, std::size_t index, const Section& section);
Project withSectionRemoved(const Project& project, std::size_t index);
/// The section at `from` stands at `to` afterwards; the others keep their order.
Project withSectionMoved(const Project& project, std::size_t from, std::size_t to);

} // namespace cornerwright
