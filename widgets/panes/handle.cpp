#include "widgets/panes/handle.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

/// Travel across the main direction that counts as an unsteady hand.
constexpr double unsteady_pixels = 8.0;

double beyond(double travel, double slack) {
    return std::copysign(std::max(0.0, std::abs(travel) - slack), travel);
}

} // namespace

QPointF DragMotion::steadied() const {
    const QPointF travel = to - from;
    return {travel.x(), beyond(travel.y(), unsteady_pixels)};
}

QRectF touchArea(const QPointF& at, double reach) {
    return {at.x() - reach, at.y() - reach, 2.0 * reach, 2.0 * reach};
}

} // namespace cornerwright
