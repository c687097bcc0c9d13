#include "app/cli/command.h"
#include "app/cli/fleet_json.h"
#include "app/cli/text_table.h"
#include "core/numerics/error.h"
#include "core/numerics/number_text.h"
#include "core/numerics/sha256.h"

#include <algorithm>
#include <cmath>
#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string folder;
    std::string shard;
    std::vector<std::string> merge;
    int workers = 0;
    int integrators = -1;
    int unstable_poles = -1;
    bool json = false;
};

/// "2/8" is the second of eight.
void read_shard(const std::string& text, FleetOptions& fleet) {
    const std::size_t slash = text.find('/');
    const auto shard = parse_number(text.substr(0, slash));
    const auto shards =
        slash == std::string::npos ? std::nullopt : parse_number(text.substr(slash + 1));
    constexpr double most_shards = 1e6;
    const auto is_count = [](double value) { return value >= 1.0 && value == std::floor(value); };
    if (!shard || !shards || !is_count(*shard) || !is_count(*shards) || *shard > *shards ||
        *shards > most_shards)
        throw UsageError("--shard: expected I/N with I from 1 to N, found \"" + text + "\"");
    fleet.shard = static_cast<int>(*shard);
    fleet.shards = static_cast<int>(*shards);
}

std::string names_sha256(const std::vector<std::filesystem::path>& files) {
    Sha256 hash;
    for (const auto& file : files)
        hash.add(file.filename().string() + '\n');
    return hash.hex();
}

std::vector<FleetUnit> merged(const Options& options, const Project& project) {
    std::vector<FleetUnit> units;
    std::vector<int> seen;
    FleetShard first;
    for (const std::string& file : options.merge) {
        FleetShard shard = shard_from(file, project);
        if (shard.project_sha256 != sha256_hex(to_text(project)))
            throw InputError({file, {}, {}}, "a shard of this project as it stands",
                             "one of another or an edited project");
        if (seen.empty())
            first = shard;
        if (shard.shards != first.shards || shard.folder_sha256 != first.folder_sha256)
            throw InputError({file, {}, {}}, "a shard of the same fleet as " + options.merge[0],
                             "one of another");
        if (std::find(seen.begin(), seen.end(), shard.shard) != seen.end())
            throw InputError({file, {}, {}}, "each shard once",
                             "shard " + std::to_string(shard.shard) + " again");
        seen.push_back(shard.shard);
        units.insert(units.end(), shard.units.begin(), shard.units.end());
    }
    if (static_cast<int>(seen.size()) != first.shards)
        throw UsageError("--merge: expected all " + std::to_string(first.shards) +
                         " shards, found " + std::to_string(seen.size()));
    std::sort(units.begin(), units.end(),
              [](const FleetUnit& a, const FleetUnit& b) { return a.file < b.file; });
    return units;
}

void print_requirements(const Project& project, const FleetSummary& summary) {
    TextTable table({"requirement", "limit", "met", "unmet", "undetermined", "worst", "unit"});
    for (std::size_t i = 0; i < summary.requirements.size(); ++i) {
        const FleetRequirement& requirement = summary.requirements[i];
        table.add({std::string(name_of(requirement.measure)), requirement.limit,
                   std::to_string(requirement.met), std::to_string(requirement.unmet),
                   std::to_string(requirement.undetermined),
                   people_text(requirement.worst.value,
                               symbol_of(unit_of(project.requirements[i].measure))),
                   requirement.worst_file});
    }
    table.print(std::cout);
}

void print_spread(const FleetSummary& summary) {
    std::vector<std::string> heading{"figure", "loop", "units"};
    for (const double part : fleet_quantiles)
        heading.push_back(number_text(100.0 * part, 3) + " %");
    TextTable table(std::move(heading));
    for (const FleetSpread& spread : summary.spread) {
        std::vector<std::string> row{spread.figure, std::string(name_of(spread.loop)),
                                     std::to_string(spread.determined)};
        for (const Figure& quantile : spread.quantiles)
            row.push_back(people_text(quantile, ""));
        table.add(std::move(row));
    }
    table.print(std::cout);
}

