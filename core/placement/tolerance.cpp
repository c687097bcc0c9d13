#include "core/placement/tolerance.h"

#include "core/numerics/error.h"

#include <algorithm>
#include <atomic>
#include <cmath>
#include <exception>
#include <mutex>
#include <thread>

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

class ToleranceRun {
  public:
    ToleranceRun(const PlacementProblem& problem, const ToleranceOptions& options)
        : problem_(problem), options_(options), outcomes_(options.samples) {}

    std::vector<SampleOutcome> run(bool& stopped) {
        const auto cores = static_cast<int>(std::max(1U, std::thread::hardware_concurrency()));
        const int workers = options_.workers > 0 ? options_.workers : cores;
        std::vector<std::thread> threads;
        for (int i = 1; i < workers; ++i)
            threads.emplace_back([this] { work(); });
        work();
        for (std::thread& thread : threads)
            thread.join();
        if (failure_)
            std::rethrow_exception(failure_);
        stopped = stopped_;
        return std::move(outcomes_);
    }

  private:
    void work() {
        try {
            for (std::size_t i = next_++; i < outcomes_.size() && !stopped_; i = next_++) {
                outcomes_[i] = outcome_of(drawn(problem_, options_.spreads, options_.seed, i));
                tell();
            }
        } catch (...) {
            const std::lock_guard lock(mutex_);
            failure_ = std::current_exception();
            stopped_ = true;
        }
    }

    void tell() {
        const std::lock_guard lock(mutex_);
        ++done_;
        if (options_.proceed && !stopped_ && !options_.proceed(done_, outcomes_.size()))
            stopped_ = true;
    }

    const PlacementProblem& problem_;
    const ToleranceOptions& options_;
    std::vector<SampleOutcome> outcomes_;
    std::atomic<std::size_t> next_{0};
    std::atomic<bool> stopped_{false};
    std::mutex mutex_;
    std::size_t done_ = 0;
    std::exception_ptr failure_;
};

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
    const std::vector<SampleOutcome> outcomes = ToleranceRun(problem, options).run(result.stopped);
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
