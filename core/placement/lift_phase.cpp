#include "core/loop/frequency_figures.h"
#include "core/numerics/bracketed_root.h"
#include "core/numerics/number_text.h"
#include "core/placement/design_practice.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <functional>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double radians = std::numbers::pi / 180.0;
/// More than this asks for corners so far apart that two sections do it with less gain.
constexpr double most_of_one_deg = 60.0;
constexpr int most_sections = 2;

double ratio_of(double lift_deg) {
    const double sine = std::sin(lift_deg * radians);
    return (1.0 + sine) / (1.0 - sine);
}

Complex value_at(const PlacementLoop& loop, double w) {
    const std::array<double, 1> one{w};
    const auto points = std::visit([&](const auto& l) { return loop_points(l, one); }, loop.loop);
    return points.front().loop;
}

/// Where |L| last falls through exp(level) on its way up in frequency, from its grid and polished.
std::optional<double> falls_through(const PlacementLoop& loop, double level) {
    const LoopCurves& curves = loop.assessment.curves;
    const auto size = [&](std::size_t i) { return std::log(std::abs(curves.loop[i])) - level; };
    for (std::size_t i = curves.w_rad_s.size(); i-- > 1;) {
        if (size(i - 1) < 0.0 || size(i) >= 0.0)
            continue;
        const auto f = [&](double ln_w) {
            return std::log(std::abs(value_at(loop, std::exp(ln_w)))) - level;
        };
        const double a = std::log(curves.w_rad_s[i - 1]);
        const double b = std::log(curves.w_rad_s[i]);
        const double fa = f(a);
        const double fb = f(b);
        if ((fa < 0.0) == (fb < 0.0))
            return curves.w_rad_s[i];
        return std::exp(bracketed_root(f, a, fa, b, fb));
    }
    return {};
}

Requirement margin_wanted(double deg) {
    Requirement requirement;
    requirement.measure = Measure::phase_margin;
    requirement.at_least = deg;
    return requirement;
}

/// 180 + arg L at a frequency, wrapped to (-180, 180].
double phase_above_minus_180_deg(const PlacementLoop& loop, double w) {
    return std::remainder(180.0 + std::arg(value_at(loop, w)) / radians, 360.0);
}

/// The loop that decides, and the phase it has.
struct Start {
    const PlacementLoop* loop = nullptr;
    double present_deg = HUGE_VAL;
};

/// Whether the loop's curve reaches that frequency (a measurement ends).
bool reaches(const PlacementLoop& loop, double w) {
    const std::vector<double>& grid = loop.assessment.curves.w_rad_s;
    return !grid.empty() && grid.front() <= w && w <= grid.back();
}

/// The loop with the smallest phase margin, unstable ones (below zero) included; with a wanted
/// crossover the one with the least phase there.
Start worst_start(const Evaluation& evaluation, const PhaseLift& wanted) {
    Start start;
    for (const PlacementLoop& loop : evaluation.loops) {
        Figure margin = loop.assessment.figures.frequency.phase_margin_deg;
        if (wanted.crossover_rad_s && reaches(loop, *wanted.crossover_rad_s))
            margin = Figure::of(phase_above_minus_180_deg(loop, *wanted.crossover_rad_s));
        else if (wanted.crossover_rad_s)
            continue;
        if (margin.is_value() && margin.value() < start.present_deg)
            start = {&loop, margin.value()};
    }
    return start;
}

Chain with_leads(const Chain& chain, const PlacementLoop& worst, const PhaseLift& wanted,
                 const LeadEstimate& lead) {
    Section section;
    section.kind = SectionKind::lead;
    section.zero_rad_s = lead.centre_rad_s / std::sqrt(lead.ratio);
    section.pole_rad_s = lead.centre_rad_s * std::sqrt(lead.ratio);
    Chain result = chain;
    if (wanted.crossover_rad_s) {
        // At its centre a lead with unit gain at s = 0 is sqrt(ratio).
        const double size = std::abs(value_at(worst, lead.centre_rad_s));
        result =
            with_gain_factor(std::move(result), std::pow(lead.ratio, -0.5 * lead.sections) / size);
    }
    result.insert(result.end(), static_cast<std::size_t>(lead.sections), section);
    return result;
}

