#pragma once

#include "core/plant/plant_case.h"

#include <QStringList>

namespace cornerwright {

/// What is to be told of a plant case as a measurement, one sentence each: which file, how many
/// rows gave points and how many did not, what the file says of its averages and coherence, how
/// well the fit follows, and the reader's warnings.
QStringList measurementWords(const PlantCase& plantCase);

} // namespace cornerwright
