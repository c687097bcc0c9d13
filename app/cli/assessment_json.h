#pragma once

#include "app/cli/json.h"
#include "core/engine/assessment.h"

namespace cornerwright::cli {

/// The whole assessment as `assess --json` prints it. A figure that is not determined is null and
/// has its reason under "notes" of its loop, where remarks on determined figures stand too.
Json to_json(const Assessment& assessment);

} // namespace cornerwright::cli
