// What each choice costs, against separate assessments and simulations.
#include "core/engine/engine.h"
#include "core/handover/realisation_study.h"
#include "core/numerics/error.h"
#include "tests/core/realisation/section_builders.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace cornerwright::test {
namespace {

bool always() {
    return true;
}

Requirement requirement_of(Measure measure, std::optional<double> at_least,
                           std::optional<double> at_most) {
    Requirement requirement;
    requirement.measure = measure;
    requirement.at_least = at_least;
    requirement.at_most = at_most;
    return requirement;
}

/// A servo on an integrating plant with two loads; crossover about 60 rad/s, sampled at 1 kHz.
Project servo_project() {
    Project project;
    project.title = "servo";
    project.plant_cases = {{"light", FormulaSource{"60/(s (s/30 + 1))"}},
                           {"heavy", FormulaSource{"40/(s (s/20 + 1))"}}};
    project.compensator = {gain_of(0.9), pi_at(2.0), lead_of(25.0, 300.0)};
    project.sampling = Sampling{0.001, 0.0, true};
    project.realisation = Realisation{};
    project.requirements = {requirement_of(Measure::phase_margin, 45.0, std::nullopt),
                            requirement_of(Measure::sensitivity_peak, std::nullopt, 5.0),
                            requirement_of(Measure::overshoot, std::nullopt, 30.0)};
    return project;
}

TEST(RealisationStudy, EachMethodStandsAsASeparateAssessmentSays) {
    Project project = servo_project();
    const RealisationStudy study = study_realisation(project, always);
    ASSERT_EQ(study.methods.size(), 6u);
    for (const MethodOutcome& outcome : study.methods) {
        project.realisation->method = outcome.method;
        const auto assessment = Engine().assess(project);
        EXPECT_EQ(outcome.problem, assessment->realisation_problem);
        if (!assessment->equation)
            continue;
        ASSERT_EQ(outcome.worst.size(), project.requirements.size());
        for (std::size_t i = 0; i < outcome.worst.size(); ++i) {
            double least = HUGE_VAL;
            for (const Judgement& one : assessment->verdict.requirements[i].all)
                if (one.loop == LoopName::realised)
                    least = std::min(least, one.share.value());
            EXPECT_EQ(outcome.worst[i].share.value(), least);
        }
    }
}

TEST(RealisationStudy, NamesWhyAMethodCannotBe) {
    Project project = servo_project();
    project.compensator.push_back(zero_at(900.0));
    project.compensator.push_back(pole_at(2000.0));
    for (const MethodOutcome& outcome : study_realisation(project, always).methods)
        if (outcome.method == Method::step_invariant) {
            EXPECT_THAT(outcome.problem, testing::HasSubstr("more zeros than poles"));
            EXPECT_TRUE(outcome.worst.empty());
        }
}

TEST(RealisationStudy, SmallestFractionBitsAreTheFirstThatMeetEverything) {
    Project project = servo_project();
    for (const int word_bits : {16, 32}) {
        const FractionBits bits = smallest_fraction_bits(project, word_bits, always);
        ASSERT_TRUE(bits.smallest) << bits.reason;
        for (int fraction = 1; fraction <= *bits.smallest; ++fraction) {
            project.realisation->number_format = {NumberFormat::Type::fixed, word_bits, fraction};
            const auto assessment = Engine().assess(project);
            const bool meets = assessment->equation && assessment->verdict.state == State::met;
            EXPECT_EQ(meets, fraction == *bits.smallest) << fraction;
        }
    }
}

/// The room of a wide word was seen to be spent on amplifying inner signals, so that the last
/// section was left with a few bits for its coefficients.
TEST(RealisationStudy, AWiderWordNeedsHardlyMoreFractionBits) {
    const Project project = servo_project();
    const FractionBits narrow = smallest_fraction_bits(project, 16, always);
    const FractionBits wide = smallest_fraction_bits(project, 32, always);
    ASSERT_TRUE(narrow.smallest && wide.smallest);
    EXPECT_LE(*wide.smallest, *narrow.smallest + *narrow.smallest / 4);
}

TEST(RealisationStudy, SaysWhyThereAreNoSmallestFractionBits) {
    Project project = servo_project();
    project.requirements.push_back(requirement_of(Measure::phase_margin, 85.0, std::nullopt));
    EXPECT_EQ(smallest_fraction_bits(project, 32, always).reason,
              "in double precision not every requirement is met either");
    project.requirements.clear();
    EXPECT_EQ(smallest_fraction_bits(project, 32, always).reason,
              "the project states no requirement");
    EXPECT_EQ(smallest_fraction_bits(servo_project(), 32, [] { return false; }).reason,
              "the search was stopped");
}

DifferenceEquation equation_of(const Project& project) {
    return discretise(project.compensator, *project.sampling, *project.realisation);
}

TEST(LimitedStep, WithLimitsOutOfReachIsTheRealisedStep) {
    Project project = servo_project();
    project.sampling->computation_delay_s = 0.0017; // a whole sample and a part of one
    project.realisation->output_limits = OutputLimits{-1e6, 1e6};
    const auto assessment = Engine().assess(project);
    for (std::size_t i = 0; i < project.plant_cases.size(); ++i) {
        const LimitedStep step =
            limited_step(project, project.plant_cases[i], equation_of(project), 1.0, 3.0);
        EXPECT_EQ(step.note, "");
        EXPECT_EQ(step.time_at_limit_s, 0.0);
        const TimeFigures& figures = assessment->cases[i].realised->figures.time;
        EXPECT_NEAR(step.overshoot_percent.value(), figures.overshoot_percent.value(), 0.05);
        EXPECT_NEAR(step.settling_time_s.value(), figures.settling_time_s.value(), 0.0011);
        EXPECT_NEAR(*std::ranges::max_element(step.u), figures.control_peak.value(), 1e-9);
    }
}

/// By hand: gain 2 on 1/s, Ts = 0.1: y[n+1] = y[n] + 0.1 min(0.5, 2 (1 - y[n])).
TEST(LimitedStep, OfAnIntegratorByHand) {
    Project project;
    project.plant_cases = {{"bench", FormulaSource{"1/s"}}};
    project.compensator = {gain_of(2.0)};
    project.sampling = Sampling{0.1, 0.0, true};
    project.realisation = Realisation{};
    project.realisation->output_limits = OutputLimits{-0.5, 0.5};
    const LimitedStep step =
        limited_step(project, project.plant_cases[0], equation_of(project), 1.0, 6.0);
    double y = 0.0;
    int at_limit = 0;
    for (std::size_t n = 0; n < step.y.size(); ++n) {
        EXPECT_NEAR(step.y[n], y, 1e-12);
        const double u = std::min(0.5, 2.0 * (1.0 - y));
        at_limit += u >= 0.5 - 1e-12;
        EXPECT_NEAR(step.u[n], u, 1e-12);
        y += 0.1 * u;
    }
    EXPECT_NEAR(step.time_at_limit_s, 0.1 * at_limit, 0.1001); // the last one stands on the edge
}

TEST(LimitedStep, ConditionalIntegrationKeepsTheOvershootSmall) {
    Project project = servo_project();
    project.realisation->output_limits = OutputLimits{-0.3, 0.3};
    const LimitedStep limited =
        limited_step(project, project.plant_cases[1], equation_of(project), 1.0, 5.0);
    EXPECT_GT(limited.time_at_limit_s, 0.0);
    for (const double u : limited.u)
        EXPECT_LE(std::abs(u), 0.3);
    ASSERT_TRUE(limited.settling_time_s.is_value());
    EXPECT_LT(limited.overshoot_percent.value(), 30.0);
}

TEST(LimitedStep, SaysWhereTheLimitKeepsTheOutputFromItsPlace) {
    Project project = servo_project();
    project.plant_cases = {{"warm", FormulaSource{"2/(s + 1)"}}};
    project.realisation->output_limits = OutputLimits{-0.1, 0.1}; // reaches 0.2 at most
    const LimitedStep step =
        limited_step(project, project.plant_cases[0], equation_of(project), 1.0, 5.0);
    EXPECT_EQ(step.settling_time_s, Figure::infinite());
    EXPECT_EQ(step.overshoot_percent.value(), 0.0);
}

TEST(LimitedStep, SaysWhyThereIsNone) {
    Project project = servo_project();
    EXPECT_EQ(limited_step(project, project.plant_cases[0], equation_of(project), 1.0, 1.0).note,
              "no output limits are set");
    project.realisation->output_limits = OutputLimits{-1.0, 1.0};
    project.plant_cases = {{"direct", FormulaSource{"(s + 1)/(s + 2)"}}};
    EXPECT_EQ(limited_step(project, project.plant_cases[0], equation_of(project), 1.0, 1.0).note,
              "the plant answers within the same instant");
}

} // namespace
} // namespace cornerwright::test
