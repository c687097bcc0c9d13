#include "core/loop/step_signal.h"

#include <algorithm>
#include <array>
#include <cmath>

namespace cornerwright {
namespace {

/// The cubic between two points, on x in [0, 1].
struct Cubic {
    double c0, c1, c2, c3;
    double at(double x) const { return c0 + x * (c1 + x * (c2 + x * c3)); }

    /// Bounds on [0, 1]: those of the four Bernstein coefficients, whose hull holds the cubic.
    double low() const { return std::min(std::min(c0, b1()), std::min(b2(), b3())); }
    double high() const { return std::max(std::max(c0, b1()), std::max(b2(), b3())); }

  private:
    double b1() const { return c0 + c1 / 3.0; }
    double b2() const { return c0 + (2.0 * c1 + c2) / 3.0; }
    double b3() const { return c0 + c1 + c2 + c3; }
};

/// At most so many places on a cubic: its ends and where it turns between them.
class Places {
  public:
    void add(double x) { at_[size_++] = x; }
    std::size_t size() const { return size_; }
    double operator[](std::size_t i) const { return at_[i]; }
    const double* begin() const { return at_.data(); }
    const double* end() const { return at_.data() + size_; }

  private:
    std::array<double, 4> at_{};
    std::size_t size_ = 0;
};

Cubic between(const JoinedPoints& points, std::size_t i) {
    const double h = points.t_s[i + 1] - points.t_s[i];
    const double rise = points.value[i + 1] - points.value[i];
    const double first = points.slope[i] * h;
    const double second = points.slope[i + 1] * h;
    return {points.value[i], first, 3.0 * rise - 2.0 * first - second, first + second - 2.0 * rise};
}

/// Where the cubic turns inside (0, 1), ascending.
Places turning_points(const Cubic& cubic) {
    // c1 + 2 c2 x + 3 c3 x^2 = 0, by the form that does not cancel.
    const double half = cubic.c2;
    const double discriminant = half * half - 3.0 * cubic.c3 * cubic.c1;
    Places inside;
    if (discriminant < 0.0)
        return inside;
    const double q = -(half + std::copysign(std::sqrt(discriminant), half));
    const double one = q / (3.0 * cubic.c3);
    const double other = cubic.c1 / q;
    for (const double x : {std::min(one, other), std::max(one, other)})
        if (x > 0.0 && x < 1.0)
            inside.add(x);
    return inside;
}

/// x in [low, high] where the cubic minus `level` changes sign.
double crossing(const Cubic& cubic, double level, double low, double high) {
    const bool below = cubic.at(low) < level;
    constexpr int halvings = 50;
    for (int i = 0; i < halvings; ++i) {
        const double middle = 0.5 * (low + high);
        ((cubic.at(middle) < level) == below ? low : high) = middle;
    }
    return 0.5 * (low + high);
}

/// Ends of the pieces of a cubic that go one way, ascending.
Places monotone_ends(const Cubic& cubic) {
    Places ends;
    ends.add(0.0);
    for (const double x : turning_points(cubic))
        ends.add(x);
    ends.add(1.0);
    return ends;
}

double time_at(const JoinedPoints& points, std::size_t i, double x) {
    return points.t_s[i] + x * (points.t_s[i + 1] - points.t_s[i]);
}

constexpr double negligible = 1e-7; // of the size: what is left of a mode that no figure sees

} // namespace

double JoinedPoints::at(double t) const {
    const auto after = std::upper_bound(t_s.begin(), t_s.end(), t);
    if (after == t_s.begin())
        return value.front();
    if (after == t_s.end())
        return value.back();
    const auto i = static_cast<std::size_t>(after - t_s.begin()) - 1;
    return between(*this, i).at((t - t_s[i]) / (t_s[i + 1] - t_s[i]));
}

double StepSignal::at(double t) const {
    return t >= tail_from ? tail.value(t) : points.at(t);
}

double StepSignal::size() const {
    double largest_size = std::abs(final_value());
    for (const double v : points.value)
        largest_size = std::max(largest_size, std::abs(v));
    // Each mode is seen near its own time constants.
    for (const Mode& mode : tail.modes) {
        for (const double x : {0.0, 0.5, 1.0, 2.0, 4.0}) {
            const double rate = std::abs(mode.rate);
            if (rate > 0.0)
                largest_size = std::max(largest_size, std::abs(tail.value(tail_from + x / rate)));
        }
    }
    return largest_size > 0.0 ? largest_size : 1.0;
}

bool StepSignal::settles() const {
    return std::isfinite(tail.envelope(tail_from));
}

StepSignal::Extreme StepSignal::largest(double sign) const {
    Extreme best{0.0, -HUGE_VAL};
    for (std::size_t i = 0; i < points.t_s.size(); ++i) {
        if (sign * points.value[i] > best.value)
            best = {points.t_s[i], sign * points.value[i]};
        if (i + 1 == points.t_s.size() || points.t_s[i + 1] == points.t_s[i])
            continue;
        if (sign * points.slope[i] <= 0.0 || sign * points.slope[i + 1] >= 0.0)
            continue;
        const Cubic cubic = between(points, i);
        for (const double x : turning_points(cubic))
            if (sign * cubic.at(x) > best.value)
                best = {time_at(points, i, x), sign * cubic.at(x)};
    }
    const double scale = size();
    const double end = envelope_below(tail, negligible * scale, tail_from);
    const Extreme in_tail = ModalSearch{&tail, tail_from, end, scale}.largest(sign);
    if (in_tail.value > best.value)
        best = in_tail;
    if (sign * final_value() > best.value)
        best = {HUGE_VAL, sign * final_value()};
    return best;
}

std::optional<double> StepSignal::first_reaching(double level, double sign) const {
    for (std::size_t i = 0; i < points.t_s.size(); ++i) {
        if (sign * points.value[i] >= level)
            return points.t_s[i];
        if (i + 1 == points.t_s.size() || points.t_s[i + 1] == points.t_s[i])
            continue;
        const Cubic cubic = between(points, i);
        if (std::max(sign * cubic.low(), sign * cubic.high()) < level)
            continue;
        const Places ends = monotone_ends(cubic);
        for (std::size_t k = 0; k + 1 < ends.size(); ++k)
            if (sign * cubic.at(ends[k + 1]) >= level)
                return time_at(points, i, crossing(cubic, sign * level, ends[k], ends[k + 1]));
    }
    const double scale = size();
    const double end = envelope_below(tail, negligible * scale, tail_from);
    return ModalSearch{&tail, tail_from, end, scale}.first_reaching(level, sign);
}

double StepSignal::last_outside(double band) const {
    const double middle = final_value();
    const double end = envelope_below(tail, band, tail_from);
    if (const auto in_tail = ModalSearch{&tail, tail_from, end, size()}.last_outside(middle, band))
        return *in_tail;
    for (std::size_t i = points.t_s.size(); i-- > 0;) {
        if (i + 1 < points.t_s.size() && points.t_s[i + 1] > points.t_s[i]) {
            const Cubic cubic = between(points, i);
            if (middle - cubic.low() <= band && cubic.high() - middle <= band)
                continue;
            const Places ends = monotone_ends(cubic);
            for (std::size_t k = ends.size() - 1; k-- > 0;) {
                const double offset = cubic.at(ends[k]) - middle;
                if (std::abs(offset) <= band)
                    continue;
                return time_at(
                    points, i,
                    crossing(cubic, middle + std::copysign(band, offset), ends[k], ends[k + 1]));
            }
        }
        if (std::abs(points.value[i] - middle) > band)
            return points.t_s[i];
    }
    return 0.0;
}

} // namespace cornerwright
