#include "core/engine/fleet_summary.h"

#include <algorithm>
#include <cmath>
#include <optional>

namespace cornerwright {
namespace {

constexpr std::size_t most_worst_units = 10;

void count(State state, std::size_t& met, std::size_t& unmet, std::size_t& undetermined) {
    ++(state == State::met ? met : state == State::unmet ? unmet : undetermined);
}

FleetRequirement requirement_over(const Requirement& requirement, std::size_t index,
                                  const std::vector<FleetUnit>& units) {
    FleetRequirement result;
    result.measure = requirement.measure;
    result.limit = limit_text(requirement);
    for (const FleetUnit& unit : units) {
        if (!unit.problem.empty())
            continue;
        const FleetJudgement& judgement = unit.judgements[index];
        count(judgement.state, result.met, result.unmet, result.undetermined);
        if (judgement.share.is_determined() &&
            (result.worst_file.empty() || judgement.share.value() < result.worst.share.value())) {
            result.worst = judgement;
            result.worst_file = unit.file;
        }
    }
    return result;
}

FleetSpread spread_of(std::size_t figure, LoopName loop, const std::vector<FleetUnit>& units) {
    FleetSpread spread;
    spread.figure = std::string(fleet_figure_names[figure]);
    spread.loop = loop;
    std::vector<double> values;
    for (const FleetUnit& unit : units) {
        const Figure& value = (loop == LoopName::design ? unit.design : unit.realised)[figure];
        if (unit.problem.empty() && value.is_determined())
            values.push_back(value.value());
    }
    std::sort(values.begin(), values.end());
    spread.determined = values.size();
    if (values.empty())
        return spread;
    for (const double part : fleet_quantiles) {
        const double rank = std::max(1.0, std::ceil(part * static_cast<double>(values.size())));
        spread.quantiles.push_back(Figure::of(values[static_cast<std::size_t>(rank) - 1]));
    }
    return spread;
}

std::vector<WorstUnit> worst_units(std::span<const Requirement> requirements,
                                   const std::vector<FleetUnit>& units) {
    std::vector<WorstUnit> worst;
    for (const FleetUnit& unit : units) {
        std::optional<WorstUnit> own;
        for (std::size_t i = 0; i < unit.judgements.size(); ++i) {
            const Figure& share = unit.judgements[i].share;
            if (share.is_determined() && (!own || share.value() < own->share.value()))
                own = WorstUnit{unit.file, requirements[i].measure, share};
        }
        if (own)
            worst.push_back(*own);
    }
    std::stable_sort(worst.begin(), worst.end(), [](const WorstUnit& a, const WorstUnit& b) {
        return a.share.value() < b.share.value();
    });
    worst.resize(std::min(worst.size(), most_worst_units));
    return worst;
}

} // namespace

FleetSummary summary_of(std::span<const Requirement> requirements, std::vector<FleetUnit> units) {
    std::sort(units.begin(), units.end(),
              [](const FleetUnit& a, const FleetUnit& b) { return a.file < b.file; });
    FleetSummary summary;
    summary.units = units.size();
    for (const FleetUnit& unit : units) {
        if (unit.problem.empty())
            count(unit.state, summary.met, summary.unmet, summary.undetermined);
        else
            ++summary.unreadable;
    }
    if (summary.unmet > 0)
        summary.state = State::unmet;
    else if (summary.undetermined + summary.unreadable > 0 || units.empty())
        summary.state = State::undetermined;
    for (std::size_t i = 0; i < requirements.size(); ++i)
        summary.requirements.push_back(requirement_over(requirements[i], i, units));
    for (const LoopName loop : {LoopName::design, LoopName::realised}) {
        for (std::size_t figure = 0; figure < fleet_figure_names.size(); ++figure) {
            FleetSpread spread = spread_of(figure, loop, units);
            if (spread.determined > 0)
                summary.spread.push_back(std::move(spread));
        }
    }
    summary.worst = worst_units(requirements, units);
    return summary;
}

} // namespace cornerwright
