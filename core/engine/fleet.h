#pragma once

#include "core/project/project.h"
#include "core/requirements/verdict.h"

#include <array>
#include <cstddef>
#include <filesystem>
#include <functional>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// The figures of a loop whose spread over the fleet is told, by their names in the contract.
inline constexpr std::array<std::string_view, 8> fleet_figure_names{
    "phase_margin_deg",    "gain_margin_db",        "gain_reduction_margin_db", "delay_margin_s",
    "sensitivity_peak_db", "complementary_peak_db", "control_effort_peak_db",   "bandwidth_rad_s"};

using FleetFigures = std::array<Figure, fleet_figure_names.size()>;

/// How one requirement stands on one unit: the worse of its loops.
struct FleetJudgement {
    Figure value;
    Figure share;
    LoopName loop = LoopName::design;
    State state = State::undetermined;

    bool operator==(const FleetJudgement&) const = default;
};

/// One measured unit against the compensator: some hundred bytes, whatever the file's size.
struct FleetUnit {
    std::string file;    ///< name within the folder
    std::string problem; ///< why the file could not be read, one sentence; else empty
    State state = State::undetermined;
    std::vector<FleetJudgement> judgements; ///< in the order of the project's requirements
    FleetFigures design;
    FleetFigures realised; ///< not determined where the project has no realisation

    bool operator==(const FleetUnit&) const = default;
};

struct FleetOptions {
    int shard = 1; ///< from 1 to `shards`: every `shards`-th file, so that all take equally long
    int shards = 1;
    int workers = 0; ///< 0: as many as there are processor cores
    int integrators = 0;
    int unstable_poles = 0;
    /// Told how many files are done of how many, from one thread at a time; false stops.
    std::function<bool(std::size_t done, std::size_t of)> proceed;
};

/// Measurement files of a folder, not of the folders in it, sorted by the bytes of their names:
/// those with a suffix that the readers know. Throws InputError where there is no such folder.
std::vector<std::filesystem::path> fleet_files(const std::filesystem::path& folder);

/// Integrators and unstable poles of the project's first plant case: what is declared for a
/// measurement, what the roots of a model tell.
void declare_as_first_case(const Project& project, FleetOptions& options);

/// Judges the project's compensator on every file of the shard. Files are read one at a time by
/// each worker and dropped when judged. The answer does not depend on the number of workers.
/// Throws InputError where the compensator cannot be realised as the project asks; a file that
/// cannot be read is a unit with a problem. Stopped: the units that were done.
std::vector<FleetUnit> run_fleet(const Project& project,
                                 const std::vector<std::filesystem::path>& files,
                                 const FleetOptions& options);

} // namespace cornerwright
