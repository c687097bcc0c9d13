#include "core/measurement/time_record.h"

#include "core/measurement/characters.h"
#include "core/measurement/number_field.h"
#include "core/measurement/sampling.h"
#include "core/measurement/table_layout.h"
#include "core/measurement/table_rows.h"
#include "core/measurement/text_lines.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <charconv>
#include <cmath>
#include <optional>
#include <utility>

namespace cornerwright {
namespace {

/// Steps of a time column may differ from their mean by this share.
constexpr double step_tolerance = 0.01;

/// The heading without the bracket at its end.
std::string_view without_bracket(std::string_view heading) {
    heading = trimmed(heading);
    if (heading.ends_with(')') || heading.ends_with(']')) {
        const std::size_t open = heading.find_last_of("([");
        if (open != std::string_view::npos && open > 0)
            return trimmed(heading.substr(0, open));
    }
    return heading;
}

/// The unit of a time heading: in its bracket, behind its last separator, or in the line of units.
std::string time_unit(const Heading& heading) {
    const std::string_view text = trimmed(heading.text);
    const std::string_view name = without_bracket(text);
    if (name.size() < text.size()) {
        const std::string_view bracket = trimmed(text.substr(name.size()));
        return std::string(trimmed(bracket.substr(1, bracket.size() - 2)));
    }
    const std::size_t separator = text.find_last_of("/,_ ");
    if (separator != std::string_view::npos) {
        const std::string_view behind = trimmed(text.substr(separator + 1));
        if (!behind.empty() && seconds_in(behind) > 0.0)
            return std::string(behind);
    }
    std::string_view below = trimmed(heading.unit_text);
    if (below.size() > 2 && (below.front() == '(' || below.front() == '['))
        below = trimmed(below.substr(1, below.size() - 2));
    return std::string(below == "-" ? std::string_view() : below);
}

/// Follows the steps of a time column.
class StepWatch {
  public:
    void add(double time, int line) {
        if (count_ == 0) {
            first_ = time;
        } else {
            const double step = time - last_;
            if (count_ == 1 || step < smallest_) {
                smallest_ = step;
                smallest_line_ = line;
            }
            if (count_ == 1 || step > largest_) {
                largest_ = step;
                largest_line_ = line;
            }
        }
        last_ = time;
        ++count_;
    }

    double mean() const { return (last_ - first_) / static_cast<double>(count_ - 1); }

    /// Line and size of a step that differs too much from the mean, if any.
    std::optional<std::pair<int, double>> uneven() const {
        const double allowed = step_tolerance * std::abs(mean());
        const bool small = mean() - smallest_ > allowed;
        const bool large = largest_ - mean() > allowed;
        if (small && (!large || smallest_line_ < largest_line_))
            return std::pair(smallest_line_, smallest_);
        if (large)
            return std::pair(largest_line_, largest_);
        return std::nullopt;
    }

  private:
    std::size_t count_ = 0;
    double first_ = 0.0;
    double last_ = 0.0;
    double smallest_ = 0.0;
    double largest_ = 0.0;
    int smallest_line_ = 0;
    int largest_line_ = 0;
};

class RecordReader {
  public:
    RecordReader(TextLines& lines, const RecordOptions& options)
        : lines_(lines), options_(options), layout_(judge_layout(lines, TableKind::time_record)) {}

    std::vector<std::string> columns() const {
        std::vector<std::string> names;
        if (layout_.heading_line == 0)
            for (std::size_t i = 0; i < layout_.row_fields; ++i)
                names.push_back(std::to_string(i + 1));
        for (const auto& heading : layout_.headings)
            names.push_back(heading.text);
        return names;
    }

    void require_rows() const {
        if (!layout_.has_text)
            lines_.refuse({}, {}, "a time record", "an empty file");
        if (layout_.first_row_line == 0)
            lines_.refuse({}, {}, "a time record with rows of numbers", "none");
    }

    TimeRecord read() {
        require_rows();
        const int excitation = column(options_.excitation, "excitation");
        const int response = column(options_.response, "response");
        TimeRecord record;
        record.columns = columns();
        record.excitation_name = record.columns[static_cast<std::size_t>(excitation - 1)];
        record.response_name = record.columns[static_cast<std::size_t>(response - 1)];
        const int time = time_column(excitation, response);
        StepWatch steps;
        read_rows({time, excitation, response, 0}, record, steps);
        if (record.excitation.size() < 2)
            lines_.refuse({}, {}, "at least two rows of numbers",
                          std::to_string(record.excitation.size()));
        settle_sample_period(time, steps, record);
        return record;
    }

  private:
    std::optional<int> heading_line() const {
        return layout_.heading_line != 0 ? std::optional(layout_.heading_line) : std::nullopt;
    }

    /// The number of the column that the user named.
    int column(const std::string& name, const std::string& what) const {
        const auto names = columns();
        const auto wanted = folded(trimmed(name));
        const auto find = [&](auto text_of) {
            std::vector<int> found;
            for (std::size_t i = 0; i < names.size(); ++i)
                if (!wanted.empty() && folded(text_of(names[i])) == wanted)
                    found.push_back(static_cast<int>(i + 1));
            return found;
        };
        auto found = find([](const std::string& text) { return trimmed(text); });
        if (found.empty())
            found = find([](const std::string& text) { return without_bracket(text); });
        int number = 0;
        const auto [end, error] = std::from_chars(name.data(), name.data() + name.size(), number);
        if (found.empty() && error == std::errc{} && end == name.data() + name.size() &&
            number >= 1 && static_cast<std::size_t>(number) <= names.size())
            found.push_back(number);
        if (found.size() == 1)
            return found.front();
        std::string expected = "a column for the " + what + " (";
        for (const auto& known : names)
            expected += (&known == names.data() ? "" : ", ") + known;
        lines_.refuse(heading_line(), {}, expected + "; or a number from 1)",
                      found.empty() ? quoted_in_message(name)
                                    : std::to_string(found.size()) + " columns named " + name);
    }

