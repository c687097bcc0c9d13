#include "widgets/panes/loop_plane_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/case_choice.h"
#include "widgets/panes/csv_table.h"
#include "widgets/panes/followed_place.h"
#include "widgets/panes/legend_widget.h"
#include "widgets/panes/painting.h"
#include "widgets/panes/section_edit.h"
#include "widgets/view_state.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

constexpr double main_width = 1.5;
constexpr double faint_loop = 0.26;
/// How near the curve a press takes the gain, and the mouse takes the cursor along.
constexpr double curve_reach = 7.0;
constexpr double cursor_reach = 40.0;

double distanceToSegment(const QPointF& point, const QPointF& from, const QPointF& to,
                         double& share) {
    const QPointF step = to - from;
    const double length = QPointF::dotProduct(step, step);
    share =
        length > 0.0 ? std::clamp(QPointF::dotProduct(point - from, step) / length, 0.0, 1.0) : 0.0;
    const QPointF away = point - from - share * step;
    return std::hypot(away.x(), away.y());
}

} // namespace

LoopPlanePane::LoopPlanePane(ViewState& state, QWidget* parent) : PlotPane(state, parent) {
    connect(&state, &ViewState::cursorChanged, this, [this] { redrawMarks(); });
}

void LoopPlanePane::contentChanged() {
    const QColor ink = theme().colour(ColourRole::ink);
    std::vector<LegendWidget::Entry> entries{{tr("design loop"), curvePen(ink, main_width)}};
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown != nullptr && shown->realised)
        entries.push_back({tr("realised loop"), curvePen(ink, main_width, Qt::DashLine)});
    if (content().assessment && content().assessment->cases.size() > 1)
        entries.push_back(
            {tr("other cases"), curvePen(theme().faint(ColourRole::ink, faint_loop))});
    legend().setEntries(std::move(entries));
}

QPointF LoopPlanePane::toPixel(const QPointF& place) const {
    return {mapX().toPixel(place.x()), mapY().toPixel(place.y())};
}

QPointF LoopPlanePane::toPlace(const QPointF& pixel) const {
    return {mapX().toValue(pixel.x()), mapY().toValue(pixel.y())};
}

std::vector<QPointF> LoopPlanePane::toPixels(std::vector<QPointF> places) const {
    const AxisMap x = mapX();
    const AxisMap y = mapY();
    for (QPointF& place : places)
        place = {x.toPixel(place.x()), y.toPixel(place.y())};
    return places;
}

std::optional<QPointF> LoopPlanePane::pixelAt(const LoopCurves& curves, double w_rad_s) const {
    const auto position = findOnLog(curves.w_rad_s, w_rad_s);
    const std::vector<QPointF> places = placesOf(curves);
    if (!position || places.size() != curves.w_rad_s.size())
        return std::nullopt;
    const QPointF from = toPixel(places[position->index]);
    return from + position->share * (toPixel(places[position->index + 1]) - from);
}

std::optional<QPointF> LoopPlanePane::pixelAtFrequency(double w_rad_s) const {
    const CaseAssessment* shown = shownCase(content().assessment);
    return shown != nullptr ? pixelAt(shown->design.curves, w_rad_s) : std::nullopt;
}

void LoopPlanePane::drawLoop(QPainter& painter, const LoopCurves& curves, const QPen& pen) const {
    drawPath(painter, pen, toPixels(placesOf(curves)), plotArea());
}

void LoopPlanePane::drawCurves(QPainter& painter) {
    drawGround(painter);
    if (!content().assessment)
        return;
    const QColor ink = theme().colour(ColourRole::ink);
    const QColor faint = theme().faint(ColourRole::ink, faint_loop);
    const auto& cases = content().assessment->cases;
    const auto worst =
        worstCases(*content().assessment,
                   {Measure::phase_margin, Measure::gain_margin, Measure::gain_reduction_margin,
                    Measure::delay_margin, Measure::sensitivity_peak});
    for (std::size_t i = 0; i < cases.size(); ++i)
        if (i != viewState().shownCase() && !isHidden(i))
            drawLoop(painter, cases[i].design.curves, curvePen(worst.contains(i) ? ink : faint));
    if (const CaseAssessment* trial = shownCase(content().trial))
        drawLoop(painter, trial->design.curves,
                 curvePen(theme().colour(ColourRole::accent), 1.0, Qt::DashDotLine));
    if (const CaseAssessment* ghost = shownCase(content().ghost))
        drawLoop(painter, ghost->design.curves, curvePen(theme().faint(ColourRole::muted, 0.7)));
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr)
        return;
    drawMirrored(painter, shown->design.curves);
    drawLoop(painter, shown->design.curves, curvePen(ink, main_width));
    if (shown->realised)
        drawLoop(painter, shown->realised->curves, curvePen(ink, main_width, Qt::DashLine));
}

void LoopPlanePane::drawMarks(QPainter& painter) {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr || project() == nullptr)
        return;
    painter.save();
    painter.setClipRect(plotArea(), Qt::IntersectClip);
    LabelPlacer placer(plotArea());
    drawMargins(painter, *shown, placer);
    drawFollowed(painter, *shown, placer);
    drawCursor(painter, *shown);
    painter.restore();
}

