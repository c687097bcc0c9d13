#pragma once

#include "core/measurement/read_measurement.h"
#include "core/measurement/text_lines.h"

namespace cornerwright {

/// Reads the one frequency response of a universal file (dataset 58, "Function at nodal DOF",
/// Structural Dynamics Research Laboratory, University of Cincinnati, revision 1999), with its
/// coherence where the file has one. `lines` should only remember what looks binary: the binary
/// form 58b is refused by name. Throws InputError.
ReadResult read_universal_file(TextLines& lines);

} // namespace cornerwright
