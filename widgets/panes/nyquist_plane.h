#pragma once

#include "core/numerics/complex.h"
#include "widgets/panes/plot_canvas.h"

#include <QPointF>

#include <vector>

namespace cornerwright {

/// How the complex plane is drawn. Compressed keeps the unit disc as it is and draws the radius r
/// outside as 1 + ln r, so that an integrator's arm and a resonance stay on the pane; directions
/// are kept, straight lines past the origin are not.
enum class RadiusScale { compressed, linear };

QPointF toDrawn(Complex value, RadiusScale scale);
Complex fromDrawn(const QPointF& place, RadiusScale scale);

/// The circle about `centre`, as it is drawn.
std::vector<QPointF> drawnCircle(Complex centre, double radius, RadiusScale scale);

/// Labels say the value, compressed or not; a compressed axis is divided at powers of ten.
AxisStyle nyquistAxis(RadiusScale scale);

} // namespace cornerwright
