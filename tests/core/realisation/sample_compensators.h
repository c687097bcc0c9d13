#pragma once

#include "core/realisation/difference_equation.h"

#include <string>
#include <vector>

namespace cornerwright::test {

/// A compensator of our own invention, for tests of every method, structure and number format.
struct SampleCompensator {
    std::string name;
    Chain chain;
    std::optional<OutputLimits> limits;
};

/// Every kind of section, alone and together; corners fit a sample period of 1 ms.
std::vector<SampleCompensator> sample_compensators();

constexpr double sample_period_s = 0.001;

std::vector<Method> all_methods();
std::vector<Structure> all_structures();
/// float64, float32, fixed 32 bits with 24 fraction bits, fixed 16 bits with 11.
std::vector<NumberFormat> all_formats();

/// "ramp_invariant, delta, fixed 16" for messages.
std::string words_of(const Realisation& realisation);

} // namespace cornerwright::test
