#include "core/loop/crossings.h"

#include "core/loop/curve_search.h"

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;
/// Below this L counts as 0, where its sign at pi/Ts would be a matter of rounding.
constexpr double zero_loop = 1e-10;

/// A zero of L nearer to the axis than this part of its modulus lies on it but for rounding: L is 0
/// there, not negative, however its phase passes.
constexpr double on_axis = 1e-9;

bool is_zero_of_loop(const CurvePoint& point) {
    return std::abs(point.slope_after) * point.w_rad_s > 1.0 / on_axis;
}

struct LogMagnitude {
    static double value(const CurvePoint& p) { return p.loop_log; }
    static double before(const CurvePoint& p) { return p.slope_before.real(); }
    static double after(const CurvePoint& p) { return p.slope_after.real(); }
};

struct Phase {
    static double value(const CurvePoint& p) { return p.loop_phase_rad; }
    static double before(const CurvePoint& p) { return p.slope_before.imag(); }
    static double after(const CurvePoint& p) { return p.slope_after.imag(); }
};

/// The half-open band [pi + 2 pi k, pi + 2 pi (k + 1)) in which a phase lies.
double band_of(double phase_rad) {
    return std::floor((phase_rad - pi) / (2.0 * pi));
}

class Search {
  public:
    explicit Search(const LoopCurve& curve) : curve_(curve) {}

    Crossings run() {
        const auto& points = curve_.points;
        if (curve_.loop_at_zero && *curve_.loop_at_zero < 0.0)
            add_zero_frequency();
        for (std::size_t i = 0; i + 1 < points.size(); ++i) {
            if (points[i].gap_after)
                continue;
            gain_between(points[i], points[i + 1]);
            const bool closes_at_half_rate =
                curve_.ends_at_half_rate && !curve_.measured && i + 2 == points.size();
            if (!closes_at_half_rate && !phases_complete())
                phase_between(points[i], points[i + 1]);
        }
        if (curve_.ends_at_half_rate && !curve_.measured) {
            const Complex end = points.back().loop;
            if (end.real() < -zero_loop)
                found_.phase.push_back(points.back());
        }
        return std::move(found_);
    }

  private:
    void add_zero_frequency() {
        CurvePoint point;
        point.loop = *curve_.loop_at_zero;
        point.loop_log = std::log(-*curve_.loop_at_zero);
        point.loop_phase_rad = pi;
        found_.phase.push_back(point);
    }

    bool phases_complete() const {
        return !found_.phase.empty() && found_.phase.back().w_rad_s > curve_.listed_up_to_rad_s;
    }

    void gain_between(const CurvePoint& a, const CurvePoint& b) {
        const LogMagnitude log{};
        const bool a_above = a.loop_log >= 0.0;
        if (a_above != (b.loop_log >= 0.0)) {
            found_.gain.push_back(passage_between(curve_, log, a, b, 0.0));
            return;
        }
        const double towards = a_above ? -1.0 : 1.0;
        if (log.after(a) * towards <= 0.0 || log.before(b) * towards >= 0.0)
            return;
        if ((reach_between(log, a, b) >= 0.0) == a_above)
            return;
        const CurvePoint turn = extremum_between(curve_, log, a, b);
        if ((turn.loop_log >= 0.0) == a_above)
            return;
        found_.gain.push_back(passage_between(curve_, log, a, turn, 0.0));
        found_.gain.push_back(passage_between(curve_, log, turn, b, 0.0));
    }

    void phase_between(const CurvePoint& a, const CurvePoint& b) {
        const Phase phase{};
        const bool turns = phase.after(a) * phase.before(b) < 0.0;
        const double reach = turns ? reach_between(phase, a, b) : a.loop_phase_rad;
        if (turns && (band_of(reach) != band_of(a.loop_phase_rad) ||
                      band_of(reach) != band_of(b.loop_phase_rad))) {
            const CurvePoint turn = extremum_between(curve_, phase, a, b);
            monotone_phase(a, turn);
            monotone_phase(turn, b);
            return;
        }
        monotone_phase(a, b);
    }

    void monotone_phase(const CurvePoint& a, const CurvePoint& b) {
        const double from = band_of(a.loop_phase_rad);
        const double to = band_of(b.loop_phase_rad);
        const double step = to > from ? 1.0 : -1.0;
        for (double band = from; band != to; band += step) {
            // Between two bands lies the lower edge of the upper one.
            const double level = pi + 2.0 * pi * std::max(band, band + step);
            const CurvePoint crossing = passage_between(curve_, Phase{}, a, b, level);
            if (!is_zero_of_loop(crossing))
                found_.phase.push_back(crossing);
            if (phases_complete())
                return;
        }
    }

    const LoopCurve& curve_;
    Crossings found_;
};

} // namespace

Crossings crossings_of(const LoopCurve& curve) {
    return Search(curve).run();
}

} // namespace cornerwright
