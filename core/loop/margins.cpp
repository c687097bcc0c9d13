#include "core/loop/margins.h"

#include "core/loop/decibel.h"
#include "core/numerics/number_text.h"

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;

/// Wrapped to (-pi, pi].
double wrapped(double angle_rad) {
    const double rest = std::remainder(angle_rad, 2.0 * pi);
    return rest <= -pi ? pi : rest;
}

/// Relative random error of L at a crossing; 0 where none is known.
double random_error(const LoopCurve& curve, const CurvePoint& at) {
    if (!curve.interpolation())
        return 0.0;
    return curve.interpolation()->random_error(at.w_rad_s).value_or(0.0);
}

/// The error of a value read where another quantity passes its level: the two errors are
/// independent and equal, and the second moves the place by error / its slope.
double read_error(double error, double slope_of_value, double slope_of_place) {
    const double ratio = slope_of_place == 0.0 ? 0.0 : slope_of_value / slope_of_place;
    return error * std::sqrt(1.0 + ratio * ratio);
}

std::string beyond_measurement(const LoopCurve& curve) {
    return "it would need data above the last usable frequency " +
           number_text(curve.points.back().w_rad_s, 6) + " rad/s";
}

std::string below_measurement(const LoopCurve& curve) {
    return "it would need data below the first measured frequency " +
           number_text(curve.points.front().w_rad_s, 6) + " rad/s";
}

/// Why a gain crossover of a measured loop may lie outside the data; empty if none can.
std::string crossover_outside(const LoopCurve& curve, bool none_found) {
    if (!curve.measured)
        return "";
    const bool first_above = curve.points.front().loop_log >= 0.0;
    if (curve.points.back().loop_log >= 0.0)
        return "|L| is still above 1 at the end of the data: " + beyond_measurement(curve);
    if (curve.integrators > 0 && !first_above)
        return "the loop integrates but |L| is already below 1 at the start of the data: " +
               below_measurement(curve);
    if (curve.integrators < 0 && first_above)
        return "L(0) is 0 but |L| is already above 1 at the start of the data: " +
               below_measurement(curve);
    if (none_found && curve.integrators == 0)
        return "no gain crossover in the measured range: " + below_measurement(curve);
    return "";
}

void add_phase_margin(const LoopCurve& curve, const std::vector<CurvePoint>& crossovers,
                      FrequencyFigures& figures) {
    const std::string outside = crossover_outside(curve, crossovers.empty());
    if (!outside.empty()) {
        figures.phase_margin_deg = Figure::undetermined(outside);
        figures.phase_margin_at_rad_s = Figure::undetermined(outside);
        figures.delay_margin_s = Figure::undetermined(outside);
        return;
    }
    if (crossovers.empty()) {
        figures.phase_margin_deg = Figure::infinite();
        figures.phase_margin_at_rad_s = Figure::undetermined("|L| never is 1");
        figures.delay_margin_s = Figure::infinite();
        return;
    }
    const CurvePoint* worst = nullptr;
    const CurvePoint* soonest = nullptr;
    double margin = HUGE_VAL;
    double delay = HUGE_VAL;
    for (const CurvePoint& at : crossovers) {
        const double here = wrapped(at.loop_phase_rad + pi);
        if (std::abs(here) < std::abs(margin)) {
            margin = here;
            worst = &at;
        }
        const double lag = here > 0.0 ? here : here + 2.0 * pi;
        if (lag / at.w_rad_s < delay) {
            delay = lag / at.w_rad_s;
            soonest = &at;
        }
    }
    const auto phase_error = [&](const CurvePoint& at) {
        return read_error(random_error(curve, at), at.slope_after.imag(), at.slope_after.real());
    };
    figures.phase_margin_deg =
        Figure::of(margin * deg_per_rad).with_standard_deviation(phase_error(*worst) * deg_per_rad);
    figures.phase_margin_at_rad_s = Figure::of(worst->w_rad_s);
    figures.delay_margin_s =
        Figure::of(delay).with_standard_deviation(phase_error(*soonest) / soonest->w_rad_s);
}

/// Whether the loop below the data is the declared integrators' own straight line, so that no phase
/// crossing with |L| > 1 hides there.
bool low_end_is_clear(const LoopCurve& curve) {
    constexpr double agreement_rad = pi / 4.0;
    const CurvePoint& first = curve.points.front();
    const double rest = std::remainder(first.loop_phase_rad + 0.5 * pi * curve.integrators, pi);
    return curve.integrators >= 0 && curve.integrators <= 1 && std::abs(rest) < agreement_rad;
}

struct GainMargin {
    const CurvePoint* at = nullptr;
    double nepers = HUGE_VAL;
};

void set_gain_margin(const LoopCurve& curve, const GainMargin& margin, const std::string& outside,
                     Figure& value, Figure& place) {
    if (margin.at) {
        const double error =
            read_error(random_error(curve, *margin.at), margin.at->slope_after.real(),
                       margin.at->slope_after.imag());
        value =
            Figure::of(margin.nepers * db_per_neper).with_standard_deviation(error * db_per_neper);
        place = Figure::of(margin.at->w_rad_s);
    } else if (!outside.empty()) {
        value = Figure::undetermined(outside);
        place = Figure::undetermined(outside);
    } else {
        value = Figure::infinite();
        place = Figure::undetermined("L is nowhere real and negative there");
    }
}

} // namespace

void add_margins(const LoopCurve& curve, const Crossings& crossings, FrequencyFigures& figures) {
    for (const CurvePoint& at : crossings.gain)
        figures.crossovers_rad_s.push_back(at.w_rad_s);
    for (const CurvePoint& at : crossings.phase)
        figures.phase_crossings_rad_s.push_back(at.w_rad_s);
    add_phase_margin(curve, crossings.gain, figures);

    GainMargin increase;
    GainMargin reduction;
    for (const CurvePoint& at : crossings.phase) {
        GainMargin& margin = at.loop_log < 0.0 ? increase : reduction;
        if (std::abs(at.loop_log) < margin.nepers)
            margin = {&at, std::abs(at.loop_log)};
    }
    std::string increase_outside;
    std::string reduction_outside;
    if (curve.measured) {
        increase_outside =
            "no phase crossing with |L| < 1 in the data: " + beyond_measurement(curve);
        if (curve.points.back().loop_log >= 0.0)
            reduction_outside =
                "|L| is still above 1 at the end of the data: " + beyond_measurement(curve);
        else if (!low_end_is_clear(curve))
            reduction_outside =
                "no phase crossing with |L| > 1 in the data: " + below_measurement(curve);
    }
    set_gain_margin(curve, increase, increase_outside, figures.gain_margin_db,
                    figures.gain_margin_at_rad_s);
    set_gain_margin(curve, reduction, reduction_outside, figures.gain_reduction_margin_db,
                    figures.gain_reduction_margin_at_rad_s);
}

} // namespace cornerwright
