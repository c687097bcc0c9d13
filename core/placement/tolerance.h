#pragma once

#include "core/placement/spread.h"

#include <array>
#include <cstddef>
#include <functional>
#include <optional>
#include <vector>

namespace cornerwright {

struct ToleranceOptions {
    Spreads spreads;
    std::uint64_t seed = 1;
    std::size_t samples = 1000;
    int workers = 0; ///< 0: as many as there are processor cores
    /// Told how many samples are done, from one thread at a time; false stops.
    std::function<bool(std::size_t done, std::size_t of)> proceed;
};

/// One requirement over the samples.
struct ToleranceRequirement {
    std::size_t met = 0;
    std::size_t unmet = 0;
    std::size_t undetermined = 0;
    std::optional<double> smallest_share; ///< over samples, cases and loops where determined
};

/// The sample that stands worst.
struct WorstSample {
    std::uint64_t number = 0;
    double merit = 0.0;    ///< smallest share; below `unstable_merit` where a loop is not stable
    std::size_t plant = 0; ///< index into the problem's plants
    LoopName loop = LoopName::design;
    std::size_t requirement = 0; ///< index into the problem's; the one with that share
    LoopPlant as_plant; ///< with which the nominal compensator gives this sample's design loop
};

struct ToleranceResult {
    std::size_t met = 0; ///< samples whose whole verdict is met
    std::size_t unmet = 0;
    std::size_t undetermined = 0;
    std::vector<ToleranceRequirement> requirements; ///< as in the problem
    std::vector<double> merits;       ///< smallest share of each sample, in their order
    std::optional<WorstSample> worst; ///< nothing where no sample was judged
    bool stopped = false;

    std::size_t samples() const { return met + unmet + undetermined; }
    /// Part of the samples that are met.
    double yield() const;
    /// Limits between which the true yield lies with 95 % confidence. Source: E. B. Wilson,
    /// Probable inference, the law of succession, and statistical inference, J. Am. Stat. Assoc. 22
    /// (1927); citation from memory.
    std::array<double, 2> yield_limits() const;
};

/// Judges seeded samples of plants and component values, see `drawn`. The answer does not depend on
/// the number of workers. Throws InputError where there is no plant case, no requirement or no
/// spread, and as `drawn` does; a sample that cannot be realised is undetermined.
ToleranceResult tolerance(const PlacementProblem& problem, const ToleranceOptions& options);

} // namespace cornerwright