    int time_column(int excitation, int response) const {
        for (std::size_t i = 0; i < layout_.headings.size(); ++i) {
            const int number = static_cast<int>(i + 1);
            if (layout_.headings[i].meaning == Meaning::time && number != excitation &&
                number != response)
                return number;
        }
        return 0;
    }

    void read_rows(const std::array<int, TableRows::most_counting>& counting, TimeRecord& record,
                   StepWatch& steps) {
        const std::size_t fields =
            layout_.heading_line != 0 ? layout_.headings.size() : layout_.row_fields;
        // One column may be excitation and response at once; a field fills one value only.
        auto separate = counting;
        const bool same = counting[1] == counting[2];
        if (same)
            separate[2] = 0;
        const TableRows table(layout_.dialect, separate, fields, layout_.heading_fields);
        const int begin = layout_.heading_line != 0
                              ? std::max(layout_.heading_line, layout_.units_line) + 1
                              : layout_.first_row_line;
        std::string_view line;
        lines_.rewind();
        TableRows::Values values{};
        while (lines_.next(line)) {
            if (lines_.line_number() < begin)
                continue;
            if (!table.take(line, values)) {
                if (trimmed(line).empty() || is_comment(line, layout_.dialect.separator))
                    continue;
                values = whole_row(table, line, separate);
            }
            if (counting[0] != 0)
                steps.add(values[0], lines_.line_number());
            record.excitation.push_back(values[1]);
            record.response.push_back(same ? values[1] : values[2]);
        }
    }

    /// A gap would shift every later sample: rows without a value cannot be left out here.
    TableRows::Values whole_row(const TableRows& table, std::string_view line,
                                const std::array<int, TableRows::most_counting>& counting) const {
        const TableRows::Row row = table.judge(line, lines_);
        for (std::size_t k = 0; k < counting.size(); ++k)
            if (counting[k] != 0 && row.kinds[k] != FieldKind::number) {
                const auto fields = split_fields(line, layout_.dialect.separator);
                const auto field = fields[static_cast<std::size_t>(counting[k] - 1)];
                lines_.refuse(lines_.line_number(), counting[k],
                              "a number in every row of a time record",
                              quoted_in_message(unquoted(field)));
            }
        return row.values;
    }

    void settle_sample_period(int time, const StepWatch& steps, TimeRecord& record) {
        const double by_column = time != 0 ? period_of_column(time, steps) : 0.0;
        const auto by_preamble = sampling_in(layout_.preamble);
        if (options_.sample_period_s > 0.0)
            record.sample_period_s = options_.sample_period_s;
        else if (by_preamble)
            record.sample_period_s = *by_preamble;
        else if (time != 0)
            record.sample_period_s = by_column;
        else
            lines_.refuse(
                {}, {},
                "a sample rate in the preamble (sample rate: ... Hz, dt = ... s) or a time "
                "column",
                "neither");
        if (time != 0 && std::abs(by_column / record.sample_period_s - 1.0) > step_tolerance)
            record.warnings.push_back(
                "sample period taken as " + number_text(record.sample_period_s, 6) +
                " s, though the time column says " + number_text(by_column, 6) + " s");
    }

    double period_of_column(int time, const StepWatch& steps) const {
        const Heading& heading = layout_.headings[static_cast<std::size_t>(time - 1)];
        const std::string unit = time_unit(heading);
        const double second = seconds_in(unit);
        if (second == 0.0)
            lines_.refuse(heading_line(), time, "a unit of time (s, ms or us)",
                          quoted_in_message(unit));
        if (!(steps.mean() > 0.0))
            lines_.refuse({}, time, "a time that rises", "one that does not");
        if (const auto uneven = steps.uneven())
            lines_.refuse(uneven->first, time, "even time steps of " + number_text(steps.mean(), 6),
                          "a step of " + number_text(uneven->second, 6));
        return steps.mean() * second;
    }

    TextLines& lines_;
    const RecordOptions& options_;
    TableLayout layout_;
};

TimeRecord read_record(ByteSource& source, const std::string& file_name,
                       const RecordOptions& options) {
    try {
        TextLines lines(source, file_name, options.progress);
        return RecordReader(lines, options).read();
    } catch (const ReadingCancelled&) {
        TimeRecord cancelled;
        cancelled.cancelled = true;
        return cancelled;
    }
}

} // namespace

TimeRecord read_time_record(const std::filesystem::path& file, const RecordOptions& options) {
    return read_record(*file_source(file), file.string(), options);
}

TimeRecord read_time_record_bytes(std::string_view bytes, const std::string& file_name,
                                  const RecordOptions& options) {
    return read_record(*memory_source(bytes), file_name, options);
}

std::vector<std::string> time_record_columns(const std::filesystem::path& file) {
    const auto source = file_source(file);
    TextLines lines(*source, file.string());
    const RecordOptions options;
    const RecordReader reader(lines, options);
    reader.require_rows();
    return reader.columns();
}

} // namespace cornerwright
