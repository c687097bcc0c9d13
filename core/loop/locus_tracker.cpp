#include "core/loop/locus_tracker.h"

#include "core/numerics/root_clusters.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <optional>

namespace cornerwright {
namespace {

constexpr double shortest_step = 1e-6; ///< of ln(factor); closer to a meeting the poles jump it
constexpr double longest_step = 0.5;
constexpr std::size_t most_states = 4000;

std::vector<double> gaps(const ComplexVector& poles) {
    std::vector<double> nearest(poles.size(), std::numeric_limits<double>::infinity());
    for (std::size_t i = 0; i < poles.size(); ++i)
        for (std::size_t j = i + 1; j < poles.size(); ++j) {
            const double distance = std::norm(poles[i] - poles[j]);
            nearest[i] = std::min(nearest[i], distance);
            nearest[j] = std::min(nearest[j], distance);
        }
    for (double& distance : nearest)
        distance = std::sqrt(distance);
    return nearest;
}

/// The corrector: the root near `s`, `room` away from what else there is, or nothing where Newton
/// does not get there at once.
std::optional<LocusEquation::At> correct(const LocusEquation& equation, Complex& s, bool is_real,
                                         double factor, double room) {
    constexpr int rounds = 6;
    for (int round = 0; round < rounds; ++round) {
        const LocusEquation::At at = equation.at(s, factor);
        const Complex correction = is_real ? Complex(at.newton.real()) : at.newton;
        const double size = std::abs(correction);
        if (!(size <= room))
            return std::nullopt;
        s -= correction;
        // What is left is about size^2/room.
        if (at.settled || size * size <= 1e-14 * room * std::abs(s))
            return at;
    }
    return std::nullopt;
}

struct Step {
    LocusState state;
    double stretch = 0.0;             ///< by how much the step could have been longer
    std::vector<std::size_t> refused; ///< poles whose next place is not plain
};

/// `before` is the state before `from`, null where the branches turned sharply between the two.
Step try_step(const LocusEquation& equation, const LocusState* before, const LocusState& from,
              const std::vector<double>& gap, double to, const LocusStepLimit& limit) {
    constexpr double of_gap = 0.4;
    constexpr double of_move = 0.3;
    Step step{from, 2.0, {}};
    step.state.log_factor = to;
    const double factor = std::exp(to);
    const double ahead = to - from.log_factor;
    // Half the change of the rate over the last step, brought to the size of this one.
    const double bend =
        before == nullptr ? 0.0 : 0.5 * ahead * ahead / (from.log_factor - before->log_factor);
    for (std::size_t i = 0; i < from.poles.size(); ++i) {
        if (!from.leads(i))
            continue;
        const std::size_t twin = from.mirror[i];
        const bool is_real = twin == i;
        Complex predicted = from.poles[i] + ahead * from.rates[i];
        if (before != nullptr)
            predicted += bend * (from.rates[i] - before->rates[i]);
        Complex s = is_real ? Complex(predicted.real()) : predicted;
        const double allowed = std::min(of_gap * gap[i], limit.at(from.poles[i]));
        std::optional<LocusEquation::At> at;
        if (std::abs(s - from.poles[i]) <= 2.0 * allowed)
            at = correct(equation, s, is_real, factor,
                         std::min(gap[i], std::abs(from.poles[i]) + limit.smallest));
        const double moved = std::abs(s - from.poles[i]);
        const bool plain = at && moved <= allowed &&
                           std::abs(s - predicted) <= of_move * moved + 1e-9 * std::abs(s) &&
                           (is_real || s.imag() > 0.0);
        if (!plain) {
            step.refused.push_back(i);
            continue;
        }
        step.stretch = std::min(step.stretch, 0.8 * allowed / (moved + 1e-300));
        step.state.poles[i] = s;
        step.state.poles[twin] = is_real ? s : std::conj(s);
        step.state.rates[i] = is_real ? Complex(at->rate.real()) : at->rate;
        step.state.rates[twin] = is_real ? step.state.rates[i] : std::conj(at->rate);
    }
    return step;
}

/// Moves all poles at once, each kept off the others' roots.
bool iterate_together(const LocusEquation& equation, ComplexVector& poles, double factor) {
    constexpr int rounds = 60;
    for (int round = 0; round < rounds; ++round) {
        bool all = true;
        for (std::size_t i = 0; i < poles.size(); ++i) {
            const LocusEquation::At at = equation.at(poles[i], factor);
            Complex repelled = 0.0;
            for (std::size_t j = 0; j < poles.size(); ++j)
                if (poles[j] != poles[i])
                    repelled += inverse(poles[i] - poles[j]);
            const Complex correction = times(at.newton, inverse(1.0 - times(at.newton, repelled)));
            if (!std::isfinite(std::abs(correction)))
                return false;
            poles[i] -= correction;
            all = all && (at.settled || std::abs(correction) <= 1e-12 * std::abs(poles[i]));
        }
        if (all)
            return true;
    }
    return false;
}

/// The state past a meeting of poles. Two on the real axis leave it and two that come down on it
/// part along it, each turning left, so that a branch keeps its name through a breakaway. Nothing
/// where a pole meets one that is not among the followed (dead time).
std::optional<LocusState> jump(const LocusEquation& equation, const LocusState& from,
                               const std::vector<std::size_t>& refused, double to) {
    ComplexVector start = from.poles;
    for (std::size_t i = 0; i < start.size(); ++i)
        start[i] += (to - from.log_factor) * from.rates[i];
    for (const std::size_t i : refused) {
        std::size_t other = i;
        double nearest = std::numeric_limits<double>::infinity();
        for (std::size_t j = 0; j < start.size(); ++j)
            if (j != i && std::abs(from.poles[j] - from.poles[i]) < nearest) {
                other = j;
                nearest = std::abs(from.poles[j] - from.poles[i]);
            }
        const Complex centre = 0.5 * (from.poles[i] + from.poles[other]);
        const Complex offset = from.poles[i] - centre;
        const bool both_real = from.mirror[i] == i && from.mirror[other] == other;
        if (other == i || !(both_real || from.mirror[i] == other)) {
            start[i] = from.poles[i] * Complex(1.0, 1e-9);
            continue;
        }
        const Complex left_turn = Complex(0.0, -1.0); // for one that comes from the other side
        start[i] = centre + left_turn * offset;
        start[other] = centre - left_turn * offset;
    }
    ComplexVector poles = start;
    const bool arrived = iterate_together(equation, poles, std::exp(to));
    if (!arrived && equation.has_delay())
        return std::nullopt;
    if (!arrived) {
        const FactoredSum sum = equation.sum(std::exp(to));
        ComplexVector fresh = sum.start();
        iterate_roots(sum, fresh);
        if (fresh.size() == poles.size()) {
            const std::vector<std::size_t> partner = match_nearest(start, fresh);
            for (std::size_t i = 0; i < poles.size(); ++i)
                poles[i] = fresh[partner[i]];
        }
    }
    const ComplexVector as_arrived = poles;
    pair_conjugates(poles);
    // Pairing gives the upper half plane to the earlier of two; a branch keeps its own.
    for (std::size_t i = 0; i < poles.size(); ++i)
        if (poles[i].imag() * as_arrived[i].imag() < 0.0)
            poles[i] = std::conj(poles[i]);
    return locus_state(equation, to, std::move(poles));
}

} // namespace

LocusEquation::LocusEquation(const LoopModel& model)
    : unit_({model.roots.poles}, {model.roots.zeros}, model.roots.gain), delay_(model.delay_s) {}

FactoredSum LocusEquation::sum(double factor) const {
    return FactoredSum(unit_.left(), unit_.right(), factor * unit_.gain());
}

LocusEquation::At LocusEquation::at(Complex s, double factor) const {
    FactoredSum::Sides sides = unit_.sides(s);
    const double gain = factor * unit_.gain();
    if (has_delay()) {
        const Complex exponential = gain * std::exp(-s * delay_);
        sides.right_derivative = times(sides.right_derivative - delay_ * sides.right, exponential);
        sides.right = times(sides.right, exponential);
    } else {
        sides.right_derivative *= gain;
        sides.right *= gain;
    }
    const Complex slope = inverse(sides.left_derivative + sides.right_derivative);
    const Complex value = sides.left + sides.right;
    const double terms = static_cast<double>(unit_.left().degree() + unit_.right().degree() + 2) +
                         std::abs(s) * delay_;
    const bool settled = std::norm(value) <= std::norm(terms * 0x1p-51) *
                                                 (std::norm(sides.left) + std::norm(sides.right));
    return {times(value, slope), -times(sides.right, slope), settled};
}

Complex LocusEquation::factor_for(Complex s) const {
    const FactoredSum::Sides sides = unit_.sides(s);
    return -sides.left * std::exp(s * delay_) / (unit_.gain() * sides.right);
}

double LocusStepLimit::at(Complex s) const {
    constexpr double of_distance = 0.15; // a step near the origin is small there, too
    const double distance = std::abs(s);
    const double here = plain + 0.1 * std::max(0.0, distance - region);
    return std::min(here, of_distance * distance + smallest);
}

LocusState locus_state(const LocusEquation& equation, double log_factor, ComplexVector poles) {
    LocusState state{log_factor, std::move(poles), {}, {}};
    const std::size_t n = state.poles.size();
    state.rates.resize(n);
    state.mirror.resize(n);
    std::vector<bool> taken(n, false);
    for (std::size_t i = 0; i < n; ++i) {
        state.rates[i] = equation.at(state.poles[i], std::exp(log_factor)).rate;
        if (taken[i])
            continue;
        state.mirror[i] = i;
        for (std::size_t j = i + 1; j < n && state.poles[i].imag() != 0.0; ++j)
            if (!taken[j] && state.poles[j] == std::conj(state.poles[i])) {
                state.mirror[i] = j;
                state.mirror[j] = i;
                taken[j] = true;
                break;
            }
    }
    return state;
}

std::vector<LocusState> track_locus(const LocusEquation& equation, const LocusState& from,
                                    double to_log_factor, const LocusStepLimit& limit) {
    std::vector<LocusState> states;
    const LocusState* before = nullptr;
    const LocusState* last = &from;
    const double sign = to_log_factor < from.log_factor ? -1.0 : 1.0;
    double size = 0.02;
    std::vector<double> gap = gaps(from.poles);
    states.reserve(most_states);
    while (last->log_factor != to_log_factor && states.size() < most_states) {
        const double left = std::abs(to_log_factor - last->log_factor);
        const bool arrives = size >= left;
        const double to = arrives ? to_log_factor : last->log_factor + sign * size;
        Step step = try_step(equation, before, *last, gap, to, limit);
        if (!step.refused.empty() && std::min(size, left) > 1.01 * shortest_step) {
            size = std::max(shortest_step, 0.4 * std::min(size, left));
            continue;
        }
        if (step.refused.empty()) {
            states.push_back(std::move(step.state));
            before = last;
            size =
                std::clamp(size * std::clamp(step.stretch, 0.3, 2.0), shortest_step, longest_step);
        } else {
            constexpr double past = 8.0; // of the shortest step, well clear of the meeting
            const double beyond = last->log_factor + sign * std::min(left, past * shortest_step);
            std::optional<LocusState> over =
                jump(equation, *last, step.refused,
                     left <= past * shortest_step ? to_log_factor : beyond);
            if (!over)
                return states;
            states.push_back(std::move(*over));
            before = nullptr;
            size = past * shortest_step;
        }
        last = &states.back();
        gap = gaps(last->poles);
    }
    return states;
}

std::vector<std::size_t> match_nearest(const ComplexVector& old, const ComplexVector& fresh) {
    struct Pair {
        double distance;
        std::size_t old_index, fresh_index;
    };
    std::vector<Pair> pairs;
    for (std::size_t i = 0; i < old.size(); ++i)
        for (std::size_t j = 0; j < fresh.size(); ++j)
            pairs.push_back({std::norm(old[i] - fresh[j]), i, j});
    std::stable_sort(pairs.begin(), pairs.end(), [](const Pair& left, const Pair& right) {
        return left.distance < right.distance;
    });
    constexpr std::size_t none = std::numeric_limits<std::size_t>::max();
    std::vector<std::size_t> partner(old.size(), none);
    std::vector<bool> taken(fresh.size(), false);
    for (const Pair& pair : pairs)
        if (partner[pair.old_index] == none && !taken[pair.fresh_index]) {
            partner[pair.old_index] = pair.fresh_index;
            taken[pair.fresh_index] = true;
        }
    return partner;
}

} // namespace cornerwright
