#include "app/cli/command.h"
#include "app/cli/json.h"
#include "app/cli/text_table.h"
#include "app/cli/written_project.h"
#include "core/engine/kept_sample.h"
#include "core/engine/placement_problem.h"
#include "core/numerics/number_text.h"
#include "core/placement/tolerance.h"

#include <filesystem>
#include <iostream>
#include <map>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string keep;
    ToleranceOptions run;
    bool json = false;
};

std::string percent_text(double part) {
    return number_text(100.0 * part, 4) + " %";
}

Json merit_json(double merit) {
    return to_json(Figure::of(merit));
}

Json to_json(const Project& project, const PlacementProblem& problem,
             const ToleranceResult& result) {
    Json requirements = Json::array();
    for (std::size_t i = 0; i < result.requirements.size(); ++i) {
        const ToleranceRequirement& requirement = result.requirements[i];
        Json entry = {{"measure", name_of(project.requirements[i].measure)},
                      {"limit", limit_text(project.requirements[i])},
                      {"met", requirement.met},
                      {"unmet", requirement.unmet},
                      {"undetermined", requirement.undetermined}};
        entry["smallest_share"] =
            requirement.smallest_share ? merit_json(*requirement.smallest_share) : Json();
        requirements.push_back(std::move(entry));
    }
    Json merits = Json::array();
    for (const double merit : result.merits)
        merits.push_back(merit_json(merit));
    Json json = {{"cornerwright", 1},
                 {"title", project.title},
                 {"samples", result.samples()},
                 {"met", result.met},
                 {"unmet", result.unmet},
                 {"undetermined", result.undetermined},
                 {"yield", result.yield()},
                 {"yield_limits_95", result.yield_limits()},
                 {"requirements", std::move(requirements)},
                 {"smallest_shares", std::move(merits)}};
    if (result.worst) {
        const WorstSample& worst = *result.worst;
        json["worst"] = {{"sample", worst.number},
                         {"smallest_share", merit_json(worst.merit)},
                         {"case", problem.plants[worst.plant].name},
                         {"loop", name_of(worst.loop)},
                         {"measure", name_of(project.requirements[worst.requirement].measure)}};
    }
    return json;
}

void print_for_people(const Project& project, const PlacementProblem& problem,
                      const ToleranceResult& result) {
    const auto limits = result.yield_limits();
    std::cout << project.title << '\n'
              << "yield: " << percent_text(result.yield()) << " (" << result.met << " of "
              << result.samples() << " samples met, " << result.unmet << " unmet, "
              << result.undetermined << " undetermined; " << percent_text(limits[0]) << " to "
              << percent_text(limits[1]) << " with 95 % confidence)\n\n";
    TextTable table(
        {"requirement", "limit", "met", "unmet", "undetermined", "smallest share of headroom"});
    for (std::size_t i = 0; i < result.requirements.size(); ++i) {
        const ToleranceRequirement& requirement = result.requirements[i];
        table.add({std::string(name_of(project.requirements[i].measure)),
                   limit_text(project.requirements[i]), std::to_string(requirement.met),
                   std::to_string(requirement.unmet), std::to_string(requirement.undetermined),
                   requirement.smallest_share
                       ? people_text(Figure::of(*requirement.smallest_share), "")
                       : "not determined"});
    }
    table.print(std::cout);
    if (!result.worst)
        return;
    const WorstSample& worst = *result.worst;
    std::cout << "\nworst: sample " << worst.number << ", " << problem.plants[worst.plant].name
              << ", " << name_of(worst.loop) << ", ";
    if (worst.merit <= unstable_merit)
        std::cout << "not stable\n";
    else
        std::cout << name_of(project.requirements[worst.requirement].measure) << ", share "
                  << number_text(worst.merit, 4) << '\n';
}

void keep_worst(const Options& options, Project project, const PlacementProblem& problem,
                const ToleranceResult& result) {
    if (!result.worst)
        throw UsageError("--keep-worst: no sample could be judged");
    const WorstSample& worst = *result.worst;
    // A measured sample is written beside the project that names it.
    const auto folder = std::filesystem::absolute(options.keep).parent_path();
    PlantCase kept = kept_case(project, worst.as_plant,
                               "worst sample of " + problem.plants[worst.plant].name, folder);
    if (auto* measurement = std::get_if<MeasurementSource>(&kept.source)) {
        const auto origin = std::filesystem::absolute(options.project).parent_path();
        measurement->file =
            (folder / measurement->file).lexically_relative(origin).generic_string();
    }
    project.plant_cases.push_back(std::move(kept));
    write_project(std::move(project), options.project, options.keep);
}

void run(const Options& options) {
    const Project project = load_telling_notices(options.project);
    const PlacementProblem problem = placement_problem_of(project);
    const ToleranceResult result = tolerance(problem, options.run);
    if (!options.keep.empty())
        keep_worst(options, project, problem, result);
    if (options.json)
        std::cout << to_json(project, problem, result).dump() << '\n';
    else
        print_for_people(project, problem, result);
}

} // namespace

void add_tolerance(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "tolerance", "Judge seeded samples of plants and component values inside stated spreads: "
                     "yield, and the worst sample kept as a plant case. Spreads in per cent of "
                     "each value; a measured plant's frequency axis stretches as a whole");
    Spreads& spreads = options->run.spreads;
    command->add_option("PROJECT", options->project, "project file")->required();
    const auto add_spread = [command](const char* name, double& percent, const char* what) {
        command->add_option(name, percent, what)->check(CLI::Range(0.0, 99.9));
    };
    add_spread("--plant-gain", spreads.plant_gain_percent, "of each plant's gain");
    add_spread("--plant-corners", spreads.plant_corner_percent,
               "of each plant root's or pair's frequency");
    add_spread("--plant-damping", spreads.plant_damping_percent, "of each plant pair's damping");
    add_spread("--dead-time", spreads.dead_time_percent, "of each plant's dead time");
    add_spread("--components", spreads.component_percent, "of each value of the compensator");
    command
        ->add_option("--shape", spreads.shape,
                     "uniform: evenly inside the spread; normal: the spread is three standard "
                     "deviations")
        ->transform(CLI::CheckedTransformer(std::map<std::string, SpreadShape>{
            {"uniform", SpreadShape::uniform}, {"normal", SpreadShape::normal}}))
        ->default_str("uniform");
    command->add_option("--samples", options->run.samples, "how many")
        ->check(CLI::Range(std::size_t{1}, std::size_t{10'000'000}))
        ->capture_default_str();
    command->add_option("--seed", options->run.seed, "equal seeds give equal samples")
        ->capture_default_str();
    command->add_option("--workers", options->run.workers, "samples judged at a time; 0: all cores")
        ->check(CLI::NonNegativeNumber)
        ->capture_default_str();
    command->add_option("--keep-worst", options->keep,
                        "project file to write: PROJECT with the worst sample as one more case");
    command->add_flag("--json", options->json, "print JSON");
    command->callback([options] { run(*options); });
}

} // namespace cornerwright::cli
