#pragma once

#include <QColor>
#include <QRectF>

class QPainter;

namespace cornerwright {

/// Small signs drawn with lines, so that they take their colour from the theme and their size from
/// the scale.
enum class Glyph {
    grip,
    locked,
    unlocked,
    on,
    off,
    remove,
    whole_window,
    back_from_whole,
    up,
    down,
    edit,
    help,
};

void paintGlyph(QPainter& painter, Glyph glyph, const QRectF& box, const QColor& colour);

} // namespace cornerwright
