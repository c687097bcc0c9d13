#pragma once

#include "core/numerics/error.h"
#include "core/response/measured_response.h"

#include <cstddef>
#include <filesystem>
#include <functional>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// One column (text table) or quantity (Touchstone, universal file) as it was understood.
struct ColumnInfo {
    int column = 0;      ///< field number from 1; 0 where the file has no such thing
    std::string heading; ///< as it stands in the file; the assumed one where there is no heading
    std::string meaning; ///< frequency, magnitude, phase, real, imaginary, coherence, unused,
                         ///< response, S21, ...
    std::string unit; ///< Hz, kHz, MHz, GHz, mHz, rad/s, krad/s, dB, linear, deg, rad, %, or empty

    bool operator==(const ColumnInfo&) const = default;
};

/// A data row that gave no point.
struct SkippedRow {
    int line = 0;    ///< from 1 over the whole file
    std::string why; ///< "not a number" or "zero frequency"

    bool operator==(const SkippedRow&) const = default;
};

/// The user's word on one column of a text table; it overrules the heading.
struct ColumnChoice {
    int column = 0;      ///< field number from 1
    std::string meaning; ///< frequency, magnitude, phase, real, imaginary, coherence or unused
    std::string unit;    ///< empty: as the heading says
};

/// What the user settles before or after a first look; empty members leave it to the file.
struct ReadOptions {
    std::string frequency_unit; ///< Hz, kHz, MHz, GHz, mHz, rad/s or krad/s
    std::string magnitude_unit; ///< dB or linear
    std::string phase_unit;     ///< deg or rad
    std::vector<ColumnChoice> columns;
    std::string parameter;  ///< Touchstone: "S11", "Z21", ... or "21"; default 21, of one port 11
    bool flip_sign = false; ///< multiply the response by -1
    double remove_delay_s = 0.0; ///< multiply the response by exp(+jw delay)

    /// Told the share of the file that is read, now and then; returning false stops the reading.
    std::function<bool(double share)> progress;
};

struct ReadResult {
    MeasuredResponse response;
    std::vector<ColumnInfo> columns;
    std::size_t rows = 0; ///< rows that gave the points (repeats counted each)
    std::vector<SkippedRow> skipped;
    std::vector<std::string> warnings; ///< whatever was assumed, averaged or left out
    bool cancelled = false;            ///< `progress` returned false; nothing else is set then
};

/// Reads a frequency response from a text table, a Touchstone file (1.x, 2.0) or a universal file
/// (dataset 58, ASCII). The file is read in blocks; only its numbers are kept.
/// Throws InputError naming file, line and field for whatever cannot be read, and for whatever
/// could be read in two ways (the message then names the choices and the options that settle it).
ReadResult read_measurement(const std::filesystem::path& file, const ReadOptions& options = {});

/// The same from bytes in memory. `file_name` decides on the kind of file and is named in errors.
ReadResult read_measurement_bytes(std::string_view bytes, const std::string& file_name,
                                  const ReadOptions& options = {});

} // namespace cornerwright
