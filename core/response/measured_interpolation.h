#pragma once

#include "core/response/measured_response.h"
#include "core/response/rational_response.h"

#include <optional>

namespace cornerwright {

/// Joins the points of a measurement: ln|P| and the unwrapped phase are linear over ln w between
/// neighbours. Nothing is extrapolated. Holds its own copy of what it needs.
class MeasuredInterpolation {
  public:
    MeasuredInterpolation() = default;
    explicit MeasuredInterpolation(const MeasuredResponse& measured);

    std::size_t size() const { return w_.size(); }
    double w_rad_s(std::size_t index) const { return w_[index]; }
    double first_rad_s() const { return w_.front(); }
    double last_rad_s() const { return w_.back(); }

    /// Value between the points; `w_rad_s` within [first, last].
    ResponseSample at(double w_rad_s) const;
    /// Value on a point with the slope of the piece behind it (or of the last piece).
    ResponseSample node(std::size_t index) const;
    /// d ln P / d ln w on the piece from point `index` to the next.
    Complex log_slope(std::size_t index) const;

    /// Relative random error of |P|, equal to that of the phase in rad, where coherence and number
    /// of averages are known: sqrt((1 - c)/(2 n c)), c the ordinary coherence, joined linearly.
    /// Source: J. S. Bendat, A. G. Piersol, Random Data, ch. 9 (citation from memory).
    std::optional<double> random_error(double w_rad_s) const;

  private:
    std::size_t piece_of(double w_rad_s) const;

    std::vector<double> w_;
    std::vector<double> log_w_;
    std::vector<double> log_magnitude_;
    std::vector<double> phase_rad_;
    std::vector<double> coherence_;
    double averages_ = 0.0;
};

} // namespace cornerwright
