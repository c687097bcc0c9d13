#include "widgets/parts/glyphs.h"

#include <QPainter>
#include <QPainterPath>

namespace cornerwright {

namespace {

// All signs are designed on a square of this side.
constexpr double side = 16.0;

void paintGrip(QPainter& painter, const QColor& colour) {
    painter.setBrush(colour);
    painter.setPen(Qt::NoPen);
    for (const double x : {6.0, 10.0}) {
        for (const double y : {4.0, 8.0, 12.0}) {
            painter.drawEllipse(QPointF(x, y), 1.0, 1.0);
        }
    }
}

void paintLock(QPainter& painter, const QColor& colour, bool closed) {
    QPainterPath shackle;
    shackle.moveTo(5.5, 8.0);
    shackle.lineTo(5.5, 5.5);
    shackle.arcTo(QRectF(5.5, 3.0, 5.0, 5.0), 180.0, closed ? -180.0 : -130.0);
    if (closed) {
        shackle.lineTo(10.5, 8.0);
    }
    painter.drawPath(shackle);
    const QRectF body(4.0, 8.0, 8.0, 5.5);
    if (closed) {
        painter.fillRect(body, colour);
    }
    painter.drawRect(body);
}

void paintSwitch(QPainter& painter, const QColor& colour, bool on) {
    painter.drawRoundedRect(QRectF(1.5, 4.5, 13.0, 7.0), 3.5, 3.5);
    painter.setBrush(on ? QBrush(colour) : QBrush(Qt::NoBrush));
    painter.drawEllipse(QPointF(on ? 11.0 : 5.0, 8.0), 2.0, 2.0);
}

void paintCorners(QPainter& painter, bool outwards) {
    for (const double x : {-1.0, 1.0}) {
        for (const double y : {-1.0, 1.0}) {
            const QPointF tip(8.0 + x * (outwards ? 5.0 : 2.0), 8.0 + y * (outwards ? 5.0 : 2.0));
            const double way = outwards ? -3.0 : 3.0;
            painter.drawLine(tip, tip + QPointF(x * way, 0.0));
            painter.drawLine(tip, tip + QPointF(0.0, y * way));
        }
    }
}

} // namespace

void paintGlyph(QPainter& painter, Glyph glyph, const QRectF& box, const QColor& colour) {
    painter.save();
    painter.setRenderHint(QPainter::Antialiasing);
    painter.translate(box.topLeft());
    painter.scale(box.width() / side, box.height() / side);
    painter.setPen(QPen(colour, 1.3, Qt::SolidLine, Qt::RoundCap, Qt::RoundJoin));
    switch (glyph) {
    case Glyph::grip:
        paintGrip(painter, colour);
        break;
    case Glyph::locked:
    case Glyph::unlocked:
        paintLock(painter, colour, glyph == Glyph::locked);
        break;
    case Glyph::on:
    case Glyph::off:
        paintSwitch(painter, colour, glyph == Glyph::on);
        break;
    case Glyph::remove:
        painter.drawLine(QPointF(4.5, 4.5), QPointF(11.5, 11.5));
        painter.drawLine(QPointF(4.5, 11.5), QPointF(11.5, 4.5));
        break;
    case Glyph::whole_window:
    case Glyph::back_from_whole:
        paintCorners(painter, glyph == Glyph::whole_window);
        break;
    case Glyph::up:
    case Glyph::down: {
        const double way = glyph == Glyph::up ? -2.0 : 2.0;
        painter.drawPolyline(QPolygonF(
            {QPointF(4.5, 8.0 - way), QPointF(8.0, 8.0 + way), QPointF(11.5, 8.0 - way)}));
        break;
    }
    case Glyph::edit:
        painter.drawPolygon(QPolygonF({QPointF(4.0, 12.0), QPointF(4.6, 9.6), QPointF(10.6, 3.6),
                                       QPointF(12.4, 5.4), QPointF(6.4, 11.4)}));
        break;
    case Glyph::help: {
        QPainterPath hook;
        hook.moveTo(5.2, 6.2);
        hook.cubicTo(5.2, 2.2, 11.2, 2.4, 10.8, 6.0);
        hook.cubicTo(10.6, 7.8, 8.0, 7.8, 8.0, 10.2);
        painter.drawPath(hook);
        painter.fillRect(QRectF(7.3, 12.0, 1.4, 1.4), colour);
        break;
    }
    }
    painter.restore();
}

} // namespace cornerwright
