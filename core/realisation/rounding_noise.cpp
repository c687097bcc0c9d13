#include "core/realisation/bit_true_run.h"
#include "core/realisation/fixed_sections.h"
#include "core/realisation/linear_section.h"
#include "core/realisation/node_bounds.h"
#include "core/realisation/precision.h"
#include "core/realisation/run_plan.h"
#include "core/realisation/section_coefficients.h"
#include "core/realisation/white_input.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <span>

namespace cornerwright {
namespace {

enum class Source { output, w1, w2 };

/// Sum of squares at the compensator's output after one step of rounding error at a source in
/// `sections.front()`.
double noise_gain(std::span<const DiscreteSection> sections, Structure structure, Source source) {
    std::vector<LinearSection<double>> run;
    for (const DiscreteSection& section : sections)
        run.emplace_back(section, structure);
    const ImpulseLength length = impulse_length(sections);
    double sum = 0.0;
    for (int n = 0; n < length.samples; ++n) {
        double signal = run.front().step(0.0);
        if (n == 0 && source == Source::output) {
            signal = 1.0;
            run.front().disturb_output(1.0);
        } else if (n == 0) {
            run.front().disturb(source == Source::w1 ? 0 : 1, 1.0);
        }
        for (std::size_t i = 1; i < run.size(); ++i)
            signal = run[i].step(signal);
        sum += signal * signal * (n + 1 == length.samples ? 1.0 + length.tail / 2.0 : 1.0);
    }
    return sum;
}

/// A section that only multiplies by a whole number rounds nothing.
bool rounds(const DiscreteSection& section, std::size_t order) {
    return order > 0 || section.b[0] != std::round(section.b[0]);
}

Figure theory_rms(const DifferenceEquation& equation) {
    const NumberFormat& format = equation.realisation.number_format;
    if (format.type != NumberFormat::Type::fixed)
        return Figure::undetermined("in floating point the noise follows the signal");
    const Structure structure = equation.realisation.structure;
    const std::span<const DiscreteSection> sections = equation.sections;
    if (!impulse_length(sections).decays)
        return Figure::undetermined("a pole outside the unit circle after rounding");
    double gain = 0.0;
    for (std::size_t i = 0; i < sections.size(); ++i) {
        const std::size_t order = order_of(sections[i], structure);
        if (has_integrator(sections[i], structure))
            return Figure::infinite().with_note("an integrator adds the rounding errors up");
        if (!rounds(sections[i], order))
            continue;
        gain += noise_gain(sections.subspan(i), structure, Source::output);
        if (structure == Structure::direct_form_1)
            continue;
        if (order > 0)
            gain += noise_gain(sections.subspan(i), structure, Source::w1);
        if (order > 1)
            gain += noise_gain(sections.subspan(i), structure, Source::w2);
    }
    return Figure::of(std::ldexp(std::sqrt(gain / 12.0), -format.fraction_bits));
}

/// Half of what may go in before the output could be cut off.
double input_size(const DifferenceEquation& equation) {
    const double output =
        l1_bounds(equation.sections, equation.realisation.structure).back().output;
    double size = 1.0;
    if (equation.realisation.number_format.type == NumberFormat::Type::fixed &&
        std::isfinite(output))
        size = std::min(size, range_of(equation.realisation.number_format) / output);
    return size / 2.0;
}

} // namespace

RoundingNoise rounding_noise(const DifferenceEquation& equation) {
    constexpr int samples = 20000;
    const DifferenceEquation unlimited = [&equation] {
        DifferenceEquation copy = equation;
        copy.realisation.output_limits.reset();
        return copy;
    }();
    RoundingNoise noise{theory_rms(equation), 0.0, input_size(equation), samples};

    BitTrueRun run(unlimited);
    std::vector<LinearSection<long double>> exact;
    for (const DiscreteSection& section : unlimited.sections)
        exact.emplace_back(section, unlimited.realisation.structure);
    WhiteInput input(noise.input_size);
    double sum = 0.0;
    for (int n = 0; n < samples; ++n) {
        const double error = held_value(input.next(), unlimited.realisation.number_format);
        long double signal = error;
        for (LinearSection<long double>& section : exact)
            signal = section.step(signal);
        const auto difference = static_cast<double>(run.step(error) - signal);
        sum += difference * difference;
    }
    noise.simulated_rms = std::sqrt(sum / samples);
    return noise;
}

} // namespace cornerwright
