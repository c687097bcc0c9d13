// What a magnitude or phase pane paints above its curves.

#include "widgets/figure_text.h"
#include "widgets/panes/bode_pane.h"
#include "widgets/panes/followed_place.h"
#include "widgets/panes/margin_label.h"
#include "widgets/panes/painting.h"
#include "widgets/panes/uphill_marks.h"
#include "widgets/view_state.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

void BodePane::drawGrip(QPainter& painter, std::size_t index, const Handle& grip,
                        const std::vector<Handle>& all) const {
    const QColor colour = theme().section(index);
    const bool isStrong = isHighlighted(grip.id) || viewState().selectedSection() == index;
    painter.setPen(curvePen(colour, 1.0, Qt::DotLine));
    for (const Handle& corner : all)
        if (corner.id.index == index && corner.id.kind == grip.id.kind &&
            corner.id.part != SectionPart::grip)
            painter.drawLine(QPointF(corner.at.x(), grip.at.y()), corner.at);
    const QRectF bar = grip.area.adjusted(4.0, 9.0, -4.0, -9.0);
    painter.setPen(QPen(colour, isStrong ? 2.5 : 1.5));
    painter.drawLine(QPointF(bar.left(), grip.at.y()), QPointF(bar.right(), grip.at.y()));
    const double half = 0.7 * handleSize();
    const double length = std::min(2.2 * half, 0.5 * bar.width());
    painter.setPen(QPen(theme().colour(ColourRole::ink), 1.0));
    painter.setBrush(colour);
    painter.drawRoundedRect(
        QRectF(grip.at.x() - length, grip.at.y() - 0.7 * half, 2.0 * length, 1.4 * half),
        0.7 * half, 0.7 * half);
}

void BodePane::drawHandles(QPainter& painter, LabelPlacer& placer) const {
    const std::vector<Handle>& all = handles();
    const double size = handleSize();
    const QColor line = theme().colour(ColourRole::ink);
    const Chain& chain = project()->compensator;
    for (const Handle& handle : all)
        if (handle.id.kind == HandleKind::section_part && handle.id.part == SectionPart::grip &&
            handle.id.index < chain.size())
            drawGrip(painter, handle.id.index, handle, all);
    for (const Handle& handle : all) {
        if (handle.id.kind != HandleKind::section_part || handle.id.part == SectionPart::grip ||
            handle.id.index >= chain.size())
            continue;
        const auto corners = cornersOf(chain[handle.id.index]);
        const auto corner =
            std::find_if(corners.begin(), corners.end(),
                         [&](const SectionCorner& c) { return c.part == handle.id.part; });
        if (corner == corners.end())
            continue;
        const QColor fill = theme().section(handle.id.index);
        const double grown = isHovered(handle.id) ? 1.25 * size : size;
        if (isSelected(handle.id)) {
            painter.setPen(QPen(theme().colour(ColourRole::accent), 2.0));
            painter.setBrush(Qt::NoBrush);
            painter.drawEllipse(handle.at, 1.9 * size, 1.9 * size);
        }
        const bool up = corner->has_zero;
        if (!corner->complex_pair) {
            drawTriangle(painter, handle.at, grown, up, fill, line);
            continue;
        }
        // Two stacked: of a notch the zeros' above, the poles' below.
        const QPointF half(0.0, 0.85 * grown);
        const bool isNotch = corner->has_zero && corner->has_pole;
        drawTriangle(painter, handle.at - half, 0.85 * grown, up, fill, line);
        drawTriangle(painter, handle.at + half, 0.85 * grown, isNotch ? !up : up, fill, line);
    }
    for (const Handle& handle : all)
        if (handle.id.kind == HandleKind::section_part)
            drawUphillAside(painter, handle.at, size,
                            uphillOf(viewState().uphill(), chain, handle.id.index, handle.id.part),
                            theme());
    for (const Handle& handle : all)
        placer.block(touchArea(handle.at, size));
    for (const Handle& handle : all) {
        if (handle.id.kind != HandleKind::section_part || !isHighlighted(handle.id) ||
            handle.id.index >= chain.size())
            continue;
        const Section& section = chain[handle.id.index];
        const bool hertz = viewState().showsHertz();
        QString text = handle.name;
        const auto corners = cornersOf(section);
        for (const SectionCorner& corner : corners)
            if (corner.part == handle.id.part)
                text += QLatin1Char(' ') + frequencyText(corner.w_rad_s, hertz);
        if (handle.id.part == SectionPart::grip)
            text += QStringLiteral(" × ") + numberText(ratioOf(section));
        if (section.kind == SectionKind::notch)
            text += QStringLiteral(" · ") + decibelText(depthOf(section));
        const LabelStyle style{theme().sectionText(handle.id.index), fontOf(FontRole::strong),
                               LabelGround::pane};
        const QSizeF room = labelSize(text, style.font);
        const double gap = 1.6 * size;
        const QRectF place =
            placer.place(room, {handle.at + QPointF(-0.5 * room.width(), -gap - room.height()),
                                handle.at + QPointF(gap, -0.5 * room.height()),
                                handle.at + QPointF(-gap - room.width(), -0.5 * room.height()),
                                handle.at + QPointF(-0.5 * room.width(), gap)});
        drawLabel(painter, place, text, style, theme());
    }
}

