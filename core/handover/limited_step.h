#pragma once

#include "core/engine/assessment.h"
#include "core/numerics/figure.h"
#include "core/project/project.h"
#include "core/realisation/difference_equation.h"

#include <string>
#include <vector>

namespace cornerwright {

/// The unit step on the reference, at rest, with the output limits in force: the bit-true run
/// before the exact sampled plant. Values stand at the sampling instants.
struct LimitedStep {
    std::vector<double> t_s;
    std::vector<double> y;
    std::vector<double> u;    ///< as limited
    Figure overshoot_percent; ///< over where the loop without limits ends up
    Figure settling_time_s;   ///< 2 % band; infinite where it does not settle in the time shown
    double time_at_limit_s = 0.0;
    std::string note; ///< why there is nothing, or "from the fit, misfit 0.4 dB"
};

/// For one case. Nothing but the note where there is no model, the plant answers within the same
/// instant, or there are no limits. `final_value` is where the loop without limits ends up (a
/// realised step error of 0 makes it 1); `until_s` how far to go, at most a million samples.
LimitedStep limited_step(const Project& project, const PlantCase& plant_case,
                         const DifferenceEquation& equation, double final_value, double until_s);

/// The same for a case of an assessment (which has an equation), over three times the stretch on
/// which its realised step is drawn, at most 20000 samples.
LimitedStep limited_step(const Project& project, const Assessment& assessment,
                         std::size_t case_index);

} // namespace cornerwright
