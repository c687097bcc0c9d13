#include "core/engine/engine.h"
#include "core/numerics/error.h"

#include <utility>

namespace cornerwright {
namespace {

LoopPlant loop_plant_of(const PlantCase& plant_case) {
    if (const auto* measurement = std::get_if<MeasurementSource>(&plant_case.source)) {
        if (!measurement->response)
            throw InputError({measurement->file, {}, {}},
                             "a measurement for the case \"" + plant_case.name + "\"",
                             "no readable file");
        return MeasuredPlant{measurement->response, measurement->integrators,
                             measurement->unstable_poles, measurement->fit};
    }
    return *model_of(plant_case.source);
}

} // namespace

DesignLoop design_loop_of(const Project& project, const PlantCase& plant_case) {
    DesignLoop loop{roots_of(project.compensator), loop_plant_of(plant_case), 0.0, 0.0};
    if (project.sampling && project.sampling->design_includes_hold) {
        loop.computation_delay_s = project.sampling->computation_delay_s;
        loop.hold_period_s = project.sampling->sample_period_s;
    }
    return loop;
}

RealisedLoop realised_loop_of(const Project& project, const PlantCase& plant_case,
                              const DifferenceEquation& equation) {
    const double delay = project.sampling ? project.sampling->computation_delay_s : 0.0;
    return {equation, loop_plant_of(plant_case), delay};
}

} // namespace cornerwright
