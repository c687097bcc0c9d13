#pragma once

#include "core/placement/placement.h"
#include "core/placement/share_gradient.h"

namespace cornerwright {

/// The judgements that carry weight in the last linear program, heaviest first.
std::vector<Binding> bindings_of(const Evaluation& evaluation,
                                 const std::vector<ShareGradient>& gradients,
                                 const std::vector<double>& weights);

/// What a person wants to read: from which smallest headroom to which, what binds and where, and,
/// where not all is met, which two requirements pull against each other.
std::vector<std::string> placement_words(const PlacementProblem& problem,
                                         const PlacementResult& result,
                                         const std::vector<ShareGradient>& gradients,
                                         const std::vector<double>& weights);

} // namespace cornerwright
