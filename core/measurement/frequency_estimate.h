#pragma once

#include "core/measurement/time_record.h"
#include "core/response/measured_response.h"

#include <string>
#include <vector>

namespace cornerwright {

/// How the response is made from a time record.
struct EstimateOptions {
    enum class Method {
        h1,    ///< S_yu/S_uu: unbiased where the noise is on the response
        h2,    ///< S_yy/S_uy: unbiased where the noise is on the excitation
        tones, ///< stepped sine: correlation at each tone, a cycle at a time
    };
    enum class Window { hann, hamming, blackman, rectangular };
    enum class Detrend { line, mean, none };

    Method method = Method::h1;
    Window window = Window::hann;
    Detrend detrend = Detrend::line;
    int averages = 15;               ///< pieces that overlap by half (h1, h2)
    std::vector<double> tones_rad_s; ///< tones: the steps; empty: found in the excitation
};

struct Estimate {
    MeasuredResponse response;    ///< with coherence; `averages` set
    std::size_t piece_length = 0; ///< samples a piece (h1, h2)
    std::vector<std::string> warnings;
};

/// Frequency response with coherence. h1, h2: P. D. Welch's method (IEEE Trans. Audio
/// Electroacoustics AU-15, 1967): `averages` pieces of 2 rows/(averages + 1) samples, rounded down
/// to even, that overlap by half; trend taken off and window laid over each; zero frequency left
/// out. No hold is taken out of the response. Throws InputError where the record is too short for
/// the averages, or silent, and for a number of averages below 1.
Estimate estimate_response(const TimeRecord& record, const EstimateOptions& options = {});

} // namespace cornerwright
