#include "core/numerics/bracketed_root.h"
#include "core/numerics/number_text.h"
#include "core/placement/design_practice.h"

#include <cmath>

namespace cornerwright {
namespace {

constexpr double pair_damping = 0.7; ///< flat and without a peak: common practice, no source

Chain with_poles(const Chain& chain, double corner, bool complex_poles) {
    Section section;
    section.kind = complex_poles ? SectionKind::complex_poles : SectionKind::real_pole;
    section.corner_rad_s = corner;
    section.pole_rad_s = corner;
    section.damping = pair_damping;
    Chain result = chain;
    result.push_back(section);
    return result;
}

} // namespace

SectionProposal roll_off(const PlacementProblem& problem, const RollOff& wanted) {
    Requirement requirement;
    requirement.measure = Measure::roll_off;
    requirement.at_most = wanted.below_db;
    requirement.from_rad_s = wanted.from_rad_s;
    const PlacementProblem judged = with_only(problem, requirement);
    const Figure now = worst_figure(judged, problem.compensator);
    if (!now.is_determined())
        return impossible(problem, {"The roll-off is not determined: " + now.reason() + "."});
    if (now.value() <= wanted.below_db)
        return impossible(problem, {"The worst case has " + number_text(now.value(), 4) +
                                    " dB already: nothing to add."});
    const auto excess = [&](double log_corner) {
        const Figure value = worst_figure(
            judged, with_poles(problem.compensator, std::exp(log_corner), wanted.complex_poles));
        constexpr double far_above = 1e3; // not stable, or not to be realised
        return value.is_determined() ? value.value() - wanted.below_db : far_above;
    };
    // From a decade above downwards: the first corner that is low enough is the highest.
    constexpr double stride = 0.05;
    const double highest = std::log(10.0 * wanted.from_rad_s);
    const double lowest = std::log(1e-3 * wanted.from_rad_s);
    double above = highest;
    double excess_above = excess(above);
    for (double corner = highest - stride; corner > lowest; corner -= stride) {
        const double here = excess(corner);
        if (here <= 0.0 && excess_above > 0.0) {
            const double root = std::exp(bracketed_root(excess, corner, here, above, excess_above));
            Chain chain = with_poles(problem.compensator, root, wanted.complex_poles);
            SectionProposal proposal{true, chain, {chain.size() - 1}, {}};
            proposal.words.push_back(std::string(wanted.complex_poles ? "Two poles" : "A pole") +
                                     " at " + number_text(root, 4) +
                                     " rad/s: " + number_text(wanted.below_db, 4) + " dB from " +
                                     number_text(wanted.from_rad_s, 4) + " rad/s on every case.");
            const Evaluation before = evaluate(judged, problem.compensator);
            if (const auto crossover = lowest_crossover(before))
                proposal.words.push_back(
                    "It takes " +
                    number_text(-phase_change_deg(problem.compensator, chain, *crossover), 3) +
                    " deg at crossover, " + number_text(*crossover, 4) + " rad/s.");
            return proposal;
        }
        above = corner;
        excess_above = here;
    }
    return impossible(problem, {"No corner gives " + number_text(wanted.below_db, 4) +
                                " dB there and leaves every loop stable: the crossover is too near "
                                "(use two poles, or lower the gain)."});
}

} // namespace cornerwright
