#pragma once

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// The sample period (s) that the preamble of a time record gives, as a rate (Hz, kHz, MHz) or an
/// interval (s, ms, us); nothing where it is silent, or the number is not above zero.
std::optional<double> sampling_in(const std::vector<std::string>& preamble);

/// Seconds in a unit of time: s, ms or us; 0 for anything else.
double seconds_in(std::string_view unit);

} // namespace cornerwright
