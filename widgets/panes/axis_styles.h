#pragma once

#include "widgets/panes/plot_canvas.h"

#include <QString>

namespace cornerwright {

class ViewState;

/// Frequencies kept in rad/s, divided and labelled in the unit that the view state shows. The view
/// state outlives the axis.
AxisStyle frequencyAxis(const ViewState& viewState);

/// A linear axis whose topmost (last) label carries the unit; the unit may be empty.
AxisStyle linearAxis(const QString& unit);

/// Degrees, divided at 15, 30, 45, 60, 90 ...
AxisStyle degreeAxis();

/// Seconds with an SI prefix chosen for the range.
AxisStyle timeAxis();

} // namespace cornerwright
