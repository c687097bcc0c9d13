#pragma once

#include "core/realisation/difference_equation.h"

#include <optional>
#include <vector>

namespace cornerwright {

/// What a section's step has to know besides its coefficients.
struct SectionPlan {
    std::size_t order = 0;
    bool integrator = false;
    /// True where an output limit stops this section: it integrates, and a positive input of the
    /// section drives the output up (`grows_with_input`) or down.
    bool held_at_limits = false;
    bool grows_with_input = true;
};

/// How a difference equation runs beyond its sections; the bit-true run and every generated text
/// follow the same plan.
struct RunPlan {
    std::vector<SectionPlan> sections;
    /// Limits of the output as the format holds them. Besides the user's: the range of the word
    /// where a last section amplifies what an integrator holds, which could otherwise wind up
    /// beyond it.
    std::optional<OutputLimits> limits;
    /// The section whose state a bumpless start sets: the last one that is a plain integrator.
    /// Nothing where the output follows the error from rest.
    std::optional<std::size_t> restart_section;
    /// The power of two by which the output exceeds the output of that section.
    int restart_exponent = 0;
};

RunPlan run_plan(const DifferenceEquation& equation);

/// The numbers that run: beta and alpha of a delta section, b and a otherwise.
const std::array<double, 3>& running_numerator(const DiscreteSection& section, Structure structure);
const std::array<double, 3>& running_denominator(const DiscreteSection& section,
                                                 Structure structure);

/// `value` as the number format holds it: nearest, in fixed point with ties away from zero and
/// saturating.
double held_value(double value, const NumberFormat& format);

} // namespace cornerwright
