#pragma once

#include "core/measurement/frequency_estimate.h"

#include <cstddef>
#include <span>
#include <vector>

namespace cornerwright {

/// A stretch of the excitation that holds one tone. Times in samples.
struct ToneStep {
    double begin = 0.0;  ///< a rising crossing of the mean
    double period = 0.0; ///< samples a cycle
    std::size_t cycles = 0;
};

/// Stretches of constant frequency in an excitation that steps from tone to tone: rising crossings
/// that lie on a straight line over their number. Stretches of fewer than `least_cycles` are left
/// out.
std::vector<ToneStep> find_tone_steps(std::span<const double> excitation,
                                      std::size_t least_cycles = 8);

/// Response at each tone: the first quarter of the cycles settles and the last cycle is left out;
/// the rest is split into groups of whole cycles, and in each group sine, cosine, offset and slope
/// are fitted to both channels (least squares). The groups are averaged as in H1, which gives the
/// coherence. `tones_rad_s` names the tones where they are known; steps that are none of them (2 %)
/// are left out. Throws InputError where fewer than two tones are found.
Estimate estimate_stepped_sine(const TimeRecord& record, const std::vector<double>& tones_rad_s);

} // namespace cornerwright
