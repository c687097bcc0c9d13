#include "tests/core/fitting/practice_fit.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

using nlohmann::json;

ComplexVector roots_in(const json& list) {
    ComplexVector roots;
    for (const json& root : list)
        roots.emplace_back(root.at(0).get<double>(), root.at(1).get<double>());
    return roots;
}

} // namespace

PlantModel plant_in(const json& plant) {
    return {{roots_in(plant.at("zeros_rad_s")), roots_in(plant.at("poles_rad_s")),
             plant.at("gain").get<double>()},
            plant.at("dead_time_s").get<double>()};
}

std::optional<double> asked(const json& value) {
    if (value.is_number())
        return value.get<double>();
    if (value == "auto")
        return {};
    return std::stod(value.get<std::string>());
}

Complex response_of(const PlantModel& model, double w) {
    return evaluate(model.roots, {0.0, w}) * std::polar(1.0, -w * model.dead_time_s);
}

double misfit_in_sigma(const PlantModel& model, const PlantModel& truth,
                       const MeasuredResponse& measured, double averages) {
    double sum = 0.0;
    for (std::size_t i = 0; i < measured.w_rad_s.size(); ++i) {
        const double w = measured.w_rad_s[i];
        const double c = measured.coherence[i];
        const double variance = std::norm(response_of(truth, w)) * (1.0 - c) / (c * averages);
        sum += std::norm(response_of(model, w) - measured.response[i]) / variance;
    }
    return std::sqrt(sum / static_cast<double>(measured.w_rad_s.size()));
}

int unstable_poles_of(const PlantModel& model, double lowest_w) {
    return static_cast<int>(
        std::count_if(model.roots.poles.begin(), model.roots.poles.end(), [&](Complex pole) {
            return pole.real() > 0.0 && std::abs(pole) > lowest_w / 100.0;
        }));
}

} // namespace cornerwright
