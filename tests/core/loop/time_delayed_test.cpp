#include "core/loop/closed_loop_poles.h"
#include "core/loop/step_response.h"

#include <gtest/gtest.h>

#include <cmath>

namespace cornerwright {
namespace {

TimeAssessment assess(const DesignLoop& loop) {
    return assess_time(loop, {}, closed_loop_poles(loop).poles);
}

/// sum over k of (-1)^(k+1) (t - k)^k/k!: the unit step of exp(-s)/s under unit feedback.
/// Source: R. Bellman, K. L. Cooke, Differential-Difference Equations, ch. 3 (citation from
/// memory).
double method_of_steps(double t) {
    double sum = 0.0;
    double factorial = 1.0;
    for (int k = 1; k <= static_cast<int>(t); ++k) {
        factorial *= k;
        sum += (k % 2 == 1 ? 1.0 : -1.0) * std::pow(t - k, k) / factorial;
    }
    return sum;
}

TEST(time_delayed, integrator_with_dead_time_by_the_method_of_steps) {
    const DesignLoop loop{{}, PlantModel{{{}, {0.0}, 1.0}, 1.0}};
    const TimeAssessment result = assess(loop);
    EXPECT_NEAR(result.figures.overshoot_percent.value(), 50.0, 1e-3);
    EXPECT_NEAR(result.figures.peak_time_s.value(), 3.0, 1e-3);
    const StepCurves curves = step_curves(loop, 12.0, 97);
    for (std::size_t i = 0; i < curves.t_s.size(); ++i)
        EXPECT_NEAR(curves.y[i], method_of_steps(curves.t_s[i]), 1e-4) << curves.t_s[i];
}

TEST(time_delayed, a_delay_before_the_plant_and_one_inside_it_give_the_same_y) {
    const RootForm compensator{{-2.0}, {0.0}, 1.5};
    const RootForm plant{{}, {-1.0, -8.0}, 8.0};
    const StepCurves inside = step_curves(DesignLoop{compensator, PlantModel{plant, 0.2}}, 5.0, 51);
    const StepCurves before =
        step_curves(DesignLoop{compensator, PlantModel{plant, 0.0}, 0.1, 0.2}, 5.0, 51);
    for (std::size_t i = 0; i < 51; ++i) {
        EXPECT_NEAR(inside.y[i], before.y[i], 1e-6);
        EXPECT_NEAR(inside.u[i], before.u[i], 1e-5);
    }
    // The disturbance acts behind the control delay: at once in one, late in the other.
    EXPECT_EQ(inside.y_disturbance[1], 0.0);
    EXPECT_GT(before.y_disturbance[1], 0.0);
}

TEST(time_delayed, a_vanishing_delay_tends_to_the_rational_loop) {
    const RootForm compensator{{-1.0}, {0.0}, 2.0};
    const RootForm plant{{}, {-3.0, -40.0}, 120.0};
    const TimeFigures without = assess(DesignLoop{compensator, PlantModel{plant, 0.0}}).figures;
    double last = 1.0;
    for (const double delay : {1e-3, 1e-4, 1e-6}) {
        const TimeFigures with = assess(DesignLoop{compensator, PlantModel{plant, delay}}).figures;
        const double difference =
            std::abs(with.settling_time_s.value() - without.settling_time_s.value());
        EXPECT_LT(difference, last);
        EXPECT_LT(difference, 20.0 * delay + 1e-5);
        EXPECT_NEAR(with.control_peak.value(), without.control_peak.value(), 20.0 * delay + 1e-5);
        last = difference;
    }
}

TEST(time_delayed, final_values_are_those_of_t_and_ps_at_zero) {
    // P-control of a type-0 plant: T(0) = 2/3, PS(0) = 0.5/3.
    const DesignLoop loop{{{}, {}, 4.0}, PlantModel{{{}, {-2.0}, 1.0}, 0.05}, 0.01, 0.02};
    const StepCurves curves = step_curves(loop, 30.0, 2);
    EXPECT_NEAR(curves.y.back(), 2.0 / 3.0, 1e-6);
    EXPECT_NEAR(curves.u.back(), 4.0 / 3.0, 1e-5);
    EXPECT_NEAR(curves.y_disturbance.back(), 0.5 / 3.0, 1e-6);
}

TEST(time_delayed, a_factor_that_the_compensator_cancels_shows_in_the_disturbance_alone) {
    // The zero at -0.2 cancels the plant's pole: y is fast, the disturbance decays as exp(-0.2 t).
    const DesignLoop loop{{{-0.2}, {0.0}, 1.0}, PlantModel{{{}, {-0.2}, 1.0}, 0.1}};
    const TimeFigures figures = assess(loop).figures;
    EXPECT_LT(figures.settling_time_s.value(), 6.0);
    const StepCurves curves = step_curves(loop, 40.0, 5);
    EXPECT_NEAR(curves.y_disturbance[4] / curves.y_disturbance[3], std::exp(-0.2 * 10.0), 1e-5);
}

TEST(time_delayed, an_unstable_loop_has_curves_that_grow) {
    const DesignLoop loop{{}, PlantModel{{{}, {0.0, -10.0}, 100.0}, 0.2}};
    const StepCurves curves = step_curves(loop, 6.0, 61);
    ASSERT_EQ(curves.y.size(), 61u);
    EXPECT_GT(std::abs(curves.y.back()), 100.0);
}

TEST(time_delayed, a_compensator_that_is_improper_leaves_y_finite) {
    const DesignLoop loop{{{-6.0}, {}, 1.0 / 3.0}, PlantModel{{{}, {0.0, -3.0}, 9.0}, 0.01}};
    const TimeFigures figures = assess(loop).figures;
    EXPECT_EQ(figures.control_peak.kind(), Figure::Kind::infinite);
    EXPECT_TRUE(figures.overshoot_percent.is_value());
    EXPECT_TRUE(figures.settling_time_s.is_value());
}

} // namespace
} // namespace cornerwright
