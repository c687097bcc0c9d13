#include "widgets/panes/plot_canvas.h"

#include <QFontMetricsF>
#include <QSvgGenerator>
#include <qcustomplot.h>

#include <algorithm>
#include <utility>

namespace cornerwright {

namespace {

/// Pixels that a label needs along its axis, beside which the next one can still be told apart.
constexpr double label_room_x = 76.0;
constexpr double label_room_y = 34.0;

class Ticker : public QCPAxisTicker {
  public:
    Ticker(AxisStyle style, const QCPAxis* axis, double room)
        : style_(std::move(style)), axis_(axis), room_(room) {}

    void generate(const QCPRange& range, const QLocale&, QChar, int, QVector<double>& ticks,
                  QVector<double>* subTicks, QVector<QString>* labels) override {
        const QRect area = axis_->axisRect()->rect();
        const int length = axis_->orientation() == Qt::Horizontal ? area.width() : area.height();
        const double room = room_ * QFontMetricsF(axis_->tickLabelFont()).height() / 14.0;
        const std::vector<Tick> all =
            style_.ticks({range.lower, range.upper}, std::max(2, static_cast<int>(length / room)));
        ticks.clear();
        if (subTicks != nullptr)
            subTicks->clear();
        if (labels != nullptr)
            labels->clear();
        for (std::size_t i = 0; i < all.size(); ++i) {
            if (!all[i].labelled) {
                if (subTicks != nullptr)
                    subTicks->append(all[i].value);
                continue;
            }
            ticks.append(all[i].value);
            if (labels != nullptr)
                labels->append(style_.label(all, i));
        }
    }

  private:
    AxisStyle style_;
    const QCPAxis* axis_;
    double room_;
};

class PaintedLayerable : public QCPLayerable {
  public:
    PaintedLayerable(QCustomPlot* plot, const QString& layer, PlotCanvas::Paint paint, bool clips)
        : QCPLayerable(plot, layer), paint_(std::move(paint)), clips_(clips) {}

  protected:
    QRect clipRect() const override {
        return clips_ ? parentPlot()->axisRect()->rect() : parentPlot()->viewport();
    }
    void applyDefaultAntialiasingHint(QCPPainter* painter) const override {
        painter->setAntialiasing(true);
    }
    void draw(QCPPainter* painter) override { paint_(*painter); }

