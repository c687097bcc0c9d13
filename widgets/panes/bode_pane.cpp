#include "widgets/panes/bode_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/case_choice.h"
#include "widgets/panes/csv_table.h"
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
constexpr double faint_plant = 0.38;
/// Pixels between the grip's bar and the higher one of its triangles.
constexpr double grip_height = 28.0;

} // namespace

BodePane::BodePane(ViewState& state, const AxisStyle& vertical, Curve plant, Curve loop,
                   QWidget* parent)
    : FrequencyPane(state, vertical, parent), plant_(plant), loop_(loop) {}

void BodePane::contentChanged() {
    const Theme& colours = theme();
    const QColor ink = colours.colour(ColourRole::ink);
    std::vector<LegendWidget::Entry> entries{
        {tr("plant"), curvePen(colours.colour(ColourRole::graphite), main_width)},
        {tr("design loop"), curvePen(ink, main_width)}};
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown != nullptr && shown->realised)
        entries.push_back({tr("realised loop"), curvePen(ink, main_width, Qt::DashLine)});
    if (content().assessment && content().assessment->cases.size() > 1)
        entries.push_back(
            {tr("other cases"), curvePen(colours.faint(ColourRole::ink, faint_loop))});
    if (content().trial)
        entries.push_back(
            {tr("trial"), curvePen(colours.colour(ColourRole::accent), 1.0, Qt::DashDotLine)});
    legend().setEntries(std::move(entries));
}

void BodePane::drawCase(QPainter& painter, const LoopCurves& curves, const QPen& plant,
                        const QPen& loop) const {
    drawFunction(painter, plant, curves.w_rad_s, curves.*plant_, mapX(), mapY());
    drawFunction(painter, loop, curves.w_rad_s, curves.*loop_, mapX(), mapY());
}

void BodePane::drawCurves(QPainter& painter) {
    if (!content().assessment)
        return;
    const Theme& colours = theme();
    const auto& cases = content().assessment->cases;
    const QPen faintPlant = curvePen(colours.faint(ColourRole::graphite, faint_plant));
    const QPen faintLoop = curvePen(colours.faint(ColourRole::ink, faint_loop));
    const QPen fullLoop = curvePen(colours.colour(ColourRole::ink));
    const auto worst =
        worstCases(*content().assessment, {Measure::phase_margin, Measure::gain_margin,
                                           Measure::gain_reduction_margin, Measure::delay_margin});
    for (std::size_t i = 0; i < cases.size(); ++i)
        if (i != viewState().shownCase() && !isHidden(i))
            drawCase(painter, cases[i].design.curves, faintPlant,
                     worst.contains(i) ? fullLoop : faintLoop);

    if (const CaseAssessment* trial = shownCase(content().trial))
        drawFunction(painter, curvePen(colours.colour(ColourRole::accent), 1.0, Qt::DashDotLine),
                     trial->design.curves.w_rad_s, trial->design.curves.*loop_, mapX(), mapY());
    if (const CaseAssessment* ghost = shownCase(content().ghost))
        drawFunction(painter, curvePen(colours.faint(ColourRole::muted, 0.7)),
                     ghost->design.curves.w_rad_s, ghost->design.curves.*loop_, mapX(), mapY());

    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr)
        return;
    const QColor ink = colours.colour(ColourRole::ink);
    drawCase(painter, shown->design.curves,
             curvePen(colours.colour(ColourRole::graphite), main_width), curvePen(ink, main_width));
    if (shown->realised)
        drawFunction(painter, curvePen(ink, main_width, Qt::DashLine),
                     shown->realised->curves.w_rad_s, shown->realised->curves.*loop_, mapX(),
                     mapY());
}

std::optional<QPointF> BodePane::pixelAtFrequency(double w) const {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr)
        return std::nullopt;
    const LoopCurves& curves = shown->design.curves;
    const auto value = interpolateOnLog(curves.w_rad_s, curves.*loop_, w);
    if (!value)
        return std::nullopt;
    return QPointF(mapX().toPixel(w), mapY().toPixel(*value));
}

