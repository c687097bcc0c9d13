#pragma once

#include "core/realisation/realisation.h"

#include <string>

namespace cornerwright {

/// The shortest decimal text that reads back as the same number of the format (float32: as the same
/// float), always with a point: "0.1", "1.0", "2.5e-07". Valid in C, IEC 61131-3 and JSON.
std::string real_literal(double value, NumberFormat::Type type);

/// `value` of a fixed-point format as the integer that the word holds.
std::string word_literal(double value, const NumberFormat& format);

/// A signal as the generated code sees it: a word in fixed point, else a real number.
std::string signal_literal(double value, const NumberFormat& format);

} // namespace cornerwright
