#include "app/cli/assessment_json.h"
#include "app/cli/command.h"
#include "app/cli/text_table.h"
#include "core/engine/engine.h"

#include <algorithm>
#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    bool json = false;
};

std::string mark_of(State state) {
    switch (state) {
    case State::met:
        return "✓ met";
    case State::unmet:
        return "✗ unmet";
    case State::undetermined:
        break;
    }
    return "? undetermined";
}

/// "phase margin", "steady state error (ramp)"
std::string people_name(const Requirement& requirement) {
    std::string name(name_of(requirement.measure));
    std::replace(name.begin(), name.end(), '_', ' ');
    if (requirement.measure == Measure::steady_state_error)
        name += " (" + std::string(name_of(requirement.input)) + ")";
    return name;
}

/// Logarithmic headrooms have no unit that a person knows; they are told as a factor.
std::string headroom_text(const RequirementResult& result) {
    const MeasureUnit unit = unit_of(result.requirement.measure);
    if (unit == MeasureUnit::deg || unit == MeasureUnit::db)
        return people_text(result.worst.headroom, symbol_of(unit));
    return people_text(result.worst.headroom, "");
}

void print_requirements(const Verdict& verdict) {
    TextTable table({"", "requirement", "limit", "worst", "case", "loop", "headroom", ""});
    for (const RequirementResult& result : verdict.requirements)
        table.add({mark_of(result.worst.state), people_name(result.requirement), result.limit,
                   people_text(result.worst.value, symbol_of(unit_of(result.requirement.measure))),
                   result.worst.case_name, std::string(name_of(result.worst.loop)),
                   headroom_text(result), result.worst.reason});
    table.print(std::cout);
}

std::string stability_text(const Stability& stability) {
    if (!stability.stable)
        return "not determined";
    return *stability.stable ? "yes" : "no";
}

void print_figures(const std::vector<CaseAssessment>& cases) {
    TextTable table({"case", "loop", "stable", "phase margin", "gain margin", "gain reduction",
                     "delay margin", "S peak", "bandwidth", "overshoot", "settling"});
    const auto add = [&table](const std::string& name, const char* loop, const LoopFigures& all) {
        const FrequencyFigures& frequency = all.frequency;
        table.add({name, loop, stability_text(all.stability),
                   people_text(frequency.phase_margin_deg, "deg"),
                   people_text(frequency.gain_margin_db, "dB"),
                   people_text(frequency.gain_reduction_margin_db, "dB"),
                   people_text(frequency.delay_margin_s, "s"),
                   people_text(frequency.sensitivity_peak_db, "dB"),
                   people_text(frequency.bandwidth_rad_s, "rad/s"),
                   people_text(all.time.overshoot_percent, "%"),
                   people_text(all.time.settling_time_s, "s")});
    };
    for (const CaseAssessment& plant_case : cases) {
        add(plant_case.name, "design", plant_case.design.figures);
        if (plant_case.realised)
            add(plant_case.name, "realised", plant_case.realised->figures);
    }
    table.print(std::cout);
}

/// Why something is missing or doubtful, each sentence once.
void print_remarks(const Assessment& assessment) {
    std::vector<std::string> lines;
    const auto add = [&lines](const std::string& name, const std::string& sentence) {
        const std::string line = name + ": " + sentence;
        if (!sentence.empty() && std::find(lines.begin(), lines.end(), line) == lines.end())
            lines.push_back(line);
    };
    add("realisation", assessment.realisation_problem);
    for (const CaseAssessment& plant_case : assessment.cases) {
        add(plant_case.name, plant_case.unusable);
        const auto add_loop = [&](const LoopFigures& figures) {
            add(plant_case.name, figures.stability.reason);
            if (plant_case.unusable.empty() && !figures.time.overshoot_percent.is_determined())
                add(plant_case.name, figures.time.overshoot_percent.reason());
            for (const std::string& remark : figures.remarks)
                add(plant_case.name, remark);
        };
        add_loop(plant_case.design.figures);
        if (plant_case.realised)
            add_loop(plant_case.realised->figures);
    }
    for (const std::string& line : lines)
        std::cout << line << '\n';
}

void print_for_people(const Assessment& assessment) {
    const auto& requirements = assessment.verdict.requirements;
    const auto unmet =
        std::count_if(requirements.begin(), requirements.end(),
                      [](const auto& result) { return result.worst.state == State::unmet; });
    std::cout << assessment.title << '\n'
              << "verdict: " << name_of(assessment.verdict.state) << " (" << unmet << " of "
              << requirements.size() << " requirements unmet)\n\n";
    print_requirements(assessment.verdict);
    std::cout << '\n';
    print_figures(assessment.cases);
    std::cout << '\n';
    print_remarks(assessment);
}

int status_of(State verdict) {
    switch (verdict) {
    case State::met:
        return done;
    case State::unmet:
        return requirement_unmet;
    case State::undetermined:
        break;
    }
    return requirement_undetermined;
}

} // namespace

void add_assess(CLI::App& program, int& status) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "assess", "Judge every requirement on every plant case and loop. Exit status 0: all met; "
                  "1: something unmet; 2: nothing unmet but something undetermined");
    command->add_option("PROJECT", options->project, "project file")->required();
    command->add_flag("--json", options->json, "print JSON");
    command->callback([options, &status] {
        const Project project = load_telling_notices(options->project);
        Engine engine;
        const auto assessment = engine.assess(project);
        if (options->json)
            std::cout << to_json(*assessment).dump() << '\n';
        else
            print_for_people(*assessment);
        status = status_of(assessment->verdict.state);
    });
}

} // namespace cornerwright::cli
