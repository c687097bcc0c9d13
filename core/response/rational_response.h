#pragma once

#include "core/numerics/root_form.h"

#include <span>
#include <vector>

namespace cornerwright {

/// A function at one point of the positive imaginary axis.
struct ResponseSample {
    Complex value;              ///< F(jw)
    double log_magnitude = 0.0; ///< ln|F|, right even where `value` has left the range of a double
    double phase_rad = 0.0;     ///< accumulated, continuous in w between axis roots
    Complex slope;              ///< d ln F / dw, 1/(rad/s): slope of ln|F| and of the phase
};

/// How F behaves towards an end of the axis: F ~ gain * s^-order.
struct Asymptote {
    int order = 0;
    double gain = 0.0;
};

/// A rational function made ready for many evaluations on s = jw. Every root contributes one real
/// or quadratic factor that is 1 at w = 0; angles are counted by the half plane in which the
/// running product stands, so that one arc tangent a point gives the exact accumulated phase.
/// The phase starts, for w -> 0, at -90 degrees times the number of integrators, and 180 lower
/// where lim s^n F is negative. Poles on the axis are passed on the right: the phase falls by 180
/// there; zeros on the axis raise it by 180.
class RationalResponse {
  public:
    RationalResponse() = default;
    explicit RationalResponse(const RootForm& form);

    /// One sample for each frequency (> 0); `samples` has the size of `w_rad_s`. The same bits come
    /// out whatever else is evaluated in the same call.
    void evaluate(std::span<const double> w_rad_s, std::span<ResponseSample> samples) const;
    ResponseSample at(double w_rad_s) const;

    Asymptote at_zero() const { return {order_at_zero_, gain_at_zero_}; }
    Asymptote at_infinity() const { return {order_at_infinity_, gain_at_infinity_}; }
    /// Frequencies of undamped pairs, where the response is 0 or infinite, ascending.
    const std::vector<double>& axis_rad_s() const { return axis_rad_s_; }

  private:
    struct Quadratic { ///< 1 + (real part of s^2/b) + ..., of the pair -a +- j im, b = a^2 + im^2
        double real_squared = 0.0;
        double imag = 0.0;
        double inverse_b = 0.0;
        double width = 0.0; ///< 2|a| / b
    };
    /// Factors on one side of one fraction bar, all with angles between 0 and 180 degrees.
    struct Group {
        std::vector<double> inverse_corners;
        std::vector<Quadratic> quadratics;
        bool empty() const { return inverse_corners.empty() && quadratics.empty(); }
        std::size_t order() const { return inverse_corners.size() + 2 * quadratics.size(); }
    };
    /// So few factors that their product stays within the range of a double.
    struct Chunk {
        Group zeros_left, zeros_right, poles_left, poles_right;
    };
    struct AxisPair {
        double imag = 0.0;
        bool is_pole = false;
    };
    struct Block;

    void take(Complex root, bool is_pole);
    Group& group_with_room(Group Chunk::*group);
    static void run(const Group& group, double slope_sign, double angle_sign, Block& block,
                    double* re, double* im, double* turns);
    void evaluate_block(std::span<const double> w_rad_s, std::span<ResponseSample> samples) const;

    std::vector<Chunk> chunks_;
    std::vector<AxisPair> axis_pairs_;
    std::vector<double> axis_rad_s_;
    int order_at_zero_ = 0;
    int order_at_infinity_ = 0;
    double gain_at_zero_ = 1.0;
    double gain_at_infinity_ = 1.0;
};

} // namespace cornerwright
