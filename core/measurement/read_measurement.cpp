#include "core/measurement/read_measurement.h"

#include "core/measurement/measurement_kind.h"
#include "core/measurement/read_table.h"
#include "core/measurement/response_edits.h"

#include <utility>

namespace cornerwright {
namespace {

ReadResult read_source(ByteSource& source, const std::string& file_name,
                       const ReadOptions& options) {
    try {
        TableReport report;
        ReadResult result = read_any_kind(source, file_name, options, report);
        result.response = edited(std::move(result.response), options);
        return result;
    } catch (const ReadingCancelled&) {
        ReadResult cancelled;
        cancelled.cancelled = true;
        return cancelled;
    }
}

} // namespace

ReadResult read_measurement(const std::filesystem::path& file, const ReadOptions& options) {
    return read_source(*file_source(file), file.string(), options);
}

ReadResult read_measurement_bytes(std::string_view bytes, const std::string& file_name,
                                  const ReadOptions& options) {
    return read_source(*memory_source(bytes), file_name, options);
}

} // namespace cornerwright
