#include "core/measurement/units.h"

#include "core/measurement/number_field.h"

#include <algorithm>
#include <array>
#include <numbers>
#include <utility>

namespace cornerwright {
namespace {

struct MeaningName {
    Meaning meaning;
    std::string_view name;
};
constexpr std::array<MeaningName, 8> meaning_names = {{{Meaning::unused, "unused"},
                                                       {Meaning::frequency, "frequency"},
                                                       {Meaning::magnitude, "magnitude"},
                                                       {Meaning::phase, "phase"},
                                                       {Meaning::real, "real"},
                                                       {Meaning::imaginary, "imaginary"},
                                                       {Meaning::coherence, "coherence"},
                                                       {Meaning::time, "time"}}};

struct UnitWord {
    std::string_view word; ///< lower case
    Unit unit;
};
constexpr std::array<UnitWord, 68> unit_words = {{
    {"hz", Unit::hertz},
    {"hertz", Unit::hertz},
    {"khz", Unit::kilohertz},
    {"ghz", Unit::gigahertz},
    {"rad/s", Unit::rad_per_s},
    {"rads", Unit::rad_per_s},
    {"rad/sec", Unit::rad_per_s},
    {"radian/s", Unit::rad_per_s},
    {"radians/s", Unit::rad_per_s},
    {"radians/sec", Unit::rad_per_s},
    {"rad s^-1", Unit::rad_per_s},
    {"krad/s", Unit::krad_per_s},
    {"krad/sec", Unit::krad_per_s},
    {"db", Unit::decibel},
    {"lin", Unit::linear},
    {"linear", Unit::linear},
    {"ratio", Unit::linear},
    {"abs", Unit::linear},
    {"-", Unit::linear},
    {"1", Unit::linear},
    {"deg", Unit::degree},
    {"degree", Unit::degree},
    {"degrees", Unit::degree},
    {"\xC2\xB0", Unit::degree},
    {"rad", Unit::radian},
    {"radian", Unit::radian},
    {"radians", Unit::radian},
    {"%", Unit::percent},
    {"percent", Unit::percent},
    {"rpm", Unit::foreign},
    {"u/min", Unit::foreign},
    {"1/min", Unit::foreign},
    {"r/min", Unit::foreign},
    {"rev/min", Unit::foreign},
    {"rev/s", Unit::foreign},
    {"rps", Unit::foreign},
    {"min^-1", Unit::foreign},
    {"min-1", Unit::foreign},
    {"1/s", Unit::foreign},
    {"s^-1", Unit::foreign},
    {"s-1", Unit::foreign},
    {"deg/s", Unit::foreign},
    {"\xC2\xB0/s", Unit::foreign},
    {"rad/min", Unit::foreign},
    {"mrad/s", Unit::foreign},
    {"cpm", Unit::foreign},
    {"bpm", Unit::foreign},
    {"thz", Unit::foreign},
    {"uhz", Unit::foreign},
    {"\xC2\xB5hz", Unit::foreign},
    {"\xCE\xBChz", Unit::foreign},
    {"oct", Unit::foreign},
    {"octave", Unit::foreign},
    {"decade", Unit::foreign},
    {"gon", Unit::foreign},
    {"grad", Unit::foreign},
    {"mrad", Unit::foreign},
    {"rev", Unit::foreign},
    {"turn", Unit::foreign},
    {"turns", Unit::foreign},
    {"cycles", Unit::foreign},
    {"arcmin", Unit::foreign},
    {"arcsec", Unit::foreign},
    {"np", Unit::foreign},
    {"neper", Unit::foreign},
    {"cnp", Unit::foreign},
    {"dnp", Unit::foreign},
    {"bel", Unit::foreign},
}};

std::string lower(std::string_view text) {
    std::string result(text);
    std::transform(result.begin(), result.end(), result.begin(),
                   [](char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c + 32) : c; });
    return result;
}

bool is_quotient(std::string_view text) {
    const std::size_t slash = text.find('/');
    return slash != std::string_view::npos && slash > 0 && slash + 1 < text.size();
}

bool is_frequency(Unit unit) {
    return unit >= Unit::hertz && unit <= Unit::krad_per_s;
}

} // namespace

