#include "core/handover/number_literals.h"

#include <array>
#include <charconv>
#include <cmath>
#include <cstdint>

namespace cornerwright {
namespace {

template <class T>
std::string shortest(T value) {
    std::array<char, 40> buffer{};
    const auto end = std::to_chars(buffer.data(), buffer.data() + buffer.size(), value);
    return {buffer.data(), end.ptr};
}

} // namespace

std::string real_literal(double value, NumberFormat::Type type) {
    std::string text =
        type == NumberFormat::Type::float32 ? shortest(static_cast<float>(value)) : shortest(value);
    if (text.find('.') != std::string::npos)
        return text;
    const std::size_t exponent = text.find('e');
    text.insert(exponent == std::string::npos ? text.size() : exponent, ".0");
    return text;
}

std::string word_literal(double value, const NumberFormat& format) {
    return std::to_string(static_cast<std::int64_t>(std::ldexp(value, format.fraction_bits)));
}

std::string signal_literal(double value, const NumberFormat& format) {
    return format.type == NumberFormat::Type::fixed ? word_literal(value, format)
                                                    : real_literal(value, format.type);
}

} // namespace cornerwright
