#pragma once

#include "core/measurement/preview_measurement.h"
#include "core/measurement/table_columns.h"
#include "core/measurement/table_layout.h"

#include <vector>

namespace cornerwright {

/// What was understood of a table so far, also when reading it ends in an error.
struct TableReport {
    TableLayout layout;
    TableColumns columns;
    std::vector<OpenChoice> choices;
    bool time_record = false; ///< `layout` is then that of a record
};

/// Reads a text table as a frequency response. Throws InputError.
ReadResult read_table(TextLines& lines, const ReadOptions& options, TableReport& report);

} // namespace cornerwright
