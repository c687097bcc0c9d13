// Section design on the chain: shown before it is taken, taken as one step, put back in every way.

#include "core/engine/engine.h"
#include "core/engine/placement_problem.h"
#include "core/placement/free_parameters.h"
#include "shell_samples.h"
#include "widgets/chain/chain_edits.h"
#include "widgets/chain/chain_panel.h"
#include "widgets/design/design_panel.h"
#include "widgets/design/uphill_watch.h"
#include "widgets/design/verdict_change.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/window/design_commands.h"
#include "widgets/window/main_window.h"
#include "widgets/window/window_actions.h"

#include <QSignalSpy>
#include <QTemporaryDir>
#include <QTest>
#include <gtest/gtest.h>

#include <cmath>

namespace cornerwright {
namespace {

constexpr int longestWait = 30000; // ms

class DesignPanelTest : public testing::Test {
  protected:
    DesignPanelTest() {
        window.document().reset(smallProject(), QString(), folder.path());
        window.show();
        settle();
    }

    bool settle() {
        return QTest::qWaitFor(
            [this] { return !panel().isBusy() && !window.live().runner().isBusy(); }, longestWait);
    }

    DesignPanel& panel() { return window.chain().design(); }
    const Project& project() { return window.document().project(); }

    /// The panel open with a margin that the small project does not have.
    void beginLift(double margin_deg) {
        panel().begin(DesignKind::lift_phase);
        DesignWish wish = panel().wish();
        wish.lift.phase_margin_deg = margin_deg;
        panel().setWish(wish);
        ASSERT_TRUE(settle());
    }

