#pragma once

#include "app/cli/json.h"
#include "core/engine/fleet_summary.h"

namespace cornerwright::cli {

/// What one shard of the fleet found; shards of the same fleet are put together from these.
struct FleetShard {
    int shard = 1;
    int shards = 1;
    std::string folder_sha256;  ///< of the names of all files, so that no two fleets are mixed
    std::string project_sha256; ///< of the project as text
    std::vector<FleetUnit> units;
};

Json to_json(const FleetShard& shard, const Project& project);

/// Reads what `to_json` wrote. Throws InputError naming the file where it is anything else.
FleetShard shard_from(const std::string& file, const Project& project);

/// The whole fleet: units in the order of their names, and the summary.
Json fleet_json(const Project& project, const std::vector<FleetUnit>& units,
                const FleetSummary& summary);

} // namespace cornerwright::cli
