#pragma once

#include "core/loop/loop.h"

#include <string>

namespace cornerwright {

/// Closed-loop poles and what is to be said of them.
struct ClosedLoopPoles {
    ComplexVector poles; ///< conjugate pairs exact; rad/s, or z for the realised loop
    /// Relative a-posteriori error bound of each pole, same order as `poles`.
    std::vector<double> relative_error;
    bool complete = true; ///< false: dead time, only the rightmost of infinitely many
    std::string note;     ///< why there are none, or which these are
};

/// Roots of prod(s - p) + k prod(s - z) = 0 in factored form by simultaneous (Aberth) iteration,
/// polished, with an a-posteriori bound; `warm_start` may hold the poles of a nearby loop. With
/// dead time: the rightmost roots of the true quasi-polynomial, by argument principle and Newton.
/// The hold of the design loop is left out (as the root locus does); a measured plant goes through
/// its fit.
ClosedLoopPoles closed_loop_poles(const DesignLoop& loop, const ComplexVector& warm_start = {});

/// Poles in z of difference equation and sampled plant. Empty with a note for a measured plant.
ClosedLoopPoles closed_loop_poles(const RealisedLoop& loop, const ComplexVector& warm_start = {});

} // namespace cornerwright
