#pragma once

#include "core/engine/fleet.h"

#include <array>
#include <span>
#include <string>
#include <vector>

namespace cornerwright {

/// Parts of the fleet for which a figure's spread is told.
inline constexpr std::array<double, 9> fleet_quantiles{0.0,  0.01, 0.05, 0.25, 0.5,
                                                       0.75, 0.95, 0.99, 1.0};

/// The spread of one figure over all units where it is determined. A quantile p is the value of
/// rank ceil(p n), at least 1, in ascending order: always the figure of a unit that there is
/// (definition 1 of R. J. Hyndman, Y. Fan, Sample quantiles in statistical packages, The American
/// Statistician 50 (1996); citation from memory). Infinite figures stand at the ends.
struct FleetSpread {
    std::string figure;
    LoopName loop = LoopName::design;
    std::size_t determined = 0;
    std::vector<Figure> quantiles; ///< as in `fleet_quantiles`; empty where none is determined
};

/// One requirement over the fleet.
struct FleetRequirement {
    Measure measure = Measure::phase_margin;
    std::string limit;
    std::string worst_file; ///< empty where no unit has it determined
    FleetJudgement worst;
    std::size_t met = 0;
    std::size_t unmet = 0;
    std::size_t undetermined = 0;
};

struct WorstUnit {
    std::string file;
    Measure measure = Measure::phase_margin; ///< with the smallest share
    Figure share;
};

struct FleetSummary {
    State state = State::met; ///< as a project's verdict; unreadable files leave it undetermined
    std::size_t units = 0;
    std::size_t met = 0;
    std::size_t unmet = 0;
    std::size_t undetermined = 0;
    std::size_t unreadable = 0;
    std::vector<FleetRequirement> requirements;
    std::vector<FleetSpread> spread;
    std::vector<WorstUnit> worst; ///< smallest share first, at most ten
};

/// Depends on the units alone and not on their order, so that shards together give what one run
/// gives.
FleetSummary summary_of(std::span<const Requirement> requirements, std::vector<FleetUnit> units);

} // namespace cornerwright
