#include "core/loop/frequency_figures.h"
#include "core/numerics/number_text.h"
#include "core/placement/design_practice.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// Narrower notches than this leave no room for a drift that nobody measured: common practice, no
/// source.
constexpr double least_pole_damping = 0.2;
/// Wider ones are no notch any more: they take the phase of a low-pass at half the frequency.
constexpr double most_pole_damping = 1.0;
/// In its centre the notch is this much deeper than at the borders of the spread.
constexpr double deeper_in_centre = 0.5;

struct Peak {
    double w_rad_s = 0.0;
    double db = 0.0;
};

/// The highest turning point of |L| between the two frequencies, on the grid of the curve (which is
/// dense around lightly damped roots; of a measurement it is the points themselves).
std::optional<Peak> peak_of(const LoopCurves& curves, const ResonanceQuieting& wanted) {
    std::optional<Peak> peak;
    for (std::size_t i = 1; i + 1 < curves.w_rad_s.size(); ++i) {
        const double w = curves.w_rad_s[i];
        const double here = curves.loop_db[i];
        if (w < wanted.from_rad_s || w > wanted.to_rad_s || here < curves.loop_db[i - 1] ||
            here < curves.loop_db[i + 1])
            continue;
        if (!peak || here > peak->db)
            peak = Peak{w, here};
    }
    return peak;
}

double highest_db(const Evaluation& evaluation, double from, double to) {
    double highest = -HUGE_VAL;
    for (const PlacementLoop& loop : evaluation.loops) {
        const LoopCurves& curves = loop.assessment.curves;
        for (std::size_t i = 0; i < curves.w_rad_s.size(); ++i) {
            if (curves.w_rad_s[i] >= from && curves.w_rad_s[i] <= to)
                highest = std::max(highest, curves.loop_db[i]);
        }
    }
    return highest;
}

/// |N|^2 = (d^2 + 4 zz^2)/(d^2 + 4 zp^2) with d = w/wc - wc/w is `size`^2 at the borders.
double pole_damping_for(double detuning, double size) {
    const double centre = deeper_in_centre * size;
    return 0.5 * detuning * std::sqrt((1.0 - size * size) / (size * size - centre * centre));
}

Section notch_for(double low, double high, double size, double widening) {
    Section notch;
    notch.kind = SectionKind::notch;
    notch.corner_rad_s = std::sqrt(low * high);
    const double detuning = high / notch.corner_rad_s - notch.corner_rad_s / high;
    notch.pole_damping = widening * std::max(pole_damping_for(detuning, size), least_pole_damping);
    notch.zero_damping = deeper_in_centre * size * notch.pole_damping;
    return notch;
}

} // namespace

SectionProposal quiet_resonance(const PlacementProblem& problem, const ResonanceQuieting& wanted) {
    const Evaluation evaluation = evaluate(problem, problem.compensator);
    double low = HUGE_VAL;
    double high = 0.0;
    double highest = -HUGE_VAL;
    for (const PlacementLoop& loop : evaluation.loops) {
        if (const auto peak = peak_of(loop.assessment.curves, wanted)) {
            low = std::min(low, peak->w_rad_s);
            high = std::max(high, peak->w_rad_s);
            highest = std::max(highest, peak->db);
        }
    }
    const std::string band =
        number_text(wanted.from_rad_s, 4) + " to " + number_text(wanted.to_rad_s, 4) + " rad/s";
    if (high == 0.0)
        return impossible(problem, {"No case has a resonance peak from " + band + "."});
    if (highest <= wanted.below_db)
        return impossible(problem, {"The highest peak is " + number_text(highest, 4) +
                                    " dB already: nothing to quiet."});
    const std::string spread = "Peaks from " + number_text(low, 4) + " to " + number_text(high, 4) +
                               " rad/s over all cases, up to " + number_text(highest, 4) + " dB.";
    const double size = std::pow(10.0, (wanted.below_db - highest) / 20.0);
    // The flanks move a little when the notch comes in: widen until every case keeps the level.
    constexpr double step = 1.05;
    for (double widening = 1.0;; widening *= step) {
        const Section notch = notch_for(low, high, size, widening);
        if (notch.pole_damping > most_pole_damping)
            break;
        Chain chain = problem.compensator;
        chain.push_back(notch);
        const Evaluation after = evaluate(problem, chain);
        if (highest_db(after, low, high) > wanted.below_db)
            continue;
        SectionProposal proposal{true, chain, {chain.size() - 1}, {spread}};
        proposal.words.push_back(
            "Notch at " + number_text(notch.corner_rad_s, 4) + " rad/s, dampings " +
            number_text(notch.zero_damping, 3) + " and " + number_text(notch.pole_damping, 3) +
            ": below " + number_text(wanted.below_db, 4) + " dB at the peak of every case.");
        if (const auto crossover = lowest_crossover(evaluation); crossover && *crossover < low)
            proposal.words.push_back(
                "It takes " +
                number_text(-phase_change_deg(problem.compensator, chain, *crossover), 3) +
                " deg at crossover, " + number_text(*crossover, 4) + " rad/s.");
        return proposal;
    }
    return impossible(problem,
                      {spread, "One notch wide enough for this spread would have a pole damping "
                               "above " +
                                   number_text(most_pole_damping, 2) +
                                   ": lower the gain there (roll off), or use a notch for each "
                                   "group of units."});
}

} // namespace cornerwright
