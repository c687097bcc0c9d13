#pragma once

#include "widgets/theme.h"
#include "widgets/uphill.h"

#include <QPointF>

class QPainter;

namespace cornerwright {

/// A small arrow beside a handle, sideways: the direction in which it raises the smallest headroom.
/// `size` is that of the handle; the stronger the pull, the longer the arrow.
void drawUphillAside(QPainter& painter, const QPointF& handle, double size, const UphillSign& sign,
                     const Theme& theme);

/// The same upwards or downwards, for the gain.
void drawUphillUpright(QPainter& painter, const QPointF& handle, double size,
                       const UphillSign& sign, const Theme& theme);

} // namespace cornerwright
