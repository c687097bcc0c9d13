#include "widgets/panes/margin_marks.h"

#include "widgets/plot_geometry.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

/// How small a margin is, for choosing between the loops; infinite where there is none.
double sizeOf(const Figure& figure) {
    return figure.is_determined() ? std::abs(figure.value()) : HUGE_VAL;
}

const LoopAssessment& markedOf(const CaseAssessment& shown, std::optional<LoopName> wanted,
                               Figure FrequencyFigures::*figure, LoopName& loop) {
    loop = LoopName::design;
    if (!shown.realised || wanted == LoopName::design)
        return shown.design;
    if (wanted == LoopName::realised) {
        loop = LoopName::realised;
        return *shown.realised;
    }
    const double design = sizeOf(shown.design.figures.frequency.*figure);
    const double realised = sizeOf(shown.realised->figures.frequency.*figure);
    if (design <= realised)
        return shown.design;
    loop = LoopName::realised;
    return *shown.realised;
}

bool isAt(const Figure& at, double w) {
    return at.is_value() && std::abs(at.value() - w) <= 1e-9 * w;
}

/// The odd multiple of 180 degrees from which the margin in (-180, 180] is counted.
double lineBelow(double phase_deg) {
    const double turns = std::ceil(phase_deg / 360.0) - 1.0;
    return 360.0 * turns + 180.0;
}

} // namespace

MarkedLoop phaseMargins(const CaseAssessment& shown, std::optional<LoopName> wanted) {
    MarkedLoop marked;
    const LoopAssessment& loop =
        markedOf(shown, wanted, &FrequencyFigures::phase_margin_deg, marked.loop);
    marked.assessment = &loop;
    const FrequencyFigures& figures = loop.figures.frequency;
    for (const double w : figures.crossovers_rad_s) {
        const auto phase = interpolateOnLog(loop.curves.w_rad_s, loop.curves.loop_phase_deg, w);
        if (!phase)
            continue;
        // phase = line + margin with -180 < margin <= 180.
        const double line = lineBelow(*phase);
        marked.marks.push_back(
            {w, line, *phase, isAt(figures.phase_margin_at_rad_s, w), Measure::phase_margin});
    }
    return marked;
}

MarkedLoop gainMargins(const CaseAssessment& shown, std::optional<LoopName> wanted) {
    MarkedLoop marked;
    const LoopAssessment& loop =
        markedOf(shown, wanted, &FrequencyFigures::gain_margin_db, marked.loop);
    marked.assessment = &loop;
    const FrequencyFigures& figures = loop.figures.frequency;
    for (const double w : figures.phase_crossings_rad_s) {
        const auto db = interpolateOnLog(loop.curves.w_rad_s, loop.curves.loop_db, w);
        if (!db)
            continue;
        const bool reduces = *db > 0.0;
        const Figure& at =
            reduces ? figures.gain_reduction_margin_at_rad_s : figures.gain_margin_at_rad_s;
        marked.marks.push_back({w, 0.0, *db, isAt(at, w),
                                reduces ? Measure::gain_reduction_margin : Measure::gain_margin});
    }
    return marked;
}

std::optional<State> stateOf(const Verdict& verdict, Measure measure, const std::string& caseName,
                             LoopName loop) {
    std::optional<State> worst;
    const auto isWorse = [](State a, State b) {
        return a == State::unmet || (a == State::undetermined && b == State::met);
    };
    for (const RequirementResult& result : verdict.requirements) {
        if (result.requirement.measure != measure)
            continue;
        for (const Judgement& judgement : result.all)
            if (judgement.case_name == caseName && judgement.loop == loop &&
                (!worst || isWorse(judgement.state, *worst)))
                worst = judgement.state;
    }
    return worst;
}

} // namespace cornerwright
