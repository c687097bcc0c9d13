#pragma once

#include "core/realisation/difference_equation.h"

#include <vector>

namespace cornerwright {

/// One sample of a test: what goes in and what must come out, exact in the number format.
struct TestSample {
    double error = 0.0;
    double output = 0.0;
};

/// Inputs and the exact outputs of the bit-true run: from rest, a step, white noise, a burst of
/// twice full scale (so that saturation and output limits show), and silence. Then a bumpless start
/// from `restart_output` with a small error.
struct TestVectors {
    std::vector<TestSample> from_rest;
    double restart_output = 0.0;
    std::vector<TestSample> restarted;
};

TestVectors test_vectors(const DifferenceEquation& equation);

} // namespace cornerwright
