#pragma once

#include "core/fitting/order_search.h"

namespace cornerwright {

/// `model` with its criterion on the points of the task.
Candidate rated(const SearchTask& task, FactoredModel model, double cost);

/// Takes out what the data do not speak for, wherever the criterion does not grow by it: zeros
/// beyond the band, a slow pole that is an integrator, poles right of the axis.
Candidate tidied(const SearchTask& task, Candidate candidate);

} // namespace cornerwright
