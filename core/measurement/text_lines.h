#pragma once

#include "core/measurement/byte_source.h"
#include "core/numerics/error.h"

#include <functional>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// The longest line that is read, in characters.
inline constexpr std::size_t longest_line = 65'536;

/// Thrown (and caught inside the readers) when the progress callback asks to stop.
struct ReadingCancelled {};

/// Lines of a text file, whatever its line ends (LF, CRLF, CR) and its characters: byte order marks
/// of UTF-8 and UTF-16 are obeyed and UTF-16 arrives as UTF-8; bytes without a mark arrive as they
/// are (see `readable`). The file is read in blocks; one block is in memory.
class TextLines {
  public:
    using Progress = std::function<bool(double)>;
    enum class Binary {
        refuse,  ///< zero bytes or more than a few control bytes throw at once
        remember ///< they only set `looks_binary`
    };

    TextLines(ByteSource& source, std::string file_name, Progress progress = {},
              Binary binary = Binary::refuse);

    /// The next line without its end; the view holds until the next call.
    /// Throws InputError for a binary file and for a line longer than `longest_line`.
    bool next(std::string_view& line) {
        if (const char* end = line_end(); end != nullptr) [[likely]] {
            line = {buffer_.data() + position_,
                    static_cast<std::size_t>(end - buffer_.data()) - position_};
            position_ += line.size() + 1;
            ++line_number_;
            if (line.size() > longest_line) [[unlikely]]
                check_length(line);
            return true;
        }
        return next_across_blocks(line);
    }

    /// Number of the line that `next` gave last, from 1.
    int line_number() const { return line_number_; }

    void rewind();

    bool looks_binary() const { return binary_seen_; }
    [[noreturn]] void refuse_binary() const;

    const std::string& file_name() const { return file_name_; }

    /// An error in this file at the given place.
    [[noreturn]] void refuse(std::optional<int> line, std::optional<int> column,
                             std::string expected, std::string found) const;

  private:
    const char* line_end() const;
    bool next_across_blocks(std::string_view& line);
    void fill();
    void start();
    std::size_t take_bytes(char* into, std::size_t room);
    std::size_t take_utf16(char* into, std::size_t room);
    std::size_t unify_line_ends(char* text, std::size_t count);
    void look_for_binary(const char* text, std::size_t count);
    void check_length(std::string_view line) const;
    [[noreturn]] void refuse_endless_line();

    enum class Characters { bytes, utf16_little, utf16_big };

    ByteSource& source_;
    std::string file_name_;
    Progress progress_;
    Binary binary_;
    bool binary_seen_ = false;
    std::size_t control_bytes_ = 0;
    Characters characters_ = Characters::bytes;
    bool started_ = false;
    bool ended_ = false;
    bool after_carriage_return_ = false;
    std::uint64_t bytes_read_ = 0;
    std::string buffer_;
    std::size_t position_ = 0;
    std::size_t filled_ = 0;
    int line_number_ = 0;
    std::string pending_; ///< the first bytes, taken to look for a byte order mark
    std::string raw_;     ///< a block of UTF-16 before it becomes UTF-8
    std::uint32_t high_surrogate_ = 0;
};

/// Text for people: as it is where it is UTF-8, else taken as Windows-1252.
std::string readable(std::string_view bytes);

/// `text` for the "found" part of a message: readable, trimmed, and cut where it is long.
std::string quoted_in_message(std::string_view text);

} // namespace cornerwright
