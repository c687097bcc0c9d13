#include "core/loop/closed_loop_poles.h"
#include "core/loop/sampled_step.h"
#include "core/loop/step_response.h"

#include <gtest/gtest.h>

#include <cmath>

namespace cornerwright {
namespace {

/// A gain as the whole difference equation.
RealisedLoop gain_loop(double gain, PlantModel plant, double period, double delay = 0.0) {
    DifferenceEquation equation;
    equation.sample_period_s = period;
    DiscreteSection section;
    section.b = {gain, 0.0, 0.0};
    section.beta = {gain, 0.0, 0.0};
    equation.sections = {section};
    return {equation, std::move(plant), delay};
}

TimeFigures figures_of(const RealisedLoop& loop) {
    return assess_time(loop, {}, closed_loop_poles(loop).poles).figures;
}

TEST(time_sampled, integrator_under_a_gain_is_a_geometric_sequence) {
    // y(k+1) = y(k) + K Ts (1 - y(k)), a straight line between samples; worked by hand.
    const double ts = 0.1;
    const double gain = 4.0;
    const RealisedLoop loop = gain_loop(gain, {{{}, {0.0}, 1.0}, 0.0}, ts);
    const StepCurves curves = step_curves(loop, 2.0, 41); // every half period
    const double ratio = 1.0 - gain * ts;
    for (std::size_t i = 0; i + 1 < 41; i += 2) {
        const double k = static_cast<double>(i) / 2.0;
        const double y = 1.0 - std::pow(ratio, k);
        EXPECT_NEAR(curves.y[i], y, 1e-9);
        EXPECT_NEAR(curves.y[i + 1], y + 0.5 * gain * ts * std::pow(ratio, k), 1e-9);
    }
    const TimeFigures figures = figures_of(loop);
    EXPECT_EQ(figures.overshoot_percent.value(), 0.0);
    EXPECT_NEAR(figures.control_peak.value(), gain, 1e-12);
    EXPECT_NEAR(figures.disturbance_peak.value(), 1.0 / gain, 1e-6);
}

TEST(time_sampled, the_peak_between_two_samples_is_seen) {
    // K Ts = 1.5 on an integrator behind half a sample of delay: y rises past the first instant.
    const double ts = 1.0;
    const RealisedLoop loop = gain_loop(1.2, {{{}, {0.0}, 1.0}, 0.5}, ts);
    // u(0) = 1.2 from 0.5 on: y(1) = 0.6, u(1) = 0.48, so until 1.5 y = 1.2: the peak, between
    // samples; worked by hand.
    const TimeFigures figures = figures_of(loop);
    EXPECT_NEAR(figures.peak_time_s.value() / ts, 2.0, 0.6);
    const StepCurves curves = step_curves(loop, 3.0, 31);
    EXPECT_NEAR(curves.y[10], 0.6, 1e-9);
    EXPECT_NEAR(curves.y[15], 1.2, 1e-9);
    EXPECT_NEAR(curves.y[20], 1.2 + 0.5 * 0.48, 1e-9);
    EXPECT_NEAR(curves.y[25], 1.2 + 0.48, 1e-9);
}

TEST(time_sampled, tends_to_the_design_loop_as_the_period_shrinks) {
    const PlantModel plant{{{}, {0.0, -3.0, -20.0}, 120.0}, 0.01};
    const DesignLoop design{{{}, {}, 1.0}, plant};
    const TimeFigures goal = assess_time(design, {}, closed_loop_poles(design).poles).figures;
    double last = HUGE_VAL;
    for (const double period : {0.02, 0.004, 0.0008, 0.00016}) {
        const TimeFigures figures = figures_of(gain_loop(1.0, plant, period));
        const double difference =
            std::abs(figures.overshoot_percent.value() - goal.overshoot_percent.value());
        EXPECT_LT(difference, 0.5 * last);
        // Settling may jump by half a cycle as the ripple at the band's edge grows; rise does not.
        EXPECT_NEAR(figures.rise_time_s.value(), goal.rise_time_s.value(), 2.0 * period);
        last = difference;
    }
    EXPECT_LT(last, 0.05);
}

TEST(time_sampled, a_slow_tail_at_a_high_rate_is_not_simulated_to_its_end) {
    // Settles over four million samples; the time constant is that of the sampled pole.
    const double ts = 1e-6;
    const RealisedLoop loop = gain_loop(1.0, {{{}, {0.0}, 1.0}, 0.0}, ts);
    const double ratio_log = std::log1p(-ts);
    EXPECT_NEAR(figures_of(loop).settling_time_s.value(), ts * std::log(0.02) / ratio_log, 1e-5);
}

TEST(time_sampled, delay_of_many_samples_and_the_disturbance_before_it) {
    const PlantModel plant{{{}, {-1.0}, 1.0}, 0.13};
    const RealisedLoop loop = gain_loop(0.5, plant, 0.1, 0.37);
    const StepCurves curves = step_curves(loop, 30.0, 301);
    EXPECT_EQ(curves.y[5], 0.0); // t = 0.5, the delay's end
    EXPECT_NEAR(curves.y[6], 0.5 * (1.0 - std::exp(-0.1)), 1e-9);
    EXPECT_NEAR(curves.y_disturbance[3], 1.0 - std::exp(-(0.3 - 0.13)), 1e-7);
    EXPECT_NEAR(curves.y.back(), 0.5 / 1.5, 1e-5);
    EXPECT_NEAR(curves.u.back(), 0.5 / 1.5, 1e-5);
    EXPECT_NEAR(curves.y_disturbance.back(), 1.0 / 1.5, 1e-5);
}

TEST(time_sampled, direct_term_without_delay_solves_for_u_at_the_instant) {
    // P = 2 (a gain), C = 3: u = 3 (1 - 2 u) = 3/7, y = 6/7 at once.
    const RealisedLoop loop = gain_loop(3.0, {{{}, {}, 2.0}, 0.0}, 0.1);
    const StepCurves curves = step_curves(loop, 1.0, 3);
    EXPECT_NEAR(curves.u[0], 3.0 / 7.0, 1e-15);
    EXPECT_NEAR(curves.y[1], 6.0 / 7.0, 1e-15);
}

TEST(time_sampled, an_unstable_loop_has_curves_that_grow) {
    // 1 - K Ts = -1.5.
    const RealisedLoop loop = gain_loop(25.0, {{{}, {0.0}, 1.0}, 0.0}, 0.1);
    const StepCurves curves = step_curves(loop, 2.0, 21);
    EXPECT_NEAR(curves.y[10], 1.0 - std::pow(-1.5, 10), 1e-8);
}

TEST(time_sampled, measured_plant_without_fit_is_undetermined) {
    RealisedLoop loop = gain_loop(1.0, {}, 0.1);
    loop.plant = MeasuredPlant{};
    EXPECT_EQ(assess_time(loop, {}, {}).figures.rise_time_s.reason(),
              "no fit for this measured case");
}

} // namespace
} // namespace cornerwright
