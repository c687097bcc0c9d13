#include "widgets/panes/margin_label.h"

#include "widgets/figure_text.h"

#include <QCoreApplication>

namespace cornerwright {

namespace {

const Figure& figureOf(const MarginMark& mark, const MarkedLoop& loop) {
    const FrequencyFigures& figures = loop.assessment->figures.frequency;
    switch (mark.measure) {
    case Measure::gain_margin:
        return figures.gain_margin_db;
    case Measure::gain_reduction_margin:
        return figures.gain_reduction_margin_db;
    default:
        return figures.phase_margin_deg;
    }
}

} // namespace

QColor marginColour(const MarginMark& mark, const MarkedLoop& loop, const Assessment& assessment,
                    const CaseAssessment& shown, const Theme& theme) {
    if (!mark.decides)
        return theme.colour(ColourRole::muted);
    const auto state = stateOf(assessment.verdict, mark.measure, shown.name, loop.loop);
    return state ? theme.state(*state) : theme.colour(ColourRole::ink);
}

MarginLabel marginLabel(const MarginMark& mark, const MarkedLoop& loop,
                        const Assessment& assessment, const CaseAssessment& shown,
                        const Theme& theme, bool hertz) {
    const auto state = stateOf(assessment.verdict, mark.measure, shown.name, loop.loop);
    QString text = insideSentence(measureText(mark.measure)) + QLatin1Char(' ') +
                   figureText(figureOf(mark, loop), unit_of(mark.measure), hertz);
    if (loop.loop == LoopName::realised)
        text += QLatin1Char(' ') + QCoreApplication::translate("MarginLabel", "realised");
    if (state)
        text = markOf(*state) + QLatin1Char(' ') + text + QStringLiteral(" · ") + stateText(*state);
    return {text,
            {marginColour(mark, loop, assessment, shown, theme), fontOf(FontRole::strong),
             state == State::unmet ? LabelGround::tinted : LabelGround::pane}};
}

} // namespace cornerwright
