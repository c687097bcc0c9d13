#pragma once

#include "core/loop/loop.h"

#include <span>
#include <string>

namespace cornerwright {

/// One branch: a closed-loop pole followed as the loop gain goes through `factors` of the locus.
struct LocusBranch {
    ComplexVector poles; ///< one for each factor
};

/// Where a branch crosses the imaginary axis.
struct AxisCrossing {
    double w_rad_s = 0.0; ///< >= 0
    double factor = 0.0;  ///< of the present loop gain
};

/// Closed-loop poles of the design loop (no hold) as its gain is multiplied by each factor, 0 up to
/// `factors.back()`.
struct RootLocus {
    /// Ascending; contains 1 exactly. Begins with 0 where every branch comes from a pole of L, and
    /// above it where branches come from infinity (dead time, more zeros than poles).
    std::vector<double> factors;
    std::vector<LocusBranch> branches; ///< same size of `poles` each, continuous, identity kept
    std::vector<AxisCrossing> crossings;
    ComplexVector zeros;             ///< of L
    ComplexVector poles;             ///< of L
    ComplexVector closed_loop_poles; ///< at factor 1
    std::string
        note; ///< "from the fit, misfit ...", dead time shown inside the window only, or why none
};

/// The visible part of the s-plane, rad/s.
struct LocusWindow {
    double real_low = 0.0, real_high = 0.0, imag_low = 0.0, imag_high = 0.0;
};

/// The locus by continuation with step control. `window` bounds the search where dead time makes
/// branches without end; nothing: a window around the roots of L. `warm_start` is not looked at:
/// the branches are followed anew each time, so that the locus is the same to the bit whatever came
/// before.
RootLocus root_locus(const DesignLoop& loop, const LocusWindow* window = nullptr,
                     const RootLocus* warm_start = nullptr);

/// Closed-loop poles at each factor (> 0 or 0), for the command line. Throws InputError for a
/// negative factor.
std::vector<ComplexVector> locus_poles(const DesignLoop& loop, std::span<const double> factors);

} // namespace cornerwright
