#pragma once

#include <cstddef>
#include <cstdint>
#include <filesystem>
#include <memory>
#include <string>
#include <string_view>

namespace cornerwright {

/// Bytes that can be read from the start more than once.
class ByteSource {
  public:
    virtual ~ByteSource() = default;

    /// Fills up to `count` bytes; fewer only at the end.
    virtual std::size_t read(char* into, std::size_t count) = 0;
    virtual void rewind() = 0;
    virtual std::uint64_t size() const = 0;
};

/// Bytes held elsewhere, which must outlive the source.
std::unique_ptr<ByteSource> memory_source(std::string_view bytes);

/// A file, read in pieces. What cannot be read twice (a pipe) is kept in memory instead.
/// Throws InputError where there is no such file, or it cannot be read.
std::unique_ptr<ByteSource> file_source(const std::filesystem::path& file);

} // namespace cornerwright
