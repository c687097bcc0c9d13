#include "app/cli/fleet_json.h"

#include "core/numerics/error.h"

#include <fstream>

namespace cornerwright::cli {
namespace {

Json to_json(const FleetFigures& figures) {
    Json json = Json::object();
    for (std::size_t i = 0; i < figures.size(); ++i)
        json[std::string(fleet_figure_names[i])] = cli::to_json(figures[i]);
    return json;
}

Json to_json(const FleetJudgement& judgement) {
    return {{"value", cli::to_json(judgement.value)},
            {"share", cli::to_json(judgement.share)},
            {"loop", name_of(judgement.loop)},
            {"state", name_of(judgement.state)}};
}

Json to_json(const FleetUnit& unit, const Project& project) {
    if (!unit.problem.empty())
        return {{"file", unit.file}, {"problem", unit.problem}};
    Json requirements = Json::array();
    for (std::size_t i = 0; i < unit.judgements.size(); ++i) {
        Json json = {{"measure", name_of(project.requirements[i].measure)}};
        json.update(to_json(unit.judgements[i]));
        requirements.push_back(std::move(json));
    }
    Json json = {{"file", unit.file},
                 {"verdict", name_of(unit.state)},
                 {"requirements", std::move(requirements)},
                 {"design", to_json(unit.design)}};
    if (project.realisation)
        json["realised"] = to_json(unit.realised);
    return json;
}

Figure figure_from(const Json& json) {
    if (json.is_number())
        return Figure::of(json.get<double>());
    if (json == "infinite")
        return Figure::infinite();
    return json == "-infinite" ? Figure::minus_infinite() : Figure{};
}

State state_from(const Json& json) {
    for (const State state : {State::met, State::unmet}) {
        if (json == name_of(state))
            return state;
    }
    return State::undetermined;
}

FleetFigures figures_from(const Json& json) {
    FleetFigures figures;
    for (std::size_t i = 0; i < figures.size(); ++i)
        figures[i] = figure_from(json.at(std::string(fleet_figure_names[i])));
    return figures;
}

FleetUnit unit_from(const Json& json) {
    FleetUnit unit;
    unit.file = json.at("file").get<std::string>();
    if (json.contains("problem")) {
        unit.problem = json.at("problem").get<std::string>();
        return unit;
    }
    unit.state = state_from(json.at("verdict"));
    for (const Json& judgement : json.at("requirements"))
        unit.judgements.push_back(
            {figure_from(judgement.at("value")), figure_from(judgement.at("share")),
             judgement.at("loop") == name_of(LoopName::design) ? LoopName::design
                                                               : LoopName::realised,
             state_from(judgement.at("state"))});
    unit.design = figures_from(json.at("design"));
    if (json.contains("realised"))
        unit.realised = figures_from(json.at("realised"));
    return unit;
}

Json units_json(const Project& project, const std::vector<FleetUnit>& units) {
    Json list = Json::array();
    for (const FleetUnit& unit : units)
        list.push_back(to_json(unit, project));
    return list;
}

Json to_json(const FleetSpread& spread) {
    Json quantiles = Json::array();
    for (const Figure& quantile : spread.quantiles)
        quantiles.push_back(cli::to_json(quantile));
    return {{"figure", spread.figure},
            {"loop", name_of(spread.loop)},
            {"determined", spread.determined},
            {"quantiles", std::move(quantiles)}};
}

} // namespace

Json to_json(const FleetShard& shard, const Project& project) {
    return {{"cornerwright", 1},
            {"shard", shard.shard},
            {"shards", shard.shards},
            {"project_sha256", shard.project_sha256},
            {"files_sha256", shard.folder_sha256},
            {"units", units_json(project, shard.units)}};
}

FleetShard shard_from(const std::string& file, const Project& project) {
    try {
        std::ifstream stream(file, std::ios::binary);
        const Json json = Json::parse(stream);
        FleetShard shard{json.at("shard").get<int>(),
                         json.at("shards").get<int>(),
                         json.at("files_sha256").get<std::string>(),
                         json.at("project_sha256").get<std::string>(),
                         {}};
        for (const Json& unit : json.at("units")) {
            shard.units.push_back(unit_from(unit));
            const FleetUnit& read = shard.units.back();
            if (read.problem.empty() && read.judgements.size() != project.requirements.size())
                throw InputError({file, {}, {}}, "as many judgements as requirements", read.file);
        }
        return shard;
    } catch (const Json::exception&) {
        throw InputError({file, {}, {}}, "what a fleet run with --shard printed", "something else");
    }
}

Json fleet_json(const Project& project, const std::vector<FleetUnit>& units,
                const FleetSummary& summary) {
    Json requirements = Json::array();
    for (const FleetRequirement& requirement : summary.requirements) {
        Json json = {{"measure", name_of(requirement.measure)},
                     {"limit", requirement.limit},
                     {"met", requirement.met},
                     {"unmet", requirement.unmet},
                     {"undetermined", requirement.undetermined},
                     {"worst_file", requirement.worst_file}};
        json["worst"] = to_json(requirement.worst);
        requirements.push_back(std::move(json));
    }
    Json spread = Json::array();
    for (const FleetSpread& figure : summary.spread)
        spread.push_back(to_json(figure));
    Json worst = Json::array();
    for (const WorstUnit& unit : summary.worst)
        worst.push_back({{"file", unit.file},
                         {"measure", name_of(unit.measure)},
                         {"share", cli::to_json(unit.share)}});
    return {{"cornerwright", 1},
            {"title", project.title},
            {"verdict", name_of(summary.state)},
            {"counts",
             {{"units", summary.units},
              {"met", summary.met},
              {"unmet", summary.unmet},
              {"undetermined", summary.undetermined},
              {"unreadable", summary.unreadable}}},
            {"requirements", std::move(requirements)},
            {"quantiles", fleet_quantiles},
            {"spread", std::move(spread)},
            {"worst_units", std::move(worst)},
            {"units", units_json(project, units)}};
}

} // namespace cornerwright::cli
