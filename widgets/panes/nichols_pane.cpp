#include "widgets/panes/nichols_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/axis_styles.h"
#include "widgets/panes/margin_label.h"
#include "widgets/panes/painting.h"
#include "widgets/panes/section_edit.h"
#include "widgets/view_state.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

/// Fitting shows the curve between these sizes, and the endless turns of dead time not at all.
constexpr AxisRange fitted_db{-30.0, 30.0};
constexpr AxisRange fitted_degrees{-400.0, 60.0};
constexpr AxisRange least_degrees{-270.0, -90.0};
constexpr AxisRange least_db{-20.0, 20.0};

/// The way of a limit's travel: sideways for a phase margin, up and down for a gain margin.
bool isSideways(const Requirement& requirement) {
    return requirement.measure == Measure::phase_margin;
}

/// The odd multiple of 180 degrees nearest to a phase.
double criticalPhase(double degrees) {
    return 360.0 * std::round((degrees - 180.0) / 360.0) + 180.0;
}

} // namespace

NicholsPane::NicholsPane(ViewState& state, QWidget* parent) : LoopPlanePane(state, parent) {
    setAccessibleName(title());
    setAxes(degreeAxis(), linearAxis(QStringLiteral("dB")));
    setRanges({{-300.0, -30.0}, {-40.0, 40.0}});
}

std::vector<QPointF> NicholsPane::placesOf(const LoopCurves& curves) const {
    std::vector<QPointF> places;
    places.reserve(curves.loop_db.size());
    for (std::size_t i = 0; i < curves.loop_db.size(); ++i)
        places.emplace_back(curves.loop_phase_deg[i], curves.loop_db[i]);
    return places;
}

std::optional<PlotRanges> NicholsPane::fittedRanges() const {
    if (!content().assessment)
        return std::nullopt;
    std::vector<double> degrees{least_degrees.low, least_degrees.high};
    std::vector<double> decibels{least_db.low, least_db.high};
    for (const CaseAssessment& item : content().assessment->cases)
        for (const QPointF& place : placesOf(item.design.curves)) {
            if (place.y() < fitted_db.low || place.y() > fitted_db.high)
                continue;
            degrees.push_back(std::clamp(place.x(), fitted_degrees.low, fitted_degrees.high));
            decibels.push_back(place.y());
        }
    return PlotRanges{*rangeOf(degrees, 0.04, 1.0), *rangeOf(decibels, 0.04, 1.0)};
}

void NicholsPane::drawContour(QPainter& painter, const NicholsContour& contour,
                              const QPen& pen) const {
    const AxisRange shown = mapX().range();
    for (double turn = 360.0 * std::floor(shown.low / 360.0 + 1.0); turn - 360.0 < shown.high;
         turn += 360.0) {
        std::vector<QPointF> points = contour.points;
        for (QPointF& point : points)
            point.rx() += turn;
        drawPath(painter, pen, toPixels(std::move(points)), plotArea());
    }
}

void NicholsPane::drawGround(QPainter& painter) const {
    painter.setBrush(Qt::NoBrush);
    const QRectF area = plotArea();
    const QPen contourPen(theme().faint(ColourRole::graphite, 0.45), 1.0);
    for (const NicholsContour& contour : magnitudeContours())
        drawContour(painter, contour, contourPen);
    const QPen phasePen = curvePen(theme().faint(ColourRole::graphite, 0.4), 1.0, Qt::DotLine);
    for (const NicholsContour& contour : phaseContours())
        drawContour(painter, contour, phasePen);
    painter.setPen(QPen(theme().faint(ColourRole::graphite, 0.75), 1.0));
    const double zero = mapY().toPixel(0.0);
    painter.drawLine(QPointF(area.left(), zero), QPointF(area.right(), zero));
    for (double phase = criticalPhase(mapX().range().low); phase <= mapX().range().high;
         phase += 360.0) {
        const double x = mapX().toPixel(phase);
        painter.drawLine(QPointF(x, area.top()), QPointF(x, area.bottom()));
    }
    drawContourNames(painter);
}

