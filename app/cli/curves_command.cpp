#include "app/cli/command.h"
#include "app/cli/json.h"
#include "app/cli/text_table.h"
#include "app/cli/wanted_loop.h"
#include "core/loop/frequency_figures.h"

#include <cmath>
#include <iostream>
#include <memory>
#include <numbers>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string plant_case;
    std::string loop;
    std::string frequencies;
    bool json = false;
};

void print_json(const std::vector<LoopPoint>& points) {
    Json list = Json::array();
    for (const LoopPoint& point : points)
        list.push_back({{"w_rad_s", point.w_rad_s},
                        {"C", to_json(point.compensator)},
                        {"P", to_json(point.plant)},
                        {"L", to_json(point.loop)},
                        {"S", to_json(point.sensitivity)},
                        {"T", to_json(point.complementary)}});
    std::cout << Json{{"points", std::move(list)}}.dump() << '\n';
}

std::string decibels_and_degrees(Complex value) {
    constexpr double degrees = 180.0 / std::numbers::pi;
    return people_text(Figure::of(20.0 * std::log10(std::abs(value))), "dB") + " " +
           people_text(Figure::of(std::arg(value) * degrees), "deg");
}

void print_table(const std::vector<LoopPoint>& points) {
    TextTable table({"rad/s", "C", "P", "L", "S", "T"});
    for (const LoopPoint& point : points)
        table.add({people_text(Figure::of(point.w_rad_s), ""),
                   decibels_and_degrees(point.compensator), decibels_and_degrees(point.plant),
                   decibels_and_degrees(point.loop), decibels_and_degrees(point.sensitivity),
                   decibels_and_degrees(point.complementary)});
    table.print(std::cout);
}

} // namespace

void add_curves(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command =
        program.add_subcommand("curves", "Frequency responses of one loop at given frequencies");
    command->add_option("PROJECT", options->project, "project file")->required();
    command->add_option("--case", options->plant_case, "name of the plant case")->required();
    add_loop_option(*command, options->loop);
    command->add_option("--at", options->frequencies, "frequencies in rad/s, separated by commas")
        ->required();
    command->add_flag("--json", options->json, "print JSON");
    command->callback([options] {
        const auto frequencies = number_list(options->frequencies, "--at", 0.0, false);
        const WantedLoop loop =
            wanted_loop(load_telling_notices(options->project), options->plant_case, options->loop);
        const auto points =
            std::visit([&](const auto& each) { return loop_points(each, frequencies); }, loop);
        options->json ? print_json(points) : print_table(points);
    });
}

} // namespace cornerwright::cli
