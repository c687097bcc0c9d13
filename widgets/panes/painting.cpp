#include "widgets/panes/painting.h"

#include <QFontMetricsF>
#include <QPaintDevice>
#include <QPaintEngine>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

/// Far outside every screen; the rasteriser loses its speed and its bits with greater numbers.
constexpr double farthest_pixel = 20000.0;

} // namespace

QPen curvePen(const QColor& colour, double width, Qt::PenStyle style) {
    QPen pen(colour, width);
    if (style == Qt::DashLine)
        pen.setDashPattern({5.0, 4.0});
    else if (style == Qt::DotLine)
        pen.setDashPattern({1.0, 3.0});
    else
        pen.setStyle(style);
    pen.setCapStyle(Qt::FlatCap);
    pen.setJoinStyle(Qt::BevelJoin);
    return pen;
}

namespace {

/// The curve beside `line`, `distance` pixels to its left.
QPolygonF besideOf(const QPolygonF& line, double distance) {
    QPolygonF beside(line);
    for (qsizetype i = 0; i < line.size(); ++i) {
        const QPointF along =
            line[std::min(i + 1, line.size() - 1)] - line[std::max<qsizetype>(i - 1, 0)];
        const double length = std::hypot(along.x(), along.y());
        if (length > 0.0)
            beside[i] += distance / length * QPointF(along.y(), -along.x());
    }
    return beside;
}

/// Raster painting has a short way for pens of one pixel that is some twenty times faster than the
/// one for all others. A pen of up to two pixels is drawn as two of one, side by side.
void stroke(QPainter& painter, const QPen& pen, const std::vector<QPolygonF>& lines) {
    constexpr double narrow = 1.0;
    constexpr double widest = 2.0;
    const double width = pen.widthF();
    const bool isSplit = width > narrow && width <= widest &&
                         painter.paintEngine()->type() == QPaintEngine::Raster &&
                         painter.device()->devicePixelRatioF() == 1.0;
    QPen used = pen;
    if (isSplit)
        used.setWidthF(narrow);
    painter.setPen(used);
    for (const QPolygonF& line : lines) {
        if (!isSplit) {
            painter.drawPolyline(line);
            continue;
        }
        const double aside = 0.5 * (width - narrow);
        painter.drawPolyline(besideOf(line, aside));
        painter.drawPolyline(besideOf(line, -aside));
    }
}

} // namespace

void drawFunction(QPainter& painter, const QPen& pen, std::span<const double> x,
                  std::span<const double> y, const AxisMap& mapX, const AxisMap& mapY) {
    if (x.size() != y.size() || x.size() < 2)
        return;
    // One point beyond either side, so that the line runs to the edge.
    const auto first = std::lower_bound(x.begin(), x.end(), mapX.range().low);
    const auto last = std::upper_bound(x.begin(), x.end(), mapX.range().high);
    const auto from = static_cast<std::size_t>(first == x.begin() ? 0 : first - x.begin() - 1);
    const auto to = std::min(x.size(), static_cast<std::size_t>(last - x.begin()) + 1);
    std::vector<QPointF> pixels;
    pixels.reserve(to - from);
    for (std::size_t i = from; i < to; ++i)
        pixels.emplace_back(mapX.toPixel(x[i]),
                            std::clamp(mapY.toPixel(y[i]), -farthest_pixel, farthest_pixel));
    stroke(painter, pen, thinnedToColumns(pixels));
}

void drawPath(QPainter& painter, const QPen& pen, std::span<const QPointF> pixels,
              const QRectF& area) {
    constexpr double beyond_edge = 20.0;
    const QRectF clip = area.adjusted(-beyond_edge, -beyond_edge, beyond_edge, beyond_edge);
    stroke(painter, pen, thinnedInPlane(pixels, clip));
}

void drawTriangle(QPainter& painter, const QPointF& at, double size, bool up, const QColor& fill,
                  const QColor& line) {
    const double tip = up ? -size : size;
    const QPointF corners[] = {at + QPointF(0.0, tip), at + QPointF(-1.1 * size, -0.7 * tip),
                               at + QPointF(1.1 * size, -0.7 * tip)};
    painter.setPen(QPen(line, 1.0));
    painter.setBrush(fill);
    painter.drawPolygon(corners, 3);
}

QRectF LabelPlacer::insideOf(const QPointF& corner, const QSizeF& size) const {
    const double right = std::max(bounds_.left(), bounds_.right() - size.width());
    const double bottom = std::max(bounds_.top(), bounds_.bottom() - size.height());
    return {QPointF(std::clamp(corner.x(), bounds_.left(), right),
                    std::clamp(corner.y(), bounds_.top(), bottom)),
            size};
}

bool LabelPlacer::isFree(const QRectF& area) const {
    return std::none_of(taken_.begin(), taken_.end(),
                        [&](const QRectF& other) { return other.intersects(area); });
}

QRectF LabelPlacer::place(const QSizeF& size, std::initializer_list<QPointF> wishes) {
    QRectF best = insideOf(*wishes.begin(), size);
    for (const QPointF& wish : wishes) {
        const QRectF area = insideOf(wish, size);
        if (isFree(area)) {
            best = area;
            break;
        }
    }
    taken_.push_back(best);
    return best;
}

std::optional<QRectF> LabelPlacer::placeIfFree(const QSizeF& size, const QPointF& wish) {
    const QRectF area = insideOf(wish, size);
    if (!isFree(area))
        return std::nullopt;
    taken_.push_back(area);
    return area;
}

QSizeF labelSize(const QString& text, const QFont& font) {
    const QFontMetricsF metrics(font);
    return {metrics.horizontalAdvance(text) + 10.0, metrics.height() + 4.0};
}

void drawLabel(QPainter& painter, const QRectF& area, const QString& text, const LabelStyle& style,
               const Theme& theme) {
    if (style.ground != LabelGround::none) {
        QColor ground = theme.colour(ColourRole::pane);
        QPen border(Qt::NoPen);
        if (style.ground == LabelGround::tinted) {
            border = QPen(style.colour, 1.0);
        } else {
            ground.setAlphaF(0.86F);
        }
        painter.setPen(border);
        painter.setBrush(ground);
        painter.drawRoundedRect(area, 4.0, 4.0);
    }
    painter.setFont(style.font);
    painter.setPen(style.colour);
    painter.drawText(area, Qt::AlignCenter, text);
}

double handleSize() {
    return std::max(6.0, 0.45 * QFontMetricsF(fontOf(FontRole::body)).height());
}

} // namespace cornerwright
