#include "core/loop/signal_search.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

constexpr double resolution = 1e-7; // of the scale
constexpr int deepest = 60;         // halvings of one interval

struct Interval {
    double begin, end;
    double at_begin, at_end;
    int depth = 0;
};

/// Ends of the first intervals: geometric, from a fraction of the fastest mode to the end.
std::vector<double> first_ends(const ModalSum& sum, double begin, double end) {
    double fastest = 0.0;
    for (const Mode& mode : sum.modes)
        fastest = std::max(fastest, std::abs(mode.rate));
    constexpr double growth = 1.5;
    constexpr int coarsest = 24; // equal parts at the far end
    std::vector<double> ends{begin};
    double step = fastest > 0.0 ? 0.5 / fastest : end - begin;
    while (ends.back() + step < end) {
        ends.push_back(ends.back() + step);
        step = std::min(step * growth, (end - begin) / coarsest);
    }
    ends.push_back(std::max(end, begin));
    return ends;
}

/// The intervals as a stack whose top is the earliest (or the latest).
std::vector<Interval> first_intervals(const ModalSum& sum, double begin, double end,
                                      bool earliest_on_top) {
    const std::vector<double> ends = first_ends(sum, begin, end);
    std::vector<Interval> intervals;
    double left = sum.value(ends[0]);
    for (std::size_t i = 1; i < ends.size(); ++i) {
        const double right = sum.value(ends[i]);
        intervals.push_back({ends[i - 1], ends[i], left, right});
        left = right;
    }
    if (earliest_on_top)
        std::reverse(intervals.begin(), intervals.end());
    return intervals;
}

/// Splits the top in two, `first` of which is looked at next.
void split_top(std::vector<Interval>& stack, const ModalSum& sum, bool earliest_first) {
    const Interval whole = stack.back();
    stack.pop_back();
    const double middle = 0.5 * (whole.begin + whole.end);
    const double value = sum.value(middle);
    const Interval left{whole.begin, middle, whole.at_begin, value, whole.depth + 1};
    const Interval right{middle, whole.end, value, whole.at_end, whole.depth + 1};
    stack.push_back(earliest_first ? right : left);
    stack.push_back(earliest_first ? left : right);
}

/// Root of f between a and b of unlike sign, by bisection safeguarding the secant.
template <typename Function>
double root_between(Function f, double a, double b) {
    double fa = f(a);
    double fb = f(b);
    for (int i = 0; i < deepest && b - a > 1e-12 * b; ++i) {
        double x = a - fa * (b - a) / (fb - fa);
        if (i % 3 == 2 || !(x > a && x < b))
            x = 0.5 * (a + b);
        const double fx = f(x);
        if ((fx < 0.0) == (fa < 0.0)) {
            a = x;
            fa = fx;
        } else {
            b = x;
            fb = fx;
        }
    }
    return 0.5 * (a + b);
}

} // namespace

ModalSearch::Extreme ModalSearch::largest(double sign) const {
    std::vector<Interval> stack = first_intervals(*sum, begin, end, true);
    Extreme best{begin, -HUGE_VAL};
    double width = 0.0;
    const auto consider = [&](double t, double value, double around) {
        if (value > best.value) {
            best = {t, value};
            width = around;
        }
    };
    for (const Interval& interval : stack) {
        consider(interval.begin, sign * interval.at_begin, interval.end - interval.begin);
        consider(interval.end, sign * interval.at_end, interval.end - interval.begin);
    }
    while (!stack.empty()) {
        const Interval top = stack.back();
        const double deviation = sum->deviation_from_line(top.begin, top.end);
        const double bound = std::max(sign * top.at_begin, sign * top.at_end) + deviation;
        if (bound <= best.value + resolution * scale || top.depth >= deepest) {
            stack.pop_back();
            continue;
        }
        split_top(stack, *sum, true);
        const Interval& left = stack.back();
        consider(left.end, sign * left.at_end, left.end - left.begin);
    }
    // The top of the bend by Newton's method on the slope, within what was searched.
    double t = best.t;
    for (int i = 0; i < 8; ++i) {
        const double bend = sign * sum->curvature(t);
        if (!(bend < 0.0))
            break;
        const double next = t - sign * sum->slope(t) / bend;
        if (!(next >= begin && next <= end && std::abs(next - best.t) <= width))
            break;
        t = next;
    }
    consider(t, sign * sum->value(t), 0.0);
    return best;
}

std::optional<double> ModalSearch::first_reaching(double level, double sign) const {
    if (sign * sum->value(begin) >= level)
        return begin;
    std::vector<Interval> stack = first_intervals(*sum, begin, end, true);
    while (!stack.empty()) {
        const Interval top = stack.back();
        const double deviation = sum->deviation_from_line(top.begin, top.end);
        if (std::max(sign * top.at_begin, sign * top.at_end) + deviation < level) {
            stack.pop_back();
            continue;
        }
        if (deviation > resolution * scale && top.depth < deepest) {
            split_top(stack, *sum, true);
            continue;
        }
        if (sign * top.at_end >= level)
            return root_between([&](double t) { return sign * sum->value(t) - level; }, top.begin,
                                top.end);
        stack.pop_back();
    }
    return std::nullopt;
}

std::optional<double> ModalSearch::last_outside(double middle, double band) const {
    const auto outside = [&](double value) { return std::abs(value - middle) - band; };
    std::vector<Interval> stack = first_intervals(*sum, begin, end, false);
    while (!stack.empty()) {
        const Interval top = stack.back();
        const double deviation = sum->deviation_from_line(top.begin, top.end);
        if (std::max(outside(top.at_begin), outside(top.at_end)) + deviation < 0.0) {
            stack.pop_back();
            continue;
        }
        if (outside(top.at_end) >= 0.0)
            return top.end;
        if (deviation > resolution * scale && top.depth < deepest) {
            split_top(stack, *sum, false);
            continue;
        }
        if (outside(top.at_begin) >= 0.0)
            return root_between([&](double t) { return outside(sum->value(t)); }, top.begin,
                                top.end);
        stack.pop_back();
    }
    return std::nullopt;
}

double envelope_below(const ModalSum& sum, double level, double begin) {
    if (sum.envelope(begin) <= level)
        return begin;
    double slowest = HUGE_VAL;
    for (const Mode& mode : sum.modes)
        if (mode.rate != 0.0)
            slowest = std::min(slowest, std::abs(mode.rate.real()));
    if (!std::isfinite(sum.envelope(begin)) || slowest == 0.0)
        return HUGE_VAL;
    double low = begin;
    double step = 1.0 / slowest;
    while (sum.envelope(low + step) > level) {
        low += step;
        step *= 2.0;
    }
    double high = low + step;
    constexpr int halvings = 12; // the end need not be sharp
    for (int i = 0; i < halvings; ++i) {
        const double middle = 0.5 * (low + high);
        (sum.envelope(middle) > level ? low : high) = middle;
    }
    return high;
}

} // namespace cornerwright
