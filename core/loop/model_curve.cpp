#include "core/loop/model_curve.h"

#include "core/loop/end_limits.h"
#include "core/loop/frequency_axis.h"
#include "core/loop/point_of_loop.h"
#include "core/loop/sampled_plant.h"
#include "core/response/frequency_grid.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;
/// The grid reaches this factor beyond the outermost corner, and out to where |L| has left this
/// distance from 1 on its last asymptote, so that no crossing lies outside.
constexpr double margin_beyond_corners = 100.0;
constexpr double far_from_unity = 1e3;
/// A loop that is flat at an end may pass 1 far beyond its corners where the constant is nearly 1:
/// the search goes on this far, a decade at a time, to a distance of 1e-12 of 1.
constexpr double flat_search_decades = 4.0;
constexpr double listed_level = 0.01;  // -40 dB, the contract's end of the list of crossings
constexpr double points_a_turn = 10.0; // of dead-time phase, where |L| matters
constexpr double most_turns = 1000.0;
constexpr double gap = 1e-9;           // relative half-width left out around an axis root
constexpr double half_rate_gap = 1e-7; // last search point before pi/Ts, where phase noise ends

/// Everything a model's loop is evaluated from.
struct Functions {
    RootForm compensator_roots;
    RootForm plant_roots;
    RationalResponse compensator;
    RationalResponse plant;
    FrequencyAxis axis;
    HoldAndDelay lag;

    RootForm loop_roots() const { return compensator_roots * plant_roots; }
};

class ModelCurve : public LoopCurve {
  public:
    ModelCurve(Functions functions, const ComplexVector& closed_loop_roots);

    CurvePoint at(double w_rad_s) const override;

    void close_at_half_rate(Complex compensator, Complex plant);

  private:
    void describe_ends();
    double magnitude_bound(double w_rad_s) const;
    void bound_turns(const std::vector<GridGuide>& guides, double low, double high);
    void add_breaks(std::vector<double>& grid, double low, double high);
    void evaluate(const std::vector<double>& grid);

    Functions f_;
    double search_end_ = HUGE_VAL;
    double drawn_from_ = 0.0;
    double drawn_to_ = HUGE_VAL;
    std::vector<double> breaks_;
};

std::vector<GridGuide> guides_of(const Functions& f, const ComplexVector& closed_loop_roots) {
    std::vector<GridGuide> guides;
    const auto add = [&](const ComplexVector& roots) {
        for (const Complex& root : roots)
            if (root.imag() >= 0.0 && root != 0.0 && std::isfinite(std::abs(root)))
                guides.push_back(f.axis.guide(root));
    };
    add(f.compensator_roots.zeros);
    add(f.compensator_roots.poles);
    add(f.plant_roots.zeros);
    add(f.plant_roots.poles);
    add(closed_loop_roots);
    if (!f.axis.sampled() && f.lag.lag_s() > 0.0)
        guides.push_back({1.0 / f.lag.lag_s(), 1.0 / f.lag.lag_s()});
    return guides;
}

/// Where an asymptote gain * p^-order has gone as far from 1 as `far_from_unity`, towards the end
/// that `towards` names (-1: zero, 1: infinity); 0 where it is flat.
double far_place(const Asymptote& asymptote, int towards) {
    if (asymptote.order == 0)
        return 0.0;
    const double order = asymptote.order;
    // |L| grows towards an end where order * towards < 0.
    const double wanted = order * towards < 0.0 ? far_from_unity : 1.0 / far_from_unity;
    return std::pow(std::abs(asymptote.gain) / wanted, 1.0 / order);
}

Asymptote product(const Asymptote& a, const Asymptote& b) {
    return {a.order + b.order, a.gain * b.gain};
}

ModelCurve::ModelCurve(Functions functions, const ComplexVector& closed_loop_roots)
    : f_(std::move(functions)) {
    realised = f_.axis.sampled();
    turns_without_end = !realised && f_.lag.lag_s() > 0.0;
    describe_ends();

    std::vector<GridGuide> guides = guides_of(f_, closed_loop_roots);
    const Asymptote low_end = product(f_.compensator.at_zero(), f_.plant.at_zero());
    const Asymptote high_end = product(f_.compensator.at_infinity(), f_.plant.at_infinity());
    if (guides.empty()) {
        const double unity = std::pow(std::abs(low_end.gain), 1.0 / std::max(1, low_end.order));
        guides.push_back({f_.axis.w_rad_s(unity), f_.axis.w_rad_s(unity)});
    }
    double low = HUGE_VAL;
    double high = 0.0;
    for (const GridGuide& guide : guides) {
        low = std::min(low, guide.w_rad_s / margin_beyond_corners);
        high = std::max(high, guide.w_rad_s * margin_beyond_corners);
    }
    if (low_end.order != 0)
        low = std::min(low, f_.axis.w_rad_s(far_place(low_end, -1)));
    if (realised)
        high = f_.axis.end_rad_s() * (1.0 - half_rate_gap);
    else if (high_end.order != 0)
        high = std::max(high, far_place(high_end, 1));

    std::vector<double> grid = guided_grid(low, high, guides);
    if (low_end.order == 0)
        drawn_from_ = low;
    if (high_end.order == 0 && !realised && !turns_without_end)
        drawn_to_ = high;
    for (double decade = 1.0; decade <= flat_search_decades; ++decade) {
        if (drawn_from_ > 0.0)
            grid.push_back(low * std::pow(10.0, -decade));
        if (drawn_to_ < HUGE_VAL)
            grid.push_back(high * std::pow(10.0, decade));
    }
    if (turns_without_end)
        bound_turns(guides, low, high);
    add_breaks(grid, low, high);
    evaluate(grid);
}

