#pragma once

#include "core/engine/assessment.h"
#include "core/project/project.h"

#include <string>

namespace cornerwright {

/// A figure for a person: "41.9", "infinite", "not determined".
std::string figure_words(const Figure& figure, int digits = 4);
/// "met" with a tick, "unmet" with a cross, "not determined" with a question mark.
std::string state_words(State state);
/// "2 of 9 requirements unmet" and the like.
std::string verdict_words(const Verdict& verdict);

/// Tables of the review report, as HTML.
std::string requirement_table(const Assessment& assessment);
std::string requirement_matrix(const Assessment& assessment);
std::string figure_table(const Assessment& assessment);
std::string plant_table(const Project& project, const Assessment& assessment);
std::string section_table(const Project& project);
std::string coefficient_table(const DifferenceEquation& equation);
std::string undetermined_table(const Assessment& assessment);

/// "Phase margin": the measure as a heading.
std::string measure_words(const Requirement& requirement);

} // namespace cornerwright
