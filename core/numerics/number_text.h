#pragma once

#include <optional>
#include <string>
#include <string_view>

namespace cornerwright {

/// The shortest decimal text that reads back as the same double, with "." whatever the locale:
/// 0.1 -> "0.1", 1e-7 -> "1e-07". Infinities and NaN become "inf", "-inf", "nan".
std::string number_text(double value);

/// `value` rounded to `digits` significant digits for a person: number_text(61.2345678, 4) is
/// "61.23".
std::string number_text(double value, int digits);

/// The whole of `text` as a finite number with "." as decimal sign; nothing if it is anything else.
std::optional<double> parse_number(std::string_view text);

} // namespace cornerwright
