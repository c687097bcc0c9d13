#include "core/numerics/error.h"
#include "core/placement/placement.h"
#include "tests/core/placement/feasible_problems.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <chrono>
#include <cstdio>

namespace cornerwright {
namespace {

using namespace practice;

TEST(Placement, MeetsEverythingOnAtLeastThirtyEightOfFortyFeasibleProblems) {
    int met = 0;
    double slowest_s = 0.0;
    double total_s = 0.0;
    for (std::uint64_t seed = 1; seed <= 40; ++seed) {
        const FeasibleProblem feasible = ProblemMaker(seed).make();
        const double of_answer = evaluate(feasible.problem, feasible.answer).merit;
        ASSERT_GE(of_answer, 0.0) << seed;
        const auto begin = std::chrono::steady_clock::now();
        const PlacementResult result = place(feasible.problem, {});
        const std::chrono::duration<double> took = std::chrono::steady_clock::now() - begin;
        slowest_s = std::max(slowest_s, took.count());
        total_s += took.count();
        // The figure that counts is the judgement of the result, made anew.
        const Evaluation anew = evaluate(feasible.problem, result.compensator);
        EXPECT_EQ(anew.merit, result.merit) << seed;
        EXPECT_GE(result.merit, result.merit_before) << seed;
        met += anew.verdict.state == State::met ? 1 : 0;
        std::printf("problem %2d: %.3f before, %.3f reached, %.3f known, %.2f s\n",
                    static_cast<int>(seed), result.merit_before, result.merit, of_answer,
                    took.count());
    }
    std::printf("%d of 40 met, slowest %.2f s, all %.1f s\n", met, slowest_s, total_s);
    EXPECT_GE(met, 38);
}

TEST(Placement, IsTheSameForTheSameSeed) {
    const FeasibleProblem feasible = ProblemMaker(8).make();
    PlacementOptions options;
    options.seed = 5;
    const PlacementResult first = place(feasible.problem, options);
    const PlacementResult second = place(feasible.problem, options);
    EXPECT_EQ(first.compensator, second.compensator);
    EXPECT_EQ(first.words, second.words);
}

TEST(Placement, LeavesLockedSectionsAlone) {
    FeasibleProblem feasible = ProblemMaker(5).make();
    feasible.problem.compensator[2].locked = true;
    const PlacementResult result = place(feasible.problem, {});
    EXPECT_EQ(result.compensator[2], feasible.problem.compensator[2]);
    EXPECT_NE(result.compensator[0], feasible.problem.compensator[0]);
}

TEST(Placement, CanBeStoppedAndKeepsTheBestSoFar) {
    const FeasibleProblem feasible = ProblemMaker(3).make();
    int asked = 0;
    double last = -1.0;
    PlacementOptions options;
    options.proceed = [&](double progress, double) {
        EXPECT_GE(progress, last);
        last = progress;
        return ++asked < 4;
    };
    const PlacementResult result = place(feasible.problem, options);
    EXPECT_TRUE(result.stopped);
    EXPECT_EQ(asked, 4);
    EXPECT_GE(result.merit, result.merit_before);
}

TEST(Placement, NamesTheTwoRequirementsThatPullAgainstEachOther) {
    // An integrating plant with dead time: 60 deg of margin and a wide band cannot both be had.
    PlacementProblem problem;
    problem.compensator = {gain_of(1.0)};
    problem.plants = {{"belt", parse_formula("exp(-0.1 s)/s")}};
    problem.requirements = {at_least(Measure::phase_margin, 60.0),
                            at_least(Measure::bandwidth, 30)};
    const PlacementResult result = place(problem, {});
    EXPECT_LT(result.merit, 0.0);
    ASSERT_EQ(result.binding.size(), 2U);
    EXPECT_NE(std::find(result.words.begin(), result.words.end(),
                        "These two pull against each other: phase margin and bandwidth."),
              result.words.end());
}

TEST(Placement, WithNothingToMoveOrToMeetIsRefused) {
    PlacementProblem problem;
    problem.plants = {{"belt", parse_formula("1/s")}};
    problem.requirements = {at_least(Measure::phase_margin, 60.0)};
    EXPECT_THROW(place(problem, {}), InputError);
    problem.compensator = {gain_of(1.0)};
    problem.requirements.clear();
    EXPECT_THROW(place(problem, {}), InputError);
}

TEST(Placement, HeadroomSlopesPointUphill) {
    for (std::uint64_t seed = 1; seed <= 5; ++seed) {
        PlacementProblem problem = ProblemMaker(seed).make().problem;
        const auto slopes = headroom_slopes(problem);
        const auto parameters = free_parameters(problem.compensator);
        ASSERT_EQ(slopes.size(), parameters.size());
        const double before = evaluate(problem, problem.compensator).merit;
        double size = 0.0;
        for (const double slope : slopes)
            size += slope * slope;
        if (before <= unstable_merit || size == 0.0)
            continue;
        std::vector<double> logarithms = logarithms_of(problem.compensator, parameters);
        constexpr double reach = 1e-5;
        for (std::size_t i = 0; i < slopes.size(); ++i)
            logarithms[i] += reach * slopes[i] / std::sqrt(size);
        const double after =
            evaluate(problem, with_logarithms(problem.compensator, parameters, logarithms)).merit;
        EXPECT_NEAR((after - before) / reach, std::sqrt(size), 1e-3 * std::sqrt(size)) << seed;
    }
}

} // namespace
} // namespace cornerwright
