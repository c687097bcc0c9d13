#include "widgets/parts/histogram_view.h"

#include "widgets/theme.h"

#include <QFontMetricsF>
#include <QKeyEvent>
#include <QMouseEvent>
#include <QPainter>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {
constexpr int fewestBars = 6;
constexpr int mostBars = 40;
constexpr double margin = 8.0;
} // namespace

Histogram histogramOf(std::span<const double> values) {
    std::vector<double> finite;
    std::ranges::copy_if(values, std::back_inserter(finite),
                         [](double value) { return std::isfinite(value); });
    if (finite.empty()) {
        return {};
    }
    const auto [low, high] = std::ranges::minmax(finite);
    const auto root = static_cast<int>(std::sqrt(static_cast<double>(finite.size())));
    const auto bars = static_cast<std::size_t>(std::clamp(root, fewestBars, mostBars));
    Histogram histogram{low, (high - low) / static_cast<double>(bars), std::vector<int>(bars, 0)};
    if (histogram.width <= 0.0) { // all equal: one bar about the value
        histogram = {low, std::max(std::abs(low), 1.0) * 1e-3, {0}};
        histogram.low -= 0.5 * histogram.width;
    }
    for (const double value : finite) {
        const auto bar = static_cast<std::size_t>((value - histogram.low) / histogram.width);
        ++histogram.counts[std::min(bar, histogram.counts.size() - 1)];
    }
    return histogram;
}

HistogramView::HistogramView(QWidget* parent) : QWidget(parent) {
    setFocusPolicy(Qt::StrongFocus);
    setMouseTracking(true);
    setAccessibleName(tr("Histogram"));
}

void HistogramView::setValues(std::span<const double> values, std::optional<double> limit,
                              Text text) {
    histogram_ = histogramOf(values);
    limit_ = limit;
    text_ = std::move(text);
    bar_ = -1;
    told_.clear();
    const std::size_t bars = histogram_.counts.size();
    setAccessibleDescription(
        bars == 0 ? tr("no values")
                  : tr("%1 values from %2 to %3")
                        .arg(values.size())
                        .arg(text_(histogram_.low))
                        .arg(text_(histogram_.low + static_cast<double>(bars) * histogram_.width)));
    update();
}

QSize HistogramView::minimumSizeHint() const {
    const int line = fontMetrics().height();
    return {12 * line, 6 * line};
}

QRectF HistogramView::area() const {
    const double line = QFontMetricsF(fontOf(FontRole::small)).height();
    return QRectF(rect()).adjusted(margin, margin + line, -margin, -margin - line);
}

double HistogramView::pixelOf(double value) const {
    const QRectF box = area();
    const auto bars = static_cast<double>(histogram_.counts.size());
    return box.left() + (value - histogram_.low) / (histogram_.width * bars) * box.width();
}

void HistogramView::tell(int bar) {
    const auto bars = static_cast<int>(histogram_.counts.size());
    if (bars == 0 || bar < 0 || bar >= bars || bar == bar_) {
        return;
    }
    bar_ = bar;
    const double from = histogram_.low + bar * histogram_.width;
    told_ = tr("%1 from %2 to %3")
                .arg(histogram_.counts[static_cast<std::size_t>(bar)])
                .arg(text_(from), text_(from + histogram_.width));
    setAccessibleDescription(told_);
    update();
}

void HistogramView::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    painter.setFont(fontOf(FontRole::small));
    const QRectF box = area();
    if (histogram_.counts.empty()) {
        painter.setPen(theme.colour(ColourRole::muted));
        painter.drawText(box, Qt::AlignCenter, tr("no values yet"));
        return;
    }
    const double highest = std::max(1, *std::ranges::max_element(histogram_.counts));
    for (std::size_t i = 0; i < histogram_.counts.size(); ++i) {
        const double from = histogram_.low + static_cast<double>(i) * histogram_.width;
        const double height = histogram_.counts[i] / highest * box.height();
        const QRectF bar(pixelOf(from) + 0.5, box.bottom() - height,
                         pixelOf(from + histogram_.width) - pixelOf(from) - 1.0, height);
        const bool isTold = static_cast<int>(i) == bar_;
        painter.fillRect(bar, theme.colour(isTold ? ColourRole::accent : ColourRole::graphite));
    }
    painter.setPen(theme.colour(ColourRole::hairline));
    painter.drawLine(box.bottomLeft(), box.bottomRight());
    painter.setPen(theme.colour(ColourRole::muted));
    const QRectF below(box.left(), box.bottom(), box.width(), rect().bottom() - box.bottom());
    const double end =
        histogram_.low + static_cast<double>(histogram_.counts.size()) * histogram_.width;
    painter.drawText(below, Qt::AlignLeft | Qt::AlignVCenter, text_(histogram_.low));
    painter.drawText(below, Qt::AlignRight | Qt::AlignVCenter, text_(end));
    const QRectF above(box.left(), 0.0, box.width(), box.top());
    painter.drawText(above, Qt::AlignRight | Qt::AlignVCenter, told_);
    if (limit_ && *limit_ >= histogram_.low && *limit_ <= end) {
        const double x = pixelOf(*limit_);
        painter.setPen(QPen(theme.colour(ColourRole::ink), 1.5, Qt::DashLine));
        painter.drawLine(QPointF(x, box.top()), QPointF(x, box.bottom()));
        painter.drawText(above, Qt::AlignLeft | Qt::AlignVCenter,
                         tr("limit %1").arg(text_(*limit_)));
    }
    if (hasFocus()) {
        painter.setPen(QPen(theme.colour(ColourRole::accent), 1.5, Qt::DotLine));
        painter.setBrush(Qt::NoBrush);
        painter.drawRect(QRectF(rect()).adjusted(1.0, 1.0, -1.0, -1.0));
    }
}

void HistogramView::mouseMoveEvent(QMouseEvent* event) {
    const QRectF box = area();
    const double part = (event->position().x() - box.left()) / box.width();
    tell(static_cast<int>(std::floor(part * static_cast<double>(histogram_.counts.size()))));
}

void HistogramView::keyPressEvent(QKeyEvent* event) {
    if (event->key() == Qt::Key_Left || event->key() == Qt::Key_Right) {
        tell(bar_ + (event->key() == Qt::Key_Right ? 1 : -1));
    } else {
        QWidget::keyPressEvent(event);
    }
}

void HistogramView::focusInEvent(QFocusEvent* event) {
    QWidget::focusInEvent(event);
    update();
}

void HistogramView::focusOutEvent(QFocusEvent* event) {
    QWidget::focusOutEvent(event);
    update();
}

} // namespace cornerwright
