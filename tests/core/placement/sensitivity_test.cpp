// How far values may move, against loops whose limits are known in closed form and against the full
// judgement on both sides of every limit.

#include "core/numerics/error.h"
#include "core/placement/moved_coefficient.h"
#include "core/placement/room_search.h"
#include "core/placement/sensitivity.h"
#include "tests/core/placement/placement_practice.h"

#include <gtest/gtest.h>

namespace cornerwright {
namespace {

using namespace practice;

PlacementProblem servo() {
    PlacementProblem problem;
    problem.compensator = {gain_of(2.0), pair_of(SectionKind::lead, 8.0, 60.0),
                           corner_of(SectionKind::pi, 0.5)};
    problem.plants = {{"light", parse_formula("12/(s (s/20 + 1))")},
                      {"heavy", parse_formula("8 exp(-0.004 s)/(s (s/14 + 1))")}};
    problem.sampling = Sampling{2e-3, 1e-3, true};
    problem.realisation = Realisation{};
    problem.requirements = {at_least(Measure::phase_margin, 50.0),
                            at_least(Measure::gain_margin, 6.0),
                            at_most(Measure::sensitivity_peak, 6.0)};
    return problem;
}

TEST(Sensitivity, OfAGainIsItsGainMargin) {
    // K/(s(s+1)(s+2)) is stable for 0 < K < 6 (K. Ogata, Modern Control Engineering, 5th ed.,
    // ch. 5; citation from memory), so a gain margin of 3 dB is kept up to 6/10^(3/20).
    PlacementProblem problem;
    problem.compensator = {gain_of(1.0)};
    problem.plants = {{"plant", parse_formula("1/(s(s+1)(s+2))")}};
    problem.requirements = {at_least(Measure::gain_margin, 3.0)};
    const Sensitivity found = sensitivity(problem);
    ASSERT_EQ(found.values.size(), 1U);
    EXPECT_NEAR(found.values[0].up.factor, 6.0 / std::pow(10.0, 3.0 / 20.0), 1e-5);
    EXPECT_EQ(found.values[0].up.end, RoomEnd::requirement);
    EXPECT_EQ(found.values[0].down.end, RoomEnd::none);
    EXPECT_DOUBLE_EQ(found.values[0].down.factor, 0.1);
}

TEST(Sensitivity, EveryEndLiesBetweenMetAndUnmet) {
    const PlacementProblem problem = servo();
    ASSERT_EQ(evaluate(problem, problem.compensator).verdict.state, State::met);
    const Sensitivity found = sensitivity(problem);
    ASSERT_EQ(found.values.size(), 4U);
    EXPECT_TRUE(found.left_out.empty());
    int ends = 0;
    for (const ValueRoom& room : found.values) {
        const auto state_at = [&](double factor) {
            Chain chain = problem.compensator;
            for (const SectionParameter& parameter : parameters_of(chain[room.section].kind)) {
                if (parameter.key == room.key)
                    chain[room.section].*parameter.value *= factor;
            }
            return evaluate(problem, chain).verdict.state;
        };
        for (const ValueReach* reach : {&room.down, &room.up}) {
            if (reach->end != RoomEnd::requirement && reach->end != RoomEnd::stability)
                continue;
            ++ends;
            const double inside = std::exp(std::log(reach->factor) * (1.0 - 1e-4));
            const double outside = std::exp(std::log(reach->factor) * (1.0 + 1e-4));
            EXPECT_EQ(state_at(inside), State::met) << room.key;
            EXPECT_EQ(state_at(outside), State::unmet) << room.key;
            EXPECT_FALSE(reach->case_name.empty());
        }
    }
    EXPECT_GE(ends, 4);
}

TEST(Sensitivity, OfCoefficientsLiesBetweenMetAndUnmet) {
    PlacementProblem problem = servo();
    for (const Structure structure : {Structure::direct_form_1, Structure::delta}) {
        problem.realisation->structure = structure;
        const Sensitivity found = sensitivity(problem);
        ASSERT_FALSE(found.coefficients.empty());
        const DifferenceEquation equation =
            discretise(problem.compensator, *problem.sampling, *problem.realisation);
        for (const CoefficientName& name : coefficients_of(equation)) {
            const auto room = std::find_if(
                found.coefficients.begin(), found.coefficients.end(), [&](const ValueRoom& r) {
                    return r.section == name.section && r.key == text_of(name, equation);
                });
            ASSERT_NE(room, found.coefficients.end());
            EXPECT_EQ(room->value, coefficient(equation, name));
            const ValueReach& up = room->up;
            if (up.end == RoomEnd::none)
                continue;
            const auto state_at = [&](double factor) {
                return evaluate_realised(problem,
                                         with_coefficient(equation, name, room->value * factor))
                    .verdict.state;
            };
            EXPECT_EQ(state_at(1.0 + (up.factor - 1.0) * 0.999), State::met) << room->key;
            EXPECT_NE(state_at(1.0 + (up.factor - 1.0) * 1.001), State::met) << room->key;
        }
    }
}

TEST(Sensitivity, LeavesOutWhatIsNotMetAndLooksAtLockedValues) {
    PlacementProblem problem = servo();
    problem.realisation.reset();
    problem.requirements.push_back(at_least(Measure::phase_margin, 89.0));
    problem.compensator[0].locked = true;
    problem.compensator[2].enabled = false;
    const Sensitivity found = sensitivity(problem);
    EXPECT_EQ(found.left_out, std::vector<std::size_t>{3});
    ASSERT_EQ(found.values.size(), 3U);
    EXPECT_EQ(found.values[0].section, 0U);
    EXPECT_TRUE(found.coefficients.empty());
    problem.requirements.erase(problem.requirements.begin(), problem.requirements.end() - 1);
    EXPECT_THROW(sensitivity(problem), InputError);
}

TEST(Sensitivity, EndsWhereASectionWouldLoseItsOrder) {
    PlacementProblem problem = servo();
    problem.requirements = {at_least(Measure::phase_margin, 0.5)};
    problem.realisation.reset();
    problem.plants.pop_back();
    for (const ValueRoom& room : sensitivity(problem).values) {
        if (room.key == "zero_rad_s") {
            EXPECT_EQ(room.up.end, RoomEnd::realisation);
            EXPECT_NEAR(room.up.factor, 60.0 / 8.0, 1e-4);
        }
    }
}

TEST(Sensitivity, CanBeStopped) {
    SensitivityOptions options;
    options.proceed = [](double part) { return part < 0.2; };
    const Sensitivity found = sensitivity(servo(), options);
    EXPECT_TRUE(found.stopped);
    EXPECT_FALSE(found.values.empty());
    EXPECT_TRUE(found.coefficients.empty());
}

TEST(RoomSearch, ClosesInOnCrossingsOfEveryShape) {
    for (const double root : {1e-7, 0.003, 0.4, 0.9}) {
        const auto smooth = [&](double x) { return std::tanh(5.0 * (root - x)); };
        const auto jump = [&](double x) { return x < root ? 0.5 : -1.0; };
        const auto cubic = [&](double x) { return std::pow(root - x, 3.0); };
        EXPECT_NEAR(*first_failure(smooth, smooth(0.0), {}), root, 2e-6 * root);
        EXPECT_NEAR(*first_failure(jump, jump(0.0), {}), root, 2e-6 * root);
        EXPECT_NEAR(*first_failure(cubic, cubic(0.0), {}), root, 2e-6 * root);
    }
    EXPECT_FALSE(first_failure([](double) { return 1.0; }, 1.0, {}));
}

} // namespace
} // namespace cornerwright
