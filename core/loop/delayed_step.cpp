#include "core/loop/delayed_step.h"

#include "core/loop/common_roots.h"
#include "core/loop/history_stepper.h"
#include "core/loop/steady_values.h"
#include "core/numerics/delayed_sum.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double far_off = 1e4;    // of all rates: where an improper compensator is ended
constexpr double agreement = 3e-6; // of the size, between history and tail
constexpr std::size_t most_intervals = 400000;
constexpr std::size_t first_segments = 8; // modes left of -3/delay are below 1e-10 then

/// One of the two steps, followed over one delay after another.
class History {
  public:
    History(const HistoryStepper& stepper, double delay_s, double reference, double disturbance)
        : stepper_(stepper),
          delay_s_(delay_s),
          reference_(reference),
          disturbance_(disturbance),
          state_(stepper.rest()),
          past_(stepper.intervals().size()) {}

    /// Adds one delay's worth to the compensator's and the plant's output, `plant_shift_s` late.
    void follow(double plant_shift_s, JoinedPoints* compensator, JoinedPoints& plant) {
        const double start = static_cast<double>(segments_) * delay_s_;
        for (std::size_t i = 0; i < past_.size(); ++i) {
            const HistoryStepper::Interval& interval = stepper_.intervals()[i];
            HistoryStepper::Nodes drive;
            for (std::size_t k = 0; k < HistoryStepper::nodes; ++k)
                drive[k] = reference_ - past_[i][k];
            const HistoryStepper::Outputs outputs =
                stepper_.advance(interval, drive, disturbance_, state_);
            past_[i] = outputs.plant;
            const double begin = start + interval.begin_s;
            if (compensator != nullptr)
                append(outputs.compensator, begin, interval.length_s, i == 0, *compensator);
            append(outputs.plant, begin + plant_shift_s, interval.length_s, i == 0, plant);
        }
        ++segments_;
    }

  private:
    /// The first node repeats the last one before it, except where the past may have a kink.
    static void append(const HistoryStepper::Nodes& values, double begin, double length,
                       bool may_jump, JoinedPoints& points) {
        const HistoryStepper::Nodes slopes = node_slopes(values, length);
        for (std::size_t k = may_jump ? 0 : 1; k < HistoryStepper::nodes; ++k)
            points.append(begin + 0.25 * static_cast<double>(k) * length, values[k], slopes[k]);
    }

    const HistoryStepper& stepper_;
    double delay_s_;
    double reference_;
    double disturbance_;
    ComplexVector state_;
    std::vector<HistoryStepper::Nodes> past_;
    std::size_t segments_ = 0;
};

/// An improper compensator gets as many poles as it lacks, far beyond everything else.
RootForm ended(const DelayedLoop& loop) {
    RootForm compensator = loop.compensator;
    double fastest = 1.0 / loop.delay_s();
    for (const ComplexVector* roots :
         {&loop.compensator.zeros, &loop.compensator.poles, &loop.plant.zeros, &loop.plant.poles})
        for (const Complex& root : *roots)
            fastest = std::max(fastest, std::abs(root));
    while (compensator.zeros.size() > compensator.poles.size()) {
        compensator.poles.emplace_back(-far_off * fastest);
        compensator.gain *= far_off * fastest;
    }
    return compensator;
}

/// Modes of the rightmost closed-loop poles: residues of T/s, C S/s and P S/s there, with
/// L = -1 and L' = -L'/L = -q at a pole.
struct Tail {
    ModalSum y, u, y_disturbance;
};

Complex logarithmic_slope(const RootForm& form, Complex s) {
    Complex sum = 0.0;
    for (const Complex& zero : form.zeros)
        sum += inverse(s - zero);
    for (const Complex& pole : form.poles)
        sum -= inverse(s - pole);
    return sum;
}

