#include "widgets/panes/sensitivity_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/axis_styles.h"
#include "widgets/panes/case_choice.h"
#include "widgets/panes/csv_table.h"
#include "widgets/panes/followed_place.h"
#include "widgets/panes/legend_widget.h"
#include "widgets/panes/limit_lines.h"
#include "widgets/panes/painting.h"
#include "widgets/view_state.h"

#include <algorithm>
#include <functional>

namespace cornerwright {

namespace {

constexpr double main_width = 1.5;
constexpr double thin_width = 1.0;
constexpr double faint_case = 0.2;
constexpr AxisRange useful_db{-60.0, 60.0};

/// In decibel the product P S is a sum.
std::vector<double> disturbanceDecibels(const LoopCurves& curves) {
    if (curves.plant_db.size() != curves.sensitivity_db.size())
        return {};
    std::vector<double> sum = curves.plant_db;
    std::transform(sum.begin(), sum.end(), curves.sensitivity_db.begin(), sum.begin(),
                   std::plus<>());
    return sum;
}

} // namespace

SensitivityPane::SensitivityPane(ViewState& state, QWidget* parent)
    : FrequencyPane(state, linearAxis(QStringLiteral("dB")), parent) {
    setAccessibleName(title());
    setRanges({ranges().x, {-60.0, 20.0}});
}

std::array<SensitivityPane::Member, 4> SensitivityPane::members() {
    return {{{disturbanceDecibels, ColourRole::graphite, thin_width, QStringLiteral("PS")},
             {[](const LoopCurves& curves) { return curves.control_effort_db; },
              ColourRole::graphite, main_width, QStringLiteral("CS")},
             {[](const LoopCurves& curves) { return curves.complementary_db; }, ColourRole::accent,
              main_width, QStringLiteral("T")},
             {[](const LoopCurves& curves) { return curves.sensitivity_db; }, ColourRole::ink,
              main_width, QStringLiteral("S")}}};
}

void SensitivityPane::contentChanged() {
    const QColor ink = theme().colour(ColourRole::ink);
    std::vector<LegendWidget::Entry> entries{{tr("design loop"), curvePen(ink, main_width)}};
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown != nullptr && shown->realised)
        entries.push_back({tr("realised loop"), curvePen(ink, main_width, Qt::DashLine)});
    if (content().assessment && content().assessment->cases.size() > 1)
        entries.push_back(
            {tr("other cases"), curvePen(theme().faint(ColourRole::ink, faint_case))});
    legend().setEntries(std::move(entries));
}

std::optional<AxisRange> SensitivityPane::fittedVertical(const AxisRange& frequencies) const {
    std::vector<double> values{-20.0, 10.0};
    for (const CaseAssessment& item : content().assessment->cases)
        for (const Member& member : members())
            for (const double db : within(item.design.curves.w_rad_s,
                                          member.decibels(item.design.curves), frequencies))
                values.push_back(std::clamp(db, useful_db.low, useful_db.high));
    for (const Requirement& requirement : project()->requirements)
        if (requirement.at_most && limitedFrequencies(requirement))
            values.push_back(std::clamp(*requirement.at_most, useful_db.low, useful_db.high));
    return rangeOf(values, 0.04, 1.0);
}

void SensitivityPane::drawLoop(QPainter& painter, const LoopCurves& curves, double share,
                               Qt::PenStyle style, double width) const {
    for (const Member& member : members())
        drawFunction(
            painter,
            curvePen(theme().faint(member.colour, share), std::min(width, member.width), style),
            curves.w_rad_s, member.decibels(curves), mapX(), mapY());
}

