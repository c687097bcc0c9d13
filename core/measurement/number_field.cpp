#include "core/measurement/number_field.h"

#include <algorithm>
#include <charconv>
#include <cmath>
#include <limits>
#include <string>
#include <system_error>

namespace cornerwright {
namespace {

bool is_digit(char c) {
    return c >= '0' && c <= '9';
}

/// End of the number that begins at `begin`, or `begin`.
const char* end_of_number(const char* begin, const char* end, char decimal) {
    const char* p = begin;
    if (p != end && (*p == '-' || *p == '+'))
        ++p;
    const auto skip_digits = [&] {
        const char* from = p;
        p = std::find_if_not(p, end, is_digit);
        return p - from;
    };
    auto digits = skip_digits();
    if (p != end && *p == decimal) {
        ++p;
        digits += skip_digits();
    }
    if (digits == 0)
        return begin;
    const char* mantissa_end = p;
    if (p == end || std::string_view("eEdD").find(*p) == std::string_view::npos)
        return mantissa_end;
    ++p;
    if (p != end && (*p == '-' || *p == '+'))
        ++p;
    return skip_digits() > 0 ? p : mantissa_end;
}

/// std::from_chars tells that a value is out of range, not on which side.
double out_of_range(std::string_view number) {
    const std::size_t e = number.find('e');
    const std::string_view mantissa = number.substr(0, e);
    // Decimal exponent of the first digit that is not zero.
    const std::size_t point = std::min(mantissa.find('.'), mantissa.size());
    const std::size_t first = mantissa.find_first_of("123456789");
    const long place =
        first < point ? static_cast<long>(point - first) - 1 : -static_cast<long>(first - point);
    // An exponent too long for any integer decides by its sign alone.
    long written = 0;
    if (e != std::string_view::npos) {
        std::string_view digits = number.substr(e + 1);
        digits.remove_prefix(digits.starts_with('+') ? 1 : 0);
        const auto [unused, error] =
            std::from_chars(digits.data(), digits.data() + digits.size(), written);
        if (error == std::errc::result_out_of_range)
            return digits.starts_with('-') ? 0.0 : std::numeric_limits<double>::infinity();
    }
    return written > -place ? std::numeric_limits<double>::infinity() : 0.0;
}

/// The words of instruments and spreadsheets for "no value", in lower case.
bool is_missing_word(std::string_view word) {
    static constexpr std::string_view words[] = {
        "", "-", "--", "---", "n/a", "na", "null", "ovld", "ovl", "over", "overload", "overrange"};
    return std::find(std::begin(words), std::end(words), word) != std::end(words);
}

bool is_not_a_number_word(std::string_view word) {
    return word == "nan" || word == "1.#qnan" || word == "1.#ind" || word.starts_with("nan(");
}

bool is_infinity_word(std::string_view word) {
    return word == "inf" || word == "infinity" || word == "1.#inf";
}

} // namespace

const char* parse_number_slowly(const char* begin, const char* end, char decimal, double& value) {
    const char* stop = end_of_number(begin, end, decimal);
    if (stop == begin)
        return begin;
    std::string text(begin + (*begin == '+' ? 1 : 0), stop);
    for (char& c : text) {
        if (c == decimal)
            c = '.';
        else if (c == 'E' || c == 'd' || c == 'D')
            c = 'e';
    }
    const auto [unused, error] = std::from_chars(text.data(), text.data() + text.size(), value);
    if (error == std::errc::result_out_of_range)
        value = std::copysign(out_of_range(text), text.front() == '-' ? -1.0 : 1.0);
    return stop;
}

std::string_view trimmed(std::string_view text) {
    const auto blank = [](char c) { return c == ' ' || c == '\t'; };
    while (!text.empty() && blank(text.front()))
        text.remove_prefix(1);
    while (!text.empty() && blank(text.back()))
        text.remove_suffix(1);
    return text;
}

std::string_view unquoted(std::string_view field) {
    field = trimmed(field);
    if (field.size() >= 2 && field.front() == '"' && field.back() == '"')
        field = trimmed(field.substr(1, field.size() - 2));
    return field;
}

FieldKind judge_field(std::string_view field, char decimal, double& value) {
    field = unquoted(field);
    const char* end = field.data() + field.size();
    if (!field.empty() && parse_number(field.data(), end, decimal, value) == end)
        return std::abs(value) >= instrument_not_a_number ? FieldKind::missing : FieldKind::number;
    std::string word(field.substr(0, std::min<std::size_t>(field.size(), 24)));
    std::transform(word.begin(), word.end(), word.begin(),
                   [](char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c + 32) : c; });
    if (is_missing_word(word))
        return FieldKind::missing;
    const bool negative = word.starts_with('-');
    if (negative || word.starts_with('+'))
        word.erase(0, 1);
    if (is_infinity_word(word))
        return negative ? FieldKind::minus_infinity : FieldKind::missing;
    return is_not_a_number_word(word) ? FieldKind::missing : FieldKind::text;
}

} // namespace cornerwright
