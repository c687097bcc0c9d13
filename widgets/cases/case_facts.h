#pragma once

#include "core/engine/assessment.h"
#include "core/project/project.h"

#include <QString>
#include <QStringList>

namespace cornerwright {

/// What is known of a plant case in one short line: "800 points · coherence ≥ 0.97", "4 poles,
/// 2 zeros · dead time 800 µs", the formula, or why the case cannot be used.
QString caseFact(const PlantCase& plantCase);

/// Whether there are measured points that a model can be fitted to.
bool isMeasured(const PlantCase& plantCase);

/// "binds 2 requirements": of how many unmet or nearest requirements this case is the worst. Empty
/// where it binds none.
QString bindingFact(const Verdict& verdict, const std::string& caseName);

/// What stands below the list for the shown case: fit, sampling, and what sampling costs at the
/// crossover. `figures` may be null.
QStringList shownCaseFacts(const Project& project, const PlantCase& plantCase,
                           const LoopFigures* figures);

} // namespace cornerwright