std::vector<Handle> BodePane::makeHandles() const {
    std::vector<Handle> handles;
    if (project() == nullptr)
        return handles;
    const QRectF area = plotArea();
    const double size = handleSize();
    const auto keptInside = [&](QPointF at) {
        at.setY(std::clamp(at.y(), area.top() + size, area.bottom() - size));
        return at;
    };
    const auto add = [&](Handle handle) {
        // Corners of one frequency would hide one another: later ones stand above.
        const auto hides = [&](const Handle& other) {
            return std::abs(other.at.x() - handle.at.x()) < size &&
                   std::abs(other.at.y() - handle.at.y()) < 2.0 * size;
        };
        while (std::any_of(handles.begin(), handles.end(), hides) &&
               handle.at.y() - 2.0 * size > area.top())
            handle.at.ry() -= 2.0 * size + 1.0;
        handle.area = touchArea(handle.at, std::max(9.0, 1.4 * size));
        handles.push_back(std::move(handle));
    };
    const Chain& chain = project()->compensator;
    for (std::size_t i = 0; i < chain.size(); ++i) {
        if (!chain[i].enabled)
            continue;
        const QString name = sectionText(chain[i]);
        const auto corners = cornersOf(chain[i]);
        std::vector<QPointF> places;
        for (const SectionCorner& corner : corners) {
            const auto at = pixelAtFrequency(corner.w_rad_s);
            if (!at)
                continue;
            places.push_back(keptInside(*at));
            if (at->x() < area.left() || at->x() > area.right())
                continue;
            Handle handle;
            handle.id = {HandleKind::section_part, i, corner.part, 0};
            handle.at = places.back();
            handle.name = corner.part == SectionPart::zero   ? tr("zero of %1").arg(name)
                          : corner.part == SectionPart::pole ? tr("pole of %1").arg(name)
                                                             : name;
            handle.shiftIsFine = chain[i].kind != SectionKind::notch;
            handle.cursor = corner.complex_pair ? Qt::SizeAllCursor : Qt::SizeHorCursor;
            add(std::move(handle));
        }
        if (corners.size() != 2 || places.size() != 2)
            continue;
        Handle grip;
        grip.id = {HandleKind::section_part, i, SectionPart::grip, 0};
        grip.at = keptInside({0.5 * (places[0].x() + places[1].x()),
                              std::min(places[0].y(), places[1].y()) - grip_height});
        grip.area = QRectF(QPointF(std::min(places[0].x(), places[1].x()), grip.at.y()),
                           QPointF(std::max(places[0].x(), places[1].x()), grip.at.y()))
                        .adjusted(-4.0, -9.0, 4.0, 9.0);
        grip.name = name;
        grip.cursor = Qt::SizeAllCursor;
        if (grip.area.intersects(area))
            handles.push_back(std::move(grip));
    }
    return handles;
}

std::vector<Handle> BodePane::limitHandles(const MarkedLoop& loop) const {
    std::vector<Handle> handles;
    const auto& requirements = project()->requirements;
    for (const MarginMark& mark : loop.marks) {
        if (!mark.decides)
            continue;
        for (std::size_t i = 0; i < requirements.size(); ++i) {
            const Requirement& requirement = requirements[i];
            if (requirement.measure != mark.measure || !requirement.at_least)
                continue;
            Handle handle;
            handle.id = {HandleKind::limit, i, SectionPart::corner, mark.to < mark.from ? -1 : 1};
            handle.at = {mapX().toPixel(mark.w_rad_s),
                         mapY().toPixel(mark.from + handle.id.sub * *requirement.at_least)};
            handle.area = touchArea(handle.at).adjusted(-8.0, 0.0, 8.0, 0.0);
            handle.name = tr("limit of %1").arg(insideSentence(measureText(mark.measure)));
            handle.cursor = Qt::SizeVerCursor;
            if (plotArea().contains(handle.at))
                handles.push_back(std::move(handle));
        }
    }
    return handles;
}

std::optional<Project> BodePane::dragged(const HandleId& handle, const DragMotion& motion,
                                         const Project& start) const {
    if (handle.kind == HandleKind::limit) {
        const double travel = mapY().toValue(motion.to.y()) - mapY().toValue(motion.from.y());
        return withLimitMoved(start, handle.index, handle.sub * travel);
    }
    if (handle.kind != HandleKind::section_part || handle.index >= start.compensator.size())
        return std::nullopt;
    const QPointF travel = motion.steadied();
    const AxisMap x = mapX();
    ResponseDrag drag;
    drag.frequency_factor = x.toValue(motion.from.x() + travel.x()) / x.toValue(motion.from.x());
    drag.up_db = decibelsOf(-travel.y());
    drag.width = motion.shift;
    return withSection(start, handle.index,
                       withResponseDrag(start.compensator[handle.index], handle.part, drag));
}

std::optional<Project> BodePane::nudged(const HandleId& handle, const QPointF& direction,
                                        double share, const Project& start) const {
    if (handle.kind == HandleKind::limit && handle.index < start.requirements.size()) {
        const double limit = start.requirements[handle.index].at_least.value_or(0.0);
        return withLimitMoved(start, handle.index, handle.sub * direction.y() * share * limit);
    }
    if (handle.kind != HandleKind::section_part || handle.index >= start.compensator.size())
        return std::nullopt;
    ResponseDrag drag;
    drag.frequency_factor = std::pow(1.0 + share, direction.x());
    drag.up_db = 20.0 * std::log10(1.0 + share) * direction.y();
    return withSection(start, handle.index,
                       withResponseDrag(start.compensator[handle.index], handle.part, drag));
}

QString BodePane::csv() const {
    CsvTable table({tr("case"), tr("loop"), QStringLiteral("frequency_rad_s"),
                    QStringLiteral("plant_") + unit(), QStringLiteral("loop_") + unit()});
    if (!content().assessment)
        return table.text();
    const auto add = [&](const CaseAssessment& item, const LoopCurves& curves, LoopName loop) {
        const QString name = QString::fromStdString(item.name);
        const std::string_view loopName = name_of(loop);
        const QString loopText =
            QString::fromLatin1(loopName.data(), static_cast<qsizetype>(loopName.size()));
        for (std::size_t i = 0; i < curves.w_rad_s.size(); ++i)
            table.addRow({name, loopText},
                         {curves.w_rad_s[i], (curves.*plant_)[i], (curves.*loop_)[i]});
    };
    for (const CaseAssessment& item : content().assessment->cases) {
        add(item, item.design.curves, LoopName::design);
        if (item.realised)
            add(item, item.realised->curves, LoopName::realised);
    }
    return table.text();
}

} // namespace cornerwright
