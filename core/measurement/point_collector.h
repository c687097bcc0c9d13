#pragma once

#include "core/measurement/read_measurement.h"
#include "core/measurement/units.h"

#include <cmath>
#include <functional>
#include <string>
#include <vector>

namespace cornerwright {

/// How the two numbers of a point make its response.
enum class PointForm {
    real_imaginary,
    magnitude_phase, ///< units of both given with `finish`
};

/// Gathers points in the order of the file: leaves out zero frequency, refuses negative
/// frequencies, changes of direction, coherences outside 0 to 1 and responses of zero (or of a
/// negative linear magnitude); turns a falling sweep and averages repeats. Memory: the points
/// themselves, once.
class PointCollector {
  public:
    struct Columns {
        int frequency = 0;
        int first = 0;     ///< real part or magnitude
        int coherence = 0; ///< 0: there is none
    };

    PointCollector(std::string file_name, PointForm form, Unit frequency_unit, Columns columns)
        : file_name_(std::move(file_name)),
          form_(form),
          rad_per_s_(rad_per_s_in(frequency_unit)),
          columns_(columns) {}

    /// One row. `first`, `second`: real and imaginary part, or magnitude and phase as written.
    void add(int line, double frequency, double first, double second, double coherence = 0.0) {
        const double w = frequency * rad_per_s_;
        if (!(w > 0.0)) {
            zero_or_negative(line, frequency);
            return;
        }
        if (!result_.response.w_rad_s.empty())
            judge_direction(line, w, frequency);
        if (columns_.coherence != 0) {
            if (!(coherence >= -coherence_slack && coherence <= 1.0 + coherence_slack))
                refuse_coherence(line, coherence);
            result_.response.coherence.push_back(std::fmin(1.0, std::fmax(0.0, coherence)));
        }
        if (first == 0.0 || (first < 0.0 && magnitude_ == Unit::linear))
            judge_size(line, first, second);
        result_.response.w_rad_s.push_back(w);
        result_.response.response.emplace_back(first, second);
    }

    void skip(int line, std::string why) { result_.skipped.push_back({line, std::move(why)}); }

    /// The units of magnitude and phase where they are known before the end; a magnitude of zero is
    /// then refused in its row.
    void expect_units(Unit magnitude, Unit phase) {
        magnitude_ = magnitude;
        phase_ = phase;
    }

    std::size_t points() const { return result_.response.w_rad_s.size(); }

    /// Points, skipped rows and the warnings about both. Throws InputError where fewer than two
    /// rows can be used.
    ReadResult finish();

  private:
    static constexpr double coherence_slack = 1e-6;

    void zero_or_negative(int line, double frequency);
    void judge_direction(int line, double w, double frequency);
    void judge_size(int line, double first, double second) const;
    [[noreturn]] void refuse_coherence(int line, double coherence) const;
    [[noreturn]] void refuse(int line, int column, std::string expected, std::string found) const;
    void convert();
    void average_repeats();
    void warn();

    std::string file_name_;
    PointForm form_;
    double rad_per_s_;
    Columns columns_;
    Unit magnitude_ = Unit::none;
    Unit phase_ = Unit::none;
    int direction_ = 0;
    ReadResult result_;
};

} // namespace cornerwright
