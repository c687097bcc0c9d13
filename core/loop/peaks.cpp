#include "core/loop/peaks.h"

#include "core/loop/closed_loop_quantities.h"
#include "core/loop/curve_search.h"
#include "core/loop/decibel.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// A limit counts as reached where the curve exceeds it by no more than rounding, in nepers.
constexpr double rounding = 1e-12;

struct Supremum {
    double log_value = -HUGE_VAL;
    double w_rad_s = 0.0;
    CurvePoint at;
    bool on_edge = false; ///< the first or the last point of the range
};

/// Supremum over the points `first`..`last` and all local maxima between them.
template <typename Quantity>
Supremum highest_between(const LoopCurve& curve, const Quantity& quantity,
                         const std::vector<double>& values, std::size_t first, std::size_t last) {
    const auto& points = curve.points;
    Supremum best;
    for (std::size_t i = first; i <= last; ++i)
        if (values[i] > best.log_value)
            best = {values[i], points[i].w_rad_s, points[i], i == first || i == last};
    for (std::size_t i = first; i < last; ++i) {
        const CurvePoint& a = points[i];
        const CurvePoint& b = points[i + 1];
        if (a.gap_after || !(quantity.after(a) > 0.0) || !(quantity.before(b) < 0.0))
            continue;
        // The tangents bound a rounded maximum; a sharp one between two points is not so bounded,
        // therefore the doubled reach.
        if (std::max(reach_between(quantity, a, b), values[i + 1]) < best.log_value)
            continue;
        const CurvePoint top = extremum_between(curve, quantity, a, b);
        const double value = quantity.value(top);
        if (value >= best.log_value)
            best = {value, top.w_rad_s, top, false};
    }
    return best;
}

struct PeakFigures {
    Figure value;
    Figure place;
};

Figure decibels(double nepers) {
    return Figure::of(nepers * db_per_neper);
}

PeakFigures undetermined_peak(const std::string& reason) {
    return {Figure::undetermined(reason), Figure::undetermined(reason)};
}

/// A supremum together with the limits at the ends of the axis.
PeakFigures with_limits(const Supremum& inside, std::optional<double> at_zero,
                        std::optional<double> at_end) {
    const double low = at_zero ? std::log(*at_zero) : -HUGE_VAL;
    const double high = at_end ? std::log(*at_end) : -HUGE_VAL;
    if (std::max(low, high) < inside.log_value - rounding)
        return {decibels(inside.log_value), Figure::of(inside.w_rad_s)};
    if (low >= high)
        return {decibels(low), Figure::of(0.0)};
    return {decibels(high), Figure::infinite()};
}

/// Peak over the whole axis. Of a measurement a maximum on the edge of the data is no peak: beyond
/// the edge the curve may go on rising.
template <typename Quantity>
PeakFigures whole_peak(const LoopCurve& curve, const Quantity& quantity,
                       const std::vector<double>& values, std::optional<double> at_zero,
                       std::optional<double> at_end) {
    const Supremum best = highest_between(curve, quantity, values, 0, values.size() - 1);
    if (curve.measured && best.on_edge) {
        const bool at_low_edge = best.w_rad_s == curve.points.front().w_rad_s;
        const bool explained = at_low_edge ? at_zero.has_value() : curve.ends_at_half_rate;
        if (!explained)
            return undetermined_peak("the curve is highest at the edge of the data, " +
                                     number_text(best.w_rad_s, 6) +
                                     " rad/s, and may go on rising beyond it");
    }
    PeakFigures peak = with_limits(best, at_zero, at_end);
    if (curve.interpolation() && peak.place.is_value() && peak.place.value() > 0.0) {
        const double error = curve.interpolation()->random_error(peak.place.value()).value_or(0.0);
        // A relative error of L moves ln|S| by |T| times it, ln|T| by |S| times it.
        const Complex share =
            std::is_same_v<Quantity, Complementary> ? best.at.sensitivity : best.at.complementary;
        peak.value = peak.value.with_standard_deviation(error * std::abs(share) * db_per_neper);
    }
    return peak;
}

