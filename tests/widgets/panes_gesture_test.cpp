// Every gesture on the panes: what it does to the project, that the figures follow, and that it is
// one step of undo.

#include "gesture_hand.h"

#include <QTest>

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

constexpr std::size_t gain = 0, pi = 1, lead = 2, notch = 3;

/// Requirements of the servo project.
constexpr std::size_t phase_margin = 0, gain_margin = 1, sensitivity_peak = 2, overshoot = 3,
                      settling = 4;

class Gestures : public GestureTest {
  protected:
    double atLeast(std::size_t requirement) {
        return project().requirements.at(requirement).at_least.value_or(NAN);
    }
    double atMost(std::size_t requirement) {
        return project().requirements.at(requirement).at_most.value_or(NAN);
    }
    /// Pixels of the magnitude and phase panes for a factor on the frequency.
    static double pixelsFor(const PlotPane& pane, double factor) {
        const AxisRange x = pane.ranges().x;
        const double width = pane.plotArea().width();
        return width * std::log(factor) / std::log(x.high / x.low);
    }
};

class OnBothResponses : public Gestures, public testing::WithParamInterface<const char*> {
  protected:
    PlotPane& shown() { return pane(QString::fromLatin1(GetParam())); }
};
INSTANTIATE_TEST_SUITE_P(Panes, OnBothResponses, testing::Values("magnitude", "phase"));

