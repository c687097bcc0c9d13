#include "core/requirements/verdict.h"

#include "core/numerics/number_text.h"
#include "core/requirements/judged_figure.h"
#include "core/requirements/scale.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

void add_once(std::vector<double>& list, double value) {
    if (std::find(list.begin(), list.end(), value) == list.end())
        list.push_back(value);
}

/// The number that is held against the limits: margins and errors count by size.
double judged_size(const Requirement& requirement, const Figure& value) {
    switch (requirement.measure) {
    case Measure::phase_margin:
    case Measure::steady_state_error:
        return std::abs(value.value());
    default:
        return value.value();
    }
}

struct Distance {
    Figure headroom;
    Figure share;
};

Distance over_a_bit(const Figure& headroom, double limit, MeasureUnit unit) {
    return {headroom, Figure::of(headroom.value() / bit_of(limit, unit))};
}

/// Distance to the nearer limit.
Distance distance_of(const Requirement& requirement, double value) {
    const MeasureUnit unit = unit_of(requirement.measure);
    std::optional<Distance> nearer;
    if (requirement.at_least)
        nearer = over_a_bit(headroom_above(value, *requirement.at_least, unit),
                            *requirement.at_least, unit);
    if (requirement.at_most) {
        const Distance below = over_a_bit(headroom_below(value, *requirement.at_most, unit),
                                          *requirement.at_most, unit);
        if (!nearer || below.share.value() < nearer->share.value())
            nearer = below;
    }
    return nearer.value_or(Distance{Figure::infinite(), Figure::infinite()});
}

/// The standard deviation of a figure, carried into the scale of its headroom.
double deviation_of_headroom(const Figure& value, double size, MeasureUnit unit) {
    if (scale_of(unit) == ScaleKind::difference || size == 0.0)
        return value.standard_deviation();
    return value.standard_deviation() / size;
}

std::string deviation_reason(const Figure& value, MeasureUnit unit) {
    constexpr int digits = 2;
    std::string text = "met by less than two standard deviations of the measurement, " +
                       number_text(value.standard_deviation(), digits);
    if (unit != MeasureUnit::plain)
        text += " " + std::string(symbol_of(unit));
    return text + " each";
}

Judgement judge_loop(const Requirement& requirement, const FigureRequest& request,
                     const JudgedLoop& loop) {
    const JudgedFigure figure = judged_figure(requirement, request, *loop.figures);
    const Stability& stability = loop.figures->stability;
    Judgement judgement;
    judgement.case_name = loop.case_name;
    judgement.loop = loop.loop;
    judgement.value = figure.value;
    judgement.at_rad_s = figure.at_rad_s;
    if (stability.stable == false) {
        judgement.state = State::unmet;
        judgement.headroom = Figure::minus_infinite();
        judgement.share = Figure::minus_infinite();
        judgement.reason = "the loop is not stable";
        if (!stability.reason.empty())
            judgement.reason += ": " + stability.reason;
        return judgement;
    }
    if (!stability.stable || !figure.value.is_determined()) {
        judgement.reason = stability.stable
                               ? figure.value.reason()
                               : "stability could not be determined: " + stability.reason;
        judgement.headroom = Figure::undetermined(judgement.reason);
        judgement.share = judgement.headroom;
        return judgement;
    }
    const double size = judged_size(requirement, figure.value);
    const Distance distance = distance_of(requirement, size);
    judgement.headroom = distance.headroom;
    judgement.share = distance.share;
    judgement.state = distance.headroom.value() >= 0.0 ? State::met : State::unmet;
    judgement.reason = figure.value.note();
    const MeasureUnit unit = unit_of(requirement.measure);
    const double deviation = deviation_of_headroom(figure.value, size, unit);
    constexpr double safe_deviations = 2.0;
    if (judgement.state == State::met && deviation > 0.0 &&
        distance.headroom.value() < safe_deviations * deviation)
        judgement.reason = deviation_reason(figure.value, unit);
    return judgement;
}

/// Unmet before undetermined before met; among equals the smaller share.
bool is_worse(const Judgement& a, const Judgement& b) {
    const auto rank = [](State state) {
        return state == State::unmet ? 0 : state == State::undetermined ? 1 : 2;
    };
    if (rank(a.state) != rank(b.state))
        return rank(a.state) < rank(b.state);
    return a.state != State::undetermined && a.share.value() < b.share.value();
}

RequirementResult judge_requirement(const Requirement& requirement, const FigureRequest& request,
                                    std::span<const JudgedLoop> loops) {
    RequirementResult result;
    result.requirement = requirement;
    result.limit = limit_text(requirement);
    for (const JudgedLoop& loop : loops)
        result.all.push_back(judge_loop(requirement, request, loop));
    const auto worst = std::min_element(result.all.begin(), result.all.end(), is_worse);
    if (worst != result.all.end()) {
        result.worst = *worst;
    } else {
        result.worst.reason = "there is no loop to judge";
        result.worst.value = Figure::undetermined(result.worst.reason);
        result.worst.headroom = result.worst.value;
        result.worst.share = result.worst.value;
        result.worst.at_rad_s = result.worst.value;
    }
    return result;
}

} // namespace

std::string_view name_of(LoopName loop) {
    return loop == LoopName::design ? "design" : "realised";
}

FigureRequest request_of(std::span<const Requirement> requirements) {
    FigureRequest request;
    for (const Requirement& requirement : requirements) {
        if (requirement.measure == Measure::settling_time &&
            requirement.band_percent != always_computed_band_percent)
            add_once(request.settling_bands_percent, requirement.band_percent);
        if (requirement.measure == Measure::disturbance_rejection)
            add_once(request.rejection_up_to_rad_s, requirement.up_to_rad_s);
        if (requirement.measure == Measure::roll_off)
            add_once(request.roll_off_from_rad_s, requirement.from_rad_s);
    }
    return request;
}

Figure share_of(const Requirement& requirement, double size) {
    return distance_of(requirement, size).share;
}

Verdict judge(std::span<const Requirement> requirements, const FigureRequest& request,
              std::span<const JudgedLoop> loops) {
    Verdict verdict;
    for (const Requirement& requirement : requirements) {
        verdict.requirements.push_back(judge_requirement(requirement, request, loops));
        const State state = verdict.requirements.back().worst.state;
        if (state == State::unmet || (state == State::undetermined && verdict.state == State::met))
            verdict.state = state;
    }
    return verdict;
}

std::string limit_text(const Requirement& requirement) {
    std::string unit(symbol_of(unit_of(requirement.measure)));
    if (!unit.empty())
        unit.insert(0, " ");
    if (requirement.at_least && requirement.at_most)
        return number_text(*requirement.at_least) + " to " + number_text(*requirement.at_most) +
               unit;
    if (requirement.at_least)
        return "at least " + number_text(*requirement.at_least) + unit;
    if (requirement.at_most)
        return "at most " + number_text(*requirement.at_most) + unit;
    return "no limit";
}

} // namespace cornerwright
