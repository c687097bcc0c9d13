#include "core/loop/closed_loop_poles.h"
#include "tests/core/loop/frequency_practice.h"

#include <gtest/gtest.h>

#include <cmath>
#include <memory>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;

FrequencyAssessment assess(const DesignLoop& loop) {
    return assess_frequency(loop, {}, closed_loop_poles(loop).poles);
}

/// 1 + K exp(-s tau)/s = 0 is stable for K tau < pi/2 and loses a pair at each pi/2 + 2 pi n.
TEST(FrequencyStability, IntegratorWithDeadTimeLosesItAtHalfPi) {
    const double tau = 0.25;
    for (const double product : {0.1, 1.0, 1.55, 1.5700}) {
        const DesignLoop loop = practice::plant_alone({{}, {0.0}, product / tau}, tau);
        EXPECT_EQ(assess(loop).stability.stable, true) << product;
        EXPECT_NEAR(assess(loop).figures.gain_margin_db.value(),
                    20.0 * std::log10(0.5 * pi / product), 1e-9);
    }
    for (const double product : {1.5715, 3.0, 20.0, 200.0}) {
        const DesignLoop loop = practice::plant_alone({{}, {0.0}, product / tau}, tau);
        EXPECT_EQ(assess(loop).stability.stable, false) << product;
    }
}

TEST(FrequencyStability, TheBoundaryItselfIsNotStable) {
    const DesignLoop dead_time = practice::plant_alone({{}, {0.0}, 0.5 * pi}, 1.0);
    EXPECT_EQ(assess(dead_time).stability.stable, false);
    // K = 6 on 1/(s (s + 1)(s + 2)): a pair on the axis.
    const DesignLoop rational = practice::plant_alone({{}, {0.0, -1.0, -2.0}, 6.0});
    EXPECT_EQ(assess(rational).stability.stable, false);
    const DesignLoop just_below = practice::plant_alone({{}, {0.0, -1.0, -2.0}, 6.0 * (1 - 1e-6)});
    EXPECT_EQ(assess(just_below).stability.stable, true);
}

TEST(FrequencyStability, DeadTimeOnALoopThatDoesNotRollOff) {
    const DesignLoop above = practice::plant_alone({{-1.0}, {-3.0}, 1.1}, 0.1);
    const FrequencyAssessment unstable = assess(above);
    EXPECT_EQ(unstable.stability.stable, false);
    EXPECT_NE(unstable.stability.reason.find("does not roll off"), std::string::npos);
    const DesignLoop below = practice::plant_alone({{-1.0}, {-3.0}, 0.9}, 0.1);
    const FrequencyAssessment stable = assess(below);
    EXPECT_EQ(stable.stability.stable, true);
    // The supremum 1/(1 - 0.9) is only approached at infinity.
    EXPECT_NEAR(stable.figures.sensitivity_peak_db.value(), 20.0, 1e-9);
    EXPECT_EQ(stable.figures.sensitivity_peak_at_rad_s.kind(), Figure::Kind::infinite);
}

TEST(FrequencyStability, AnUnstablePlantBehindDeadTimeIsCounted) {
    // k exp(-s tau)/(s - 1): stable for 1 < k < k_max(tau), never below 1.
    const auto stable = [](double gain) {
        return assess(practice::plant_alone({{}, {1.0}, gain}, 0.2)).stability.stable;
    };
    EXPECT_EQ(stable(0.9), false);
    EXPECT_EQ(stable(2.0), true);
    EXPECT_EQ(stable(4.0), true);
    EXPECT_EQ(stable(9.0), false);
}

TEST(FrequencyStability, UndampedPlantPolesArePassedOnTheRight) {
    // exp(-s tau) K s / (s^2 + 900): collocated rate feedback, stable while the lag at 30 rad/s
    // stays below 90 degrees.
    const auto stable = [](double tau) {
        const DesignLoop loop =
            practice::plant_alone({{0.0}, {{0.0, 30.0}, {0.0, -30.0}}, 3.0}, tau);
        return assess(loop).stability.stable;
    };
    EXPECT_EQ(stable(0.01), true);
    EXPECT_EQ(stable(0.08), false);
}