void LoopPlanePane::drawFollowed(QPainter& painter, const CaseAssessment& shown,
                                 LabelPlacer& placer) const {
    const Judgement* judgement = followedJudgement(viewState(), *content().assessment);
    if (judgement == nullptr || !judgement->at_rad_s.is_value())
        return;
    const LoopAssessment* loop = loopOf(shown, judgement->loop);
    const auto at =
        loop != nullptr ? pixelAt(loop->curves, judgement->at_rad_s.value()) : std::nullopt;
    if (at && plotArea().contains(*at))
        drawFollowedPlace(painter, *at, viewState(), *content().assessment, placer, theme());
}

void LoopPlanePane::drawCursor(QPainter& painter, const CaseAssessment& shown) const {
    const auto w = viewState().cursorRadS();
    if (!w || isExporting())
        return;
    QString text = frequencyText(*w, viewState().showsHertz());
    const auto read = [&](const LoopCurves& curves, const QString& name) {
        const auto db = interpolateOnLog(curves.w_rad_s, curves.loop_db, *w);
        const auto phase = interpolateOnLog(curves.w_rad_s, curves.loop_phase_deg, *w);
        const auto at = pixelAt(curves, *w);
        if (!db || !phase || !at)
            return;
        text += QStringLiteral("   ") + name + QLatin1Char(' ') + decibelText(*db) +
                QStringLiteral(" ∠ ") + degreeText(*phase);
        painter.setPen(QPen(theme().colour(ColourRole::accent), 2.0));
        painter.setBrush(theme().colour(ColourRole::pane));
        painter.drawEllipse(*at, 0.7 * handleSize(), 0.7 * handleSize());
    };
    if (shown.realised)
        read(shown.realised->curves, tr("realised"));
    read(shown.design.curves, tr("loop"));
    const LabelStyle style{theme().colour(ColourRole::ink), fontOf(FontRole::small),
                           LabelGround::pane};
    const QSizeF room = labelSize(text, style.font);
    const QPointF corner(plotArea().left() + 4.0, plotArea().bottom() - room.height() - 4.0);
    drawLabel(painter, QRectF(corner, room), text, style, theme());
}

std::optional<LoopPlanePane::Nearest> LoopPlanePane::nearestTo(const QPointF& pixel) const {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr)
        return std::nullopt;
    const std::vector<double>& w = shown->design.curves.w_rad_s;
    const std::vector<QPointF> pixels = toPixels(placesOf(shown->design.curves));
    std::optional<Nearest> nearest;
    for (std::size_t i = 0; i + 1 < pixels.size(); ++i) {
        double share = 0.0;
        const double distance = distanceToSegment(pixel, pixels[i], pixels[i + 1], share);
        if (!nearest || distance < nearest->distance)
            nearest = Nearest{w[i] * std::pow(w[i + 1] / w[i], share), distance};
    }
    return nearest;
}

std::optional<Handle> LoopPlanePane::curveHandleAt(const QPointF& pixel) const {
    if (project() == nullptr || !plotArea().contains(pixel))
        return std::nullopt;
    const auto nearest = nearestTo(pixel);
    if (!nearest || nearest->distance > curve_reach)
        return std::nullopt;
    Handle handle;
    handle.id.kind = HandleKind::gain_curve;
    handle.at = pixel;
    handle.area = touchArea(pixel);
    handle.name = tr("gain");
    handle.cursor = Qt::SizeAllCursor;
    return handle;
}

std::optional<Project> LoopPlanePane::dragged(const HandleId& handle, const DragMotion& motion,
                                              const Project& start) const {
    if (handle.kind != HandleKind::gain_curve)
        return std::nullopt;
    constexpr double greatest = 1e6; // the hand may reach the origin
    const double factor = gainFactorOf(motion.from, motion.to);
    return withLoopGain(start, std::clamp(factor, 1.0 / greatest, greatest));
}

std::optional<Project> LoopPlanePane::nudged(const HandleId& handle, const QPointF& direction,
                                             double share, const Project& start) const {
    if (handle.kind != HandleKind::gain_curve || direction.y() == 0.0)
        return std::nullopt;
    return withLoopGain(start, std::pow(1.0 + share, direction.y()));
}

void LoopPlanePane::mouseAt(const QPointF& pixel) {
    if (isDragging())
        return;
    const auto nearest = nearestTo(pixel);
    if (nearest && nearest->distance <= cursor_reach && plotArea().contains(pixel))
        viewState().setCursorRadS(nearest->w_rad_s);
    else
        viewState().setCursorRadS(std::nullopt);
}

void LoopPlanePane::mouseLeft() {
    viewState().setCursorRadS(std::nullopt);
}

QString LoopPlanePane::csv() const {
    CsvTable table({tr("case"), tr("loop"), QStringLiteral("frequency_rad_s"),
                    QStringLiteral("real"), QStringLiteral("imaginary"), QStringLiteral("loop_db"),
                    QStringLiteral("loop_deg")});
    if (!content().assessment)
        return table.text();
    const auto add = [&](const CaseAssessment& item, const LoopCurves& curves,
                         const QString& loop) {
        for (std::size_t i = 0; i < curves.loop.size(); ++i)
            table.addRow({QString::fromStdString(item.name), loop},
                         {curves.w_rad_s[i], curves.loop[i].real(), curves.loop[i].imag(),
                          curves.loop_db[i], curves.loop_phase_deg[i]});
    };
    for (const CaseAssessment& item : content().assessment->cases) {
        add(item, item.design.curves, QStringLiteral("design"));
        if (item.realised)
            add(item, item.realised->curves, QStringLiteral("realised"));
    }
    return table.text();
}

} // namespace cornerwright
