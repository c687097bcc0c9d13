#include "core/placement/compensator_slopes.h"

#include <cmath>

namespace cornerwright {
namespace {

/// Step in ln(parameter): the third derivative's share and rounding are both near 1e-10 here.
constexpr double difference_step = 1e-5;

RootForm unrounded_roots(const PlacementProblem& problem, const Chain& chain) {
    Realisation realisation = *problem.realisation;
    realisation.number_format = NumberFormat{};
    // Whose coefficients keep their digits where corners are far below the sample rate.
    realisation.structure = Structure::delta;
    return roots_in_z_minus_1(
        discretise(chain, problem.sampling.value_or(Sampling{}), realisation));
}

/// exp(jw Ts) - 1 without cancellation.
Complex z_minus_1_at(double angle) {
    const double half = std::sin(0.5 * angle);
    return {-2.0 * half * half, std::sin(angle)};
}

} // namespace

CompensatorSlopes::CompensatorSlopes(const PlacementProblem& problem, const Chain& chain,
                                     const std::vector<FreeParameter>& parameters)
    : chain_(&chain), parameters_(&parameters) {
    if (!problem.realisation)
        return;
    sample_period_s_ = problem.sampling.value_or(Sampling{}).sample_period_s;
    const std::vector<double> centre = logarithms_of(chain, parameters);
    for (std::size_t i = 0; i < parameters.size(); ++i) {
        std::vector<double> moved = centre;
        moved[i] = centre[i] + difference_step;
        Neighbours neighbours;
        neighbours.above = unrounded_roots(problem, with_logarithms(chain, parameters, moved));
        moved[i] = centre[i] - difference_step;
        neighbours.below = unrounded_roots(problem, with_logarithms(chain, parameters, moved));
        neighbours_.push_back(std::move(neighbours));
    }
}

ComplexVector CompensatorSlopes::design(double w_rad_s) const {
    return log_derivatives(*chain_, *parameters_, {0.0, w_rad_s});
}

ComplexVector CompensatorSlopes::realised(double w_rad_s) const {
    const Complex d = z_minus_1_at(w_rad_s * sample_period_s_);
    ComplexVector slopes;
    for (const Neighbours& neighbours : neighbours_)
        slopes.push_back(std::log(evaluate(neighbours.above, d) / evaluate(neighbours.below, d)) /
                         (2.0 * difference_step));
    return slopes;
}

} // namespace cornerwright
