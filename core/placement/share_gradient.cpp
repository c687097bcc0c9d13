#include "core/placement/share_gradient.h"

#include "core/placement/compensator_slopes.h"
#include "core/placement/figure_slopes.h"

#include <array>
#include <cmath>
#include <optional>

namespace cornerwright {
namespace {

/// Step in ln(parameter) for figures of the step response, whose own error is near 1e-8.
constexpr double step_difference = 1e-4;

/// Assessments of the loops with one parameter moved, made when first asked for.
class MovedLoops {
  public:
    MovedLoops(const PlacementProblem& problem, const Chain& chain,
               const std::vector<FreeParameter>& parameters, const Evaluation& evaluation)
        : problem_(problem),
          chain_(chain),
          parameters_(parameters),
          evaluation_(evaluation),
          pairs_(evaluation.loops.size() * parameters.size()) {}

    /// Share of one requirement on one loop with one parameter down and up; empty where one of the
    /// two is not a number.
    std::optional<std::array<double, 2>> shares(std::size_t loop, std::size_t parameter,
                                                const Requirement& requirement) {
        auto& pair = pairs_[loop * parameters_.size() + parameter];
        if (!pair)
            pair = {assessed(loop, parameter, -step_difference),
                    assessed(loop, parameter, step_difference)};
        std::array<double, 2> result{};
        for (std::size_t side = 0; side < 2; ++side) {
            const PlacementLoop& at = evaluation_.loops[loop];
            const JudgedLoop judged{problem_.plants[at.plant].name, at.name, &(*pair)[side]};
            const Verdict verdict = judge({&requirement, 1}, evaluation_.request, {&judged, 1});
            const Figure& share = verdict.requirements.front().worst.share;
            if (!share.is_value())
                return {};
            result[side] = share.value();
        }
        return result;
    }

  private:
    LoopFigures assessed(std::size_t loop, std::size_t parameter, double step) const {
        std::vector<double> moved = logarithms_of(chain_, parameters_);
        moved[parameter] += step;
        const Chain chain = with_logarithms(chain_, parameters_, moved);
        const PlacementLoop& at = evaluation_.loops[loop];
        if (at.name == LoopName::design)
            return assess_loop(design_loop_with(problem_, at.plant, chain), evaluation_.request)
                .figures;
        return assess_loop(*realised_loop_with(problem_, at.plant, chain), evaluation_.request)
            .figures;
    }

    const PlacementProblem& problem_;
    const Chain& chain_;
    const std::vector<FreeParameter>& parameters_;
    const Evaluation& evaluation_;
    std::vector<std::optional<std::array<LoopFigures, 2>>> pairs_;
};

/// d share / d value: shares are smooth in the value except at a change of the nearer limit.
double share_slope(const Requirement& requirement, double value) {
    const double step = 1e-6 * std::abs(value);
    const Figure above = share_of(requirement, value + step);
    const Figure below = share_of(requirement, value - step);
    return (above.value() - below.value()) / (2.0 * step);
}

std::vector<double> by_differences(MovedLoops& moved, std::size_t loop, std::size_t count,
                                   const Requirement& requirement) {
    std::vector<double> slope(count, 0.0);
    for (std::size_t i = 0; i < count; ++i) {
        if (const auto shares = moved.shares(loop, i, requirement))
            slope[i] = ((*shares)[1] - (*shares)[0]) / (2.0 * step_difference);
    }
    return slope;
}

} // namespace

std::vector<ShareGradient> share_gradients(const PlacementProblem& problem, const Chain& chain,
                                           const std::vector<FreeParameter>& parameters,
                                           const Evaluation& evaluation, double up_to) {
    const CompensatorSlopes slopes(problem, chain, parameters);
    MovedLoops moved(problem, chain, parameters, evaluation);
    std::vector<ShareGradient> gradients;
    for (std::size_t r = 0; r < problem.requirements.size(); ++r) {
        const Requirement& requirement = problem.requirements[r];
        const std::vector<Judgement>& all = evaluation.verdict.requirements[r].all;
        for (std::size_t l = 0; l < all.size(); ++l) {
            const Judgement& judgement = all[l];
            if (!judgement.share.is_value() || judgement.share.value() >= up_to)
                continue;
            ShareGradient gradient{r, l, judgement.share.value(), {}};
            const auto figure =
                figure_slopes(evaluation.loops[l], requirement.measure, judgement.at_rad_s, slopes);
            if (figure && judgement.value.is_value() && judgement.value.value() != 0.0) {
                gradient.slope = *figure;
                // Margins are judged by size.
                const double value = judgement.value.value();
                const double sign =
                    value < 0.0 && unit_of(requirement.measure) == MeasureUnit::deg ? -1.0 : 1.0;
                for (double& slope : gradient.slope)
                    slope *= sign * share_slope(requirement, sign * value);
            } else {
                gradient.slope = by_differences(moved, l, parameters.size(), requirement);
            }
            gradients.push_back(std::move(gradient));
        }
    }
    return gradients;
}

} // namespace cornerwright
