#include "core/realisation/run_plan.h"

#include "core/realisation/fixed_sections.h"
#include "core/realisation/section_coefficients.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// Sections with order 0 behind the first one hold the power of two that the gain left over.
int exponent_behind(const DifferenceEquation& equation, std::size_t section) {
    int exponent = 0;
    for (std::size_t i = section + 1; i < equation.sections.size(); ++i)
        exponent += std::ilogb(equation.sections[i].b[0]);
    return exponent;
}

bool only_gains_behind(const RunPlan& plan, std::size_t section) {
    return std::all_of(plan.sections.begin() + static_cast<std::ptrdiff_t>(section) + 1,
                       plan.sections.end(),
                       [](const SectionPlan& later) { return later.order == 0; });
}

void plan_restart(RunPlan& plan, const DifferenceEquation& equation) {
    for (std::size_t i = plan.sections.size(); i-- > 0;) {
        if (!plan.sections[i].integrator)
            continue;
        if (plan.sections[i].order == 1 && only_gains_behind(plan, i)) {
            plan.restart_section = i;
            plan.restart_exponent = exponent_behind(equation, i);
        }
        return;
    }
}

void plan_limits(RunPlan& plan, const DifferenceEquation& equation) {
    const NumberFormat& format = equation.realisation.number_format;
    if (equation.realisation.output_limits) {
        const OutputLimits& limits = *equation.realisation.output_limits;
        plan.limits =
            OutputLimits{held_value(limits.at_least, format), held_value(limits.at_most, format)};
    } else if (plan.restart_section && plan.restart_exponent > 0) {
        const double range = range_of(format);
        plan.limits = OutputLimits{held_value(-range, format), held_value(range, format)};
    }
    for (SectionPlan& section : plan.sections)
        section.held_at_limits = section.held_at_limits && plan.limits;
}

} // namespace

RunPlan run_plan(const DifferenceEquation& equation) {
    const Structure structure = equation.realisation.structure;
    RunPlan plan;
    for (const DiscreteSection& section : equation.sections) {
        SectionPlan entry;
        entry.order = order_of(section, structure);
        entry.integrator = has_integrator(section, structure);
        const double growth = section.beta[entry.order];
        entry.held_at_limits = entry.integrator && growth != 0.0;
        entry.grows_with_input = growth > 0.0;
        plan.sections.push_back(entry);
    }
    plan_restart(plan, equation);
    plan_limits(plan, equation);
    return plan;
}

const std::array<double, 3>& running_numerator(const DiscreteSection& section,
                                               Structure structure) {
    return structure == Structure::delta ? section.beta : section.b;
}

const std::array<double, 3>& running_denominator(const DiscreteSection& section,
                                                 Structure structure) {
    return structure == Structure::delta ? section.alpha : section.a;
}

double held_value(double value, const NumberFormat& format) {
    if (format.type == NumberFormat::Type::float64)
        return value;
    if (format.type == NumberFormat::Type::float32)
        return static_cast<double>(static_cast<float>(value));
    const double steps = std::round(std::ldexp(value, format.fraction_bits));
    const double word = std::ldexp(1.0, format.word_bits - 1);
    return std::ldexp(std::clamp(steps, -word, word - 1.0), -format.fraction_bits);
}

} // namespace cornerwright
