#pragma once

#include "core/placement/section_design.h"

#include <optional>
#include <string>

namespace cornerwright {

/// The problem with one requirement alone, so that only what a section design asks is judged.
PlacementProblem with_only(const PlacementProblem& problem, const Requirement& requirement);

/// The worst figure of the only requirement over all cases and loops; not determined where a loop
/// is not stable or the chain cannot be realised.
Figure worst_figure(const PlacementProblem& with_one, const Chain& chain);

/// The lowest gain crossover over all loops, rad/s.
std::optional<double> lowest_crossover(const Evaluation& evaluation);

/// The chain with its overall gain multiplied: in its first unlocked gain section, else in a new
/// one at the end.
Chain with_gain_factor(Chain chain, double factor);

/// arg C of the new chain less that of the old one at a frequency, deg.
double phase_change_deg(const Chain& before, const Chain& after, double w_rad_s);

/// Why more phase cannot be had, as far as the plants tell: dead time, zeros right of the axis,
/// resonances above 0 dB. One sentence each.
std::vector<std::string> limits_of_physics(const PlacementProblem& problem,
                                           const Evaluation& evaluation);

SectionProposal impossible(const PlacementProblem& problem, std::vector<std::string> words);

} // namespace cornerwright
