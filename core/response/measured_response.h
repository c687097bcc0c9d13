#pragma once

#include "core/numerics/complex.h"

namespace cornerwright {

/// A frequency response as measured. Frequencies ascend strictly and are above zero; no response is
/// zero, infinite or NaN (the readers see to that).
struct MeasuredResponse {
    std::vector<double> w_rad_s;
    ComplexVector response;
    std::vector<double> coherence; ///< one a point in [0, 1], or empty where none was measured
    double averages = 0.0;         ///< how many were averaged; 0 where the file does not say

    bool operator==(const MeasuredResponse&) const = default;
};

} // namespace cornerwright
