#include "core/loop/point_of_loop.h"

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

Complex product(Complex a, Complex b) {
    return {a.real() * b.real() - a.imag() * b.imag(), a.real() * b.imag() + a.imag() * b.real()};
}

/// d ln(sin x / x) / dx. Below the limit the series is exact to a double.
double sinc_slope(double x) {
    constexpr double series_below = 1e-3;
    return x < series_below ? -x / 3.0 * (1.0 + x * x / 15.0) : 1.0 / std::tan(x) - 1.0 / x;
}

} // namespace

CurvePoint point_of_loop(double w_rad_s, const ResponseSample& compensator,
                         const ResponseSample& plant) {
    CurvePoint point;
    point.w_rad_s = w_rad_s;
    point.compensator = compensator.value;
    point.plant = plant.value;
    point.loop = product(compensator.value, plant.value);
    point.compensator_log = compensator.log_magnitude;
    point.plant_log = plant.log_magnitude;
    point.plant_phase_rad = plant.phase_rad;
    point.loop_log = compensator.log_magnitude + plant.log_magnitude;
    point.loop_phase_rad = compensator.phase_rad + plant.phase_rad;
    point.compensator_slope = compensator.slope;
    point.slope_before = compensator.slope + plant.slope;
    point.slope_after = point.slope_before;
    const Complex difference = 1.0 + point.loop;
    constexpr double beyond_squares = 1e150;
    if (std::abs(point.loop.real()) + std::abs(point.loop.imag()) < beyond_squares) {
        const double scale = 1.0 / std::norm(difference);
        point.sensitivity = {difference.real() * scale, -difference.imag() * scale};
        point.complementary = product(point.loop, point.sensitivity);
    } else {
        point.sensitivity = 0.0;
        point.complementary = 1.0;
    }
    return point;
}

void HoldAndDelay::apply(double w_rad_s, ResponseSample& plant) const {
    const double lag = lag_s();
    if (lag == 0.0)
        return;
    const double angle = w_rad_s * lag;
    Complex factor{std::cos(angle), -std::sin(angle)};
    plant.phase_rad -= angle;
    plant.slope -= Complex(0.0, lag);
    if (hold_s > 0.0) {
        const double x = 0.5 * w_rad_s * hold_s;
        const double sinc = std::sin(x) / x;
        factor *= sinc;
        plant.log_magnitude += std::log(std::abs(sinc));
        plant.phase_rad -= std::numbers::pi * std::floor(x / std::numbers::pi);
        plant.slope += 0.5 * hold_s * sinc_slope(x);
    }
    plant.value = product(plant.value, factor);
}

} // namespace cornerwright