TEST(FrequencyStability, AHiddenFactorIsNamed) {
    DesignLoop loop = practice::plant_alone({{}, {4.0, -3.0}, 30.0});
    loop.compensator = {{4.0}, {-50.0}, 10.0};
    const FrequencyAssessment a = assess(loop);
    EXPECT_EQ(a.stability.stable, false);
    EXPECT_NE(a.stability.reason.find("(s - 4)"), std::string::npos) << a.stability.reason;

    DesignLoop washout = practice::plant_alone({{}, {0.0, -3.0}, 3.0});
    washout.compensator = {{0.0}, {-1.0}, 1.0};
    EXPECT_EQ(assess(washout).stability.stable, false);
    EXPECT_NE(assess(washout).stability.reason.find("factor s "), std::string::npos);

    DesignLoop left = practice::plant_alone({{}, {-4.0, -3.0}, 30.0});
    left.compensator = {{-4.0}, {-50.0}, 10.0};
    EXPECT_EQ(assess(left).stability.stable, true);
}

TEST(FrequencyStability, ConditionalStabilityIsRemarked) {
    DesignLoop loop = practice::plant_alone({{-1.0, -1.0}, {0.0, 0.0, 0.0, -80.0, -150.0}, 1e4});
    FrequencyAssessment a = assess(loop);
    double gain = 1e4;
    while (a.stability.stable != true && gain < 1e9) {
        gain *= 1.3;
        loop = practice::plant_alone({{-1.0, -1.0}, {0.0, 0.0, 0.0, -80.0, -150.0}, gain});
        a = assess(loop);
    }
    ASSERT_EQ(a.stability.stable, true);
    ASSERT_LT(a.figures.gain_reduction_margin_db.value(), 6.0);
    ASSERT_EQ(a.remarks.size(), 1u);
    EXPECT_EQ(a.remarks[0].find("Conditionally stable"), 0u);
}

TEST(FrequencyStability, AnAlgebraicLoopHasNoSolution) {
    const FrequencyAssessment a = assess(practice::plant_alone({{-2.0}, {-5.0}, -1.0}));
    EXPECT_EQ(a.stability.stable, false);
    EXPECT_NE(a.stability.reason.find("infinity"), std::string::npos);
}

TEST(FrequencyErrors, TypesZeroToThreeAndCancelledIntegrators) {
    const auto errors = [](const RootForm& roots) {
        return assess(practice::plant_alone(roots)).steady_state_error;
    };
    const SteadyStateErrors type0 = errors({{}, {-1.0, -4.0}, 12.0});
    EXPECT_DOUBLE_EQ(type0.step.value(), 1.0 / (1.0 + 3.0));
    EXPECT_EQ(type0.ramp.kind(), Figure::Kind::infinite);
    const SteadyStateErrors type2 = errors({{-2.0}, {0.0, 0.0, -40.0}, 400.0});
    EXPECT_EQ(type2.ramp.value(), 0.0);
    EXPECT_DOUBLE_EQ(type2.parabola.value(), 40.0 / 800.0);
    const SteadyStateErrors type3 = errors({{-2.0, -2.0}, {0.0, 0.0, 0.0}, 40.0});
    EXPECT_EQ(type3.parabola.value(), 0.0);
    const SteadyStateErrors cancelled = errors({{0.0}, {0.0, 0.0, -5.0}, 20.0});
    EXPECT_DOUBLE_EQ(cancelled.ramp.value(), 5.0 / 20.0);
    const SteadyStateErrors washout = errors({{0.0}, {-1.0, -5.0}, 20.0});
    EXPECT_EQ(washout.step.value(), 1.0);
}

TEST(FrequencyStability, ADeclaredIntegratorThatTheCompensatorTakesAwayIsNamed) {
    const RootForm axis{{}, {0.0, -9.0}, 90.0};
    auto response = std::make_shared<MeasuredResponse>();
    for (double w = 0.1; w < 1000.0; w *= 1.1) {
        response->w_rad_s.push_back(w);
        response->response.push_back(evaluate(axis, Complex(0.0, w)));
    }
    DesignLoop loop;
    loop.plant = MeasuredPlant{response, 1, 0, {}};
    EXPECT_EQ(assess(loop).stability.stable, true);
    loop.compensator = {{0.0}, {-50.0}, 50.0};
    const FrequencyAssessment hidden = assess(loop);
    EXPECT_EQ(hidden.stability.stable, false);
    EXPECT_NE(hidden.stability.reason.find("the factor s is cancelled"), std::string::npos)
        << hidden.stability.reason;
}

} // namespace
} // namespace cornerwright
