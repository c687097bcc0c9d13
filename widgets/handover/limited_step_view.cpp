#include "widgets/handover/limited_step_view.h"

#include "widgets/figure_text.h"
#include "widgets/theme.h"

#include <QPainter>
#include <QPainterPath>

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

constexpr int viewHeight = 170;
constexpr double margin = 6.0;
constexpr double air = 0.08; // of the range, above and below a curve

} // namespace

LimitedStepView::LimitedStepView(QWidget* parent) : QWidget(parent) {
    setFixedHeight(viewHeight);
    setVisible(false);
}

void LimitedStepView::setStep(std::shared_ptr<const LimitedStep> step, const OutputLimits& limits) {
    step_ = std::move(step);
    limits_ = limits;
    setVisible(step_ && !step_->t_s.empty());
    setAccessibleName(tr("Unit step with the output limits"));
    setAccessibleDescription(sentence());
    update();
}

void LimitedStepView::clear() {
    step_.reset();
    setVisible(false);
}

QString LimitedStepView::sentence() const {
    if (!step_) {
        return {};
    }
    if (step_->t_s.empty()) {
        return tr("No step with the limits: %1.").arg(QString::fromStdString(step_->note));
    }
    QString words = tr("Unit step with the limits, shown case: overshoot %1, settling %2, %3 at a "
                       "limit.")
                        .arg(figureText(step_->overshoot_percent, MeasureUnit::percent, true),
                             step_->settling_time_s.is_value()
                                 ? timeText(step_->settling_time_s.value())
                                 : tr("not within %1").arg(timeText(step_->t_s.back())),
                             timeText(step_->time_at_limit_s));
    if (!step_->note.empty()) {
        words += QLatin1Char(' ') + QString::fromStdString(step_->note) + QLatin1Char('.');
    }
    return words;
}

void LimitedStepView::drawSignal(QPainter& painter, const QRectF& area,
                                 const std::vector<double>& values, const QString& name,
                                 const std::vector<double>& levels) const {
    const Theme& theme = Theme::of(palette());
    double low = 0.0;
    double high = 0.0;
    for (const auto* list : {&values, &levels}) {
        for (const double value : *list) {
            low = std::min(low, value);
            high = std::max(high, value);
        }
    }
    const double range = std::max(high - low, 1e-12) * (1.0 + 2.0 * air);
    const double bottom = low - air * (high - low);
    const auto yOf = [&](double value) {
        return area.bottom() - area.height() * (value - bottom) / range;
    };
    const auto xOf = [&](double t) { return area.left() + area.width() * t / step_->t_s.back(); };
    painter.setPen(theme.colour(ColourRole::hairline));
    painter.drawRect(area);
    painter.drawLine(QPointF(area.left(), yOf(0.0)), QPointF(area.right(), yOf(0.0)));
    for (const double level : levels) {
        painter.setPen(QPen(theme.colour(ColourRole::muted), 1.0, Qt::DashLine));
        painter.drawLine(QPointF(area.left(), yOf(level)), QPointF(area.right(), yOf(level)));
        const double letters = painter.fontMetrics().height();
        const bool fitsAbove = yOf(level) - area.top() > letters;
        painter.drawText(
            QPointF(area.left() + 4.0 * margin, yOf(level) + (fitsAbove ? -2.0 : letters)),
            numberText(level));
    }
    QPainterPath path;
    for (std::size_t i = 0; i < values.size(); ++i) {
        const QPointF point(xOf(step_->t_s[i]), yOf(values[i]));
        i == 0 ? path.moveTo(point) : path.lineTo(point);
    }
    painter.setPen(QPen(theme.colour(ColourRole::ink), 1.3));
    painter.drawPath(path);
    painter.setPen(theme.colour(ColourRole::muted));
    painter.drawText(area.adjusted(margin, 2.0, -margin, -2.0), Qt::AlignRight | Qt::AlignVCenter,
                     name);
}

void LimitedStepView::paintEvent(QPaintEvent*) {
    if (!step_ || step_->t_s.empty()) {
        return;
    }
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    painter.setFont(fontOf(FontRole::small));
    const QRectF whole = QRectF(rect()).adjusted(1.0, 1.0, -1.0, -1.0);
    QRectF upper = whole;
    upper.setHeight(whole.height() / 2.0 - margin / 2.0);
    const QRectF lower = upper.translated(0.0, upper.height() + margin);
    drawSignal(painter, upper, step_->y, tr("output y, to %1").arg(timeText(step_->t_s.back())),
               {1.0});
    drawSignal(painter, lower, step_->u, tr("control u with its limits"),
               {limits_.at_least, limits_.at_most});
}

} // namespace cornerwright
