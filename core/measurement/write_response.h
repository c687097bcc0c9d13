#pragma once

#include "core/response/measured_response.h"

#include <filesystem>
#include <string>
#include <vector>

namespace cornerwright {

/// A response as a text table: frequency in Hz, real and imaginary part, coherence where there is
/// one; the number of averages and the given remarks as comments above. `read_measurement` reads it
/// back (frequencies to the last bit but one, the rest exactly).
std::string response_table(const MeasuredResponse& response,
                           const std::vector<std::string>& remarks = {});

/// Writes that table in one step: beside, synced, renamed. Throws WriteError.
void write_response(const MeasuredResponse& response, const std::filesystem::path& file,
                    const std::vector<std::string>& remarks = {});

} // namespace cornerwright
