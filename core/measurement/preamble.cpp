#include "core/measurement/preamble.h"

#include "core/measurement/number_field.h"
#include "core/measurement/text_lines.h"

#include <algorithm>

namespace cornerwright {
namespace {

std::string lower(std::string_view text) {
    std::string result(text);
    std::transform(result.begin(), result.end(), result.begin(),
                   [](char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c + 32) : c; });
    return result;
}

/// Takes "(unit)" or "[unit]" off the end of a key.
std::string take_bracket(std::string_view& key) {
    if (key.empty() || (key.back() != ')' && key.back() != ']'))
        return {};
    const std::size_t open = key.find_last_of("([");
    if (open == std::string_view::npos)
        return {};
    const std::string unit(trimmed(key.substr(open + 1, key.size() - open - 2)));
    key = trimmed(key.substr(0, open));
    return unit;
}

/// A unit stands behind the number, up to the next separator or comment.
std::string_view unit_behind(std::string_view rest) {
    rest = trimmed(rest);
    return trimmed(rest.substr(0, rest.find_first_of(",;\t\" ")));
}

} // namespace

std::optional<PreambleNumber> preamble_number(std::string_view line) {
    line = trimmed(line);
    if (line.starts_with('"'))
        line.remove_prefix(1);
    const std::size_t sign = line.find_first_of(":=");
    if (sign == std::string_view::npos)
        return std::nullopt;
    std::string_view key = trimmed(line.substr(0, sign));
    std::string_view value = trimmed(line.substr(sign + 1));
    while (!value.empty() && (value.front() == '"' || value.front() == ',' || value.front() == ';'))
        value = trimmed(value.substr(1));
    PreambleNumber result;
    const char* begin = value.data();
    const char* end = begin + value.size();
    const char* stop = parse_number(begin, end, '.', result.value);
    if (stop != end && *stop == ',' && stop + 1 != end && stop[1] >= '0' && stop[1] <= '9')
        stop = parse_number(begin, end, ',', result.value);
    if (stop == begin)
        return std::nullopt;
    const std::string in_bracket = take_bracket(key);
    const std::string_view behind =
        unit_behind(value.substr(static_cast<std::size_t>(stop - begin)));
    result.unit = behind.empty() ? in_bracket : std::string(behind);
    if (result.unit.size() > 2 && (result.unit.front() == '(' || result.unit.front() == '['))
        result.unit = result.unit.substr(1, result.unit.size() - 2);
    result.key = lower(key);
    return result;
}

double averages_in(const std::vector<std::string>& preamble) {
    for (const auto& line : preamble) {
        const auto entry = preamble_number(line);
        if (entry && (entry->key == "averages" || entry->key == "number of averages") &&
            entry->value >= 1.0 && entry->value < instrument_not_a_number)
            return entry->value;
    }
    return 0.0;
}

} // namespace cornerwright
