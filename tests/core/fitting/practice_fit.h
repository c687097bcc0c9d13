#pragma once

#include "core/fitting/fit.h"

#include <nlohmann/json.hpp>

#include <optional>

namespace cornerwright {

/// A model as zeros_rad_s, poles_rad_s, gain and dead_time_s.
PlantModel plant_in(const nlohmann::json& plant);

/// "auto" (nothing) or a number, also as text.
std::optional<double> asked(const nlohmann::json& value);

/// P(jw) of a model.
Complex response_of(const PlantModel& model, double w);

/// sqrt(mean |model - measured|^2 / sigma^2), sigma^2 = |truth|^2 (1 - c)/(n c): 1 where the model
/// misses the points by just their random error.
double misfit_in_sigma(const PlantModel& model, const PlantModel& truth,
                       const MeasuredResponse& measured, double averages);

/// Poles right of the axis, those within a hundredth of the lowest frequency not counted.
int unstable_poles_of(const PlantModel& model, double lowest_w);

} // namespace cornerwright
