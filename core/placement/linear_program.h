#pragma once

#include <optional>
#include <vector>

namespace cornerwright {

/// minimise cost . z subject to row_i . z <= bound_i for every i; z is free in sign.
struct LinearProgram {
    std::vector<double> cost;              ///< n
    std::vector<std::vector<double>> rows; ///< m rows of n
    std::vector<double> bounds;            ///< m
};

struct LinearSolution {
    std::vector<double> point;       ///< n
    std::vector<double> multipliers; ///< m, >= 0; large where a row binds
};

/// Primal-dual interior-point method with Mehrotra's corrector, dense: meant for tens of unknowns
/// and hundreds of rows. `start` must satisfy every row strictly. Empty where rounding stops it
/// short of a relative gap of 1e-9. Source: S. Mehrotra, On the implementation of a primal-dual
/// interior point method, SIAM J. Optim. 2 (1992) (citation from memory).
std::optional<LinearSolution> solve(const LinearProgram& program, const std::vector<double>& start);

} // namespace cornerwright
