#pragma once

#include <array>
#include <cstdint>
#include <string_view>

namespace cornerwright {

/// What a field of a table holds where a number is due.
enum class FieldKind {
    number,
    missing,        ///< empty, NaN, overload and their like, or a size of 9.9e37 or more
    minus_infinity, ///< missing too, but as a magnitude in dB it says "exactly zero"
    text,
};

/// Instruments write 9.9e37 (or 9.91e37) for "not a number" (SCPI 1999.0, volume 1, 7.2.1).
inline constexpr double instrument_not_a_number = 9.9e37;

/// The number that begins at `begin`: optional sign, digits with at most one `decimal` sign,
/// exponent with e, E, d or D. Gives the place behind it and sets `value`, correctly rounded; gives
/// `begin` where no number begins. Beyond the range of double the value is infinite or zero.
const char* parse_number_slowly(const char* begin, const char* end, char decimal, double& value);

/// Powers of ten that double holds exactly.
inline constexpr std::array<double, 23> exact_powers_of_ten = {
    1e0,  1e1,  1e2,  1e3,  1e4,  1e5,  1e6,  1e7,  1e8,  1e9,  1e10, 1e11,
    1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19, 1e20, 1e21, 1e22};

/// As `parse_number_slowly`, by the short way where that is exact: an integer below 2^53 times or
/// divided by a power of ten that double holds exactly is rounded once (Clinger, "How to read
/// floating point numbers accurately", 1990).
inline const char* parse_number(const char* begin, const char* end, char decimal, double& value) {
    const char* p = begin;
    const bool negative = p != end && *p == '-';
    if (p != end && (*p == '-' || *p == '+'))
        ++p;
    const auto digit = [](char c) { return static_cast<unsigned>(c - '0'); };
    std::uint64_t mantissa = 0;
    const char* first = p;
    while (p != end && digit(*p) < 10)
        mantissa = 10 * mantissa + digit(*p++);
    auto digits = p - first;
    int exponent = 0;
    if (p != end && *p == decimal) {
        const char* fraction = ++p;
        while (p != end && digit(*p) < 10)
            mantissa = 10 * mantissa + digit(*p++);
        exponent = -static_cast<int>(p - fraction);
        digits += p - fraction;
    }
    // Nineteen digits fit 64 bits.
    if (digits == 0 || digits > 19)
        return parse_number_slowly(begin, end, decimal, value);
    if (p != end && ((*p | 0x20) == 'e' || (*p | 0x20) == 'd')) {
        const char* q = p + 1;
        const bool down = q != end && *q == '-';
        if (q != end && (*q == '-' || *q == '+'))
            ++q;
        const char* exponent_digits = q;
        int written = 0;
        while (q != end && digit(*q) < 10 && q - exponent_digits < 4)
            written = 10 * written + static_cast<int>(digit(*q++));
        if (q == exponent_digits || (q != end && digit(*q) < 10))
            return parse_number_slowly(begin, end, decimal, value);
        exponent += down ? -written : written;
        p = q;
    }
    if (mantissa > (std::uint64_t{1} << 53) || exponent < -22 || exponent > 22)
        return parse_number_slowly(begin, end, decimal, value);
    const auto integer = static_cast<double>(mantissa);
    const double size = exponent < 0
                            ? integer / exact_powers_of_ten[static_cast<unsigned>(-exponent)]
                            : integer * exact_powers_of_ten[static_cast<unsigned>(exponent)];
    value = negative ? -size : size;
    return p;
}

/// Without surrounding spaces and tabs.
std::string_view trimmed(std::string_view text);

/// Without surrounding spaces and one pair of double quotes.
std::string_view unquoted(std::string_view field);

/// Judges a whole field (spaces and quotes around it do not count).
FieldKind judge_field(std::string_view field, char decimal, double& value);

} // namespace cornerwright
