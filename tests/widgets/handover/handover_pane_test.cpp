// The handover panel: fields change the project, the study follows, files and reports are written.
#include "core/engine/engine.h"
#include "tests/core/project/temporary_folder.h"
#include "widgets/handover/export_row.h"
#include "widgets/handover/handover_flow.h"
#include "widgets/handover/limited_step_view.h"
#include "widgets/handover/realisation_pane.h"
#include "widgets/handover/study_view.h"
#include "widgets/view_state.h"

#include <QCheckBox>
#include <QComboBox>
#include <QLabel>
#include <QSignalSpy>
#include <QTableWidget>
#include <QTest>
#include <gtest/gtest.h>

namespace cornerwright {
namespace {

constexpr int patience = 60000; // ms; a busy machine is slow

Requirement atLeast(Measure measure, double limit) {
    Requirement requirement;
    requirement.measure = measure;
    requirement.at_least = limit;
    return requirement;
}

Section section(SectionKind kind, double first, double second = 0.0) {
    Section result;
    result.kind = kind;
    const auto parameters = parameters_of(kind);
    result.*parameters[0].value = first;
    if (parameters.size() > 1) {
        result.*parameters[1].value = second;
    }
    return result;
}

Project servo() {
    Project project;
    project.title = "servo";
    project.plant_cases = {{"light", FormulaSource{"60/(s (s/30 + 1))"}},
                           {"heavy", FormulaSource{"40/(s (s/20 + 1))"}}};
    project.compensator = {section(SectionKind::gain, 0.9), section(SectionKind::pi, 2.0),
                           section(SectionKind::lead, 25.0, 300.0)};
    project.sampling = Sampling{0.001, 0.0, true};
    project.realisation = Realisation{};
    project.requirements = {atLeast(Measure::phase_margin, 45.0)};
    return project;
}

PaneContent contentOf(const Project& project) {
    PaneContent content;
    content.project = std::make_shared<const Project>(project);
    content.assessment = Engine().assess(project);
    return content;
}

class HandoverPane : public testing::Test {
  protected:
    HandoverPane() : pane_(viewState_) {
        pane_.resize(700, 1300);
        QObject::connect(&pane_, &Pane::edited,
                         [this](const std::shared_ptr<const Project>& project, const QString&) {
                             edited_ = project;
                         });
    }

    void show(const Project& project) {
        pane_.setContent(contentOf(project));
        pane_.show();
    }
    QTableWidget& table() { return *pane_.findChild<QTableWidget*>(); }
    bool studied() {
        return QTest::qWaitFor([this] { return table().isVisible() && table().rowCount() == 6; },
                               patience);
    }
    /// Every sentence that the panel shows.
    QString words() {
        QString words;
        for (const QLabel* label : pane_.findChildren<QLabel*>()) {
            words += label->isVisible() ? label->text() + QLatin1Char('\n') : QString();
        }
        return words;
    }
    QCheckBox& limits() {
        for (QCheckBox* box : pane_.findChildren<QCheckBox*>()) {
            if (box->text().startsWith(QStringLiteral("limit"))) {
                return *box;
            }
        }
        throw std::runtime_error("no box for the limits");
    }

