#include "core/handover/handover.h"
#include "core/numerics/error.h"
#include "core/numerics/write_file.h"

#include <system_error>

namespace cornerwright {
namespace {

namespace fs = std::filesystem;

/// A folder of its own for the files on their way; gone again whatever happens.
class Staging {
  public:
    explicit Staging(fs::path place) : place_(std::move(place)) {
        std::error_code problem;
        fs::remove_all(place_, problem); // what a power cut may have left
        fs::create_directories(place_, problem);
        if (problem)
            throw WriteError("cannot write into the folder " + place_.parent_path().string() +
                             ": " + problem.message());
    }
    ~Staging() {
        std::error_code ignored;
        fs::remove_all(place_, ignored);
    }
    Staging(const Staging&) = delete;
    Staging& operator=(const Staging&) = delete;

    fs::path path_of(const std::string& name) const { return place_ / name; }

  private:
    fs::path place_;
};

void check_targets(const std::vector<HandoverFile>& files, const fs::path& folder) {
    for (const HandoverFile& file : files) {
        std::error_code problem;
        if (fs::is_directory(folder / file.name, problem))
            throw WriteError("cannot write " + (folder / file.name).string() +
                             ": a folder of that name stands there");
    }
}

} // namespace

void write_handover(const std::vector<HandoverFile>& files, const fs::path& folder) {
    check_targets(files, folder);
    const Staging staging(folder / (files.front().name + ".unfinished"));
    for (const HandoverFile& file : files)
        write_file(staging.path_of(file.name), file.bytes);
    for (const HandoverFile& file : files) {
        std::error_code problem;
        fs::rename(staging.path_of(file.name), folder / file.name, problem);
        if (problem)
            throw WriteError("cannot write " + (folder / file.name).string() + ": " +
                             problem.message());
    }
}

} // namespace cornerwright
