#include "app/cli/command.h"
#include "app/cli/json.h"
#include "app/cli/text_table.h"
#include "core/engine/engine.h"
#include "core/loop/root_locus.h"

#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string plant_case;
    std::string factors;
    bool json = false;
};

void print_json(const std::vector<double>& factors, const std::vector<ComplexVector>& poles) {
    Json list = Json::array();
    for (std::size_t i = 0; i < factors.size(); ++i)
        list.push_back({{"factor", factors[i]}, {"poles_rad_s", to_json(poles[i])}});
    std::cout << Json{{"points", std::move(list)}}.dump() << '\n';
}

void print_table(const std::vector<double>& factors, const std::vector<ComplexVector>& poles) {
    TextTable table({"factor", "real [rad/s]", "imaginary [rad/s]"});
    for (std::size_t i = 0; i < factors.size(); ++i)
        for (const Complex pole : poles[i])
            table.add({people_text(Figure::of(factors[i]), ""),
                       people_text(Figure::of(pole.real()), ""),
                       people_text(Figure::of(pole.imag()), "")});
    table.print(std::cout);
}

} // namespace

void add_locus(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "locus", "Closed-loop poles of the design loop (without hold) as its gain is multiplied");
    command->add_option("PROJECT", options->project, "project file")->required();
    command->add_option("--case", options->plant_case, "name of the plant case")->required();
    command->add_option("--factors", options->factors, "factors of the gain, separated by commas")
        ->required();
    command->add_flag("--json", options->json, "print JSON");
    command->callback([options] {
        const auto factors = number_list(options->factors, "--factors", 0.0, true);
        const Project project = load_telling_notices(options->project);
        const DesignLoop loop = design_loop_of(project, case_named(project, options->plant_case));
        const auto poles = locus_poles(loop, factors);
        options->json ? print_json(factors, poles) : print_table(factors, poles);
    });
}

} // namespace cornerwright::cli
