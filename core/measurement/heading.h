#pragma once

#include "core/measurement/units.h"

#include <string>
#include <string_view>

namespace cornerwright {

/// One field of a heading, as its words and its unit say.
struct Heading {
    std::string text; ///< as it stands, without quotes
    Meaning meaning = Meaning::unused;
    Unit unit = Unit::none;           ///< from the heading itself
    std::string unit_text;            ///< how it is written there
    Unit unit_if_silent = Unit::none; ///< what the word implies (omega: rad/s)
};

/// Reads one field of a heading (valid UTF-8, quotes allowed). The leftmost word that names a
/// meaning decides; a unit stands in brackets at the end, or behind the last slash, comma,
/// underscore or space.
Heading read_heading(std::string_view field);

/// The unit that a field of a line of units names (also in brackets); its text in `unit_text`.
std::optional<Unit> read_unit_field(std::string_view field, std::string& unit_text);

} // namespace cornerwright
