#include "core/numerics/write_file.h"

#include "core/numerics/error.h"

#include <cerrno>
#include <cstring>
#include <fcntl.h>
#include <string>
#include <sys/stat.h>
#include <unistd.h>
#include <utility>

namespace cornerwright {
namespace {

namespace fs = std::filesystem;

constexpr fs::perms any_write =
    fs::perms::owner_write | fs::perms::group_write | fs::perms::others_write;

[[noreturn]] void refuse(const fs::path& file, const std::string& reason) {
    throw WriteError("could not write " + file.string() + ": " + reason);
}

/// A descriptor that is closed whatever happens.
class Descriptor {
  public:
    explicit Descriptor(int number) : number_(number) {}
    ~Descriptor() {
        if (number_ >= 0)
            ::close(number_);
    }
    Descriptor(const Descriptor&) = delete;
    Descriptor& operator=(const Descriptor&) = delete;

    int number() const { return number_; }
    bool is_open() const { return number_ >= 0; }
    /// Closing can report a write that failed late.
    bool close() { return ::close(std::exchange(number_, -1)) == 0; }

  private:
    int number_;
};

bool write_all(int descriptor, std::string_view content) {
    while (!content.empty()) {
        const ssize_t written = ::write(descriptor, content.data(), content.size());
        if (written < 0 && errno == EINTR)
            continue;
        if (written <= 0)
            return false;
        content.remove_prefix(static_cast<std::size_t>(written));
    }
    return true;
}

/// Where the bytes really go: behind a symbolic link stands the file that is meant.
fs::path resolved(const fs::path& file) {
    std::error_code error;
    const fs::path target = fs::canonical(file, error);
    return error ? file : target;
}

void check_replaceable(const fs::path& file, const fs::path& target) {
    std::error_code error;
    const fs::file_status status = fs::status(target, error);
    if (status.type() == fs::file_type::not_found)
        return;
    if (status.type() != fs::file_type::regular)
        refuse(file, "it is not a regular file");
    // A rename would replace a file whose owner protected it, so the protection is looked at here.
    if ((status.permissions() & any_write) == fs::perms::none ||
        ::access(target.c_str(), W_OK) != 0)
        refuse(file, "it is read-only");
}

} // namespace

void write_file(const fs::path& file, std::string_view content) {
    const fs::path target = resolved(file);
    check_replaceable(file, target);
    const fs::path folder = target.has_parent_path() ? target.parent_path() : fs::path(".");
    const fs::path beside =
        folder / ("." + target.filename().string() + "." + std::to_string(::getpid()) + ".part");

    struct stat old {};
    const bool replaces = ::stat(target.c_str(), &old) == 0;
    constexpr mode_t readable_by_all = 0666; // narrowed by the user's umask
    Descriptor out(::open(beside.c_str(), O_WRONLY | O_CREAT | O_TRUNC | O_CLOEXEC | O_NOFOLLOW,
                          readable_by_all));
    if (!out.is_open())
        refuse(file, std::strerror(errno));
    bool good = write_all(out.number(), content) &&
                (!replaces || ::fchmod(out.number(), old.st_mode & 07777) == 0) &&
                ::fsync(out.number()) == 0;
    int reason = errno;
    if (!out.close() && good) {
        good = false;
        reason = errno;
    }
    if (good && ::rename(beside.c_str(), target.c_str()) != 0) {
        good = false;
        reason = errno;
    }
    if (!good) {
        ::unlink(beside.c_str());
        refuse(file, std::strerror(reason));
    }
    // The new name itself must survive a power cut; a file system that cannot sync a folder is not
    // a failed save.
    const Descriptor parent(::open(folder.c_str(), O_RDONLY | O_DIRECTORY | O_CLOEXEC));
    if (parent.is_open())
        ::fsync(parent.number());
}

} // namespace cornerwright