void BodePane::drawLimits(QPainter& painter, LabelPlacer& placer) const {
    const auto& requirements = project()->requirements;
    for (const Handle& handle : handles()) {
        if (handle.id.kind != HandleKind::limit || handle.id.index >= requirements.size())
            continue;
        const bool isStrong = isHighlighted(handle.id);
        constexpr double half = 11.0;
        painter.setPen(QPen(theme().colour(ColourRole::ink), isStrong ? 3.0 : 1.5));
        painter.drawLine(handle.at - QPointF(half, 0.0), handle.at + QPointF(half, 0.0));
        if (!isStrong)
            continue;
        const QString text = limitText(requirements[handle.id.index], viewState().showsHertz());
        const LabelStyle style{theme().colour(ColourRole::ink), fontOf(FontRole::small),
                               LabelGround::pane};
        const QSizeF room = labelSize(text, style.font);
        drawLabel(
            painter,
            placer.place(room, {handle.at + QPointF(-half - room.width(), -0.5 * room.height()),
                                handle.at + QPointF(half, -0.5 * room.height())}),
            text, style, theme());
    }
}

void BodePane::drawReferenceLine(QPainter& painter, double value) const {
    const QRectF area = plotArea();
    const double y = mapY().toPixel(value);
    if (y < area.top() || y > area.bottom())
        return;
    painter.setPen(QPen(theme().faint(ColourRole::graphite, 0.75), 1.0));
    painter.drawLine(QPointF(area.left(), y), QPointF(area.right(), y));
}

void BodePane::drawCrossovers(QPainter& painter, const MarkedLoop& loop) const {
    const QRectF area = plotArea();
    const CaseAssessment* shown = shownCase(content().assessment);
    for (const MarginMark& mark : loop.marks) {
        const double x = mapX().toPixel(mark.w_rad_s);
        if (x < area.left() || x > area.right())
            continue;
        const auto state =
            stateOf(content().assessment->verdict, Measure::phase_margin, shown->name, loop.loop);
        const QColor colour =
            mark.decides && state ? theme().state(*state) : theme().colour(ColourRole::muted);
        painter.setPen(curvePen(colour, 1.0, Qt::DotLine));
        painter.drawLine(QPointF(x, area.top()), QPointF(x, area.bottom()));
    }
}

void BodePane::drawMargin(QPainter& painter, const MarginMark& mark, const MarkedLoop& loop,
                          LabelPlacer& placer) const {
    const QRectF area = plotArea();
    const double x = mapX().toPixel(mark.w_rad_s);
    if (x < area.left() || x > area.right())
        return;
    const auto bounded = [&](double y) { return std::clamp(y, area.top(), area.bottom()); };
    const double from = bounded(mapY().toPixel(mark.from));
    const double to = bounded(mapY().toPixel(mark.to));
    const CaseAssessment* shown = shownCase(content().assessment);
    painter.setPen(QPen(marginColour(mark, loop, *content().assessment, *shown, theme()),
                        mark.decides ? 3.0 : 1.5, Qt::SolidLine, Qt::FlatCap));
    painter.drawLine(QPointF(x, from), QPointF(x, to));
    if (!mark.decides)
        return;
    const MarginLabel label =
        marginLabel(mark, loop, *content().assessment, *shown, theme(), viewState().showsHertz());
    const QSizeF room = labelSize(label.text, label.style.font);
    const double middle = 0.5 * (from + to) - 0.5 * room.height();
    const QRectF place =
        placer.place(room, {QPointF(x + 8.0, middle), QPointF(x - 8.0 - room.width(), middle),
                            QPointF(x + 8.0, std::max(from, to) + 4.0),
                            QPointF(x + 8.0, std::min(from, to) - room.height() - 4.0),
                            QPointF(x - 8.0 - room.width(), std::max(from, to) + 4.0)});
    drawLabel(painter, place, label.text, label.style, theme());
}

