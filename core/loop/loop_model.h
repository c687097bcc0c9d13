#pragma once

#include "core/loop/loop.h"

#include <optional>
#include <string>

namespace cornerwright {

/// L(s) = roots(s) * exp(-s delay_s) where the plant is a model or has a fit; the hold of the
/// design loop is left out.
struct LoopModel {
    RootForm roots;
    double delay_s = 0.0; ///< dead time of the plant and computation delay
    std::string note;     ///< "from the fit, misfit 0.4 dB"; empty for a model
};

/// Nothing for a measurement without a fit.
std::optional<LoopModel> loop_model(const DesignLoop& loop);

/// Why a measurement without a fit has no closed-loop poles and no locus.
inline constexpr const char* no_model_note =
    "a measured plant without a fit has no closed-loop poles";

} // namespace cornerwright
