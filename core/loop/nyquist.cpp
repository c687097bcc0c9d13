#include "core/loop/nyquist.h"

#include "core/numerics/number_text.h"

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;
constexpr double widest_step = pi / 3.0;
constexpr double boundary = 1e-9; ///< of 1: nearer to -1 counts as on it
/// Left-over angles that the declared integrators may leave unexplained at the first point.
constexpr double unexplained = 0.6 * pi;

Complex difference_of(const CurvePoint& point) {
    return 1.0 + point.loop;
}

double step_between(const CurvePoint& a, const CurvePoint& b) {
    // Without the product of sizes, which may leave the range of a double.
    const Complex da = difference_of(a) / std::abs(difference_of(a));
    const Complex db = difference_of(b) / std::abs(difference_of(b));
    return std::arg(db * std::conj(da));
}

class Accumulation {
  public:
    explicit Accumulation(const LoopCurve& curve) : curve_(curve) {}

    double turn() {
        const auto& points = curve_.points;
        double sum = 0.0;
        for (std::size_t i = 0; i + 1 < points.size(); ++i) {
            note_distance(points[i]);
            sum += points[i].gap_after ? across_gap(points[i], points[i + 1])
                                       : halved(points[i], points[i + 1], 0);
        }
        note_distance(points.back());
        return sum;
    }

    bool touches() const { return nearest_ < boundary; }

  private:
    void note_distance(const CurvePoint& point) {
        nearest_ = std::min(nearest_, std::abs(difference_of(point)));
    }

    double halved(const CurvePoint& a, const CurvePoint& b, int depth) {
        constexpr int deepest = 60;
        const double direct = step_between(a, b);
        // A turn of L itself beyond half a circle would hide behind a small principal angle.
        const bool loop_turns = std::abs(b.loop_phase_rad - a.loop_phase_rad) > pi / 2.0 &&
                                std::max(std::abs(a.loop), std::abs(b.loop)) > 0.5;
        if ((std::abs(direct) < widest_step && !loop_turns) || depth == deepest)
            return direct;
        const CurvePoint middle = curve_.at(0.5 * (a.w_rad_s + b.w_rad_s));
        note_distance(middle);
        if (middle.w_rad_s <= a.w_rad_s || middle.w_rad_s >= b.w_rad_s)
            return direct;
        return halved(a, middle, depth + 1) + halved(middle, b, depth + 1);
    }

    /// Past an axis pole L swings round on a circle without end, by the phase that the pole takes;
    /// past a zero of L, 1 + L stays at 1.
    static double across_gap(const CurvePoint& a, const CurvePoint& b) {
        const double direct = step_between(a, b);
        if (a.loop_log < 0.0 || b.loop_log < 0.0)
            return direct;
        const double nominal = b.loop_phase_rad - a.loop_phase_rad;
        return nominal + std::remainder(direct - nominal, 2.0 * pi);
    }

    const LoopCurve& curve_;
    double nearest_ = HUGE_VAL;
};

struct Closing {
    double angle = 0.0;
    std::string reason;
};

/// From the positive real axis of s, round the integrators on the right, to the first point.
Closing close_below(const LoopCurve& curve) {
    const CurvePoint& first = curve.points.front();
    double start = 0.0; // angle of 1 + L at a small positive s
    if (curve.integrators > 0)
        start = curve.low_gain < 0.0 ? pi : 0.0;
    else if (curve.loop_at_zero)
        start = *curve.loop_at_zero < -1.0 ? pi : 0.0;
    else if (curve.integrators == 0 && curve.low_gain < 0.0 && first.loop_log > 0.0)
        start = pi;
    const double nominal = start - 0.5 * pi * std::max(0, curve.integrators);
    const double rest = std::remainder(std::arg(difference_of(first)) - nominal, 2.0 * pi);
    Closing closing{nominal + rest - start, ""};
    if (curve.measured && std::abs(rest) > unexplained)
        closing.reason = "the phase at the first frequency, " + number_text(first.w_rad_s, 6) +
                         " rad/s, does not tell how the curve comes from w = 0";
    return closing;
}

/// From the last point to the positive real axis at infinity (or z = -1, where the point is real).
Closing close_above(const LoopCurve& curve) {
    const CurvePoint& last = curve.points.back();
    const double angle = -std::arg(difference_of(last));
    // A loop that ends in a constant ends on the real axis, on whichever side of -1.
    if (!curve.measured && (curve.realised || (curve.flat_end > 0.0 && !curve.turns_without_end)))
        return {std::remainder(angle, pi), ""};
    if (last.loop_log < 0.0)
        return {angle, ""};
    if (curve.measured)
        return {0.0, "|L| is still 1 or more at the last usable frequency, " +
                         number_text(last.w_rad_s, 6) + " rad/s"};
    return {angle, ""};
}

} // namespace

NyquistCount nyquist_count(const LoopCurve& curve) {
    NyquistCount count;
    const Closing below = close_below(curve);
    const Closing above = close_above(curve);
    count.reason = !above.reason.empty() ? above.reason : below.reason;
    if (!count.reason.empty())
        return count;
    Accumulation accumulation(curve);
    const double along = accumulation.turn();
    count.on_boundary = accumulation.touches();
    const double half_turns = (below.angle + along + above.angle) / pi;
    count.unstable_poles = curve.open_right_poles - static_cast<int>(std::lround(half_turns));
    return count;
}

} // namespace cornerwright
