#include "core/placement/design_practice.h"

#include "core/numerics/error.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <utility>

namespace cornerwright {
namespace {

/// The model of a plant, or the one fitted to its measurement; null where there is neither.
const PlantModel* known_model(const LoopPlant& plant) {
    if (const auto* model = std::get_if<PlantModel>(&plant))
        return model;
    const auto& fit = std::get<MeasuredPlant>(plant).fit;
    return fit ? &fit->model : nullptr;
}

} // namespace

PlacementProblem with_only(const PlacementProblem& problem, const Requirement& requirement) {
    PlacementProblem result = problem;
    result.requirements = {requirement};
    return result;
}

Figure worst_figure(const PlacementProblem& with_one, const Chain& chain) {
    try {
        const Evaluation evaluation = evaluate(with_one, chain);
        if (evaluation.merit <= unstable_merit)
            return Figure::undetermined("a loop is not stable");
        return evaluation.verdict.requirements.front().worst.value;
    } catch (const InputError& error) {
        return Figure::undetermined(error.what());
    }
}

std::optional<double> lowest_crossover(const Evaluation& evaluation) {
    std::optional<double> lowest;
    for (const PlacementLoop& loop : evaluation.loops) {
        const auto& crossovers = loop.assessment.figures.frequency.crossovers_rad_s;
        if (!crossovers.empty() && (!lowest || crossovers.front() < *lowest))
            lowest = crossovers.front();
    }
    return lowest;
}

Chain with_gain_factor(Chain chain, double factor) {
    const auto gain = std::find_if(chain.begin(), chain.end(), [](const Section& section) {
        return section.kind == SectionKind::gain && section.enabled && !section.locked;
    });
    if (gain != chain.end()) {
        gain->gain *= factor;
    } else {
        Section section;
        section.kind = SectionKind::gain;
        section.gain = factor;
        chain.push_back(section);
    }
    return chain;
}

double phase_change_deg(const Chain& before, const Chain& after, double w_rad_s) {
    const Complex s(0.0, w_rad_s);
    return std::arg(evaluate(roots_of(after), s) / evaluate(roots_of(before), s)) * 180.0 /
           std::numbers::pi;
}

std::vector<std::string> limits_of_physics(const PlacementProblem& problem,
                                           const Evaluation& evaluation) {
    std::vector<std::string> words;
    const auto crossover = lowest_crossover(evaluation);
    double delay = 0.0;
    for (const PlacementPlant& plant : problem.plants) {
        const PlantModel* model = known_model(plant.plant);
        if (!model)
            continue;
        delay = std::max(delay, model->dead_time_s);
        for (const Complex& zero : model->roots.zeros) {
            if (zero.real() > 0.0 && zero.imag() >= 0.0)
                words.push_back("A zero right of the axis at " + number_text(std::abs(zero), 4) +
                                " rad/s (" + plant.name + ") takes phase that no lead gives back.");
        }
    }
    if (problem.sampling && problem.sampling->design_includes_hold)
        delay += problem.sampling->computation_delay_s + 0.5 * problem.sampling->sample_period_s;
    if (delay > 0.0 && crossover)
        words.push_back("Dead time and sampling take " +
                        number_text(*crossover * delay * 180.0 / std::numbers::pi, 3) +
                        " deg at the present crossover, and more the farther a lead moves it up.");
    for (const PlacementLoop& loop : evaluation.loops) {
        const auto& crossovers = loop.assessment.figures.frequency.crossovers_rad_s;
        if (crossovers.size() > 1) {
            words.push_back("The loop of " + problem.plants[loop.plant].name + " crosses 0 dB " +
                            std::to_string(crossovers.size()) + " times, the last at " +
                            number_text(crossovers.back(), 4) +
                            " rad/s: quiet the resonance there first.");
            break;
        }
    }
    return words;
}

SectionProposal impossible(const PlacementProblem& problem, std::vector<std::string> words) {
    return {false, problem.compensator, {}, std::move(words)};
}

} // namespace cornerwright
