#include "core/measurement/table_rows.h"

#include <algorithm>
#include <cmath>
#include <string>

namespace cornerwright {
namespace {

char other_sign(char decimal) {
    return decimal == '.' ? ',' : '.';
}

bool is_number(std::string_view field, char decimal) {
    double value = 0.0;
    return judge_field(field, decimal, value) == FieldKind::number;
}

std::string expected_number(std::string_view field, TableDialect dialect) {
    if (!is_number(field, other_sign(dialect.decimal)))
        return "a number";
    return dialect.decimal == ',' ? "a number with decimal comma as in the other rows"
                                  : "a number with decimal point as in the other rows";
}

} // namespace

TableRows::TableRows(TableDialect dialect, const std::array<int, most_counting>& counting,
                     std::size_t fields, std::size_t most_fields)
    : dialect_(dialect), value_of_field_(fields, -1), most_fields_(std::max(fields, most_fields)) {
    for (std::size_t k = 0; k < most_counting; ++k)
        if (counting[k] > 0)
            value_of_field_[static_cast<std::size_t>(counting[k] - 1)] = static_cast<int>(k);
}

bool TableRows::take(std::string_view line, Values& values) const {
    const char* p = line.data();
    const char* const end = p + line.size();
    const char separator = dialect_.separator;
    const auto skip_spaces = [&] {
        while (p != end && *p == ' ')
            ++p;
    };
    const std::size_t fields = value_of_field_.size();
    double largest = 0.0;
    for (std::size_t field = 0;;) {
        skip_spaces();
        const char* const begin = p;
        if (const int slot = value_of_field_[field]; slot >= 0) {
            double value = 0.0;
            p = parse_number(begin, end, dialect_.decimal, value);
            values[static_cast<std::size_t>(slot)] = value;
            largest = std::max(largest, std::abs(value));
            if (p == begin)
                return false;
        } else {
            while (p != end && *p != separator && *p != '"')
                ++p;
        }
        const char* const behind = p;
        skip_spaces();
        if (++field == fields)
            break;
        if (separator == ' ' ? p == behind : p == end || *p++ != separator)
            return false;
    }
    // Empty fields may follow.
    while (p != end && (*p == separator || *p == ' '))
        ++p;
    return p == end && largest < instrument_not_a_number;
}

TableRows::Row TableRows::judge(std::string_view line, const TextLines& lines) const {
    const auto fields = split_fields(line, dialect_.separator);
    const std::size_t expected = value_of_field_.size();
    const bool extra_text = std::any_of(
        fields.begin() + static_cast<std::ptrdiff_t>(std::min(fields.size(), most_fields_)),
        fields.end(), [](std::string_view field) { return !unquoted(field).empty(); });
    if (fields.size() < expected || extra_text)
        lines.refuse(lines.line_number(), {}, std::to_string(expected) + " fields",
                     std::to_string(fields.size()));
    Row row;
    for (std::size_t field = 0; field < expected; ++field) {
        if (value_of_field_[field] < 0)
            continue;
        const auto slot = static_cast<std::size_t>(value_of_field_[field]);
        row.kinds[slot] = judge_field(fields[field], dialect_.decimal, row.values[slot]);
        if (row.kinds[slot] == FieldKind::text)
            lines.refuse(lines.line_number(), static_cast<int>(field + 1),
                         expected_number(fields[field], dialect_),
                         quoted_in_message(unquoted(fields[field])));
    }
    return row;
}

bool TableRows::has_other_decimal_sign(std::string_view line) const {
    if (dialect_.separator == ',')
        return false;
    const auto fields = split_fields(line, dialect_.separator);
    for (std::size_t i = 0; i < std::min(fields.size(), value_of_field_.size()); ++i)
        if (value_of_field_[i] >= 0 && !is_number(fields[i], dialect_.decimal) &&
            is_number(fields[i], other_sign(dialect_.decimal)))
            return true;
    return false;
}

} // namespace cornerwright