void BodePane::drawFollowed(QPainter& painter, LabelPlacer& placer) const {
    const Assessment& assessment = *content().assessment;
    const Judgement* judgement = followedJudgement(viewState(), assessment);
    const CaseAssessment* shown = shownCase(content().assessment);
    if (judgement == nullptr || shown == nullptr || !judgement->at_rad_s.is_value())
        return;
    const LoopAssessment* loop = loopOf(*shown, judgement->loop);
    const double w = judgement->at_rad_s.value();
    const auto value = loop != nullptr
                           ? interpolateOnLog(loop->curves.w_rad_s, loop->curves.*loop_, w)
                           : std::nullopt;
    if (!value)
        return;
    const QPointF at(mapX().toPixel(w), mapY().toPixel(*value));
    if (plotArea().contains(at))
        drawFollowedPlace(painter, at, viewState(), assessment, placer, theme(),
                          marksMargin(followedMeasure(viewState(), assessment)) ? RingName::left_out
                                                                                : RingName::shown);
}

void BodePane::drawWorstNames(QPainter& painter, LabelPlacer& placer) const {
    const Assessment& assessment = *content().assessment;
    for (const RequirementResult& result : assessment.verdict.requirements) {
        if (!marksMargin(result.requirement.measure) || !result.worst.at_rad_s.is_value())
            continue;
        for (std::size_t i = 0; i < assessment.cases.size(); ++i) {
            const CaseAssessment& item = assessment.cases[i];
            if (item.name != result.worst.case_name || i == viewState().shownCase() || isHidden(i))
                continue;
            const double w = result.worst.at_rad_s.value();
            const auto value =
                interpolateOnLog(item.design.curves.w_rad_s, item.design.curves.*loop_, w);
            if (!value)
                continue;
            const QPointF at(mapX().toPixel(w), mapY().toPixel(*value));
            if (!plotArea().contains(at))
                continue;
            painter.setPen(Qt::NoPen);
            painter.setBrush(theme().state(result.worst.state));
            painter.drawEllipse(at, 3.5, 3.5);
            const QString text = QString::fromStdString(item.name) + QLatin1Char(' ') +
                                 figureText(result.worst.value, unit_of(result.requirement.measure),
                                            viewState().showsHertz());
            const LabelStyle style{theme().state(result.worst.state), fontOf(FontRole::small),
                                   LabelGround::pane};
            const QSizeF room = labelSize(text, style.font);
            drawLabel(
                painter,
                placer.place(room, {at + QPointF(8.0, 4.0), at + QPointF(-8.0 - room.width(), 4.0),
                                    at + QPointF(8.0, -4.0 - room.height()),
                                    at + QPointF(-8.0 - room.width(), -4.0 - room.height()),
                                    at + QPointF(8.0, 24.0)}),
                text, style, theme());
        }
    }
}

void BodePane::drawReadings(QPainter& painter) const {
    const auto w = viewState().cursorRadS();
    const CaseAssessment* shown = shownCase(content().assessment);
    if (!w)
        return;
    QString readings;
    const auto read = [&](const QString& name, const LoopCurves& curves, Curve curve) {
        if (const auto value = interpolateOnLog(curves.w_rad_s, curves.*curve, *w))
            readings += QStringLiteral("   ") + name + QLatin1Char(' ') +
                        (unit() == QLatin1String("db") ? decibelText(*value) : degreeText(*value));
    };
    if (shown != nullptr) {
        read(tr("loop"), shown->design.curves, loop_);
        if (shown->realised)
            read(tr("realised"), shown->realised->curves, loop_);
        read(tr("plant"), shown->design.curves, plant_);
    }
    drawCursor(painter, readings);
}

} // namespace cornerwright
