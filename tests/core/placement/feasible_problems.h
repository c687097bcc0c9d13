#pragma once

#include "core/placement/free_parameters.h"
#include "core/placement/placement.h"
#include "core/requirements/judged_figure.h"
#include "tests/core/placement/placement_practice.h"

#include <random>

namespace cornerwright::practice {

/// A problem that is known to have an answer: plants and a compensator are drawn, requirements are
/// read off that compensator's own figures with a little slack, and placement is given the
/// compensator with every value moved.
struct FeasibleProblem {
    PlacementProblem problem; ///< with the moved compensator
    Chain answer;
};

class ProblemMaker {
  public:
    explicit ProblemMaker(std::uint64_t seed) : random_(seed) {}

    FeasibleProblem make() {
        for (;;) {
            FeasibleProblem made;
            made.problem.plants = plants();
            made.answer = answer();
            if (chance(0.5))
                sample(made.problem);
            if (!require(made))
                continue;
            made.problem.compensator = moved(made);
            return made;
        }
    }

  private:
    double uniform(double low, double high) {
        return std::uniform_real_distribution<>(low, high)(random_);
    }
    bool chance(double share) { return uniform(0.0, 1.0) < share; }

    /// One to four units of a servo or a thermal family; every second family measured.
    std::vector<PlacementPlant> plants() {
        crossover_ = std::exp(uniform(std::log(5.0), std::log(200.0)));
        const bool servo = chance(0.6);
        const bool seen = chance(0.4);
        resonance_ = crossover_ * uniform(6.0, 12.0);
        const double lag = crossover_ * uniform(0.3, 0.8);
        const int units = 1 + static_cast<int>(uniform(0.0, 4.0));
        std::vector<PlacementPlant> result;
        for (int unit = 0; unit < units; ++unit) {
            const double gain = std::exp(uniform(-0.15, 0.15));
            const double ring = resonance_ * std::exp(uniform(-0.03, 0.03));
            PlantModel model;
            model.dead_time_s = chance(0.5) ? 0.05 / crossover_ : 0.0;
            model.roots.poles = {-lag * std::exp(uniform(-0.2, 0.2)),
                                 servo ? Complex(0.0) : Complex(-0.02 * crossover_),
                                 Complex(-0.05 * ring, ring), Complex(-0.05 * ring, -ring)};
            model.roots.gain = gain * crossover_ * lag * ring * ring * (1.0 + 0.05 * 0.05);
            const std::string name = "unit " + std::to_string(unit + 1);
            if (seen)
                result.push_back({name, measured(model, 0.01 * crossover_, 100.0 * crossover_, 201,
                                                 servo ? 1 : 0)});
            else
                result.push_back({name, model});
        }
        return result;
    }

    Chain answer() {
        const double centre = crossover_ * uniform(0.9, 1.3);
        const double ratio = uniform(2.0, 3.5);
        return {gain_of(uniform(0.8, 1.3)), corner_of(SectionKind::pi, crossover_ / uniform(8, 15)),
                pair_of(SectionKind::lead, centre / ratio, centre * ratio),
                notch_of(resonance_, uniform(0.05, 0.15), uniform(0.6, 0.9)),
                second_order_of(SectionKind::complex_poles, resonance_ * uniform(2.0, 3.0), 0.7)};
    }

    void sample(PlacementProblem& problem) {
        const double period = 0.02 / crossover_;
        problem.sampling = Sampling{period, 0.5 * period, true};
        if (chance(0.6))
            problem.realisation = Realisation{};
    }

    /// Every limit a slack away from the worst figure; false where the answer is not a sound loop.
    bool require(FeasibleProblem& made) {
        PlacementProblem& problem = made.problem;
        problem.requirements = {
            at_least(Measure::phase_margin, 1.0), at_least(Measure::gain_margin, 1.0),
            at_most(Measure::sensitivity_peak, 60.0), at_least(Measure::bandwidth, 1e-3),
            at_most(Measure::disturbance_rejection, 0.0)};
        problem.requirements.back().up_to_rad_s = 0.1 * crossover_;
        const Evaluation evaluation = evaluate(problem, made.answer);
        for (const PlacementLoop& loop : evaluation.loops) {
            if (loop.assessment.figures.stability.stable != true)
                return false;
        }
        for (std::size_t i = 0; i < problem.requirements.size(); ++i) {
            Requirement& requirement = problem.requirements[i];
            const Figure worst = evaluation.verdict.requirements[i].worst.value;
            if (!worst.is_value())
                return false;
            const double value = worst.value();
            if (requirement.measure == Measure::phase_margin) {
                if (value < 20.0)
                    return false;
                requirement.at_least = value - 2.0;
            } else if (requirement.measure == Measure::bandwidth) {
                requirement.at_least = value * 0.95;
            } else if (requirement.at_least) {
                requirement.at_least = value - 0.5;
            } else {
                requirement.at_most = value + 0.5;
            }
        }
        return true;
    }

    /// Every value up to a factor of 3 off, corners of a lead still in order, something unmet.
    Chain moved(const FeasibleProblem& made) {
        for (;;) {
            const auto parameters = free_parameters(made.answer);
            std::vector<double> logarithms = logarithms_of(made.answer, parameters);
            for (double& logarithm : logarithms)
                logarithm += uniform(-std::log(3.0), std::log(3.0));
            Chain chain = with_logarithms(made.answer, parameters, logarithms);
            const bool in_order = chain[2].pole_rad_s > 1.1 * chain[2].zero_rad_s &&
                                  chain[3].pole_damping > 1.1 * chain[3].zero_damping;
            if (in_order && evaluate(made.problem, chain).merit < 0.0)
                return chain;
        }
    }

    std::mt19937_64 random_;
    double crossover_ = 1.0;
    double resonance_ = 10.0;
};

} // namespace cornerwright::practice
