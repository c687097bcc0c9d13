#pragma once

#include "core/loop/sampled_plant.h"
#include "core/loop/step_figures.h"
#include "core/plant/plant_case.h"

namespace cornerwright {

/// A difference equation, as its roots in z - 1, before a held plant.
struct SampledLoop {
    RootForm compensator; ///< in z - 1, proper
    PlantModel plant;
    double computation_delay_s = 0.0;
    double sample_period_s = 0.0;
    std::shared_ptr<const SampledPlants> sampled; ///< of that plant, delay and period
};

/// Step signals of the sampled loop: the difference equation at the sampling instants, the plant
/// exactly between them, the disturbance stepping at a sampling instant. Once no mode is left that
/// turns within a few samples, the slow closed-loop poles (in z) carry the signals on, checked
/// against the simulation where they meet. `until_s` 0: until settled; else at least so far.
/// Returns nothing where that takes more than the work allowed or never comes to be.
std::optional<StepSignals> sampled_step(const SampledLoop& loop,
                                        const ComplexVector& closed_loop_poles_z,
                                        double until_s = 0.0);

} // namespace cornerwright
