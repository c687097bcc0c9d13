#pragma once

#include "core/numerics/figure.h"
#include "core/requirements/requirement.h"

namespace cornerwright {

/// In which scale the distance to a limit is told.
enum class ScaleKind {
    difference,  ///< deg and dB: value - limit
    logarithmic, ///< positive quantities: ln(value / limit); plain difference where the limit is 0
};

ScaleKind scale_of(MeasureUnit unit);

/// Signed distance of `value` to a limit, positive = met. `value` is determined; the kinds judged
/// by size come in as sizes.
Figure headroom_above(double value, double at_least, MeasureUnit unit);
Figure headroom_below(double value, double at_most, MeasureUnit unit);

/// What a person would call "a bit" in the scale of a limit: the divisor that makes headrooms of
/// different kinds comparable.
double bit_of(double limit, MeasureUnit unit);

} // namespace cornerwright