std::optional<LeadEstimate> lead_for(const PlacementLoop& read, const PhaseLift& wanted,
                                     double lift_deg, int sections) {
    LeadEstimate lead{lift_deg, sections, ratio_of(lift_deg), 0.0};
    const auto centre = wanted.crossover_rad_s
                            ? wanted.crossover_rad_s
                            : falls_through(read, -0.5 * sections * std::log(lead.ratio));
    if (!centre)
        return {};
    lead.centre_rad_s = *centre;
    return lead;
}

/// Solves for the lift with which every margin is the wanted one.
class LiftSolver {
  public:
    LiftSolver(const PlacementProblem& problem, const PlacementLoop& worst, const PhaseLift& wanted)
        : judged_(with_only(problem, margin_wanted(wanted.phase_margin_deg))),
          worst_(worst),
          wanted_(wanted) {}

    Chain chain_with(const LeadEstimate& lead) const {
        return with_leads(judged_.compensator, worst_, wanted_, lead);
    }

    /// The least lift by `sections` leads: with the centre read off the worst case's curve; where
    /// that cannot be (cases whose crossovers lie far apart), off the other cases' curves and then
    /// at places from below the lowest crossover to above the highest.
    std::optional<LeadEstimate> least(const Evaluation& evaluation, int sections) const {
        auto lead = least_read_off(worst_, sections);
        if (lead || wanted_.crossover_rad_s)
            return lead;
        double lowest = HUGE_VAL;
        double highest = 0.0;
        for (const PlacementLoop& loop : evaluation.loops) {
            if (&loop != &worst_)
                lead = smaller(lead, least_read_off(loop, sections));
            for (const double w : loop.assessment.figures.frequency.crossovers_rad_s) {
                lowest = std::min(lowest, w);
                highest = std::max(highest, w);
            }
        }
        constexpr double octave = 2.0;
        for (double w = lowest / octave; !lead && w <= highest * octave; w *= octave)
            lead = least_lift([&](double lift_deg) {
                return LeadEstimate{lift_deg, sections, ratio_of(lift_deg), w};
            });
        return lead;
    }

  private:
    using Placing = std::function<std::optional<LeadEstimate>(double lift_deg)>;

    static std::optional<LeadEstimate> smaller(std::optional<LeadEstimate> a,
                                               std::optional<LeadEstimate> b) {
        return !a || (b && b->lift_deg < a->lift_deg) ? b : a;
    }

    std::optional<LeadEstimate> least_read_off(const PlacementLoop& loop, int sections) const {
        return least_lift(
            [&](double lift_deg) { return lead_for(loop, wanted_, lift_deg, sections); });
    }

    std::optional<LeadEstimate> least_lift(const Placing& place) const {
        // Undetermined (unstable, or no place for the centre) counts as far short.
        constexpr double far_short = -360.0;
        const auto excess = [&](double lift_deg) {
            const auto lead = place(lift_deg);
            if (!lead)
                return far_short;
            const Figure margin = worst_figure(judged_, chain_with(*lead));
            return margin.is_value() ? margin.value() - wanted_.phase_margin_deg : far_short;
        };
        constexpr double stride_deg = 2.5;
        constexpr double least_deg = 1e-4; // a lead of no lift at all has no centre
        double below = least_deg;
        double excess_below = excess(below);
        for (double lift = stride_deg; lift <= most_of_one_deg; lift += stride_deg) {
            const double here = excess(lift);
            if (here >= 0.0 && excess_below < 0.0)
                return place(bracketed_root(excess, below, excess_below, lift, here));
            below = lift;
            excess_below = here;
        }
        return {};
    }

