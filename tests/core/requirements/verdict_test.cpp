#include "core/requirements/verdict.h"

#include <gtest/gtest.h>

#include <cmath>

namespace cornerwright {
namespace {

Requirement at_least(Measure measure, double limit) {
    Requirement requirement;
    requirement.measure = measure;
    requirement.at_least = limit;
    return requirement;
}

Requirement at_most(Measure measure, double limit) {
    Requirement requirement;
    requirement.measure = measure;
    requirement.at_most = limit;
    return requirement;
}

/// A stable loop with one phase margin, one sensitivity peak and one bandwidth.
LoopFigures stable_loop(double phase_margin_deg, double sensitivity_peak_db = 4.0,
                        double bandwidth_rad_s = 100.0) {
    LoopFigures figures;
    figures.stability.stable = true;
    figures.frequency.phase_margin_deg = Figure::of(phase_margin_deg);
    figures.frequency.phase_margin_at_rad_s = Figure::of(10.0);
    figures.frequency.sensitivity_peak_db = Figure::of(sensitivity_peak_db);
    figures.frequency.bandwidth_rad_s = Figure::of(bandwidth_rad_s);
    figures.time.settling_time_s = Figure::of(0.2);
    return figures;
}

RequirementResult judge_one(const Requirement& requirement, const LoopFigures& figures) {
    const JudgedLoop loop{"unit 1", LoopName::design, &figures};
    return judge({&requirement, 1}, request_of({&requirement, 1}), {&loop, 1}).requirements[0];
}

TEST(Verdict, HeadroomIsTheSignedDistanceToTheLimit) {
    const RequirementResult met =
        judge_one(at_least(Measure::phase_margin, 45.0), stable_loop(50.0));
    EXPECT_EQ(met.worst.state, State::met);
    EXPECT_DOUBLE_EQ(met.worst.headroom.value(), 5.0);
    EXPECT_DOUBLE_EQ(met.worst.share.value(), 0.5);
    EXPECT_DOUBLE_EQ(met.worst.at_rad_s.value(), 10.0);
    EXPECT_EQ(met.limit, "at least 45 deg");

    const RequirementResult unmet =
        judge_one(at_least(Measure::phase_margin, 45.0), stable_loop(38.0));
    EXPECT_EQ(unmet.worst.state, State::unmet);
    EXPECT_DOUBLE_EQ(unmet.worst.headroom.value(), -7.0);
}

TEST(Verdict, APhaseMarginThatLeadEatsCountsBySize) {
    const RequirementResult result =
        judge_one(at_least(Measure::phase_margin, 45.0), stable_loop(-50.0));
    EXPECT_EQ(result.worst.state, State::met);
    EXPECT_DOUBLE_EQ(result.worst.headroom.value(), 5.0);
    EXPECT_DOUBLE_EQ(result.worst.value.value(), -50.0);
}

TEST(Verdict, TwoLimitsAreJudgedByTheNearer) {
    Requirement band = at_least(Measure::bandwidth, 60.0);
    band.at_most = 200.0;
    const RequirementResult near_top = judge_one(band, stable_loop(50.0, 4.0, 150.0));
    EXPECT_DOUBLE_EQ(near_top.worst.headroom.value(), std::log(200.0 / 150.0));
    const RequirementResult near_bottom = judge_one(band, stable_loop(50.0, 4.0, 70.0));
    EXPECT_DOUBLE_EQ(near_bottom.worst.headroom.value(), std::log(70.0 / 60.0));
    EXPECT_DOUBLE_EQ(near_bottom.worst.share.value(), std::log(70.0 / 60.0) / std::log(1.25));
    EXPECT_EQ(near_top.limit, "60 to 200 rad/s");
}

TEST(Verdict, AnUnstableLoopLeavesEverythingUnmet) {
    LoopFigures figures = stable_loop(80.0);
    figures.stability = {false, "2 closed-loop poles right of the axis"};
    const RequirementResult result = judge_one(at_least(Measure::phase_margin, 45.0), figures);
    EXPECT_EQ(result.worst.state, State::unmet);
    EXPECT_EQ(result.worst.headroom.kind(), Figure::Kind::minus_infinite);
    EXPECT_EQ(result.worst.reason, "the loop is not stable: 2 closed-loop poles right of the axis");
}

TEST(Verdict, UnknownStabilityAndUnknownFiguresAreUndetermined) {
    LoopFigures unknown = stable_loop(80.0);
    unknown.stability = {std::nullopt, "|L| is still above 1"};
    EXPECT_EQ(judge_one(at_least(Measure::phase_margin, 45.0), unknown).worst.state,
              State::undetermined);
    LoopFigures no_step = stable_loop(80.0);
    no_step.time.overshoot_percent = Figure::undetermined("no fit for this measured case");
    const RequirementResult result = judge_one(at_most(Measure::overshoot, 25.0), no_step);
    EXPECT_EQ(result.worst.state, State::undetermined);
    EXPECT_EQ(result.worst.reason, "no fit for this measured case");
}

TEST(Verdict, TheWorstLoopStandsForTheRequirement) {
    const LoopFigures good = stable_loop(60.0);
    const LoopFigures poor = stable_loop(47.0);
    LoopFigures unknown = stable_loop(60.0);
    unknown.frequency.phase_margin_deg = Figure::undetermined("outside the data");
    const Requirement requirement = at_least(Measure::phase_margin, 45.0);
    const std::vector<JudgedLoop> loops{{"a", LoopName::design, &good},
                                        {"a", LoopName::realised, &poor},
                                        {"b", LoopName::design, &unknown}};
    const Verdict two = judge({&requirement, 1}, {}, std::span(loops).first(2));
    EXPECT_EQ(two.requirements[0].worst.loop, LoopName::realised);
    EXPECT_EQ(two.state, State::met);
    const Verdict three = judge({&requirement, 1}, {}, loops);
    EXPECT_EQ(three.requirements[0].worst.case_name, "b");
    EXPECT_EQ(three.state, State::undetermined);
    EXPECT_EQ(three.requirements[0].all.size(), 3u);
}

TEST(Verdict, AnUnmetRequirementOutweighsAnUndeterminedOne) {
    LoopFigures figures = stable_loop(40.0);
    const std::vector<Requirement> requirements{at_most(Measure::overshoot, 25.0),
                                                at_least(Measure::phase_margin, 45.0)};
    figures.time.overshoot_percent = Figure::undetermined("no fit");
    const JudgedLoop loop{"unit 1", LoopName::design, &figures};
    EXPECT_EQ(judge(requirements, {}, {&loop, 1}).state, State::unmet);
}

TEST(Verdict, AMarginWithinTwoStandardDeviationsIsSaid) {
    LoopFigures figures = stable_loop(47.0);
    figures.frequency.phase_margin_deg = Figure::of(47.0).with_standard_deviation(1.5);
    const RequirementResult near = judge_one(at_least(Measure::phase_margin, 45.0), figures);
    EXPECT_EQ(near.worst.state, State::met);
    EXPECT_NE(near.worst.reason.find("less than two standard deviations"), std::string::npos);
    const RequirementResult far = judge_one(at_least(Measure::phase_margin, 40.0), figures);
    EXPECT_EQ(far.worst.reason, "");
}

TEST(Verdict, RequestHoldsEachWantedNumberOnce) {
    Requirement settling = at_most(Measure::settling_time, 0.3);
    Requirement wide = settling;
    wide.band_percent = 5.0;
    Requirement rejection = at_most(Measure::disturbance_rejection, -20.0);
    rejection.up_to_rad_s = 6.0;
    const std::vector<Requirement> requirements{settling, wide, wide, rejection, rejection};
    const FigureRequest request = request_of(requirements);
    EXPECT_EQ(request.settling_bands_percent, std::vector<double>{5.0});
    EXPECT_EQ(request.rejection_up_to_rad_s, std::vector<double>{6.0});

    LoopFigures figures = stable_loop(50.0);
    figures.time.settling_times_s = {Figure::of(0.1)};
    figures.frequency.rejections_db = {Figure::of(-26.0)};
    figures.frequency.rejections_at_rad_s = {Figure::of(6.0)};
    const JudgedLoop loop{"unit 1", LoopName::design, &figures};
    const Verdict verdict = judge(requirements, request, {&loop, 1});
    EXPECT_DOUBLE_EQ(verdict.requirements[0].worst.value.value(), 0.2);
    EXPECT_DOUBLE_EQ(verdict.requirements[1].worst.value.value(), 0.1);
    EXPECT_DOUBLE_EQ(verdict.requirements[3].worst.headroom.value(), 6.0);
}

TEST(Verdict, WithoutRequirementsTheProjectIsMet) {
    EXPECT_EQ(judge({}, {}, {}).state, State::met);
}

TEST(Verdict, WithoutLoopsNothingIsDetermined) {
    const Requirement requirement = at_least(Measure::phase_margin, 45.0);
    EXPECT_EQ(judge({&requirement, 1}, {}, {}).state, State::undetermined);
}

} // namespace
} // namespace cornerwright
