#include "core/measurement/read_touchstone.h"

#include "core/measurement/number_field.h"
#include "core/measurement/point_collector.h"
#include "core/measurement/preamble.h"
#include "core/measurement/table_layout.h"
#include "core/measurement/touchstone_header.h"

#include <algorithm>
#include <cmath>
#include <filesystem>
#include <utility>

namespace cornerwright {
namespace {

/// Ports that the suffix .s<n>p tells; 0 where it does not.
int ports_of_suffix(const std::string& file_name) {
    const std::string suffix = std::filesystem::path(file_name).extension().string();
    int ports = 0;
    for (std::size_t i = 2; i + 1 < suffix.size() && ports < 1000; ++i) {
        if (suffix[i] < '0' || suffix[i] > '9')
            return 0;
        ports = 10 * ports + (suffix[i] - '0');
    }
    return ports;
}

class TouchstoneReader {
  public:
    TouchstoneReader(TextLines& lines, const ReadOptions& options)
        : lines_(lines), options_(options), ports_(ports_of_suffix(lines.file_name())) {}

    ReadResult read() {
        std::string_view raw;
        lines_.rewind();
        while (!ended_ && lines_.next(raw))
            take_line(raw);
        finish_rows();
        ReadResult result = points_->finish();
        scale(result.response);
        result.response.averages = averages_in(comments_);
        result.columns = {{1, "", "frequency", std::string(name_of(header_->frequency_unit))},
                          {field_ + 1, "", name_, format_name()}};
        if (noise_rows_ > 0)
            result.warnings.push_back("noise section left out: " + std::to_string(noise_rows_) +
                                      (noise_rows_ == 1 ? " row" : " rows"));
        return result;
    }

  private:
    enum class Section { head, information, reference, network, noise };

    void take_line(std::string_view raw) {
        const std::size_t comment = raw.find('!');
        if (comment != std::string_view::npos && comments_.size() < most_comments)
            comments_.emplace_back(raw.substr(comment + 1));
        const std::string_view line = trimmed(raw.substr(0, comment));
        if (line.empty())
            return;
        if (line.front() == '[' || section_ == Section::information)
            take_keyword(upper_case(line));
        else if (line.front() == '#')
            take_option_line(line);
        else if (section_ == Section::reference && !version_2_data_)
            return; // further reference resistances
        else
            take_row(line);
    }

    void take_option_line(std::string_view line) {
        // Later option lines are ignored.
        if (!header_)
            header_ = touchstone_options(upper_case(line), lines_);
    }

    void take_keyword(const std::string& line) {
        const std::string_view keyword = touchstone_keyword(line);
        if (section_ == Section::information) {
            if (keyword == "[END INFORMATION]")
                section_ = Section::head;
            return;
        }
        if (keyword == "[VERSION]")
            version_2_ = true;
        if (!version_2_)
            refuse("a file that begins with [Version] where it has keywords", std::string(keyword));
        if (keyword == "[BEGIN INFORMATION]") {
            section_ = Section::information;
        } else if (keyword == "[NETWORK DATA]") {
            begin_network_data();
        } else if (keyword == "[NOISE DATA]") {
            section_ = Section::noise;
        } else if (keyword == "[END]") {
            ended_ = true;
        } else {
            if (version_2_data_)
                refuse("rows, [Noise Data] or [End]", std::string(keyword));
            take_touchstone_keyword(line, keywords_, lines_);
            section_ = keyword == "[REFERENCE]" ? Section::reference : Section::head;
        }
    }

    void begin_network_data() {
        if (!header_)
            refuse("an option line (# ...) above the data", "none");
        if (!keywords_.ports)
            refuse("[Number of Ports] above [Network Data]", "none");
        ports_ = *keywords_.ports;
        if (ports_ == 2 && !keywords_.order)
            refuse("[Two-Port Data Order] above [Network Data]", "none");
        if (!keywords_.frequencies)
            refuse("[Number of Frequencies] above [Network Data]", "none");
        section_ = Section::network;
        version_2_data_ = true;
        begin_rows(0);
    }

