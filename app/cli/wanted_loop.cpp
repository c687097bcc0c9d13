#include "app/cli/wanted_loop.h"

#include "app/cli/command.h"
#include "core/engine/engine.h"

namespace cornerwright::cli {

WantedLoop wanted_loop(const Project& project, const std::string& plant_case,
                       const std::string& loop) {
    const PlantCase& chosen = case_named(project, plant_case);
    if (loop == "design")
        return design_loop_of(project, chosen);
    if (!project.realisation || !project.sampling)
        throw UsageError("--loop: expected design, found \"realised\", but the project has no "
                         "realisation or no sampling");
    return realised_loop_of(
        project, chosen, discretise(project.compensator, *project.sampling, *project.realisation));
}

} // namespace cornerwright::cli
