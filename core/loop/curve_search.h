#pragma once

#include "core/loop/loop_curve.h"
#include "core/numerics/bracketed_root.h"

namespace cornerwright {

/// A real function along a curve with its slope towards either side.
/// `Quantity` gives value(point), before(point) and after(point).
///
/// The place of an extremum between `a` and `b`, whose inner slopes differ in sign.
template <typename Quantity>
CurvePoint extremum_between(const LoopCurve& curve, const Quantity& quantity, const CurvePoint& a,
                            const CurvePoint& b) {
    const double w = bracketed_root([&](double place) { return quantity.after(curve.at(place)); },
                                    a.w_rad_s, quantity.after(a), b.w_rad_s, quantity.before(b));
    return curve.at(w);
}

/// Where the quantity passes `level` between `a` and `b`, which lie on different sides of it.
template <typename Quantity>
CurvePoint passage_between(const LoopCurve& curve, const Quantity& quantity, const CurvePoint& a,
                           const CurvePoint& b, double level) {
    const double w =
        bracketed_root([&](double place) { return quantity.value(curve.at(place)) - level; },
                       a.w_rad_s, quantity.value(a) - level, b.w_rad_s, quantity.value(b) - level);
    return curve.at(w);
}

/// Twice as far as the tangents of `a` and `b` reach from `a` where they meet: how far the extremum
/// between them may go. Of use where the inner slopes differ in sign.
template <typename Quantity>
double reach_between(const Quantity& quantity, const CurvePoint& a, const CurvePoint& b) {
    const double slope_a = quantity.after(a);
    const double slope_b = quantity.before(b);
    const double width = b.w_rad_s - a.w_rad_s;
    const double step =
        (quantity.value(b) - quantity.value(a) - slope_b * width) / (slope_a - slope_b);
    return quantity.value(a) + 2.0 * slope_a * std::clamp(step, 0.0, width);
}

} // namespace cornerwright
