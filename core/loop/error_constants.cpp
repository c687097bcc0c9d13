#include "core/loop/error_constants.h"

namespace cornerwright {
namespace {

/// Error for the input t^order / order!.
Figure error_for(const LoopCurve& curve, int order) {
    if (curve.integrators > order)
        return Figure::of(0.0);
    if (curve.integrators < order)
        return Figure::infinite();
    if (curve.measured)
        return Figure::undetermined("it would need data below the first measured frequency");
    const double constant = order == 0 ? 1.0 + curve.low_gain : curve.low_gain;
    return constant == 0.0 ? Figure::infinite() : Figure::of(1.0 / constant);
}

} // namespace

SteadyStateErrors steady_state_errors(const LoopCurve& curve) {
    SteadyStateErrors errors{error_for(curve, 0), error_for(curve, 1), error_for(curve, 2)};
    if (curve.integrators < 0) // L(0) = 0
        errors.step = Figure::of(1.0);
    return errors;
}

} // namespace cornerwright
