// Every slope of a frequency-response figure against central differences of the full assessment,
// sharpened once by Richardson's extrapolation (the figures themselves are good to about 1e-12).

#include "core/placement/figure_slopes.h"
#include "core/requirements/judged_figure.h"
#include "tests/core/placement/placement_practice.h"

#include <gtest/gtest.h>

#include <algorithm>

namespace cornerwright {
namespace {

using namespace practice;

std::vector<Requirement> frequency_requirements(double w) {
    std::vector<Requirement> all{
        at_least(Measure::phase_margin, 45.0),       at_least(Measure::gain_margin, 6.0),
        at_least(Measure::gain_reduction_margin, 3), at_least(Measure::delay_margin, 1e-3),
        at_most(Measure::sensitivity_peak, 6.0),     at_most(Measure::complementary_peak, 3.0),
        at_most(Measure::control_effort_peak, 40.0), at_least(Measure::bandwidth, w),
        at_most(Measure::disturbance_rejection, -6), at_most(Measure::roll_off, -6.0)};
    all[8].up_to_rad_s = 0.3 * w;
    all[9].from_rad_s = 4.0 * w;
    return all;
}

/// Figures of every requirement (rows) on one loop of `problem`, with `chain`.
std::vector<Figure> figures(const PlacementProblem& problem, const Chain& chain, std::size_t loop) {
    const Evaluation evaluation = evaluate(problem, chain);
    std::vector<Figure> result;
    for (const Requirement& requirement : problem.requirements)
        result.push_back(judged_figure(requirement, evaluation.request,
                                       evaluation.loops[loop].assessment.figures)
                             .value);
    return result;
}

/// Compares every slope that exists; returns how many requirements were compared.
int compare(const PlacementProblem& problem, std::size_t loop_index) {
    constexpr double step = 1e-4;
    const Chain& chain = problem.compensator;
    const auto parameters = free_parameters(chain);
    const Evaluation evaluation = evaluate(problem, chain);
    const PlacementLoop& loop = evaluation.loops[loop_index];
    EXPECT_EQ(loop.assessment.figures.stability.stable, true);
    const CompensatorSlopes slopes(problem, chain, parameters);

    std::vector<std::vector<Figure>> moved; // by parameter, then -2h, -h, h, 2h
    for (std::size_t i = 0; i < parameters.size(); ++i) {
        for (const double steps : {-2.0, -1.0, 1.0, 2.0}) {
            std::vector<double> logarithms = logarithms_of(chain, parameters);
            logarithms[i] += steps * step;
            moved.push_back(
                figures(problem, with_logarithms(chain, parameters, logarithms), loop_index));
        }
    }

    int compared = 0;
    for (std::size_t r = 0; r < problem.requirements.size(); ++r) {
        const Measure measure = problem.requirements[r].measure;
        const JudgedFigure judged =
            judged_figure(problem.requirements[r], evaluation.request, loop.assessment.figures);
        if (!judged.value.is_value())
            continue;
        const auto found = figure_slopes(loop, measure, judged.at_rad_s, slopes);
        if (!found)
            continue;
        std::vector<double> expected;
        double largest = 0.0;
        for (std::size_t i = 0; i < parameters.size(); ++i) {
            const auto at = [&](std::size_t k) { return moved[4 * i + k][r].value(); };
            expected.push_back((8.0 * (at(2) - at(1)) - (at(3) - at(0))) / (12.0 * step));
            largest = std::max(largest, std::abs(expected.back()));
        }
        for (std::size_t i = 0; i < parameters.size(); ++i)
            EXPECT_NEAR((*found)[i], expected[i], 1e-6 * largest)
                << name_of(measure) << " by " << parameters[i].parameter.key << " of section "
                << parameters[i].section;
        ++compared;
    }
    return compared;
}

Chain servo_chain() {
    return {gain_of(40.0), corner_of(SectionKind::pi, 1.5), pair_of(SectionKind::lead, 12.0, 80.0),
            notch_of(141.0, 0.1, 0.8), pair_of(SectionKind::real_pole, 1.0, 700.0)};
}

constexpr const char* servo = "1/(s (0.2 s + 1)) * 150^2/(s^2 + 12 s + 150^2)";
constexpr const char* slow_servo = "1/(s (0.2 s + 1)) * 150^2/(s^2 + 12 s + 150^2) exp(-0.003 s)";

TEST(FigureSlopes, OfARationalLoop) {
    PlacementProblem problem;
    problem.compensator = servo_chain();
    problem.plants = {{"servo", parse_formula(servo)}};
    problem.requirements = frequency_requirements(30.0);
    EXPECT_GE(compare(problem, 0), 9);
}

TEST(FigureSlopes, OfALoopWithoutIntegratorWhoseBandwidthFollowsItsFiniteGain) {
    PlacementProblem problem;
    problem.compensator = {gain_of(8.0), pair_of(SectionKind::lag, 3.0, 1.0),
                           second_order_of(SectionKind::complex_poles, 300.0, 0.7)};
    problem.plants = {{"oven", parse_formula("2/((s + 1)(0.02 s + 1))")}};
    problem.requirements = frequency_requirements(15.0);
    EXPECT_GE(compare(problem, 0), 7);
}

TEST(FigureSlopes, OfALoopWithDeadTimeAndHold) {
    PlacementProblem problem;
    problem.compensator = servo_chain();
    problem.plants = {{"servo", parse_formula(slow_servo)}};
    problem.sampling = Sampling{1e-3, 5e-4, true};
    problem.requirements = frequency_requirements(30.0);
    EXPECT_GE(compare(problem, 0), 9);
}

TEST(FigureSlopes, OfARealisedLoop) {
    for (const Method method : {Method::tustin, Method::matched_roots, Method::tustin_at_corners}) {
        PlacementProblem problem;
        problem.compensator = servo_chain();
        problem.plants = {{"servo", parse_formula(slow_servo)}};
        problem.sampling = Sampling{1e-3, 5e-4, true};
        problem.realisation = Realisation{};
        problem.realisation->method = method;
        problem.requirements = frequency_requirements(30.0);
        EXPECT_GE(compare(problem, 1), 9) << name_of(method);
    }
}

TEST(FigureSlopes, OfAMeasuredLoop) {
    PlacementProblem problem;
    problem.compensator = servo_chain();
    problem.plants = {{"unit 1", measured(parse_formula(slow_servo), 0.1, 2e3, 403, 1)}};
    problem.sampling = Sampling{1e-3, 5e-4, true};
    problem.realisation = Realisation{};
    problem.requirements = frequency_requirements(30.0);
    EXPECT_GE(compare(problem, 0), 9);
    EXPECT_GE(compare(problem, 1), 9);
}

} // namespace
} // namespace cornerwright
