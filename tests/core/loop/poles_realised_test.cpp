#include "core/loop/closed_loop_poles.h"
#include "core/loop/sampled_plant.h"
#include "tests/core/numerics/random_roots.h"

#include <gtest/gtest.h>

namespace cornerwright {
namespace {

using test::worst_mismatch;

RealisedLoop loop_of(RootForm plant, double dead_time, double period, double gain) {
    RealisedLoop loop;
    loop.plant = PlantModel{std::move(plant), dead_time};
    loop.compensator.sample_period_s = period;
    DiscreteSection section;
    section.b = {gain, 0.0, 0.0};
    section.beta = {gain, 0.0, 0.0};
    loop.compensator.sections = {section};
    return loop;
}

// Zero-order-hold equivalent of a/(s + a) is (1 - e)/(z - e), e = exp(-a Ts): K. J. Astrom, B.
// Wittenmark, Computer-Controlled Systems, 3rd ed., ch. 2 (citation from memory). With a gain k the
// pole is e - k (1 - e).
TEST(RealisedPoles, FirstOrderLagBehindAGain) {
    const double e = std::exp(-0.1);
    const ClosedLoopPoles result = closed_loop_poles(loop_of({{}, {-1.0}, 1.0}, 0.0, 0.1, 4.0));
    ASSERT_EQ(result.poles.size(), 1u);
    EXPECT_NEAR(result.poles[0].real(), e - 4.0 * (1.0 - e), 1e-14);
}

TEST(RealisedPoles, WholeSamplesOfDeadTimeAddPoles) {
    // z (z - e) + k (1 - e) = 0
    const double e = std::exp(-0.1);
    const double k = 4.0 * (1.0 - e);
    const ClosedLoopPoles result = closed_loop_poles(loop_of({{}, {-1.0}, 1.0}, 0.1, 0.1, 4.0));
    const Complex root = std::sqrt(Complex(e * e / 4.0 - k));
    EXPECT_LT(worst_mismatch(result.poles, {e / 2.0 + root, e / 2.0 - root}), 1e-12);
}

TEST(RealisedPoles, HundredsOfSamplesOfDeadTime) {
    const ClosedLoopPoles result =
        closed_loop_poles(loop_of({{}, {-1.0 / 600.0}, 1.0 / 600.0}, 300.0, 1.0, 2.0));
    ASSERT_GE(result.poles.size(), 301u);
    const double e = std::exp(-1.0 / 600.0);
    for (const Complex& z : result.poles) {
        const Complex left = std::exp(300.0 * std::log(z)) * (z - e);
        EXPECT_LT(std::abs(left + 2.0 * (1.0 - e)), 1e-12);
    }
}

TEST(RealisedPoles, SlowDynamicsKeepTheirDigitsAtAFastRate) {
    // Ts w = 1e-9: z - 1 = exp(s Ts) - 1 to first order, so that the pole s = -2 must be seen.
    const ClosedLoopPoles result = closed_loop_poles(loop_of({{}, {-1.0}, 1.0}, 0.0, 1e-9, 1.0));
    ASSERT_EQ(result.poles.size(), 1u);
    EXPECT_NEAR((result.poles[0].real() - 1.0) / -2e-9, 1.0, 1e-6); // z itself has 16 digits
    EXPECT_LT(result.relative_error[0], 1e-15);
}

TEST(RealisedPoles, SatisfyTheLoopEquationWithAFractionalDelay) {
    const RealisedLoop loop =
        loop_of({{-3.0}, {0.0, Complex(-1.0, 5.0), Complex(-1.0, -5.0)}, 4.0}, 0.034, 0.02, 0.7);
    const SampledPlant plant = sample_plant(std::get<PlantModel>(loop.plant), 0.0, 0.02);
    const ClosedLoopPoles result = closed_loop_poles(loop);
    EXPECT_EQ(result.poles.size(),
              plant.delta_form.poles.size() + static_cast<std::size_t>(plant.whole_samples));
    for (const Complex& z : result.poles)
        EXPECT_LT(std::abs(1.0 + 0.7 * evaluate(plant, z - 1.0)), 1e-9);
}

TEST(RealisedPoles, NoneForAMeasurement) {
    RealisedLoop loop;
    loop.plant = MeasuredPlant{};
    EXPECT_TRUE(closed_loop_poles(loop).poles.empty());
    EXPECT_FALSE(closed_loop_poles(loop).note.empty());
}

} // namespace
} // namespace cornerwright