    /// Settles ports and parameter before the first row of `numbers` numbers.
    void begin_rows(std::size_t numbers) {
        if (ports_ == 0)
            ports_ = numbers == 3 ? 1 : 2;
        if (ports_ != 1 && ports_ != 2)
            lines_.refuse(lines_.line_number(), {}, "a file of one or two ports",
                          std::to_string(ports_) + " ports");
        choose_parameter();
        PointCollector::Columns columns{1, field_ + 1, 0};
        using enum TouchstoneOptions::Format;
        points_.emplace(lines_.file_name(),
                        header_->format == real_imaginary ? PointForm::real_imaginary
                                                          : PointForm::magnitude_phase,
                        header_->frequency_unit, columns);
        points_->expect_units(header_->format == decibel_angle ? Unit::decibel : Unit::linear,
                              Unit::degree);
        if (header_->format == real_imaginary)
            points_->expect_units(Unit::none, Unit::none);
    }

    /// The parameter that is read, and the field (from 0) where its pair begins.
    void choose_parameter() {
        std::string wanted = upper_case(options_.parameter);
        const std::string by_default = ports_ == 1 ? "11" : "21";
        if (wanted.empty())
            wanted = by_default;
        if (wanted.size() == 2)
            wanted.insert(wanted.begin(), header_->parameter);
        const bool known =
            wanted == std::string(1, header_->parameter) + "11" ||
            (ports_ == 2 && wanted.size() == 3 && wanted[0] == header_->parameter &&
             (wanted[1] == '1' || wanted[1] == '2') && (wanted[2] == '1' || wanted[2] == '2'));
        if (!known)
            lines_.refuse(
                {}, {},
                std::string("a parameter of this file (") + header_->parameter + "11" +
                    (ports_ == 2 ? " to " + std::string(1, header_->parameter) + "22" : "") + ")",
                quoted_in_message(options_.parameter));
        name_ = wanted;
        row_ = wanted[1] - '1';
        column_ = wanted[2] - '1';
        numbers_in_row_ = ports_ == 1 ? 3 : keywords_.matrix == MatrixFormat::full ? 9 : 7;
        field_ = 1 + 2 * pair_of_parameter();
    }

    int pair_of_parameter() const {
        if (ports_ == 1)
            return 0;
        if (keywords_.matrix != MatrixFormat::full)
            return row_ + column_; // N11, N21 = N12, N22
        if (row_ == column_)
            return 3 * row_;
        const bool first =
            (row_ == 1) == (!version_2_ || keywords_.order == TwoPortOrder::n21_before_n12);
        return first ? 1 : 2;
    }

    void take_row(std::string_view line) {
        if (section_ == Section::noise) {
            ++noise_rows_;
            return;
        }
        if (!header_)
            refuse("an option line (# ...) above the data", "numbers");
        if (version_2_ && !version_2_data_)
            refuse("[Network Data] above the rows", quoted_in_message(line));
        const auto fields = split_fields(line, ' ');
        if (!points_)
            begin_rows(fields.size());
        const FieldKind kind = judge(fields, 0, values_[0]);
        if (begins_noise(fields.size(), kind)) {
            section_ = Section::noise;
            ++noise_rows_;
            return;
        }
        if (fields.size() != numbers_in_row_)
            refuse(std::to_string(numbers_in_row_) + " numbers", std::to_string(fields.size()));
        add_point(fields, kind);
    }

    /// A version 1 file of two ports goes on with five numbers a row where frequency does not rise.
    bool begins_noise(std::size_t numbers, FieldKind kind) const {
        return !version_2_ && ports_ == 2 && numbers == 5 && rows_ > 0 &&
               kind == FieldKind::number && values_[0] <= last_frequency_;
    }

    FieldKind judge(const std::vector<std::string_view>& fields, std::size_t index, double& value) {
        const FieldKind kind = judge_field(fields[index], '.', value);
        if (kind == FieldKind::text)
            lines_.refuse(lines_.line_number(), static_cast<int>(index + 1), "a number",
                          quoted_in_message(fields[index]));
        return kind;
    }

