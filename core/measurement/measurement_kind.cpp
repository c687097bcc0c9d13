#include "core/measurement/measurement_kind.h"

#include "core/measurement/number_field.h"
#include "core/measurement/read_touchstone.h"
#include "core/measurement/read_universal_file.h"
#include "core/measurement/text_lines.h"

#include <algorithm>
#include <filesystem>

namespace cornerwright {
namespace {

bool has_touchstone_suffix(const std::string& file_name) {
    std::string suffix = std::filesystem::path(file_name).extension().string();
    std::transform(suffix.begin(), suffix.end(), suffix.begin(),
                   [](char c) { return c >= 'A' && c <= 'Z' ? static_cast<char>(c + 32) : c; });
    if (suffix == ".ts")
        return true;
    return suffix.size() >= 4 && suffix.starts_with(".s") && suffix.ends_with('p') &&
           std::all_of(suffix.begin() + 2, suffix.end() - 1,
                       [](char c) { return c >= '0' && c <= '9'; });
}

bool is_version_line(std::string_view line) {
    constexpr std::string_view keyword = "[version]";
    return line.size() >= keyword.size() &&
           std::equal(keyword.begin(), keyword.end(), line.begin(), [](char k, char c) {
               return k == (c >= 'A' && c <= 'Z' ? static_cast<char>(c + 32) : c);
           });
}

} // namespace

Preview::Kind measurement_kind(ByteSource& source, const std::string& file_name) {
    TextLines lines(source, file_name, {}, TextLines::Binary::remember);
    Preview::Kind kind = Preview::Kind::text_table;
    std::string_view line;
    bool first = true;
    // An overlong line raises an error below; it is raised again, in its place, by the reader.
    try {
        lines.rewind();
        while (lines.next(line)) {
            line = trimmed(line);
            if (line.empty())
                continue;
            if (first && line == "-1")
                kind = Preview::Kind::universal_file;
            first = false;
            if (line.front() == '!')
                continue;
            if (is_version_line(line))
                kind = Preview::Kind::touchstone;
            break;
        }
    } catch (const InputError&) {
    }
    source.rewind();
    if (kind == Preview::Kind::text_table && has_touchstone_suffix(file_name))
        kind = Preview::Kind::touchstone;
    return kind;
}

ReadResult read_any_kind(ByteSource& source, const std::string& file_name,
                         const ReadOptions& options, TableReport& report) {
    const Preview::Kind kind = measurement_kind(source, file_name);
    const auto binary = kind == Preview::Kind::universal_file ? TextLines::Binary::remember
                                                              : TextLines::Binary::refuse;
    TextLines lines(source, file_name, options.progress, binary);
    if (kind == Preview::Kind::touchstone)
        return read_touchstone(lines, options);
    if (kind == Preview::Kind::universal_file)
        return read_universal_file(lines);
    return read_table(lines, options, report);
}

} // namespace cornerwright
