#include "core/requirements/scale.h"

#include <cmath>

namespace cornerwright {
namespace {

// The one table of what a person would call "a bit". Our choice.
constexpr double bit_of_degrees = 10.0;
constexpr double bit_of_decibels = 2.0;
constexpr double bit_of_ratio = 1.25;
constexpr double bit_of_plain = 1.0; ///< where the limit itself is 0

double distance(double high, double low, double limit, MeasureUnit unit) {
    if (high == low)
        return 0.0; // also of two infinities
    if (scale_of(unit) == ScaleKind::difference || limit == 0.0)
        return high - low;
    if (low <= 0.0)
        return HUGE_VAL;
    if (high <= 0.0)
        return -HUGE_VAL;
    return std::log(high / low);
}

} // namespace

ScaleKind scale_of(MeasureUnit unit) {
    return unit == MeasureUnit::deg || unit == MeasureUnit::db ? ScaleKind::difference
                                                               : ScaleKind::logarithmic;
}

Figure headroom_above(double value, double at_least, MeasureUnit unit) {
    return Figure::of(distance(value, at_least, at_least, unit));
}

Figure headroom_below(double value, double at_most, MeasureUnit unit) {
    return Figure::of(distance(at_most, value, at_most, unit));
}

double bit_of(double limit, MeasureUnit unit) {
    switch (unit) {
    case MeasureUnit::deg:
        return bit_of_degrees;
    case MeasureUnit::db:
        return bit_of_decibels;
    default:
        return limit == 0.0 ? bit_of_plain : std::log(bit_of_ratio);
    }
}

} // namespace cornerwright