void print_for_people(const Project& project, const std::vector<FleetUnit>& units,
                      const FleetSummary& summary) {
    std::cout << project.title << '\n'
              << "verdict: " << name_of(summary.state) << " (" << summary.units
              << " units: " << summary.met << " met, " << summary.unmet << " unmet, "
              << summary.undetermined << " undetermined, " << summary.unreadable
              << " unreadable)\n\n";
    print_requirements(project, summary);
    std::cout << '\n';
    print_spread(summary);
    std::cout << '\n';
    TextTable worst({"worst units", "requirement", "share of headroom"});
    for (const WorstUnit& unit : summary.worst)
        worst.add({unit.file, std::string(name_of(unit.measure)), people_text(unit.share, "")});
    worst.print(std::cout);
    std::cout << '\n';
    for (const FleetUnit& unit : units) {
        if (unit.problem.empty())
            std::cout << unit.file << ": " << name_of(unit.state) << '\n';
        else
            std::cout << unit.problem << '\n';
    }
}

void run(const Options& options) {
    const Project project = load_telling_notices(options.project);
    std::vector<FleetUnit> units;
    if (!options.merge.empty()) {
        units = merged(options, project);
    } else {
        FleetOptions fleet;
        fleet.workers = options.workers;
        declare_as_first_case(project, fleet);
        if (options.integrators >= 0)
            fleet.integrators = options.integrators;
        if (options.unstable_poles >= 0)
            fleet.unstable_poles = options.unstable_poles;
        if (!options.shard.empty())
            read_shard(options.shard, fleet);
        const auto files = fleet_files(options.folder);
        if (files.empty())
            throw InputError({options.folder, {}, {}}, "measurement files", "none");
        units = run_fleet(project, files, fleet);
        if (!options.shard.empty()) {
            const FleetShard shard{fleet.shard, fleet.shards, names_sha256(files),
                                   sha256_hex(to_text(project)), std::move(units)};
            std::cout << to_json(shard, project).dump() << '\n';
            return;
        }
    }
    const FleetSummary summary = summary_of(project.requirements, units);
    if (options.json)
        std::cout << fleet_json(project, units, summary).dump() << '\n';
    else
        print_for_people(project, units, summary);
}

} // namespace

void add_fleet(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "fleet", "The compensator against every measurement file in a folder: verdict per file, "
                 "worst of each requirement, spread. Quantile p is the figure of rank ceil(p n)");
    command->add_option("PROJECT", options->project, "project file")->required();
    CLI::Option* folder = command->add_option("DIR", options->folder, "folder of measurements");
    command->add_flag("--json", options->json, "print JSON");
    CLI::Option* shard =
        command->add_option("--shard", options->shard,
                            "I/N: only every N-th file, from the I-th; prints what --merge "
                            "reads");
    CLI::Option* merge = command->add_option(
        "--merge", options->merge, "what all shards printed; the result is that of one run");
    command->add_option("--workers", options->workers, "files judged at a time; 0: all cores")
        ->check(CLI::NonNegativeNumber)
        ->capture_default_str();
    command
        ->add_option("--integrators", options->integrators,
                     "of every unit; as the first plant case if silent")
        ->check(CLI::NonNegativeNumber);
    command
        ->add_option("--unstable-poles", options->unstable_poles,
                     "of every unit; as the first plant case if silent")
        ->check(CLI::NonNegativeNumber);
    merge->excludes(shard)->excludes(folder);
    command->callback([options] {
        if (options->folder.empty() && options->merge.empty())
            throw UsageError("DIR: expected a folder of measurements, or --merge, found neither");
        run(*options);
    });
}

} // namespace cornerwright::cli