/// Index of the last point at or below `w`.
std::size_t index_below(const LoopCurve& curve, double w) {
    const auto above = std::upper_bound(
        curve.points.begin(), curve.points.end(), w,
        [](double place, const CurvePoint& point) { return place < point.w_rad_s; });
    return static_cast<std::size_t>(std::max<std::ptrdiff_t>(above - curve.points.begin(), 1) - 1);
}

/// Adds what lies between the point `from` and the place `w`: its own value, and a maximum on the
/// way there.
template <typename Quantity>
void extend_to(const LoopCurve& curve, const Quantity& quantity, const CurvePoint& from, double w,
               Supremum& best) {
    const CurvePoint end = curve.at(w);
    const auto take = [&](const CurvePoint& point) {
        if (quantity.value(point) > best.log_value)
            best = {quantity.value(point), point.w_rad_s, point, false};
    };
    take(end);
    const CurvePoint& low = w < from.w_rad_s ? end : from;
    const CurvePoint& high = w < from.w_rad_s ? from : end;
    if (quantity.after(low) > 0.0 && quantity.before(high) < 0.0)
        take(extremum_between(curve, quantity, low, high));
}

PeakFigures rejection(const LoopCurve& curve, const CurveLevels& levels, double up_to) {
    const auto& points = curve.points;
    const double last = points.back().w_rad_s;
    if (curve.measured && !(up_to >= points.front().w_rad_s))
        return undetermined_peak("the data begin above " + number_text(up_to, 6) + " rad/s");
    if (curve.measured && up_to > last && !curve.ends_at_half_rate)
        return undetermined_peak("the data end below " + number_text(up_to, 6) + " rad/s");
    const std::size_t index = up_to >= last ? points.size() - 1 : index_below(curve, up_to);
    Supremum best;
    if (points.front().w_rad_s <= up_to)
        best = highest_between(curve, Sensitivity{}, levels.sensitivity, 0, index);
    if (up_to < last)
        extend_to(curve, Sensitivity{}, points[index], up_to, best);
    const bool to_the_end = up_to >= last && !curve.ends_at_half_rate;
    return with_limits(best, curve.at_zero.sensitivity,
                       to_the_end ? curve.at_end.sensitivity : std::nullopt);
}

PeakFigures roll_off(const LoopCurve& curve, const CurveLevels& levels, double from) {
    const auto& points = curve.points;
    const double first = points.front().w_rad_s;
    const double last = points.back().w_rad_s;
    if (curve.measured && from > last && !curve.ends_at_half_rate)
        return undetermined_peak("the data end below " + number_text(from, 6) + " rad/s");
    if (curve.measured && from < first)
        return undetermined_peak("the data begin above " + number_text(from, 6) + " rad/s");
    if (curve.realised && from > last)
        return undetermined_peak("a sampled loop ends at pi/Ts, " + number_text(last, 6) +
                                 " rad/s");
    Supremum best;
    if (from > last) {
        const double value = Complementary::value(curve.at(from));
        best.log_value = value;
        best.w_rad_s = from;
    } else {
        const std::size_t index = from <= first ? 0 : index_below(curve, from) + 1;
        if (index < points.size())
            best = highest_between(curve, Complementary{}, levels.complementary, index,
                                   points.size() - 1);
        if (from > first && index < points.size())
            extend_to(curve, Complementary{}, points[index], from, best);
        else if (from > first)
            best = {Complementary::value(points.back()), last, points.back(), false};
    }
    PeakFigures peak = with_limits(best, std::nullopt, curve.at_end.complementary);
    if (curve.measured && !curve.ends_at_half_rate)
        peak.value =
            peak.value.with_note("up to the end of the data, " + number_text(last, 6) + " rad/s");
    return peak;
}