void ModelCurve::describe_ends() {
    const Asymptote c0 = f_.compensator.at_zero();
    const Asymptote p0 = f_.plant.at_zero();
    const Asymptote l0 = product(c0, p0);
    at_zero = limits_towards(c0, l0, End::zero, false);
    integrators = l0.order;
    // On the bilinear axis s' = s Ts / 2 for small s, whether s stands for ln z / Ts or (z - 1)/Ts.
    low_gain = l0.gain * std::pow(f_.axis.rate(0.0), -l0.order);
    if (l0.order <= 0)
        loop_at_zero = l0.order == 0 ? l0.gain : 0.0;
    const RootForm all = f_.loop_roots();
    for (const Complex& pole : all.poles)
        open_right_poles += pole.real() > 0.0 ? 1 : 0;
    if (realised)
        return;
    const Asymptote c_end = f_.compensator.at_infinity();
    Asymptote l_end = product(c_end, f_.plant.at_infinity());
    if (f_.lag.hold_s > 0.0) // the hold's envelope is 2/(w Ts)
        l_end = product(l_end, {1, 2.0 / f_.lag.hold_s});
    at_end = limits_towards(c_end, l_end, End::infinity, turns_without_end);
    flat_end = l_end.order > 0 ? 0.0 : l_end.order == 0 ? std::abs(l_end.gain) : HUGE_VAL;
}

/// |L| without the lobes of the hold.
double ModelCurve::magnitude_bound(double w_rad_s) const {
    const double log_magnitude = f_.axis.at(f_.compensator, w_rad_s).log_magnitude +
                                 f_.axis.at(f_.plant, w_rad_s).log_magnitude;
    const double envelope =
        f_.lag.hold_s > 0.0 ? std::min(1.0, 2.0 / (w_rad_s * f_.lag.hold_s)) : 1.0;
    return std::exp(log_magnitude) * envelope;
}

/// Finds the last frequency at which |L| reaches the listed level, and where the search may stop.
void ModelCurve::bound_turns(const std::vector<GridGuide>& guides, double low, double high) {
    constexpr double step = 1.2;
    std::vector<double> places;
    for (double w = low; w < high; w *= step)
        places.push_back(w);
    places.push_back(high);
    for (const GridGuide& guide : guides)
        if (guide.w_rad_s > low && guide.w_rad_s < high)
            places.push_back(guide.w_rad_s);
    sort_and_thin(places);
    std::vector<double> magnitudes;
    magnitudes.reserve(places.size());
    for (const double w : places)
        magnitudes.push_back(magnitude_bound(w));
    const double highest = *std::max_element(magnitudes.begin(), magnitudes.end());
    const auto last_at = [&](double level) {
        std::size_t last = places.size() - 1;
        while (last > 0 && magnitudes[last] < level)
            --last;
        double end = places[last];
        double beyond = places[std::min(last + 1, places.size() - 1)];
        while (beyond - end > 1e-9 * beyond) {
            const double middle = std::sqrt(end * beyond);
            (magnitude_bound(middle) >= level ? end : beyond) = middle;
        }
        return end;
    };
    const double turn = 2.0 * pi / f_.lag.lag_s();
    const double most = most_turns * turn;
    const double level = listed_level * std::min(1.0, highest);
    const double end = last_at(level);
    listed_up_to_rad_s = std::min(end, most);
    if (end > most)
        remarks.push_back("Dead time or hold makes phase crossings without end: those above " +
                          std::to_string(most) + " rad/s are not listed.");
    // |T| of a weak loop may fall through |T(0)|/sqrt 2 below the listed level only.
    const double weak =
        loop_at_zero && *loop_at_zero != 0.0 ? 0.5 * std::abs(*loop_at_zero) : level;
    // Two whole turns contain the first crossing beyond the level for sure.
    search_end_ = std::min(last_at(std::min(level, weak)), most) + 2.0 * turn;
}

