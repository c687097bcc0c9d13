#pragma once

#include "core/response/measured_response.h"

#include <vector>

namespace cornerwright {

/// Normalised random error (one standard deviation) of a response measured with coherence g2 and n
/// averages: sqrt((1 - g2) / (2 n g2)), which is the relative error of the magnitude and, in
/// radians, the error of the phase (Bendat and Piersol, Random Data, chapter 9 on single-input
/// single-output relationships). Infinite where the coherence is 0.
double random_error(double coherence, double averages);

/// The random error of every point; empty where coherence or number of averages is not known.
std::vector<double> random_errors(const MeasuredResponse& measured);

} // namespace cornerwright
