#include "app/cli/command.h"

#include "core/numerics/number_text.h"

#include <algorithm>
#include <iostream>

namespace cornerwright::cli {

Project load_telling_notices(const std::string& file) {
    LoadedProject loaded = load_project(file);
    for (const std::string& notice : loaded.notices)
        std::cerr << file << ": " << notice << '\n';
    return std::move(loaded.project);
}

const PlantCase& case_named(const Project& project, const std::string& name) {
    const auto found =
        std::find_if(project.plant_cases.begin(), project.plant_cases.end(),
                     [&](const PlantCase& plant_case) { return plant_case.name == name; });
    if (found != project.plant_cases.end())
        return *found;
    std::string names;
    for (const PlantCase& plant_case : project.plant_cases)
        names += (names.empty() ? "\"" : ", \"") + plant_case.name + "\"";
    throw UsageError("--case: expected " + (names.empty() ? "a project with plant cases" : names) +
                     ", found \"" + name + "\"");
}

void add_loop_option(CLI::App& command, std::string& loop) {
    loop = "design";
    command.add_option("--loop", loop, "design or realised")
        ->check(CLI::IsMember({"design", "realised"}))
        ->capture_default_str();
}

std::vector<double> number_list(const std::string& text, const std::string& option, double above,
                                bool or_equal) {
    std::vector<double> values;
    for (std::size_t begin = 0; begin <= text.size();) {
        const std::size_t end = std::min(text.find(',', begin), text.size());
        const std::string part = text.substr(begin, end - begin);
        const auto value = parse_number(part);
        if (!value || *value < above || (*value == above && !or_equal))
            throw UsageError(option + ": expected numbers " + (or_equal ? "from " : "above ") +
                             number_text(above) + " separated by commas, found \"" + part + "\"");
        values.push_back(*value);
        begin = end + 1;
    }
    return values;
}

} // namespace cornerwright::cli
