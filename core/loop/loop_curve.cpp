#include "core/loop/loop_curve.h"

#include "core/loop/measured_curve.h"
#include "core/loop/model_curve.h"

namespace cornerwright {

std::unique_ptr<LoopCurve> loop_curve(const DesignLoop& loop,
                                      const ComplexVector& closed_loop_poles) {
    if (const auto* measured = std::get_if<MeasuredPlant>(&loop.plant))
        return measured_curve(loop, *measured);
    return model_curve(loop, std::get<PlantModel>(loop.plant), closed_loop_poles);
}

std::unique_ptr<LoopCurve> loop_curve(const RealisedLoop& loop,
                                      const ComplexVector& closed_loop_poles_z) {
    if (const auto* measured = std::get_if<MeasuredPlant>(&loop.plant))
        return measured_curve(loop, *measured);
    return model_curve(loop, closed_loop_poles_z);
}

} // namespace cornerwright
