#include "core/placement/tolerance.h"

#include "core/numerics/error.h"
#include "core/numerics/shared_work.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// What one sample leaves behind.
struct SampleOutcome {
    bool is_done = false;
    State state = State::undetermined;
    double merit = HUGE_VAL;
    std::vector<State> states; ///< a requirement each; empty where it cannot be realised
    std::vector<Figure> shares;
};

SampleOutcome outcome_of(const PlacementProblem& sampled) {
    SampleOutcome outcome;
    outcome.is_done = true;
    try {
        const Evaluation evaluation = evaluate(sampled, sampled.compensator);
        outcome.state = evaluation.verdict.state;
        outcome.merit = evaluation.merit;
        for (const RequirementResult& result : evaluation.verdict.requirements) {
            outcome.states.push_back(result.worst.state);
            outcome.shares.push_back(result.worst.share);
        }
    } catch (const InputError&) {
        outcome.state = State::undetermined;
    }
    return outcome;
}

/// Every sample's outcome; `stopped` tells whether some were never begun.
std::vector<SampleOutcome> outcomes_of(const PlacementProblem& problem,
                                       const ToleranceOptions& options, bool& stopped) {
    std::vector<SampleOutcome> outcomes(options.samples);
    SharedWork work{outcomes.size(), options.workers, {}};
    if (options.proceed)
        work.proceed = [&](std::size_t done) { return options.proceed(done, outcomes.size()); };
    stopped = !do_shared(work, [&]() -> WorkOnIndex {
        return [&](std::size_t i) {
            outcomes[i] = outcome_of(drawn(problem, options.spreads, options.seed, i));
        };
    });
    return outcomes;
}

void count(State state, std::size_t& met, std::size_t& unmet, std::size_t& undetermined) {
    ++(state == State::met ? met : state == State::unmet ? unmet : undetermined);
}

void count(const SampleOutcome& outcome, std::vector<ToleranceRequirement>& requirements) {
    for (std::size_t i = 0; i < requirements.size(); ++i) {
        ToleranceRequirement& requirement = requirements[i];
        if (outcome.states.empty()) {
            ++requirement.undetermined;
            continue;
        }
        count(outcome.states[i], requirement.met, requirement.unmet, requirement.undetermined);
        const Figure& share = outcome.shares[i];
        if (share.is_determined() &&
            (!requirement.smallest_share || share.value() < *requirement.smallest_share))
            requirement.smallest_share = share.value();
    }
}

/// The sample drawn once more, with the case, loop and requirement that make it the worst.
WorstSample worst_sample(const PlacementProblem& problem, const ToleranceOptions& options,
                         std::uint64_t number) {
    const PlacementProblem sampled = drawn(problem, options.spreads, options.seed, number);
    const Evaluation evaluation = evaluate(sampled, sampled.compensator);
    WorstSample worst;
    worst.number = number;
    worst.merit = evaluation.merit;
    double smallest = HUGE_VAL;
    for (std::size_t r = 0; r < evaluation.verdict.requirements.size(); ++r) {
        const std::vector<Judgement>& all = evaluation.verdict.requirements[r].all;
        for (std::size_t l = 0; l < all.size(); ++l) {
            const bool is_unstable =
                evaluation.loops[l].assessment.figures.stability.stable == false;
            const double share = is_unstable                    ? -HUGE_VAL
                                 : all[l].share.is_determined() ? all[l].share.value()
                                                                : HUGE_VAL;
            if (share < smallest) {
                smallest = share;
                worst.plant = evaluation.loops[l].plant;
                worst.loop = evaluation.loops[l].name;
                worst.requirement = r;
            }
        }
    }
    worst.as_plant = plant_with_drift(problem, sampled, worst.plant);
    return worst;
}

bool has_spread(const Spreads& spreads) {
    return spreads.plant_gain_percent > 0.0 || spreads.plant_corner_percent > 0.0 ||
           spreads.plant_damping_percent > 0.0 || spreads.dead_time_percent > 0.0 ||
           spreads.component_percent > 0.0;
}

} // namespace

double ToleranceResult::yield() const {
    return samples() == 0 ? 0.0 : static_cast<double>(met) / static_cast<double>(samples());
}

std::array<double, 2> ToleranceResult::yield_limits() const {
    if (samples() == 0)
        return {0.0, 1.0};
    constexpr double z = 1.959964; // of the normal distribution at 97.5 %
    const auto n = static_cast<double>(samples());
    const double middle = (yield() + z * z / (2.0 * n)) / (1.0 + z * z / n);
    const double half =
        z / (1.0 + z * z / n) * std::sqrt(yield() * (1.0 - yield()) / n + z * z / (4.0 * n * n));
    return {std::max(0.0, middle - half), std::min(1.0, middle + half)};
}

ToleranceResult tolerance(const PlacementProblem& problem, const ToleranceOptions& options) {
    if (problem.plants.empty() || problem.requirements.empty())
        throw InputError({}, "a plant case and a requirement to judge", "none");
    if (!has_spread(options.spreads))
        throw InputError({}, "a spread above 0 %", "none");
    ToleranceResult result;
    result.requirements.resize(problem.requirements.size());
    const std::vector<SampleOutcome> outcomes = outcomes_of(problem, options, result.stopped);
    std::optional<std::size_t> worst;
    for (std::size_t i = 0; i < outcomes.size(); ++i) {
        const SampleOutcome& outcome = outcomes[i];
        if (!outcome.is_done)
            continue;
        count(outcome.state, result.met, result.unmet, result.undetermined);
        count(outcome, result.requirements);
        result.merits.push_back(outcome.merit);
        if (!outcome.states.empty() && (!worst || outcome.merit < outcomes[*worst].merit))
            worst = i;
    }
    if (worst)
        result.worst = worst_sample(problem, options, *worst);
    return result;
}

} // namespace cornerwright