  private:
    PlotCanvas::Paint paint_;
    bool clips_;
};

QCPRange toPlot(const AxisRange& range) {
    return {range.low, range.high};
}
AxisRange fromPlot(const QCPRange& range) {
    return {range.lower, range.upper};
}

} // namespace

PlotCanvas::PlotCanvas(QWidget* parent, Paint curves, Paint marks)
    : plot_(new QCustomPlot(parent)) {
    plot_->setObjectName(QStringLiteral("plot"));
    plot_->setMouseTracking(true);
    plot_->setNoAntialiasingOnDrag(false);
    // All plots of the window are then painted and shown in one go.
    plot_->setPlottingHint(QCP::phImmediateRefresh, false);
    plot_->addLayer(QStringLiteral("marks"), plot_->layer(QStringLiteral("overlay")),
                    QCustomPlot::limBelow);
    plot_->layer(QStringLiteral("marks"))->setMode(QCPLayer::lmBuffered);
    // The plot deletes its layerables.
    new PaintedLayerable(plot_, QStringLiteral("main"), std::move(curves), true);
    new PaintedLayerable(plot_, QStringLiteral("marks"), std::move(marks), false);
    plot_->axisRect()->setAutoMargins(QCP::msNone);
    layOut();
}

QWidget* PlotCanvas::widget() const {
    return plot_;
}

void PlotCanvas::setAxes(const AxisStyle& x, const AxisStyle& y) {
    const auto set = [](QCPAxis* axis, const AxisStyle& style, double room) {
        axis->setScaleType(style.logarithmic ? QCPAxis::stLogarithmic : QCPAxis::stLinear);
        axis->setTicker(QSharedPointer<Ticker>::create(style, axis, room));
        axis->grid()->setSubGridVisible(true);
        axis->setTickLength(0, 0);
        axis->setSubTickLength(0, 0);
    };
    set(plot_->xAxis, x, label_room_x);
    set(plot_->yAxis, y, label_room_y);
}

void PlotCanvas::setRanges(const PlotRanges& ranges) {
    plot_->xAxis->setRange(toPlot(ranges.x));
    plot_->yAxis->setRange(toPlot(ranges.y));
}

PlotRanges PlotCanvas::ranges() const {
    return {fromPlot(plot_->xAxis->range()), fromPlot(plot_->yAxis->range())};
}

QRectF PlotCanvas::area() const {
    return plot_->axisRect()->rect();
}

AxisMap PlotCanvas::mapX() const {
    const QRectF rect = area();
    return {ranges().x,
            {rect.left(), rect.right()},
            plot_->xAxis->scaleType() == QCPAxis::stLogarithmic};
}

AxisMap PlotCanvas::mapY() const {
    const QRectF rect = area();
    return {ranges().y,
            {rect.bottom(), rect.top()},
            plot_->yAxis->scaleType() == QCPAxis::stLogarithmic};
}

void PlotCanvas::layOut() {
    // The same margins on every pane, so that frequency axes stacked on one another line up.
    const QFontMetricsF metrics(fontOf(FontRole::small));
    const int line = static_cast<int>(std::ceil(metrics.height()));
    const int left =
        static_cast<int>(std::ceil(metrics.horizontalAdvance(QStringLiteral("\u2212100 rad/s"))));
    plot_->axisRect()->setMargins(QMargins(left, line / 2 + 2, line, line + 8));
}

void PlotCanvas::setTheme(const Theme& theme) {
    plot_->setBackground(theme.colour(ColourRole::pane));
    const QPen gridPen(theme.colour(ColourRole::grid), 0);
    for (QCPAxis* axis : {plot_->xAxis, plot_->yAxis}) {
        axis->setTickLabelFont(fontOf(FontRole::small));
        axis->setTickLabelColor(theme.colour(ColourRole::muted));
        axis->setBasePen(QPen(Qt::NoPen));
        axis->setTickPen(QPen(Qt::NoPen));
        axis->setSubTickPen(QPen(Qt::NoPen));
        axis->grid()->setPen(gridPen);
        axis->grid()->setSubGridPen(QPen(theme.faint(ColourRole::grid, 0.55), 0));
        axis->grid()->setZeroLinePen(QPen(Qt::NoPen));
    }
    layOut();
}

void PlotCanvas::redraw() {
    if (plot_->viewport().isEmpty())
        return; // a pane without room has nothing to paint on
    plot_->replot(QCustomPlot::rpQueuedReplot);
}

void PlotCanvas::redrawMarks() {
    if (plot_->viewport().isEmpty())
        return;
    plot_->layer(QStringLiteral("marks"))->replot();
}

QImage PlotCanvas::picture(double scale) {
    return plot_->toPixmap(plot_->width(), plot_->height(), scale).toImage();
}

bool PlotCanvas::saveVector(const QString& file, bool svg) {
    if (!svg)
        return plot_->savePdf(file, plot_->width(), plot_->height());
    QSvgGenerator generator;
    generator.setFileName(file);
    generator.setSize(plot_->size());
    generator.setViewBox(QRect(QPoint(0, 0), plot_->size()));
    QCPPainter painter;
    if (!painter.begin(&generator))
        return false;
    painter.setMode(QCPPainter::pmVectorized);
    painter.setMode(QCPPainter::pmNoCaching);
    plot_->toPainter(&painter, plot_->width(), plot_->height());
    return painter.end();
}

bool PlotCanvas::print(QPaintDevice& page) {
    QCPPainter painter;
    if (!painter.begin(&page))
        return false;
    painter.setMode(QCPPainter::pmVectorized);
    painter.setMode(QCPPainter::pmNoCaching);
    const double scale = std::min(static_cast<double>(page.width()) / plot_->width(),
                                  static_cast<double>(page.height()) / plot_->height());
    painter.scale(scale, scale);
    plot_->toPainter(&painter, plot_->width(), plot_->height());
    return painter.end();
}

} // namespace cornerwright
