#pragma once

#include "core/compensator/chain.h"
#include "core/loop/loop.h"
#include "core/loop/loop_assessment.h"
#include "core/realisation/realisation.h"
#include "core/requirements/verdict.h"

#include <cstddef>
#include <optional>
#include <string>
#include <variant>
#include <vector>

namespace cornerwright {

struct PlacementPlant {
    std::string name;
    LoopPlant plant;
};

/// What placement and section design work on: a compensator, the plants it must serve, how it is
/// sampled, and what is required.
struct PlacementProblem {
    Chain compensator;
    std::vector<PlacementPlant> plants;
    std::optional<Sampling> sampling;
    std::optional<Realisation> realisation;
    std::vector<Requirement> requirements;
};

/// One loop of one plant with its figures.
struct PlacementLoop {
    std::size_t plant = 0;
    LoopName name = LoopName::design;
    std::variant<DesignLoop, RealisedLoop> loop;
    LoopAssessment assessment;
};

/// A compensator judged on every plant and loop of the problem.
struct Evaluation {
    std::vector<PlacementLoop> loops;
    FigureRequest request;
    Verdict verdict;
    /// The smallest share over all requirements, plants and loops that are determined. Where a loop
    /// is not stable: below `unstable_merit`, the lower the farther its poles are from the left.
    double merit = 0.0;
    /// How many judgements are not determined: a place where fewer are is the better one, or a
    /// search would flee to where nothing can be told.
    std::size_t undetermined = 0;
};

inline constexpr double unstable_merit = -1e3;

/// Stable before unstable, then fewer judgements undetermined, then the larger merit.
bool is_better(const Evaluation& a, const Evaluation& b);

/// The design loop, or the realised one, of a plant with this compensator. Throws InputError where
/// the difference equation cannot be made.
DesignLoop design_loop_with(const PlacementProblem& problem, std::size_t plant, const Chain& chain);
std::optional<RealisedLoop> realised_loop_with(const PlacementProblem& problem, std::size_t plant,
                                               const Chain& chain);

/// Figures of the step response are only determined where a requirement asks for one of them.
/// Judges `chain` in place of the problem's compensator. Throws InputError as above.
Evaluation evaluate(const PlacementProblem& problem, const Chain& chain);

/// Judges a difference equation in place of the problem's compensator, on the realised loops alone.
Evaluation evaluate_realised(const PlacementProblem& problem, const DifferenceEquation& equation);

} // namespace cornerwright