std::string_view name_of(Meaning meaning) {
    return meaning_names[static_cast<std::size_t>(meaning)].name;
}

std::optional<Meaning> meaning_from_name(std::string_view name) {
    for (const auto& entry : meaning_names)
        if (entry.name == name)
            return entry.meaning;
    return std::nullopt;
}

std::string_view name_of(Unit unit) {
    static constexpr std::array<std::string_view, 15> names = {
        "",   "Hz",     "kHz", "MHz", "GHz", "mHz", "rad/s", "krad/s",
        "dB", "linear", "deg", "rad", "%",   "mhz", ""};
    return names[static_cast<std::size_t>(unit)];
}

std::optional<Unit> unit_from_text(std::string_view text) {
    text = trimmed(text);
    const std::string word = lower(text);
    if (word == "mhz") {
        if (text.front() == 'M')
            return Unit::megahertz;
        return text[1] == 'H' ? Unit::millihertz : Unit::mega_or_milli;
    }
    for (const auto& entry : unit_words)
        if (entry.word == word)
            return entry.unit;
    if (is_quotient(text))
        return Unit::linear;
    return std::nullopt;
}

std::optional<Unit> fitting_unit(Meaning meaning, Unit unit, std::string_view text) {
    const auto if_fits = [&](bool fits) { return fits ? std::optional(unit) : std::nullopt; };
    const bool quotient = is_quotient(text);
    switch (meaning) {
    case Meaning::frequency:
        if (unit == Unit::linear && quotient)
            return Unit::none;
        return if_fits(unit == Unit::none || is_frequency(unit));
    case Meaning::magnitude:
        if (quotient)
            return Unit::linear;
        return if_fits(unit == Unit::none || unit == Unit::decibel || unit == Unit::linear);
    case Meaning::phase:
        if (unit == Unit::linear && quotient)
            return Unit::none;
        return if_fits(unit == Unit::none || unit == Unit::degree || unit == Unit::radian);
    case Meaning::real:
    case Meaning::imaginary:
        return quotient || unit == Unit::linear || unit == Unit::none ? std::optional(Unit::none)
                                                                      : std::nullopt;
    case Meaning::coherence:
        if (unit == Unit::percent)
            return unit;
        return unit == Unit::linear || unit == Unit::none ? std::optional(Unit::none)
                                                          : std::nullopt;
    case Meaning::unused:
    case Meaning::time:
        return Unit::none;
    }
    return std::nullopt;
}

std::string_view units_expected(Meaning meaning) {
    switch (meaning) {
    case Meaning::frequency:
        return "a unit of frequency that is known (Hz, kHz, MHz, GHz, mHz, rad/s or krad/s)";
    case Meaning::magnitude:
        return "a unit of magnitude that is known (dB, linear or a quotient such as V/V)";
    case Meaning::phase:
        return "a unit of phase that is known (deg or rad)";
    case Meaning::real:
    case Meaning::imaginary:
        return "a real or imaginary part with a linear unit";
    default:
        return "a coherence as a plain number or in %";
    }
}

double rad_per_s_in(Unit unit) {
    constexpr double turn = 2.0 * std::numbers::pi;
    switch (unit) {
    case Unit::kilohertz:
        return turn * 1e3;
    case Unit::megahertz:
        return turn * 1e6;
    case Unit::gigahertz:
        return turn * 1e9;
    case Unit::millihertz:
        return turn * 1e-3;
    case Unit::rad_per_s:
        return 1.0;
    case Unit::krad_per_s:
        return 1e3;
    default:
        return turn;
    }
}

} // namespace cornerwright
