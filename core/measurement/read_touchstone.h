#pragma once

#include "core/measurement/read_measurement.h"
#include "core/measurement/text_lines.h"

namespace cornerwright {

/// Reads a Touchstone file of one or two ports, version 1.x or 2.0 (Touchstone File Format
/// Specification, IBIS Open Forum, revisions 1.1 of 2003 and 2.0 of 2009): N11 of one port, N21 of
/// two, or the parameter that the options name. Z and Y come in ohm and siemens. Throws InputError.
ReadResult read_touchstone(TextLines& lines, const ReadOptions& options);

} // namespace cornerwright
