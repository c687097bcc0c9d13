#pragma once

#include "core/numerics/root_form.h"
#include "core/plant/plant_case.h"
#include "core/realisation/difference_equation.h"
#include "core/response/measured_response.h"

#include <memory>
#include <optional>
#include <variant>

namespace cornerwright {

struct SampledPlants;

/// A plant of which only points are known. What lies below the first frequency is told by
/// `integrators`; `unstable_poles` are those right of the axis.
struct MeasuredPlant {
    std::shared_ptr<const MeasuredResponse> response;
    int integrators = 0;
    int unstable_poles = 0;
    std::optional<FittedModel> fit; ///< for closed-loop poles, locus and time response
};

using LoopPlant = std::variant<PlantModel, MeasuredPlant>;

/// L(s) = C(s) H(s) P(s), with H = exp(-s computation_delay) and the hold
/// (1 - exp(-s Ts))/(s Ts) where hold_period_s = Ts > 0.
struct DesignLoop {
    RootForm compensator;
    LoopPlant plant;
    double computation_delay_s = 0.0; ///< 0 where the project's design loop leaves it out
    double hold_period_s = 0.0;       ///< 0 where there is none
};

/// L at z = exp(jw Ts): the difference equation as rounded, times the exact sampled plant (model)
/// or the held measured response.
struct RealisedLoop {
    DifferenceEquation compensator; ///< carries the sample period
    LoopPlant plant;
    double computation_delay_s = 0.0;
    /// Of just this plant, delay and period, where somebody has them already: sampling costs more
    /// than the figures that need it.
    std::shared_ptr<const SampledPlants> sampled = nullptr;
};

} // namespace cornerwright