    QTemporaryDir folder;
    MainWindow window{{folder.filePath(QStringLiteral("window.ini")),
                       folder.filePath(QStringLiteral("recovery"))}};
};

TEST_F(DesignPanelTest, ShowsWhatItWouldDoWithThePresentDesignAsGhost) {
    const auto before = window.live().content().assessment;
    beginLift(68.0);
    ASSERT_TRUE(panel().isPossible()) << panel().words().toStdString();
    EXPECT_EQ(project().compensator.size(), smallProject().compensator.size() + 1);
    EXPECT_EQ(window.live().content().ghost, before);
    EXPECT_EQ(window.live().content().assessment->verdict, Engine().assess(project())->verdict);
    EXPECT_NEAR(window.live().content().assessment->verdict.requirements[0].worst.value.value(),
                68.0, 0.01);
    EXPECT_FALSE(window.document().canUndo());
}

TEST_F(DesignPanelTest, TakenItIsOneStepOfOrdinarySections) {
    beginLift(68.0);
    panel().take();
    EXPECT_FALSE(panel().isOpen());
    ASSERT_EQ(project().compensator.back().kind, SectionKind::lead);
    EXPECT_TRUE(window.document().canUndo());
    EXPECT_EQ(window.viewState().selectedSection(), project().compensator.size() - 1);
    window.actions().undo->trigger();
    EXPECT_EQ(project(), smallProject());
    EXPECT_FALSE(window.document().canUndo());
}

TEST_F(DesignPanelTest, EscapeAndUndoPutEverythingBack) {
    beginLift(68.0);
    QTest::keyClick(panel().fields().front(), Qt::Key_Escape);
    EXPECT_FALSE(panel().isOpen());
    EXPECT_EQ(project(), smallProject());
    const Project edited = withLeadZero(smallProject(), 26.0);
    window.document().apply(edited, QStringLiteral("Move zero"));
    beginLift(66.0);
    ASSERT_TRUE(panel().isPossible());
    window.actions().undo->trigger();
    QCoreApplication::processEvents();
    EXPECT_FALSE(panel().isOpen());
    EXPECT_EQ(project(), edited);
}

TEST_F(DesignPanelTest, AProposalThatNobodyTookIsNotSaved) {
    beginLift(68.0);
    ASSERT_TRUE(panel().isPossible());
    const QString file = folder.filePath(QStringLiteral("saved.cornerwright.json"));
    window.document().save(file);
    EXPECT_EQ(load_project(file.toStdString()).project, smallProject());
    EXPECT_EQ(project(), smallProject());
}

TEST_F(DesignPanelTest, SaysWhyItCannotAndChangesNothing) {
    beginLift(170.0);
    EXPECT_FALSE(panel().isPossible());
    EXPECT_TRUE(panel().words().startsWith(QStringLiteral("✗")));
    EXPECT_TRUE(panel().words().contains(QStringLiteral("170")));
    EXPECT_FALSE(panel().takeButton()->isEnabled());
    EXPECT_EQ(project(), smallProject());
    EXPECT_FALSE(window.document().isDragging());
}

TEST_F(DesignPanelTest, FollowsAnEditMadeMeanwhile) {
    beginLift(68.0);
    Section gain = smallProject().compensator[0];
    gain.gain *= 0.95;
    window.document().apply(withSectionChanged(smallProject(), 0, gain), QStringLiteral("Gain"));
    QCoreApplication::processEvents();
    ASSERT_TRUE(settle());
    ASSERT_TRUE(panel().isPossible()) << panel().words().toStdString();
    EXPECT_EQ(project().compensator[0], gain);
    EXPECT_EQ(project().compensator.size(), smallProject().compensator.size() + 1);
    panel().take();
    window.actions().undo->trigger();
    EXPECT_EQ(project().compensator[0], gain);
    window.actions().undo->trigger();
    EXPECT_EQ(project(), smallProject());
}

TEST_F(DesignPanelTest, ATypedWishIsWorkedOut) {
    panel().begin(DesignKind::lift_phase);
    QuantityField* margin = panel().fields().front();
    margin->setFocus();
    margin->selectAll();
    QTest::keyClicks(margin, QStringLiteral("67"));
    QTest::keyClick(margin, Qt::Key_Return);
    ASSERT_TRUE(settle());
    EXPECT_EQ(panel().wish().lift.phase_margin_deg, 67.0);
    EXPECT_EQ(panel().wish().lift.allowance_deg, 10.0);
    EXPECT_NEAR(window.live().content().assessment->verdict.requirements[0].worst.value.value(),
                67.0, 0.01);
}

TEST_F(DesignPanelTest, EveryDesignOpensByItsCommandAndHasNamedFields) {
    for (int i = 0; i < design_kind_count; ++i) {
        window.designCommands().designs()[static_cast<std::size_t>(i)]->trigger();
        EXPECT_TRUE(panel().isOpen());
        EXPECT_EQ(panel().wish().kind, static_cast<DesignKind>(i));
        EXPECT_FALSE(panel().fields().empty());
        for (const QuantityField* field : panel().fields()) {
            EXPECT_FALSE(field->accessibleName().isEmpty());
        }
        ASSERT_TRUE(settle());
        EXPECT_FALSE(panel().words().isEmpty());
        panel().leave();
        EXPECT_EQ(project(), smallProject());
    }
}

TEST_F(DesignPanelTest, ArrowsPointWhereTheSmallestHeadroomRises) {
    const auto isKnown = [this] { return !window.designCommands().uphill().isBusy(); };
    ASSERT_TRUE(QTest::qWaitFor(isKnown, longestWait));
    const std::vector<UphillPull>& pulls = window.viewState().uphill();
    const PlacementProblem problem = placement_problem_of(project());
    const auto parameters = free_parameters(problem.compensator);
    ASSERT_EQ(pulls.size(), parameters.size());
    const double before = evaluate(problem, problem.compensator).merit;
    constexpr double step = 1e-5;
    for (std::size_t i = 0; i < pulls.size(); ++i) {
        std::vector<double> logarithms = logarithms_of(problem.compensator, parameters);
        logarithms[i] += step;
        const Chain moved = with_logarithms(problem.compensator, parameters, logarithms);
        const double rise = (evaluate(problem, moved).merit - before) / step;
        EXPECT_NEAR(pulls[i].slope, rise, 1e-3 * (1.0 + std::abs(rise)));
    }
    const UphillSign gain = uphillOfGain(pulls, problem.compensator);
    EXPECT_EQ(gain.direction, pulls[0].slope > 0.0 ? 1 : -1);
}

TEST(Uphill, GripFollowsBothCornersAndWeakPullsStayUnmarked) {
    Section lead;
    lead.kind = SectionKind::lead;
    const Chain chain{lead};
    const std::vector<UphillPull> pulls{{0, &Section::zero_rad_s, 2.0},
                                        {0, &Section::pole_rad_s, -0.5}};
    EXPECT_EQ(uphillOf(pulls, chain, 0, SectionPart::zero).direction, 1);
    EXPECT_EQ(uphillOf(pulls, chain, 0, SectionPart::pole).direction, -1);
    EXPECT_EQ(uphillOf(pulls, chain, 0, SectionPart::grip).direction, 1);
    EXPECT_DOUBLE_EQ(uphillOf(pulls, chain, 0, SectionPart::pole).strength, 0.25);
    EXPECT_EQ(uphillOf({{0, &Section::zero_rad_s, 2.0}, {0, &Section::pole_rad_s, 1e-6}}, chain, 0,
                       SectionPart::pole)
                  .direction,
              0);
    EXPECT_EQ(uphillOf(pulls, chain, 5, SectionPart::zero).direction, 0);
}

TEST(VerdictChange, TellsWhatTurns) {
    const Project project = smallProject();
    Project worse = project;
    worse.compensator[0].gain *= 3.0;
    const Verdict before = Engine().assess(project)->verdict;
    const Verdict after = Engine().assess(worse)->verdict;
    const QStringList changes = changesOf(before, after, true);
    EXPECT_EQ(changes.front(), verdictText(before) + QStringLiteral(" → ") + verdictText(after));
    int turned = 0;
    for (std::size_t i = 0; i < before.requirements.size(); ++i) {
        turned += before.requirements[i].worst.state != after.requirements[i].worst.state ? 1 : 0;
    }
    EXPECT_GT(turned, 0);
    EXPECT_EQ(changes.size(), turned + 1);
    EXPECT_EQ(changesOf(before, before, true).size(), 1);
}

} // namespace
} // namespace cornerwright
