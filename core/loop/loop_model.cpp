#include "core/loop/loop_model.h"

#include "core/numerics/number_text.h"

namespace cornerwright {

std::optional<LoopModel> loop_model(const DesignLoop& loop) {
    const auto with = [&loop](const PlantModel& plant, std::string note) {
        return LoopModel{loop.compensator * plant.roots,
                         plant.dead_time_s + loop.computation_delay_s, std::move(note)};
    };
    if (const auto* model = std::get_if<PlantModel>(&loop.plant))
        return with(*model, {});
    const auto& fit = std::get<MeasuredPlant>(loop.plant).fit;
    if (!fit)
        return std::nullopt;
    constexpr int digits = 2;
    return with(fit->model, "from the fit, misfit " + number_text(fit->misfit_db, digits) + " dB");
}

} // namespace cornerwright
