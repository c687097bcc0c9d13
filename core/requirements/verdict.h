#pragma once

#include "core/loop/loop_figures.h"
#include "core/requirements/requirement.h"

#include <span>
#include <string>
#include <vector>

namespace cornerwright {

enum class LoopName { design, realised };
std::string_view name_of(LoopName loop);

/// The figures of one loop of one case, as the ledger needs them.
struct JudgedLoop {
    std::string case_name;
    LoopName loop = LoopName::design;
    const LoopFigures* figures = nullptr; ///< not owned, outlives the call
};

/// How one requirement stands on one loop of one case.
struct Judgement {
    std::string case_name;
    LoopName loop = LoopName::design;
    Figure value;    ///< the figure judged, in the unit of the measure
    Figure headroom; ///< signed distance to the nearer limit, in the limit's own scale
    Figure share;    ///< headroom over what a person would call "a bit"
    Figure at_rad_s; ///< where on the curve it is measured; undetermined if nowhere
    State state = State::undetermined;
    std::string reason; ///< for undetermined, unstable, or "within two standard deviations"

    bool operator==(const Judgement&) const = default;
};

/// One requirement over all cases and loops; the worst stands for it.
struct RequirementResult {
    Requirement requirement;
    std::string limit; ///< "at least 45 deg"
    Judgement worst;
    std::vector<Judgement> all; ///< case by case, design before realised

    bool operator==(const RequirementResult&) const = default;
};

struct Verdict {
    State state = State::met; ///< of the project
    std::vector<RequirementResult> requirements;

    bool operator==(const Verdict&) const = default;
};

/// What must be computed so that every requirement can be judged.
FigureRequest request_of(std::span<const Requirement> requirements);

/// Judges every requirement on every loop. `request` is the one with which the figures were made.
Verdict judge(std::span<const Requirement> requirements, const FigureRequest& request,
              std::span<const JudgedLoop> loops);

/// The share of the nearer limit for a value judged by size, without a loop around it.
Figure share_of(const Requirement& requirement, double size);

/// "at least 45 deg", "at most 25 %", "60 to 200 rad/s".
std::string limit_text(const Requirement& requirement);

} // namespace cornerwright
