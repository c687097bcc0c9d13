#pragma once

#include "core/placement/problem.h"

#include <cstdint>

namespace cornerwright {

/// How the values inside a stated spread fall.
enum class SpreadShape {
    uniform, ///< evenly from -percent to +percent
    normal,  ///< percent is three standard deviations; farther draws are drawn anew
};

/// Stated spreads in per cent of each value; 0: it stays.
struct Spreads {
    double plant_gain_percent = 0.0;
    double plant_corner_percent = 0.0;  ///< size of each root or conjugate pair
    double plant_damping_percent = 0.0; ///< damping of each conjugate pair
    double dead_time_percent = 0.0;
    double component_percent = 0.0; ///< every value of the compensator's enabled sections
    SpreadShape shape = SpreadShape::uniform;
};

/// The problem as sample `number` of a seeded run has it: every plant case and every section with
/// values of its own, drawn independently; equal seeds and numbers give equal samples on every
/// machine. Corners move at constant K of K prod(1 + s/z)/prod(1 + s/p), so that they leave the
/// gain at low frequencies alone. Of a measured plant the whole frequency axis stretches by one
/// corner factor, the response takes the gain, and dead time is known only through the fit. A draw
/// that would turn a lead, lag or notch over is drawn anew. Throws InputError where a spread is
/// negative or not below 100 %.
PlacementProblem drawn(const PlacementProblem& problem, const Spreads& spreads, std::uint64_t seed,
                       std::uint64_t number);

/// The plant with which the problem's own compensator gives the design loop that `sampled` has on
/// case `index`: the sampled plant times sampled over nominal compensator.
LoopPlant plant_with_drift(const PlacementProblem& problem, const PlacementProblem& sampled,
                           std::size_t index);

} // namespace cornerwright
