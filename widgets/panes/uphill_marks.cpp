#include "widgets/panes/uphill_marks.h"

#include <QPainter>

namespace cornerwright {

namespace {

/// From outside the handle's own mark along a unit direction.
void drawArrow(QPainter& painter, const QPointF& handle, double size, const QPointF& along,
               double strength, const Theme& theme) {
    const QPointF across(-along.y(), along.x());
    const QPointF tail = handle + 1.5 * size * along;
    const QPointF tip = tail + (0.9 + 0.9 * strength) * size * along;
    const double head = 0.5 * size;
    painter.setPen(QPen(theme.colour(ColourRole::accent), 1.6));
    painter.setBrush(Qt::NoBrush);
    painter.drawLine(tail, tip);
    painter.drawLine(tip, tip - head * along + 0.8 * head * across);
    painter.drawLine(tip, tip - head * along - 0.8 * head * across);
}

} // namespace

void drawUphillAside(QPainter& painter, const QPointF& handle, double size, const UphillSign& sign,
                     const Theme& theme) {
    if (sign.direction != 0)
        drawArrow(painter, handle, size, QPointF(sign.direction, 0.0), sign.strength, theme);
}

void drawUphillUpright(QPainter& painter, const QPointF& handle, double size,
                       const UphillSign& sign, const Theme& theme) {
    if (sign.direction != 0)
        drawArrow(painter, handle, size, QPointF(0.0, -sign.direction), sign.strength, theme);
}

} // namespace cornerwright
