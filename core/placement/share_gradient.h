#pragma once

#include "core/placement/free_parameters.h"
#include "core/placement/problem.h"

#include <string>
#include <vector>

namespace cornerwright {

/// One judged figure and how its share moves with the free parameters.
struct ShareGradient {
    std::size_t requirement = 0; ///< index into the problem's
    std::size_t loop = 0;        ///< index into the evaluation's
    double share = 0.0;
    std::vector<double> slope; ///< d share / d ln(parameter)
};

/// The gradient of every finite share that is smaller than `up_to`. Figures of the frequency
/// response by implicit differentiation along the loop curve; figures of the step by central
/// differences. Shares that are infinite or not determined are left out.
std::vector<ShareGradient> share_gradients(const PlacementProblem& problem, const Chain& chain,
                                           const std::vector<FreeParameter>& parameters,
                                           const Evaluation& evaluation, double up_to);

} // namespace cornerwright
