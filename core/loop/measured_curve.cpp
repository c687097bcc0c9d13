#include "core/loop/measured_curve.h"

#include "core/loop/end_limits.h"
#include "core/loop/frequency_axis.h"
#include "core/loop/point_of_loop.h"
#include "core/numerics/error.h"
#include "core/response/frequency_grid.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;
constexpr double gap = 1e-9; ///< relative half-width left out around a place where L is 0 or pole
/// A straight piece over which P turns further than this gets points of its own.
constexpr double widest_turn_rad = pi / 6.0;

struct Functions {
    RootForm compensator_roots;
    RationalResponse compensator;
    FrequencyAxis axis;
    HoldAndDelay lag;
};

class MeasuredCurve : public LoopCurve {
  public:
    MeasuredCurve(Functions functions, const MeasuredPlant& plant);

    CurvePoint at(double w_rad_s) const override;

  private:
    void describe_ends(const MeasuredPlant& plant);
    void add_nodes(double end);
    void add_between(double end);

    Functions f_;
};

MeasuredCurve::MeasuredCurve(Functions functions, const MeasuredPlant& plant)
    : f_(std::move(functions)) {
    if (!plant.response || plant.response->w_rad_s.size() < 2)
        throw InputError({}, "a measurement of at least two frequencies",
                         plant.response ? std::to_string(plant.response->w_rad_s.size())
                                        : std::string("none"));
    measured = true;
    realised = f_.axis.sampled();
    interpolation_ = std::make_shared<MeasuredInterpolation>(*plant.response);
    const double half_rate = f_.axis.end_rad_s();
    const double end = std::min(interpolation_->last_rad_s(), half_rate);
    if (end <= interpolation_->first_rad_s())
        throw InputError({}, "a measurement that begins below pi/Ts",
                         std::to_string(interpolation_->first_rad_s()) + " rad/s");
    ends_at_half_rate = half_rate <= interpolation_->last_rad_s();
    add_nodes(end);
    add_between(end);
    describe_ends(plant);
}

void MeasuredCurve::add_nodes(double end) {
    const MeasuredInterpolation& p = *interpolation_;
    for (std::size_t i = 0; i < p.size() && p.w_rad_s(i) <= end; ++i) {
        const double w = p.w_rad_s(i);
        ResponseSample plant = p.node(i);
        f_.lag.apply(w, plant);
        CurvePoint point = point_of_loop(w, f_.axis.at(f_.compensator, w), plant);
        if (i > 0)
            point.slope_before += (p.log_slope(i - 1) - p.log_slope(i)) / w;
        point.node = i;
        points.push_back(point);
    }
}

