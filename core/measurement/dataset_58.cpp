#include "core/measurement/dataset_58.h"

#include "core/measurement/number_field.h"
#include "core/measurement/table_layout.h"

#include <array>
#include <charconv>
#include <cmath>

namespace cornerwright {
namespace {

/// The characters of a fixed field, without spaces.
std::string_view fixed_field(std::string_view line, std::size_t begin, std::size_t width) {
    return begin < line.size() ? trimmed(line.substr(begin, width)) : std::string_view();
}

/// A Fortran number. Exponents of three digits may stand without their letter (1.0-100).
bool fortran_number(std::string_view field, double& value) {
    const char* end = field.data() + field.size();
    const char* stop = parse_number(field.data(), end, '.', value);
    if (stop == end && !field.empty())
        return true;
    if (stop == field.data() || (*stop != '-' && *stop != '+'))
        return false;
    std::string text(field.data(), stop);
    text += 'e';
    text.append(stop, end);
    const char* text_end = text.data() + text.size();
    return parse_number(text.data(), text_end, '.', value) == text_end;
}

class DatasetReader {
  public:
    explicit DatasetReader(TextLines& lines) : lines_(lines) {}

    Dataset58 read() {
        data_.first_line = lines_.line_number();
        for (int record = 1; record <= 5; ++record)
            data_.identification.emplace_back(readable(record_line(record)));
        read_function(record_line(6));
        read_form(record_line(7));
        data_.abscissa_unit = readable(fixed_field(record_line(8), 47, 20));
        for (int record = 9; record <= 11; ++record)
            (void)record_line(record);
        read_values();
        return std::move(data_);
    }

  private:
    [[noreturn]] void refuse(std::string expected, std::string found) const {
        lines_.refuse(lines_.line_number(), {}, std::move(expected), std::move(found));
    }

    std::string_view record_line(int record) {
        std::string_view line;
        if (!lines_.next(line))
            refuse("record " + std::to_string(record) + " of dataset 58", "the end of the file");
        if (is_dataset_mark(line))
            refuse("record " + std::to_string(record) + " of dataset 58", "the end of the dataset");
        return line;
    }

    long integer(std::string_view line, std::size_t begin, std::size_t width,
                 const std::string& what) const {
        std::string_view text = fixed_field(line, begin, width);
        long value = 0;
        if (text.starts_with('+'))
            text.remove_prefix(1);
        const auto [end, error] = std::from_chars(text.data(), text.data() + text.size(), value);
        if (error != std::errc{} || end != text.data() + text.size())
            refuse(what, quoted_in_message(text));
        return value;
    }

    double real(std::string_view line, std::size_t begin, const std::string& what) const {
        const std::string_view text = fixed_field(line, begin, 13);
        double value = 0.0;
        if (!text.empty() && (!fortran_number(text, value) || !std::isfinite(value)))
            refuse(what, quoted_in_message(text));
        return value;
    }

    void read_function(std::string_view line) {
        const long type = integer(line, 0, 5, "a function type in record 6 of dataset 58");
        if (type == 4)
            data_.function = Dataset58::Function::frequency_response;
        else if (type == 6)
            data_.function = Dataset58::Function::coherence;
    }

    void read_form(std::string_view line) {
        const long type = integer(line, 0, 10, "an ordinate type in record 7 of dataset 58");
        if (type != 2 && type != 4 && type != 5 && type != 6)
            refuse("an ordinate type 2, 4, 5 or 6 in record 7 of dataset 58", std::to_string(type));
        data_.complex = type >= 5;
        data_.double_precision = type == 4 || type == 6;
        data_.pairs = integer(line, 10, 10, "a number of values in record 7 of dataset 58");
        if (data_.pairs < 0)
            refuse("a number of values in record 7 of dataset 58", std::to_string(data_.pairs));
        const long spacing = integer(line, 20, 10, "a spacing in record 7 of dataset 58");
        if (spacing != 0 && spacing != 1)
            refuse("a spacing 0 or 1 in record 7 of dataset 58", std::to_string(spacing));
        data_.even = spacing == 1;
        data_.first = real(line, 30, "the first abscissa in record 7 of dataset 58");
        data_.step = real(line, 43, "the step in record 7 of dataset 58");
    }

    bool is_wanted() const {
        return data_.complex ? data_.function == Dataset58::Function::frequency_response
                             : data_.function == Dataset58::Function::coherence;
    }

    /// Widths of the fields of a line of values, in turn.
    std::vector<std::size_t> widths() const {
        if (!data_.double_precision)
            return std::vector<std::size_t>(6, 13);
        if (data_.even)
            return std::vector<std::size_t>(4, 20);
        if (data_.complex)
            return {13, 20, 20};
        return {13, 20, 13, 20};
    }

    void read_values() {
        const auto field_widths = widths();
        const bool wanted = is_wanted();
        const long numbers_of_pair = (data_.even ? 0 : 1) + (data_.complex ? 2 : 1);
        const long expected = data_.pairs * numbers_of_pair;
        std::string_view line;
        long count = 0;
        while (true) {
            if (!lines_.next(line))
                lines_.refuse({}, {}, std::to_string(expected) + " values",
                              "the end of the file after fewer (" + std::to_string(count) + ")");
            if (is_dataset_mark(line))
                break;
            if (!wanted)
                continue;
            take_numbers(line, field_widths);
            for (const double value : numbers_)
                take_number(value, count++ % numbers_of_pair);
        }
        if (wanted && count != expected)
            refuse(std::to_string(expected) + " values", std::to_string(count));
    }

    void take_number(double value, long place_in_pair) {
        if (!data_.even && place_in_pair == 0) {
            data_.abscissa.push_back(value);
            return;
        }
        if (!data_.complex || place_in_pair == (data_.even ? 0 : 1))
            data_.lines_of_values.push_back(lines_.line_number());
        data_.ordinate.push_back(value);
    }

    /// The numbers of a line, by the fixed widths of its format; by spaces where that fails.
    void take_numbers(std::string_view line, const std::vector<std::size_t>& field_widths) {
        if (take_fixed(line, field_widths))
            return;
        numbers_.clear();
        const auto fields = split_fields(line, ' ');
        for (std::size_t i = 0; i < fields.size(); ++i) {
            double value = 0.0;
            if (!fortran_number(fields[i], value))
                lines_.refuse(lines_.line_number(), static_cast<int>(i + 1), "a number",
                              quoted_in_message(fields[i]));
            numbers_.push_back(value);
        }
    }

    bool take_fixed(std::string_view line, const std::vector<std::size_t>& field_widths) {
        numbers_.clear();
        std::size_t begin = 0;
        for (const std::size_t width : field_widths) {
            const std::string_view field = fixed_field(line, begin, width);
            double value = 0.0;
            if (field.empty())
                break;
            if (!fortran_number(field, value))
                return false;
            numbers_.push_back(value);
            begin += width;
        }
        return begin >= line.size() || trimmed(line.substr(begin)).empty();
    }

    TextLines& lines_;
    Dataset58 data_;
    std::vector<double> numbers_;
};

} // namespace

bool is_dataset_mark(std::string_view line) {
    return trimmed(line) == "-1";
}

Dataset58 read_dataset_58(TextLines& lines) {
    return DatasetReader(lines).read();
}

} // namespace cornerwright
