#include "core/measurement/point_collector.h"

#include "core/numerics/error.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <numbers>
#include <utility>

namespace cornerwright {
namespace {

std::string lines_of(const std::vector<SkippedRow>& rows, std::string_view why) {
    constexpr std::size_t most = 6;
    std::string text;
    std::size_t count = 0;
    for (const auto& row : rows) {
        if (row.why != why || ++count > most)
            continue;
        text += (text.empty() ? "" : ", ") + std::to_string(row.line);
    }
    return (count == 1 ? "line " : "lines ") + text + (count > most ? ", ..." : "");
}

} // namespace

void PointCollector::refuse(int line, int column, std::string expected, std::string found) const {
    throw InputError({file_name_, line, column > 0 ? std::optional(column) : std::nullopt},
                     std::move(expected), std::move(found));
}

void PointCollector::zero_or_negative(int line, double frequency) {
    if (frequency < 0.0)
        refuse(line, columns_.frequency, "a frequency that is not negative",
               number_text(frequency));
    skip(line, "zero frequency");
}

void PointCollector::judge_direction(int line, double w, double frequency) {
    const double last = result_.response.w_rad_s.back();
    if (w == last)
        return;
    const int direction = w > last ? 1 : -1;
    if (direction_ == -direction) {
        // Twelve digits read as the file has them, not as the product with the unit.
        refuse(line, columns_.frequency, "frequencies in one direction",
               number_text(frequency) + " after " + number_text(last / rad_per_s_, 12));
    }
    direction_ = direction;
}

void PointCollector::judge_size(int line, double first, double second) const {
    if (first < 0.0)
        refuse(line, columns_.first, "a linear magnitude that is not negative", number_text(first));
    if (form_ == PointForm::real_imaginary ? second == 0.0 : magnitude_ == Unit::linear)
        refuse(line, columns_.first, "a response that is not exactly zero", "0");
}

void PointCollector::refuse_coherence(int line, double coherence) const {
    refuse(line, columns_.coherence, "a coherence from 0 to 1", number_text(coherence));
}

void PointCollector::convert() {
    const double to_radians = phase_ == Unit::degree ? std::numbers::pi / 180.0 : 1.0;
    const double to_exponent = std::numbers::ln10 / 20.0;
    for (Complex& point : result_.response.response) {
        const double size =
            magnitude_ == Unit::decibel ? std::exp(point.real() * to_exponent) : point.real();
        const double angle = point.imag() * to_radians;
        point = {size * std::cos(angle), size * std::sin(angle)};
    }
}

void PointCollector::average_repeats() {
    auto& [w, response, coherence, averages] = result_.response;
    std::size_t kept = 0;
    std::size_t repeated = 0;
    for (std::size_t begin = 0, end = 0; begin < w.size(); begin = end) {
        Complex sum = 0.0;
        double coherence_sum = 0.0;
        for (end = begin; end < w.size() && w[end] == w[begin]; ++end) {
            sum += response[end];
            if (!coherence.empty())
                coherence_sum += coherence[end];
        }
        const auto count = static_cast<double>(end - begin);
        repeated += end - begin > 1 ? 1 : 0;
        w[kept] = w[begin];
        response[kept] = end - begin == 1 ? response[begin] : sum / count;
        if (!coherence.empty())
            coherence[kept] = coherence_sum / count;
        if (response[kept] == 0.0)
            throw InputError({file_name_, {}, {}}, "a response that is not exactly zero",
                             "a mean of zero at " + number_text(w[begin]) + " rad/s");
        ++kept;
    }
    if (repeated == 0)
        return;
    result_.warnings.push_back("repeated frequency: rows next to each other at the same frequency "
                               "are averaged as complex numbers (" +
                               std::to_string(w.size()) + " rows, " + std::to_string(kept) +
                               " points)");
    w.resize(kept);
    response.resize(kept);
    if (!coherence.empty())
        coherence.resize(kept);
}

void PointCollector::warn() {
    const auto count = [&](std::string_view why) {
        return std::count_if(result_.skipped.begin(), result_.skipped.end(),
                             [&](const SkippedRow& row) { return row.why == why; });
    };
    const auto tell = [&](std::string_view why, const std::string& what) {
        if (const auto rows = count(why); rows > 0)
            result_.warnings.push_back(std::string(why) + ": " + std::to_string(rows) +
                                       (rows == 1 ? " row " : " rows ") + what + " (" +
                                       lines_of(result_.skipped, why) + ")");
    };
    tell("zero frequency", "at zero frequency left out");
    tell("not a number", "without a value left out");
}

ReadResult PointCollector::finish() {
    auto& [w, response, coherence, averages] = result_.response;
    const auto refuse_all = [&](std::string expected, std::string found) {
        throw InputError({file_name_, {}, {}}, std::move(expected), std::move(found));
    };
    if (w.empty())
        refuse_all("at least one row with numbers (two make a response)", "none");
    if (w.size() == 1)
        refuse_all("at least two rows with numbers", "one");
    if (form_ == PointForm::magnitude_phase)
        convert();
    for (const Complex value : response)
        if (value == 0.0 || !std::isfinite(value.real()) || !std::isfinite(value.imag()))
            refuse_all("responses within the range of numbers", "one of zero or infinite size");
    if (direction_ < 0) {
        std::reverse(w.begin(), w.end());
        std::reverse(response.begin(), response.end());
        std::reverse(coherence.begin(), coherence.end());
    }
    warn();
    average_repeats();
    if (w.size() == 1)
        refuse_all("at least two frequencies", "one");
    result_.rows = w.size();
    return std::move(result_);
}

} // namespace cornerwright
