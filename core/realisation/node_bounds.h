#pragma once

#include "core/realisation/difference_equation.h"

#include <array>
#include <span>
#include <vector>

namespace cornerwright {

/// Largest size that the signals of one section can reach over all inputs of size 1: the sums of
/// the absolute impulse responses from the compensator's input (L1 norms). Infinite behind an
/// integrator. `states` are the stored w1, w2 of the transposed and delta structures (w2 of a delta
/// section times 2^delta_shift); for direct form 1, which stores inputs and outputs, they are 0.
/// Source: L. B. Jackson, On the interaction of roundoff noise and dynamic range in digital
/// filters, Bell Syst. Tech. J. 49 (1970) (citation from memory).
struct NodeBounds {
    double output = 0.0;
    std::array<double, 2> states{};

    double largest() const;
};

/// How long an impulse is followed: 20 time constants of the slowest mode (what is left is e^-20 of
/// the whole), within limits that keep the slowest corners at the highest rates affordable. `tail`
/// is then what remains behind the last sample, in units of that sample, as a geometric series.
/// Integrators are left out.
struct ImpulseLength {
    int samples = 0;
    double tail = 0.0;
    bool decays = true;
};

ImpulseLength impulse_length(std::span<const DiscreteSection> sections);

std::vector<NodeBounds> l1_bounds(std::span<const DiscreteSection> sections, Structure structure);

} // namespace cornerwright
