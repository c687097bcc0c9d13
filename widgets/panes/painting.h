#pragma once

#include "widgets/plot_geometry.h"
#include "widgets/theme.h"

#include <QPainter>
#include <QPen>
#include <QString>

#include <optional>
#include <span>
#include <vector>

namespace cornerwright {

/// A pen for curves: solid or dashed.
QPen curvePen(const QColor& colour, double width = 1.0, Qt::PenStyle style = Qt::SolidLine);

/// The curve y(x), x ascending, thinned to the pixels of the part that the axis shows.
void drawFunction(QPainter& painter, const QPen& pen, std::span<const double> x,
                  std::span<const double> y, const AxisMap& mapX, const AxisMap& mapY);

/// A curve in the plane, points given in pixels.
void drawPath(QPainter& painter, const QPen& pen, std::span<const QPointF> pixels,
              const QRectF& area);

/// A triangle about `at` with its point up (zero) or down (pole).
void drawTriangle(QPainter& painter, const QPointF& at, double size, bool up, const QColor& fill,
                  const QColor& line);

/// Puts labels where they cover neither one another nor what was blocked before.
class LabelPlacer {
  public:
    explicit LabelPlacer(const QRectF& bounds) : bounds_(bounds) {}

    void block(const QRectF& area) { taken_.push_back(area); }
    /// The first of the wished top-left corners where `size` is free (moved inside the bounds); the
    /// first wish where none is. The place is taken from then on.
    QRectF place(const QSizeF& size, std::initializer_list<QPointF> wishes);
    /// The same for what can be left out: nothing where the one wish is not free.
    std::optional<QRectF> placeIfFree(const QSizeF& size, const QPointF& wish);

  private:
    QRectF insideOf(const QPointF& corner, const QSizeF& size) const;
    bool isFree(const QRectF& area) const;

    QRectF bounds_;
    std::vector<QRectF> taken_;
};

enum class LabelGround { none, pane, tinted };

struct LabelStyle {
    QColor colour;
    QFont font;
    LabelGround ground = LabelGround::pane;
};

/// The room that `drawLabel` takes.
QSizeF labelSize(const QString& text, const QFont& font);
void drawLabel(QPainter& painter, const QRectF& area, const QString& text, const LabelStyle& style,
               const Theme& theme);

/// Half the height of a handle, following the font and so the user's scale.
double handleSize();

} // namespace cornerwright