    PlacementProblem judged_;
    const PlacementLoop& worst_;
    const PhaseLift& wanted_;
};

std::string pair_words(const LeadEstimate& lead) {
    return "zero at " + number_text(lead.centre_rad_s / std::sqrt(lead.ratio), 4) +
           " rad/s, pole at " + number_text(lead.centre_rad_s * std::sqrt(lead.ratio), 4) +
           " rad/s";
}

} // namespace

std::optional<LeadEstimate> lead_estimate(const PlacementProblem& problem,
                                          const PhaseLift& wanted) {
    const Evaluation evaluation =
        evaluate(with_only(problem, margin_wanted(wanted.phase_margin_deg)), problem.compensator);
    const Start start = worst_start(evaluation, wanted);
    if (!start.loop)
        return {};
    const double lift = wanted.phase_margin_deg - start.present_deg + wanted.allowance_deg;
    if (start.present_deg >= wanted.phase_margin_deg || lift > most_sections * most_of_one_deg)
        return {};
    const int sections = lift > most_of_one_deg ? 2 : 1;
    return lead_for(*start.loop, wanted, lift / sections, sections);
}

SectionProposal lift_phase(const PlacementProblem& problem, const PhaseLift& wanted) {
    const PlacementProblem judged = with_only(problem, margin_wanted(wanted.phase_margin_deg));
    const Evaluation evaluation = evaluate(judged, problem.compensator);
    const Start start = worst_start(evaluation, wanted);
    if (!start.loop)
        return impossible(problem, {wanted.crossover_rad_s
                                        ? "No case reaches the wanted crossover."
                                        : "No loop crosses 0 dB, so there is no phase margin to "
                                          "lift."});
    const double present = start.present_deg;
    const std::string name = problem.plants[start.loop->plant].name;
    const bool is_stable = evaluation.merit > unstable_merit;
    if (present >= wanted.phase_margin_deg && (is_stable || wanted.crossover_rad_s))
        return impossible(problem, {"The phase margin is " + number_text(present, 4) + " deg on " +
                                    name + ", the worst case: nothing to lift."});
    const auto estimate = lead_estimate(problem, wanted);
    const LiftSolver solver(problem, *start.loop, wanted);
    for (int sections = estimate ? estimate->sections : 1; sections <= most_sections; ++sections) {
        const auto lead = solver.least(evaluation, sections);
        if (!lead)
            continue;
        SectionProposal proposal{true, solver.chain_with(*lead), {}, {}};
        for (std::size_t i = problem.compensator.size(); i < proposal.compensator.size(); ++i)
            proposal.added.push_back(i);
        proposal.words.push_back("The worst case is " + name + " with " + number_text(present, 4) +
                                 " deg.");
        if (estimate)
            proposal.words.push_back(
                "First cut with an allowance of " + number_text(wanted.allowance_deg, 3) +
                " deg: " + number_text(estimate->lift_deg * estimate->sections, 4) + " deg, " +
                pair_words(*estimate) + ".");
        proposal.words.push_back("Solved so that " + number_text(wanted.phase_margin_deg, 4) +
                                 " deg is met on every case: " + std::to_string(sections) +
                                 (sections == 1 ? " lead, " : " equal leads, ") +
                                 number_text(lead->lift_deg, 4) + " deg, " + pair_words(*lead) +
                                 ".");
        return proposal;
    }
    std::vector<std::string> words{"Even two leads of " + number_text(most_of_one_deg, 3) +
                                   " deg do not give " + number_text(wanted.phase_margin_deg, 4) +
                                   " deg on every case (" + name + " has " +
                                   number_text(present, 4) + " deg)."};
    for (std::string& limit : limits_of_physics(problem, evaluation))
        words.push_back(std::move(limit));
    return impossible(problem, std::move(words));
}

} // namespace cornerwright
