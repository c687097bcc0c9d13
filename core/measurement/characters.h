#pragma once

#include <cstdint>
#include <string>
#include <string_view>

namespace cornerwright {

inline constexpr std::uint32_t replacement_character = 0xFFFD;

/// Writes the UTF-8 of `code` (at most four bytes) and gives the place behind it.
char* append_utf8(std::uint32_t code, char* out);

bool is_utf8(std::string_view bytes);

std::string utf8_from_windows_1252(std::string_view bytes);

/// Code points of valid UTF-8; letters of Latin-1 and Greek in lower case. The capital omega is
/// left alone: in a heading it is the ohm.
std::u32string folded(std::string_view utf8);

} // namespace cornerwright
