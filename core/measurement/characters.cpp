#include "core/measurement/characters.h"

#include <array>

namespace cornerwright {
namespace {

/// Windows-1252 from 0x80 to 0x9F, as published by the Unicode consortium (CP1252.TXT); undefined
/// bytes become the replacement character. The rest of the code page equals Latin-1.
constexpr std::array<std::uint16_t, 32> windows_1252 = {
    0x20AC, 0xFFFD, 0x201A, 0x0192, 0x201E, 0x2026, 0x2020, 0x2021, 0x02C6, 0x2030, 0x0160,
    0x2039, 0x0152, 0xFFFD, 0x017D, 0xFFFD, 0xFFFD, 0x2018, 0x2019, 0x201C, 0x201D, 0x2022,
    0x2013, 0x2014, 0x02DC, 0x2122, 0x0161, 0x203A, 0x0153, 0xFFFD, 0x017E, 0x0178};

/// Length of the sequence that starts here, and its code; 0 where it is not UTF-8 (RFC 3629).
std::size_t decode(std::string_view text, std::uint32_t& code) {
    const auto byte = [&](std::size_t i) { return static_cast<unsigned char>(text[i]); };
    const unsigned first = byte(0);
    if (first < 0x80U) {
        code = first;
        return 1;
    }
    const std::size_t length = first >= 0xF0U ? 4 : first >= 0xE0U ? 3 : 2;
    if (first < 0xC2U || first > 0xF4U || text.size() < length)
        return 0;
    code = first & (0x7FU >> length);
    for (std::size_t i = 1; i < length; ++i) {
        if ((byte(i) & 0xC0U) != 0x80U)
            return 0;
        code = code << 6U | (byte(i) & 0x3FU);
    }
    const bool overlong = (length == 3 && code < 0x800U) || (length == 4 && code < 0x10000U);
    const bool surrogate = code >= 0xD800U && code < 0xE000U;
    return overlong || surrogate || code > 0x10FFFFU ? 0 : length;
}

char32_t lower_case(std::uint32_t code) {
    const bool latin = code >= 0xC0U && code <= 0xDEU && code != 0xD7U;
    const bool greek = code >= 0x391U && code <= 0x3A8U;
    const bool ascii = code >= 'A' && code <= 'Z';
    return code + (latin || greek || ascii ? 0x20U : 0U);
}

} // namespace

char* append_utf8(std::uint32_t code, char* out) {
    const auto put = [&](std::uint32_t byte) { *out++ = static_cast<char>(byte); };
    if (code < 0x80U) {
        put(code);
    } else if (code < 0x800U) {
        put(0xC0U | code >> 6U);
        put(0x80U | (code & 0x3FU));
    } else if (code < 0x10000U) {
        put(0xE0U | code >> 12U);
        put(0x80U | (code >> 6U & 0x3FU));
        put(0x80U | (code & 0x3FU));
    } else {
        put(0xF0U | code >> 18U);
        put(0x80U | (code >> 12U & 0x3FU));
        put(0x80U | (code >> 6U & 0x3FU));
        put(0x80U | (code & 0x3FU));
    }
    return out;
}

bool is_utf8(std::string_view bytes) {
    std::uint32_t code = 0;
    while (!bytes.empty()) {
        const std::size_t length = decode(bytes, code);
        if (length == 0)
            return false;
        bytes.remove_prefix(length);
    }
    return true;
}

std::string utf8_from_windows_1252(std::string_view bytes) {
    std::string result;
    for (const char c : bytes) {
        const auto byte = static_cast<unsigned char>(c);
        const std::uint32_t code =
            byte >= 0x80U && byte < 0xA0U ? windows_1252[byte - 0x80U] : byte;
        std::array<char, 4> sequence{};
        result.append(sequence.data(), append_utf8(code, sequence.data()));
    }
    return result;
}

std::u32string folded(std::string_view utf8) {
    std::u32string result;
    std::uint32_t code = 0;
    while (!utf8.empty()) {
        const std::size_t length = decode(utf8, code);
        result.push_back(length == 0 ? char32_t{replacement_character} : lower_case(code));
        utf8.remove_prefix(length == 0 ? 1 : length);
    }
    return result;
}

} // namespace cornerwright