    ViewState viewState_;
    RealisationPane pane_;
    std::shared_ptr<const Project> edited_;
};

TEST_F(HandoverPane, ShowsWhatEachMethodCosts) {
    const Project project = servo();
    show(project);
    ASSERT_TRUE(studied());
    ASSERT_EQ(table().columnCount(), 2);
    const RealisationStudy study = study_realisation(project, [] { return true; });
    for (int row = 0; row < table().rowCount(); ++row) {
        const MethodOutcome& outcome = study.methods[static_cast<std::size_t>(row)];
        if (outcome.worst.empty()) {
            EXPECT_TRUE(table().item(row, 0)->text().endsWith(QStringLiteral("cannot be")));
            continue;
        }
        EXPECT_TRUE(table().item(row, 1)->text().contains(
            headroomText(outcome.worst[0], project.requirements[0])));
    }
    for (const char* said : {"Words of 16 bits: at least", "Words of 32 bits: at least",
                             "They are kept best by", "Rounding noise", "limit cycle"}) {
        EXPECT_TRUE(words().contains(QString::fromLatin1(said))) << said;
    }
}

TEST_F(HandoverPane, TakesTheMethodOfARow) {
    show(servo());
    ASSERT_TRUE(studied());
    Q_EMIT table().cellActivated(3, 0);
    ASSERT_TRUE(edited_);
    EXPECT_EQ(edited_->realisation->method, Method::matched_roots);
}

TEST_F(HandoverPane, FollowsTheLastOfManyChanges) {
    Project project = servo();
    show(project);
    for (const double limit : {30.0, 35.0, 40.0, 50.0}) {
        project.requirements[0].at_least = limit;
        pane_.setContent(contentOf(project));
        QTest::qWait(20);
    }
    ASSERT_TRUE(QTest::qWaitFor(
        [this] {
            return table().columnCount() == 2 && table().horizontalHeaderItem(1) != nullptr &&
                   table().horizontalHeaderItem(1)->text().contains(QStringLiteral("50.0"));
        },
        patience));
}

TEST_F(HandoverPane, LimitsTheOutputAndShowsTheStep) {
    show(servo());
    limits().click();
    ASSERT_TRUE(edited_);
    ASSERT_TRUE(edited_->realisation->output_limits);
    Project limited = *edited_;
    limited.realisation->output_limits = OutputLimits{-0.5, 0.5};
    pane_.setContent(contentOf(limited));
    ASSERT_TRUE(QTest::qWaitFor([this] { return pane_.limitedStep().isVisible(); }, patience));
    EXPECT_TRUE(words().contains(QStringLiteral("Unit step with the limits")));
    limits().click();
    EXPECT_FALSE(edited_->realisation->output_limits);
    pane_.setContent(contentOf(*edited_));
    EXPECT_FALSE(pane_.limitedStep().isVisible());
}

TEST_F(HandoverPane, IsQuietWithoutARealisation) {
    Project project = servo();
    project.realisation.reset();
    show(project);
    QTest::qWait(500);
    EXPECT_FALSE(pane_.study().isVisible());
    EXPECT_FALSE(limits().isEnabled());
}

TEST_F(HandoverPane, WarnsThatRequirementsAreUnmetAndRefusesNothing) {
    Project project = servo();
    project.requirements[0].at_least = 89.0;
    show(project);
    EXPECT_TRUE(words().contains(QStringLiteral("unmet; every file will say so")));

    const TemporaryFolder folder;
    HandoverFlow flow(&pane_);
    flow.setContent(contentOf(project));
    QSignalSpy done(&flow, &HandoverFlow::done);
    QSignalSpy failed(&flow, &HandoverFlow::failed);
    const QString place = QString::fromStdString(folder.path().string());
    flow.exportTo(HandoverForm::c99, QStringLiteral("servo"), place);
    EXPECT_EQ(done.count(), 1);
    EXPECT_NE(TemporaryFolder::read(folder.path() / "servo.h").find("UNMET"), std::string::npos);

    flow.exportTo(HandoverForm::c99, QStringLiteral("two words"), place);
    EXPECT_EQ(failed.count(), 1);
}

TEST_F(HandoverPane, WritesTheReportAsHtmlAndAsPdf) {
    const TemporaryFolder folder;
    HandoverFlow flow(&pane_);
    flow.setContent(contentOf(servo()));
    QSignalSpy done(&flow, &HandoverFlow::done);
    const QString place = QString::fromStdString(folder.path().string());
    flow.reportTo(place + QStringLiteral("/r.html"));
    flow.reportTo(place + QStringLiteral("/r.pdf"));
    EXPECT_EQ(done.count(), 2);
    EXPECT_TRUE(TemporaryFolder::read(folder.path() / "r.html").starts_with("<!DOCTYPE html>"));
    const std::string pdf = TemporaryFolder::read(folder.path() / "r.pdf");
    EXPECT_TRUE(pdf.starts_with("%PDF-"));
    EXPECT_EQ(pdf.find("CreationDate"), std::string::npos);
    EXPECT_NE(pdf.find("%%EOF"), std::string::npos);
}

} // namespace
} // namespace cornerwright
