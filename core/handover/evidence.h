#pragma once

#include "core/handover/handover.h"

#include <string>
#include <vector>

namespace cornerwright {

/// The evidence that accompanies coefficients, line by line, plain text: verdict first (a warning
/// where a requirement is not met), transfer function, rates, the difference equation in words and
/// in code, what the number format costs, requirement results, hashes, cautions. Lines that belong
/// together follow each other; an empty line parts the groups.
std::vector<std::string> evidence_lines(const HandoverInput& input);

/// One sentence: "met: every requirement on every case and loop", or the warning.
std::string verdict_sentence(const Assessment& assessment);

/// The standing cautions in one paragraph.
std::string caution_text();

/// How the sections run, in words and code with the signs of a1 and a2 told, for this structure and
/// number format.
std::vector<std::string> difference_equation_words(const DifferenceEquation& equation);

/// What the number format does to the output and to the poles, in sentences: noise, zero-input
/// limit cycle, smallest error still integrated, pole error of each structure, and for fixed point
/// the smallest fraction bits that meet every requirement.
std::vector<std::string> format_cost_lines(const Project& project,
                                           const DifferenceEquation& equation);

/// Output limits and bumpless start, in sentences.
std::vector<std::string> limit_words(const DifferenceEquation& equation);

} // namespace cornerwright