/// Points between the measured ones: where C has its roots, where L is 0 or infinite, where P turns
/// far over one piece, and at the end.
void MeasuredCurve::add_between(double end) {
    const double first = interpolation_->first_rad_s();
    std::vector<double> breaks;
    for (const double place : f_.compensator.axis_rad_s())
        breaks.push_back(f_.axis.w_rad_s(place));
    if (f_.lag.hold_s > 0.0 && !realised)
        for (double w = 2.0 * pi / f_.lag.hold_s; w < end; w += 2.0 * pi / f_.lag.hold_s)
            breaks.push_back(w);
    sort_and_thin(breaks);
    std::erase_if(breaks, [&](double w) { return w <= first || w >= end; });

    std::vector<GridGuide> guides;
    for (const ComplexVector* roots : {&f_.compensator_roots.zeros, &f_.compensator_roots.poles})
        for (const Complex& root : *roots)
            if (root.imag() >= 0.0 && root != 0.0)
                guides.push_back(f_.axis.guide(root));
    std::vector<double> extra;
    if (!guides.empty())
        extra = guided_grid(first, end, guides);
    extra.push_back(end);
    for (std::size_t i = 0; i + 1 < interpolation_->size(); ++i) {
        const double ratio = interpolation_->w_rad_s(i + 1) / interpolation_->w_rad_s(i);
        const Complex slope = interpolation_->log_slope(i);
        const double turn =
            std::abs(slope) * std::log(ratio) +
            f_.lag.lag_s() * (interpolation_->w_rad_s(i + 1) - interpolation_->w_rad_s(i));
        const int parts = static_cast<int>(std::min(1000.0, std::ceil(turn / widest_turn_rad)));
        for (int k = 1; k < parts; ++k)
            extra.push_back(interpolation_->w_rad_s(i) *
                            std::pow(ratio, static_cast<double>(k) / parts));
    }
    for (const double w : breaks) {
        extra.push_back(w * (1.0 - gap));
        extra.push_back(w * (1.0 + gap));
    }
    sort_and_thin(extra);

    const auto in_gap = [&](double w) {
        const auto above = std::lower_bound(breaks.begin(), breaks.end(), w * (1.0 - 0.5 * gap));
        return above != breaks.end() && *above <= w * (1.0 + 0.5 * gap);
    };
    std::vector<CurvePoint> nodes;
    nodes.swap(points);
    std::size_t next = 0;
    const auto take_node = [&] {
        if (!in_gap(nodes[next].w_rad_s))
            points.push_back(nodes[next]);
        ++next;
    };
    for (const double w : extra) {
        while (next < nodes.size() && nodes[next].w_rad_s <= w)
            take_node();
        if (w > end || in_gap(w) || (!points.empty() && points.back().w_rad_s == w))
            continue;
        points.push_back(at(w));
        points.back().drawn = false;
    }
    while (next < nodes.size())
        take_node();
    for (const double w : breaks) {
        const auto before = std::lower_bound(
            points.begin(), points.end(), w,
            [](const CurvePoint& point, double place) { return point.w_rad_s < place; });
        if (before != points.begin())
            std::prev(before)->gap_after = true;
    }
}

void MeasuredCurve::describe_ends(const MeasuredPlant& plant) {
    const Asymptote compensator = f_.compensator.at_zero();
    integrators = plant.integrators + compensator.order;
    for (const Complex& pole : f_.compensator_roots.poles)
        open_right_poles += pole.real() > 0.0 ? 1 : 0;
    open_right_poles += plant.unstable_poles;
    if (integrators > 0) {
        at_zero.sensitivity = 0.0;
        at_zero.complementary = 1.0;
    } else if (integrators < 0) {
        at_zero.sensitivity = 1.0;
        at_zero.complementary = 0.0;
    }
    // The sign of lim s^n L from the phase that the first point has left over.
    const CurvePoint& first = points.front();
    const double rest = std::remainder(first.loop_phase_rad + 0.5 * pi * integrators, 2.0 * pi);
    low_gain = std::abs(rest) < 0.5 * pi ? 1.0 : -1.0;
    // An integrator's size is not declared: only its sign is known.
}

CurvePoint MeasuredCurve::at(double w_rad_s) const {
    ResponseSample plant = interpolation_->at(w_rad_s);
    f_.lag.apply(w_rad_s, plant);
    return point_of_loop(w_rad_s, f_.axis.at(f_.compensator, w_rad_s), plant);
}

} // namespace

std::unique_ptr<LoopCurve> measured_curve(const DesignLoop& loop, const MeasuredPlant& plant) {
    Functions f;
    f.compensator_roots = loop.compensator;
    f.compensator = RationalResponse(f.compensator_roots);
    f.lag = {loop.computation_delay_s, loop.hold_period_s};
    return std::make_unique<MeasuredCurve>(std::move(f), plant);
}

std::unique_ptr<LoopCurve> measured_curve(const RealisedLoop& loop, const MeasuredPlant& plant) {
    Functions f;
    f.compensator_roots = on_bilinear_axis(roots_in_z_minus_1(loop.compensator));
    f.compensator = RationalResponse(f.compensator_roots);
    f.axis = FrequencyAxis(loop.compensator.sample_period_s);
    f.lag = {loop.computation_delay_s, loop.compensator.sample_period_s};
    return std::make_unique<MeasuredCurve>(std::move(f), plant);
}

} // namespace cornerwright