void SensitivityPane::drawCurves(QPainter& painter) {
    if (!content().assessment)
        return;
    const auto& cases = content().assessment->cases;
    const auto worst =
        worstCases(*content().assessment, {Measure::sensitivity_peak, Measure::complementary_peak,
                                           Measure::control_effort_peak,
                                           Measure::disturbance_rejection, Measure::roll_off});
    for (std::size_t i = 0; i < cases.size(); ++i)
        if (i != viewState().shownCase() && !isHidden(i))
            drawLoop(painter, cases[i].design.curves, worst.contains(i) ? 1.0 : faint_case,
                     Qt::SolidLine, thin_width);
    if (const CaseAssessment* trial = shownCase(content().trial))
        drawLoop(painter, trial->design.curves, 0.7, Qt::DashDotLine, thin_width);
    if (const CaseAssessment* ghost = shownCase(content().ghost))
        drawLoop(painter, ghost->design.curves, 0.45, Qt::SolidLine, thin_width);
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr)
        return;
    drawLoop(painter, shown->design.curves, 1.0, Qt::SolidLine, main_width);
    if (shown->realised)
        drawLoop(painter, shown->realised->curves, 1.0, Qt::DashLine, main_width);
}

std::optional<AxisRange> SensitivityPane::limitedFrequencies(const Requirement& requirement) const {
    const AxisRange all = ranges().x;
    switch (requirement.measure) {
    case Measure::sensitivity_peak:
    case Measure::complementary_peak:
    case Measure::control_effort_peak:
        return all;
    case Measure::disturbance_rejection:
        return AxisRange{all.low, requirement.up_to_rad_s};
    case Measure::roll_off:
        return AxisRange{requirement.from_rad_s, all.high};
    default:
        return std::nullopt;
    }
}

std::vector<Handle> SensitivityPane::makeHandles() const {
    std::vector<Handle> handles;
    if (project() == nullptr || shownCase(content().assessment) == nullptr)
        return handles;
    constexpr double reach = 9.0;
    const QRectF area = plotArea();
    for (std::size_t i = 0; i < project()->requirements.size(); ++i) {
        const Requirement& requirement = project()->requirements[i];
        const auto over = limitedFrequencies(requirement);
        if (!over || !requirement.at_most)
            continue;
        const double left = std::clamp(mapX().toPixel(over->low), area.left(), area.right());
        const double right = std::clamp(mapX().toPixel(over->high), area.left(), area.right());
        const double y = mapY().toPixel(*requirement.at_most);
        if (right - left < 1.0 || y < area.top() || y > area.bottom())
            continue;
        Handle handle;
        handle.id = {HandleKind::limit, i, SectionPart::corner, 0};
        handle.at = {0.5 * (left + right), y};
        handle.area = QRectF(left, y - reach, right - left, 2.0 * reach);
        handle.name = tr("limit of %1").arg(insideSentence(measureText(requirement.measure)));
        handle.cursor = Qt::SizeVerCursor;
        handles.push_back(std::move(handle));
    }
    return handles;
}

std::optional<Project> SensitivityPane::dragged(const HandleId& handle, const DragMotion& motion,
                                                const Project& start) const {
    const auto limit = upperLimit(start, handle);
    if (!limit)
        return std::nullopt;
    const double travel = mapY().toValue(motion.to.y()) - mapY().toValue(motion.from.y());
    return withUpperLimit(start, handle, *limit + travel);
}

std::optional<Project> SensitivityPane::nudged(const HandleId& handle, const QPointF& direction,
                                               double share, const Project& start) const {
    constexpr double db_of_share = 10.0; // 1 % moves by a tenth of a decibel
    const auto limit = upperLimit(start, handle);
    if (!limit || direction.y() == 0.0)
        return std::nullopt;
    return withUpperLimit(start, handle, *limit + db_of_share * share * direction.y());
}

void SensitivityPane::drawNames(QPainter& painter, const LoopCurves& curves,
                                LabelPlacer& placer) const {
    const QRectF area = plotArea();
    for (const Member& member : members()) {
        const std::vector<double> decibels = member.decibels(curves);
        const LabelStyle style{theme().colour(member.colour), fontOf(FontRole::strong),
                               LabelGround::pane};
        const QSizeF room = labelSize(member.name, style.font);
        // At the first place from the left where the curve is inside, leaving the edge free.
        for (const double share : {0.06, 0.14, 0.9, 0.8, 0.5}) {
            const double x = area.left() + share * area.width();
            const auto db = interpolateOnLog(curves.w_rad_s, decibels, mapX().toValue(x));
            if (!db)
                continue;
            const double y = mapY().toPixel(*db);
            if (y < area.top() + room.height() || y > area.bottom() - room.height())
                continue;
            drawLabel(painter,
                      placer.place(room, {QPointF(x, y - room.height() - 1.0), QPointF(x, y + 1.0),
                                          QPointF(x + 24.0, y - room.height() - 1.0)}),
                      member.name, style, theme());
            break;
        }
    }
}

