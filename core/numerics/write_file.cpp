#include "core/numerics/write_file.h"

#include "core/numerics/error.h"

#include <cerrno>
#include <cstring>
#include <fcntl.h>
#include <memory>
#include <optional>
#include <string>
#include <sys/stat.h>
#include <unistd.h>
#include <utility>
#include <vector>

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

constexpr mode_t permission_bits = 07777;

/// One file on its way: the new content beside its place under another name, gone again with the
/// object unless it was placed.
class StagedFile {
  public:
    StagedFile(const fs::path& file, std::string_view content)
        : file_(file), target_(resolved(file)), beside_(beside("part")), old_(beside("old")) {
        check_replaceable(file_, target_);
        struct stat old {};
        replaces_ = ::stat(target_.c_str(), &old) == 0;
        try {
            write(content, replaces_ ? std::optional(old.st_mode & permission_bits) : std::nullopt);
        } catch (...) {
            ::unlink(beside_.c_str());
            throw;
        }
    }
    ~StagedFile() {
        if (!placed_)
            ::unlink(beside_.c_str());
        if (kept_)
            ::unlink(old_.c_str());
    }
    StagedFile(const StagedFile&) = delete;
    StagedFile& operator=(const StagedFile&) = delete;

    /// A second name for what stands there, so that `put_back` can bring it back.
    void keep_old() {
        if (!replaces_)
            return;
        ::unlink(old_.c_str()); // what a power cut may have left
        std::error_code error;
        fs::create_hard_link(target_, old_, error);
        if (error) // a file system without links
            fs::copy_file(target_, old_, error);
        if (error)
            refuse(file_, error.message());
        kept_ = true;
    }

    void place() {
        if (::rename(beside_.c_str(), target_.c_str()) != 0)
            refuse(file_, std::strerror(errno));
        placed_ = true;
    }

    void put_back() {
        if (!placed_)
            return;
        if (kept_)
            kept_ = ::rename(old_.c_str(), target_.c_str()) != 0;
        else
            ::unlink(target_.c_str());
    }

    /// The new name itself must survive a power cut; a file system that cannot sync a folder is
    /// not a failed save.
    void sync_folder() const {
        const Descriptor parent(::open(folder().c_str(), O_RDONLY | O_DIRECTORY | O_CLOEXEC));
        if (parent.is_open())
            ::fsync(parent.number());
    }

  private:
    fs::path folder() const {
        return target_.has_parent_path() ? target_.parent_path() : fs::path(".");
    }
    fs::path beside(const char* suffix) const {
        return folder() / ("." + target_.filename().string() + "." + std::to_string(::getpid()) +
                           "." + suffix);
    }

    void write(std::string_view content, std::optional<mode_t> permissions) {
        constexpr mode_t readable_by_all = 0666; // narrowed by the user's umask
        Descriptor out(::open(beside_.c_str(),
                              O_WRONLY | O_CREAT | O_TRUNC | O_CLOEXEC | O_NOFOLLOW,
                              readable_by_all));
        if (!out.is_open() || !write_all(out.number(), content) ||
            (permissions && ::fchmod(out.number(), *permissions) != 0) ||
            ::fsync(out.number()) != 0 || !out.close())
            refuse(file_, std::strerror(errno));
    }

    fs::path file_;
    fs::path target_;
    fs::path beside_;
    fs::path old_;
    bool replaces_ = false;
    bool kept_ = false;
    bool placed_ = false;
};

} // namespace

void write_file(const fs::path& file, std::string_view content) {
    StagedFile staged(file, content);
    staged.place();
    staged.sync_folder();
}

void write_files(std::span<const FileContent> files) {
    std::vector<std::unique_ptr<StagedFile>> staged;
    for (const FileContent& one : files)
        staged.push_back(std::make_unique<StagedFile>(one.file, one.content));
    for (const auto& one : staged)
        one->keep_old();
    try {
        for (const auto& one : staged)
            one->place();
    } catch (const WriteError&) {
        for (const auto& one : staged)
            one->put_back();
        throw;
    }
    for (const auto& one : staged)
        one->sync_folder();
}

} // namespace cornerwright
