#include "core/measurement/read_table.h"

#include "core/measurement/point_collector.h"
#include "core/measurement/preamble.h"
#include "core/measurement/sampling.h"
#include "core/measurement/table_rows.h"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <utility>

namespace cornerwright {
namespace {

/// Phases beyond this, without a unit, are degrees: one turn of radians.
constexpr double one_turn = 6.2832;

/// What the values of magnitude and phase say of units that the heading leaves open.
struct ValuesSeen {
    bool negative_magnitude = false;
    bool beyond_one_turn = false;

    void look(double magnitude, double phase) {
        negative_magnitude |= magnitude < 0.0;
        beyond_one_turn |= std::abs(phase) > one_turn;
    }
};

/// The head of a big file had no decimal sign; a later row decides for the comma.
struct DecimalSignTurnsOut {};

class TableReader {
  public:
    TableReader(TextLines& lines, const ReadOptions& options, TableReport& report)
        : lines_(lines),
          options_(options),
          layout_(report.layout),
          columns_(report.columns),
          choices_(report.choices),
          time_record_(report.time_record) {}

    ReadResult read() {
        prepare();
        PointCollector points = collector();
        read_rows(points);
        settle_units(points);
        ReadResult result = points.finish();
        result.response.averages = averages_in(layout_.preamble);
        result.columns = columns_.infos;
        result.warnings.insert(result.warnings.begin(), columns_.warnings.begin(),
                               columns_.warnings.end());
        return result;
    }

  private:
    void prepare() {
        if (!layout_.has_text)
            lines_.refuse({}, {}, "a measurement", "an empty file");
        if (layout_.heading_line == 0)
            refuse_time_record();
        if (layout_.heading_line == 0 && layout_.first_row_line == 0)
            lines_.refuse({}, {}, "a measurement with rows of numbers",
                          "no row that begins with one");
        if (layout_.units_line != 0 && layout_.units_fields < layout_.headings.size())
            lines_.refuse(layout_.units_line, {},
                          std::to_string(layout_.headings.size()) + " fields",
                          std::to_string(layout_.units_fields));
        choose_columns(layout_, options_, lines_.file_name(), columns_, choices_);
        seek_header_only();
    }

    void refuse_time_record() {
        if (!options_.columns.empty())
            return;
        const TableLayout record = judge_layout(lines_, TableKind::time_record);
        const bool time =
            std::any_of(record.headings.begin(), record.headings.end(),
                        [](const Heading& heading) { return heading.meaning == Meaning::time; });
        const bool fits = record.row_fields > 1 && record.headings.size() == record.row_fields;
        if (!fits || !(time || sampling_in(record.preamble)))
            return;
        layout_ = record;
        time_record_ = true;
        lines_.refuse(record.heading_line, {}, "a frequency response",
                      "a time record, which `estimate` makes a response of");
    }

    void seek_header_only() const {
        if (layout_.first_row_line != 0)
            return;
        // Rows that do not begin with a number may still be rows, of missing values for instance.
        lines_.rewind();
        std::string_view line;
        const int last = std::max(layout_.heading_line, layout_.units_line);
        while (lines_.next(line))
            if (lines_.line_number() > last && !trimmed(line).empty() &&
                !is_comment(line, layout_.dialect.separator))
                return;
        lines_.refuse({}, {}, "rows of numbers below the heading", "none");
    }

    PointCollector collector() {
        const bool parts = columns_.real_imaginary;
        PointCollector points(lines_.file_name(),
                              parts ? PointForm::real_imaginary : PointForm::magnitude_phase,
                              columns_.frequency.unit,
                              {columns_.frequency.column, columns_.first.column,
                               columns_.coherence ? columns_.coherence->column : 0});
        if (!parts)
            points.expect_units(columns_.first.unit, columns_.second.unit);
        return points;
    }

    TableRows rows() const {
        const int coherence = columns_.coherence ? columns_.coherence->column : 0;
        return {
            layout_.dialect,
            {columns_.frequency.column, columns_.first.column, columns_.second.column, coherence},
            columns_.infos.size(),
            layout_.heading_fields};
    }

    void read_rows(PointCollector& points) {
        const TableRows table = rows();
        const double coherence_unit =
            columns_.coherence && columns_.coherence->unit == Unit::percent ? 0.01 : 1.0;
        const int begin = layout_.heading_line != 0
                              ? std::max(layout_.heading_line, layout_.units_line) + 1
                              : layout_.first_row_line;
        lines_.rewind();
        std::string_view line;
        TableRows::Values values{};
        while (lines_.next(line)) {
            if (lines_.line_number() < begin)
                continue;
            if (table.take(line, values)) [[likely]] {
                seen_.look(values[1], values[2]);
                points.add(lines_.line_number(), values[0], values[1], values[2],
                           values[3] * coherence_unit);
                continue;
            }
            if (trimmed(line).empty() || is_comment(line, layout_.dialect.separator))
                continue;
            if (!layout_.decimal_seen && table.has_other_decimal_sign(line))
                throw DecimalSignTurnsOut{};
            judge_row(table, line, coherence_unit, points);
        }
    }

