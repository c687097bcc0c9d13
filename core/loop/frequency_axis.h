#pragma once

#include "core/numerics/root_form.h"
#include "core/response/frequency_grid.h"
#include "core/response/rational_response.h"

#include <vector>

namespace cornerwright {

/// How w runs along the axis on which a rational function is evaluated: s = jw, or for sampled
/// functions s' = j tan(w Ts / 2) with z = (1 + s')/(1 - s').
class FrequencyAxis {
  public:
    FrequencyAxis() = default;
    explicit FrequencyAxis(double sample_period_s) : half_period_(0.5 * sample_period_s) {}

    bool sampled() const { return half_period_ > 0.0; }
    /// pi/Ts; infinite where nothing samples.
    double end_rad_s() const;
    double place(double w_rad_s) const;
    double w_rad_s(double place) const;
    /// d place / d w at a place.
    double rate(double place) const;
    GridGuide guide(Complex root) const;

    /// Evaluates on w; slopes come per rad/s of w.
    void evaluate(const RationalResponse& response, const std::vector<double>& w_rad_s,
                  std::vector<ResponseSample>& samples) const;
    ResponseSample at(const RationalResponse& response, double w_rad_s) const;

  private:
    double half_period_ = 0.0;
};

/// A function with roots in d = z - 1 as one in s' = (z - 1)/(z + 1): the unit circle becomes the
/// imaginary axis, its inside the left half plane.
RootForm on_bilinear_axis(const RootForm& delta_form);

} // namespace cornerwright
