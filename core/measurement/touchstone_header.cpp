#include "core/measurement/touchstone_header.h"

#include "core/measurement/number_field.h"
#include "core/measurement/table_layout.h"

#include <algorithm>
#include <charconv>

namespace cornerwright {
namespace {

std::optional<Unit> touchstone_frequency_unit(std::string_view word) {
    if (word == "HZ")
        return Unit::hertz;
    if (word == "KHZ")
        return Unit::kilohertz;
    if (word == "MHZ")
        return Unit::megahertz; // case does not count here: millihertz does not exist
    if (word == "GHZ")
        return Unit::gigahertz;
    return std::nullopt;
}

std::optional<TouchstoneOptions::Format> touchstone_format(std::string_view word) {
    if (word == "MA")
        return TouchstoneOptions::Format::magnitude_angle;
    if (word == "DB")
        return TouchstoneOptions::Format::decibel_angle;
    if (word == "RI")
        return TouchstoneOptions::Format::real_imaginary;
    return std::nullopt;
}

std::optional<long> whole_number(std::string_view text) {
    long value = 0;
    const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), value);
    if (error != std::errc{} || end != text.data() + text.size() || value < 0)
        return std::nullopt;
    return value;
}

} // namespace

std::string upper_case(std::string_view text) {
    std::string result(text);
    std::transform(result.begin(), result.end(), result.begin(),
                   [](char c) { return c >= 'a' && c <= 'z' ? static_cast<char>(c - 32) : c; });
    return result;
}

TouchstoneOptions touchstone_options(std::string_view line, const TextLines& lines) {
    TouchstoneOptions options;
    const auto words = split_fields(line.substr(1), ' ');
    for (std::size_t i = 0; i < words.size(); ++i) {
        const std::string_view word = words[i];
        if (const auto unit = touchstone_frequency_unit(word)) {
            options.frequency_unit = *unit;
        } else if (const auto format = touchstone_format(word)) {
            options.format = *format;
        } else if (word.size() == 1 &&
                   std::string_view("SYZGH").find(word) != std::string_view::npos) {
            options.parameter = word.front();
        } else if (word == "R") {
            const std::string_view number = i + 1 < words.size() ? words[++i] : std::string_view();
            if (judge_field(number, '.', options.resistance_ohm) != FieldKind::number ||
                options.resistance_ohm <= 0.0)
                lines.refuse(lines.line_number(), {}, "a resistance above zero behind R",
                             quoted_in_message(number));
        } else {
            lines.refuse(lines.line_number(), {},
                         "an option line of frequency unit, S, Y, Z, G or H, MA, DB or RI, and R",
                         quoted_in_message(word));
        }
    }
    return options;
}

std::string_view touchstone_keyword(std::string_view line) {
    line = trimmed(line);
    if (!line.starts_with('['))
        return {};
    return line.substr(0, std::min(line.find(']'), line.size() - 1) + 1);
}

void take_touchstone_keyword(std::string_view line, TouchstoneKeywords& keywords,
                             const TextLines& lines) {
    const std::string_view keyword = touchstone_keyword(line);
    const std::string_view value = trimmed(trimmed(line).substr(keyword.size()));
    const auto refuse = [&](const std::string& expected) {
        lines.refuse(lines.line_number(), {}, expected, quoted_in_message(value));
    };
    const auto number = [&] {
        const auto read = whole_number(value);
        if (!read)
            refuse("a whole number behind " + std::string(keyword));
        return *read;
    };
    if (keyword == "[NUMBER OF PORTS]") {
        keywords.ports = static_cast<int>(std::min(number(), 1000L));
    } else if (keyword == "[NUMBER OF FREQUENCIES]") {
        keywords.frequencies = number();
        keywords.frequencies_line = lines.line_number();
    } else if (keyword == "[TWO-PORT DATA ORDER]") {
        if (value != "12_21" && value != "21_12")
            refuse("12_21 or 21_12 behind [Two-Port Data Order]");
        keywords.order =
            value == "21_12" ? TwoPortOrder::n21_before_n12 : TwoPortOrder::n12_before_n21;
    } else if (keyword == "[MATRIX FORMAT]") {
        if (value != "FULL" && value != "LOWER" && value != "UPPER")
            refuse("Full, Lower or Upper behind [Matrix Format]");
        keywords.matrix = value == "FULL"    ? MatrixFormat::full
                          : value == "LOWER" ? MatrixFormat::lower
                                             : MatrixFormat::upper;
    } else if (keyword == "[VERSION]") {
        if (value != "2.0" && value != "2")
            refuse("version 2.0 behind [Version]");
    } else if (keyword != "[NUMBER OF NOISE FREQUENCIES]" && keyword != "[REFERENCE]") {
        lines.refuse(lines.line_number(), {}, "a keyword of Touchstone 2.0 for single-ended ports",
                     quoted_in_message(keyword));
    }
}

} // namespace cornerwright
