#include "core/loop/loop_assessment.h"

#include "core/loop/closed_loop_poles.h"
#include "core/loop/frequency_figures.h"
#include "core/loop/sampled_plant.h"
#include "core/loop/step_response.h"

#include <type_traits>
#include <utility>

namespace cornerwright {
namespace {

TimeFigures undetermined_time(const FigureRequest& request, const std::string& reason) {
    const Figure none = Figure::undetermined(reason);
    TimeFigures figures{none, none, none, none, {}, none, none};
    figures.settling_times_s.assign(request.settling_bands_percent.size(), none);
    return figures;
}

SteadyStateErrors undetermined_errors(const std::string& reason) {
    const Figure none = Figure::undetermined(reason);
    return {none, none, none};
}

std::string reason_without_time(const Stability& stability) {
    if (!stability.stable)
        return "stability could not be determined: " + stability.reason;
    return "the loop is not stable";
}

template <typename Loop>
LoopAssessment assess_any(const Loop& loop, const FigureRequest& request) {
    const ClosedLoopPoles poles = closed_loop_poles(loop);
    FrequencyAssessment frequency = assess_frequency(loop, request, poles.poles);

    LoopAssessment result;
    result.figures.stability = frequency.stability;
    result.figures.frequency = std::move(frequency.figures);
    result.figures.closed_loop_poles = poles.poles;
    result.figures.closed_loop_poles_note = poles.note;
    result.figures.poles_in_z = std::is_same_v<Loop, RealisedLoop>;
    result.figures.remarks = std::move(frequency.remarks);
    result.curves = std::move(frequency.curves);

    if (frequency.stability.stable == true) {
        TimeAssessment time = assess_time(loop, request, poles.poles);
        result.figures.steady_state_error = std::move(frequency.steady_state_error);
        result.figures.time = std::move(time.figures);
        result.step = std::move(time.curves);
    } else {
        const std::string reason = reason_without_time(frequency.stability);
        result.figures.steady_state_error = undetermined_errors(reason);
        result.figures.time = undetermined_time(request, reason);
        result.step.note = reason;
    }
    return result;
}

} // namespace

LoopAssessment assess_loop(const DesignLoop& loop, const FigureRequest& request) {
    return assess_any(loop, request);
}

LoopAssessment assess_loop(const RealisedLoop& loop, const FigureRequest& request) {
    if (loop.sampled || !std::holds_alternative<PlantModel>(loop.plant))
        return assess_any(loop, request);
    RealisedLoop with_samples = loop;
    with_samples.sampled = sampled_plants_of(loop);
    return assess_any(with_samples, request);
}

LoopAssessment undetermined_loop(const FigureRequest& request, const std::string& reason) {
    const Figure none = Figure::undetermined(reason);
    LoopAssessment result;
    result.figures.stability.reason = reason;
    FrequencyFigures& f = result.figures.frequency;
    for (Figure* figure :
         {&f.phase_margin_deg, &f.phase_margin_at_rad_s, &f.gain_margin_db, &f.gain_margin_at_rad_s,
          &f.gain_reduction_margin_db, &f.gain_reduction_margin_at_rad_s, &f.delay_margin_s,
          &f.sensitivity_peak_db, &f.sensitivity_peak_at_rad_s, &f.complementary_peak_db,
          &f.complementary_peak_at_rad_s, &f.control_effort_peak_db,
          &f.control_effort_peak_at_rad_s, &f.bandwidth_rad_s})
        *figure = none;
    f.rejections_db.assign(request.rejection_up_to_rad_s.size(), none);
    f.rejections_at_rad_s = f.rejections_db;
    f.roll_offs_db.assign(request.roll_off_from_rad_s.size(), none);
    f.roll_offs_at_rad_s = f.roll_offs_db;
    result.figures.steady_state_error = undetermined_errors(reason);
    result.figures.time = undetermined_time(request, reason);
    result.step.note = reason;
    return result;
}

} // namespace cornerwright
