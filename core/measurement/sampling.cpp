#include "core/measurement/sampling.h"

#include "core/measurement/preamble.h"
#include "core/measurement/units.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr std::array<std::string_view, 7> rate_words = {
    "sample rate", "sampling rate", "sample frequency", "sampling frequency",
    "fs",          "abtastrate",    "abtastfrequenz"};
constexpr std::array<std::string_view, 8> interval_words = {"sample interval",
                                                            "sampling interval",
                                                            "sample period",
                                                            "sampling period",
                                                            "sample time",
                                                            "dt",
                                                            "ts",
                                                            "abtastzeit"};

template <typename Words>
bool is_one_of(const Words& words, std::string_view key) {
    return std::find(words.begin(), words.end(), key) != words.end();
}

/// Hertz in a unit of a sample rate; 0 for anything else. Case does not count: nobody samples in
/// millihertz and writes MHz.
double hertz_in(std::string_view unit) {
    if (unit.empty())
        return 1.0;
    const auto known = unit_from_text(unit);
    if (!known)
        return 0.0;
    switch (*known) {
    case Unit::hertz:
    case Unit::kilohertz:
    case Unit::megahertz:
    case Unit::gigahertz:
    case Unit::millihertz:
        return rad_per_s_in(*known) / (2.0 * std::numbers::pi);
    default:
        return 0.0;
    }
}

} // namespace

double seconds_in(std::string_view unit) {
    if (unit.empty() || unit == "s" || unit == "sec" || unit == "S")
        return 1.0;
    if (unit == "ms")
        return 1e-3;
    if (unit == "us" || unit == "\xC2\xB5s" || unit == "\xCE\xBCs")
        return 1e-6;
    return 0.0;
}

std::optional<double> sampling_in(const std::vector<std::string>& preamble) {
    for (const auto& line : preamble) {
        const auto entry = preamble_number(line);
        if (!entry || !(entry->value > 0.0) || !std::isfinite(entry->value))
            continue;
        double period = 0.0;
        if (is_one_of(rate_words, entry->key) && hertz_in(entry->unit) > 0.0)
            period = 1.0 / (entry->value * hertz_in(entry->unit));
        else if (is_one_of(interval_words, entry->key))
            period = entry->value * seconds_in(entry->unit);
        if (period > 0.0 && std::isfinite(period))
            return period;
    }
    return std::nullopt;
}

} // namespace cornerwright
