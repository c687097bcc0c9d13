// Tolerance runs against yields that are known in closed form, and against the judgement of the
// drawn values themselves.

#include "core/loop/frequency_figures.h"
#include "core/numerics/error.h"
#include "core/placement/tolerance.h"
#include "tests/core/placement/placement_practice.h"

#include <gtest/gtest.h>

#include <algorithm>

namespace cornerwright {
namespace {

using namespace practice;

/// K/(s(s+1)(s+2)) is stable for 0 < K < 6 (K. Ogata, Modern Control Engineering, 5th ed., ch. 5;
/// citation from memory): a gain margin of 0.01 dB asks for K < 6/1.00115.
PlacementProblem third_order(double gain) {
    PlacementProblem problem;
    problem.compensator = {gain_of(gain)};
    problem.plants = {{"plant", parse_formula("1/(s(s+1)(s+2))")}};
    problem.requirements = {at_least(Measure::gain_margin, 0.01)};
    return problem;
}

PlacementProblem drive() {
    PlacementProblem problem;
    problem.compensator = {gain_of(0.6), corner_of(SectionKind::pi, 3.0),
                           pair_of(SectionKind::lead, 40.0, 300.0), notch_of(400.0, 0.1, 0.7)};
    const PlantModel model =
        parse_formula("40 exp(-0.0006 s)/((s/3 + 1)(0.002 s + 1)) * 400^2/(s^2 + 24 s + 400^2)");
    problem.plants = {{"model", model}, {"unit", measured(model, 0.3, 3e3, 301, 0)}};
    problem.requirements = {at_least(Measure::phase_margin, 50.0),
                            at_least(Measure::gain_margin, 8.0),
                            at_most(Measure::sensitivity_peak, 4.0)};
    return problem;
}

TEST(Tolerance, YieldOfAUniformGainIsTheShareInsideTheLimit) {
    // Gain 5 +- 40 % runs from 3 to 7; below 5.99308 is met.
    ToleranceOptions options;
    options.spreads.plant_gain_percent = 40.0;
    options.samples = 4000;
    const ToleranceResult result = tolerance(third_order(5.0), options);
    const double expected = (6.0 / std::pow(10.0, 0.01 / 20.0) - 3.0) / 4.0;
    EXPECT_EQ(result.samples(), 4000U);
    // Four standard deviations of a counted part.
    EXPECT_NEAR(result.yield(), expected, 4.0 * std::sqrt(expected * (1.0 - expected) / 4000.0));
    EXPECT_LT(result.yield_limits()[0], expected);
    EXPECT_GT(result.yield_limits()[1], expected);
    ASSERT_TRUE(result.worst);
    EXPECT_LT(result.worst->merit, unstable_merit);
}

TEST(Tolerance, YieldOfANormalGainIsThatOfTheBell) {
    // 30 % are three standard deviations of 10 %: gain 5.5, limit 5.99308 at 0.8965 of them;
    // P(x < 0.8965) = 0.8150 (tables of the normal distribution).
    ToleranceOptions options;
    options.spreads.plant_gain_percent = 30.0;
    options.spreads.shape = SpreadShape::normal;
    options.samples = 4000;
    const ToleranceResult result = tolerance(third_order(5.5), options);
    EXPECT_NEAR(result.yield(), 0.815, 4.0 * std::sqrt(0.815 * 0.185 / 4000.0));
}

TEST(Tolerance, IsTheSameForTheSameSeedOnAnyNumberOfWorkers) {
    ToleranceOptions options;
    options.spreads = {10.0, 5.0, 30.0, 10.0, 2.0, SpreadShape::normal};
    options.samples = 60;
    options.workers = 1;
    const ToleranceResult alone = tolerance(drive(), options);
    options.workers = 3;
    EXPECT_EQ(tolerance(drive(), options).merits, alone.merits);
    options.seed = 2;
    EXPECT_NE(tolerance(drive(), options).merits, alone.merits);
}

TEST(Tolerance, TheWorstSampleKeptAsAPlantHasTheSameDesignLoop) {
    for (const bool has_model : {true, false}) {
        PlacementProblem problem = drive();
        problem.plants.erase(problem.plants.begin() + (has_model ? 1 : 0));
        ToleranceOptions options;
        options.spreads = {10.0, 5.0, 30.0, 10.0, 5.0, SpreadShape::uniform};
        options.samples = 40;
        const ToleranceResult result = tolerance(problem, options);
        ASSERT_TRUE(result.worst);
        EXPECT_EQ(result.worst->merit,
                  *std::min_element(result.merits.begin(), result.merits.end()));
        PlacementProblem kept = problem;
        kept.plants = {{"worst", result.worst->as_plant}};
        const Evaluation again = evaluate(kept, kept.compensator);
        EXPECT_NEAR(again.merit, result.worst->merit, 1e-6 * std::abs(result.worst->merit))
            << has_model;
    }
}

TEST(Spread, MovesCornersAtConstantLowFrequencyGainAndWithinTheSpread) {
    PlacementProblem problem;
    problem.compensator = {gain_of(2.0), notch_of(50.0, 0.0, 0.5)};
    problem.plants = {{"plant", parse_formula("7 (s/30 + 1)/(s (s/4 + 1)(s^2 + 2 s + 100))")}};
    const auto& nominal = std::get<PlantModel>(problem.plants[0].plant);
    Spreads spreads;
    spreads.plant_corner_percent = 20.0;
    spreads.plant_damping_percent = 50.0;
    double farthest = 0.0;
    for (std::uint64_t number = 0; number < 50; ++number) {
        const PlacementProblem sampled = drawn(problem, spreads, 3, number);
        EXPECT_EQ(sampled.compensator, problem.compensator);
        const auto& model = std::get<PlantModel>(sampled.plants[0].plant);
        const Complex low(0.0, 1e-6);
        EXPECT_NEAR(std::abs(evaluate(model.roots, low) / evaluate(nominal.roots, low)), 1.0, 1e-6);
        for (std::size_t i = 0; i < model.roots.poles.size(); ++i) {
            const double before = std::abs(nominal.roots.poles[i]);
            const double after = std::abs(model.roots.poles[i]);
            EXPECT_LE(std::abs(after - before), 0.2 * before * (1.0 + 1e-12));
            if (before > 0.0)
                farthest = std::max(farthest, std::abs(after / before - 1.0));
            const Complex twin = std::conj(model.roots.poles[i]);
            EXPECT_NE(std::find(model.roots.poles.begin(), model.roots.poles.end(), twin),
                      model.roots.poles.end());
        }
    }
    EXPECT_GT(farthest, 0.15);
}

TEST(Spread, OfAMeasurementIsThatOfItsModelWhereAllCornersMoveTogether) {
    // One corner and an integrator: stretching the axis is moving the corner.
    PlacementProblem problem;
    const PlantModel model = parse_formula("5/(s (s/10 + 1))");
    problem.plants = {{"unit", measured(model, 0.1, 1e3, 101, 1)}};
    Spreads spreads;
    spreads.plant_corner_percent = 30.0;
    const PlacementProblem sampled = drawn(problem, spreads, 1, 7);
    const auto& response = *std::get<MeasuredPlant>(sampled.plants[0].plant).response;
    const double stretch = response.w_rad_s[0] / 0.1;
    EXPECT_NE(stretch, 1.0);
    for (std::size_t i = 0; i < response.w_rad_s.size(); ++i) {
        const Complex s(0.0, response.w_rad_s[i]);
        const Complex expected = 5.0 / (s * (s / (10.0 * stretch) + 1.0));
        EXPECT_LE(std::abs(response.response[i] - expected), 1e-12 * std::abs(expected));
    }
}

TEST(Tolerance, StopsWhereAskedAndRefusesWhatMakesNoSense) {
    ToleranceOptions options;
    options.spreads.plant_gain_percent = 10.0;
    options.samples = 500;
    options.workers = 2;
    options.proceed = [](std::size_t done, std::size_t of) {
        EXPECT_EQ(of, 500U);
        return done < 20;
    };
    const ToleranceResult result = tolerance(third_order(1.0), options);
    EXPECT_TRUE(result.stopped);
    EXPECT_GE(result.samples(), 20U);
    EXPECT_LT(result.samples(), 30U);
    options.spreads.plant_gain_percent = 100.0;
    EXPECT_THROW(tolerance(third_order(1.0), options), InputError);
    options.spreads.plant_gain_percent = 0.0;
    EXPECT_THROW(tolerance(third_order(1.0), options), InputError);
}

} // namespace
} // namespace cornerwright
