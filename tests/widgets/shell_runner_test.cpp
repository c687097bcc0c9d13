#include "core/engine/engine.h"
#include "shell_samples.h"
#include "widgets/document/live_content.h"

#include <QDir>
#include <QSignalSpy>
#include <gtest/gtest.h>

namespace cornerwright {
namespace {

constexpr int longestWait = 20000; // ms

TEST(AssessmentRunner, TheLastOfManyRequestsIsAnswered) {
    AssessmentRunner runner;
    std::vector<AssessedProject> answers;
    QObject::connect(&runner, &AssessmentRunner::assessed, &runner,
                     [&answers](const AssessedProject& result) { answers.push_back(result); });
    QSignalSpy busy(&runner, &AssessmentRunner::busyChanged);
    constexpr int requests = 200;
    ProjectPointer last;
    for (int i = 0; i < requests; ++i) {
        last = std::make_shared<const Project>(withLeadZero(smallProject(), 10.0 + i));
        runner.request(last, 0);
    }
    while (runner.isBusy()) {
        ASSERT_TRUE(busy.wait(longestWait));
    }
    ASSERT_FALSE(answers.empty());
    EXPECT_EQ(answers.back().project, last);
    // Requests that were overtaken while another was computed were never computed.
    EXPECT_LT(answers.size(), static_cast<std::size_t>(requests));
    const auto fresh = Engine().assess(*last);
    EXPECT_EQ(answers.back().assessment->verdict, fresh->verdict);
}

TEST(AssessmentRunner, ACancelledRequestGivesNoAnswer) {
    AssessmentRunner runner;
    QSignalSpy answered(&runner, &AssessmentRunner::assessed);
    QSignalSpy busy(&runner, &AssessmentRunner::busyChanged);
    runner.request(std::make_shared<const Project>(smallProject()), 0);
    runner.cancel();
    EXPECT_FALSE(runner.isBusy());
    runner.request(std::make_shared<const Project>(smallProject()), 0);
    ASSERT_TRUE(answered.wait(longestWait));
    EXPECT_EQ(answered.count(), 1);
}

TEST(LiveContent, KeepsTheStartOfADragAsGhost) {
    Document document;
    ViewState viewState;
    LiveContent live(document, viewState);
    QSignalSpy changed(&live, &LiveContent::contentChanged);
    document.reset(smallProject(), QString(), QDir::currentPath());
    while (!live.content().assessment) {
        ASSERT_TRUE(changed.wait(longestWait));
    }
    const auto start = live.content().assessment;
    document.beginDrag(QStringLiteral("Move"));
    document.previewDrag(std::make_shared<const Project>(withLeadZero(smallProject(), 60.0)));
    while (live.content().assessment == start) {
        ASSERT_TRUE(changed.wait(longestWait));
    }
    EXPECT_EQ(live.content().ghost, start);
    document.commitDrag();
    EXPECT_EQ(live.content().ghost, nullptr);
}

TEST(LiveContent, KeepsIndicesInsideAProjectThatShrinks) {
    Document document;
    ViewState viewState;
    const LiveContent live(document, viewState);
    document.reset(smallProject(), QString(), QDir::currentPath());
    viewState.setShownCase(2);
    viewState.setHiddenCases({1, 2});
    viewState.setSelectedSection(4);
    Project smaller = smallProject();
    smaller.plant_cases.resize(1);
    smaller.compensator.resize(2);
    document.apply(smaller, QStringLiteral("shrink"));
    EXPECT_EQ(viewState.shownCase(), 0u);
    EXPECT_TRUE(viewState.hiddenCases().empty());
    EXPECT_FALSE(viewState.selectedSection());
}

} // namespace
} // namespace cornerwright
