#include "core/engine/placement_problem.h"

#include "core/engine/engine.h"
#include "core/numerics/error.h"

namespace cornerwright {

PlacementProblem placement_problem_of(const Project& project) {
    PlacementProblem problem{
        project.compensator, {}, project.sampling, project.realisation, project.requirements};
    for (const PlantCase& plant_case : project.plant_cases) {
        try {
            problem.plants.push_back({plant_case.name, design_loop_of(project, plant_case).plant});
        } catch (const InputError&) {
            // The assessment says why this case cannot be used; it cannot guide a corner either.
            continue;
        }
    }
    return problem;
}

} // namespace cornerwright
