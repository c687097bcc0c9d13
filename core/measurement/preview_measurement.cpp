#include "core/measurement/preview_measurement.h"

#include "core/measurement/measurement_kind.h"
#include "core/measurement/number_field.h"
#include "core/measurement/read_table.h"
#include "core/measurement/response_edits.h"

#include <algorithm>
#include <utility>

namespace cornerwright {
namespace {

RawLine raw_table_line(int number, std::string_view line, const TableLayout& layout) {
    RawLine raw;
    raw.line = number;
    const char separator = layout.dialect.separator;
    const int first_row = layout.heading_line != 0
                              ? std::max(layout.heading_line, layout.units_line) + 1
                              : layout.first_row_line;
    using Role = RawLine::Role;
    if (number == layout.heading_line)
        raw.role = Role::heading;
    else if (number == layout.units_line)
        raw.role = Role::units;
    else if (number < first_row || first_row == 0)
        raw.role = Role::preamble;
    else
        raw.role = is_comment(line, separator) ? Role::comment : Role::row;
    if (raw.role == Role::heading && !layout.headings.empty())
        for (const auto& heading : layout.headings)
            raw.fields.push_back(heading.text);
    else if (raw.role == Role::row || raw.role == Role::units)
        for (const auto field : split_fields(line, separator))
            raw.fields.push_back(readable(unquoted(field)));
    else
        raw.fields.push_back(readable(line));
    return raw;
}

RawLine raw_plain_line(int number, std::string_view line) {
    const bool comment = trimmed(line).starts_with('!');
    return {number, comment ? RawLine::Role::comment : RawLine::Role::row, {readable(line)}};
}

void take_lines(ByteSource& source, const std::string& file_name, const TableReport& report,
                std::size_t limit, Preview& preview) {
    TextLines lines(source, file_name, {}, TextLines::Binary::remember);
    std::string_view line;
    // What cannot be split into lines is not shown; the problem says why.
    try {
        lines.rewind();
        while (preview.lines.size() < limit && lines.next(line) && !lines.looks_binary())
            preview.lines.push_back(preview.kind == Preview::Kind::text_table
                                        ? raw_table_line(lines.line_number(), line, report.layout)
                                        : raw_plain_line(lines.line_number(), line));
    } catch (const InputError&) {
    }
}

Preview preview_source(ByteSource& source, const std::string& file_name, const ReadOptions& options,
                       std::size_t line_limit) {
    Preview preview;
    TableReport report;
    preview.kind = measurement_kind(source, file_name);
    try {
        ReadResult result = read_any_kind(source, file_name, options, report);
        result.response = edited(std::move(result.response), options);
        preview.columns = result.columns;
        preview.result = std::move(result);
    } catch (const InputError& error) {
        preview.problem = error;
        preview.columns = report.columns.infos;
    } catch (const ReadingCancelled&) {
        preview.result.emplace().cancelled = true;
    }
    preview.choices = std::move(report.choices);
    preview.time_record = report.time_record;
    take_lines(source, file_name, report, line_limit, preview);
    return preview;
}

} // namespace

Preview preview_measurement(const std::filesystem::path& file, const ReadOptions& options,
                            std::size_t line_limit) {
    try {
        return preview_source(*file_source(file), file.string(), options, line_limit);
    } catch (const InputError& error) {
        Preview preview;
        preview.problem = error;
        return preview;
    }
}

Preview preview_measurement_bytes(std::string_view bytes, const std::string& file_name,
                                  const ReadOptions& options, std::size_t line_limit) {
    return preview_source(*memory_source(bytes), file_name, options, line_limit);
}

} // namespace cornerwright