/// Adds what dead time, hold zeros and axis roots need, and drops points inside a gap.
void ModelCurve::add_breaks(std::vector<double>& grid, double low, double high) {
    for (const RationalResponse* response : {&f_.compensator, &f_.plant})
        for (const double place : response->axis_rad_s())
            breaks_.push_back(f_.axis.w_rad_s(place));
    if (turns_without_end) {
        const double step = 2.0 * pi / f_.lag.lag_s() / points_a_turn;
        for (double w = step; w < search_end_; w += step)
            grid.push_back(w);
        grid.push_back(search_end_);
        if (f_.lag.hold_s > 0.0) {
            const double lobe = 2.0 * pi / f_.lag.hold_s;
            for (double w = lobe; w < search_end_; w += lobe)
                breaks_.push_back(w);
        }
    }
    sort_and_thin(breaks_);
    std::erase_if(breaks_, [&](double w) { return w <= low || w >= std::max(high, search_end_); });
    std::erase_if(grid, [&](double w) {
        const auto above = std::lower_bound(breaks_.begin(), breaks_.end(), w * (1.0 - gap));
        return above != breaks_.end() && *above <= w * (1.0 + gap);
    });
    for (const double w : breaks_) {
        grid.push_back(w * (1.0 - gap));
        grid.push_back(w * (1.0 + gap));
    }
    sort_and_thin(grid);
    // Beyond the search the turns are not resolved: points there would only be drawn wrongly.
    if (turns_without_end)
        std::erase_if(grid, [&](double w) { return w > search_end_; });
}

void ModelCurve::evaluate(const std::vector<double>& grid) {
    std::vector<ResponseSample> compensator;
    std::vector<ResponseSample> plant;
    f_.axis.evaluate(f_.compensator, grid, compensator);
    f_.axis.evaluate(f_.plant, grid, plant);
    points.reserve(grid.size() + 1);
    for (std::size_t i = 0; i < grid.size(); ++i) {
        f_.lag.apply(grid[i], plant[i]);
        points.push_back(point_of_loop(grid[i], compensator[i], plant[i]));
        points.back().drawn = grid[i] >= drawn_from_ && grid[i] <= drawn_to_;
    }
    for (const double w : breaks_) {
        const auto before = std::lower_bound(
            points.begin(), points.end(), w,
            [](const CurvePoint& point, double place) { return point.w_rad_s < place; });
        if (before != points.begin())
            std::prev(before)->gap_after = true;
    }
}

CurvePoint ModelCurve::at(double w_rad_s) const {
    ResponseSample plant = f_.axis.at(f_.plant, w_rad_s);
    f_.lag.apply(w_rad_s, plant);
    return point_of_loop(w_rad_s, f_.axis.at(f_.compensator, w_rad_s), plant);
}

/// Appends pi/Ts, where both functions are real.
void ModelCurve::close_at_half_rate(Complex compensator, Complex plant) {
    const double w = f_.axis.end_rad_s();
    const CurvePoint& last = points.back();
    const auto sample = [](Complex value, double near_phase) {
        const double phase = pi * std::round(near_phase / pi);
        return ResponseSample{value.real(), std::log(std::abs(value.real())), phase, 0.0};
    };
    CurvePoint end =
        point_of_loop(w, sample(compensator, last.loop_phase_rad - last.plant_phase_rad),
                      sample(plant, last.plant_phase_rad));
    end.slope_before = end.slope_after = Complex(0.0, last.slope_after.imag());
    points.push_back(end);
    ends_at_half_rate = true;
}

} // namespace

std::unique_ptr<LoopCurve> model_curve(const DesignLoop& loop, const PlantModel& plant,
                                       const ComplexVector& closed_loop_poles) {
    Functions f;
    f.compensator_roots = loop.compensator;
    f.plant_roots = plant.roots;
    f.compensator = RationalResponse(f.compensator_roots);
    f.plant = RationalResponse(f.plant_roots);
    f.lag = {plant.dead_time_s + loop.computation_delay_s, loop.hold_period_s};
    return std::make_unique<ModelCurve>(std::move(f), closed_loop_poles);
}

std::unique_ptr<LoopCurve> model_curve(const RealisedLoop& loop,
                                       const ComplexVector& closed_loop_poles_z) {
    const double period = loop.compensator.sample_period_s;
    const RootForm compensator = roots_in_z_minus_1(loop.compensator);
    const std::shared_ptr<const SampledPlants> plants = sampled_plants_of(loop);
    const SampledPlant& sampled = plants->delayed;
    Functions f;
    f.compensator_roots = on_bilinear_axis(compensator);
    f.plant_roots = on_bilinear_axis(sampled.delta_form);
    f.compensator = RationalResponse(f.compensator_roots);
    f.plant = RationalResponse(f.plant_roots);
    f.axis = FrequencyAxis(period);
    f.lag = {sampled.whole_samples * period, 0.0};
    ComplexVector closed_loop_roots;
    for (const Complex& z : closed_loop_poles_z)
        if (z != Complex(-1.0, 0.0))
            closed_loop_roots.push_back((z - 1.0) / (z + 1.0));
    auto curve = std::make_unique<ModelCurve>(std::move(f), closed_loop_roots);
    constexpr double half_rate = -2.0; // z = -1
    curve->close_at_half_rate(evaluate(compensator, half_rate), evaluate(sampled, half_rate));
    return curve;
}

} // namespace cornerwright
