#pragma once

#include "core/loop/loop_curve.h"

#include <cmath>

namespace cornerwright {

inline double log_sensitivity(const CurvePoint& p) {
    return 0.5 * std::log(std::norm(p.sensitivity));
}

/// Re(a b).
inline double real_of_product(Complex a, Complex b) {
    return a.real() * b.real() - a.imag() * b.imag();
}

/// ln|S|; d ln S = -T d ln L.
struct Sensitivity {
    static double value(const CurvePoint& p) { return log_sensitivity(p); }
    static double before(const CurvePoint& p) {
        return -real_of_product(p.complementary, p.slope_before);
    }
    static double after(const CurvePoint& p) {
        return -real_of_product(p.complementary, p.slope_after);
    }
};

/// ln|T|; d ln T = S d ln L.
struct Complementary {
    static double value(const CurvePoint& p) { return p.loop_log + log_sensitivity(p); }
    static double before(const CurvePoint& p) {
        return real_of_product(p.sensitivity, p.slope_before);
    }
    static double after(const CurvePoint& p) {
        return real_of_product(p.sensitivity, p.slope_after);
    }
};

/// ln|C S|.
struct ControlEffort {
    static double value(const CurvePoint& p) { return p.compensator_log + log_sensitivity(p); }
    static double before(const CurvePoint& p) {
        return p.compensator_slope.real() + Sensitivity::before(p);
    }
    static double after(const CurvePoint& p) {
        return p.compensator_slope.real() + Sensitivity::after(p);
    }
};

} // namespace cornerwright
