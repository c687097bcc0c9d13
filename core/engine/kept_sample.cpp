#include "core/engine/kept_sample.h"

#include "core/measurement/write_response.h"
#include "core/project/load_measurement.h"

#include <algorithm>
#include <cctype>
#include <system_error>

namespace cornerwright {
namespace {

namespace fs = std::filesystem;

std::string free_name(const Project& project, const std::string& name) {
    const auto is_taken = [&](const std::string& wanted) {
        return std::any_of(project.plant_cases.begin(), project.plant_cases.end(),
                           [&](const PlantCase& other) { return other.name == wanted; });
    };
    std::string result = name;
    for (int i = 2; is_taken(result); ++i)
        result = name + " " + std::to_string(i);
    return result;
}

/// Letters, digits and hyphens of the name: what every file system takes. Never a file that is
/// there already.
fs::path free_file(const fs::path& folder, const std::string& name) {
    std::string stem;
    for (const char c : name)
        stem += std::isalnum(static_cast<unsigned char>(c)) != 0 ? c : '-';
    fs::path file = folder / (stem + ".csv");
    std::error_code error;
    for (int i = 2; fs::exists(file, error); ++i)
        file = folder / (stem + "-" + std::to_string(i) + ".csv");
    return file;
}

} // namespace

PlantCase kept_case(const Project& project, const LoopPlant& plant, const std::string& name,
                    const fs::path& folder) {
    const std::string own = free_name(project, name);
    if (const auto* model = std::get_if<PlantModel>(&plant))
        return {own, RootsSource{*model}};
    const auto& measured = std::get<MeasuredPlant>(plant);
    const fs::path file = free_file(folder, own);
    write_response(*measured.response, file, {own});
    MeasurementSource source;
    source.file = file.filename().string();
    source.sha256 = sha256_of_file(file);
    source.integrators = measured.integrators;
    source.unstable_poles = measured.unstable_poles;
    source.fit = measured.fit;
    // As a later opening reads it: the table holds frequencies to the last bit but one.
    source.response = std::make_shared<const MeasuredResponse>(read_measurement(file).response);
    return {own, source};
}

} // namespace cornerwright
