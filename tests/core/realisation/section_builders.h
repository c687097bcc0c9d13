#pragma once

#include "core/compensator/section.h"

/// Sections of each kind from their numbers, in rad/s.
namespace cornerwright::test {

/// A section of `kind` with the numbers of `change` set.
template <class Change>
inline Section section_of(SectionKind kind, Change change) {
    Section section;
    section.kind = kind;
    change(section);
    return section;
}

inline Section gain_of(double value) {
    return section_of(SectionKind::gain, [=](Section& s) { s.gain = value; });
}
inline Section with_corner(SectionKind kind, double w) {
    return section_of(kind, [=](Section& s) { s.corner_rad_s = w; });
}
inline Section pi_at(double w) {
    return with_corner(SectionKind::pi, w);
}
inline Section washout_at(double w) {
    return with_corner(SectionKind::washout, w);
}
inline Section plain_integrator() {
    return with_corner(SectionKind::integrator, 1.0);
}
inline Section zero_and_pole(SectionKind kind, double zero, double pole) {
    return section_of(kind, [=](Section& s) {
        s.zero_rad_s = zero;
        s.pole_rad_s = pole;
    });
}
inline Section lead_of(double zero, double pole) {
    return zero_and_pole(SectionKind::lead, zero, pole);
}
inline Section lag_of(double zero, double pole) {
    return zero_and_pole(SectionKind::lag, zero, pole);
}
inline Section pole_at(double w) {
    return zero_and_pole(SectionKind::real_pole, 1.0, w);
}
inline Section zero_at(double w) {
    return zero_and_pole(SectionKind::real_zero, w, 1.0);
}
inline Section damped(SectionKind kind, double w, double damping) {
    return section_of(kind, [=](Section& s) {
        s.corner_rad_s = w;
        s.damping = damping;
    });
}
inline Section poles_at(double w, double damping) {
    return damped(SectionKind::complex_poles, w, damping);
}
inline Section zeros_at(double w, double damping) {
    return damped(SectionKind::complex_zeros, w, damping);
}
inline Section notch_at(double w, double zero_damping, double pole_damping) {
    return section_of(SectionKind::notch, [=](Section& s) {
        s.corner_rad_s = w;
        s.zero_damping = zero_damping;
        s.pole_damping = pole_damping;
    });
}

} // namespace cornerwright::test
