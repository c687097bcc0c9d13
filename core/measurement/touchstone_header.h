#pragma once

#include "core/measurement/text_lines.h"
#include "core/measurement/units.h"

#include <optional>
#include <string>
#include <string_view>

namespace cornerwright {

/// The option line: "# <unit> <parameter> <format> R <ohm>"; what it leaves out stands here.
struct TouchstoneOptions {
    enum class Format { magnitude_angle, decibel_angle, real_imaginary };

    Unit frequency_unit = Unit::gigahertz;
    char parameter = 'S'; ///< S, Y, Z, G or H
    Format format = Format::magnitude_angle;
    double resistance_ohm = 50.0;
};

/// How the four parameters of two ports stand in a row.
enum class TwoPortOrder { n21_before_n12, n12_before_n21 };
enum class MatrixFormat { full, lower, upper };

/// What the keywords of version 2 say.
struct TouchstoneKeywords {
    std::optional<int> ports;
    std::optional<TwoPortOrder> order;
    std::optional<long> frequencies;
    int frequencies_line = 0;
    MatrixFormat matrix = MatrixFormat::full;
};

/// Upper case ASCII, for words of files in which case does not count.
std::string upper_case(std::string_view text);

/// Reads the option line (in upper case, comment off). Throws InputError for an unknown field.
TouchstoneOptions touchstone_options(std::string_view line, const TextLines& lines);

/// Takes a keyword line of version 2 ("[NUMBER OF PORTS] 2", upper case) into `keywords`. Throws
/// InputError for unknown keywords and bad values.
void take_touchstone_keyword(std::string_view line, TouchstoneKeywords& keywords,
                             const TextLines& lines);

/// The keyword of a line with its brackets, "[NETWORK DATA]"; empty where it has none.
std::string_view touchstone_keyword(std::string_view line);

} // namespace cornerwright
