#include "core/numerics/bracketed_root.h"
#include "core/numerics/number_text.h"
#include "core/placement/design_practice.h"

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double radians = std::numbers::pi / 180.0;

Requirement error_wanted(ErrorInput input, double error) {
    Requirement requirement;
    requirement.measure = Measure::steady_state_error;
    requirement.input = input;
    requirement.at_most = error;
    return requirement;
}

/// By what the loop's gain at zero must grow: e = 1/(1 + Kp) for a step, 1/Kv and 1/Ka else.
double growth_for(ErrorInput input, double now, double wanted) {
    if (input == ErrorInput::step)
        return (1.0 / wanted - 1.0) / (1.0 / now - 1.0);
    return now / wanted;
}

SectionProposal already(const PlacementProblem& problem, const std::string& what) {
    return impossible(problem, {what + " already: nothing to add."});
}

std::string error_words(ErrorInput input, const Figure& error) {
    const std::string value = error.is_value() ? number_text(error.value(), 4) : "infinite";
    return "The largest steady-state error (" + std::string(name_of(input)) + ") is " + value;
}

/// A lag whose phase at `w` is -spent: atan(z/w) - atan(z/(ratio w)) = spent, the lower of the two
/// answers. Where it can never spend so much, the one that spends most.
Section lag_for(double ratio, double w, double spent_deg) {
    const double highest = w * std::sqrt(ratio);
    const auto excess = [&](double zero) {
        return std::atan(zero / w) - std::atan(zero / (ratio * w)) - spent_deg * radians;
    };
    constexpr double lowest_part = 1e-9;
    const double lowest = lowest_part * w;
    const double most = excess(highest);
    Section lag;
    lag.kind = SectionKind::lag;
    lag.zero_rad_s =
        most <= 0.0 ? highest : bracketed_root(excess, lowest, excess(lowest), highest, most);
    lag.pole_rad_s = lag.zero_rad_s / ratio;
    return lag;
}

Chain with_lag(const Chain& chain, double ratio, double w, double spent_deg) {
    Chain result = with_gain_factor(chain, ratio);
    result.push_back(lag_for(ratio, w, spent_deg));
    return result;
}

SectionProposal taken(const PlacementProblem& problem, const PlacementProblem& judged, Chain chain,
                      double w, std::vector<std::string> words) {
    const Evaluation after = evaluate(judged, chain);
    if (after.merit <= unstable_merit) {
        words.emplace_back(
            "With it a loop would not be stable: allow less phase, or lift the phase "
            "margin first.");
        return impossible(problem, std::move(words));
    }
    words.push_back("It takes " + number_text(-phase_change_deg(problem.compensator, chain, w), 3) +
                    " deg at the lowest crossover, " + number_text(w, 4) + " rad/s.");
    const std::size_t last = chain.size() - 1;
    return {true, std::move(chain), {last}, std::move(words)};
}

SectionProposal with_pi(const PlacementProblem& problem, const PlacementProblem& judged, double w,
                        double spent_deg) {
    Section pi;
    pi.kind = SectionKind::pi;
    pi.corner_rad_s = w * std::tan(spent_deg * radians);
    Chain chain = problem.compensator;
    chain.push_back(pi);
    return taken(problem, judged, std::move(chain), w,
                 {"Only an integrator does this: PI with its corner at " +
                  number_text(pi.corner_rad_s, 4) + " rad/s."});
}

} // namespace

