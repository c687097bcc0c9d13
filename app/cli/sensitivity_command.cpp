#include "app/cli/command.h"
#include "app/cli/json.h"
#include "app/cli/text_table.h"
#include "core/engine/placement_problem.h"
#include "core/numerics/number_text.h"
#include "core/placement/sensitivity.h"

#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    double farthest = 10.0;
    bool json = false;
};

std::string_view word_of(RoomEnd end) {
    switch (end) {
    case RoomEnd::none:
        return "nothing fails";
    case RoomEnd::requirement:
        return "requirement";
    case RoomEnd::stability:
        return "stability";
    case RoomEnd::realisation:
        break;
    }
    return "realisation";
}

std::string what_fails(const Project& project, const ValueReach& reach) {
    if (reach.end == RoomEnd::requirement)
        return std::string(name_of(project.requirements[reach.requirement].measure));
    return std::string(word_of(reach.end));
}

Json to_json(const Project& project, const ValueReach& reach) {
    Json json = {{"end", word_of(reach.end)}, {"factor", reach.factor}};
    if (reach.end == RoomEnd::requirement)
        json["measure"] = name_of(project.requirements[reach.requirement].measure);
    if (!reach.case_name.empty()) {
        json["case"] = reach.case_name;
        json["loop"] = name_of(reach.loop);
    }
    return json;
}

Json to_json(const Project& project, const std::vector<ValueRoom>& rooms) {
    Json list = Json::array();
    for (const ValueRoom& room : rooms) {
        Json entry = {{"section", room.section + 1}};
        if (!room.is_coefficient)
            entry["kind"] = name_of(project.compensator[room.section].kind);
        entry["key"] = room.key;
        entry["value"] = room.value;
        entry["down"] = to_json(project, room.down);
        entry["up"] = to_json(project, room.up);
        list.push_back(std::move(entry));
    }
    return list;
}

/// "-12.3 %"; with a coefficient's last digits where they count.
std::string change_text(const ValueReach& reach) {
    if (reach.end == RoomEnd::none)
        return "free";
    const std::string text = number_text(100.0 * (reach.factor - 1.0), 3) + " %";
    return reach.factor > 1.0 ? "+" + text : text;
}

void add_rows(TextTable& table, const Project& project, const std::vector<ValueRoom>& rooms) {
    for (const ValueRoom& room : rooms) {
        const std::string section =
            std::to_string(room.section + 1) +
            (room.is_coefficient
                 ? ""
                 : " " + std::string(name_of(project.compensator[room.section].kind)));
        table.add({section, room.key, number_text(room.value, room.is_coefficient ? 10 : 4),
                   change_text(room.down), what_fails(project, room.down), room.down.case_name,
                   change_text(room.up), what_fails(project, room.up), room.up.case_name});
    }
}

void run(const Options& options) {
    const Project project = load_telling_notices(options.project);
    SensitivityOptions how;
    how.farthest_factor = options.farthest;
    const Sensitivity found = sensitivity(placement_problem_of(project), how);
    if (options.json) {
        Json left_out = Json::array();
        for (const std::size_t index : found.left_out)
            left_out.push_back(name_of(project.requirements[index].measure));
        std::cout << Json{{"cornerwright", 1},
                          {"title", project.title},
                          {"left_out", std::move(left_out)},
                          {"values", to_json(project, found.values)},
                          {"coefficients", to_json(project, found.coefficients)}}
                         .dump()
                  << '\n';
        return;
    }
    std::cout << project.title << '\n';
    for (const std::size_t index : found.left_out)
        std::cout << "left out, since it is not met: "
                  << name_of(project.requirements[index].measure) << ' '
                  << limit_text(project.requirements[index]) << '\n';
    TextTable table({"section", "value", "is", "down", "fails", "case", "up", "fails", "case"});
    add_rows(table, project, found.values);
    table.print(std::cout);
    if (found.coefficients.empty())
        return;
    std::cout << '\n';
    TextTable coefficients(
        {"run section", "coefficient", "is", "down", "fails", "case", "up", "fails", "case"});
    add_rows(coefficients, project, found.coefficients);
    coefficients.print(std::cout);
}

} // namespace

void add_sensitivity(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "sensitivity", "How far every corner, damping, gain and coefficient may move alone before "
                       "a requirement fails that is met now");
    command->add_option("PROJECT", options->project, "project file")->required();
    command
        ->add_option("--farthest", options->farthest,
                     "values are looked at from 1/FARTHEST to FARTHEST times themselves")
        ->check(CLI::Range(1.01, 1e6))
        ->capture_default_str();
    command->add_flag("--json", options->json, "print JSON");
    command->callback([options] { run(*options); });
}

} // namespace cornerwright::cli