void NicholsPane::drawContourNames(QPainter& painter) const {
    const QRectF area = plotArea();
    const QFont font = fontOf(FontRole::small);
    const LabelStyle style{theme().colour(ColourRole::muted), font, LabelGround::pane};
    LabelPlacer placer(area);
    const double turn = 360.0 * std::ceil(mapX().range().high / 360.0 - 1.0);
    for (const NicholsContour& contour : magnitudeContours()) {
        // Open contours are named at the right edge or where they end, closed ones on their top.
        std::optional<QPointF> at;
        for (QPointF point : contour.points) {
            point.rx() += turn;
            const QPointF pixel = toPixel(point);
            if (!area.contains(pixel))
                continue;
            const bool isBetter =
                !at || (contour.value > 0.0 ? pixel.y() < at->y() : pixel.x() > at->x());
            if (isBetter)
                at = pixel;
        }
        if (!at)
            continue;
        const QString text = (contour.value > 0.0 ? QStringLiteral("+") : QString()) +
                             numberText(contour.value, 2) + QStringLiteral(" dB");
        const QSizeF room = labelSize(text, font);
        if (const auto place =
                placer.placeIfFree(room, *at - QPointF(0.5 * room.width(), 0.5 * room.height())))
            drawLabel(painter, *place, text, style, theme());
    }
}

void NicholsPane::drawMargin(QPainter& painter, const MarginMark& mark, const MarkedLoop& loop,
                             const CaseAssessment& shown, LabelPlacer& placer) const {
    QPointF from;
    QPointF to;
    if (mark.measure == Measure::phase_margin) {
        from = toPixel({mark.from, 0.0});
        to = toPixel({mark.to, 0.0});
    } else {
        const LoopCurves& curves = loop.assessment->curves;
        const auto phase = interpolateOnLog(curves.w_rad_s, curves.loop_phase_deg, mark.w_rad_s);
        if (!phase)
            return;
        from = toPixel({criticalPhase(*phase), 0.0});
        to = toPixel({criticalPhase(*phase), mark.to});
    }
    if (!plotArea().contains(from))
        return;
    painter.setPen(QPen(marginColour(mark, loop, *content().assessment, shown, theme()),
                        mark.decides ? 3.0 : 1.5, Qt::SolidLine, Qt::FlatCap));
    painter.drawLine(from, to);
    if (!mark.decides)
        return;
    const MarginLabel label =
        marginLabel(mark, loop, *content().assessment, shown, theme(), viewState().showsHertz());
    const QSizeF room = labelSize(label.text, label.style.font);
    const QPointF middle = 0.5 * (from + to);
    const QPointF right(10.0, -0.5 * room.height());
    drawLabel(
        painter,
        mark.measure == Measure::phase_margin
            ? placer.place(room,
                           {middle + QPointF(8.0, -room.height() - 8.0), middle + QPointF(8.0, 8.0),
                            middle + QPointF(-8.0 - room.width(), 8.0)})
            : placer.place(room, {middle + right, middle + QPointF(-10.0 - room.width(), right.y()),
                                  middle + QPointF(10.0, room.height())}),
        label.text, label.style, theme());
}

void NicholsPane::drawLimits(QPainter& painter, LabelPlacer& placer) const {
    constexpr double half = 9.0;
    for (const Handle& handle : handles()) {
        const Requirement& requirement = project()->requirements[handle.id.index];
        const bool isStrong = isHighlighted(handle.id);
        const QPointF arm = isSideways(requirement) ? QPointF(0.0, half) : QPointF(half, 0.0);
        painter.setPen(QPen(theme().colour(ColourRole::ink), isStrong ? 3.0 : 1.5));
        painter.drawLine(handle.at - arm, handle.at + arm);
        if (!isStrong)
            continue;
        const QString text = limitText(requirement, viewState().showsHertz());
        const LabelStyle style{theme().colour(ColourRole::ink), fontOf(FontRole::small),
                               LabelGround::pane};
        const QSizeF room = labelSize(text, style.font);
        drawLabel(painter,
                  placer.place(room, {handle.at + QPointF(half, half),
                                      handle.at + QPointF(half, -half - room.height())}),
                  text, style, theme());
    }
}

