#pragma once

#include "core/fitting/fit.h"
#include "core/project/project.h"
#include "widgets/import/response_preview.h"

#include <QString>

#include <cstddef>
#include <memory>
#include <optional>

namespace cornerwright {

std::optional<std::size_t> indexOfCase(const Project& project, const std::string& name);

/// The points of a measured case; null for any other.
std::shared_ptr<const MeasuredResponse> measuredResponseOf(const PlantCase& plantCase);

/// The project with the model in the case at `index`, which is a measured one.
Project withFit(const Project& project, std::size_t index, const FitResult& fit);

/// The model at the measured frequencies, its phase starting beside the measured one.
PreviewCurve previewOfModel(const PlantModel& model, const MeasuredResponse& measured);

/// Order, misfit, dead time and roots for people.
QString fitWords(const FitResult& fit);

} // namespace cornerwright
