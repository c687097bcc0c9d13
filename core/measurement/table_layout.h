#pragma once

#include "core/measurement/heading.h"
#include "core/measurement/text_lines.h"

#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// How the rows of a text table are written.
struct TableDialect {
    char separator = ','; ///< tab, semicolon, comma, or space for runs of spaces
    char decimal = '.';
};

/// The shape of a text table, judged on its first lines.
struct TableLayout {
    TableDialect dialect;
    bool decimal_seen = true;       ///< false: no number had a decimal sign, and either may follow
    int heading_line = 0;           ///< 0: no heading
    int units_line = 0;             ///< line of units below the heading; 0: none
    std::vector<Heading> headings;  ///< trailing empty ones dropped; units of `units_line` included
    std::size_t heading_fields = 0; ///< before dropping
    std::size_t units_fields = 0;
    int first_row_line = 0;            ///< first row of numbers; 0: there is none
    std::size_t row_fields = 0;        ///< fields that most rows of numbers have
    std::vector<std::string> preamble; ///< lines above heading and rows, comment marks taken off
    bool has_text = false;             ///< any line that is not blank
};

/// What the heading of the table must name.
enum class TableKind {
    frequency_response, ///< a frequency and at least one more
    time_record,        ///< a time, or else any line of words with as many fields as the rows
};

/// Judges the layout on the first megabyte or so, and leaves `lines` at the start. Throws
/// InputError as TextLines does.
TableLayout judge_layout(TextLines& lines, TableKind kind);

/// True for a line that starts with a comment mark: # % ! or two slashes, or a semicolon where that
/// does not separate.
bool is_comment(std::string_view line, char separator);

/// The fields of a line; quotes are kept, a separator inside them does not split.
std::vector<std::string_view> split_fields(std::string_view line, char separator);

} // namespace cornerwright
