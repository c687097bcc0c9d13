#include "core/loop/closed_loop_poles.h"
#include "tests/core/numerics/random_roots.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace cornerwright {
namespace {

using test::RandomRoots;
using test::worst_mismatch;

DesignLoop loop_of(RootForm compensator, RootForm plant, double dead_time = 0.0) {
    return {std::move(compensator), PlantModel{std::move(plant), dead_time}};
}

// K. Ogata, Modern Control Engineering, 5th ed., ch. 7, lead compensation of 4/(s(s+2)) (citation
// from memory): Gc = 41.7 (s + 4.41)/(s + 18.4). Poles recomputed with 50 digits.
TEST(DesignPoles, TextbookLead) {
    const ClosedLoopPoles result =
        closed_loop_poles(loop_of({{-4.41}, {-18.4}, 41.7}, {{}, {0.0, -2.0}, 4.0}));
    EXPECT_TRUE(result.complete);
    EXPECT_LT(worst_mismatch(
                  result.poles,
                  {{-6.954120785, 8.059234433}, {-6.954120785, -8.059234433}, {-6.49175843, 0.0}}),
              1e-9);
    for (const double error : result.relative_error)
        EXPECT_LT(error, 1e-14);
}

// K. Ogata, as above, ch. 5 (Routh; citation from memory): K/(s(s+1)(s+2)) at K = 6 has its poles
// at -3 and +-j sqrt 2.
TEST(DesignPoles, AtTheLimitOfStability) {
    const ClosedLoopPoles result = closed_loop_poles(loop_of({}, {{}, {0.0, -1.0, -2.0}, 6.0}));
    ASSERT_EQ(result.poles.size(), 3u);
    EXPECT_NEAR(result.poles[0].real(), -3.0, 1e-15);
    EXPECT_EQ(result.poles[1].real(), 0.0);
    EXPECT_NEAR(result.poles[2].imag(), std::sqrt(2.0), 1e-15);
}

TEST(DesignPoles, CancelledFactorsBetweenCompensatorAndPlantStay) {
    // A zero of C on the unstable pole of P hides the mode; it is a closed-loop pole all the same.
    const ClosedLoopPoles result =
        closed_loop_poles(loop_of({{3.0}, {-10.0}, 1.0}, {{}, {3.0, -1.0}, 5.0}));
    EXPECT_THAT(result.poles, testing::Contains(Complex(3.0)));
    EXPECT_EQ(result.poles.size(), 3u);
}

TEST(DesignPoles, ImproperCompensator) {
    // PD on 1/s: s + 2 (s + 3) = 0; two zeros more than poles: s + (s + 1)(s + 2) = 0.
    EXPECT_EQ(closed_loop_poles(loop_of({{-3.0}, {}, 2.0}, {{}, {0.0}, 1.0})).poles,
              ComplexVector{-2.0});
    EXPECT_LT(
        worst_mismatch(closed_loop_poles(loop_of({{-1.0, -2.0}, {}, 1.0}, {{}, {0.0}, 1.0})).poles,
                       {-2.0 - std::sqrt(2.0), -2.0 + std::sqrt(2.0)}),
        1e-15);
}

TEST(DesignPoles, WithoutAFitAMeasurementHasNone) {
    DesignLoop loop;
    loop.plant = MeasuredPlant{};
    const ClosedLoopPoles result = closed_loop_poles(loop);
    EXPECT_TRUE(result.poles.empty());
    EXPECT_FALSE(result.note.empty());
}

TEST(DesignPoles, FromTheFitSaysSo) {
    DesignLoop loop;
    MeasuredPlant plant;
    plant.fit = FittedModel{{{{}, {-1.0}, 1.0}, 0.0}, 0.4};
    loop.plant = plant;
    const ClosedLoopPoles result = closed_loop_poles(loop);
    EXPECT_EQ(result.poles, ComplexVector{-2.0});
    EXPECT_EQ(result.note, "from the fit, misfit 0.4 dB");
}

TEST(DesignPoles, ErrorBoundHoldsAgainstTheSameLoopInFactoredProducts) {
    // Loops built from their closed-loop poles: prod(s - c) = prod(s - p) + k, c from p by
    // construction of p = roots of prod(s - c) - k, so that c must come back within the bound.
    RandomRoots random(21);
    for (int run = 0; run < 200; ++run) {
        const ComplexVector closed = random.roots(random.integer(1, 8), 3.0);
        const double gain = random.log_uniform(0.01, 10.0);
        const ClosedLoopPoles open = closed_loop_poles(loop_of({}, {{}, closed, -gain}));
        const ClosedLoopPoles back = closed_loop_poles(loop_of({}, {{}, open.poles, gain}));
        ASSERT_EQ(back.poles.size(), closed.size());
        ComplexVector left = closed;
        for (std::size_t i = 0; i < back.poles.size(); ++i) {
            const auto nearest =
                std::min_element(left.begin(), left.end(), [&](Complex one, Complex other) {
                    return std::norm(one - back.poles[i]) < std::norm(other - back.poles[i]);
                });
            // The open loop's poles are rounded once more on the way: a hundred times the bound
            // of a single rounding of the gain covers eight of them.
            EXPECT_LE(std::abs(*nearest - back.poles[i]),
                      100.0 * back.relative_error[i] * std::abs(back.poles[i]) + 1e-12)
                << "run " << run;
            left.erase(nearest);
        }
    }
}

// K exp(-s tau)/s is at its limit at K tau = pi/2, w tau = pi/2: K. J. Astrom, T. Hagglund,
// Advanced PID Control, ch. 2 and 4 (citation from memory).
TEST(DesignPoles, IntegratorWithDeadTimeAtItsLimit) {
    const double tau = 0.2;
    const double limit = std::numbers::pi / 2.0 / tau;
    const ClosedLoopPoles result = closed_loop_poles(loop_of({}, {{}, {0.0}, limit}, tau));
    EXPECT_FALSE(result.complete);
    ASSERT_GE(result.poles.size(), 2u);
    const Complex rightmost = result.poles.back();
    EXPECT_NEAR(rightmost.real(), 0.0, 1e-14 * limit);
    EXPECT_NEAR(std::abs(rightmost.imag()), limit, 1e-14 * limit);
    EXPECT_THAT(result.note, testing::HasSubstr("dead time"));
}

TEST(DesignPoles, DeadTimeOfPlantAndComputationAddUp) {
    DesignLoop split = loop_of({}, {{}, {0.0, -1.0}, 2.0}, 0.3);
    split.computation_delay_s = 0.2;
    const DesignLoop whole = loop_of({}, {{}, {0.0, -1.0}, 2.0}, 0.5);
    EXPECT_EQ(closed_loop_poles(split).poles, closed_loop_poles(whole).poles);
}

TEST(DesignPoles, TinyDeadTimeTendsToNone) {
    const RootForm plant{{}, {0.0, -1.0, -2.0}, 3.0};
    EXPECT_LT(worst_mismatch(closed_loop_poles(loop_of({}, plant, 1e-7)).poles,
                             closed_loop_poles(loop_of({}, plant)).poles),
              1e-6);
}

} // namespace
} // namespace cornerwright
