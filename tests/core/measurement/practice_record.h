#pragma once

#include "core/response/measured_response.h"

#include <nlohmann/json.hpp>

#include <cstddef>
#include <string>
#include <vector>

namespace cornerwright {

/// Time records made from known models, with what an estimate of each must reach.
std::vector<std::string> practice_records();
nlohmann::json truth_of_record(const std::string& record);

/// How far an estimate is from the truth, over its points of high coherence in the excited band.
struct EstimateError {
    double rms = 0.0;
    double percentile_95 = 0.0;
    std::size_t covered_bands = 0; ///< of the truth's equal logarithmic bands, with such a point
};

/// No points at all: errors of infinity.
EstimateError estimate_error(const nlohmann::json& truth, const MeasuredResponse& estimate);

} // namespace cornerwright