void SensitivityPane::drawFollowed(QPainter& painter, const CaseAssessment& shown,
                                   LabelPlacer& placer) const {
    const Assessment& assessment = *content().assessment;
    const Judgement* judgement = followedJudgement(viewState(), assessment);
    if (judgement == nullptr || !judgement->at_rad_s.is_value())
        return;
    std::vector<double> LoopCurves::*curve = nullptr;
    switch (followedMeasure(viewState(), assessment)) {
    case Measure::sensitivity_peak:
    case Measure::disturbance_rejection:
        curve = &LoopCurves::sensitivity_db;
        break;
    case Measure::complementary_peak:
    case Measure::roll_off:
    case Measure::bandwidth:
        curve = &LoopCurves::complementary_db;
        break;
    case Measure::control_effort_peak:
        curve = &LoopCurves::control_effort_db;
        break;
    default:
        return;
    }
    const LoopAssessment* loop = loopOf(shown, judgement->loop);
    const double w = judgement->at_rad_s.value();
    const auto db = loop != nullptr ? interpolateOnLog(loop->curves.w_rad_s, loop->curves.*curve, w)
                                    : std::nullopt;
    if (!db)
        return;
    const QPointF at(mapX().toPixel(w), mapY().toPixel(*db));
    if (plotArea().contains(at))
        drawFollowedPlace(painter, at, viewState(), assessment, placer, theme());
}

QString SensitivityPane::readings(const CaseAssessment& shown, double w_rad_s) const {
    QString text;
    const auto members = SensitivityPane::members();
    for (auto member = members.rbegin(); member != members.rend(); ++member)
        if (const auto value = interpolateOnLog(shown.design.curves.w_rad_s,
                                                member->decibels(shown.design.curves), w_rad_s))
            text += QStringLiteral("   ") + member->name + QLatin1Char(' ') + decibelText(*value);
    return text;
}

void SensitivityPane::drawMarks(QPainter& painter) {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr) {
        drawCursor(painter, {});
        return;
    }
    LabelPlacer placer(plotArea());
    for (const Handle& handle : handles())
        drawLimitLine(painter, handle, isHighlighted(handle.id),
                      limitTextOf(*content().assessment, shown->name,
                                  project()->requirements[handle.id.index],
                                  viewState().showsHertz()),
                      placer, theme());
    drawNames(painter, shown->design.curves, placer);
    drawFollowed(painter, *shown, placer);
    const auto w = viewState().cursorRadS();
    drawCursor(painter, w ? readings(*shown, *w) : QString());
}

QString SensitivityPane::csv() const {
    CsvTable table({tr("case"), tr("loop"), QStringLiteral("frequency_rad_s"),
                    QStringLiteral("S_db"), QStringLiteral("T_db"), QStringLiteral("CS_db"),
                    QStringLiteral("PS_db")});
    if (!content().assessment)
        return table.text();
    const auto add = [&](const CaseAssessment& item, const LoopCurves& curves,
                         const QString& loop) {
        const std::vector<double> disturbance = disturbanceDecibels(curves);
        for (std::size_t i = 0; i < disturbance.size(); ++i)
            table.addRow({QString::fromStdString(item.name), loop},
                         {curves.w_rad_s[i], curves.sensitivity_db[i], curves.complementary_db[i],
                          curves.control_effort_db[i], disturbance[i]});
    };
    for (const CaseAssessment& item : content().assessment->cases) {
        add(item, item.design.curves, QStringLiteral("design"));
        if (item.realised)
            add(item, item.realised->curves, QStringLiteral("realised"));
    }
    return table.text();
}

} // namespace cornerwright
