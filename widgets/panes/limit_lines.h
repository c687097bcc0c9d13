#pragma once

#include "core/engine/assessment.h"
#include "core/project/project.h"
#include "widgets/panes/handle.h"
#include "widgets/panes/painting.h"

#include <optional>

namespace cornerwright {

/// The `at_most` limit of a requirement that a handle names; nothing where it has none.
std::optional<double> upperLimit(const Project& project, const HandleId& handle);

/// The project with that limit at another value; nothing where there is no such limit.
std::optional<Project> withUpperLimit(const Project& project, const HandleId& handle, double limit);

/// How a limit stands on the shown case (the design loop), and what is written beside its line:
/// "✓ Sensitivity peak ≤ 6.0 dB".
struct LimitText {
    State state = State::undetermined;
    QString text;
};
LimitText limitTextOf(const Assessment& assessment, const std::string& caseName,
                      const Requirement& requirement, bool hertz);

/// A horizontal limit from `handle.area.left()` to its right end, with its text.
void drawLimitLine(QPainter& painter, const Handle& handle, bool isStrong, const LimitText& text,
                   LabelPlacer& placer, const Theme& theme);

} // namespace cornerwright
