#include "core/handover/test_vectors.h"

#include "core/realisation/bit_true_run.h"
#include "core/realisation/run_plan.h"
#include "core/realisation/white_input.h"

namespace cornerwright {
namespace {

constexpr int resting = 2;
constexpr int stepped = 40;
constexpr int noisy = 120;
constexpr int overdriven = 40;
constexpr int silent = 54;

std::vector<double> inputs() {
    std::vector<double> values(resting, 0.0);
    values.insert(values.end(), stepped, 0.5);
    WhiteInput noise(0.5);
    for (int i = 0; i < noisy; ++i)
        values.push_back(noise.next());
    for (int i = 0; i < overdriven; ++i)
        values.push_back(i < overdriven / 2 ? 2.0 : -2.0);
    values.insert(values.end(), silent, 0.0);
    return values;
}

} // namespace

TestVectors test_vectors(const DifferenceEquation& equation) {
    constexpr int restarted = 20;
    const NumberFormat& format = equation.realisation.number_format;
    TestVectors vectors;
    BitTrueRun run(equation);
    for (const double input : inputs()) {
        const double error = held_value(input, format);
        vectors.from_rest.push_back({error, run.step(error)});
    }
    vectors.restart_output = held_value(0.375, format);
    run.reset(vectors.restart_output);
    WhiteInput small(0.01);
    for (int i = 0; i < restarted; ++i) {
        const double error = i == 0 ? 0.0 : held_value(small.next(), format);
        vectors.restarted.push_back({error, run.step(error)});
    }
    return vectors;
}

} // namespace cornerwright
