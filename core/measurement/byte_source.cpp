#include "core/measurement/byte_source.h"

#include "core/numerics/error.h"

#include <algorithm>
#include <cstring>
#include <fstream>
#include <iterator>
#include <system_error>

namespace cornerwright {
namespace {

class MemorySource final : public ByteSource {
  public:
    explicit MemorySource(std::string_view bytes) : bytes_(bytes) {}
    explicit MemorySource(std::string owned) : owned_(std::move(owned)), bytes_(owned_) {}

    std::size_t read(char* into, std::size_t count) override {
        count = std::min(count, bytes_.size() - position_);
        if (count > 0)
            std::memcpy(into, bytes_.data() + position_, count);
        position_ += count;
        return count;
    }
    void rewind() override { position_ = 0; }
    std::uint64_t size() const override { return bytes_.size(); }

  private:
    std::string owned_;
    std::string_view bytes_;
    std::size_t position_ = 0;
};

class FileSource final : public ByteSource {
  public:
    FileSource(std::ifstream stream, std::uint64_t size)
        : stream_(std::move(stream)), size_(size) {}

    std::size_t read(char* into, std::size_t count) override {
        stream_.read(into, static_cast<std::streamsize>(count));
        return static_cast<std::size_t>(stream_.gcount());
    }
    void rewind() override {
        stream_.clear();
        stream_.seekg(0);
    }
    std::uint64_t size() const override { return size_; }

  private:
    std::ifstream stream_;
    std::uint64_t size_;
};

} // namespace

std::unique_ptr<ByteSource> memory_source(std::string_view bytes) {
    return std::make_unique<MemorySource>(bytes);
}

std::unique_ptr<ByteSource> file_source(const std::filesystem::path& file) {
    const auto refuse = [&](const std::string& found) {
        throw InputError({file.string(), {}, {}}, "a file that can be read", found);
    };
    std::error_code error;
    const auto status = std::filesystem::status(file, error);
    if (!std::filesystem::exists(status))
        refuse("no file of this name");
    if (std::filesystem::is_directory(status))
        refuse("a folder");
    std::ifstream stream;
    // Blocks are read into a buffer of our own; a second one in between would only copy.
    stream.rdbuf()->pubsetbuf(nullptr, 0);
    stream.open(file, std::ios::binary);
    if (!stream)
        refuse("one that cannot be opened");
    if (std::filesystem::is_regular_file(status))
        return std::make_unique<FileSource>(std::move(stream),
                                            std::filesystem::file_size(file, error));
    return std::make_unique<MemorySource>(
        std::string(std::istreambuf_iterator<char>(stream), std::istreambuf_iterator<char>()));
}

} // namespace cornerwright
