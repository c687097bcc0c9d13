#include "core/engine/engine.h"
#include "shell_samples.h"
#include "widgets/ledger/ledger_model.h"
#include "widgets/ledger/ledger_order.h"
#include "widgets/ledger/ledger_text.h"

#include <QAbstractItemModelTester>
#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

RequirementResult resultOf(Measure measure, double limit, double value, State state) {
    RequirementResult result;
    result.requirement.measure = measure;
    result.requirement.at_least = limit;
    result.worst.case_name = "unit 7";
    result.worst.value = Figure::of(value);
    result.worst.share = Figure::of((value - limit) / 10.0);
    result.worst.state = state;
    return result;
}

TEST(LedgerOrder, PutsTheMostPressingFirst) {
    Verdict verdict;
    verdict.requirements = {resultOf(Measure::phase_margin, 45, 60, State::met),
                            resultOf(Measure::phase_margin, 45, 44, State::unmet),
                            resultOf(Measure::phase_margin, 45, 46, State::met),
                            resultOf(Measure::phase_margin, 45, 30, State::unmet)};
    RequirementResult unknown = resultOf(Measure::overshoot, 1, 1, State::undetermined);
    unknown.worst.share = Figure::undetermined("no fit");
    verdict.requirements.insert(verdict.requirements.begin(), unknown);
    EXPECT_EQ(ledgerOrder(verdict), (std::vector<std::size_t>{4, 2, 3, 1, 0}));
}

TEST(LedgerOrder, BarsRiseWithTheShareAndStayInTheirCell) {
    double before = -1.0;
    for (double share = -50.0; share <= 50.0; share += 0.25) {
        const double place = barPosition(share);
        EXPECT_GT(place, before);
        EXPECT_LT(std::abs(place), 1.0);
        before = place;
    }
    EXPECT_EQ(barPosition(0.0), 0.0);
    EXPECT_EQ(barPosition(HUGE_VAL), 1.0);
    EXPECT_EQ(barPosition(-HUGE_VAL), -1.0);
}

TEST(LedgerText, SaysHowFarInWordsAndUnit) {
    EXPECT_EQ(distanceText(resultOf(Measure::phase_margin, 45, 41.9, State::unmet), true),
              QStringLiteral("3.1° short"));
    EXPECT_EQ(distanceText(resultOf(Measure::gain_margin, 8, 9.9, State::met), true),
              QStringLiteral("1.9 dB"));
    // Margins are judged by size: -50 deg stands 5 deg above 45.
    EXPECT_EQ(distanceText(resultOf(Measure::phase_margin, 45, -50, State::met), true),
              QStringLiteral("5.0°"));
    RequirementResult peak = resultOf(Measure::sensitivity_peak, 0, 7.0, State::unmet);
    peak.requirement.at_least.reset();
    peak.requirement.at_most = 6.0;
    EXPECT_EQ(distanceText(peak, true), QStringLiteral("1.0 dB over"));
}

TEST(LedgerText, TheVerdictNamesCountWorstCaseAndDistance) {
    Verdict verdict;
    verdict.requirements = {resultOf(Measure::gain_margin, 8, 9.9, State::met),
                            resultOf(Measure::phase_margin, 45, 41.9, State::unmet)};
    EXPECT_EQ(verdictText(verdict, true),
              QStringLiteral("1 of 2 unmet · worst: unit 7, phase margin, 3.1° short"));
}

class LedgerModelTest : public testing::Test {
  protected:
    static std::shared_ptr<const Assessment> assessed(double leadZero) {
        return Engine().assess(withLeadZero(smallProject(), leadZero));
    }

    LedgerModel model;
    QAbstractItemModelTester tester{&model, QAbstractItemModelTester::FailureReportingMode::Fatal};
};

TEST_F(LedgerModelTest, ShowsWhatTheAssessmentSays) {
    const auto assessment = assessed(25.0);
    model.setAssessment(assessment, nullptr);
    ASSERT_EQ(model.rowCount(), static_cast<int>(assessment->verdict.requirements.size()));
    for (int row = 0; row < model.rowCount(); ++row) {
        const std::size_t requirement = model.requirementOf(row);
        EXPECT_EQ(&model.result(row), &assessment->verdict.requirements[requirement]);
        EXPECT_EQ(model.rowOf(requirement), row);
        EXPECT_FALSE(model.index(row, LedgerModel::mark).data().toString().isEmpty());
        EXPECT_FALSE(model.index(row, LedgerModel::state).data().toString().isEmpty());
    }
}

TEST_F(LedgerModelTest, RowsKeepTheirPlacesDuringADragAndSortAfterIt) {
    const auto start = assessed(25.0);
    model.setAssessment(start, nullptr);
    std::vector<std::size_t> before;
    for (int row = 0; row < model.rowCount(); ++row) {
        before.push_back(model.requirementOf(row));
    }
    const auto moved = assessed(120.0);
    const auto sorted = ledgerOrder(moved->verdict);
    ASSERT_NE(sorted, before) << "the edit must change the order for this test to tell anything";
    model.setAssessment(moved, start);
    for (int row = 0; row < model.rowCount(); ++row) {
        EXPECT_EQ(model.requirementOf(row), before[static_cast<std::size_t>(row)]);
        EXPECT_TRUE(
            model.index(row, LedgerModel::headroom).data(LedgerModel::startShareRole).isValid());
    }
    const QPersistentModelIndex watched(model.index(0, LedgerModel::measure));
    const std::size_t requirement = model.requirementOf(0);
    model.setAssessment(moved, nullptr);
    EXPECT_EQ(model.requirementOf(0), sorted[0]);
    EXPECT_EQ(model.requirementOf(watched.row()), requirement);
}

TEST_F(LedgerModelTest, EmptiesAndFillsAgain) {
    model.setAssessment(assessed(25.0), nullptr);
    model.setAssessment(nullptr, nullptr);
    EXPECT_EQ(model.rowCount(), 0);
    model.setAssessment(assessed(25.0), nullptr);
    EXPECT_GT(model.rowCount(), 0);
}

} // namespace
} // namespace cornerwright