std::optional<Tail> tail_of(const DelayedLoop& loop, const SteadyValues& steady) {
    RootForm open = loop.compensator * loop.plant;
    const ComplexVector common = take_common_roots(open);
    const double delay = loop.delay_s();
    const DelayedSum function{FactoredSum({open.poles}, {open.zeros}, open.gain), delay};
    constexpr double decay = 3.0;
    constexpr double most_links = 40.25; // of the chain of a loop that does not roll off
    const SymmetricRectangle rectangle =
        rightmost_rectangle(function, decay, 2.0 * std::numbers::pi * most_links / delay);
    const RootsInside inside = roots_inside(function, rectangle);
    if (!inside.confirmed)
        return std::nullopt;
    Tail tail;
    tail.y.modes.push_back({0.0, {steady.y}});
    tail.u.modes.push_back({0.0, {steady.u}});
    tail.y_disturbance.modes.push_back({0.0, {steady.y_disturbance}});
    for (const Complex& pole : inside.roots) {
        if (pole.imag() < 0.0)
            continue;
        const Complex q = logarithmic_slope(open, pole) - delay;
        const Complex weight = (pole.imag() > 0.0 ? 2.0 : 1.0) / (pole * q);
        tail.y.modes.push_back({pole, {weight}});
        tail.u.modes.push_back({pole, {-weight * evaluate(loop.compensator, pole)}});
        tail.y_disturbance.modes.push_back(
            {pole, {-weight * evaluate(loop.plant, pole) * std::exp(-pole * loop.dead_time_s)}});
    }
    // What one of compensator and plant cancels of the other does not show in y, but in u or in the
    // answer to the disturbance.
    for (const Complex& pole : common) {
        if (pole.imag() < 0.0 || pole == 0.0)
            continue;
        const Complex sensitivity = 1.0 / (1.0 + evaluate(open, pole) * std::exp(-pole * delay));
        const Complex weight = (pole.imag() > 0.0 ? 2.0 : 1.0) * sensitivity / pole;
        tail.u.modes.push_back({pole, {weight * residue_at(loop.compensator, pole)}});
        tail.y_disturbance.modes.push_back(
            {pole, {weight * residue_at(loop.plant, pole) * std::exp(-pole * loop.dead_time_s)}});
    }
    return tail;
}

/// The largest difference between points from `from` on and the sum, of the points' size.
double disagreement(const JoinedPoints& points, double from, const ModalSum& sum) {
    double size = 1e-300;
    double largest = 0.0;
    for (std::size_t i = points.t_s.size(); i-- > 0;) {
        size = std::max(size, std::abs(points.value[i]));
        if (points.t_s[i] >= from)
            largest = std::max(largest, std::abs(points.value[i] - sum.value(points.t_s[i])));
    }
    return largest / size;
}

ModalSum constant(double value) {
    return {{{0.0, {value}}}};
}

} // namespace

std::optional<StepSignals> delayed_step(const DelayedLoop& loop, const HistoryLimits& limits) {
    if (loop.compensator.zeros.size() + loop.plant.zeros.size() >
        loop.compensator.poles.size() + loop.plant.poles.size())
        return std::nullopt;
    const double delay = loop.delay_s();
    const RootForm compensator = ended(loop);
    const HistoryStepper stepper(compensator, loop.plant, delay);
    History reference(stepper, delay, 1.0, 0.0);
    History disturbance(stepper, delay, 0.0, 1.0);

    StepSignals signals;
    signals.control_has_impulse = loop.compensator.zeros.size() > loop.compensator.poles.size();
    // At rest until the delay is over; there the slope jumps.
    for (const double t : {0.0, delay})
        signals.y.points.append(t, 0.0, 0.0);
    if (loop.dead_time_s > 0.0)
        for (const double t : {0.0, loop.dead_time_s})
            signals.y_disturbance.points.append(t, 0.0, 0.0);
    const auto follow = [&](JoinedPoints* control) {
        reference.follow(delay, control, signals.y.points);
        disturbance.follow(loop.dead_time_s, nullptr, signals.y_disturbance.points);
    };

    const SteadyValues steady = steady_values(loop.compensator, loop.plant);
    std::optional<Tail> tail;
    std::size_t segments = 0;
    for (std::size_t check = first_segments;; check += std::max<std::size_t>(4, check / 2)) {
        for (; segments < check; ++segments)
            follow(&signals.u.points);
        if (!tail && steady.finite)
            tail = tail_of(loop, steady);
        const double end = static_cast<double>(segments) * delay;
        const auto agree = [&](const Tail& with) {
            return disagreement(signals.y.points, end, with.y) < agreement &&
                   disagreement(signals.y_disturbance.points, end - delay, with.y_disturbance) <
                       agreement &&
                   (signals.control_has_impulse ||
                    disagreement(signals.u.points, end - delay, with.u) < agreement);
        };
        const Tail still{constant(steady.y), constant(steady.u), constant(steady.y_disturbance)};
        const bool settled = steady.finite && agree(still);
        const bool told = settled || (tail && agree(*tail));
        const bool worn_out = segments * stepper.intervals().size() > most_intervals;
        if (!told && !worn_out && (limits.until_s == 0.0 || end < limits.until_s))
            continue;
        if (!told && (limits.until_s == 0.0 || end < limits.until_s))
            return std::nullopt;
        const Tail& rest = settled || !tail ? still : *tail;
        signals.y.tail = rest.y;
        signals.u.tail = rest.u;
        signals.y_disturbance.tail = rest.y_disturbance;
        for (StepSignal* signal : {&signals.y, &signals.u, &signals.y_disturbance})
            signal->tail_from = end;
        return signals;
    }
}

} // namespace cornerwright
