// What a margin promises: with the gain or the delay that it names the closed loop stands on the
// boundary of stability. Judged by the closed-loop poles, which the margins do not come from.

#include "core/loop/closed_loop_poles.h"
#include "core/loop/decibel.h"
#include "core/loop/frequency_figures.h"
#include "tests/core/loop/frequency_practice.h"
#include "tests/outside/published.h"

#include <algorithm>
#include <cmath>

namespace cornerwright::outside {
namespace {

DesignLoop raised(DesignLoop loop, double decibels) {
    loop.compensator.gain *= std::exp(decibels / db_per_neper);
    return loop;
}

/// How far the closed-loop pole nearest to the imaginary axis is from it, of its modulus.
double distance_from_axis(const DesignLoop& loop) {
    double nearest = HUGE_VAL;
    for (const Complex& pole : closed_loop_poles(loop).poles)
        nearest = std::min(nearest, std::abs(pole.real()) / std::abs(pole));
    return nearest;
}

TEST(Boundary, GainMarginsPutAPoleOnTheAxis) {
    std::mt19937 random(31);
    int raising = 0;
    int lowering = 0;
    for (int trial = 0; trial < 200; ++trial) {
        SCOPED_TRACE("trial " + std::to_string(trial));
        const DesignLoop loop =
            practice::plant_alone(practice::random_roots(random, 2 + trial % 9));
        const LoopFigures f = figures_of(loop);
        const FrequencyFigures& margins = f.frequency;
        // At w = 0 the pole on the boundary is 0 itself, which has no modulus to compare with.
        if (f.stability.stable != true)
            continue;
        if (margins.gain_margin_db.is_value() && margins.gain_margin_at_rad_s.value() > 0.0) {
            ++raising;
            EXPECT_LT(distance_from_axis(raised(loop, margins.gain_margin_db.value())), 1e-8);
        }
        if (margins.gain_reduction_margin_db.is_value() &&
            margins.gain_reduction_margin_at_rad_s.value() > 0.0) {
            ++lowering;
            EXPECT_LT(distance_from_axis(raised(loop, -margins.gain_reduction_margin_db.value())),
                      1e-8);
        }
    }
    EXPECT_GT(raising, 10);
    EXPECT_GT(lowering, 2);
}

TEST(Boundary, DelayMarginPutsAPoleOnTheAxis) {
    std::mt19937 random(32);
    int tried = 0;
    for (int trial = 0; trial < 200; ++trial) {
        SCOPED_TRACE("trial " + std::to_string(trial));
        DesignLoop loop = practice::plant_alone(practice::random_roots(random, 2 + trial % 5));
        const FrequencyAssessment f = assess_frequency(loop, {}, closed_loop_poles(loop).poles);
        // Under a hundredth of a degree a thousandth more or less is still on the boundary.
        constexpr double hair_deg = 0.01;
        if (f.stability.stable != true || !f.figures.delay_margin_s.is_value() ||
            std::abs(f.figures.phase_margin_deg.value()) < hair_deg)
            continue;
        ++tried;
        const double margin = f.figures.delay_margin_s.value();
        // 1 + L = 0 at one of the crossovers, and no delay below the margin ends the stability.
        double residual = HUGE_VAL;
        for (const double w : f.figures.crossovers_rad_s) {
            loop.computation_delay_s = margin;
            const std::vector<double> at{w};
            residual = std::min(residual, std::abs(1.0 + loop_points(loop, at).front().loop));
        }
        EXPECT_LT(residual, 1e-8);
        loop.computation_delay_s = 0.999 * margin;
        EXPECT_EQ(assess_frequency(loop, {}, {}).stability.stable, true);
        loop.computation_delay_s = 1.001 * margin;
        EXPECT_EQ(assess_frequency(loop, {}, {}).stability.stable, false);
    }
    EXPECT_GT(tried, 10);
}

/// A servo with its compensator, sampled ever faster.
TEST(Boundary, RealisedLoopTendsToTheDesignLoop) {
    Section lead;
    lead.kind = SectionKind::lead;
    lead.zero_rad_s = 4.0;
    lead.pole_rad_s = 40.0;
    const Chain chain{lead};
    const DesignLoop design = loop_of("60/(s (s + 2))", chain);
    const LoopFigures wanted = figures_of(design);
    double last_difference = HUGE_VAL;
    for (const double period : {1e-2, 1e-3, 1e-4, 1e-5}) {
        SCOPED_TRACE(period);
        const DifferenceEquation equation = discretise(chain, {period, 0.0, true}, Realisation{});
        const LoopFigures f =
            assess_loop(RealisedLoop{equation, design.plant, 0.0}, FigureRequest{}).figures;
        const double difference = std::abs(f.frequency.phase_margin_deg.value() -
                                           wanted.frequency.phase_margin_deg.value());
        // The hold costs w Ts/2 at the crossover; all else is of the order of Ts squared.
        const double hold_deg =
            0.5 * period * wanted.frequency.phase_margin_at_rad_s.value() * deg_per_rad;
        EXPECT_NEAR(difference, hold_deg, 0.1 * hold_deg);
        EXPECT_LT(difference, 0.2 * last_difference);
        last_difference = difference;
        EXPECT_NEAR(f.time.overshoot_percent.value(), wanted.time.overshoot_percent.value(),
                    2e3 * period);
        EXPECT_NEAR(f.frequency.sensitivity_peak_db.value(),
                    wanted.frequency.sensitivity_peak_db.value(), 1e2 * period);
    }
}

} // namespace
} // namespace cornerwright::outside
