#pragma once

#include "core/numerics/root_iteration.h"

namespace cornerwright {

/// How far each root may be from the true one when the data are off by half a unit in the last
/// place: absolute, cluster by cluster (the m-th root of the noise for m roots that hang together).
std::vector<double> root_uncertainty(const RootProblem& problem, const ComplexVector& roots);

/// Puts roots that lie within their own uncertainty of each other at their common mean, which is
/// far better known than they are.
void merge_clusters(const RootProblem& problem, ComplexVector& roots);

/// Makes the set symmetric: each root becomes real or one of an exact conjugate pair, nearest
/// mirrors first.
void pair_conjugates(ComplexVector& roots);

} // namespace cornerwright
