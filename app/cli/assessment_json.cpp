#include "app/cli/assessment_json.h"

namespace cornerwright::cli {
namespace {

/// One loop's object while it grows: figures, and what is to be said about them.
class LoopJson {
  public:
    /// `unusable`: why no figure of the case could be computed; empty otherwise.
    explicit LoopJson(const std::string& unusable) : unusable_(unusable) {}

    void add(const char* key, const Figure& figure) {
        loop_[key] = to_json(figure);
        add_note(key, figure);
    }
    void add(const char* key, Json value) { loop_[key] = std::move(value); }
    void add_note(const char* key, const Figure& figure) {
        if (!figure.is_determined())
            add_note(key, figure.reason());
        else if (!figure.note().empty())
            notes_[key] = figure.note();
    }
    void add_note(const char* key, const std::string& reason) {
        notes_[key] = reason.empty() ? unusable_ : reason;
    }

    Json take(const std::vector<std::string>& remarks) {
        if (!notes_.empty())
            loop_["notes"] = std::move(notes_);
        if (!remarks.empty())
            loop_["remarks"] = remarks;
        return std::move(loop_);
    }

  private:
    const std::string& unusable_;
    Json loop_ = Json::object();
    Json notes_ = Json::object();
};

void add_stability(LoopJson& loop, const Stability& stability) {
    loop.add("stable", stability.stable ? Json(*stability.stable) : Json(nullptr));
    if (!stability.stable || !stability.reason.empty())
        loop.add_note("stable", stability.reason);
}

void add_frequency(LoopJson& loop, const FrequencyFigures& figures) {
    loop.add("phase_margin_deg", figures.phase_margin_deg);
    loop.add("phase_margin_at_rad_s", figures.phase_margin_at_rad_s);
    loop.add("gain_margin_db", figures.gain_margin_db);
    loop.add("gain_margin_at_rad_s", figures.gain_margin_at_rad_s);
    loop.add("gain_reduction_margin_db", figures.gain_reduction_margin_db);
    loop.add("delay_margin_s", figures.delay_margin_s);
    loop.add("crossovers_rad_s", Json(figures.crossovers_rad_s));
    loop.add("phase_crossings_rad_s", Json(figures.phase_crossings_rad_s));
    loop.add("sensitivity_peak_db", figures.sensitivity_peak_db);
    loop.add("sensitivity_peak_at_rad_s", figures.sensitivity_peak_at_rad_s);
    loop.add("complementary_peak_db", figures.complementary_peak_db);
    loop.add("complementary_peak_at_rad_s", figures.complementary_peak_at_rad_s);
    loop.add("control_effort_peak_db", figures.control_effort_peak_db);
    loop.add("bandwidth_rad_s", figures.bandwidth_rad_s);
}

void add_time(LoopJson& loop, const TimeFigures& figures, const SteadyStateErrors& errors) {
    loop.add("overshoot_percent", figures.overshoot_percent);
    loop.add("peak_time_s", figures.peak_time_s);
    loop.add("rise_time_s", figures.rise_time_s);
    loop.add("settling_time_s", figures.settling_time_s);
    loop.add("steady_state_error", Json{{"step", to_json(errors.step)},
                                        {"ramp", to_json(errors.ramp)},
                                        {"parabola", to_json(errors.parabola)}});
    for (const Figure* error : {&errors.step, &errors.ramp, &errors.parabola})
        if (!error->is_determined() || !error->note().empty()) {
            loop.add_note("steady_state_error", *error);
            break;
        }
    loop.add("control_peak", figures.control_peak);
    loop.add("disturbance_peak", figures.disturbance_peak);
}

void add_poles(LoopJson& loop, const LoopFigures& figures) {
    const char* key = figures.poles_in_z ? "closed_loop_poles_z" : "closed_loop_poles_rad_s";
    const bool known = !figures.closed_loop_poles.empty() || figures.closed_loop_poles_note.empty();
    loop.add(key, known ? to_json(figures.closed_loop_poles) : Json(nullptr));
    if (!figures.closed_loop_poles_note.empty())
        loop.add_note(key, figures.closed_loop_poles_note);
}

Json loop_json(const LoopFigures& figures, const std::string& unusable) {
    LoopJson loop(unusable);
    add_stability(loop, figures.stability);
    add_frequency(loop, figures.frequency);
    add_time(loop, figures.time, figures.steady_state_error);
    add_poles(loop, figures);
    return loop.take(figures.remarks);
}

Json case_json(const CaseAssessment& plant_case) {
    Json loops = {{"design", loop_json(plant_case.design.figures, plant_case.unusable)}};
    if (plant_case.realised)
        loops["realised"] = loop_json(plant_case.realised->figures, plant_case.unusable);
    Json json = {{"name", plant_case.name}};
    if (!plant_case.unusable.empty())
        json["unusable"] = plant_case.unusable;
    json["loops"] = std::move(loops);
    return json;
}

Json requirement_json(const RequirementResult& result) {
    const Judgement& worst = result.worst;
    return {{"measure", name_of(result.requirement.measure)},
            {"limit", result.limit},
            {"worst", to_json(worst.value)},
            {"case", worst.case_name},
            {"loop", name_of(worst.loop)},
            {"headroom", to_json(worst.headroom)},
            {"share", to_json(worst.share)},
            {"state", name_of(worst.state)},
            {"reason", worst.reason}};
}

} // namespace

Json to_json(const Assessment& assessment) {
    Json json = {{"cornerwright", 1},
                 {"title", assessment.title},
                 {"verdict", name_of(assessment.verdict.state)}};
    if (!assessment.realisation_problem.empty())
        json["realisation_problem"] = assessment.realisation_problem;
    json["cases"] = Json::array();
    for (const CaseAssessment& plant_case : assessment.cases)
        json["cases"].push_back(case_json(plant_case));
    json["requirements"] = Json::array();
    for (const RequirementResult& result : assessment.verdict.requirements)
        json["requirements"].push_back(requirement_json(result));
    return json;
}

} // namespace cornerwright::cli
