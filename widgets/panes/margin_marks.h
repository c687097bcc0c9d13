#pragma once

#include "core/engine/assessment.h"

#include <optional>
#include <vector>

namespace cornerwright {

/// A margin where it is measured on the curve of one loop.
struct MarginMark {
    double w_rad_s = 0.0;
    double from = 0.0;    ///< the line it is measured from: 0 dB, or an odd multiple of 180 deg
    double to = 0.0;      ///< the curve: dB or deg
    bool decides = false; ///< the one that is the figure
    Measure measure = Measure::phase_margin;
};

/// The loop whose margins are marked, with all of them.
struct MarkedLoop {
    LoopName loop = LoopName::design;
    const LoopAssessment* assessment = nullptr;
    std::vector<MarginMark> marks;
};

/// Phase margins at every crossover of the loop of this case that is wanted, else of the one that
/// has the smaller one.
MarkedLoop phaseMargins(const CaseAssessment& shown, std::optional<LoopName> wanted = {});

/// Gain and gain reduction margins at every phase crossing of the loop of this case that is wanted,
/// else of the one that has the smaller gain margin.
MarkedLoop gainMargins(const CaseAssessment& shown, std::optional<LoopName> wanted = {});

/// How a measure of one loop of one case stands: the worst state of its requirements; empty where
/// nothing is required of it.
std::optional<State> stateOf(const Verdict& verdict, Measure measure, const std::string& caseName,
                             LoopName loop);

} // namespace cornerwright
