#pragma once

#include "core/measurement/byte_source.h"
#include "core/measurement/preview_measurement.h"
#include "core/measurement/read_table.h"

#include <string>

namespace cornerwright {

/// A universal file begins with a line "-1"; a Touchstone file has a suffix .s1p, .s2p, .s<n>p or
/// .ts, or begins with [Version]; everything else is a text table. Leaves the source at its start.
Preview::Kind measurement_kind(ByteSource& source, const std::string& file_name);

/// Reads whatever kind of file it is; `report` is filled for a text table. Throws InputError, and
/// ReadingCancelled when the progress callback asks to stop.
ReadResult read_any_kind(ByteSource& source, const std::string& file_name,
                         const ReadOptions& options, TableReport& report);

} // namespace cornerwright
