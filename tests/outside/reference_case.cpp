#include "tests/outside/reference_case.h"

#include "app/cli/assessment_json.h"
#include "core/engine/engine.h"
#include "core/handover/handover.h"

#include <algorithm>
#include <chrono>
#include <cstdlib>
#include <fstream>
#include <stdexcept>
#include <unistd.h>

namespace cornerwright::outside {
namespace {

namespace fs = std::filesystem;

/// A folder that goes with the object.
class Folder {
  public:
    Folder() {
        std::string pattern = (fs::temp_directory_path() / "cornerwright-case-XXXXXX").string();
        path_ = ::mkdtemp(pattern.data());
    }
    ~Folder() {
        std::error_code ignored;
        fs::remove_all(path_, ignored);
    }
    Folder(const Folder&) = delete;
    Folder& operator=(const Folder&) = delete;

    fs::path write(const std::string& name, const std::string& text) const {
        fs::create_directories((path_ / name).parent_path());
        std::ofstream(path_ / name, std::ios::binary) << text;
        return path_ / name;
    }

  private:
    fs::path path_;
};

Project load(const ReferenceCase& reference, const Folder& folder) {
    if (reference.files.is_object())
        for (const auto& [file, text] : reference.files.items())
            folder.write(file, text.get<std::string>());
    return load_project(folder.write("project.cornerwright.json", reference.project.dump()))
        .project;
}

Json handover_json(const Project& project, const Assessment& assessment) {
    HandoverInput input;
    input.project = &project;
    input.assessment = &assessment;
    return Json::parse(handover_files(input, HandoverForm::json).front().bytes);
}

} // namespace

fs::path case_folder() {
    if (const char* folder = std::getenv("CORNERWRIGHT_CASES"))
        return folder;
    return fs::path(CORNERWRIGHT_TEST_DATA) / "outside" / "cases";
}

std::vector<std::string> case_names() {
    std::vector<std::string> names;
    for (const fs::directory_entry& entry : fs::directory_iterator(case_folder()))
        if (entry.path().extension() == ".json")
            names.push_back(entry.path().stem().string());
    std::sort(names.begin(), names.end());
    return names;
}

ReferenceCase read_case(const std::string& name) {
    const fs::path file = case_folder() / (name + ".json");
    std::ifstream stream(file);
    if (!stream)
        throw std::runtime_error("cannot read " + file.string());
    const Json json = Json::parse(stream);
    return {name, json.at("project"), json.value("files", Json()), json.at("expected"),
            json.value("tolerances", Json::object())};
}

Assessed assess(const ReferenceCase& reference) {
    const Folder folder;
    const Project project = load(reference, folder);
    Engine engine;
    const auto start = std::chrono::steady_clock::now();
    const auto assessment = engine.assess(project);
    const std::chrono::duration<double> taken = std::chrono::steady_clock::now() - start;

    Assessed result;
    result.seconds = taken.count();
    // Through text, as a reader of the printed figures gets them.
    result.assessment = Json::parse(cli::to_json(*assessment).dump());
    if (assessment->equation)
        result.handover = handover_json(project, *assessment);
    result.project = project;
    return result;
}

} // namespace cornerwright::outside
