#pragma once

#include "core/measurement/read_measurement.h"

#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// A line of the file as it stands, split where the reader splits it.
struct RawLine {
    int line = 0; ///< from 1
    enum class Role { preamble, comment, heading, units, row } role = Role::row;
    std::vector<std::string> fields; ///< one for lines that are not split
};

/// Something the file leaves open, with what it may be.
struct OpenChoice {
    enum class About { frequency_unit, magnitude_unit, phase_unit, columns } about;
    int column = 0;                        ///< field number from 1; 0 where no single one is meant
    std::vector<std::string> alternatives; ///< units, or meanings of a column
    std::string why;                       ///< "no unit, and no negative value"
};

/// What an import panel shows before, and while, the user settles what the file leaves open.
struct Preview {
    enum class Kind { text_table, touchstone, universal_file } kind = Kind::text_table;
    bool time_record = false;   ///< a table of samples over time, which `estimate_response` takes
    std::vector<RawLine> lines; ///< the first lines of the file
    std::vector<ColumnInfo> columns;   ///< as far as understood; unit empty where it is open
    std::vector<OpenChoice> choices;   ///< empty when nothing is open
    std::optional<ReadResult> result;  ///< the points, when nothing is open and nothing is wrong
    std::optional<InputError> problem; ///< why there is no result; also set while a choice is open
};

/// Looks at a file without refusing it: ambiguity comes back as data. `line_limit` bounds
/// `Preview::lines`. The whole file is read for the points.
Preview preview_measurement(const std::filesystem::path& file, const ReadOptions& options = {},
                            std::size_t line_limit = 60);

/// The same from bytes in memory.
Preview preview_measurement_bytes(std::string_view bytes, const std::string& file_name,
                                  const ReadOptions& options = {}, std::size_t line_limit = 60);

} // namespace cornerwright
