#include "core/handover/limited_step.h"

#include "core/engine/engine.h"
#include "core/loop/sampled_plant.h"
#include "core/numerics/number_text.h"
#include "core/realisation/bit_true_run.h"
#include "core/realisation/float_sections.h"
#include "core/realisation/linear_section.h"
#include "core/realisation/run_plan.h"
#include "core/realisation/second_order_pairs.h"

#include <algorithm>
#include <cmath>
#include <limits>

namespace cornerwright {
namespace {

constexpr double settling_band = 0.02;
constexpr std::size_t most_samples = 1000000;

/// The sampled plant as sections in z - 1, behind a line of whole samples of delay.
class RunningPlant {
  public:
    explicit RunningPlant(const SampledPlant& plant)
        : delay_line_(static_cast<std::size_t>(plant.whole_samples), 0.0) {
        Realisation in_delta_form;
        in_delta_form.structure = Structure::delta;
        std::vector<SectionCoefficients> exact;
        for (const SectionRoots& roots : second_order_pairs(plant.delta_form))
            exact.push_back(
                section_coefficients(roots, exact.empty() ? plant.delta_form.gain : 1.0));
        for (const DiscreteSection& section : float_sections(exact, in_delta_form))
            sections_.emplace_back(section, Structure::delta);
    }

    /// The output of this instant, which the input of this instant does not reach.
    double output() const {
        std::vector<LinearSection<double>> ahead = sections_;
        return through(ahead, 0.0);
    }

    void take(double input) {
        if (!delay_line_.empty()) {
            std::swap(input, delay_line_[place_]);
            place_ = (place_ + 1) % delay_line_.size();
        }
        through(sections_, input);
    }

  private:
    static double through(std::vector<LinearSection<double>>& sections, double signal) {
        for (LinearSection<double>& section : sections)
            signal = section.step(signal);
        return signal;
    }

    std::vector<LinearSection<double>> sections_;
    std::vector<double> delay_line_;
    std::size_t place_ = 0;
};

LimitedStep nothing(std::string why) {
    LimitedStep step;
    step.overshoot_percent = Figure::undetermined(why);
    step.settling_time_s = Figure::undetermined(why);
    step.note = std::move(why);
    return step;
}

void take_figures(LimitedStep& step, double final_value) {
    if (final_value == 0.0) {
        step.overshoot_percent = Figure::undetermined("the output ends at 0");
        step.settling_time_s = Figure::undetermined("the output ends at 0");
        return;
    }
    double highest = 0.0;
    std::size_t settled = 0; // the first sample from which on it stays inside
    for (std::size_t i = 0; i < step.y.size(); ++i) {
        const double share = step.y[i] / final_value;
        highest = std::max(highest, share);
        if (std::abs(share - 1.0) > settling_band)
            settled = i + 1;
    }
    step.overshoot_percent = Figure::of(100.0 * std::max(0.0, highest - 1.0));
    step.settling_time_s =
        settled < step.t_s.size() ? Figure::of(step.t_s[settled]) : Figure::infinite();
}

} // namespace

LimitedStep limited_step(const Project& project, const PlantCase& plant_case,
                         const DifferenceEquation& equation, double final_value, double until_s) {
    const std::optional<OutputLimits> limits = run_plan(equation).limits;
    if (!equation.realisation.output_limits || !limits)
        return nothing("no output limits are set");
    const std::optional<PlantModel> model = model_of(plant_case.source);
    if (!model)
        return nothing("no fit for this measured case");
    const double delay = project.sampling ? project.sampling->computation_delay_s : 0.0;
    const SampledPlant plant = sample_plant(*model, delay, equation.sample_period_s);
    if (plant.whole_samples == 0 && !plant.delta_form.is_strictly_proper())
        return nothing("the plant answers within the same instant");

    LimitedStep step;
    if (const auto* measured = std::get_if<MeasurementSource>(&plant_case.source))
        step.note = "from the fit, misfit " + number_text(measured->fit->misfit_db, 3) + " dB";
    const double wanted = std::ceil(until_s / equation.sample_period_s) + 1.0;
    const auto samples =
        static_cast<std::size_t>(std::clamp(wanted, 2.0, static_cast<double>(most_samples)));
    RunningPlant running(plant);
    BitTrueRun controller(equation);
    std::size_t at_limit = 0;
    for (std::size_t n = 0; n < samples; ++n) {
        const double y = running.output();
        const double u = controller.step(1.0 - y);
        running.take(u);
        step.t_s.push_back(static_cast<double>(n) * equation.sample_period_s);
        step.y.push_back(y);
        step.u.push_back(u);
        at_limit += u <= limits->at_least || u >= limits->at_most;
    }
    step.time_at_limit_s = static_cast<double>(at_limit) * equation.sample_period_s;
    take_figures(step, final_value);
    return step;
}

LimitedStep limited_step(const Project& project, const Assessment& assessment,
                         std::size_t case_index) {
    constexpr double longer_with_limit = 3.0;
    constexpr double samples_if_unknown = 1000.0;
    constexpr double most_shown = 20000.0; // samples: more than any screen or page has places for
    const double period = assessment.equation->sample_period_s;
    double final_value = 1.0;
    double until = samples_if_unknown * period;
    if (const auto& realised = assessment.cases[case_index].realised) {
        const Figure& error = realised->figures.steady_state_error.step;
        if (error.is_value())
            final_value = 1.0 - error.value();
        if (!realised->step.t_s.empty())
            until = longer_with_limit * realised->step.t_s.back();
    }
    return limited_step(project, project.plant_cases[case_index], *assessment.equation, final_value,
                        std::min(until, most_shown * period));
}

} // namespace cornerwright
