#pragma once

#include <algorithm>
#include <cmath>
#include <limits>
#include <utility>

namespace cornerwright {

/// The root of a continuous function between `a` and `b`, where `fa = f(a)` and `fb = f(b)` differ
/// in sign (one may be 0). Stops once the bracket is narrower than 4 ulp of the root or f is 0.
/// Inverse quadratic interpolation where it is safe, bisection else.
/// Source: T. R. Chandrupatla, A new hybrid quadratic/bisection algorithm for finding the zero of a
/// nonlinear function without using derivatives, Advances in Engineering Software 28 (1997)
/// (citation from memory).
template <typename Function>
double bracketed_root(Function&& f, double a, double fa, double b, double fb) {
    // An end on the root itself has no sign for the bracket to go by.
    if (fa == 0.0 || fb == 0.0)
        return fa == 0.0 ? a : b;
    constexpr int most_steps = 120; // bisection alone needs 60 for a ratio of 2 between the ends
    double c = a;
    double fc = fa;
    double fraction = 0.5;
    for (int step = 0; step < most_steps; ++step) {
        const double x = a + fraction * (b - a);
        const double fx = f(x);
        if ((fx > 0.0) == (fa > 0.0)) {
            c = a;
            fc = fa;
        } else {
            c = b;
            fc = fb;
            b = a;
            fb = fa;
        }
        a = x;
        fa = fx;
        const bool a_is_nearer = std::abs(fa) < std::abs(fb);
        const double best = a_is_nearer ? a : b;
        const double tolerance = 2.0 * std::numeric_limits<double>::epsilon() * std::abs(best);
        const double relative = tolerance / std::abs(b - a);
        if (fa == 0.0 || fb == 0.0 || relative > 0.5)
            return fa == 0.0 ? a : fb == 0.0 ? b : best;
        const double xi = (a - b) / (c - b);
        const double phi = (fa - fb) / (fc - fb);
        if (phi * phi < xi && (1.0 - phi) * (1.0 - phi) < 1.0 - xi)
            fraction = fa / (fb - fa) * fc / (fb - fc) +
                       (c - a) / (b - a) * fa / (fc - fa) * fb / (fc - fb);
        else
            fraction = 0.5;
        fraction = std::clamp(fraction, relative, 1.0 - relative);
    }
    return std::abs(fa) < std::abs(fb) ? a : b;
}

} // namespace cornerwright
