#pragma once

#include "core/placement/problem.h"

#include <cstdint>
#include <functional>
#include <string>
#include <vector>

namespace cornerwright {

struct PlacementOptions {
    std::uint64_t seed = 1;    ///< equal seeds give equal results, unless the time limit cuts in
    int starts = 6;            ///< the given compensator and seeded variations of it
    double time_limit_s = 0.0; ///< 0: none
    double widest_factor = 1000.0; ///< no value leaves [start/factor, start*factor]
    /// Told the progress from 0 to 1 and the best merit so far; returns false to stop.
    std::function<bool(double, double)> proceed;
};

/// A requirement on a loop that stands in the way of more headroom.
struct Binding {
    std::size_t requirement = 0; ///< index into the problem's
    std::string case_name;
    LoopName loop = LoopName::design;
    Figure at_rad_s;
    double share = 0.0;
    double weight = 0.0; ///< its part of the pull, all together 1
};

struct PlacementResult {
    Chain compensator;
    double merit_before = 0.0; ///< smallest share, see Evaluation
    double merit = 0.0;
    std::vector<Binding> binding;   ///< heaviest first
    std::vector<std::string> words; ///< what was reached, what binds, which two conflict
    bool stopped = false;           ///< by the user or the time limit
};

/// Moves all unlocked values of the compensator so that the smallest share over all requirements,
/// plants and loops grows: sequential linear programming in the logarithms of the values with a
/// trust region, from several starts. Throws InputError where nothing can be moved or judged.
/// Source of the method: M. J. D. Powell's and others' minimax linearisation, for instance R.
/// Fletcher, Practical Methods of Optimization, 2nd ed., ch. 14 (citation from memory).
PlacementResult place(const PlacementProblem& problem, const PlacementOptions& options);

/// For every free parameter the slope of the smallest share by ln(parameter): the direction in
/// which a handle should move. In the order of `free_parameters`.
std::vector<double> headroom_slopes(const PlacementProblem& problem);

} // namespace cornerwright
