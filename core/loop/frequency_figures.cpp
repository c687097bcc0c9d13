#include "core/loop/frequency_figures.h"

#include "core/loop/cancellation.h"
#include "core/loop/crossings.h"
#include "core/loop/decibel.h"
#include "core/loop/error_constants.h"
#include "core/loop/loop_curve.h"
#include "core/loop/margins.h"
#include "core/loop/peaks.h"
#include "core/loop/remarks.h"
#include "core/loop/sampled_plant.h"
#include "core/loop/stability.h"
#include "core/numerics/error.h"
#include "core/numerics/number_text.h"

#include <cmath>

namespace cornerwright {
namespace {

LoopCurves curves_of(const LoopCurve& curve, const CurveLevels& levels) {
    LoopCurves curves;
    const std::size_t size = curve.points.size();
    for (auto* list : {&curves.w_rad_s, &curves.plant_db, &curves.plant_phase_deg, &curves.loop_db,
                       &curves.loop_phase_deg, &curves.sensitivity_db, &curves.complementary_db,
                       &curves.control_effort_db})
        list->reserve(size);
    for (auto* list : {&curves.plant, &curves.compensator, &curves.loop})
        list->reserve(size);
    for (std::size_t i = 0; i < size; ++i) {
        const CurvePoint& point = curve.points[i];
        if (!point.drawn)
            continue;
        curves.w_rad_s.push_back(point.w_rad_s);
        curves.plant.push_back(point.plant);
        curves.compensator.push_back(point.compensator);
        curves.loop.push_back(point.loop);
        curves.plant_db.push_back(point.plant_log * db_per_neper);
        curves.plant_phase_deg.push_back(point.plant_phase_rad * deg_per_rad);
        curves.loop_db.push_back(point.loop_log * db_per_neper);
        curves.loop_phase_deg.push_back(point.loop_phase_rad * deg_per_rad);
        curves.sensitivity_db.push_back(levels.sensitivity[i] * db_per_neper);
        curves.complementary_db.push_back(levels.complementary[i] * db_per_neper);
        curves.control_effort_db.push_back(levels.control_effort[i] * db_per_neper);
    }
    return curves;
}

FrequencyAssessment assess_curve(const LoopCurve& curve, const MeasuredPlant* measured,
                                 const FigureRequest& request, Stability stability) {
    FrequencyAssessment result;
    result.stability = std::move(stability);
    const CurveLevels levels = levels_of(curve);
    add_margins(curve, crossings_of(curve), result.figures);
    add_peaks(curve, levels, request, result.figures);
    result.steady_state_error = steady_state_errors(curve);
    result.curves = curves_of(curve, levels);
    result.remarks = remarks_on(curve, measured, result.stability, result.figures);
    return result;
}

std::vector<LoopPoint> points_at(const LoopCurve& curve, std::span<const double> w_rad_s,
                                 double lowest, double highest, const std::string& why) {
    std::vector<LoopPoint> points;
    points.reserve(w_rad_s.size());
    for (const double w : w_rad_s) {
        if (!(w >= lowest && w <= highest && w > 0.0))
            throw InputError({}, why, number_text(w) + " rad/s");
        const CurvePoint point = curve.at(w);
        points.push_back({w, point.compensator, point.plant, point.loop, point.sensitivity,
                          point.complementary});
    }
    return points;
}

std::string range_text(double lowest, double highest) {
    return "a frequency from " + number_text(lowest) + " to " + number_text(highest) + " rad/s";
}

/// What is known of the roots of a measured loop: the compensator's and the declared integrators.
RootForm known_roots(RootForm compensator, const MeasuredPlant& plant) {
    compensator.poles.insert(compensator.poles.end(), static_cast<std::size_t>(plant.integrators),
                             Complex(0.0));
    return compensator;
}

} // namespace

FrequencyAssessment assess_frequency(const DesignLoop& loop, const FigureRequest& request,
                                     const ComplexVector& closed_loop_poles) {
    const std::unique_ptr<LoopCurve> curve = loop_curve(loop, closed_loop_poles);
    const auto* measured = std::get_if<MeasuredPlant>(&loop.plant);
    Stability stability;
    if (measured) {
        stability = with_hidden_factor(
            stability_from_curve(*curve),
            hidden_factor(known_roots(loop.compensator, *measured), RootPlane::s));
    } else {
        const RootForm roots = loop.compensator * std::get<PlantModel>(loop.plant).roots;
        const bool rational = !curve->turns_without_end;
        const bool algebraic_loop =
            rational && curve->at_end.sensitivity && std::isinf(*curve->at_end.sensitivity);
        if (algebraic_loop)
            stability = {false, "1 + L is 0 at infinity: the loop has no solution"};
        else if (rational && (!closed_loop_poles.empty() || roots.poles.empty()))
            stability = stability_from_poles(closed_loop_poles, false);
        else
            stability = stability_from_curve(*curve);
        stability = with_hidden_factor(std::move(stability), hidden_factor(roots, RootPlane::s));
    }
    return assess_curve(*curve, measured, request, std::move(stability));
}

FrequencyAssessment assess_frequency(const RealisedLoop& loop, const FigureRequest& request,
                                     const ComplexVector& closed_loop_poles_z) {
    const std::unique_ptr<LoopCurve> curve = loop_curve(loop, closed_loop_poles_z);
    const auto* measured = std::get_if<MeasuredPlant>(&loop.plant);
    Stability stability = measured || closed_loop_poles_z.empty()
                              ? stability_from_curve(*curve)
                              : stability_from_poles(closed_loop_poles_z, true);
    const RootForm compensator = roots_in_z_minus_1(loop.compensator);
    if (measured) {
        stability = with_hidden_factor(
            std::move(stability),
            hidden_factor(known_roots(compensator, *measured), RootPlane::z_minus_1));
    } else {
        const RootForm roots = compensator * sampled_plants_of(loop)->delayed.delta_form;
        stability =
            with_hidden_factor(std::move(stability), hidden_factor(roots, RootPlane::z_minus_1));
    }
    return assess_curve(*curve, measured, request, std::move(stability));
}

std::vector<LoopPoint> loop_points(const DesignLoop& loop, std::span<const double> w_rad_s) {
    const std::unique_ptr<LoopCurve> curve = loop_curve(loop, {});
    if (!curve->measured)
        return points_at(*curve, w_rad_s, 0.0, HUGE_VAL, "a frequency above 0");
    const MeasuredInterpolation& data = *curve->interpolation();
    return points_at(*curve, w_rad_s, data.first_rad_s(), data.last_rad_s(),
                     range_text(data.first_rad_s(), data.last_rad_s()));
}

std::vector<LoopPoint> loop_points(const RealisedLoop& loop, std::span<const double> w_rad_s) {
    const std::unique_ptr<LoopCurve> curve = loop_curve(loop, {});
    const double lowest = curve->measured ? curve->interpolation()->first_rad_s() : 0.0;
    const double highest = curve->points.back().w_rad_s;
    return points_at(*curve, w_rad_s, lowest, highest,
                     curve->measured
                         ? range_text(lowest, highest)
                         : "a frequency above 0, up to pi/Ts = " + number_text(highest) + " rad/s");
}

} // namespace cornerwright
