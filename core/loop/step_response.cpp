#include "core/loop/step_response.h"

#include "core/loop/closed_loop_poles.h"
#include "core/loop/delayed_step.h"
#include "core/loop/rational_step.h"
#include "core/loop/sampled_step.h"
#include "core/loop/step_drawing.h"
#include "core/numerics/number_text.h"

namespace cornerwright {
namespace {

constexpr const char* no_fit = "no fit for this measured case";

/// The model that stands for the plant in time, and what is to be said of it.
struct TimePlant {
    const PlantModel* model = nullptr; ///< null: a measurement without a fit
    std::string note;
};

TimePlant time_plant(const LoopPlant& plant) {
    if (const auto* model = std::get_if<PlantModel>(&plant))
        return {model, {}};
    const auto& fit = std::get<MeasuredPlant>(plant).fit;
    if (!fit)
        return {};
    constexpr int digits = 2;
    return {&fit->model, "from the fit, misfit " + number_text(fit->misfit_db, digits) + " dB"};
}

TimeAssessment without(const FigureRequest& request, const std::string& reason) {
    TimeAssessment result{no_time_figures(request, reason), {}};
    result.curves.note = reason;
    return result;
}

TimeAssessment assessed(const StepSignals& signals, const FigureRequest& request,
                        const std::string& note) {
    TimeAssessment result{time_figures(signals, request),
                          curves_at(signals, drawing_times(signals))};
    if (!note.empty()) {
        result.figures = with_note(std::move(result.figures), note);
        result.curves.note = note;
    }
    return result;
}

/// The hold counts as a delay of half its period, standing where the computation delay does.
DelayedLoop delayed(const DesignLoop& loop, const PlantModel& plant) {
    return {loop.compensator, plant.roots, plant.dead_time_s,
            loop.computation_delay_s + 0.5 * loop.hold_period_s};
}

constexpr const char* no_history =
    "the response behind the dead time could not be followed until it settles";

/// The loop itself, or of a measured plant the one through its fit.
RealisedLoop modelled(const RealisedLoop& loop, const PlantModel& plant) {
    if (std::holds_alternative<PlantModel>(loop.plant))
        return loop;
    return {loop.compensator, plant, loop.computation_delay_s};
}

/// `loop` of a model plant. Without poles its own serve.
std::optional<StepSignals> signals_of(RealisedLoop loop, const ComplexVector& poles_z,
                                      double until_s = 0.0) {
    loop.sampled = sampled_plants_of(loop);
    const SampledLoop sampled{roots_in_z_minus_1(loop.compensator),
                              std::get<PlantModel>(loop.plant), loop.computation_delay_s,
                              loop.compensator.sample_period_s, loop.sampled};
    return sampled_step(sampled, poles_z.empty() ? closed_loop_poles(loop).poles : poles_z,
                        until_s);
}

constexpr const char* no_samples = "the sampled response could not be followed until it settles";

} // namespace

TimeAssessment assess_time(const DesignLoop& loop, const FigureRequest& request,
                           const ComplexVector& closed_loop_poles) {
    const TimePlant plant = time_plant(loop.plant);
    if (plant.model == nullptr)
        return without(request, no_fit);
    const DelayedLoop with_delay = delayed(loop, *plant.model);
    if (with_delay.delay_s() == 0.0)
        return assessed(rational_step(loop.compensator, plant.model->roots, closed_loop_poles),
                        request, plant.note);
    const std::optional<StepSignals> signals = delayed_step(with_delay);
    return signals ? assessed(*signals, request, plant.note) : without(request, no_history);
}

StepCurves step_curves(const DesignLoop& loop, double until_s, int points) {
    const TimePlant plant = time_plant(loop.plant);
    if (plant.model == nullptr)
        return {{}, {}, {}, {}, no_fit};
    const DelayedLoop with_delay = delayed(loop, *plant.model);
    const std::optional<StepSignals> signals =
        with_delay.delay_s() == 0.0
            ? rational_step(loop.compensator, plant.model->roots, closed_loop_poles(loop).poles)
            : delayed_step(with_delay, {until_s});
    if (!signals)
        return {{}, {}, {}, {}, no_history};
    StepCurves curves = curves_at(*signals, even_times(until_s, points));
    curves.note = plant.note;
    return curves;
}

TimeAssessment assess_time(const RealisedLoop& loop, const FigureRequest& request,
                           const ComplexVector& closed_loop_poles_z) {
    const TimePlant plant = time_plant(loop.plant);
    if (plant.model == nullptr)
        return without(request, no_fit);
    const std::optional<StepSignals> signals =
        signals_of(modelled(loop, *plant.model), closed_loop_poles_z);
    return signals ? assessed(*signals, request, plant.note) : without(request, no_samples);
}

StepCurves step_curves(const RealisedLoop& loop, double until_s, int points) {
    const TimePlant plant = time_plant(loop.plant);
    if (plant.model == nullptr)
        return {{}, {}, {}, {}, no_fit};
    const std::optional<StepSignals> signals =
        signals_of(modelled(loop, *plant.model), {}, until_s);
    if (!signals)
        return {{}, {}, {}, {}, no_samples};
    StepCurves curves = curves_at(*signals, even_times(until_s, points));
    curves.note = plant.note;
    return curves;
}

} // namespace cornerwright
