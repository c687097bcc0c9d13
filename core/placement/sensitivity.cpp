#include "core/placement/sensitivity.h"

#include "core/numerics/error.h"
#include "core/placement/free_parameters.h"
#include "core/placement/moved_coefficient.h"
#include "core/placement/room_search.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// Shares beyond this change nothing about where they turn negative, and keep the search straight.
constexpr double clipped_share = 1.0;
/// A coefficient of a slow section may bear a change in its ninth digit only.
constexpr RoomSearch coefficient_search{1e-9, 4.0, 1.0};
constexpr double first_look_at_values = 1e-3;

/// How things stand with one value moved.
struct Standing {
    double share = 0.0; ///< smallest, clipped; negative where something fails
    RoomEnd end = RoomEnd::none;
    std::size_t requirement = 0;
    std::string case_name;
    LoopName loop = LoopName::design;
};

class Rooms {
  public:
    Rooms(const PlacementProblem& problem, const SensitivityOptions& options)
        : problem_(problem), options_(options) {
        const Evaluation now = evaluate(problem, problem.compensator);
        problem_.requirements.clear();
        for (std::size_t i = 0; i < problem.requirements.size(); ++i) {
            if (now.verdict.requirements[i].worst.state == State::met) {
                problem_.requirements.push_back(problem.requirements[i]);
                numbers_.push_back(i);
            } else {
                result_.left_out.push_back(i);
            }
        }
        if (problem.plants.empty() || numbers_.empty())
            throw InputError({}, "a plant case and a requirement that is met", "none");
    }

    Sensitivity run() {
        for (Section& section : problem_.compensator)
            section.locked = false; // a locked value drifts like any other
        const std::vector<FreeParameter> parameters = free_parameters(problem_.compensator);
        std::vector<CoefficientName> coefficients;
        if (problem_.realisation) {
            equation_ = discretise(problem_.compensator, problem_.sampling.value_or(Sampling{}),
                                   *problem_.realisation);
            coefficients = coefficients_of(equation_);
        }
        all_ = parameters.size() + coefficients.size();
        for (const FreeParameter& parameter : parameters) {
            if (proceed())
                result_.values.push_back(room_of(parameter));
        }
        for (const CoefficientName& name : coefficients) {
            if (proceed())
                result_.coefficients.push_back(room_of(name));
        }
        return std::move(result_);
    }

  private:
    bool proceed() {
        const double part = static_cast<double>(done_++) / static_cast<double>(all_);
        if (!result_.stopped && options_.proceed && !options_.proceed(part))
            result_.stopped = true;
        return !result_.stopped;
    }

    Standing standing_of(const Evaluation& evaluation) const {
        Standing standing;
        for (const PlacementLoop& loop : evaluation.loops) {
            if (loop.assessment.figures.stability.stable == false)
                return {-clipped_share, RoomEnd::stability, 0, problem_.plants[loop.plant].name,
                        loop.name};
        }
        standing.share = clipped_share;
        for (std::size_t i = 0; i < numbers_.size(); ++i) {
            for (const Judgement& judgement : evaluation.verdict.requirements[i].all) {
                // What can no longer be determined is no longer met.
                const double share =
                    judgement.share.is_determined() ? judgement.share.value() : -clipped_share;
                if (share >= standing.share)
                    continue;
                standing = {std::max(share, -clipped_share), RoomEnd::requirement, numbers_[i],
                            judgement.case_name, judgement.loop};
            }
        }
        return standing;
    }

    template <typename Evaluate>
    Standing standing(Evaluate&& evaluate_there) const {
        try {
            return standing_of(evaluate_there());
        } catch (const InputError&) {
            return {-clipped_share, RoomEnd::realisation, 0, {}, LoopName::design};
        }
    }

    /// `at` gives the standing at a distance, `factor` what that distance is of the value.
    template <typename At, typename Factor>
    static ValueReach reach(At&& at, Factor&& factor, const RoomSearch& search) {
        const double at_zero = std::max(at(0.0).share, 0.0);
        const auto distance = first_failure([&](double x) { return at(x).share; }, at_zero, search);
        if (!distance)
            return {RoomEnd::none, factor(search.farthest), 0, {}, LoopName::design};
        const Standing there = at(*distance);
        return {there.end, factor(*distance), there.requirement, there.case_name, there.loop};
    }

    ValueRoom room_of(const FreeParameter& parameter) const {
        const double value = problem_.compensator[parameter.section].*parameter.parameter.value;
        const RoomSearch search{first_look_at_values, 2.0, std::log(options_.farthest_factor)};
        const auto side = [&](double sign) {
            const auto at = [&](double x) {
                return standing([&] {
                    Chain chain = problem_.compensator;
                    Section& section = chain[parameter.section];
                    section.*parameter.parameter.value = value * std::exp(sign * x);
                    check(section);
                    return evaluate(problem_, chain);
                });
            };
            return reach(
                at, [&](double x) { return std::exp(sign * x); }, search);
        };
        return {false, parameter.section, std::string(parameter.parameter.key),
                value, side(-1.0),        side(1.0)};
    }

    ValueRoom room_of(const CoefficientName& name) const {
        const double value = coefficient(equation_, name);
        const auto side = [&](double sign) {
            const auto at = [&](double x) {
                return standing([&] {
                    return evaluate_realised(
                        problem_, with_coefficient(equation_, name, value * (1.0 + sign * x)));
                });
            };
            return reach(
                at, [&](double x) { return 1.0 + sign * x; }, coefficient_search);
        };
        return {true, name.section, text_of(name, equation_), value, side(-1.0), side(1.0)};
    }

    PlacementProblem problem_; ///< with the requirements that are met
    const SensitivityOptions& options_;
    std::vector<std::size_t> numbers_; ///< of those requirements in the problem given
    DifferenceEquation equation_;
    Sensitivity result_;
    std::size_t all_ = 1;
    std::size_t done_ = 0;
};

} // namespace

Sensitivity sensitivity(const PlacementProblem& problem, const SensitivityOptions& options) {
    return Rooms(problem, options).run();
}

} // namespace cornerwright
