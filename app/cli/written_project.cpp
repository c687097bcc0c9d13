#include "app/cli/written_project.h"

#include <filesystem>

namespace cornerwright::cli {
namespace {

namespace fs = std::filesystem;

/// Measurements are named relative to the project file; a project written to another folder names
/// the same files from there.
void name_measurements_from(Project& project, const fs::path& from, const fs::path& to) {
    const fs::path source = fs::weakly_canonical(fs::absolute(from)).parent_path();
    const fs::path target = fs::weakly_canonical(fs::absolute(to)).parent_path();
    if (source == target)
        return;
    for (PlantCase& plant_case : project.plant_cases) {
        if (auto* measurement = std::get_if<MeasurementSource>(&plant_case.source))
            measurement->file =
                (source / measurement->file).lexically_relative(target).generic_string();
    }
}

} // namespace

void write_project(Project project, const std::string& from, const std::string& to) {
    name_measurements_from(project, from, to);
    save_project(project, to);
}

} // namespace cornerwright::cli
