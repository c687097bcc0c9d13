#include "core/loop/sampled_step.h"

#include "core/loop/common_roots.h"
#include "core/loop/held_plant.h"
#include "core/loop/sampled_plant.h"
#include "core/loop/steady_values.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

constexpr double agreement = 5e-5;        // of the size, between simulation and tail
constexpr double spent = 0.1 * agreement; // of a signal's size: a mode that no longer counts
constexpr double slow_turn = 0.3; // rad or time constants in a sample: the tail is smooth then
// In z - 1: what the rounding of coefficients and of z leaves of a cancelled root.
constexpr double same_place = 1e-13;
constexpr std::size_t first_check = 48; // samples
constexpr double most_pieces = 4e6;

/// A delay counted from the start of a sample.
struct Offset {
    std::size_t samples = 0;
    double rest_s = 0.0; ///< [0, period)
};

Offset offset_of(double delay_s, double period_s) {
    constexpr double rounding = 1e-12;
    const double ratio = delay_s / period_s;
    double whole = std::floor(ratio);
    if (ratio - whole > 1.0 - rounding * std::max(1.0, ratio))
        whole += 1.0;
    double rest = std::max(0.0, delay_s - whole * period_s);
    if (rest <= rounding * std::max(1.0, ratio) * period_s)
        rest = 0.0;
    return {static_cast<std::size_t>(whole), rest};
}

/// One of the two steps, sample by sample.
class Run {
  public:
    Run(const HeldPlant& plant, const BlockChain& compensator, double period_s, Offset control,
        Offset dead_time, double reference, double disturbance)
        : plant_(plant),
          compensator_(compensator),
          period_s_(period_s),
          control_(control),
          dead_time_(dead_time),
          reference_(reference),
          disturbance_(disturbance),
          plant_state_(plant.chain().order),
          compensator_state_(compensator.order),
          past_(control.samples + 2, 0.0) {}

    /// One sample: measures, computes, and follows the plant to the next.
    void step(JoinedPoints* control_points, JoinedPoints& y) {
        const double start = static_cast<double>(sample_) * period_s_;
        compute();
        if (control_points != nullptr) {
            if (sample_ > 0)
                control_points->append(start, control(1), 0.0);
            control_points->append(start, control(0), 0.0);
        }
        for (const HeldPlant::Segment& segment : plant_.segments()) {
            const double input = plant_input(segment.begin_s);
            const double begin = start + segment.begin_s;
            y.append(begin, plant_.chain().out(plant_state_, input),
                     plant_.chain().slope(plant_state_, input));
            for (const HeldPlant::Outlet& outlet : segment.outlets) {
                const auto [value, slope] = plant_.read(outlet, input, plant_state_);
                y.append(begin + outlet.after_s, value, slope);
            }
            plant_.advance(segment, input, plant_state_);
        }
        ++sample_;
    }

  private:
    /// u so many samples ago.
    double control(std::size_t ago) const {
        return ago > sample_ ? 0.0 : past_[(sample_ - ago) % past_.size()];
    }

    double disturbance_at(double offset_s) const {
        const bool acts = sample_ > dead_time_.samples ||
                          (sample_ == dead_time_.samples && offset_s >= dead_time_.rest_s);
        return acts ? disturbance_ : 0.0;
    }

    double plant_input(double offset_s) const {
        return control(control_.samples + (offset_s < control_.rest_s ? 1 : 0)) +
               disturbance_at(offset_s);
    }

    /// The new u from y just after the instant, which a plant with a direct term and no delay lets
    /// depend on u itself.
    void compute() {
        double& now = past_[sample_ % past_.size()];
        now = 0.0;
        const double y_before = plant_.chain().out(plant_state_, plant_input(0.0));
        const bool immediate = control_.samples == 0 && control_.rest_s == 0.0;
        const double through = immediate ? plant_.chain().direct : 0.0;
        now = compensator_.out(compensator_state_, reference_ - y_before) /
              (1.0 + compensator_.direct * through);
        const double error = reference_ - y_before - through * now;
        compensator_.add_rate(compensator_state_, error);
    }

    const HeldPlant& plant_;
    const BlockChain& compensator_;
    double period_s_;
    Offset control_;
    Offset dead_time_;
    double reference_;
    double disturbance_;
    ComplexVector plant_state_;
    ComplexVector compensator_state_;
    std::vector<double> past_;
    std::size_t sample_ = 0;
};

/// What the closed-loop poles make of the signals at the sampling instants.
struct Tail {
    ModalSum y, u, y_disturbance;
};

