#pragma once

#include "core/requirements/verdict.h"

#include <QString>

#include <vector>

namespace cornerwright {

/// One requirement in two designs.
struct TrialDifference {
    QString measure;
    QString limit;
    QString then; ///< worst value in the trial
    QString now;
    QString
        change; ///< now - then in the unit of the measure, with its sign; empty if not determined
    State stateThen = State::undetermined;
    State stateNow = State::undetermined;
    int better = 0; ///< +1 more headroom now, -1 less, 0 equal or not to be told
};

/// The requirements of the present design beside those of a trial, in the order of the project.
/// A requirement that the trial did not have has no `then`.
std::vector<TrialDifference> differencesOf(const Verdict& then, const Verdict& now, bool hertz);

} // namespace cornerwright