    void judge_row(const TableRows& table, std::string_view line, double coherence_unit,
                   PointCollector& points) {
        const TableRows::Row row = table.judge(line, lines_);
        const auto is = [&](std::size_t k, FieldKind kind) { return row.kinds[k] == kind; };
        const int number = lines_.line_number();
        const bool zero = is(0, FieldKind::number) && row.values[0] == 0.0;
        seen_.look(is(1, FieldKind::number) ? row.values[1] : 0.0,
                   is(2, FieldKind::number) ? row.values[2] : 0.0);
        const auto whole = [&](std::size_t from, std::size_t to) {
            return std::all_of(row.kinds.begin() + static_cast<std::ptrdiff_t>(from),
                               row.kinds.begin() + static_cast<std::ptrdiff_t>(to),
                               [](FieldKind kind) { return kind == FieldKind::number; });
        };
        if (zero)
            points.skip(number, "zero frequency");
        else if (whole(0, 4))
            points.add(number, row.values[0], row.values[1], row.values[2],
                       row.values[3] * coherence_unit);
        else if (is(1, FieldKind::minus_infinity) && whole(0, 1) && whole(2, 4) &&
                 !columns_.real_imaginary && columns_.first.unit != Unit::linear)
            lines_.refuse(number, columns_.first.column, "a response that is not exactly zero",
                          "-inf dB");
        else
            points.skip(number, "not a number");
    }

    /// Units of magnitude and phase that neither heading nor options gave.
    void settle_units(PointCollector& points) {
        if (columns_.real_imaginary)
            return;
        const bool no_heading = layout_.heading_line == 0;
        if (columns_.assumed && !(seen_.negative_magnitude && seen_.beyond_one_turn)) {
            for (const auto about :
                 {OpenChoice::About::magnitude_unit, OpenChoice::About::phase_unit})
                choices_.push_back(about_unit(about, "no heading"));
            lines_.refuse({}, {}, "a heading (or --magnitude-unit and --phase-unit, or --column)",
                          (columns_.infos.size() == 3 ? "three" : "four") +
                              std::string(" columns that do not look like Hz, dB, deg"));
        }
        if (no_heading)
            columns_.warnings.insert(columns_.warnings.begin(), no_heading_warning());
        const bool magnitude_open = settle(columns_.first, seen_.negative_magnitude, Unit::decibel,
                                           "magnitude in dB, since it has negative values");
        const bool phase_open =
            settle(columns_.second, seen_.beyond_one_turn, Unit::degree,
                   "phase in degrees, since it goes beyond one turn of radians");
        if (magnitude_open)
            choices_.push_back(
                about_unit(OpenChoice::About::magnitude_unit, "no unit, and no negative value"));
        if (phase_open)
            choices_.push_back(about_unit(OpenChoice::About::phase_unit,
                                          "no unit, and every value within one turn of radians"));
        if (magnitude_open)
            lines_.refuse(heading_line(), columns_.first.column,
                          "dB or linear in the heading (or --magnitude-unit dB, linear)",
                          "no unit, and no negative value");
        if (phase_open)
            lines_.refuse(heading_line(), columns_.second.column,
                          "deg or rad in the heading (or --phase-unit deg, rad)",
                          "no unit, and every value within one turn of radians");
        points.expect_units(columns_.first.unit, columns_.second.unit);
    }

    std::optional<int> heading_line() const {
        return layout_.heading_line != 0 ? std::optional(layout_.heading_line) : std::nullopt;
    }

    std::string no_heading_warning() const {
        std::string text = "no heading: columns taken as ";
        for (const auto& info : columns_.infos)
            text += (info.column == 1 ? "" : ", ") + info.meaning +
                    (info.unit.empty() ? "" : " in " + info.unit);
        return text;
    }

    /// True where the unit stays open.
    bool settle(CountingColumn& column, bool evident, Unit unit, const std::string& what) {
        if (column.unit != Unit::none)
            return false;
        if (!evident)
            return true;
        column.unit = unit;
        columns_.infos[static_cast<std::size_t>(column.column - 1)].unit =
            std::string(name_of(unit));
        columns_.warnings.push_back("unit assumed: " + what + " (column " +
                                    std::to_string(column.column) + ")");
        return false;
    }

    OpenChoice about_unit(OpenChoice::About about, const std::string& why) const {
        const bool magnitude = about == OpenChoice::About::magnitude_unit;
        return {about, magnitude ? columns_.first.column : columns_.second.column,
                magnitude ? std::vector<std::string>{"dB", "linear"}
                          : std::vector<std::string>{"deg", "rad"},
                why};
    }

    TextLines& lines_;
    const ReadOptions& options_;
    TableLayout& layout_;
    TableColumns& columns_;
    std::vector<OpenChoice>& choices_;
    bool& time_record_;
    ValuesSeen seen_;
};

} // namespace

ReadResult read_table(TextLines& lines, const ReadOptions& options, TableReport& report) {
    report.layout = judge_layout(lines, TableKind::frequency_response);
    try {
        return TableReader(lines, options, report).read();
    } catch (const DecimalSignTurnsOut&) {
        report.layout.dialect.decimal = report.layout.dialect.decimal == '.' ? ',' : '.';
        report.layout.decimal_seen = true;
        report.columns = {};
        report.choices.clear();
        return TableReader(lines, options, report).read();
    }
}

} // namespace cornerwright
