#pragma once

#include "core/plant/plant_case.h"

#include <string_view>

namespace cornerwright {

/// Reads a plant written as algebra in s: numbers, + - * / ^ with whole powers, parentheses,
/// juxtaposition as product, exp(-T s) as dead time in the numerator.
///
/// Juxtaposition ranks as * and / do, from left to right, so 3/(s + 1) (s + 2) is 3 (s + 2)/(s +
/// 1); behind a divisor without parentheses it is refused as ambiguous (1/2 s). Factors stay
/// factors: only a sum is multiplied out, and its roots are solved for.
///
/// Throws InputError with the column (characters, from 1) and no file. Whether the plant is proper
/// is not looked at here (`model_of` does).
PlantModel parse_formula(std::string_view text);

} // namespace cornerwright
