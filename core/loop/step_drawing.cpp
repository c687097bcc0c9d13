#include "core/loop/step_drawing.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

constexpr double fewest_points = 300.0;
constexpr double most_points = 2000.0;

/// A little beyond the time at which what is to be seen has settled.
double horizon(const StepSignals& signals) {
    const auto settled = [](const StepSignal& signal, double part) {
        return signal.settles() ? signal.last_outside(part * signal.size()) : 0.0;
    };
    const double y = settled(signals.y, 0.02);
    // The answer to a disturbance may take far longer: its beginning is what counts then.
    const double disturbance = settled(signals.y_disturbance, 0.05);
    const double longest = y > 0.0 ? std::max(y, std::min(disturbance, 4.0 * y))
                                   : std::max(disturbance, settled(signals.u, 0.02));
    constexpr double beyond = 1.3;
    return longest > 0.0 ? beyond * longest : 1.0;
}

/// The step that resolves every mode of the tail still to be seen at t.
double visible_step(const StepSignal& signal, double size, double t) {
    constexpr double resolved = 0.2; // rad or time constants
    constexpr double visible = 2e-3; // of the signal's size
    double step = HUGE_VAL;
    for (const Mode& mode : signal.tail.modes) {
        const double rate = std::abs(mode.rate);
        if (rate > 0.0 &&
            std::abs(mode.coefficients[0]) * std::exp(mode.rate.real() * t) > visible * size)
            step = std::min(step, resolved / rate);
    }
    return step;
}

/// The points of a signal up to `until`, thinned (jumps not kept) where there are too many.
std::vector<double> point_times(const JoinedPoints& points, double until) {
    const auto end = std::upper_bound(points.t_s.begin(), points.t_s.end(), until);
    std::vector<double> times(points.t_s.begin(), end);
    if (static_cast<double>(times.size()) <= most_points)
        return times;
    std::vector<double> thinned;
    for (const double t : times)
        if (thinned.empty() || t - thinned.back() >= until / most_points)
            thinned.push_back(t);
    return thinned;
}

double before(const StepSignal& signal, double t) {
    const std::vector<double>& times = signal.points.t_s;
    const auto at = std::lower_bound(times.begin(), times.end(), t);
    if (at == times.end() || *at != t)
        return signal.at(t);
    return signal.points.value[static_cast<std::size_t>(at - times.begin())];
}

} // namespace

std::vector<double> drawing_times(const StepSignals& signals) {
    const double until = horizon(signals);
    std::vector<double> times;
    for (const StepSignal* signal : {&signals.y, &signals.u}) {
        std::vector<double> merged;
        const std::vector<double> more = point_times(signal->points, until);
        std::set_union(times.begin(), times.end(), more.begin(), more.end(),
                       std::back_inserter(merged));
        times = std::move(merged);
    }
    const double y_size = signals.y.size();
    const double u_size = signals.u.size();
    const double disturbance_size = signals.y_disturbance.size();
    double t = times.empty() ? 0.0 : times.back();
    if (times.empty())
        times.push_back(t);
    while (t < until) {
        const double step =
            std::min({visible_step(signals.y, y_size, t), visible_step(signals.u, u_size, t),
                      visible_step(signals.y_disturbance, disturbance_size, t)});
        t += std::clamp(step, until / most_points, until / fewest_points);
        times.push_back(std::min(t, until));
    }
    return times;
}

StepCurves curves_at(const StepSignals& signals, std::vector<double> times) {
    StepCurves curves;
    curves.t_s = std::move(times);
    for (std::size_t i = 0; i < curves.t_s.size(); ++i) {
        const double t = curves.t_s[i];
        const bool jump_ahead = i + 1 < curves.t_s.size() && curves.t_s[i + 1] == t;
        const auto value = [&](const StepSignal& signal) {
            return jump_ahead ? before(signal, t) : signal.at(t);
        };
        curves.y.push_back(value(signals.y));
        curves.u.push_back(value(signals.u));
        curves.y_disturbance.push_back(value(signals.y_disturbance));
    }
    return curves;
}

std::vector<double> even_times(double until_s, int points) {
    std::vector<double> times;
    for (int i = 0; i < points; ++i)
        times.push_back(points == 1 ? until_s : until_s * i / (points - 1));
    return times;
}

} // namespace cornerwright
