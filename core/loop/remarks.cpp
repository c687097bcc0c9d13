#include "core/loop/remarks.h"

#include "core/loop/decibel.h"
#include "core/numerics/number_text.h"

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;
constexpr int digits = 4;

void remark_conditional(const Stability& stability, const FrequencyFigures& figures,
                        std::vector<std::string>& remarks) {
    constexpr double low_reduction_db = 6.0;
    const Figure& margin = figures.gain_reduction_margin_db;
    if (stability.stable != true || !margin.is_value() || margin.value() >= low_reduction_db)
        return;
    remarks.push_back("Conditionally stable: " + number_text(margin.value(), digits) +
                      " dB less gain makes the loop unstable, and saturation lowers the gain.");
}

/// Index range of points whose magnitude stays above half the power of the peak at `top`, or
/// nothing where the curve does not fall that far on both sides within a fifth of the frequency.
std::size_t points_in_half_power_width(const std::vector<double>& w,
                                       const std::vector<double>& magnitude, std::size_t top) {
    constexpr double widest = 1.2; // wider than that is no light resonance
    const double level = magnitude[top] / std::numbers::sqrt2;
    std::size_t first = top;
    while (first > 0 && magnitude[first - 1] >= level)
        --first;
    std::size_t last = top;
    while (last + 1 < w.size() && magnitude[last + 1] >= level)
        ++last;
    if (first == 0 || last + 1 == w.size())
        return 0;
    if (w[top] / w[first] > widest || w[last] / w[top] > widest)
        return 0;
    return last - first + 1;
}

/// A maximum that stands out on both sides, so that neither a shoulder nor noise is meant.
bool is_resonance(const std::vector<double>& magnitude, std::size_t top) {
    constexpr double rise = 2.0; // 6 dB
    double left = magnitude[top];
    for (std::size_t i = top; i-- > 0 && magnitude[i] <= magnitude[top];)
        left = std::min(left, magnitude[i]);
    double right = magnitude[top];
    for (std::size_t i = top + 1; i < magnitude.size() && magnitude[i] <= magnitude[top]; ++i)
        right = std::min(right, magnitude[i]);
    return magnitude[top] >= rise * left && magnitude[top] >= rise * right;
}

void remark_resonances(const MeasuredResponse& measured, std::vector<std::string>& remarks) {
    constexpr std::size_t enough_points = 5;
    std::vector<double> magnitude;
    for (const Complex& value : measured.response)
        magnitude.push_back(std::abs(value));
    for (std::size_t i = 1; i + 1 < magnitude.size(); ++i) {
        if (magnitude[i] < magnitude[i - 1] || magnitude[i] <= magnitude[i + 1] ||
            !is_resonance(magnitude, i))
            continue;
        const std::size_t count = points_in_half_power_width(measured.w_rad_s, magnitude, i);
        if (count > 0 && count < enough_points)
            remarks.push_back("The resonance at " + number_text(measured.w_rad_s[i], digits) +
                              " rad/s has only " + std::to_string(count) +
                              (count == 1 ? " point" : " points") +
                              " in its half-power width: its height is not to be trusted.");
    }
}

void remark_phase_steps(const MeasuredResponse& measured, std::vector<std::string>& remarks) {
    constexpr double widest_step = 120.0 / deg_per_rad;
    std::size_t count = 0;
    double first_at = 0.0;
    for (std::size_t i = 0; i + 1 < measured.response.size(); ++i) {
        const double step = std::arg(measured.response[i + 1] / measured.response[i]);
        if (std::abs(step) <= widest_step)
            continue;
        if (count++ == 0)
            first_at = measured.w_rad_s[i];
    }
    if (count > 0)
        remarks.push_back("Neighbouring points differ by more than 120 deg of phase (" +
                          std::to_string(count) + (count == 1 ? " place" : " places") +
                          ", the first at " + number_text(first_at, digits) +
                          " rad/s): a whole turn may be hidden there.");
}

void remark_sign(const LoopCurve& curve, const MeasuredPlant& plant,
                 std::vector<std::string>& remarks) {
    constexpr double agreement = pi / 6.0;
    const CurvePoint& first = curve.points.front();
    const double expected =
        -0.5 * pi * plant.integrators + (plant.unstable_poles % 2 == 0 ? 0.0 : pi);
    const double rest = std::remainder(first.plant_phase_rad - expected, 2.0 * pi);
    if (std::abs(rest) > pi - agreement)
        remarks.push_back(
            "The plant's phase starts half a turn from what its declared integrators and unstable "
            "poles give: the sign of the measurement may be turned.");
}

} // namespace

std::vector<std::string> remarks_on(const LoopCurve& curve, const MeasuredPlant* plant,
                                    const Stability& stability, const FrequencyFigures& figures) {
    std::vector<std::string> remarks = curve.remarks;
    remark_conditional(stability, figures, remarks);
    if (!plant)
        return remarks;
    if (curve.realised)
        remarks.push_back("Aliasing is neglected: a measured plant behind a sampler is taken as "
                          "it was measured, up to pi/Ts.");
    remark_sign(curve, *plant, remarks);
    remark_resonances(*plant->response, remarks);
    remark_phase_steps(*plant->response, remarks);
    return remarks;
}

} // namespace cornerwright
