#pragma once

#include <cmath>
#include <optional>

namespace cornerwright {

/// Where a function of a distance, positive or zero at 0, first turns negative.
struct RoomSearch {
    double first = 1e-3;   ///< distance of the first look
    double growth = 2.0;   ///< of the distance from look to look
    double farthest = 1.0; ///< of the last look
};

/// The distance at which `f` turns negative, on its negative side and within a part in a million;
/// nothing where it is not negative at any look. `at_zero` = f(0) >= 0.
/// Method of closing in: false position with halved ends (M. Dowell, P. Jarratt, A modified regula
/// falsi method, BIT 11 (1971); citation from memory), with bisection where it creeps.
template <typename Function>
std::optional<double> first_failure(Function&& f, double at_zero, const RoomSearch& search) {
    double good = 0.0;
    double f_good = at_zero;
    double bad = 0.0;
    double f_bad = 0.0;
    for (double x = search.first;; x *= search.growth) {
        x = std::fmin(x, search.farthest);
        const double here = f(x);
        if (here < 0.0) {
            bad = x;
            f_bad = here;
            break;
        }
        if (x >= search.farthest)
            return {};
        good = x;
        f_good = here;
    }
    constexpr double precision = 1e-6;
    constexpr int most_steps = 60;
    bool was_bad = false;
    for (int step = 0; step < most_steps && bad - good > precision * bad; ++step) {
        constexpr int creeping = 10; // by then false position is through where it works at all
        const double part = step < creeping && f_good > f_bad ? f_good / (f_good - f_bad) : 0.5;
        // At an end nothing would be learnt; a little inside closes the bracket from its far side.
        const double inner = 0.5 * precision;
        const double x = good + std::fmin(std::fmax(part, inner), 1.0 - inner) * (bad - good);
        const double here = f(x);
        const bool is_bad = here < 0.0;
        if (is_bad) {
            bad = x;
            f_bad = here;
            f_good = was_bad && step > 0 ? 0.5 * f_good : f_good;
        } else {
            good = x;
            f_good = here;
            f_bad = !was_bad && step > 0 ? 0.5 * f_bad : f_bad;
        }
        was_bad = is_bad;
    }
    return bad;
}

} // namespace cornerwright
