#pragma once

#include "core/numerics/complex.h"
#include "widgets/panes/plot_canvas.h"

#include <QPointF>

#include <vector>

namespace cornerwright {

/// How the complex plane is drawn. Compressed keeps the unit disc as it is and draws the radius r
/// outside as 1 + lg(1 + (r - 1) ln 10): smooth at the unit circle and, farther out, one unit a
/// decade, so that an integrator's arm and a resonance stay on the pane. Directions are kept,
/// straight lines past the origin are not.
enum class RadiusScale { compressed, linear };

QPointF toDrawn(Complex value, RadiusScale scale);
Complex fromDrawn(const QPointF& place, RadiusScale scale);

/// The circle about `centre`, as it is drawn.
std::vector<QPointF> drawnCircle(Complex centre, double radius, RadiusScale scale);

/// Labels say the value, compressed or not; a compressed axis is divided at powers of ten, at as
/// many of them as have room.
AxisStyle nyquistAxis(RadiusScale scale);

} // namespace cornerwright
