#include "widgets/panes/limit_lines.h"

#include "widgets/figure_text.h"
#include "widgets/panes/margin_marks.h"

namespace cornerwright {

std::optional<double> upperLimit(const Project& project, const HandleId& handle) {
    if (handle.kind != HandleKind::limit || handle.index >= project.requirements.size())
        return std::nullopt;
    return project.requirements[handle.index].at_most;
}

std::optional<Project> withUpperLimit(const Project& project, const HandleId& handle,
                                      double limit) {
    if (!upperLimit(project, handle))
        return std::nullopt;
    Project changed = project;
    changed.requirements[handle.index].at_most = limit;
    return changed;
}

LimitText limitTextOf(const Assessment& assessment, const std::string& caseName,
                      const Requirement& requirement, bool hertz) {
    const State state = stateOf(assessment.verdict, requirement.measure, caseName, LoopName::design)
                            .value_or(State::undetermined);
    return {state, markOf(state) + QLatin1Char(' ') +
                       insideSentence(requirementText(requirement, hertz)) + QLatin1Char(' ') +
                       limitText(requirement, hertz)};
}

void drawLimitLine(QPainter& painter, const Handle& handle, bool isStrong, const LimitText& text,
                   LabelPlacer& placer, const Theme& theme) {
    const QColor colour = theme.state(text.state);
    painter.setPen(QPen(colour, isStrong ? 3.0 : 1.5));
    painter.drawLine(QPointF(handle.area.left(), handle.at.y()),
                     QPointF(handle.area.right(), handle.at.y()));
    const LabelStyle style{colour, fontOf(FontRole::small), LabelGround::pane};
    const QSizeF room = labelSize(text.text, style.font);
    const double left = handle.area.left() + 4.0;
    const double right = handle.area.right() - room.width() - 4.0;
    const double above = handle.at.y() - room.height() - 2.0;
    const double below = handle.at.y() + 2.0;
    drawLabel(painter,
              placer.place(room, {QPointF(right, above), QPointF(right, below),
                                  QPointF(left, above), QPointF(left, below)}),
              text.text, style, theme);
}

} // namespace cornerwright
