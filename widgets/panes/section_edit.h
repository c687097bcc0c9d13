#pragma once

#include "core/project/project.h"
#include "widgets/section_drag.h"

#include <optional>

namespace cornerwright {

/// The project with another section at `index`; nothing where there is no such section.
std::optional<Project> withSection(const Project& project, std::size_t index, Section section);

/// The project with the loop gain by `factor`.
Project withLoopGain(const Project& project, double factor);

/// The project with the `at_least` limit of a requirement changed by `step`, kept above zero;
/// nothing where there is no such limit.
std::optional<Project> withLimitMoved(const Project& project, std::size_t index, double step);

} // namespace cornerwright
