#include "core/requirements/judged_figure.h"

#include <algorithm>

namespace cornerwright {
namespace {

JudgedFigure without_place(Figure value) {
    return {std::move(value), Figure::undetermined("not measured on the frequency axis")};
}

/// The entry of `figures` that was made for `wanted`.
Figure requested(const std::vector<double>& asked, const std::vector<Figure>& figures,
                 double wanted) {
    const auto found = std::find(asked.begin(), asked.end(), wanted);
    const auto index = static_cast<std::size_t>(found - asked.begin());
    if (found == asked.end() || index >= figures.size())
        return Figure::undetermined("it was not computed");
    return figures[index];
}

Figure settling_time(const Requirement& requirement, const FigureRequest& request,
                     const TimeFigures& time) {
    if (requirement.band_percent == always_computed_band_percent)
        return time.settling_time_s;
    return requested(request.settling_bands_percent, time.settling_times_s,
                     requirement.band_percent);
}

Figure steady_state_error(ErrorInput input, const SteadyStateErrors& errors) {
    switch (input) {
    case ErrorInput::ramp:
        return errors.ramp;
    case ErrorInput::parabola:
        return errors.parabola;
    case ErrorInput::step:
        break;
    }
    return errors.step;
}

} // namespace

JudgedFigure judged_figure(const Requirement& requirement, const FigureRequest& request,
                           const LoopFigures& figures) {
    const FrequencyFigures& f = figures.frequency;
    const TimeFigures& t = figures.time;
    switch (requirement.measure) {
    case Measure::phase_margin:
        return {f.phase_margin_deg, f.phase_margin_at_rad_s};
    case Measure::gain_margin:
        return {f.gain_margin_db, f.gain_margin_at_rad_s};
    case Measure::gain_reduction_margin:
        return {f.gain_reduction_margin_db, f.gain_reduction_margin_at_rad_s};
    case Measure::delay_margin:
        return without_place(f.delay_margin_s);
    case Measure::sensitivity_peak:
        return {f.sensitivity_peak_db, f.sensitivity_peak_at_rad_s};
    case Measure::complementary_peak:
        return {f.complementary_peak_db, f.complementary_peak_at_rad_s};
    case Measure::control_effort_peak:
        return {f.control_effort_peak_db, f.control_effort_peak_at_rad_s};
    case Measure::bandwidth:
        return {f.bandwidth_rad_s, f.bandwidth_rad_s};
    case Measure::disturbance_rejection:
        return {requested(request.rejection_up_to_rad_s, f.rejections_db, requirement.up_to_rad_s),
                requested(request.rejection_up_to_rad_s, f.rejections_at_rad_s,
                          requirement.up_to_rad_s)};
    case Measure::roll_off:
        return {
            requested(request.roll_off_from_rad_s, f.roll_offs_db, requirement.from_rad_s),
            requested(request.roll_off_from_rad_s, f.roll_offs_at_rad_s, requirement.from_rad_s)};
    case Measure::overshoot:
        return without_place(t.overshoot_percent);
    case Measure::peak_time:
        return without_place(t.peak_time_s);
    case Measure::rise_time:
        return without_place(t.rise_time_s);
    case Measure::settling_time:
        return without_place(settling_time(requirement, request, t));
    case Measure::steady_state_error:
        return without_place(steady_state_error(requirement.input, figures.steady_state_error));
    case Measure::control_peak:
        return without_place(t.control_peak);
    case Measure::disturbance_peak:
        return without_place(t.disturbance_peak);
    }
    return without_place(Figure::undetermined("unknown measure"));
}

} // namespace cornerwright