SectionProposal gain_for_error(const PlacementProblem& problem, ErrorInput input, double error) {
    const PlacementProblem judged = with_only(problem, error_wanted(input, error));
    const Figure now = worst_figure(judged, problem.compensator);
    if (!now.is_determined())
        return impossible(problem,
                          {"The steady-state error is not determined: " + now.reason() + "."});
    if (!now.is_value())
        return impossible(problem,
                          {error_words(input, now) + ": no gain makes it finite, an integrator "
                                                     "does (hold low frequency)."});
    if (now.value() == 0.0)
        return already(problem, error_words(input, now));
    if (error <= 0.0)
        return impossible(problem, {"No finite gain makes the error zero; an integrator does (hold "
                                    "low frequency)."});
    const double factor = growth_for(input, now.value(), error);
    SectionProposal proposal{true, with_gain_factor(problem.compensator, factor), {}, {}};
    proposal.words.push_back(error_words(input, now) + "; the gain times " +
                             number_text(factor, 4) + " makes it " + number_text(error, 4) + ".");
    if (evaluate(judged, proposal.compensator).merit <= unstable_merit)
        proposal.words.emplace_back(
            "With this gain alone a loop is not stable: lift the phase next, or hold low frequency "
            "instead.");
    return proposal;
}

SectionProposal hold_low_frequency(const PlacementProblem& problem,
                                   const LowFrequencyHold& wanted) {
    const PlacementProblem judged = with_only(problem, error_wanted(wanted.input, wanted.error));
    const Evaluation evaluation = evaluate(judged, problem.compensator);
    const auto crossover = lowest_crossover(evaluation);
    const Figure now = worst_figure(judged, problem.compensator);
    if (!crossover || !now.is_determined())
        return impossible(problem, {!crossover ? "No loop crosses 0 dB: set the gain first."
                                               : "The steady-state error is not determined: " +
                                                     now.reason() + "."});
    if (now.is_value() && now.value() <= wanted.error)
        return already(problem, error_words(wanted.input, now));
    if (!now.is_value() || wanted.error <= 0.0)
        return with_pi(problem, judged, *crossover, wanted.phase_spent_deg);
    const double ratio = growth_for(wanted.input, now.value(), wanted.error);
    Chain chain = with_lag(problem.compensator, ratio, *crossover, wanted.phase_spent_deg);
    return taken(problem, judged, std::move(chain), *crossover,
                 {error_words(wanted.input, now) + "; a lag with ratio " + number_text(ratio, 4) +
                  " makes it " + number_text(wanted.error, 4) + "."});
}

SectionProposal hold_rejection(const PlacementProblem& problem, double rejection_db,
                               double up_to_rad_s, double phase_spent_deg) {
    Requirement requirement;
    requirement.measure = Measure::disturbance_rejection;
    requirement.at_most = rejection_db;
    requirement.up_to_rad_s = up_to_rad_s;
    const PlacementProblem judged = with_only(problem, requirement);
    const auto crossover = lowest_crossover(evaluate(judged, problem.compensator));
    if (!crossover)
        return impossible(problem, {"No loop crosses 0 dB: set the gain first."});
    const auto excess = [&](double log_ratio) {
        const Chain chain =
            with_lag(problem.compensator, std::exp(log_ratio), *crossover, phase_spent_deg);
        const Figure rejection = worst_figure(judged, chain);
        constexpr double far_above = 1e3;
        return rejection.is_value() ? rejection.value() - rejection_db : far_above;
    };
    const Figure now = worst_figure(judged, problem.compensator);
    if (now.is_determined() && now.value() <= rejection_db)
        return already(problem, "The rejection is " + number_text(now.value(), 4) + " dB");
    const double widest = std::log(1e4);
    const double least = 1e-3;
    const double short_of = excess(least);
    const double reached = excess(widest);
    if (short_of <= 0.0 || reached > 0.0)
        return impossible(problem,
                          {"A lag that takes no more than " + number_text(phase_spent_deg, 3) +
                           " deg at crossover reaches up to too low a frequency for " +
                           number_text(rejection_db, 4) + " dB at " + number_text(up_to_rad_s, 4) +
                           " rad/s: allow more phase, or raise the crossover."});
    const double ratio = std::exp(bracketed_root(excess, least, short_of, widest, reached));
    return taken(problem, judged, with_lag(problem.compensator, ratio, *crossover, phase_spent_deg),
                 *crossover,
                 {"A lag with ratio " + number_text(ratio, 4) + " gives " +
                  number_text(rejection_db, 4) + " dB up to " + number_text(up_to_rad_s, 4) +
                  " rad/s on the worst case."});
}

} // namespace cornerwright
