#pragma once

#include "core/measurement/read_measurement.h"

#include <span>

namespace cornerwright {

/// The response with its sign turned, as after an inverting injection.
MeasuredResponse with_sign_flipped(MeasuredResponse measured);

/// The response without a known delay: multiplied by exp(+jw delay).
MeasuredResponse with_delay_removed(MeasuredResponse measured, double delay_s);

/// The points whose coherence is not below `least`: outside the excited band an estimate is noise.
/// Throws InputError where no coherence was measured, or fewer than two points are left.
MeasuredResponse with_least_coherence(const MeasuredResponse& measured, double least);

/// Sign and delay as the options say.
MeasuredResponse edited(MeasuredResponse measured, const ReadOptions& options);

/// P = L/C from a measured loop gain L and the compensator's response at the same frequencies.
/// Throws InputError where the numbers of points differ, or C is zero or not finite somewhere.
MeasuredResponse plant_from_loop_gain(MeasuredResponse loop_gain,
                                      std::span<const Complex> compensator);

/// P = T/(C (1 - T)) from a measured complementary sensitivity T. Where |L| is large, 1 - T is a
/// small difference and the plant inherits its error: dP/P = dT/T / (1 - T). The coherence becomes
/// the one that tells this error with the same number of averages. Throws InputError as above, and
/// where T is exactly 1.
MeasuredResponse plant_from_closed_loop(MeasuredResponse closed_loop,
                                        std::span<const Complex> compensator);

/// What was measured around a loop.
enum class MeasuredQuantity { plant, loop_gain, closed_loop };

/// The plant behind any of them; `compensator` counts for all but the plant itself.
MeasuredResponse plant_from(MeasuredQuantity quantity, MeasuredResponse measured,
                            std::span<const Complex> compensator);

} // namespace cornerwright
