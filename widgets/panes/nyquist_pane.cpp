#include "widgets/panes/nyquist_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/legend_widget.h"
#include "widgets/panes/limit_lines.h"
#include "widgets/panes/margin_label.h"
#include "widgets/panes/painting.h"
#include "widgets/view_state.h"

#include <QAction>
#include <QActionGroup>

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {

namespace {

const Complex critical_point(-1.0, 0.0);
/// Fitting shows the curve up to this size.
constexpr double fitted_compressed = 100.0;
constexpr double fitted_linear = 2.5;
constexpr double least_limit_db = 0.1;
constexpr double greatest_limit_db = 40.0;

/// 1/|S| is the distance to -1: a peak of `db` keeps the curve out of this radius.
double radiusOf(double db) {
    return std::pow(10.0, -db / 20.0);
}

double limitOf(double radius) {
    return std::clamp(-20.0 * std::log10(radius), least_limit_db, greatest_limit_db);
}

} // namespace

NyquistPane::NyquistPane(ViewState& state, QWidget* parent) : LoopPlanePane(state, parent) {
    setAccessibleName(title());
    setRadiusScale(scale_);
    auto* group = new QActionGroup(this);
    for (const auto& [scale, name] : {std::pair(RadiusScale::compressed, tr("compressed")),
                                      std::pair(RadiusScale::linear, tr("linear"))}) {
        QAction* action = addPaneAction(name, [this, scale = scale] { setRadiusScale(scale); });
        action->setCheckable(true);
        action->setChecked(scale == scale_);
        action->setToolTip(
            scale == RadiusScale::compressed
                ? tr("Radius beyond 1 drawn about one unit a decade, so that all of the loop "
                     "stays in sight")
                : tr("The plane as it is"));
        group->addAction(action);
        legend().addSwitch(action);
    }
}

void NyquistPane::setRadiusScale(RadiusScale scale) {
    scale_ = scale;
    setAxes(nyquistAxis(scale), nyquistAxis(scale));
    fit();
}

QPointF NyquistPane::pixelOf(Complex value) const {
    return toPixel(toDrawn(value, scale_));
}

Complex NyquistPane::valueAt(const QPointF& pixel) const {
    return fromDrawn(toPlace(pixel), scale_);
}

std::vector<QPointF> NyquistPane::placesOf(const LoopCurves& curves) const {
    std::vector<QPointF> places;
    places.reserve(curves.loop.size());
    for (const Complex& value : curves.loop)
        places.push_back(toDrawn(value, scale_));
    return places;
}

std::optional<PlotRanges> NyquistPane::fittedRanges() const {
    if (!content().assessment)
        return std::nullopt;
    const double greatest = scale_ == RadiusScale::compressed ? fitted_compressed : fitted_linear;
    // The critical point with its surroundings is always there.
    std::vector<double> real{-1.8, 0.6};
    std::vector<double> imaginary{-1.1, 1.1};
    for (const CaseAssessment& item : content().assessment->cases)
        for (const Complex& value : item.design.curves.loop)
            if (std::abs(value) <= greatest) {
                const QPointF drawn = toDrawn(value, scale_);
                real.push_back(drawn.x());
                imaginary.push_back(drawn.y());
            }
    const AxisRange x = *rangeOf(real, 0.05, 1.0);
    const AxisRange y = *rangeOf(imaginary, 0.05, 1.0);
    // The same pixels per unit both ways: circles are circles.
    const double width = std::max(plotArea().width(), 1.0);
    const double height = std::max(plotArea().height(), 1.0);
    const double perPixel = std::max((x.high - x.low) / width, (y.high - y.low) / height);
    const double middleX = 0.5 * (x.low + x.high);
    const double middleY = 0.5 * (y.low + y.high);
    return PlotRanges{{middleX - 0.5 * perPixel * width, middleX + 0.5 * perPixel * width},
                      {middleY - 0.5 * perPixel * height, middleY + 0.5 * perPixel * height}};
}

void NyquistPane::drawGround(QPainter& painter) const {
    painter.setBrush(Qt::NoBrush);
    const QRectF area = plotArea();
    const QPointF origin = pixelOf(0.0);
    painter.setPen(QPen(theme().faint(ColourRole::graphite, 0.75), 1.0));
    painter.drawLine(QPointF(area.left(), origin.y()), QPointF(area.right(), origin.y()));
    painter.drawLine(QPointF(origin.x(), area.top()), QPointF(origin.x(), area.bottom()));
    drawPath(painter, curvePen(theme().colour(ColourRole::graphite), 1.0, Qt::DotLine),
             toPixels(drawnCircle(0.0, 1.0, scale_)), area);
    if (scale_ == RadiusScale::linear)
        return;
    const QPen ring(theme().colour(ColourRole::grid), 1.0);
    const PlotRanges shown = ranges();
    const double farthest =
        std::hypot(std::max(-shown.x.low, shown.x.high), std::max(-shown.y.low, shown.y.high));
    for (double radius = 10.0; toDrawn(radius, scale_).x() < farthest; radius *= 10.0)
        drawPath(painter, ring, toPixels(drawnCircle(0.0, radius, scale_)), area);
}

void NyquistPane::drawMirrored(QPainter& painter, const LoopCurves& curves) const {
    std::vector<QPointF> places = placesOf(curves);
    for (QPointF& place : places)
        place.ry() = -place.y();
    drawPath(painter, curvePen(theme().faint(ColourRole::ink, 0.35), 1.0, Qt::DotLine),
             toPixels(std::move(places)), plotArea());
}

void NyquistPane::drawMargin(QPainter& painter, const MarginMark& mark, const MarkedLoop& loop,
                             const CaseAssessment& shown, LabelPlacer& placer) const {
    std::vector<Complex> way;
    if (mark.measure == Measure::phase_margin) {
        constexpr int steps = 48; // along the unit circle from -1 to the curve
        for (int i = 0; i <= steps; ++i)
            way.push_back(std::polar(1.0, std::lerp(mark.from, mark.to, i / double(steps)) *
                                              std::numbers::pi / 180.0));
    } else {
        way = {critical_point, -std::pow(10.0, mark.to / 20.0)};
    }
    std::vector<QPointF> pixels;
    for (const Complex& value : way)
        pixels.push_back(pixelOf(value));
    const QColor colour = marginColour(mark, loop, *content().assessment, shown, theme());
    drawPath(painter, QPen(colour, mark.decides ? 3.0 : 1.5, Qt::SolidLine, Qt::FlatCap), pixels,
             plotArea());
    painter.setBrush(colour);
    painter.setPen(QPen(theme().colour(ColourRole::pane), 1.0));
    painter.drawEllipse(pixels.back(), 4.0, 4.0);
    if (!mark.decides)
        return;
    const MarginLabel label =
        marginLabel(mark, loop, *content().assessment, shown, theme(), viewState().showsHertz());
    const QSizeF room = labelSize(label.text, label.style.font);
    const QPointF at = pixels.back();
    drawLabel(painter,
              placer.place(room, {at + QPointF(10.0, 6.0), at + QPointF(10.0, -6.0 - room.height()),
                                  at + QPointF(-10.0 - room.width(), 6.0),
                                  at + QPointF(-10.0 - room.width(), -6.0 - room.height()),
                                  at + QPointF(10.0, 30.0)}),
              label.text, label.style, theme());
}

void NyquistPane::drawSensitivityPeak(QPainter& painter, const CaseAssessment& shown) const {
    // The shortest way from -1 to the curve: its length is the inverse of the sensitivity peak.
    const auto draw = [&](const LoopAssessment& loop) {
        const Figure& at = loop.figures.frequency.sensitivity_peak_at_rad_s;
        if (!at.is_value())
            return;
        const auto pixel = pixelAt(loop.curves, at.value());
        if (!pixel)
            return;
        painter.setPen(curvePen(theme().colour(ColourRole::muted), 1.0, Qt::DashLine));
        painter.drawLine(pixelOf(critical_point), *pixel);
    };
    draw(shown.design);
    if (shown.realised)
        draw(*shown.realised);
}

void NyquistPane::drawLimitCircles(QPainter& painter, const CaseAssessment& shown,
                                   LabelPlacer& placer) const {
    for (const Handle& handle : handles()) {
        const auto limit = upperLimit(*project(), handle.id);
        if (!limit)
            continue;
        const LimitText words =
            limitTextOf(*content().assessment, shown.name, project()->requirements[handle.id.index],
                        viewState().showsHertz());
        const QColor colour = theme().state(words.state);
        const bool isStrong = isHighlighted(handle.id);
        painter.setBrush(Qt::NoBrush);
        drawPath(painter, QPen(colour, isStrong ? 3.0 : 1.5),
                 toPixels(drawnCircle(critical_point, radiusOf(*limit), scale_)), plotArea());
        painter.setPen(QPen(theme().colour(ColourRole::pane), 1.0));
        painter.setBrush(colour);
        painter.drawRoundedRect(QRectF(handle.at - QPointF(8.0, 3.5), QSizeF(16.0, 7.0)), 3.5, 3.5);
        const LabelStyle style{colour, fontOf(FontRole::small), LabelGround::pane};
        const QSizeF room = labelSize(words.text, style.font);
        drawLabel(
            painter,
            placer.place(room, {handle.at + QPointF(-room.width() - 6.0, -room.height() - 6.0),
                                handle.at + QPointF(-0.5 * room.width(), -room.height() - 8.0),
                                handle.at + QPointF(10.0, -room.height() - 6.0)}),
            words.text, style, theme());
    }
}

void NyquistPane::drawMargins(QPainter& painter, const CaseAssessment& shown,
                              LabelPlacer& placer) const {
    const QPointF critical = pixelOf(critical_point);
    placer.block(touchArea(critical));
    drawSensitivityPeak(painter, shown);
    const MarkedLoop phase = phaseMargins(shown, followedLoop());
    for (const MarginMark& mark : phase.marks)
        drawMargin(painter, mark, phase, shown, placer);
    const MarkedLoop gain = gainMargins(shown, followedLoop());
    for (const MarginMark& mark : gain.marks)
        drawMargin(painter, mark, gain, shown, placer);
    drawLimitCircles(painter, shown, placer);
    constexpr double arm = 6.0;
    painter.setPen(QPen(theme().colour(ColourRole::ink), 2.0));
    painter.drawLine(critical - QPointF(arm, 0.0), critical + QPointF(arm, 0.0));
    painter.drawLine(critical - QPointF(0.0, arm), critical + QPointF(0.0, arm));
}

double NyquistPane::gainFactorOf(const QPointF& from, const QPointF& to) const {
    return std::abs(valueAt(to)) / std::max(std::abs(valueAt(from)), 1e-12);
}

Handle NyquistPane::circleHandle(std::size_t requirement, const QPointF& at) const {
    Handle handle;
    handle.id = {HandleKind::limit, requirement, SectionPart::corner, 0};
    handle.at = at;
    handle.area = touchArea(at, 10.0);
    handle.name = tr("limit of %1").arg(insideSentence(measureText(Measure::sensitivity_peak)));
    handle.cursor = Qt::SizeAllCursor;
    return handle;
}

std::vector<Handle> NyquistPane::makeHandles() const {
    std::vector<Handle> handles;
    if (project() == nullptr || shownCase(content().assessment) == nullptr)
        return handles;
    for (std::size_t i = 0; i < project()->requirements.size(); ++i) {
        const Requirement& requirement = project()->requirements[i];
        if (requirement.measure != Measure::sensitivity_peak || !requirement.at_most)
            continue;
        const QPointF top = pixelOf(critical_point + Complex(0.0, radiusOf(*requirement.at_most)));
        if (plotArea().contains(top))
            handles.push_back(circleHandle(i, top));
    }
    return handles;
}

std::optional<Handle> NyquistPane::curveHandleAt(const QPointF& pixel) const {
    constexpr double reach = 6.0;
    for (const Handle& handle : handles()) {
        const auto limit = upperLimit(*project(), handle.id);
        if (!limit)
            continue;
        const Complex way = valueAt(pixel) - critical_point;
        if (std::abs(way) == 0.0)
            continue;
        const QPointF away =
            pixelOf(critical_point + way * (radiusOf(*limit) / std::abs(way))) - pixel;
        if (std::hypot(away.x(), away.y()) <= reach)
            return circleHandle(handle.id.index, pixel);
    }
    return LoopPlanePane::curveHandleAt(pixel);
}

std::optional<Project> NyquistPane::dragged(const HandleId& handle, const DragMotion& motion,
                                            const Project& start) const {
    const auto limit = upperLimit(start, handle);
    if (!limit)
        return LoopPlanePane::dragged(handle, motion, start);
    const double from = std::abs(valueAt(motion.from) - critical_point);
    const double to = std::abs(valueAt(motion.to) - critical_point);
    if (from == 0.0 || to == 0.0)
        return std::nullopt;
    return withUpperLimit(start, handle, limitOf(radiusOf(*limit) * to / from));
}

std::optional<Project> NyquistPane::nudged(const HandleId& handle, const QPointF& direction,
                                           double share, const Project& start) const {
    const auto limit = upperLimit(start, handle);
    if (!limit)
        return LoopPlanePane::nudged(handle, direction, share, start);
    const double factor = std::pow(1.0 + share, direction.x() + direction.y());
    return withUpperLimit(start, handle, limitOf(radiusOf(*limit) * factor));
}

} // namespace cornerwright
