#include "app/cli/command.h"
#include "app/cli/written_project.h"
#include "core/engine/placement_problem.h"
#include "core/placement/placement.h"

#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string out;
    std::uint64_t seed = 1;
    double time_limit_s = 0.0;
};

} // namespace

void add_place(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "place", "Move unlocked corners, dampings and gains so that the smallest headroom grows");
    command->add_option("PROJECT", options->project, "project file")->required();
    command->add_option("--write", options->out, "project file to write; may be PROJECT itself")
        ->required();
    command->add_option("--seed", options->seed, "equal seeds give equal results")
        ->capture_default_str();
    command
        ->add_option("--time-limit", options->time_limit_s,
                     "seconds after which the best so far is taken; 0: none")
        ->check(CLI::NonNegativeNumber)
        ->capture_default_str();
    command->callback([options] {
        Project project = load_telling_notices(options->project);
        PlacementOptions placement;
        placement.seed = options->seed;
        placement.time_limit_s = options->time_limit_s;
        const PlacementResult result = place(placement_problem_of(project), placement);
        project.compensator = result.compensator;
        write_project(project, options->project, options->out);
        for (const std::string& words : result.words)
            std::cout << words << '\n';
    });
}

} // namespace cornerwright::cli
