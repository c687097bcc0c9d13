#pragma once

#include "core/measurement/read_measurement.h"

#include <filesystem>
#include <functional>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// Two channels sampled together.
struct TimeRecord {
    double sample_period_s = 0.0;
    std::vector<double> excitation;
    std::vector<double> response; ///< as many as `excitation`
    std::string excitation_name;  ///< heading of the column, or its number
    std::string response_name;
    std::vector<std::string> columns; ///< all headings of the file, for a choice of columns
    std::vector<std::string> warnings;
    bool cancelled = false;
};

struct RecordOptions {
    std::string excitation; ///< heading with or without its bracket (any case), or number from 1
    std::string response;   ///< likewise
    double sample_period_s = 0.0;               ///< overrules the file where above zero
    std::function<bool(double share)> progress; ///< as in ReadOptions
};

/// Reads two channels of a sampled time record (a text table). The sample period comes from the
/// options, from the preamble (sample rate, dt, ...) or from the time column. Throws InputError for
/// unknown columns, rows that are not whole, a record without a rate, and a time column whose steps
/// differ by more than a hundredth.
TimeRecord read_time_record(const std::filesystem::path& file, const RecordOptions& options);

/// The same from bytes in memory.
TimeRecord read_time_record_bytes(std::string_view bytes, const std::string& file_name,
                                  const RecordOptions& options);

/// The headings of a time record, by which its columns can be named ("1", "2", ... where it has
/// none). Throws InputError where there is no table.
std::vector<std::string> time_record_columns(const std::filesystem::path& file);

} // namespace cornerwright
