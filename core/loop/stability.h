#pragma once

#include "core/loop/loop_curve.h"
#include "core/loop/loop_figures.h"

#include <optional>
#include <string>

namespace cornerwright {

/// Stability from all closed-loop poles. One nearer to the boundary than 1e-9 of its modulus (or
/// beyond it) counts as not stable.
Stability stability_from_poles(const ComplexVector& poles, bool in_z);

/// Stability by Nyquist's criterion along the curve.
Stability stability_from_curve(const LoopCurve& curve);

/// `found`, corrected by what neither poles nor curve show: a hidden factor, or an algebraic loop
/// with 1 + L = 0 at infinity.
Stability with_hidden_factor(Stability found, const std::optional<std::string>& factor);

} // namespace cornerwright
