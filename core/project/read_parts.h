#pragma once

#include "core/compensator/chain.h"
#include "core/project/json_document.h"
#include "core/realisation/realisation.h"
#include "core/requirements/requirement.h"

#include <string>
#include <vector>

namespace cornerwright {

/// The parts of the project file that hold values only. All throw InputError with file, line and
/// column.
Chain read_compensator(const std::vector<JsonNode>& items, const std::string& file);
Sampling read_sampling(const JsonNode& node, const std::string& file);
Realisation read_realisation(const JsonNode& node, const std::string& file);
std::vector<Requirement> read_requirements(const std::vector<JsonNode>& items,
                                           const std::string& file);

} // namespace cornerwright
