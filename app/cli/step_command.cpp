#include "app/cli/command.h"
#include "app/cli/json.h"
#include "app/cli/text_table.h"
#include "app/cli/wanted_loop.h"
#include "core/loop/step_response.h"

#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string plant_case;
    std::string loop;
    double until_s = 0.0;
    int points = 501;
    bool json = false;
};

void print_json(const StepCurves& curves) {
    Json json = {{"t_s", curves.t_s},
                 {"y", curves.y},
                 {"u", curves.u},
                 {"y_disturbance", curves.y_disturbance}};
    if (!curves.note.empty())
        json["note"] = curves.note;
    std::cout << json.dump() << '\n';
}

void print_table(const StepCurves& curves) {
    if (!curves.note.empty())
        std::cout << curves.note << '\n';
    TextTable table({"t [s]", "y", "u", "y after a disturbance step"});
    for (std::size_t i = 0; i < curves.t_s.size(); ++i)
        table.add({people_text(Figure::of(curves.t_s[i]), ""),
                   people_text(Figure::of(curves.y[i]), ""),
                   people_text(Figure::of(curves.u[i]), ""),
                   people_text(Figure::of(curves.y_disturbance[i]), "")});
    table.print(std::cout);
}

} // namespace

void add_step(CLI::App& program, int&) {
    constexpr int most_points = 1'000'000;
    const auto options = std::make_shared<Options>();
    CLI::App* command =
        program.add_subcommand("step", "Response to a unit step on the reference, and on the "
                                       "disturbance");
    command->add_option("PROJECT", options->project, "project file")->required();
    command->add_option("--case", options->plant_case, "name of the plant case")->required();
    add_loop_option(*command, options->loop);
    command->add_option("--until", options->until_s, "end time in s")
        ->required()
        ->check(CLI::PositiveNumber);
    command->add_option("--points", options->points, "number of points, evenly spaced from 0")
        ->check(CLI::Range(2, most_points))
        ->capture_default_str();
    command->add_flag("--json", options->json, "print JSON");
    command->callback([options] {
        const WantedLoop loop =
            wanted_loop(load_telling_notices(options->project), options->plant_case, options->loop);
        const StepCurves curves = std::visit(
            [&](const auto& each) { return step_curves(each, options->until_s, options->points); },
            loop);
        options->json ? print_json(curves) : print_table(curves);
    });
}

} // namespace cornerwright::cli
