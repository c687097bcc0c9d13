#pragma once

#include "core/engine/assessment.h"

#include <cstddef>
#include <string>

namespace cornerwright {

/// Plots of the review report as SVG, one case drawn full and the others faint. Frequencies in
/// rad/s.
std::string magnitude_plot(const Assessment& assessment, std::size_t shown);
std::string phase_plot(const Assessment& assessment, std::size_t shown);
std::string sensitivity_plot(const Assessment& assessment, std::size_t shown);
std::string step_plot(const Assessment& assessment, std::size_t shown);
/// Root locus of the shown case; empty where there is none.
std::string locus_plot(const RootLocus& locus, const std::string& case_name);

/// The case on which the requirement with the smallest share stands worst; 0 where none says.
std::size_t worst_case_of(const Assessment& assessment);

} // namespace cornerwright
