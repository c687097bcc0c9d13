#include "core/engine/loop_without_plant.h"

#include "core/engine/engine.h"
#include "core/loop/point_of_loop.h"

namespace cornerwright {

ComplexVector loop_without_plant(const Project& project, std::span<const double> w_rad_s) {
    const PlantCase unity{"1", RootsSource{{{{}, {}, 1.0}, 0.0}}};
    const DesignLoop loop = design_loop_of(project, unity);
    const RationalResponse compensator(loop.compensator);
    const HoldAndDelay lag{loop.computation_delay_s, loop.hold_period_s};
    ComplexVector values;
    values.reserve(w_rad_s.size());
    for (const double w : w_rad_s) {
        ResponseSample sample = compensator.at(w);
        lag.apply(w, sample);
        values.push_back(sample.value);
    }
    return values;
}

} // namespace cornerwright
