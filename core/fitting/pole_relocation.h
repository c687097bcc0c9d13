#pragma once

#include "core/fitting/factored_model.h"
#include "core/numerics/complex.h"

namespace cornerwright {

/// Starting poles over the band of the points: lightly damped pairs, or real poles, evenly spaced
/// in the logarithm of frequency.
ComplexVector spread_pairs(double w_low, double w_high, int count);
ComplexVector spread_real(double w_low, double w_high, int count);

/// Moves poles so that a sum of partial fractions meets the points in the weighted relative least
/// squares sense (vector fitting, relaxed), up to `rounds` times, then solves for the residues and
/// gives the whole in factored form with as many zeros as poles. `delay_s` is taken off the points
/// first and stands in the model. Poles right of the axis are reflected where `stable`.
FactoredModel relocate(const FitPoints& points, ComplexVector poles, double delay_s, bool stable,
                       int rounds);

} // namespace cornerwright