double size_of(const StepSignal& signal) {
    double size = 0.0;
    for (const double value : signal.points.value)
        size = std::max(size, std::abs(value));
    return size;
}

/// Residues of T, C S and P S times z/(z - 1) at the closed-loop poles, with L = -1 and L' = -q
/// there, as modes in time (z^k = exp(rate t)).
class TailModes {
  public:
    TailModes(const SampledLoop& loop, const ComplexVector& poles_z, const SteadyValues& steady);

    /// The modes that still count after so many samples of these signals; nothing where one of them
    /// turns too fast for a smooth curve through the sampling instants.
    std::optional<Tail> after(std::size_t samples, const StepSignals& signals) const;

    /// After how many samples the last mode that turns too fast for that will have died.
    double samples_of_fast_modes(const StepSignals& signals) const;

  private:
    struct Entry {
        Complex turn; ///< ln z
        Complex y, u, y_disturbance;
    };
    double period_s_;
    SteadyValues steady_;
    std::vector<Entry> entries_;
};

TailModes::TailModes(const SampledLoop& loop, const ComplexVector& poles_z,
                     const SteadyValues& steady)
    : period_s_(loop.sample_period_s), steady_(steady) {
    const SampledPlant& plant = loop.sampled->delayed;
    const SampledPlant& undelayed = loop.sampled->undelayed;
    RootForm open = loop.compensator * plant.delta_form;
    const ComplexVector common = take_common_roots(open, same_place);
    for (const Complex& z : poles_z) {
        const Complex d = z - 1.0;
        const bool cancelled = std::any_of(common.begin(), common.end(), [&](Complex root) {
            return std::abs(root - d) <= same_place;
        });
        if (z.imag() < 0.0 || z == 0.0 || cancelled)
            continue;
        Complex q = -static_cast<double>(plant.whole_samples) / z;
        for (const Complex& zero : open.zeros)
            q += 1.0 / (d - zero);
        for (const Complex& pole : open.poles)
            q -= 1.0 / (d - pole);
        const Complex weight = (z.imag() > 0.0 ? 2.0 : 1.0) / (d * q);
        entries_.push_back({std::log(z), weight, -weight * evaluate(loop.compensator, d),
                            -weight * evaluate(undelayed, d)});
    }
    // What one of compensator and plant cancels of the other shows in u or in the answer to the
    // disturbance alone.
    for (const Complex& d : common) {
        const Complex z = 1.0 + d;
        if (d.imag() < 0.0 || d == 0.0 || z == 0.0)
            continue;
        const Complex loop_gain =
            evaluate(open, d) * std::pow(z, -static_cast<double>(plant.whole_samples));
        const Complex weight = (d.imag() > 0.0 ? 2.0 : 1.0) / ((1.0 + loop_gain) * d);
        const Complex late = std::pow(z, -static_cast<double>(undelayed.whole_samples));
        entries_.push_back({std::log(z), 0.0, weight * residue_at(loop.compensator, d),
                            weight * late * residue_at(undelayed.delta_form, d)});
    }
}

double TailModes::samples_of_fast_modes(const StepSignals& signals) const {
    const double y_size = size_of(signals.y);
    const double u_size = size_of(signals.u);
    const double disturbance_size = size_of(signals.y_disturbance);
    double samples = 0.0;
    for (const Entry& entry : entries_) {
        if (std::abs(entry.turn) <= slow_turn)
            continue;
        const double part = std::max({std::abs(entry.y) / y_size, std::abs(entry.u) / u_size,
                                      std::abs(entry.y_disturbance) / disturbance_size});
        // Weights of poles at one place are no numbers, and tell nothing here.
        if (part > spent && std::isfinite(part))
            samples = std::max(samples, std::log(spent / part) / entry.turn.real());
    }
    return samples;
}

std::optional<Tail> TailModes::after(std::size_t samples, const StepSignals& signals) const {
    Tail tail;
    tail.y.modes.push_back({0.0, {steady_.y}});
    tail.u.modes.push_back({0.0, {steady_.u}});
    tail.y_disturbance.modes.push_back({0.0, {steady_.y_disturbance}});
    const double y_size = size_of(signals.y);
    const double u_size = size_of(signals.u);
    const double disturbance_size = size_of(signals.y_disturbance);
    for (const Entry& entry : entries_) {
        const double left = std::exp(entry.turn.real() * static_cast<double>(samples));
        // Not "greater": weights of poles at one place are no numbers until they have died.
        const bool negligible =
            left == 0.0 || (std::abs(entry.y) * left < spent * y_size &&
                            std::abs(entry.u) * left < spent * u_size &&
                            std::abs(entry.y_disturbance) * left < spent * disturbance_size);
        if (negligible)
            continue;
        if (std::abs(entry.turn) > slow_turn || !std::isfinite(std::abs(entry.y)))
            return std::nullopt;
        const Complex rate = entry.turn / period_s_;
        tail.y.modes.push_back({rate, {entry.y}});
        tail.u.modes.push_back({rate, {entry.u}});
        tail.y_disturbance.modes.push_back({rate, {entry.y_disturbance}});
    }
    return tail;
}

