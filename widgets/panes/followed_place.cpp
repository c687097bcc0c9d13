#include "widgets/panes/followed_place.h"

#include "widgets/figure_text.h"
#include "widgets/view_state.h"

#include <QCoreApplication>

namespace cornerwright {

namespace {

class FollowedPlace {
    Q_DECLARE_TR_FUNCTIONS(FollowedPlace)
};

} // namespace

const Judgement* followedJudgement(const ViewState& viewState, const Assessment& assessment) {
    const auto& followed = viewState.followed();
    const auto& requirements = assessment.verdict.requirements;
    if (!followed || followed->case_index != viewState.shownCase() ||
        followed->requirement >= requirements.size() ||
        followed->case_index >= assessment.cases.size())
        return nullptr;
    const std::string& name = assessment.cases[followed->case_index].name;
    for (const Judgement& judgement : requirements[followed->requirement].all)
        if (judgement.case_name == name && judgement.loop == followed->loop)
            return &judgement;
    return nullptr;
}

Measure followedMeasure(const ViewState& viewState, const Assessment& assessment) {
    return assessment.verdict.requirements[viewState.followed()->requirement].requirement.measure;
}

const LoopAssessment* loopOf(const CaseAssessment& shown, LoopName loop) {
    if (loop == LoopName::design)
        return &shown.design;
    return shown.realised ? &*shown.realised : nullptr;
}

void drawFollowedPlace(QPainter& painter, const QPointF& at, const ViewState& viewState,
                       const Assessment& assessment, LabelPlacer& placer, const Theme& theme,
                       RingName name) {
    const Judgement* judgement = followedJudgement(viewState, assessment);
    if (judgement == nullptr)
        return;
    const Requirement& requirement =
        assessment.verdict.requirements[viewState.followed()->requirement].requirement;
    const bool hertz = viewState.showsHertz();
    const double radius = 1.6 * handleSize();
    painter.setPen(QPen(theme.colour(ColourRole::accent), 2.5));
    painter.setBrush(Qt::NoBrush);
    painter.drawEllipse(at, radius, radius);
    if (name == RingName::left_out)
        return;
    const QString loop = judgement->loop == LoopName::realised ? FollowedPlace::tr("realised loop")
                                                               : FollowedPlace::tr("design loop");
    const QString text = markOf(judgement->state) + QLatin1Char(' ') +
                         insideSentence(requirementText(requirement, hertz)) + QLatin1Char(' ') +
                         figureText(judgement->value, unit_of(requirement.measure), hertz) +
                         QStringLiteral(", ") + loop;
    const LabelStyle style{theme.state(judgement->state), fontOf(FontRole::strong),
                           LabelGround::tinted};
    const QSizeF room = labelSize(text, style.font);
    const double gap = radius + 4.0;
    drawLabel(painter,
              placer.place(room, {at + QPointF(gap, gap), at + QPointF(-gap - room.width(), gap),
                                  at + QPointF(gap, -gap - room.height()),
                                  at + QPointF(-gap - room.width(), -gap - room.height()),
                                  at + QPointF(gap, 3.0 * gap)}),
              text, style, theme);
}

} // namespace cornerwright
