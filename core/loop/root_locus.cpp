#include "core/loop/root_locus.h"

#include "core/loop/closed_loop_poles.h"
#include "core/loop/locus_crossings.h"
#include "core/loop/locus_tracker.h"
#include "core/numerics/error.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numbers>

namespace cornerwright {
namespace {

/// Half the width of the window that shows everything, seen from the origin.
double reach_of(const ComplexVector& points) {
    double reach = 0.0;
    for (const Complex& point : points)
        reach = std::max(reach, std::abs(point));
    return reach;
}

ComplexVector landmarks(const RootLocus& locus) {
    ComplexVector all = locus.poles;
    all.insert(all.end(), locus.zeros.begin(), locus.zeros.end());
    all.insert(all.end(), locus.closed_loop_poles.begin(), locus.closed_loop_poles.end());
    return all;
}

/// The window asked for, or one around the roots of L and the closed-loop poles; with dead time it
/// reaches to the first links of the chain that this makes, unless all else is far smaller.
LocusWindow window_or_default(const RootLocus& locus, double delay, const LocusWindow* window) {
    if (window != nullptr)
        return *window;
    double reach = reach_of(landmarks(locus));
    constexpr double first_links = 8.0; // rad of phase over the delay: the first stands near 2 pi
    constexpr double far_smaller = 20.0;
    if (delay > 0.0)
        reach = std::max(reach, reach > 0.0 ? std::min(first_links / delay, far_smaller * reach)
                                            : first_links / delay);
    const double half = reach > 0.0 ? 1.3 * reach : 1.0;
    return {-half, half, -half, half};
}

LocusStepLimit step_limit(const RootLocus& locus, const LocusWindow& window) {
    double smallest = std::numeric_limits<double>::infinity();
    for (const Complex& point : landmarks(locus))
        if (point != Complex(0.0))
            smallest = std::min(smallest, std::abs(point));
    const double diagonal =
        std::hypot(window.real_high - window.real_low, window.imag_high - window.imag_low);
    const double corner =
        std::hypot(std::max(std::abs(window.real_low), std::abs(window.real_high)),
                   std::max(std::abs(window.imag_low), std::abs(window.imag_high)));
    constexpr double of_window = 0.012; // a step of some ten pixels
    LocusStepLimit limit{of_window * diagonal, corner, 0.0};
    limit.smallest = std::min(limit.plain, 0.02 * smallest);
    return limit;
}

/// True where every branch has come to a zero or left the window for good.
bool is_at_its_end(const RootLocus& locus, const ComplexVector& poles,
                   const LocusStepLimit& limit) {
    return std::all_of(poles.begin(), poles.end(), [&](Complex pole) {
        if (std::abs(pole) > 1.5 * limit.region)
            return true;
        return std::any_of(locus.zeros.begin(), locus.zeros.end(), [&](Complex zero) {
            return std::abs(pole - zero) <= 0.5 * limit.plain;
        });
    });
}

/// The factor below which no simple pole of L has moved visibly.
double first_factor(const LocusEquation& equation) {
    constexpr double lowest = 1e-9;
    double first = 1e-3;
    const ComplexVector& poles = equation.poles();
    for (std::size_t i = 0; i < poles.size(); ++i) {
        double room = std::abs(poles[i]);
        for (std::size_t j = 0; j < poles.size(); ++j)
            if (j != i && poles[j] != poles[i])
                room =
                    std::min(room > 0.0 ? room : std::abs(poles[j]), std::abs(poles[j] - poles[i]));
        // At a small factor a simple pole has moved by |rate| from where it was.
        const double moved = std::abs(equation.at(poles[i], lowest).rate) / lowest;
        if (room > 0.0 && std::isfinite(moved) && moved > 0.0)
            first = std::min(first, 0.01 * room / moved);
    }
    return std::max(first, lowest);
}

/// Poles at one factor without a history, in the order of `old` as far as that goes.
ComplexVector poles_near(const LocusEquation& equation, double factor, const ComplexVector& old) {
    const ComplexVector fresh = solve_roots(equation.sum(factor)).roots;
    if (old.size() > fresh.size())
        return fresh;
    const std::vector<std::size_t> partner = match_nearest(old, fresh);
    ComplexVector ordered;
    std::vector<bool> used(fresh.size(), false);
    for (const std::size_t index : partner) {
        ordered.push_back(fresh[index]);
        used[index] = true;
    }
    for (std::size_t j = 0; j < fresh.size(); ++j)
        if (!used[j])
            ordered.push_back(fresh[j]); // from infinity
    return ordered;
}

/// States from the open-loop poles up to the end of the branches; one of them at factor 1.
std::vector<LocusState> rational_states(const LocusEquation& equation, const RootLocus& locus,
                                        const LocusStepLimit& limit) {
    const double first = std::log(first_factor(equation));
    const ComplexVector& open = equation.poles();
    std::vector<LocusState> states;
    states.push_back(locus_state(equation, first, poles_near(equation, std::exp(first), open)));
    const auto follow = [&](double to) {
        std::vector<LocusState> more = track_locus(equation, states.back(), to, limit);
        std::move(more.begin(), more.end(), std::back_inserter(states));
    };
    follow(0.0);
    constexpr double decades_at_a_time = std::numbers::ln10;
    constexpr double least_end = std::numbers::ln10;      // 20 dB
    constexpr double last_end = 6.0 * std::numbers::ln10; // 120 dB
    for (double end = least_end; end <= last_end; end += decades_at_a_time) {
        follow(end);
        if (is_at_its_end(locus, states.back().poles, limit))
            break;
    }
    return states;
}

void add_missing(ComplexVector& known, const ComplexVector& found) {
    for (const Complex& root : found) {
        const bool is_known = std::any_of(known.begin(), known.end(), [&](Complex other) {
            return std::abs(other - root) <= 1e-6 * std::abs(root);
        });
        if (!is_known)
            known.push_back(root);
    }
}

SymmetricRectangle rectangle_around(const LocusWindow& window, double margin) {
    const double width = window.real_high - window.real_low;
    const double high = std::max(std::abs(window.imag_low), std::abs(window.imag_high));
    return {window.real_low - margin * width, window.real_high + margin * width,
            (1.0 + margin) * high};
}

struct DelayedStates {
    std::vector<LocusState> states;
    bool confirmed = true; ///< counts inside the window agree with the argument principle
};

/// States of the true roots that show in the window somewhere between the first and last factor.
DelayedStates delayed_states(const LocusEquation& equation, const LocusWindow& window,
                             const LocusStepLimit& limit) {
    constexpr double first = -3.0 * std::numbers::ln10; // -60 dB
    constexpr double last = std::numbers::ln10;         // 20 dB
    constexpr double margin = 0.2;
    const SymmetricRectangle wide = rectangle_around(window, margin);
    // Roots seen at the checkpoints are brought to factor 1, where all branches are put together.
    const double checkpoints[] = {first, 0.5 * first, 0.5 * last, last};
    ComplexVector at_one = roots_inside(equation.delayed(1.0), wide).roots;
    const auto bring_in = [&](double checkpoint) {
        const RootsInside inside = roots_inside(equation.delayed(std::exp(checkpoint)), wide);
        const std::vector<LocusState> path =
            track_locus(equation, locus_state(equation, checkpoint, inside.roots), 0.0, limit);
        if (!path.empty() && path.back().log_factor == 0.0)
            add_missing(at_one, path.back().poles);
    };
    for (const double checkpoint : checkpoints)
        bring_in(checkpoint);
    LocusState middle = locus_state(equation, 0.0, at_one);
    std::vector<LocusState> down = track_locus(equation, middle, first, limit);
    std::vector<LocusState> up = track_locus(equation, middle, last, limit);
    DelayedStates result;
    result.states.assign(std::make_move_iterator(down.rbegin()),
                         std::make_move_iterator(down.rend()));
    result.states.push_back(std::move(middle));
    std::move(up.begin(), up.end(), std::back_inserter(result.states));

    const SymmetricRectangle shown = rectangle_around(window, 0.0);
    for (const std::size_t k :
         {std::size_t{0}, result.states.size() / 2, result.states.size() - 1}) {
        const LocusState& state = result.states[k];
        const auto tracked = std::count_if(state.poles.begin(), state.poles.end(),
                                           [&](Complex pole) { return shown.contains(pole); });
        const int count = count_roots_inside(equation.delayed(std::exp(state.log_factor)), shown);
        result.confirmed = result.confirmed && count == static_cast<int>(tracked);
    }
    return result;
}

/// Factors and branches from the states; at factor 1 the polished closed-loop poles.
void fill_branches(RootLocus& locus, const std::vector<LocusState>& states,
                   const ComplexVector& common_roots) {
    const std::size_t followed = states.front().poles.size();
    locus.branches.resize(followed + common_roots.size());
    for (const LocusState& state : states) {
        locus.factors.push_back(state.log_factor == 0.0 ? 1.0 : std::exp(state.log_factor));
        for (std::size_t i = 0; i < followed; ++i)
            locus.branches[i].poles.push_back(state.poles[i]);
        for (std::size_t i = 0; i < common_roots.size(); ++i)
            locus.branches[followed + i].poles.push_back(common_roots[i]);
    }
}

/// Puts the polished poles in place of the tracked ones at factor 1.
void polish_present(RootLocus& locus) {
    const auto present = std::find(locus.factors.begin(), locus.factors.end(), 1.0);
    if (present == locus.factors.end())
        return;
    const std::size_t k = static_cast<std::size_t>(present - locus.factors.begin());
    ComplexVector tracked;
    for (const LocusBranch& branch : locus.branches)
        tracked.push_back(branch.poles[k]);
    if (locus.closed_loop_poles.size() != tracked.size())
        return;
    const std::vector<std::size_t> partner = match_nearest(tracked, locus.closed_loop_poles);
    for (std::size_t i = 0; i < tracked.size(); ++i)
        locus.branches[i].poles[k] = locus.closed_loop_poles[partner[i]];
}

} // namespace

RootLocus root_locus(const DesignLoop& loop, const LocusWindow* window, const RootLocus*) {
    RootLocus locus;
    const std::optional<LoopModel> model = loop_model(loop);
    if (!model) {
        locus.note = no_model_note;
        return locus;
    }
    locus.zeros = model->roots.zeros;
    locus.poles = model->roots.poles;
    const ClosedLoopPoles closed = closed_loop_poles(loop);
    locus.closed_loop_poles = closed.poles;
    locus.note = model->note;
    const LocusEquation equation(*model);
    const LocusWindow shown = window_or_default(locus, model->delay_s, window);
    const LocusStepLimit limit = step_limit(locus, shown);

    std::vector<LocusState> states;
    if (equation.has_delay()) {
        DelayedStates delayed = delayed_states(equation, shown, limit);
        states = std::move(delayed.states);
        locus.note += locus.note.empty() ? "" : "; ";
        locus.note += "dead time: of infinitely many branches those inside the window";
        if (!delayed.confirmed)
            locus.note += ", perhaps not all";
    } else {
        states = rational_states(equation, locus, limit);
    }
    locus.crossings = axis_crossings(equation, states);
    // Where every branch comes from a pole of L, the locus begins there.
    if (!equation.has_delay() && states.front().poles.size() == equation.poles().size()) {
        LocusState open{-std::numeric_limits<double>::infinity(), equation.poles(), {}, {}};
        states.insert(states.begin(), std::move(open));
    }
    fill_branches(locus, states, equation.common_roots());
    polish_present(locus);
    return locus;
}

std::vector<ComplexVector> locus_poles(const DesignLoop& loop, std::span<const double> factors) {
    std::vector<ComplexVector> points;
    for (const double factor : factors) {
        if (!(factor >= 0.0) || !std::isfinite(factor))
            throw InputError({}, "gain factors of 0 or more for the root locus",
                             number_text(factor));
        if (factor == 0.0) {
            const std::optional<LoopModel> model = loop_model(loop);
            points.push_back(model ? model->roots.poles : ComplexVector{});
            continue;
        }
        DesignLoop scaled = loop;
        scaled.compensator.gain *= factor;
        points.push_back(closed_loop_poles(scaled).poles);
    }
    return points;
}

} // namespace cornerwright
