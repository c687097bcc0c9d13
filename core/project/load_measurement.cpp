#include "core/project/load_measurement.h"

#include "core/numerics/sha256.h"

#include <fstream>
#include <utility>
#include <vector>

namespace cornerwright {
namespace {

void fill(MeasurementSource& source, const InputPlace& place, const std::string& where,
          MeasurementLookup& lookup) {
    const std::filesystem::path path = lookup.folder / source.file;
    std::error_code error;
    if (!std::filesystem::is_regular_file(path, error))
        throw InputError(place, "the measurement file of " + where,
                         "no file \"" + source.file + "\" beside the project");
    ReadResult read = read_measurement(path);
    source.reading = std::make_shared<const ReadingRecord>(record_of(read));
    source.response = std::make_shared<const MeasuredResponse>(std::move(read.response));
    if (!source.sha256.empty() && sha256_of_file(path) != source.sha256)
        lookup.notices.push_back(where + ": \"" + source.file +
                                 "\" has changed since it was taken in (its SHA-256 differs from "
                                 "the project's); the figures follow the file as it is now");
}

} // namespace

ReadingRecord record_of(const ReadResult& read) {
    ReadingRecord record;
    record.rows = read.rows;
    record.skipped = read.skipped.size();
    if (!read.skipped.empty()) {
        record.first_skipped_line = read.skipped.front().line;
        record.first_skipped_why = read.skipped.front().why;
    }
    for (const ColumnInfo& column : read.columns)
        record.columns.push_back(column.heading + ": " + column.meaning +
                                 (column.unit.empty() ? "" : ", " + column.unit));
    record.warnings = read.warnings;
    return record;
}

std::string sha256_of_file(const std::filesystem::path& file) {
    std::ifstream in(file, std::ios::binary);
    if (!in)
        throw InputError({file.string(), {}, {}}, "a file that can be read", "none");
    constexpr std::size_t block_size = 1 << 16;
    std::vector<char> block(block_size);
    Sha256 hash;
    while (in.read(block.data(), block_size) || in.gcount() > 0)
        hash.add({block.data(), static_cast<std::size_t>(in.gcount())});
    return hash.hex();
}

void load_measurement(MeasurementSource& source, const InputPlace& place, const std::string& where,
                      MeasurementLookup& lookup) {
    if (lookup.missing == MissingFiles::are_errors)
        return fill(source, place, where, lookup);
    try {
        fill(source, place, where, lookup);
    } catch (const InputError& error) {
        lookup.notices.emplace_back(error.what());
    }
}

} // namespace cornerwright