void NicholsPane::drawMargins(QPainter& painter, const CaseAssessment& shown,
                              LabelPlacer& placer) const {
    for (const Requirement& requirement : project()->requirements)
        if (requirement.measure == Measure::sensitivity_peak && requirement.at_most &&
            *requirement.at_most > 0.0) {
            const auto state = stateOf(content().assessment->verdict, requirement.measure,
                                       shown.name, LoopName::design);
            painter.setBrush(Qt::NoBrush);
            drawContour(painter, sensitivityContour(*requirement.at_most),
                        QPen(theme().state(state.value_or(State::undetermined)), 1.5));
        }
    const MarkedLoop phase = phaseMargins(shown, followedLoop());
    for (const MarginMark& mark : phase.marks)
        drawMargin(painter, mark, phase, shown, placer);
    const MarkedLoop gain = gainMargins(shown, followedLoop());
    for (const MarginMark& mark : gain.marks)
        drawMargin(painter, mark, gain, shown, placer);
    drawLimits(painter, placer);
    constexpr double arm = 6.0;
    painter.setPen(QPen(theme().colour(ColourRole::ink), 2.0));
    for (double degrees = criticalPhase(mapX().range().low); degrees <= mapX().range().high;
         degrees += 360.0) {
        const QPointF critical = toPixel({degrees, 0.0});
        painter.drawLine(critical - QPointF(arm, 0.0), critical + QPointF(arm, 0.0));
        painter.drawLine(critical - QPointF(0.0, arm), critical + QPointF(0.0, arm));
    }
}

double NicholsPane::gainFactorOf(const QPointF& from, const QPointF& to) const {
    const double db = mapY().toValue(to.y()) - mapY().toValue(from.y());
    return std::pow(10.0, db / 20.0);
}

void NicholsPane::addLimitHandles(std::vector<Handle>& handles, const MarkedLoop& loop) const {
    const auto& requirements = project()->requirements;
    for (const MarginMark& mark : loop.marks) {
        if (!mark.decides)
            continue;
        const LoopCurves& curves = loop.assessment->curves;
        const auto phase = interpolateOnLog(curves.w_rad_s, curves.loop_phase_deg, mark.w_rad_s);
        for (std::size_t i = 0; phase && i < requirements.size(); ++i) {
            if (requirements[i].measure != mark.measure || !requirements[i].at_least)
                continue;
            Handle handle;
            handle.id = {HandleKind::limit, i, SectionPart::corner, mark.to < mark.from ? -1 : 1};
            const double away = handle.id.sub * *requirements[i].at_least;
            handle.at = isSideways(requirements[i]) ? toPixel({mark.from + away, 0.0})
                                                    : toPixel({criticalPhase(*phase), away});
            handle.area = touchArea(handle.at);
            handle.name = tr("limit of %1").arg(insideSentence(measureText(mark.measure)));
            handle.cursor = isSideways(requirements[i]) ? Qt::SizeHorCursor : Qt::SizeVerCursor;
            if (plotArea().contains(handle.at))
                handles.push_back(std::move(handle));
        }
    }
}

std::vector<Handle> NicholsPane::makeHandles() const {
    std::vector<Handle> handles;
    const CaseAssessment* shown = shownCase(content().assessment);
    if (project() == nullptr || shown == nullptr)
        return handles;
    addLimitHandles(handles, phaseMargins(*shown, followedLoop()));
    addLimitHandles(handles, gainMargins(*shown, followedLoop()));
    return handles;
}

std::optional<Project> NicholsPane::dragged(const HandleId& handle, const DragMotion& motion,
                                            const Project& start) const {
    if (handle.kind != HandleKind::limit || handle.index >= start.requirements.size())
        return LoopPlanePane::dragged(handle, motion, start);
    const QPointF travel = toPlace(motion.to) - toPlace(motion.from);
    const bool sideways = isSideways(start.requirements[handle.index]);
    return withLimitMoved(start, handle.index, handle.sub * (sideways ? travel.x() : travel.y()));
}

std::optional<Project> NicholsPane::nudged(const HandleId& handle, const QPointF& direction,
                                           double share, const Project& start) const {
    if (handle.kind != HandleKind::limit || handle.index >= start.requirements.size())
        return LoopPlanePane::nudged(handle, direction, share, start);
    const Requirement& requirement = start.requirements[handle.index];
    const double way = isSideways(requirement) ? direction.x() : direction.y();
    return withLimitMoved(start, handle.index,
                          handle.sub * way * share * requirement.at_least.value_or(0.0));
}

} // namespace cornerwright
