#pragma once

#include "core/plant/plant_case.h"
#include "core/project/json_document.h"
#include "core/project/project.h"

#include <filesystem>
#include <string>
#include <vector>

namespace cornerwright {

/// Where measurements are looked for and what becomes of those that cannot be read.
struct MeasurementLookup {
    std::filesystem::path folder;
    MissingFiles missing = MissingFiles::are_errors;
    std::vector<std::string> notices; ///< grows
};

/// The plant cases of the project file with their measurements. Throws InputError with file, line
/// and column: no or several sources, two cases of one name, formula errors (the column counted in
/// the formula), improper plants, complex roots without their twin.
std::vector<PlantCase> read_plant_cases(const std::vector<JsonNode>& items, const std::string& file,
                                        MeasurementLookup& lookup);

} // namespace cornerwright
