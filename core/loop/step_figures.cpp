#include "core/loop/step_figures.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

// Of the final value: a smaller overshoot is the rounding of the propagation.
constexpr double overshoot_noise = 2e-8;
// Of the size of the signal: a smaller final value is zero.
constexpr double final_noise = 1e-10;

void settle_overshoot(TimeFigures& figures, const StepSignal& y, double final_value) {
    const double sign = final_value < 0.0 ? -1.0 : 1.0;
    const StepSignal::Extreme top = y.largest(sign);
    const double excess = top.value / std::abs(final_value) - 1.0;
    if (excess <= overshoot_noise || !std::isfinite(top.t)) {
        figures.overshoot_percent = Figure::of(0.0);
        figures.peak_time_s = Figure::undetermined("there is no overshoot");
        return;
    }
    figures.overshoot_percent = Figure::of(100.0 * excess);
    figures.peak_time_s = Figure::of(top.t);
}

Figure rise_time(const StepSignal& y, double final_value) {
    const double sign = final_value < 0.0 ? -1.0 : 1.0;
    const std::optional<double> low = y.first_reaching(0.1 * std::abs(final_value), sign);
    const std::optional<double> high = y.first_reaching(0.9 * std::abs(final_value), sign);
    if (!low || !high)
        return Figure::undetermined("the step response does not reach 90 % of its final value");
    return Figure::of(*high - *low);
}

Figure settling_time(const StepSignal& y, double final_value, double band_percent) {
    if (!(band_percent > 0.0))
        return Figure::undetermined("a band of 0 % is never settled in");
    return Figure::of(y.last_outside(0.01 * band_percent * std::abs(final_value)));
}

Figure peak(const StepSignal& signal) {
    if (!signal.settles())
        return Figure::undetermined("the signal does not settle");
    return Figure::of(std::max(signal.largest(1.0).value, signal.largest(-1.0).value));
}

} // namespace

TimeFigures no_time_figures(const FigureRequest& request, const std::string& reason) {
    const Figure none = Figure::undetermined(reason);
    TimeFigures figures{none, none, none, none, {}, none, none};
    figures.settling_times_s.assign(request.settling_bands_percent.size(), none);
    return figures;
}

TimeFigures time_figures(const StepSignals& signals, const FigureRequest& request) {
    const StepSignal& y = signals.y;
    const double final_value = y.final_value();
    constexpr double default_band_percent = 2.0;

    TimeFigures figures;
    if (!y.settles()) {
        figures = no_time_figures(request, "the step response does not settle");
    } else if (std::abs(final_value) <= final_noise * y.size()) {
        figures = no_time_figures(request, "the step response settles to 0");
    } else {
        settle_overshoot(figures, y, final_value);
        figures.rise_time_s = rise_time(y, final_value);
        figures.settling_time_s = settling_time(y, final_value, default_band_percent);
        for (const double band : request.settling_bands_percent)
            figures.settling_times_s.push_back(settling_time(y, final_value, band));
    }
    figures.control_peak = signals.control_has_impulse ? Figure::infinite() : peak(signals.u);
    figures.disturbance_peak = peak(signals.y_disturbance);
    return figures;
}

TimeFigures with_note(TimeFigures figures, const std::string& note) {
    const auto remark = [&note](Figure& figure) {
        if (figure.is_determined())
            figure = figure.with_note(note);
    };
    for (Figure* figure :
         {&figures.overshoot_percent, &figures.peak_time_s, &figures.rise_time_s,
          &figures.settling_time_s, &figures.control_peak, &figures.disturbance_peak})
        remark(*figure);
    for (Figure& figure : figures.settling_times_s)
        remark(figure);
    return figures;
}

} // namespace cornerwright
