#include "widgets/import/response_preview.h"

#include "widgets/panes/axis_styles.h"
#include "widgets/panes/painting.h"
#include "widgets/view_state.h"

#include <QEvent>
#include <QVBoxLayout>

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {

namespace {

constexpr double lineWidth = 1.5;
constexpr double pointRadius = 1.6;
/// Room above and below what is shown, as a share of it.
constexpr double margin = 0.06;
constexpr double smallestDb = 6.0;
constexpr double smallestDegrees = 30.0;

} // namespace

PreviewCurve previewCurve(const MeasuredResponse& measured) {
    constexpr double turn = 360.0;
    PreviewCurve curve;
    curve.w_rad_s = measured.w_rad_s;
    for (const Complex value : measured.response) {
        curve.db.push_back(20.0 * std::log10(std::abs(value)));
        double degrees = std::arg(value) * 180.0 / std::numbers::pi;
        if (!curve.degrees.empty()) {
            degrees += turn * std::round((curve.degrees.back() - degrees) / turn);
        }
        curve.degrees.push_back(degrees);
    }
    return curve;
}

ResponsePreview::ResponsePreview(ViewState& viewState, QWidget* parent)
    : QWidget(parent), viewState_(viewState) {
    auto* column = new QVBoxLayout(this);
    column->setContentsMargins(0, 0, 0, 0);
    column->setSpacing(0);
    const auto make = [this, column](std::vector<double> PreviewCurve::*values, const QString& name,
                                     const AxisStyle& vertical) {
        auto holder = std::make_shared<PlotCanvas*>(nullptr);
        auto canvas = std::make_unique<PlotCanvas>(
            this, [this, holder, values](QPainter& painter) { draw(painter, **holder, values); },
            [](QPainter&) {});
        *holder = canvas.get();
        canvas->setAxes(frequencyAxis(viewState_), vertical);
        canvas->widget()->setMinimumHeight(110);
        canvas->widget()->setAccessibleName(name);
        canvas->widget()->setFocusPolicy(Qt::NoFocus);
        column->addWidget(canvas->widget(), 1);
        return canvas;
    };
    magnitude_ = make(&PreviewCurve::db, tr("Magnitude of the measurement"),
                      linearAxis(QStringLiteral("dB")));
    phase_ = make(&PreviewCurve::degrees, tr("Phase of the measurement"), degreeAxis());
    connect(&viewState_, &ViewState::unitChanged, this, &ResponsePreview::redraw);
    redraw();
}

void ResponsePreview::setCurves(std::vector<PreviewCurve> curves) {
    curves_ = std::move(curves);
    fitTo(*magnitude_, &PreviewCurve::db, smallestDb);
    fitTo(*phase_, &PreviewCurve::degrees, smallestDegrees);
    redraw();
}

void ResponsePreview::fitTo(PlotCanvas& canvas, std::vector<double> PreviewCurve::*values,
                            double smallest) {
    std::vector<double> all;
    AxisRange frequencies{HUGE_VAL, 0.0};
    for (const PreviewCurve& curve : curves_) {
        if (!curve.w_rad_s.empty()) {
            frequencies.low = std::min(frequencies.low, curve.w_rad_s.front());
            frequencies.high = std::max(frequencies.high, curve.w_rad_s.back());
            all.insert(all.end(), (curve.*values).begin(), (curve.*values).end());
        }
    }
    const std::optional<AxisRange> vertical = rangeOf(all, margin, smallest);
    if (vertical && frequencies.low < frequencies.high) {
        canvas.setRanges({frequencies, *vertical});
    }
}

void ResponsePreview::draw(QPainter& painter, const PlotCanvas& canvas,
                           std::vector<double> PreviewCurve::*values) const {
    const Theme& theme = Theme::of(palette());
    const AxisMap mapX = canvas.mapX();
    const AxisMap mapY = canvas.mapY();
    for (const PreviewCurve& curve : curves_) {
        const QColor colour =
            theme.colour(curve.isModel ? ColourRole::accent : ColourRole::graphite);
        drawFunction(painter, curvePen(colour, curve.isModel ? lineWidth : 1.0), curve.w_rad_s,
                     curve.*values, mapX, mapY);
        if (curve.isModel) {
            continue;
        }
        painter.setPen(Qt::NoPen);
        painter.setBrush(colour);
        for (std::size_t i = 0; i < curve.w_rad_s.size(); ++i) {
            painter.drawEllipse(
                QPointF(mapX.toPixel(curve.w_rad_s[i]), mapY.toPixel((curve.*values)[i])),
                pointRadius, pointRadius);
        }
    }
}

void ResponsePreview::redraw() {
    const Theme& theme = Theme::of(palette());
    for (PlotCanvas* canvas : {magnitude_.get(), phase_.get()}) {
        canvas->setTheme(theme);
        canvas->redraw();
    }
}

void ResponsePreview::changeEvent(QEvent* event) {
    QWidget::changeEvent(event);
    if (event->type() == QEvent::PaletteChange || event->type() == QEvent::FontChange) {
        redraw();
    }
}

} // namespace cornerwright