/// The lowest frequency at which ln|T| falls through `level`.
std::optional<double> first_fall(const LoopCurve& curve, const std::vector<double>& values,
                                 double level) {
    const Complementary quantity{};
    const auto& points = curve.points;
    for (std::size_t i = 0; i + 1 < points.size(); ++i) {
        const CurvePoint& a = points[i];
        const CurvePoint& b = points[i + 1];
        if (values[i] < level)
            continue;
        if (values[i + 1] < level)
            return a.gap_after ? b.w_rad_s : passage_between(curve, quantity, a, b, level).w_rad_s;
        const bool dips = !a.gap_after && quantity.after(a) < 0.0 && quantity.before(b) > 0.0;
        if (!dips || reach_between(quantity, a, b) >= level)
            continue;
        const CurvePoint bottom = extremum_between(curve, quantity, a, b);
        if (quantity.value(bottom) < level)
            return passage_between(curve, quantity, a, bottom, level).w_rad_s;
    }
    return std::nullopt;
}

Figure bandwidth(const LoopCurve& curve, const CurveLevels& levels) {
    if (!curve.at_zero.complementary)
        return Figure::undetermined("T(0) would need data below the first measured frequency");
    const double start = *curve.at_zero.complementary;
    if (start == 0.0)
        return Figure::undetermined("T(0) is 0");
    if (start == HUGE_VAL)
        return Figure::undetermined("T(0) is infinite");
    const double level = std::log(start) - 0.5 * std::log(2.0);
    if (levels.complementary.front() < level) {
        if (curve.measured)
            return Figure::undetermined("|T| has fallen before the first measured frequency");
        constexpr double near_zero = 1e-9;
        const CurvePoint& first = curve.points.front();
        const CurvePoint below = curve.at(first.w_rad_s * near_zero);
        return Figure::of(passage_between(curve, Complementary{}, below, first, level).w_rad_s);
    }
    if (const auto w = first_fall(curve, levels.complementary, level))
        return Figure::of(*w);
    if (curve.measured && !curve.ends_at_half_rate)
        return Figure::undetermined("|T| does not fall below |T(0)|/sqrt 2 within the data");
    return Figure::infinite();
}

} // namespace

CurveLevels levels_of(const LoopCurve& curve) {
    CurveLevels levels;
    levels.sensitivity.reserve(curve.points.size());
    levels.complementary.reserve(curve.points.size());
    levels.control_effort.reserve(curve.points.size());
    for (const CurvePoint& point : curve.points) {
        const double sensitivity = log_sensitivity(point);
        levels.sensitivity.push_back(sensitivity);
        levels.complementary.push_back(point.loop_log + sensitivity);
        levels.control_effort.push_back(point.compensator_log + sensitivity);
    }
    return levels;
}

void add_peaks(const LoopCurve& curve, const CurveLevels& levels, const FigureRequest& request,
               FrequencyFigures& figures) {
    const auto set = [](const PeakFigures& peak, Figure& value, Figure& place) {
        value = peak.value;
        place = peak.place;
    };
    set(whole_peak(curve, Sensitivity{}, levels.sensitivity, curve.at_zero.sensitivity,
                   curve.at_end.sensitivity),
        figures.sensitivity_peak_db, figures.sensitivity_peak_at_rad_s);
    set(whole_peak(curve, Complementary{}, levels.complementary, curve.at_zero.complementary,
                   curve.at_end.complementary),
        figures.complementary_peak_db, figures.complementary_peak_at_rad_s);
    set(whole_peak(curve, ControlEffort{}, levels.control_effort, curve.at_zero.control_effort,
                   curve.at_end.control_effort),
        figures.control_effort_peak_db, figures.control_effort_peak_at_rad_s);
    figures.bandwidth_rad_s = bandwidth(curve, levels);
    for (const double up_to : request.rejection_up_to_rad_s) {
        const PeakFigures peak = rejection(curve, levels, up_to);
        figures.rejections_db.push_back(peak.value);
        figures.rejections_at_rad_s.push_back(peak.place);
    }
    for (const double from : request.roll_off_from_rad_s) {
        const PeakFigures peak = roll_off(curve, levels, from);
        figures.roll_offs_db.push_back(peak.value);
        figures.roll_offs_at_rad_s.push_back(peak.place);
    }
}

} // namespace cornerwright