    void add_point(const std::vector<std::string_view>& fields, FieldKind frequency) {
        const int line = lines_.line_number();
        bool whole = frequency == FieldKind::number;
        const auto wanted = static_cast<std::size_t>(field_);
        for (std::size_t i = 1; i < fields.size(); ++i) {
            double value = 0.0;
            const FieldKind kind = judge(fields, i, value);
            if (i != wanted && i != wanted + 1)
                continue;
            values_[i - wanted + 1] = value;
            if (kind == FieldKind::minus_infinity && i == wanted &&
                frequency == FieldKind::number && values_[0] != 0.0 &&
                header_->format == TouchstoneOptions::Format::decibel_angle)
                lines_.refuse(line, field_ + 1, "a response that is not exactly zero", "-inf dB");
            whole = whole && kind == FieldKind::number;
        }
        ++rows_;
        if (frequency == FieldKind::number) {
            last_frequency_ = values_[0];
            if (values_[0] == 0.0) {
                points_->skip(line, "zero frequency");
                return;
            }
        }
        if (whole)
            points_->add(line, values_[0], values_[1], values_[2]);
        else
            points_->skip(line, "not a number");
    }

    void finish_rows() {
        if (lines_.line_number() == 0)
            lines_.refuse({}, {}, "a measurement", "an empty file");
        if (version_2_ && !ended_)
            lines_.refuse({}, {}, "[End] behind the data", "the end of the file");
        if (!points_)
            lines_.refuse({}, {}, "rows of numbers", "none");
        if (version_2_ && keywords_.frequencies && *keywords_.frequencies != rows_)
            lines_.refuse(keywords_.frequencies_line, {},
                          std::to_string(*keywords_.frequencies) + " frequencies",
                          std::to_string(rows_));
    }

    /// Version 1 stores what is not S normalised to the resistance of the option line: impedances
    /// divided by it, admittances multiplied. H11 and G22 are impedances, H22 and G11 admittances.
    void scale(MeasuredResponse& response) const {
        if (version_2_)
            return;
        const bool first = row_ == 0 && column_ == 0;
        const bool last = row_ == 1 && column_ == 1;
        const char parameter = header_->parameter;
        double factor = 1.0;
        if (parameter == 'Z' || (parameter == 'H' && first) || (parameter == 'G' && last))
            factor = header_->resistance_ohm;
        else if (parameter == 'Y' || (parameter == 'H' && last) || (parameter == 'G' && first))
            factor = 1.0 / header_->resistance_ohm;
        for (Complex& value : response.response) {
            value *= factor;
            if (value == 0.0 || !std::isfinite(std::abs(value)))
                lines_.refuse({}, {}, "responses within the range of numbers",
                              "one of zero or infinite size");
        }
    }

    std::string format_name() const {
        using enum TouchstoneOptions::Format;
        return header_->format == real_imaginary  ? "RI"
               : header_->format == decibel_angle ? "DB"
                                                  : "MA";
    }

    [[noreturn]] void refuse(std::string expected, std::string found) const {
        lines_.refuse(lines_.line_number(), {}, std::move(expected), std::move(found));
    }

    /// Comments are kept to look for the number of averages; more than these are data.
    static constexpr std::size_t most_comments = 200;

    TextLines& lines_;
    const ReadOptions& options_;
    int ports_;
    Section section_ = Section::head;
    bool version_2_ = false;
    bool version_2_data_ = false;
    bool ended_ = false;
    std::optional<TouchstoneOptions> header_;
    TouchstoneKeywords keywords_;
    std::optional<PointCollector> points_;
    std::vector<std::string> comments_;
    std::string name_;
    int row_ = 0;
    int column_ = 0;
    int field_ = 1;
    std::size_t numbers_in_row_ = 3;
    double values_[3] = {};
    double last_frequency_ = 0.0;
    long rows_ = 0;
    long noise_rows_ = 0;
};

} // namespace

ReadResult read_touchstone(TextLines& lines, const ReadOptions& options) {
    return TouchstoneReader(lines, options).read();
}

} // namespace cornerwright
