#include "core/handover/handover.h"
#include "core/numerics/error.h"
#include "core/numerics/write_file.h"

#include <system_error>

namespace cornerwright {
namespace {

namespace fs = std::filesystem;

/// The folder and those above it that were missing; those that stay empty go with the object.
class MadeFolder {
  public:
    explicit MadeFolder(const fs::path& folder) {
        std::error_code problem;
        for (fs::path missing = folder; !missing.empty() && !fs::exists(missing, problem);
             missing = missing.parent_path())
            made_.push_back(missing);
        fs::create_directories(folder, problem);
        if (std::error_code ignored; problem || !fs::is_directory(folder, ignored))
            throw WriteError("could not make the folder " + folder.string() + ": " +
                             (problem ? problem.message() : "a file of that name stands there"));
    }
    ~MadeFolder() {
        std::error_code not_empty; // then it stays, as it should
        for (const fs::path& folder : made_)
            fs::remove(folder, not_empty);
    }
    MadeFolder(const MadeFolder&) = delete;
    MadeFolder& operator=(const MadeFolder&) = delete;

  private:
    std::vector<fs::path> made_; ///< the innermost first
};

} // namespace

void write_handover(const std::vector<HandoverFile>& files, const fs::path& folder) {
    const MadeFolder made(folder);
    std::vector<FileContent> contents;
    contents.reserve(files.size());
    for (const HandoverFile& file : files)
        contents.push_back({folder / file.name, file.bytes});
    write_files(contents);
}

} // namespace cornerwright
