#pragma once

#include "core/realisation/section_coefficients.h"

#include <span>
#include <string>
#include <vector>

namespace cornerwright {

/// Sections with integer coefficients, and sentences on how the gain was spread.
struct FixedSections {
    std::vector<DiscreteSection> sections;
    std::vector<std::string> notes;
};

/// Rounds the sections to signed Q numbers (nearest, ties away from zero). Every section has the
/// smallest shift with which its coefficients fit into the word and its sums of products into twice
/// the word. The gain is spread in powers of two so that no stored state overflows for a full-scale
/// input (size 1.0), by L1 bounds, and no signal is amplified on the way by more than a quarter of
/// the fraction bits; what then remains of the gain stands in a last section that holds a power of
/// two. A pole or zero at z = 1 stays there exactly. Throws InputError where the word cannot hold a
/// coefficient with any shift, or all of a section's numerator rounds to 0.
FixedSections fixed_sections(std::span<const SectionCoefficients> sections,
                             const Realisation& realisation);

/// Largest value of the format: 2^(word_bits - 1 - fraction_bits).
double range_of(const NumberFormat& format);

} // namespace cornerwright
