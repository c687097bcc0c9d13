#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// "key (unit): number unit" or "key = number unit" from the lines above a table.
struct PreambleNumber {
    std::string key; ///< lower case, without the bracket
    double value = 0.0;
    std::string unit; ///< behind the number, or in brackets behind the key; empty if silent
};

/// The numbers that a line of a preamble gives (comment mark off), decimal sign point or comma.
std::optional<PreambleNumber> preamble_number(std::string_view line);

/// How many measurements were averaged: "averages: 16", "number of averages = 16"; 0 if silent.
double averages_in(const std::vector<std::string>& preamble);

} // namespace cornerwright
