#include "widgets/panes/step_pane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/axis_styles.h"
#include "widgets/panes/case_choice.h"
#include "widgets/panes/csv_table.h"
#include "widgets/panes/followed_place.h"
#include "widgets/panes/legend_widget.h"
#include "widgets/panes/margin_marks.h"
#include "widgets/panes/painting.h"
#include "widgets/view_state.h"

#include <QAction>
#include <QActionGroup>

#include <algorithm>
#include <array>
#include <cmath>

namespace cornerwright {

namespace {

constexpr double main_width = 1.5;
constexpr double faint_loop = 0.26;
constexpr double least_overshoot_percent = 0.1;
constexpr double least_time_s = 1e-9;

} // namespace

StepPane::StepPane(ViewState& state, QWidget* parent) : PlotPane(state, parent) {
    setAccessibleName(title());
    setAxes(timeAxis(), linearAxis({}));
    auto* group = new QActionGroup(this);
    const std::array<std::pair<Signal, QString>, 3> signalNames{
        {{Signal::output, tr("output y")},
         {Signal::control, tr("control u")},
         {Signal::disturbance, tr("disturbance")}}};
    for (const auto& [signal, name] : signalNames) {
        QAction* action = addPaneAction(name, [this, signal = signal] { showSignal(signal); });
        action->setCheckable(true);
        action->setChecked(signal == signal_);
        group->addAction(action);
        legend().addSwitch(action);
    }
}

void StepPane::showSignal(Signal signal) {
    signal_ = signal;
    fit();
}

void StepPane::contentChanged() {
    const QColor ink = theme().colour(ColourRole::ink);
    std::vector<LegendWidget::Entry> entries{{tr("design"), curvePen(ink, main_width)}};
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown != nullptr && shown->realised)
        entries.push_back({tr("realised"), curvePen(ink, main_width, Qt::DashLine)});
    legend().setEntries(std::move(entries));
}

const std::vector<double>& StepPane::signalOf(const StepCurves& curves) const {
    switch (signal_) {
    case Signal::control:
        return curves.u;
    case Signal::disturbance:
        return curves.y_disturbance;
    case Signal::output:
        break;
    }
    return curves.y;
}

std::optional<double> StepPane::finalValue() const {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr)
        return std::nullopt;
    const Figure& error = shown->design.figures.steady_state_error.step;
    return error.is_value() ? std::optional(1.0 - error.value()) : std::nullopt;
}

void StepPane::addLimits(std::vector<double>& values, double& end) const {
    constexpr double farthest_percent = 100.0;
    constexpr double farthest_time = 3.0; // times what the curves need
    const auto final = finalValue();
    if (project() == nullptr || signal_ != Signal::output || !final)
        return;
    const double endOfCurves = end;
    for (const Requirement& requirement : project()->requirements) {
        if (!requirement.at_most)
            continue;
        if (requirement.measure == Measure::overshoot && *requirement.at_most < farthest_percent)
            values.push_back(*final * (1.0 + *requirement.at_most / 100.0));
        if (requirement.measure == Measure::settling_time &&
            *requirement.at_most < farthest_time * endOfCurves)
            end = std::max(end, 1.05 * *requirement.at_most);
    }
}

std::optional<PlotRanges> StepPane::fittedRanges() const {
    if (!content().assessment)
        return std::nullopt;
    double end = 0.0;
    std::vector<double> values{0.0};
    for (std::size_t i = 0; i < content().assessment->cases.size(); ++i) {
        const StepCurves& step = content().assessment->cases[i].design.step;
        if (isHidden(i) || step.t_s.empty())
            continue;
        end = std::max(end, step.t_s.back());
        const auto& values_of_case = signalOf(step);
        values.insert(values.end(), values_of_case.begin(), values_of_case.end());
    }
    if (end <= 0.0)
        return std::nullopt;
    addLimits(values, end);
    return PlotRanges{{0.0, end}, *rangeOf(values, 0.08, 1e-12)};
}

void StepPane::drawCurves(QPainter& painter) {
    if (!content().assessment)
        return;
    const auto draw = [&](const StepCurves& step, const QPen& pen) {
        drawFunction(painter, pen, step.t_s, signalOf(step), mapX(), mapY());
    };
    const auto& cases = content().assessment->cases;
    const auto worst = worstHere();
    for (std::size_t i = 0; i < cases.size(); ++i)
        if (i != viewState().shownCase() && !isHidden(i))
            draw(cases[i].design.step,
                 curvePen(theme().faint(ColourRole::ink, worst.contains(i) ? 1.0 : faint_loop)));
    if (const CaseAssessment* trial = shownCase(content().trial))
        draw(trial->design.step,
             curvePen(theme().colour(ColourRole::accent), 1.0, Qt::DashDotLine));
    if (const CaseAssessment* ghost = shownCase(content().ghost))
        draw(ghost->design.step, curvePen(theme().faint(ColourRole::muted, 0.7)));
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr)
        return;
    const QColor ink = theme().colour(ColourRole::ink);
    draw(shown->design.step, curvePen(ink, main_width));
    if (shown->realised)
        draw(shown->realised->step, curvePen(ink, main_width, Qt::DashLine));
}

