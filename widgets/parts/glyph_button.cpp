#include "widgets/parts/glyph_button.h"

#include "widgets/theme.h"

#include <QPainter>

namespace cornerwright {

GlyphButton::GlyphButton(Glyph glyph, const QString& name, QWidget* parent)
    : QAbstractButton(parent), glyph_(glyph) {
    setName(name);
    setFocusPolicy(Qt::TabFocus);
    setSizePolicy(QSizePolicy::Fixed, QSizePolicy::Fixed);
}

void GlyphButton::setGlyph(Glyph glyph) {
    if (glyph_ != glyph) {
        glyph_ = glyph;
        update();
    }
}

void GlyphButton::setName(const QString& name) {
    setToolTip(name);
    setAccessibleName(name);
}

QSize GlyphButton::sizeHint() const {
    const int side = fontMetrics().height() + 4;
    return {side, side};
}

void GlyphButton::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    const QRectF frame = QRectF(rect()).adjusted(0.5, 0.5, -0.5, -0.5);
    if (isDown() || underMouse()) {
        painter.setPen(Qt::NoPen);
        painter.setBrush(theme.colour(ColourRole::grid));
        painter.drawRoundedRect(frame, 4.0, 4.0);
    }
    if (hasFocus()) {
        painter.setPen(QPen(theme.colour(ColourRole::accent), 1.5));
        painter.setBrush(Qt::NoBrush);
        painter.drawRoundedRect(frame, 4.0, 4.0);
    }
    paintGlyph(painter, glyph_, frame.adjusted(1.5, 1.5, -1.5, -1.5),
               theme.colour(underMouse() ? ColourRole::ink : ColourRole::muted));
}

void GlyphButton::enterEvent(QEnterEvent* event) {
    QAbstractButton::enterEvent(event);
    update();
}

void GlyphButton::leaveEvent(QEvent* event) {
    QAbstractButton::leaveEvent(event);
    update();
}

} // namespace cornerwright
