#include "core/placement/problem.h"

#include "core/loop/closed_loop_poles.h"
#include "core/loop/frequency_figures.h"

#include <algorithm>
#include <cmath>
#include <span>
#include <type_traits>

namespace cornerwright {
namespace {

/// How far the closed-loop poles are from where they should be: 0 on the boundary, up to 1.
double instability_of(const LoopFigures& figures) {
    double worst = 0.0;
    for (const Complex& pole : figures.closed_loop_poles) {
        const double size = std::abs(pole);
        if (size > 0.0)
            worst = std::max(worst, figures.poles_in_z ? 1.0 - 1.0 / size : pole.real() / size);
    }
    return worst;
}

bool is_of_time(const Requirement& requirement) {
    switch (requirement.measure) {
    case Measure::overshoot:
    case Measure::peak_time:
    case Measure::rise_time:
    case Measure::settling_time:
    case Measure::control_peak:
    case Measure::disturbance_peak:
        return true;
    default:
        return false;
    }
}

/// As `assess_loop`, but a step response is only made where a requirement judges one: it takes most
/// of the time.
template <typename Loop>
LoopAssessment assess_as_required(const Loop& loop, const FigureRequest& request,
                                  std::span<const Requirement> requirements) {
    if (std::any_of(requirements.begin(), requirements.end(), is_of_time))
        return assess_loop(loop, request);
    const ClosedLoopPoles poles = closed_loop_poles(loop);
    FrequencyAssessment frequency = assess_frequency(loop, request, poles.poles);
    LoopAssessment result = undetermined_loop(request, "no requirement asks for it");
    result.figures.stability = std::move(frequency.stability);
    result.figures.frequency = std::move(frequency.figures);
    if (result.figures.stability.stable == true)
        result.figures.steady_state_error = std::move(frequency.steady_state_error);
    result.figures.closed_loop_poles = poles.poles;
    result.figures.poles_in_z = std::is_same_v<Loop, RealisedLoop>;
    result.curves = std::move(frequency.curves);
    return result;
}

double merit_of(const Evaluation& evaluation) {
    double instability = 0.0;
    bool all_stable = true;
    for (const PlacementLoop& loop : evaluation.loops) {
        if (loop.assessment.figures.stability.stable == false) {
            all_stable = false;
            instability += 1.0 + instability_of(loop.assessment.figures);
        }
    }
    if (!all_stable)
        return unstable_merit * (1.0 + instability);
    double smallest = HUGE_VAL;
    for (const RequirementResult& result : evaluation.verdict.requirements) {
        for (const Judgement& judgement : result.all) {
            if (judgement.share.is_determined())
                smallest = std::min(smallest, judgement.share.value());
        }
    }
    return std::max(smallest, unstable_merit);
}

/// Verdict, merit and what is not determined, from the loops.
void judge_all(const PlacementProblem& problem, Evaluation& evaluation) {
    std::vector<JudgedLoop> judged;
    for (const PlacementLoop& loop : evaluation.loops)
        judged.push_back({problem.plants[loop.plant].name, loop.name, &loop.assessment.figures});
    evaluation.verdict = judge(problem.requirements, evaluation.request, judged);
    evaluation.merit = merit_of(evaluation);
    for (const RequirementResult& result : evaluation.verdict.requirements)
        evaluation.undetermined += static_cast<std::size_t>(
            std::count_if(result.all.begin(), result.all.end(), [](const Judgement& judgement) {
                return !judgement.share.is_determined();
            }));
}

} // namespace

DesignLoop design_loop_with(const PlacementProblem& problem, std::size_t plant,
                            const Chain& chain) {
    DesignLoop loop{roots_of(chain), problem.plants[plant].plant, 0.0, 0.0};
    if (problem.sampling && problem.sampling->design_includes_hold) {
        loop.computation_delay_s = problem.sampling->computation_delay_s;
        loop.hold_period_s = problem.sampling->sample_period_s;
    }
    return loop;
}

std::optional<RealisedLoop> realised_loop_with(const PlacementProblem& problem, std::size_t plant,
                                               const Chain& chain) {
    if (!problem.realisation)
        return {};
    const Sampling sampling = problem.sampling.value_or(Sampling{});
    return RealisedLoop{discretise(chain, sampling, *problem.realisation),
                        problem.plants[plant].plant, sampling.computation_delay_s};
}

Evaluation evaluate(const PlacementProblem& problem, const Chain& chain) {
    Evaluation evaluation;
    evaluation.request = request_of(problem.requirements);
    for (std::size_t i = 0; i < problem.plants.size(); ++i) {
        DesignLoop design = design_loop_with(problem, i, chain);
        LoopAssessment assessed =
            assess_as_required(design, evaluation.request, problem.requirements);
        evaluation.loops.push_back({i, LoopName::design, std::move(design), std::move(assessed)});
        if (auto realised = realised_loop_with(problem, i, chain)) {
            assessed = assess_as_required(*realised, evaluation.request, problem.requirements);
            evaluation.loops.push_back(
                {i, LoopName::realised, std::move(*realised), std::move(assessed)});
        }
    }
    judge_all(problem, evaluation);
    return evaluation;
}

Evaluation evaluate_realised(const PlacementProblem& problem, const DifferenceEquation& equation) {
    Evaluation evaluation;
    evaluation.request = request_of(problem.requirements);
    const double delay = problem.sampling ? problem.sampling->computation_delay_s : 0.0;
    for (std::size_t i = 0; i < problem.plants.size(); ++i) {
        RealisedLoop loop{equation, problem.plants[i].plant, delay};
        LoopAssessment assessed =
            assess_as_required(loop, evaluation.request, problem.requirements);
        evaluation.loops.push_back({i, LoopName::realised, std::move(loop), std::move(assessed)});
    }
    judge_all(problem, evaluation);
    return evaluation;
}

bool is_better(const Evaluation& a, const Evaluation& b) {
    const bool both_stable = a.merit > unstable_merit && b.merit > unstable_merit;
    if (both_stable && a.undetermined != b.undetermined)
        return a.undetermined < b.undetermined;
    return a.merit > b.merit;
}

} // namespace cornerwright
