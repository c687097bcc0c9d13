#pragma once

#include "core/measurement/read_measurement.h"
#include "core/numerics/error.h"
#include "core/plant/plant_case.h"
#include "core/project/read_plant_cases.h"

#include <string>

namespace cornerwright {

/// Fills `source.response` from its file in the lookup's folder, and adds a notice where the file
/// is no longer the one that was pinned. A file that is missing or cannot be understood is an
/// InputError (missing: at `place`, where the project names it), or a notice where the lookup says
/// so; `source.response` then stays null. `where` is "plant case 2 (...)".
void load_measurement(MeasurementSource& source, const InputPlace& place, const std::string& where,
                      MeasurementLookup& lookup);

/// What of a reading is kept beside its points.
ReadingRecord record_of(const ReadResult& read);

/// SHA-256 of a file as it stands, read in blocks. Throws InputError where it cannot be read.
std::string sha256_of_file(const std::filesystem::path& file);

} // namespace cornerwright
