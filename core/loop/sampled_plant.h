#pragma once

#include "core/loop/loop.h"
#include "core/numerics/root_form.h"
#include "core/plant/plant_case.h"

#include <memory>

namespace cornerwright {

/// The exact sampled plant: zero-order-hold equivalent of P(s) exp(-s delay), fractional delay
/// included, as
///     P_d(z) = z^-whole_samples * delta_form(z - 1).
/// Roots in z - 1 keep the digits of dynamics far slower than the sample rate.
/// Source: K. J. Astrom, B. Wittenmark, Computer-Controlled Systems, 3rd ed., ch. 3 (citation from
/// memory).
struct SampledPlant {
    double sample_period_s = 0.0;
    int whole_samples = 0;
    RootForm delta_form; ///< zeros and poles in z - 1; a fractional delay adds a pole at -1 (z = 0)
};

/// `delay_s` is the dead time of the model plus the computation delay; any size. Throws InputError
/// for an improper plant (a plant with as many zeros as poles is allowed: its direct term is
/// sampled just after each instant's delay).
SampledPlant sample_plant(const PlantModel& plant, double computation_delay_s,
                          double sample_period_s);

/// The sampled plants that the figures of a realised loop ask for.
struct SampledPlants {
    SampledPlant delayed;   ///< behind dead time and computation delay
    SampledPlant undelayed; ///< behind the dead time alone, as a disturbance meets it
};

SampledPlants sample_plants(const PlantModel& plant, double computation_delay_s,
                            double sample_period_s);

/// Those of a loop whose plant is a model: `loop.sampled` where it is filled, else sampled now.
/// Throws as `sample_plant` does.
std::shared_ptr<const SampledPlants> sampled_plants_of(const RealisedLoop& loop);

/// P_d at z = 1 + d.
Complex evaluate(const SampledPlant& plant, Complex z_minus_1);

} // namespace cornerwright
