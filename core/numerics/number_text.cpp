#include "core/numerics/number_text.h"

#include <array>
#include <charconv>
#include <cmath>

namespace cornerwright {
namespace {

/// The longest shortest form is "-2.2250738585072014e-308", 24 characters; the rounded one is
/// bounded by its digits, which no caller asks to exceed 17.
using Buffer = std::array<char, 64>;

} // namespace

std::string number_text(double value) {
    Buffer buffer;
    const auto result = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value);
    return {buffer.data(), result.ptr};
}

std::string number_text(double value, int digits) {
    Buffer buffer;
    const auto result = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value,
                                      std::chars_format::general, digits);
    return {buffer.data(), result.ptr};
}

std::optional<double> parse_number(std::string_view text) {
    if (text.starts_with('+')) {
        text.remove_prefix(1);
        if (text.starts_with('-') || text.starts_with('+'))
            return std::nullopt;
    }
    double value = 0.0;
    const auto result = std::from_chars(text.data(), text.data() + text.size(), value);
    if (result.ec != std::errc{} || result.ptr != text.data() + text.size() ||
        !std::isfinite(value))
        return std::nullopt;
    return value;
}

} // namespace cornerwright
