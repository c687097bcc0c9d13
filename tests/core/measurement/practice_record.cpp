#include "tests/core/measurement/practice_record.h"

#include <algorithm>
#include <cmath>
#include <filesystem>
#include <fstream>
#include <limits>
#include <set>

namespace cornerwright {
namespace {

std::vector<Complex> roots(const nlohmann::json& list) {
    std::vector<Complex> result;
    for (const auto& root : list)
        result.emplace_back(root[0].get<double>(), root[1].get<double>());
    return result;
}

/// The response of the truth's model at w; the truth lists it at 120 frequencies of its own, which
/// tell how the hold and the dead time enter.
Complex model_response(const nlohmann::json& truth, double w) {
    const Complex s{0.0, w};
    Complex value = truth["gain"].get<double>();
    for (const Complex zero : roots(truth["zeros_rad_s"]))
        value *= s - zero;
    for (const Complex pole : roots(truth["poles_rad_s"]))
        value /= s - pole;
    return value * std::exp(-s * truth["dead_time_s"].get<double>());
}

/// Between the frequencies of the truth: log magnitude and phase relative to the model without
/// hold, a smooth function, go linearly.
Complex truth_at(const nlohmann::json& file, double w) {
    const auto& grid = file["truth_w_rad_s"];
    const auto& values = file["truth_response"];
    std::size_t i = 1;
    while (i + 1 < grid.size() && grid[i].get<double>() < w)
        ++i;
    const auto ratio = [&](std::size_t k) {
        const Complex value{values[k][0].get<double>(), values[k][1].get<double>()};
        return value / model_response(file["truth"], grid[k].get<double>());
    };
    const double w0 = grid[i - 1].get<double>();
    const double w1 = grid[i].get<double>();
    const double share = (w - w0) / (w1 - w0);
    const Complex turn = ratio(i) / ratio(i - 1);
    return model_response(file["truth"], w) * ratio(i - 1) * std::pow(turn, share);
}

} // namespace

std::vector<std::string> practice_records() {
    return {"belt-sweep.csv", "buck-multisine.txt", "coil-random.csv", "drive-prbs-hum-drift.csv"};
}

nlohmann::json truth_of_record(const std::string& record) {
    std::ifstream stream(std::filesystem::path(CORNERWRIGHT_TEST_DATA) /
                         "core/measurement/data/records" / (record + ".truth.json"));
    return nlohmann::json::parse(stream);
}

EstimateError estimate_error(const nlohmann::json& truth, const MeasuredResponse& estimate) {
    const auto& required = truth["required"];
    const double low = required["band_rad_s"][0].get<double>();
    const double high = required["band_rad_s"][1].get<double>();
    const double bands = required["bands"].get<double>();
    std::vector<double> errors;
    std::set<int> covered;
    for (std::size_t i = 0; i < estimate.w_rad_s.size(); ++i) {
        const double w = estimate.w_rad_s[i];
        if (w < low || w > high ||
            estimate.coherence[i] <= required["coherence_above"].get<double>())
            continue;
        const Complex expected = truth_at(truth, w);
        errors.push_back(std::abs(estimate.response[i] - expected) / std::abs(expected));
        covered.insert(static_cast<int>(bands * std::log(w / low) / std::log(high / low)));
    }
    constexpr double infinity = std::numeric_limits<double>::infinity();
    if (errors.empty())
        return {infinity, infinity, 0};
    std::sort(errors.begin(), errors.end());
    double squares = 0.0;
    for (const double error : errors)
        squares += error * error;
    const auto last = static_cast<double>(errors.size() - 1);
    return {std::sqrt(squares / static_cast<double>(errors.size())),
            errors[static_cast<std::size_t>(0.95 * last + 0.5)], covered.size()};
}

} // namespace cornerwright
