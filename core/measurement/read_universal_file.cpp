#include "core/measurement/read_universal_file.h"

#include "core/measurement/dataset_58.h"
#include "core/measurement/number_field.h"
#include "core/measurement/point_collector.h"
#include "core/measurement/preamble.h"

#include <algorithm>
#include <cmath>
#include <optional>
#include <utility>

namespace cornerwright {
namespace {

class UniversalFileReader {
  public:
    explicit UniversalFileReader(TextLines& lines) : lines_(lines) {}

    ReadResult read() {
        read_datasets();
        if (!response_)
            lines_.refuse({}, {},
                          "a frequency response (dataset 58, function type 4, complex ordinate)",
                          functions_ == 0 ? "no dataset 58" : "only functions of other types");
        choose_coherence();
        ReadResult result = points();
        result.response.averages = averages_in(response_->identification);
        result.columns = {{0, "", "frequency", std::string(name_of(unit_))},
                          {0, "", "response", ""}};
        result.warnings.insert(result.warnings.end(), warnings_.begin(), warnings_.end());
        return result;
    }

  private:
    void read_datasets() {
        std::string_view line;
        lines_.rewind();
        while (lines_.next(line)) {
            if (trimmed(line).empty())
                continue;
            if (!is_dataset_mark(line))
                lines_.refuse(lines_.line_number(), {}, "-1, which opens a dataset",
                              quoted_in_message(line));
            if (!lines_.next(line))
                break;
            const std::string number(trimmed(line).substr(0, trimmed(line).find(' ')));
            if (number == "58b" || number == "58B")
                lines_.refuse(lines_.line_number(), {},
                              "dataset 58 as text (export the universal file again as ASCII)",
                              "the binary form 58b");
            if (lines_.looks_binary())
                lines_.refuse_binary();
            if (number == "58")
                keep(read_dataset_58(lines_));
            else
                skip_dataset();
        }
        if (lines_.looks_binary())
            lines_.refuse_binary();
    }

    void skip_dataset() {
        std::string_view line;
        while (lines_.next(line) && !is_dataset_mark(line)) {
        }
    }

    void keep(Dataset58 data) {
        ++functions_;
        if (data.function == Dataset58::Function::frequency_response && data.complex) {
            if (response_)
                lines_.refuse(data.first_line, {}, "one frequency response", "two");
            response_ = std::move(data);
        } else if (data.function == Dataset58::Function::coherence && !data.complex) {
            coherences_.push_back(std::move(data));
        }
    }

    void choose_coherence() {
        for (auto& candidate : coherences_) {
            if (candidate.pairs != response_->pairs)
                warnings_.push_back("coherence left out: it has " +
                                    std::to_string(candidate.pairs) + " values, the response " +
                                    std::to_string(response_->pairs));
            else if (coherence_)
                warnings_.push_back("coherence left out: the first one of the file counts");
            else
                coherence_ = std::move(candidate);
        }
    }

    Unit abscissa_unit() const {
        const std::string& text = response_->abscissa_unit;
        if (text.empty() || text == "NONE" || text == "none")
            return Unit::hertz;
        const auto unit = unit_from_text(text);
        const auto fits = unit ? fitting_unit(Meaning::frequency, *unit, text) : std::nullopt;
        if (!fits || *fits == Unit::none)
            lines_.refuse(response_->first_line + record_8, {}, "an abscissa in Hz or rad/s",
                          quoted_in_message(text));
        return *fits;
    }

    double abscissa(std::size_t index) const {
        if (!response_->even)
            return response_->abscissa[index];
        return response_->first + static_cast<double>(index) * response_->step;
    }

    ReadResult points() {
        unit_ = abscissa_unit();
        PointCollector points(lines_.file_name(), PointForm::real_imaginary, unit_,
                              {0, 0, coherence_ ? any_column : 0});
        const auto usable = [](double value) { return std::abs(value) < instrument_not_a_number; };
        for (std::size_t i = 0; i < response_->lines_of_values.size(); ++i) {
            const int line = response_->lines_of_values[i];
            const double re = response_->ordinate[2 * i];
            const double im = response_->ordinate[2 * i + 1];
            const double coherence = coherence_ ? coherence_->ordinate[i] : 0.0;
            const double frequency = abscissa(i);
            if (usable(re) && usable(im) && usable(coherence) && usable(frequency))
                points.add(line, frequency, re, im, coherence);
            else
                points.skip(line, frequency == 0.0 ? "zero frequency" : "not a number");
        }
        return points.finish();
    }

    /// Lines from "58" to record 8.
    static constexpr int record_8 = 8;
    /// The collector wants to know that there is a coherence; its column means nothing here.
    static constexpr int any_column = -1;

    TextLines& lines_;
    std::optional<Dataset58> response_;
    std::optional<Dataset58> coherence_;
    std::vector<Dataset58> coherences_;
    std::vector<std::string> warnings_;
    Unit unit_ = Unit::hertz;
    int functions_ = 0;
};

} // namespace

ReadResult read_universal_file(TextLines& lines) {
    return UniversalFileReader(lines).read();
}

} // namespace cornerwright
