#pragma once

#include "widgets/pane.h"

namespace cornerwright::sample {

/// A servo of our own invention: three loads, a gain, PI, lead, notch and low-pass; margins,
/// sensitivity, overshoot and settling required.
Project servoProject();

/// The content of the panes for a project, as the engine makes it.
PaneContent contentOf(const Project& project);

} // namespace cornerwright::sample