/// The largest difference at the sampling instants from `from` on, of the points' size.
double disagreement(const JoinedPoints& points, double from, double period_s, const ModalSum& sum) {
    double size = 1e-300;
    double largest = 0.0;
    for (std::size_t i = points.t_s.size(); i-- > 0;) {
        const double t = points.t_s[i];
        size = std::max(size, std::abs(points.value[i]));
        const double in_periods = t / period_s;
        const bool at_instant = std::abs(in_periods - std::round(in_periods)) < 1e-9;
        const bool last_of_twins = i + 1 == points.t_s.size() || points.t_s[i + 1] > t;
        if (t >= from && at_instant && last_of_twins)
            largest = std::max(largest, std::abs(points.value[i] - sum.value(t)));
    }
    return largest / size;
}

ModalSum constant(double value) {
    return {{{0.0, {value}}}};
}

} // namespace

std::optional<StepSignals> sampled_step(const SampledLoop& loop, const ComplexVector& poles_z,
                                        double until_s) {
    // The fit of a measurement may disagree with its points about the stability of the loop.
    const bool grows =
        std::any_of(poles_z.begin(), poles_z.end(), [](Complex z) { return std::abs(z) >= 1.0; });
    if (grows && until_s == 0.0)
        return std::nullopt;
    const double period = loop.sample_period_s;
    const double dead_time_s = loop.plant.dead_time_s;
    const Offset control = offset_of(dead_time_s + loop.computation_delay_s, period);
    const Offset dead_time = offset_of(dead_time_s, period);
    const HeldPlant plant(loop.plant.roots, period, {control.rest_s, dead_time.rest_s});
    const BlockChain compensator = block_chain(loop.compensator);
    Run reference(plant, compensator, period, control, dead_time, 1.0, 0.0);
    Run disturbance(plant, compensator, period, control, dead_time, 0.0, 1.0);

    const SteadyValues steady = steady_values(loop.compensator, loop.sampled->undelayed.delta_form);
    const TailModes modes(loop, poles_z, steady);

    StepSignals signals;
    std::size_t samples = 0;
    for (std::size_t check = first_check;; check += check / 2) {
        for (; samples < check; ++samples) {
            reference.step(&signals.u.points, signals.y.points);
            disturbance.step(nullptr, signals.y_disturbance.points);
        }
        const double end = static_cast<double>(samples) * period;
        const double from = 0.75 * end;
        const auto agree = [&](const Tail& with) {
            return disagreement(signals.y.points, from, period, with.y) < agreement &&
                   disagreement(signals.u.points, from, period, with.u) < agreement &&
                   disagreement(signals.y_disturbance.points, from, period, with.y_disturbance) <
                       agreement;
        };
        const Tail still{constant(steady.y), constant(steady.u), constant(steady.y_disturbance)};
        const bool settled = steady.finite && agree(still);
        std::optional<Tail> slow;
        if (!settled && steady.finite)
            slow = modes.after(3 * samples / 4, signals);
        const bool told = settled || (slow && agree(*slow));
        // Known after the first stretch, rather than found out after the last.
        const double needed = std::max(static_cast<double>(samples),
                                       until_s == 0.0 ? modes.samples_of_fast_modes(signals) : 0.0);
        const bool worn_out = needed * static_cast<double>(plant.points()) > most_pieces;
        if (!told && !worn_out && (until_s == 0.0 || end < until_s))
            continue;
        if (!told && (until_s == 0.0 || end < until_s))
            return std::nullopt;
        const Tail& rest = told && !settled ? *slow : still;
        signals.y.tail = rest.y;
        signals.u.tail = rest.u;
        signals.y_disturbance.tail = rest.y_disturbance;
        for (StepSignal* signal : {&signals.y, &signals.u, &signals.y_disturbance})
            signal->tail_from = end;
        return signals;
    }
}

} // namespace cornerwright