std::set<std::size_t> StepPane::worstHere() const {
    switch (signal_) {
    case Signal::control:
        return worstCases(*content().assessment, {Measure::control_peak});
    case Signal::disturbance:
        return worstCases(*content().assessment, {Measure::disturbance_peak});
    case Signal::output:
        break;
    }
    return worstCases(*content().assessment, {Measure::overshoot, Measure::settling_time,
                                              Measure::rise_time, Measure::peak_time});
}

std::vector<Handle> StepPane::makeHandles() const {
    std::vector<Handle> handles;
    const auto end = finalValue();
    if (signal_ != Signal::output || project() == nullptr || !end)
        return handles;
    const QRectF area = plotArea();
    for (std::size_t i = 0; i < project()->requirements.size(); ++i) {
        const Requirement& requirement = project()->requirements[i];
        if (!requirement.at_most)
            continue;
        Handle handle;
        handle.id = {HandleKind::limit, i, SectionPart::corner, 0};
        handle.name = tr("limit of %1").arg(insideSentence(measureText(requirement.measure)));
        if (requirement.measure == Measure::overshoot) {
            const double y = mapY().toPixel(*end * (1.0 + *requirement.at_most / 100.0));
            handle.at = {area.left() + 0.75 * area.width(), y};
            handle.area = QRectF(area.left(), y - 9.0, area.width(), 18.0);
            handle.cursor = Qt::SizeVerCursor;
        } else if (requirement.measure == Measure::settling_time) {
            handle.at = {mapX().toPixel(*requirement.at_most), mapY().toPixel(*end)};
            handle.area = touchArea(handle.at, 14.0);
            handle.cursor = Qt::SizeHorCursor;
        } else {
            continue;
        }
        if (area.contains(handle.at))
            handles.push_back(std::move(handle));
    }
    return handles;
}

std::optional<Project> StepPane::dragged(const HandleId& handle, const DragMotion& motion,
                                         const Project& start) const {
    const auto end = finalValue();
    if (handle.index >= start.requirements.size() || !end || *end == 0.0)
        return std::nullopt;
    Project changed = start;
    Requirement& requirement = changed.requirements[handle.index];
    if (!requirement.at_most)
        return std::nullopt;
    if (requirement.measure == Measure::overshoot) {
        const double travel = mapY().toValue(motion.to.y()) - mapY().toValue(motion.from.y());
        requirement.at_most =
            std::max(least_overshoot_percent, *requirement.at_most + 100.0 * travel / *end);
    } else {
        const double travel = mapX().toValue(motion.to.x()) - mapX().toValue(motion.from.x());
        requirement.at_most = std::max(least_time_s, *requirement.at_most + travel);
    }
    return changed;
}

std::optional<Project> StepPane::nudged(const HandleId& handle, const QPointF& direction,
                                        double share, const Project& start) const {
    if (handle.index >= start.requirements.size() || !start.requirements[handle.index].at_most)
        return std::nullopt;
    Project changed = start;
    *changed.requirements[handle.index].at_most *=
        std::pow(1.0 + share, direction.x() + direction.y());
    return changed;
}

void StepPane::drawMarks(QPainter& painter) {
    drawNote(painter);
    const CaseAssessment* shown = shownCase(content().assessment);
    LabelPlacer placer(plotArea());
    for (const Handle& handle : handles()) {
        const Requirement& requirement = project()->requirements[handle.id.index];
        const auto state = stateOf(content().assessment->verdict, requirement.measure, shown->name,
                                   LoopName::design);
        const QColor colour = theme().state(state.value_or(State::undetermined));
        const double width = isHighlighted(handle.id) ? 3.0 : 1.5;
        painter.setPen(QPen(colour, width));
        const bool isOvershoot = requirement.measure == Measure::overshoot;
        if (isOvershoot)
            painter.drawLine(QPointF(plotArea().left(), handle.at.y()),
                             QPointF(plotArea().right(), handle.at.y()));
        else
            painter.drawLine(handle.at - QPointF(0.0, 12.0), handle.at + QPointF(0.0, 12.0));
        painter.setBrush(colour);
        const QSizeF knob = isOvershoot ? QSizeF(20.0, 7.0) : QSizeF(7.0, 14.0);
        painter.drawRoundedRect(
            QRectF(handle.at - QPointF(0.5 * knob.width(), 0.5 * knob.height()), knob), 3.5, 3.5);
        const QString text =
            markOf(state.value_or(State::undetermined)) + QLatin1Char(' ') +
            insideSentence(requirementText(requirement, viewState().showsHertz())) +
            QLatin1Char(' ') + limitText(requirement, viewState().showsHertz());
        const LabelStyle style{colour, fontOf(FontRole::strong), LabelGround::pane};
        const QSizeF room = labelSize(text, style.font);
        drawLabel(
            painter,
            placer.place(room, {handle.at + QPointF(-0.5 * room.width(), -16.0 - room.height()),
                                handle.at + QPointF(-0.5 * room.width(), 16.0)}),
            text, style, theme());
    }
    if (shown != nullptr)
        drawFollowed(painter, placer);
    drawReading(painter);
}

