#include "core/numerics/error.h"
#include "core/project/object_reader.h"
#include "core/project/project.h"
#include "core/project/read_parts.h"
#include "core/project/read_plant_cases.h"

#include <fstream>
#include <iterator>

namespace cornerwright {
namespace {

constexpr double newest_version = 1.0;

/// A file of a later program may hold anything, so its version is judged before its keys.
void check_version(const JsonNode& root, const std::string& file) {
    if (root.kind != JsonNode::Kind::object)
        throw InputError({file, root.line, root.column}, "a project {\"cornerwright\": 1, ...}",
                         described(root));
    for (const JsonMember& member : root.members) {
        if (member.key != "cornerwright")
            continue;
        const JsonNode& version = member.value;
        const InputPlace place{file, version.line, version.column};
        if (version.kind == JsonNode::Kind::number && version.number > newest_version)
            throw InputError(place, "a project file of version 1",
                             "version " + version.text +
                                 ", written by a newer Cornerwright than this one");
        if (version.kind != JsonNode::Kind::number || version.number != newest_version)
            throw InputError(place, "version 1 for \"cornerwright\"", described(version));
        return;
    }
    throw InputError({file, root.line, root.column},
                     "a project with the key \"cornerwright\" for its version", "none");
}

} // namespace

LoadedProject parse_project(const std::string& text, const std::string& file_name,
                            const std::filesystem::path& folder, MissingFiles missing) {
    const JsonNode root = read_json(text, file_name);
    check_version(root, file_name);
    const ObjectReader reader(root, file_name, "the project",
                              {"cornerwright", "title", "notes", "plant_cases", "compensator",
                               "sampling", "realisation", "requirements"});
    MeasurementLookup lookup{folder, missing, {}};
    LoadedProject loaded;
    Project& project = loaded.project;
    project.title = reader.text_or("title", {});
    project.notes = reader.text_or("notes", {});
    if (reader.has("plant_cases"))
        project.plant_cases = read_plant_cases(reader.list("plant_cases"), file_name, lookup);
    if (reader.has("compensator"))
        project.compensator = read_compensator(reader.list("compensator"), file_name);
    if (const JsonNode* sampling = reader.find("sampling"))
        project.sampling = read_sampling(*sampling, file_name);
    if (const JsonNode* realisation = reader.find("realisation"))
        project.realisation = read_realisation(*realisation, file_name);
    if (reader.has("requirements"))
        project.requirements = read_requirements(reader.list("requirements"), file_name);
    loaded.notices = std::move(lookup.notices);
    return loaded;
}

LoadedProject load_project(const std::filesystem::path& file, MissingFiles missing) {
    std::error_code error;
    std::ifstream in(file, std::ios::binary);
    if (!in || std::filesystem::is_directory(file, error))
        throw InputError({file.string(), {}, {}}, "a project file that can be read",
                         std::filesystem::exists(file, error) ? "one that cannot" : "no such file");
    const std::string text{std::istreambuf_iterator<char>(in), {}};
    return parse_project(text, file.string(), file.parent_path(), missing);
}

} // namespace cornerwright
