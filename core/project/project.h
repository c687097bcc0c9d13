#pragma once

#include "core/compensator/chain.h"
#include "core/plant/plant_case.h"
#include "core/realisation/realisation.h"
#include "core/requirements/requirement.h"

#include <filesystem>
#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// Everything the user decided, as a plain value: copied for undo, compared for "modified", written
/// to one file. Every edit makes a new value.
struct Project {
    std::string title;
    std::string notes;
    std::vector<PlantCase> plant_cases;
    Chain compensator;
    std::optional<Sampling> sampling;
    std::optional<Realisation> realisation;
    std::vector<Requirement> requirements;

    bool operator==(const Project&) const = default;
};

/// A project from a file, with what the user must be told about it.
struct LoadedProject {
    Project project;
    /// One sentence each: a measurement that changed since it was pinned, a file that is missing
    /// where `tolerant` allowed it.
    std::vector<std::string> notices;
};

enum class MissingFiles {
    are_errors,  ///< command line: InputError
    are_notices, ///< window: the case keeps its place with no response
};

/// Reads project-file version 1 and the measurements it names (relative to the project file).
/// Throws InputError with file, line and column: JSON syntax, unknown key, wrong type or unit key,
/// value out of bounds, formula error, improper plant, newer version, two cases of one name.
LoadedProject load_project(const std::filesystem::path& file,
                           MissingFiles missing = MissingFiles::are_errors);

/// The same from text; measurements are looked for in `folder`, and errors name `file_name`.
LoadedProject parse_project(const std::string& text, const std::string& file_name,
                            const std::filesystem::path& folder,
                            MissingFiles missing = MissingFiles::are_errors);

/// The project as version-1 text: keys in the documented order, shortest round-trip numbers.
std::string to_text(const Project& project);

/// Writes beside the target, syncs and renames. Throws WriteError; the old file then stands as it
/// was.
void save_project(const Project& project, const std::filesystem::path& file);

} // namespace cornerwright
