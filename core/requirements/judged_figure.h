#pragma once

#include "core/loop/loop_figures.h"
#include "core/requirements/requirement.h"

namespace cornerwright {

/// Settling time to this band is computed for every loop, whatever is asked.
inline constexpr double always_computed_band_percent = 2.0;

/// The figure that a requirement judges, and where on the frequency axis it is measured.
struct JudgedFigure {
    Figure value;
    Figure at_rad_s;
};

/// Looks a requirement's figure up. `request` is the one with which `figures` were made; a figure
/// that was not asked for is not determined.
JudgedFigure judged_figure(const Requirement& requirement, const FigureRequest& request,
                           const LoopFigures& figures);

} // namespace cornerwright
