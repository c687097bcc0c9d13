#pragma once

#include "core/measurement/read_measurement.h"

#include <CLI/CLI.hpp>

#include <string>
#include <vector>

namespace cornerwright::cli {

/// What the user settles about a measurement file on the command line.
struct ReadingOptions {
    ReadOptions settled;
    std::vector<std::string> columns; ///< "3=phase:deg"
};

/// Adds the options that settle what a file leaves open. They write into `options`.
void add_reading_options(CLI::App& command, ReadingOptions& options);

/// The options as the reader takes them. Throws UsageError for a column that is not N=MEANING or
/// N=MEANING:UNIT.
ReadOptions read_options_of(const ReadingOptions& options);

} // namespace cornerwright::cli
