#include "sample_content.h"

#include "core/engine/engine.h"

namespace cornerwright::sample {

namespace {

PlantCase load(const std::string& name, double resonance, double gain) {
    // gain / (s (s/31 + 1)) and a lightly damped pair of poles over a pair of zeros below it.
    PlantModel model;
    const double zero = 0.82 * resonance;
    model.roots.zeros = {{-0.02 * zero, zero}, {-0.02 * zero, -zero}};
    model.roots.poles = {
        {0.0, 0.0}, {-31.0, 0.0}, {-0.02 * resonance, resonance}, {-0.02 * resonance, -resonance}};
    model.roots.gain = gain * 31.0 * resonance * resonance / (zero * zero);
    model.dead_time_s = 0.0004;
    return {name, RootsSource{model}};
}

} // namespace

Project servoProject() {
    Project project;
    project.title = "Servo";
    project.plant_cases = {load("light", 720.0, 2.4), load("middle", 600.0, 2.0),
                           load("heavy", 480.0, 1.6)};
    Section gain;
    gain.kind = SectionKind::gain;
    gain.gain = 22.0;
    Section pi;
    pi.kind = SectionKind::pi;
    pi.corner_rad_s = 4.0;
    Section lead;
    lead.kind = SectionKind::lead;
    lead.zero_rad_s = 38.0;
    lead.pole_rad_s = 330.0;
    Section notch;
    notch.kind = SectionKind::notch;
    notch.corner_rad_s = 600.0;
    notch.zero_damping = 0.12;
    notch.pole_damping = 0.7;
    Section low_pass;
    low_pass.kind = SectionKind::real_pole;
    low_pass.pole_rad_s = 1900.0;
    project.compensator = {gain, pi, lead, notch, low_pass};
    project.sampling = Sampling{0.0005, 0.00025, true};
    project.realisation = Realisation{
        Method::tustin_at_corners, 0.0, Structure::direct_form_2_transposed, NumberFormat{}, {}};
    const auto require = [&](Measure measure, std::optional<double> least,
                             std::optional<double> most) {
        Requirement requirement;
        requirement.measure = measure;
        requirement.at_least = least;
        requirement.at_most = most;
        project.requirements.push_back(requirement);
        return &project.requirements.back();
    };
    require(Measure::phase_margin, 45.0, std::nullopt);
    require(Measure::gain_margin, 8.0, std::nullopt);
    require(Measure::sensitivity_peak, std::nullopt, 6.0);
    require(Measure::overshoot, std::nullopt, 25.0);
    require(Measure::settling_time, std::nullopt, 0.2);
    require(Measure::disturbance_rejection, std::nullopt, -20.0)->up_to_rad_s = 6.0;
    require(Measure::roll_off, std::nullopt, -20.0)->from_rad_s = 2500.0;
    require(Measure::control_effort_peak, std::nullopt, 45.0);
    return project;
}

PaneContent contentOf(const Project& project) {
    Engine engine;
    PaneContent content;
    content.project = std::make_shared<const Project>(project);
    content.assessment = engine.assess(project);
    content.locus = engine.locus(project, 0);
    return content;
}

} // namespace cornerwright::sample