TEST_P(OnBothResponses, ACornerFollowsTheHandAlongFrequency) {
    PlotPane& response = shown();
    const Handle zero = handle(response, QStringLiteral("zero of Lead"));
    drag(response, zero.at, {pixelsFor(response, 1.5), 0.0});
    EXPECT_NEAR(section(lead).zero_rad_s, 1.5 * 38.0, 1e-6);
    EXPECT_EQ(section(lead).pole_rad_s, 330.0);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_P(OnBothResponses, TheGripMovesBothCornersAtConstantRatio) {
    PlotPane& response = shown();
    const auto& all = response.handles();
    const auto grip = std::find_if(all.begin(), all.end(), [](const Handle& handle) {
        return handle.id.index == lead && handle.id.part == SectionPart::grip;
    });
    ASSERT_NE(grip, all.end());
    drag(response, grip->at, {pixelsFor(response, 1.25), 0.0});
    EXPECT_NEAR(section(lead).zero_rad_s, 1.25 * 38.0, 1e-6);
    EXPECT_NEAR(section(lead).pole_rad_s, 1.25 * 330.0, 1e-6);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_P(OnBothResponses, TheGripDraggedUpOpensTheRatioAboutItsCentre) {
    PlotPane& response = shown();
    const auto& all = response.handles();
    const auto grip = std::find_if(all.begin(), all.end(), [](const Handle& handle) {
        return handle.id.index == lead && handle.id.part == SectionPart::grip;
    });
    ASSERT_NE(grip, all.end());
    drag(response, grip->at, {0.0, -60.0});
    EXPECT_GT(ratioOf(section(lead)), 1.05 * 330.0 / 38.0);
    EXPECT_NEAR(section(lead).zero_rad_s * section(lead).pole_rad_s, 38.0 * 330.0, 1e-6);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_P(OnBothResponses, ANotchGoesSidewaysByItsCentreAndUpByItsDepth) {
    PlotPane& response = shown();
    const Handle corner = handle(response, QStringLiteral("Notch"));
    drag(response, corner.at, {pixelsFor(response, 1.2), 0.0});
    EXPECT_NEAR(section(notch).corner_rad_s, 1.2 * 600.0, 1e-6);
    EXPECT_NEAR(depthOf(section(notch)), 20.0 * std::log10(0.12 / 0.7), 1e-9);
    expectOneUndoStep();
    drag(response, handle(response, QStringLiteral("Notch")).at, {0.0, 50.0});
    EXPECT_EQ(section(notch).corner_rad_s, 600.0);
    EXPECT_EQ(section(notch).pole_damping, 0.7);
    EXPECT_LT(depthOf(section(notch)), 20.0 * std::log10(0.12 / 0.7) - 0.5);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_P(OnBothResponses, ANotchDraggedWithShiftChangesItsWidth) {
    PlotPane& response = shown();
    const Handle corner = handle(response, QStringLiteral("Notch"));
    drag(response, corner.at, {pixelsFor(response, 1.3), 0.0}, Qt::ShiftModifier);
    EXPECT_EQ(section(notch).corner_rad_s, 600.0);
    EXPECT_NEAR(section(notch).pole_damping, 1.3 * 0.7, 1e-6);
    EXPECT_NEAR(section(notch).zero_damping, 1.3 * 0.12, 1e-6);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_P(OnBothResponses, ShiftMovesATenth) {
    PlotPane& response = shown();
    const Handle zero = handle(response, QStringLiteral("zero of Lead"));
    drag(response, zero.at, {pixelsFor(response, 2.0), 0.0}, Qt::ShiftModifier);
    EXPECT_NEAR(section(lead).zero_rad_s, std::pow(2.0, 0.1) * 38.0, 1e-6);
    expectOneUndoStep();
}

TEST_P(OnBothResponses, EscapeDuringADragPutsItBack) {
    PlotPane& response = shown();
    const Handle zero = handle(response, QStringLiteral("zero of Lead"));
    press(response, zero.at);
    move(response, zero.at + QPointF(60.0, 0.0));
    EXPECT_NE(project(), original());
    EXPECT_TRUE(window.document().isDragging());
    QTest::keyClick(&response, Qt::Key_Escape);
    EXPECT_EQ(project(), original());
    EXPECT_FALSE(window.document().isDragging());
    release(response, zero.at + QPointF(60.0, 0.0));
    settle();
    EXPECT_EQ(project(), original());
    EXPECT_FALSE(window.document().canUndo());
    expectFiguresFollow();
}

TEST_P(OnBothResponses, ArrowKeysNudgeTheSelectedHandle) {
    PlotPane& response = shown();
    const Handle zero = handle(response, QStringLiteral("zero of Lead"));
    press(response, zero.at);
    release(response, zero.at);
    EXPECT_EQ(project(), original()) << "a click moves nothing";
    QTest::keyClick(&response, Qt::Key_Right);
    EXPECT_NEAR(section(lead).zero_rad_s, 1.01 * 38.0, 1e-9);
    settle();
    expectFiguresFollow();
    window.document().undo();
    settle();
    QTest::keyClick(&response, Qt::Key_Left, Qt::ShiftModifier);
    EXPECT_NEAR(section(lead).zero_rad_s, 38.0 / 1.001, 1e-9);
    expectOneUndoStep();
}

TEST_P(OnBothResponses, DeleteRemovesAndSpaceSwitchesTheSelectedSection) {
    PlotPane& response = shown();
    const Handle zero = handle(response, QStringLiteral("zero of Lead"));
    press(response, zero.at);
    release(response, zero.at);
    QTest::keyClick(&response, Qt::Key_Space);
    EXPECT_FALSE(section(lead).enabled);
    settle();
    expectFiguresFollow();
    QTest::keyClick(&response, Qt::Key_Space);
    EXPECT_TRUE(section(lead).enabled);
    settle();
    QTest::keyClick(&response, Qt::Key_Delete);
    EXPECT_EQ(project().compensator.size(), 4u);
    EXPECT_EQ(section(lead).kind, SectionKind::notch);
    settle();
    expectFiguresFollow();
}

TEST_F(Gestures, TheMagnitudeCurveDraggedUpIsTheGain) {
    PlotPane& magnitude = pane(QStringLiteral("magnitude"));
    const QPointF at = magnitude.pixelAtFrequency(20.0).value_or(QPointF());
    const AxisRange y = magnitude.ranges().y;
    const double pixels = 6.0 / (y.high - y.low) * magnitude.plotArea().height();
    drag(magnitude, at, {0.0, -pixels});
    EXPECT_NEAR(section(gain).gain, 22.0 * std::pow(10.0, 6.0 / 20.0), 1e-6);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, LimitsOfTheMarginsAreDragged) {
    PlotPane& phase = pane(QStringLiteral("phase"));
    const Handle limit = handle(phase, QStringLiteral("limit of phase margin"));
    const double up = limit.id.sub * 30.0;
    drag(phase, limit.at, {0.0, -up});
    EXPECT_GT(atLeast(phase_margin), 46.0);
    expectFiguresFollow();
    expectOneUndoStep();
    PlotPane& magnitude = pane(QStringLiteral("magnitude"));
    const Handle other = handle(magnitude, QStringLiteral("limit of gain margin"));
    drag(magnitude, other.at, {0.0, -other.id.sub * 20.0});
    EXPECT_GT(atLeast(gain_margin), 8.2);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, ACompensatorRootIsDraggedInThePlane) {
    PlotPane& locus = pane(QStringLiteral("root-locus"));
    const Handle zero = handle(locus, QStringLiteral("zero of Lead"));
    const AxisRange x = locus.ranges().x;
    const double perPixel = (x.high - x.low) / locus.plotArea().width();
    drag(locus, zero.at, {-20.0, 0.0});
    EXPECT_NEAR(section(lead).zero_rad_s, 38.0 + 20.0 * perPixel, 1e-6);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, AComplexRootMovesWithItsTwin) {
    PlotPane& locus = pane(QStringLiteral("root-locus"));
    locus.showRanges({{-900.0, 300.0}, {-700.0, 700.0}});
    settle();
    const Handle zero = handle(locus, QStringLiteral("zero of Notch"));
    drag(locus, zero.at, {-10.0, 15.0});
    EXPECT_NE(section(notch).corner_rad_s, 600.0);
    EXPECT_NE(section(notch).zero_damping, 0.12);
    const auto roots = roots_of(section(notch));
    ASSERT_EQ(roots.zeros.size(), 2u);
    EXPECT_EQ(roots.zeros[0], std::conj(roots.zeros[1]));
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, AClosedLoopPoleDraggedAlongItsBranchSetsTheGain) {
    PlotPane& locus = pane(QStringLiteral("root-locus"));
    locus.showRanges({{-900.0, 300.0}, {-900.0, 900.0}});
    settle();
    const auto& all = locus.handles();
    // One off the real axis, so that its branch runs through the open plane.
    constexpr double off_axis = 30.0;
    const auto pole = std::find_if(all.begin(), all.end(), [&](const Handle& handle) {
        return handle.id.kind == HandleKind::closed_loop_pole &&
               handle.at.y() < locus.plotArea().center().y() - off_axis;
    });
    ASSERT_NE(pole, all.end());
    drag(locus, pole->at, {-12.0, -20.0});
    EXPECT_NE(section(gain).gain, 22.0);
    EXPECT_EQ(section(lead), original().compensator[lead]);
    EXPECT_EQ(section(pi), original().compensator[pi]);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, LimitsInTheStepPaneAreTheRequirements) {
    PlotPane& step = pane(QStringLiteral("step"));
    const Handle line = handle(step, QStringLiteral("limit of overshoot"));
    const AxisRange y = step.ranges().y;
    const double pixels = 0.1 / (y.high - y.low) * step.plotArea().height();
    drag(step, line.at, {0.0, -pixels});
    EXPECT_NEAR(atMost(overshoot), 25.0 + 10.0, 0.05); // the output ends at 1
    expectFiguresFollow();
    expectOneUndoStep();
    const Handle time = handle(step, QStringLiteral("limit of settling time"));
    drag(step, time.at, {-10.0, 0.0});
    EXPECT_LT(atMost(settling), 0.2);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, LimitsOfTheSensitivitiesAreDragged) {
    PlotPane& sensitivity = pane(QStringLiteral("sensitivity"));
    const Handle line = handle(sensitivity, QStringLiteral("limit of sensitivity peak"));
    const AxisRange y = sensitivity.ranges().y;
    const double pixels = 3.0 / (y.high - y.low) * sensitivity.plotArea().height();
    drag(sensitivity, line.at, {0.0, -pixels});
    EXPECT_NEAR(atMost(sensitivity_peak), 9.0, 1e-6);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, TheSensitivityCircleIsDragged) {
    PlotPane& nyquist = pane(QStringLiteral("nyquist"));
    const Handle circle = handle(nyquist, QStringLiteral("limit of sensitivity peak"));
    drag(nyquist, circle.at, {0.0, 10.0}); // towards -1: a smaller circle, a looser limit
    EXPECT_GT(atMost(sensitivity_peak), 6.1);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, LimitsOfTheMarginsAreDraggedOnTheNicholsPane) {
    PlotPane& nichols = pane(QStringLiteral("nichols"));
    const Handle limit = handle(nichols, QStringLiteral("limit of phase margin"));
    const AxisRange x = nichols.ranges().x;
    const double pixels = 5.0 / (x.high - x.low) * nichols.plotArea().width();
    drag(nichols, limit.at, {limit.id.sub * pixels, 0.0});
    EXPECT_NEAR(atLeast(phase_margin), 50.0, 1e-6);
    expectFiguresFollow();
    expectOneUndoStep();
}

TEST_F(Gestures, TheLoopCurveOfThePlanesIsTheGain) {
    for (const char* key : {"nyquist", "nichols"}) {
        PlotPane& plane = pane(QString::fromLatin1(key));
        const QPointF at = plane.pixelAtFrequency(60.0).value_or(QPointF());
        ASSERT_TRUE(plane.plotArea().contains(at)) << key;
        drag(plane, at, {0.0, -15.0});
        EXPECT_NE(section(gain).gain, 22.0) << key;
        EXPECT_EQ(section(lead), original().compensator[lead]) << key;
        expectFiguresFollow();
        expectOneUndoStep();
    }
}

TEST_F(Gestures, TheStartOfADragStaysAsAGhostAndTheLedgerShowsTheChange) {
    PlotPane& magnitude = pane(QStringLiteral("magnitude"));
    const auto before = window.live().content().assessment;
    const Handle zero = handle(magnitude, QStringLiteral("zero of Lead"));
    press(magnitude, zero.at);
    move(magnitude, zero.at + QPointF(50.0, 0.0));
    settle();
    EXPECT_EQ(window.live().content().ghost, before);
    EXPECT_NE(window.live().content().assessment, before);
    release(magnitude, zero.at + QPointF(50.0, 0.0));
    settle();
    EXPECT_EQ(window.live().content().ghost, nullptr);
}

} // namespace
} // namespace cornerwright
