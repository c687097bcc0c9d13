#include "tests/core/engine/practice_project.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <memory>

namespace cornerwright::practice {
namespace {

double uniform(std::mt19937& random, double low, double high) {
    return std::uniform_real_distribution<>(low, high)(random);
}

std::size_t pick(std::mt19937& random, std::size_t count) {
    return std::uniform_int_distribution<std::size_t>(0, count - 1)(random);
}

PlantModel resonant_axis(double resonance_rad_s) {
    constexpr double damping = 0.03;
    const double imaginary = resonance_rad_s * std::sqrt(1.0 - damping * damping);
    PlantModel plant;
    plant.roots.poles = {0.0,
                         -9.0,
                         {-damping * resonance_rad_s, imaginary},
                         {-damping * resonance_rad_s, -imaginary}};
    plant.roots.gain = 400.0 * resonance_rad_s * resonance_rad_s;
    return plant;
}

PlantCase measured_case(const std::string& name, double resonance_rad_s, bool with_fit) {
    constexpr int points = 120;
    const PlantModel plant = resonant_axis(resonance_rad_s);
    auto response = std::make_shared<MeasuredResponse>();
    for (int i = 0; i < points; ++i) {
        const double w = 2.0 * std::pow(1000.0, static_cast<double>(i) / (points - 1));
        response->w_rad_s.push_back(w);
        response->response.push_back(evaluate(plant.roots, {0.0, w}));
        response->coherence.push_back(0.995);
    }
    response->averages = 16.0;
    MeasurementSource source;
    source.file = name + ".csv";
    source.integrators = 1;
    source.response = std::move(response);
    if (with_fit)
        source.fit = FittedModel{plant, 0.02};
    return {name, std::move(source)};
}

Section section(SectionKind kind) {
    Section result;
    result.kind = kind;
    result.corner_rad_s = kind == SectionKind::notch ? 310.0 : 900.0;
    result.zero_rad_s = 15.0;
    result.pole_rad_s = kind == SectionKind::lag ? 3.0 : 120.0;
    return result;
}

bool accepted(const Section& candidate) {
    try {
        check(candidate);
        return true;
    } catch (const std::exception&) {
        return false;
    }
}

void move_a_number(Project& project, std::mt19937& random) {
    Section& target = project.compensator[pick(random, project.compensator.size())];
    const auto parameters = parameters_of(target.kind);
    if (parameters.empty())
        return;
    Section moved = target;
    moved.*(parameters[pick(random, parameters.size())].value) *= uniform(random, 0.8, 1.25);
    if (accepted(moved))
        target = moved;
}

void add_or_drop_a_section(Project& project, std::mt19937& random) {
    constexpr std::size_t most_sections = 7;
    Chain& chain = project.compensator;
    const bool drop = chain.size() > 2 && (chain.size() >= most_sections || pick(random, 2) == 0);
    if (drop) {
        chain.erase(chain.begin() + static_cast<std::ptrdiff_t>(pick(random, chain.size())));
        return;
    }
    const auto kinds = all_section_kinds();
    chain.push_back(section(kinds[pick(random, kinds.size())]));
}

void change_a_requirement(Project& project, std::mt19937& random) {
    auto& requirements = project.requirements;
    Requirement& target = requirements[pick(random, requirements.size())];
    switch (pick(random, 4)) {
    case 0:
        std::swap(requirements.front(), target);
        break;
    case 1:
        target.up_to_rad_s *= uniform(random, 0.8, 1.25);
        target.from_rad_s *= uniform(random, 0.8, 1.25);
        break;
    case 2:
        target.band_percent = uniform(random, 1.0, 6.0);
        break;
    default:
        if (target.at_least)
            *target.at_least *= uniform(random, 0.8, 1.25);
        if (target.at_most)
            *target.at_most *= uniform(random, 0.8, 1.25);
    }
}

void change_the_clock(Project& project, std::mt19937& random) {
    switch (pick(random, 5)) {
    case 0:
        project.sampling->sample_period_s = uniform(random, 0.0003, 0.003);
        break;
    case 1:
        project.sampling->computation_delay_s = uniform(random, 0.0, 0.002);
        break;
    case 2:
        project.sampling->design_includes_hold = !project.sampling->design_includes_hold;
        break;
    case 3:
        if (project.realisation)
            project.realisation.reset();
        else
            project.realisation = Realisation{};
        break;
    default:
        constexpr std::array methods{Method::tustin, Method::tustin_at_corners,
                                     Method::matched_roots, Method::step_invariant};
        constexpr std::array structures{Structure::direct_form_1,
                                        Structure::direct_form_2_transposed, Structure::delta};
        if (!project.realisation)
            return;
        project.realisation->method = methods[pick(random, methods.size())];
        project.realisation->structure = structures[pick(random, structures.size())];
        project.realisation->number_format.type =
            pick(random, 2) == 0 ? NumberFormat::Type::float64 : NumberFormat::Type::float32;
    }
}

void change_a_case(Project& project, std::mt19937& random) {
    auto& cases = project.plant_cases;
    PlantCase& target = cases[pick(random, cases.size())];
    switch (pick(random, 4)) {
    case 0:
        std::swap(cases.front(), target);
        break;
    case 1:
        target.name += "'";
        break;
    case 2:
        if (auto* measurement = std::get_if<MeasurementSource>(&target.source)) {
            if (measurement->fit)
                measurement->fit.reset();
            else
                measurement->fit = FittedModel{resonant_axis(300.0), 0.02};
        }
        break;
    default:
        if (cases.size() > 3)
            cases.erase(cases.begin() + static_cast<std::ptrdiff_t>(pick(random, cases.size())));
        else
            cases.push_back(measured_case("unit " + std::to_string(pick(random, 1000)),
                                          uniform(random, 250.0, 400.0), pick(random, 2) == 0));
    }
}

void change_a_switch_or_word(Project& project, std::mt19937& random) {
    Section& target = project.compensator[pick(random, project.compensator.size())];
    switch (pick(random, 4)) {
    case 0:
        target.enabled = !target.enabled;
        break;
    case 1:
        target.locked = !target.locked;
        break;
    case 2:
        target.label += "a";
        break;
    default:
        project.title += "b";
    }
}

} // namespace

Project mixed_project() {
    Project project;
    project.title = "every kind of case";
    project.plant_cases = {
        measured_case("bare", 340.0, true), measured_case("loaded", 280.0, false),
        PlantCase{"by formula", FormulaSource{"3.2e6/(s*(s + 9)*(s + 90)) * exp(-0.0008*s)"}},
        PlantCase{"by roots", RootsSource{resonant_axis(310.0)}}};
    Section gain = section(SectionKind::gain);
    gain.gain = 0.9;
    project.compensator = {gain, section(SectionKind::pi), section(SectionKind::lead),
                           section(SectionKind::notch), section(SectionKind::complex_poles)};
    project.compensator[1].corner_rad_s = 1.5;
    project.sampling = Sampling{0.001, 0.0004, true};
    project.realisation = Realisation{};

    const auto at_least = [&](Measure measure, double limit) {
        project.requirements.push_back({.measure = measure, .at_least = limit, .at_most = {}});
    };
    const auto at_most = [&](Measure measure, double limit) {
        project.requirements.push_back({.measure = measure, .at_least = {}, .at_most = limit});
    };
    at_least(Measure::phase_margin, 40.0);
    at_least(Measure::gain_margin, 8.0);
    at_most(Measure::sensitivity_peak, 6.0);
    at_most(Measure::overshoot, 30.0);
    at_most(Measure::settling_time, 0.4);
    at_least(Measure::bandwidth, 20.0);
    at_most(Measure::steady_state_error, 0.1);
    project.requirements.back().input = ErrorInput::ramp;
    at_most(Measure::disturbance_peak, 3.0);
    at_least(Measure::disturbance_rejection, 10.0);
    project.requirements.back().up_to_rad_s = 3.0;
    at_least(Measure::roll_off, 20.0);
    project.requirements.back().from_rad_s = 900.0;
    return project;
}

Project edited(const Project& project, std::mt19937& random) {
    Project result = project;
    // Moves of a number are what a drag is made of, so they come most often.
    switch (std::min<std::size_t>(pick(random, 10), 6)) {
    case 0:
        add_or_drop_a_section(result, random);
        break;
    case 1:
        change_a_requirement(result, random);
        break;
    case 2:
        change_the_clock(result, random);
        break;
    case 3:
        change_a_case(result, random);
        break;
    case 4:
        change_a_switch_or_word(result, random);
        break;
    default:
        move_a_number(result, random);
    }
    return result;
}

} // namespace cornerwright::practice
