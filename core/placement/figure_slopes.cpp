#include "core/placement/figure_slopes.h"

#include "core/loop/frequency_figures.h"

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double degrees = 180.0 / std::numbers::pi;
constexpr double decibels = 20.0 / std::numbers::ln10;

/// The loop where a figure is measured.
struct Here {
    double w = 0.0;
    LoopPoint point;
    Complex along;              ///< d ln L / dw
    bool stands_still = false;  ///< the place does not move with the parameters
    ComplexVector by_parameter; ///< d ln C / d ln(parameter)
};

constexpr double difference_step = 1e-5;

/// pi/Ts, where a phase crossing stands still: L is real there whatever C is.
bool is_at_half_rate(const std::variant<DesignLoop, RealisedLoop>& loop, double w) {
    const auto* realised = std::get_if<RealisedLoop>(&loop);
    return realised && w * (1.0 + 2.0 * difference_step) >
                           std::numbers::pi / realised->compensator.sample_period_s;
}

bool is_measured(const std::variant<DesignLoop, RealisedLoop>& loop) {
    return std::visit([](const auto& l) { return std::holds_alternative<MeasuredPlant>(l.plant); },
                      loop);
}

Here look_at(const PlacementLoop& loop, double w, const CompensatorSlopes& slopes, bool along) {
    Here here;
    here.w = w;
    here.stands_still = is_at_half_rate(loop.loop, w);
    along = along && !here.stands_still;
    constexpr double step = difference_step;
    std::vector<double> places{w};
    if (along)
        places.insert(places.end(), {w * (1.0 - step), w * (1.0 + step)});
    // All in one call: the loop's curve is made for each.
    const auto points =
        std::visit([&](const auto& l) { return loop_points(l, places); }, loop.loop);
    here.point = points.front();
    // Central differences: a relative error near 1e-9 on smooth curves.
    if (along)
        here.along = std::log(points[2].loop / points[1].loop) / (2.0 * step * w);
    here.by_parameter = loop.name == LoopName::design ? slopes.design(w) : slopes.realised(w);
    return here;
}

/// A figure as a function of the moving crossing: its slope by parameter from that of ln L.
template <typename Slope>
std::vector<double> each(const Here& here, Slope slope) {
    std::vector<double> result;
    for (const Complex& by : here.by_parameter)
        result.push_back(slope(by));
    return result;
}

double crossover_shift(const Here& here, Complex by) {
    return -by.real() / here.along.real();
}

std::vector<double> phase_margin_slopes(const Here& here) {
    return each(here, [&](Complex by) {
        return degrees * (by.imag() + here.along.imag() * crossover_shift(here, by));
    });
}

std::vector<double> delay_margin_slopes(const Here& here, double delay) {
    return each(here, [&](Complex by) {
        const double shift = crossover_shift(here, by);
        const double phase = by.imag() + here.along.imag() * shift;
        return (phase - delay * shift) / here.w;
    });
}

/// d ln|L| at the phase crossing, which moves so that the phase stays.
std::vector<double> crossing_size_slopes(const Here& here, double scale) {
    return each(here, [&](Complex by) {
        const double shift = here.stands_still ? 0.0 : -by.imag() / here.along.imag();
        return scale * (by.real() + here.along.real() * shift);
    });
}

std::vector<double> bandwidth_slopes(const PlacementLoop& loop, const Here& here,
                                     const CompensatorSlopes& slopes) {
    // T(0) moves too unless an integrator holds it at 1; seen far below the bandwidth. Of a
    // measured loop a bandwidth is only determined where one does.
    constexpr double far_below = 1e-6;
    const bool held = is_measured(loop.loop);
    const Here low = held ? Here{} : look_at(loop, here.w * far_below, slopes, false);
    const double along = (here.point.sensitivity * here.along).real();
    std::vector<double> result;
    for (std::size_t i = 0; i < here.by_parameter.size(); ++i) {
        const double at_band = (here.point.sensitivity * here.by_parameter[i]).real();
        const double at_zero = held ? 0.0 : (low.point.sensitivity * low.by_parameter[i]).real();
        result.push_back(-(at_band - at_zero) / along);
    }
    return result;
}

/// The crossover whose lag to -180 deg is used up by the shortest delay.
Figure delay_margin_place(const PlacementLoop& loop) {
    const FrequencyFigures& figures = loop.assessment.figures.frequency;
    if (!figures.delay_margin_s.is_value())
        return {};
    const auto points = std::visit(
        [&](const auto& l) { return loop_points(l, figures.crossovers_rad_s); }, loop.loop);
    Figure place;
    double nearest = HUGE_VAL;
    for (const LoopPoint& point : points) {
        double lag = std::arg(-point.loop);
        if (lag <= 0.0)
            lag += 2.0 * std::numbers::pi;
        const double away = std::abs(lag / point.w_rad_s - figures.delay_margin_s.value());
        if (away < nearest) {
            nearest = away;
            place = Figure::of(point.w_rad_s);
        }
    }
    return place;
}

} // namespace

std::optional<std::vector<double>> figure_slopes(const PlacementLoop& loop, Measure measure,
                                                 const Figure& judged_at_rad_s,
                                                 const CompensatorSlopes& slopes) {
    const Figure at_rad_s =
        measure == Measure::delay_margin ? delay_margin_place(loop) : judged_at_rad_s;
    if (!at_rad_s.is_value() || at_rad_s.value() <= 0.0)
        return {};
    const FrequencyFigures& figures = loop.assessment.figures.frequency;
    const auto here = [&](bool along) { return look_at(loop, at_rad_s.value(), slopes, along); };
    switch (measure) {
    case Measure::phase_margin:
        return phase_margin_slopes(here(true));
    case Measure::delay_margin:
        return delay_margin_slopes(here(true), figures.delay_margin_s.value());
    case Measure::gain_margin:
        return crossing_size_slopes(here(true), -decibels);
    case Measure::gain_reduction_margin:
        return crossing_size_slopes(here(true), decibels);
    case Measure::bandwidth:
        return bandwidth_slopes(loop, here(true), slopes);
    case Measure::sensitivity_peak:
    case Measure::disturbance_rejection: {
        const Here at = here(false);
        return each(at,
                    [&](Complex by) { return -decibels * (at.point.complementary * by).real(); });
    }
    case Measure::complementary_peak:
    case Measure::roll_off:
    case Measure::control_effort_peak: {
        // d ln T = S d ln L; d ln(C S) = (1 - T) d ln C: the same, as only C moves.
        const Here at = here(false);
        return each(at, [&](Complex by) { return decibels * (at.point.sensitivity * by).real(); });
    }
    case Measure::overshoot:
    case Measure::peak_time:
    case Measure::rise_time:
    case Measure::settling_time:
    case Measure::steady_state_error:
    case Measure::control_peak:
    case Measure::disturbance_peak:
        break;
    }
    return {};
}

} // namespace cornerwright
