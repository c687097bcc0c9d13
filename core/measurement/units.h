#pragma once

#include <optional>
#include <string>
#include <string_view>

namespace cornerwright {

/// What a column means to the readers.
enum class Meaning { unused, frequency, magnitude, phase, real, imaginary, coherence, time };

/// Units that the readers know by name.
enum class Unit {
    none,
    hertz,
    kilohertz,
    megahertz,
    gigahertz,
    millihertz,
    rad_per_s,
    krad_per_s,
    decibel,
    linear, ///< a plain ratio, or a quotient of units
    degree,
    radian,
    percent,
    mega_or_milli, ///< "mhz", which could be either
    foreign,       ///< known, but none that the readers convert (rpm, gon, Np, ...)
};

std::string_view name_of(Meaning meaning);
std::optional<Meaning> meaning_from_name(std::string_view name);

/// As printed: Hz, kHz, rad/s, dB, linear, deg, rad, %, ...; empty for none.
std::string_view name_of(Unit unit);

/// The unit written as `text` (no brackets), if it is one that is known. Case does not count except
/// in MHz and mHz.
std::optional<Unit> unit_from_text(std::string_view text);

/// The unit as it is understood in a column of that meaning ("rad/s" is a quotient for a
/// magnitude); nothing where it does not fit.
std::optional<Unit> fitting_unit(Meaning meaning, Unit unit, std::string_view text);

/// What to write in place of a unit that does not fit.
std::string_view units_expected(Meaning meaning);

/// rad/s in one of a unit of frequency.
double rad_per_s_in(Unit unit);

} // namespace cornerwright
