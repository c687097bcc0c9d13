#include "core/loop/stability.h"

#include "core/loop/nyquist.h"
#include "core/numerics/number_text.h"

#include <cmath>

namespace cornerwright {
namespace {

constexpr double boundary = 1e-9;

bool is_stable(Complex pole, bool in_z) {
    const double size = std::abs(pole);
    if (in_z)
        return size < 1.0 && 1.0 - size >= boundary * size;
    return pole.real() < 0.0 && -pole.real() >= boundary * size;
}

std::string poles_text(int count) {
    return std::to_string(count) + (count == 1 ? " closed-loop pole" : " closed-loop poles");
}

std::string region(bool in_z) {
    return in_z ? " on or outside the unit circle" : " on or right of the imaginary axis";
}

} // namespace

Stability stability_from_poles(const ComplexVector& poles, bool in_z) {
    int outside = 0;
    for (const Complex& pole : poles)
        outside += is_stable(pole, in_z) ? 0 : 1;
    if (outside == 0)
        return {true, ""};
    return {false, poles_text(outside) + region(in_z)};
}

Stability stability_from_curve(const LoopCurve& curve) {
    if (!curve.measured && curve.turns_without_end && curve.flat_end >= 1.0 - boundary)
        return {false, "dead time on a loop that does not roll off: |L| stays at " +
                           (std::isinf(curve.flat_end) ? std::string("more than 1")
                                                       : number_text(curve.flat_end, 4)) +
                           " towards infinity"};
    const NyquistCount count = nyquist_count(curve);
    if (!count.unstable_poles)
        return {std::nullopt, count.reason};
    if (count.on_boundary)
        return {false, "the loop passes through -1: a closed-loop pole on the boundary"};
    if (*count.unstable_poles == 0)
        return {true, ""};
    if (*count.unstable_poles < 0)
        return {std::nullopt, "Nyquist's count does not agree with the declared unstable poles: "
                              "the curve turns round -1 more often than they allow"};
    return {false, "Nyquist's count: " + poles_text(*count.unstable_poles) +
                       (curve.realised ? " outside the unit circle" : " right of the axis")};
}

Stability with_hidden_factor(Stability found, const std::optional<std::string>& factor) {
    if (!factor)
        return found;
    return {false, "the factor " + *factor +
                       " is cancelled in the loop: it hides a mode that does not die away"};
}

} // namespace cornerwright
