#pragma once

#include "core/compensator/chain.h"

#include <complex>
#include <cstddef>
#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

// What a hand does to a section, as pure functions: a section and a wish go in, the nearest section
// that keeps its bounds comes out. They hold no view and no pixel.

/// A part of a section that can be grabbed.
enum class SectionPart {
    corner, ///< the only corner: pi, real and complex roots, notch, washout
    zero,   ///< of lead and lag
    pole,   ///< of lead and lag
    grip,   ///< the bar between the two corners of lead and lag
};

/// Where a corner sits and which mark it bears.
struct SectionCorner {
    SectionPart part = SectionPart::corner;
    double w_rad_s = 0.0;
    bool has_zero = false; ///< triangle up
    bool has_pole = false; ///< triangle down (a notch has both)
    bool complex_pair = false;
};

/// The corners of a section; none for gain and integrator.
std::vector<SectionCorner> cornersOf(const Section& section);

/// The section with this corner at `w_rad_s`. A lead keeps pole > zero and a lag pole < zero: the
/// corner stops short of the other one by the least ratio. `grip` moves both to the geometric mean.
Section withCornerAt(Section section, SectionPart part, double w_rad_s);

/// Lead and lag: both corners apart or together about their geometric mean, so that the greater one
/// is `ratio` (>= the least ratio) times the smaller one. Others unchanged.
Section withRatio(Section section, double ratio);
double ratioOf(const Section& section);

/// Notch: its depth at the centre, dB below 0 (zero_damping / pole_damping), at constant width.
Section withDepth(Section section, double depth_db);
/// -infinity for a notch without damping of its zeros.
double depthOf(const Section& section);

/// Notch: both dampings by `factor`, so that the depth stays and the width follows.
Section withWidthFactor(Section section, double factor);

/// Complex zeros and poles: the damping by `factor`.
Section withDampingFactor(Section section, double factor);

/// A hand's wish on a frequency response: sideways as a factor on the frequency, upwards in
/// decibel.
struct ResponseDrag {
    double frequency_factor = 1.0;
    double up_db = 0.0;
    bool width = false; ///< notch: width instead of centre and depth
};

/// The part moved from where it stands in `section`. Sideways moves the corner (grip: both).
/// Upwards opens lead and lag by their grip, makes a notch shallower and the resonance of a complex
/// pair sharper (poles) or duller (zeros); real corners follow sideways only.
Section withResponseDrag(const Section& section, SectionPart part, const ResponseDrag& drag);

/// Every root of the section that can be dragged in the s-plane (those right of the real axis and
/// their twins move together). `root` has imag >= 0.
struct SectionRoot {
    SectionPart part = SectionPart::corner;
    std::complex<double> root;
    bool is_zero = false;
};
std::vector<SectionRoot> draggableRootsOf(const Section& section);

/// The section with that root at `s`, its twin beside it. A real root stays on the axis, a root
/// that must be left of the imaginary axis stays there, the complex pair's damping follows the
/// angle.
Section withRootAt(Section section, const SectionRoot& root, std::complex<double> s);

/// The loop gain by `factor` > 0: the first enabled gain section takes it; where there is none a
/// gain section is put in front. Returns its index by `index` where wanted.
Chain withGainFactor(Chain chain, double factor, std::size_t* index = nullptr);

/// A new section of this kind about `w_rad_s`, with the usual start values.
Section newSection(SectionKind kind, double w_rad_s);

/// The least ratio of the corners of lead and lag that a drag leaves.
inline constexpr double least_ratio = 1.02;

} // namespace cornerwright
