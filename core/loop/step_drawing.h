#pragma once

#include "core/loop/step_figures.h"

namespace cornerwright {

/// Times that show the signals well: a little beyond settling, as close as the live modes and the
/// points ask for, a few hundred to about two thousand. A jump's time stands twice.
std::vector<double> drawing_times(const StepSignals& signals);

/// The signals at ascending times; of a time that stands twice the first takes the value before.
StepCurves curves_at(const StepSignals& signals, std::vector<double> times);

/// `points` times evenly over [0, until_s], both ends included.
std::vector<double> even_times(double until_s, int points);

} // namespace cornerwright
