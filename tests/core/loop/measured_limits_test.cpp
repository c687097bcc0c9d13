// What the points of a measurement cannot tell is "not determined", with the reason; nothing is
// continued beyond them.

#include "core/loop/loop_assessment.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>
#include <memory>

namespace cornerwright {
namespace {

using testing::HasSubstr;

/// An axis 400/(s (s + 9)) as measured between two frequencies: |L| is 1 at 19.2 rad/s.
DesignLoop measured_axis(double first_rad_s, double last_rad_s, double gain = 1.0) {
    const RootForm axis{{}, {0.0, -9.0}, 400.0};
    constexpr int points = 60;
    auto response = std::make_shared<MeasuredResponse>();
    for (int i = 0; i < points; ++i) {
        const double w = first_rad_s * std::pow(last_rad_s / first_rad_s, i / (points - 1.0));
        response->w_rad_s.push_back(w);
        response->response.push_back(evaluate(axis, Complex(0.0, w)));
    }
    DesignLoop loop;
    loop.compensator.gain = gain;
    loop.plant = MeasuredPlant{response, 1, 0, {}};
    return loop;
}

TEST(MeasuredLimits, MarginsInsideThePointsAreDetermined) {
    const LoopFigures figures = assess_loop(measured_axis(1.0, 300.0), {}).figures;
    ASSERT_EQ(figures.frequency.crossovers_rad_s.size(), 1U);
    EXPECT_EQ(figures.stability.stable, true);
    EXPECT_TRUE(figures.frequency.phase_margin_deg.is_value());
    EXPECT_TRUE(figures.frequency.delay_margin_s.is_value());
}

TEST(MeasuredLimits, ACrossoverAboveTheLastPointLeavesStabilityAndMarginUndetermined) {
    const LoopFigures figures = assess_loop(measured_axis(1.0, 15.0), {}).figures;
    EXPECT_FALSE(figures.stability.stable.has_value());
    EXPECT_THAT(figures.stability.reason, HasSubstr("last"));
    for (const Figure& figure :
         {figures.frequency.phase_margin_deg, figures.frequency.delay_margin_s}) {
        EXPECT_FALSE(figure.is_determined());
        EXPECT_FALSE(figure.reason().empty());
    }
}

TEST(MeasuredLimits, ACrossoverBelowTheFirstPointLeavesTheMarginUndetermined) {
    const LoopFigures figures = assess_loop(measured_axis(30.0, 300.0), {}).figures;
    EXPECT_TRUE(figures.frequency.crossovers_rad_s.empty());
    EXPECT_FALSE(figures.frequency.phase_margin_deg.is_determined());
    EXPECT_FALSE(figures.frequency.phase_margin_deg.reason().empty());
}

TEST(MeasuredLimits, AGainMarginBeyondThePointsIsNotGuessed) {
    // The phase of the axis only nears -180 degrees: no crossing lies inside, and what comes after
    // the last point is not known.
    const LoopFigures figures = assess_loop(measured_axis(1.0, 300.0), {}).figures;
    EXPECT_TRUE(figures.frequency.phase_crossings_rad_s.empty());
    EXPECT_FALSE(figures.frequency.gain_margin_db.is_determined());
    EXPECT_FALSE(figures.frequency.gain_margin_db.reason().empty());
}

TEST(MeasuredLimits, TimeFiguresWithoutAFitSayThatThereIsNone) {
    const LoopFigures figures = assess_loop(measured_axis(1.0, 300.0), {}).figures;
    EXPECT_FALSE(figures.time.overshoot_percent.is_determined());
    EXPECT_THAT(figures.time.overshoot_percent.reason(), HasSubstr("no fit"));
}

TEST(MeasuredLimits, MoreTurnsThanTheDeclaredPolesAllowAreNotAnAnswer) {
    // k/(s - 9) turns once round -1 for its pole on the right, which nobody declared.
    const RootForm unstable{{}, {9.0}, 40.0};
    auto response = std::make_shared<MeasuredResponse>();
    for (double w = 0.01; w < 1000.0; w *= 1.1) {
        response->w_rad_s.push_back(w);
        response->response.push_back(evaluate(unstable, Complex(0.0, w)));
    }
    DesignLoop loop;
    loop.plant = MeasuredPlant{response, 0, 1, {}};
    EXPECT_EQ(assess_loop(loop, {}).figures.stability.stable, true);
    loop.plant = MeasuredPlant{response, 0, 0, {}};
    const Stability undeclared = assess_loop(loop, {}).figures.stability;
    EXPECT_FALSE(undeclared.stable.has_value());
    EXPECT_THAT(undeclared.reason, HasSubstr("declared"));
}

} // namespace
} // namespace cornerwright