void StepPane::drawFollowed(QPainter& painter, LabelPlacer& placer) const {
    const Assessment& assessment = *content().assessment;
    const Judgement* judgement = followedJudgement(viewState(), assessment);
    if (judgement == nullptr || signal_ != Signal::output)
        return;
    const LoopAssessment* loop = loopOf(*shownCase(content().assessment), judgement->loop);
    if (loop == nullptr)
        return;
    const Measure measure = followedMeasure(viewState(), assessment);
    const Figure& at =
        measure == Measure::overshoot ? loop->figures.time.peak_time_s : judgement->value;
    const bool isTime = measure == Measure::overshoot || measure == Measure::settling_time ||
                        measure == Measure::peak_time;
    if (!isTime || !at.is_value())
        return;
    const auto y = valueAt(loop->step, at.value());
    if (!y)
        return;
    const QPointF place(mapX().toPixel(at.value()), mapY().toPixel(*y));
    if (plotArea().contains(place))
        drawFollowedPlace(painter, place, viewState(), assessment, placer, theme());
}

std::optional<double> StepPane::valueAt(const StepCurves& step, double t_s) const {
    const auto& values = signalOf(step);
    const auto above = std::upper_bound(step.t_s.begin(), step.t_s.end(), t_s);
    if (above == step.t_s.begin() || above == step.t_s.end() || values.size() != step.t_s.size())
        return std::nullopt;
    const auto i = static_cast<std::size_t>(above - step.t_s.begin());
    const double share = (t_s - step.t_s[i - 1]) / (step.t_s[i] - step.t_s[i - 1]);
    return std::lerp(values[i - 1], values[i], share);
}

void StepPane::drawNote(QPainter& painter) const {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (shown == nullptr)
        return;
    QString text = QString::fromStdString(shown->design.step.note);
    if (shown->design.figures.stability.stable == false)
        text = markOf(State::unmet) + QLatin1Char(' ') + tr("design loop unstable");
    if (text.isEmpty())
        return;
    const LabelStyle style{theme().colour(ColourRole::muted), fontOf(FontRole::small),
                           LabelGround::pane};
    const QRectF area = plotArea();
    painter.setFont(style.font);
    painter.setPen(style.colour);
    painter.drawText(area.adjusted(6.0, 6.0, -6.0, -6.0),
                     Qt::AlignRight | Qt::AlignBottom | Qt::TextWordWrap, text);
}

void StepPane::mouseAt(const QPointF& pixel) {
    cursor_ = plotArea().contains(pixel) ? std::optional(mapX().toValue(pixel.x())) : std::nullopt;
    redrawMarks();
}

void StepPane::mouseLeft() {
    cursor_.reset();
}

void StepPane::drawReading(QPainter& painter) const {
    const CaseAssessment* shown = shownCase(content().assessment);
    if (!cursor_ || shown == nullptr || isExporting())
        return;
    const QRectF area = plotArea();
    const double x = mapX().toPixel(*cursor_);
    painter.setPen(QPen(theme().colour(ColourRole::accent), 1.0));
    painter.drawLine(QPointF(x, area.top()), QPointF(x, area.bottom()));
    QString text = timeText(*cursor_);
    if (const auto value = valueAt(shown->design.step, *cursor_))
        text += QStringLiteral("   ") + tr("design") + QLatin1Char(' ') + numberText(*value);
    if (shown->realised)
        if (const auto value = valueAt(shown->realised->step, *cursor_))
            text += QStringLiteral("   ") + tr("realised") + QLatin1Char(' ') + numberText(*value);
    const LabelStyle style{theme().colour(ColourRole::ink), fontOf(FontRole::small),
                           LabelGround::pane};
    const QSizeF room = labelSize(text, style.font);
    drawLabel(painter, QRectF(QPointF(area.left() + 4.0, area.top() + 4.0), room), text, style,
              theme());
}

QString StepPane::csv() const {
    CsvTable table({tr("case"), tr("loop"), QStringLiteral("time_s"), QStringLiteral("y"),
                    QStringLiteral("u"), QStringLiteral("y_disturbance")});
    if (!content().assessment)
        return table.text();
    const auto add = [&](const CaseAssessment& item, const StepCurves& step, const QString& loop) {
        const std::size_t count =
            std::min({step.t_s.size(), step.y.size(), step.u.size(), step.y_disturbance.size()});
        for (std::size_t i = 0; i < count; ++i)
            table.addRow({QString::fromStdString(item.name), loop},
                         {step.t_s[i], step.y[i], step.u[i], step.y_disturbance[i]});
    };
    for (const CaseAssessment& item : content().assessment->cases) {
        add(item, item.design.step, QStringLiteral("design"));
        if (item.realised)
            add(item, item.realised->step, QStringLiteral("realised"));
    }
    return table.text();
}

} // namespace cornerwright
