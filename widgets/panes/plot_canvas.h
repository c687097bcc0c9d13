#pragma once

#include "widgets/plot_geometry.h"
#include "widgets/theme.h"

#include <QImage>

#include <functional>
#include <vector>

class QCustomPlot;
class QPaintDevice;
class QPainter;
class QWidget;

namespace cornerwright {

/// How an axis divides itself.
struct AxisStyle {
    bool logarithmic = false;
    /// Ticks of a range, about so many of them labelled.
    std::function<std::vector<Tick>(AxisRange, int)> ticks;
    /// The label of ticks[index], where it is labelled.
    std::function<QString(const std::vector<Tick>& ticks, std::size_t index)> label;
};

struct PlotRanges {
    AxisRange x;
    AxisRange y;

    bool operator==(const PlotRanges&) const = default;
};

/// Axes, grid and two painted layers: the curves, and above them the marks, which can be painted
/// anew alone (hover, linked cursor). The painters are called with the clip set to the plot area
/// (curves) or to the whole widget (marks).
class PlotCanvas {
  public:
    using Paint = std::function<void(QPainter&)>;

    PlotCanvas(QWidget* parent, Paint curves, Paint marks);

    QWidget* widget() const;
    void setAxes(const AxisStyle& x, const AxisStyle& y);
    void setRanges(const PlotRanges& ranges);
    PlotRanges ranges() const;
    QRectF area() const;
    AxisMap mapX() const;
    AxisMap mapY() const;
    void setTheme(const Theme& theme);

    void redraw();
    void redrawMarks();

    /// Pictures have white ground; the caller sets the light theme before and its own after.
    QImage picture(double scale);
    bool saveVector(const QString& file, bool svg);
    /// Onto a page, as large as it allows. False where nothing can be painted on it.
    bool print(QPaintDevice& page);

  private:
    void layOut();

    QCustomPlot* plot_; ///< owned by the parent widget
};

} // namespace cornerwright
