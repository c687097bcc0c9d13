#include "core/realisation/bit_true_run.h"
#include "core/realisation/node_bounds.h"
#include "core/realisation/precision.h"
#include "core/realisation/run_plan.h"
#include "core/realisation/white_input.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <utility>

namespace cornerwright {
namespace {

bool is_fixed(const DifferenceEquation& equation) {
    return equation.realisation.number_format.type == NumberFormat::Type::fixed;
}

bool integrates(const DifferenceEquation& equation) {
    return std::ranges::any_of(run_plan(equation).sections,
                               [](const SectionPlan& section) { return section.integrator; });
}

/// Runs on zero input until the state comes back (R. P. Brent's search: the state kept for
/// comparison is renewed at every power of two). Gives the period, or 0.
int period_on_zero_input(BitTrueRun& run, int longest) {
    std::vector<double> kept = run.state();
    int since = 0;
    int renew_at = 1;
    for (int n = 0; n < longest; ++n) {
        run.step(0.0);
        ++since;
        if (run.state() == kept)
            return since;
        if (since == renew_at) {
            kept = run.state();
            since = 0;
            renew_at *= 2;
        }
    }
    return 0;
}

/// Whether the last integrator still moves under a constant error once the rest has settled.
bool still_integrates(const DifferenceEquation& equation, double error, double output,
                      int settling) {
    constexpr int watched = 16;
    BitTrueRun run(equation);
    run.reset(output);
    for (int n = 0; n < settling; ++n)
        run.step(error);
    const double before = run.step(error);
    double after = before;
    for (int n = 0; n < watched; ++n)
        after = run.step(error);
    return after != before;
}

/// What remains of the run on zero input from the state in which it stands.
ZeroInputCycle cycle_of(const DifferenceEquation& equation, BitTrueRun run) {
    constexpr int longest = 200000;
    ZeroInputCycle cycle;
    const int period = period_on_zero_input(run, longest);
    if (period == 0) {
        cycle.amplitude =
            Figure::undetermined("still dying away after " + std::to_string(longest) + " samples");
        return cycle;
    }
    double low = std::numeric_limits<double>::infinity();
    double high = -low;
    for (int n = 0; n < period; ++n) {
        const double output = run.step(0.0);
        low = std::min(low, output);
        high = std::max(high, output);
    }
    // An integrator may rest anywhere; without one only 0 is rest.
    double amplitude =
        integrates(equation) ? (high - low) / 2.0 : std::max(std::abs(low), std::abs(high));
    // The last steps of a floating-point decay, below every number of normal size.
    if (!is_fixed(equation) && amplitude < std::numeric_limits<float>::min())
        amplitude = 0.0;
    cycle.amplitude = Figure::of(amplitude);
    cycle.period = amplitude > 0.0 ? period : 0;
    return cycle;
}

/// The larger; a cycle that was not ruled out stands above none.
double weight_of(const ZeroInputCycle& cycle) {
    return cycle.amplitude.is_value() ? cycle.amplitude.value()
                                      : std::numeric_limits<double>::min();
}

} // namespace

ZeroInputCycle zero_input_cycle(const DifferenceEquation& equation) {
    constexpr int excited = 1000;
    BitTrueRun noisy(equation);
    BitTrueRun pushed(equation);
    WhiteInput input(1.0);
    for (int n = 0; n < excited; ++n) {
        noisy.step(input.next());
        pushed.step(1.0);
    }
    const ZeroInputCycle after_noise = cycle_of(equation, std::move(noisy));
    const ZeroInputCycle after_step = cycle_of(equation, std::move(pushed));
    return weight_of(after_step) > weight_of(after_noise) ? after_step : after_noise;
}

Figure smallest_integrated_error(const DifferenceEquation& equation) {
    constexpr int longest_settling = 20000;
    if (!run_plan(equation).restart_section)
        return Figure::undetermined("no integrator");
    DifferenceEquation unlimited = equation;
    unlimited.realisation.output_limits.reset();
    const ImpulseLength length = impulse_length(unlimited.sections);
    const int settling = std::min(length.samples, longest_settling);
    const double output = is_fixed(equation) ? 0.0 : 1.0;
    const auto moves = [&](double error) {
        return still_integrates(unlimited, error, output, settling);
    };
    // In fixed point by whole steps, in floating point by the exponent and then to a percent.
    const double finest = is_fixed(equation)
                              ? std::ldexp(1.0, -equation.realisation.number_format.fraction_bits)
                              : std::numeric_limits<float>::min();
    double works = 1.0;
    double fails = finest / 2.0;
    if (!moves(works))
        return Figure::infinite();
    while (is_fixed(equation) ? works - fails > finest : works > 1.01 * fails) {
        const double middle = is_fixed(equation) && works < 64.0 * finest
                                  ? (works + fails) / 2.0
                                  : std::sqrt(works * fails);
        (moves(held_value(middle, equation.realisation.number_format)) ? works : fails) = middle;
    }
    return Figure::of(held_value(works, equation.realisation.number_format));
}

} // namespace cornerwright
