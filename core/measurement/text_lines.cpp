#include "core/measurement/text_lines.h"

#include "core/measurement/characters.h"

#include <algorithm>
#include <cstdint>
#include <cstring>
#include <utility>

namespace cornerwright {
namespace {

constexpr std::size_t block = std::size_t{1} << 20;
/// Control bytes that a text may hold by accident (form feeds, an end-of-file mark).
constexpr std::size_t tolerated_control_bytes = 4;

bool is_continuation(char byte) {
    return (static_cast<unsigned char>(byte) & 0xC0U) == 0x80U;
}

std::size_t characters_in(std::string_view text) {
    return text.size() -
           static_cast<std::size_t>(std::count_if(text.begin(), text.end(), is_continuation));
}

} // namespace

TextLines::TextLines(ByteSource& source, std::string file_name, Progress progress, Binary binary)
    : source_(source),
      file_name_(std::move(file_name)),
      progress_(std::move(progress)),
      binary_(binary) {}

void TextLines::rewind() {
    source_.rewind();
    started_ = ended_ = after_carriage_return_ = false;
    characters_ = Characters::bytes;
    bytes_read_ = 0;
    position_ = filled_ = 0;
    control_bytes_ = 0;
    line_number_ = 0;
    high_surrogate_ = 0;
    pending_.clear();
}

void TextLines::refuse(std::optional<int> line, std::optional<int> column, std::string expected,
                       std::string found) const {
    throw InputError({file_name_, line, column}, std::move(expected), std::move(found));
}

void TextLines::refuse_binary() const {
    refuse({}, {}, "text", "a binary file");
}

const char* TextLines::line_end() const {
    if (position_ == filled_)
        return nullptr;
    return static_cast<const char*>(
        std::memchr(buffer_.data() + position_, '\n', filled_ - position_));
}

bool TextLines::next_across_blocks(std::string_view& line) {
    while (line_end() == nullptr && !ended_)
        fill();
    if (position_ == filled_)
        return false;
    const char* end = line_end();
    const char* begin = buffer_.data() + position_;
    const std::size_t length =
        end == nullptr ? filled_ - position_ : static_cast<std::size_t>(end - begin);
    line = {begin, length};
    position_ += length + (end == nullptr ? 0 : 1);
    ++line_number_;
    check_length(line);
    return true;
}

void TextLines::start() {
    started_ = true;
    pending_.resize(3);
    pending_.resize(source_.read(pending_.data(), pending_.size()));
    bytes_read_ = pending_.size();
    if (pending_.starts_with("\xEF\xBB\xBF")) {
        pending_.clear();
    } else if (pending_.starts_with("\xFF\xFE")) {
        characters_ = Characters::utf16_little;
        pending_.erase(0, 2);
    } else if (pending_.starts_with("\xFE\xFF")) {
        characters_ = Characters::utf16_big;
        pending_.erase(0, 2);
    }
}

void TextLines::fill() {
    if (!started_)
        start();
    const std::size_t rest = filled_ - position_;
    // Four bytes a character is the most: a line that fills this much is too long for certain.
    if (rest > 4 * longest_line)
        refuse_endless_line();
    if (rest > 0)
        std::memmove(buffer_.data(), buffer_.data() + position_, rest);
    position_ = 0;
    filled_ = rest;
    buffer_.resize(rest + block);
    char* into = buffer_.data() + rest;
    std::size_t count =
        characters_ == Characters::bytes ? take_bytes(into, block) : take_utf16(into, block);
    if (!binary_seen_)
        look_for_binary(into, count);
    filled_ += unify_line_ends(into, count);
    if (progress_ && source_.size() > 0 &&
        !progress_(
            std::min(1.0, static_cast<double>(bytes_read_) / static_cast<double>(source_.size()))))
        throw ReadingCancelled{};
}

std::size_t TextLines::take_bytes(char* into, std::size_t room) {
    const std::size_t first = pending_.size();
    std::copy(pending_.begin(), pending_.end(), into);
    pending_.clear();
    const std::size_t count = source_.read(into + first, room - first);
    bytes_read_ += count;
    ended_ = count < room - first;
    return first + count;
}

std::size_t TextLines::take_utf16(char* into, std::size_t room) {
    // One unit of two bytes becomes three at most (a surrogate pair of four becomes four).
    raw_.resize(room / 3 * 2);
    const std::size_t first = pending_.size();
    std::copy(pending_.begin(), pending_.end(), raw_.begin());
    pending_.clear();
    const std::size_t wanted = raw_.size() - first;
    const std::size_t got = source_.read(raw_.data() + first, wanted);
    bytes_read_ += got;
    ended_ = got < wanted;
    const std::size_t count = first + got;
    char* out = into;
    for (std::size_t i = 0; i + 1 < count; i += 2) {
        const auto low = static_cast<unsigned char>(raw_[i]);
        const auto high = static_cast<unsigned char>(raw_[i + 1]);
        const std::uint32_t unit = characters_ == Characters::utf16_little
                                       ? std::uint32_t{low} | std::uint32_t{high} << 8U
                                       : std::uint32_t{high} | std::uint32_t{low} << 8U;
        if (unit >= 0xD800U && unit < 0xDC00U) {
            high_surrogate_ = unit;
            continue;
        }
        std::uint32_t code = unit;
        if (unit >= 0xDC00U && unit < 0xE000U)
            code = high_surrogate_ == 0
                       ? replacement_character
                       : 0x10000U + ((high_surrogate_ - 0xD800U) << 10U) + (unit - 0xDC00U);
        high_surrogate_ = 0;
        out = append_utf8(code, out);
    }
    if (count % 2 != 0)
        pending_.assign(1, raw_[count - 1]);
    return static_cast<std::size_t>(out - into);
}

std::size_t TextLines::unify_line_ends(char* text, std::size_t count) {
    if (count == 0)
        return 0;
    if (!after_carriage_return_ && std::memchr(text, '\r', count) == nullptr)
        return count;
    char* out = text;
    for (std::size_t i = 0; i < count; ++i) {
        const char c = text[i];
        if (c == '\r')
            *out++ = '\n';
        else if (c != '\n' || !after_carriage_return_)
            *out++ = c;
        after_carriage_return_ = c == '\r';
    }
    return static_cast<std::size_t>(out - text);
}

void TextLines::look_for_binary(const char* text, std::size_t count) {
    std::size_t zero = 0;
    std::size_t control = 0;
    // Runs short enough for counters of one byte, which the compiler turns into vectors.
    for (std::size_t begin = 0; begin < count; begin += 255) {
        const std::size_t end = std::min(count, begin + 255);
        std::uint8_t zeros = 0;
        std::uint8_t controls = 0;
        for (std::size_t i = begin; i < end; ++i) {
            const auto c = static_cast<std::uint8_t>(text[i]);
            zeros = static_cast<std::uint8_t>(zeros + (c == 0));
            const bool usual = (c == '\t') | (c == '\n') | (c == '\r');
            controls = static_cast<std::uint8_t>(controls + ((c < 0x20) & !usual));
        }
        zero += zeros;
        control += controls;
    }
    control_bytes_ += control;
    if (zero == 0 && control_bytes_ <= tolerated_control_bytes)
        return;
    binary_seen_ = true;
    if (binary_ == Binary::refuse)
        refuse_binary();
}

void TextLines::check_length(std::string_view line) const {
    if (line.size() <= longest_line)
        return;
    if (const std::size_t length = characters_in(line); length > longest_line)
        refuse(line_number_, {}, "lines of a reasonable length (65536 characters at most)",
               "one of " + std::to_string(length) + " characters");
}

void TextLines::refuse_endless_line() {
    std::size_t length = 0;
    while (true) {
        const char* end = line_end();
        const std::size_t stop =
            end == nullptr ? filled_ : static_cast<std::size_t>(end - buffer_.data());
        length += characters_in({buffer_.data() + position_, stop - position_});
        position_ = stop;
        if (end != nullptr || ended_)
            break;
        position_ = filled_ = 0;
        fill();
    }
    refuse(line_number_ + 1, {}, "lines of a reasonable length (65536 characters at most)",
           "one of " + std::to_string(length) + " characters");
}

std::string readable(std::string_view bytes) {
    return is_utf8(bytes) ? std::string(bytes) : utf8_from_windows_1252(bytes);
}

std::string quoted_in_message(std::string_view text) {
    constexpr std::size_t most = 60;
    while (!text.empty() && (text.front() == ' ' || text.front() == '\t'))
        text.remove_prefix(1);
    while (!text.empty() && (text.back() == ' ' || text.back() == '\t'))
        text.remove_suffix(1);
    if (text.empty())
        return "nothing";
    std::string result = readable(text);
    if (result.size() > most) {
        std::size_t cut = most;
        while (cut > 0 && is_continuation(result[cut]))
            --cut;
        result = result.substr(0, cut) + "...";
    }
    return result;
}

} // namespace cornerwright
