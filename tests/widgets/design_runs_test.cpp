// Tolerance, room and fleet in the window, and the workers behind them.

#include "core/engine/placement_problem.h"
#include "core/measurement/write_response.h"
#include "core/placement/tolerance.h"
#include "shell_samples.h"
#include "widgets/design/background_run.h"
#include "widgets/design/latest_worker.h"
#include "widgets/design/room_pane.h"
#include "widgets/design/run_row.h"
#include "widgets/design/tolerance_form.h"
#include "widgets/design/tolerance_pane.h"
#include "widgets/fleet/fleet_figures.h"
#include "widgets/fleet/fleet_pane.h"
#include "widgets/parts/histogram_view.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/window/main_window.h"
#include "widgets/window/window_actions.h"
#include "widgets/window/work_area.h"

#include <QComboBox>
#include <QFile>
#include <QListWidget>
#include <QSignalSpy>
#include <QTableWidget>
#include <QTemporaryDir>
#include <QTest>
#include <gtest/gtest.h>

#include <atomic>
#include <cmath>
#include <numeric>

namespace cornerwright {
namespace {

constexpr int longestWait = 60000; // ms

class DesignRunsTest : public testing::Test {
  protected:
    DesignRunsTest() {
        window.document().reset(smallProject(), QString(), folder.path());
        window.show();
        EXPECT_TRUE(QTest::qWaitFor([this] { return !window.live().runner().isBusy(); }));
    }

    template <typename PaneType>
    PaneType& pane(const char* key) {
        window.area().reveal(QString::fromLatin1(key), WorkArea::lower_right);
        return *qobject_cast<PaneType*>(window.area().pane(QString::fromLatin1(key)));
    }

    static bool finish(RunRow& row) {
        return QTest::qWaitFor([&row] { return !row.run().isRunning(); }, longestWait);
    }

    QTemporaryDir folder;
    MainWindow window{{folder.filePath(QStringLiteral("window.ini")),
                       folder.filePath(QStringLiteral("recovery"))}};
};

TEST_F(DesignRunsTest, ToleranceTellsTheYieldOfTheCoreAndKeepsTheWorstAsACase) {
    auto& tolerancePane = pane<TolerancePane>("tolerance");
    ToleranceOptions options;
    options.spreads.plant_gain_percent = 15.0;
    options.samples = 40;
    options.seed = 7;
    tolerancePane.form().setOptions(options);
    tolerancePane.row().startButton()->click();
    ASSERT_TRUE(finish(tolerancePane.row()));
    const ToleranceResult expected =
        tolerance(placement_problem_of(window.document().project()), options);
    EXPECT_TRUE(tolerancePane.yieldText().contains(
        QStringLiteral("%1 of 40 samples met").arg(expected.met)))
        << tolerancePane.yieldText().toStdString();
    const std::vector<int>& counts = tolerancePane.histogram().histogram().counts;
    EXPECT_EQ(std::accumulate(counts.begin(), counts.end(), 0), 40);

    const std::size_t cases = window.document().project().plant_cases.size();
    tolerancePane.keepButton()->click();
    ASSERT_EQ(window.document().project().plant_cases.size(), cases + 1);
    Project kept = window.document().project();
    kept.plant_cases = {kept.plant_cases.back()};
    EXPECT_NEAR(evaluate(placement_problem_of(kept), kept.compensator).merit, expected.worst->merit,
                1e-6 * std::abs(expected.worst->merit));
    window.actions().undo->trigger();
    EXPECT_EQ(window.document().project(), smallProject());
}

TEST_F(DesignRunsTest, ARunCanBeCancelledAndKeepsWhatItHas) {
    auto& tolerancePane = pane<TolerancePane>("tolerance");
    ToleranceOptions options;
    options.spreads.plant_gain_percent = 15.0;
    options.samples = 1000000;
    tolerancePane.form().setOptions(options);
    QSignalSpy progress(&tolerancePane.row().run(), &BackgroundRun::progressed);
    tolerancePane.start();
    ASSERT_TRUE(progress.wait(longestWait));
    tolerancePane.row().cancelButton()->click();
    ASSERT_TRUE(finish(tolerancePane.row()));
    EXPECT_TRUE(tolerancePane.row().note().contains(QStringLiteral("stopped")));
}

TEST_F(DesignRunsTest, ASpreadThatMakesNoSenseIsSaidInPlace) {
    auto& tolerancePane = pane<TolerancePane>("tolerance");
    QuantityField* gain = tolerancePane.form().fields().front();
    gain->setFocus();
    gain->selectAll();
    QTest::keyClicks(gain, QStringLiteral("120"));
    QTest::keyClick(gain, Qt::Key_Return);
    EXPECT_TRUE(tolerancePane.row().note().startsWith(QStringLiteral("✗")));
    ToleranceOptions none;
    tolerancePane.form().setOptions(none);
    tolerancePane.start();
    ASSERT_TRUE(finish(tolerancePane.row()));
    EXPECT_TRUE(tolerancePane.row().note().contains(QStringLiteral("spread")));
}

TEST_F(DesignRunsTest, RoomListsEveryValueAndEveryCoefficient) {
    auto& roomPane = pane<RoomPane>("room");
    roomPane.start();
    ASSERT_TRUE(finish(roomPane.row()));
    const Sensitivity expected = sensitivity(placement_problem_of(window.document().project()));
    EXPECT_EQ(roomPane.table()->rowCount(),
              static_cast<int>(expected.values.size() + expected.coefficients.size()));
    EXPECT_EQ(roomPane.row().note(), QString());
    window.document().apply(withLeadZero(window.document().project(), 26.0), QStringLiteral("x"));
    EXPECT_TRUE(QTest::qWaitFor([this] { return !window.live().runner().isBusy(); }));
    EXPECT_TRUE(roomPane.row().note().contains(QStringLiteral("earlier")));
}

class FleetPaneTest : public DesignRunsTest {
  protected:
    FleetPaneTest() {
        const auto plants = placement_problem_of(smallProject()).plants;
        const auto& model = std::get<PlantModel>(plants.front().plant);
        for (int unit = 0; unit < units; ++unit) {
            MeasuredResponse response;
            for (int i = 0; i < 200; ++i) {
                const double w = 0.5 * std::pow(1e4, i / 199.0);
                response.w_rad_s.push_back(w);
                response.response.push_back((0.6 + 0.1 * unit) *
                                            evaluate(model.roots, Complex(0.0, w)) *
                                            std::polar(1.0, -w * model.dead_time_s));
            }
            write_response(response, path(QStringLiteral("unit-%1.csv").arg(unit)).toStdString());
        }
        QFile broken(path(QStringLiteral("unit-broken.csv")));
        EXPECT_TRUE(broken.open(QIODevice::WriteOnly));
        broken.write("Frequency (Hz),Magnitude (dB),Phase (deg)\n1.0,2.0\n");
    }

    QString path(const QString& name) const { return fleet.filePath(name); }

    static constexpr int units = 8;
    QTemporaryDir fleet;
};

TEST_F(FleetPaneTest, JudgesTheFolderAndListsWorstAndBrokenUnits) {
    auto& fleetPane = pane<FleetPane>("fleet");
    fleetPane.setFolder(fleet.path());
    fleetPane.row().startButton()->click();
    ASSERT_TRUE(finish(fleetPane.row()));
    ASSERT_EQ(fleetPane.unreadableList()->count(), 1);
    EXPECT_TRUE(fleetPane.unreadableList()->item(0)->text().contains(QStringLiteral("expected")));
    EXPECT_EQ(fleetPane.worstTable()->rowCount(), units);
    const std::vector<int>& counts = fleetPane.histogram().histogram().counts;
    EXPECT_EQ(std::accumulate(counts.begin(), counts.end(), 0), units);
    EXPECT_GT(fleetPane.figureChoice()->count(), 8); // on both loops
    fleetPane.figureChoice()->setCurrentIndex(1);
    EXPECT_FALSE(fleetPane.histogram().accessibleDescription().isEmpty());

    QSignalSpy asked(&fleetPane, &FleetPane::unitAsked);
    fleetPane.worstTable()->selectRow(0);
    fleetPane.takeSelected();
    ASSERT_EQ(asked.size(), 1);
    EXPECT_EQ(asked[0][0].toString(), path(fleetPane.worstTable()->item(0, 0)->text()));
}

TEST_F(FleetPaneTest, AnEmptyFolderIsSaidInPlace) {
    auto& fleetPane = pane<FleetPane>("fleet");
    QTemporaryDir empty;
    fleetPane.setFolder(empty.path());
    fleetPane.start();
    ASSERT_TRUE(finish(fleetPane.row()));
    EXPECT_TRUE(fleetPane.row().note().contains(QStringLiteral("measurement files")));
}

TEST(Histogram, CountsEveryFiniteValueOnce) {
    std::vector<double> values;
    for (int i = 0; i < 333; ++i) {
        values.push_back(std::sin(i * i) * 7.0 + 3.0);
    }
    values.push_back(HUGE_VAL);
    const Histogram histogram = histogramOf(values);
    EXPECT_EQ(std::accumulate(histogram.counts.begin(), histogram.counts.end(), 0), 333);
    EXPECT_EQ(histogram.counts.size(), 18U); // the root of 333
    const std::vector<double> equal(5, 2.0);
    EXPECT_EQ(histogramOf(equal).counts, std::vector<int>{5});
    EXPECT_LT(histogramOf(equal).low, 2.0);
    EXPECT_TRUE(histogramOf({}).counts.empty());
}

TEST(Histogram, KeysWalkTheBarsAndTellThem) {
    HistogramView view;
    const std::vector<double> values{0.0, 1.0, 2.0, 3.0, 4.0, 5.0, 6.0};
    view.setValues(values, 3.5, [](double value) { return QString::number(value); });
    QTest::keyClick(&view, Qt::Key_Right);
    EXPECT_EQ(view.told(), QStringLiteral("1 from 0 to 1"));
    QTest::keyClick(&view, Qt::Key_Right);
    EXPECT_EQ(view.told(), QStringLiteral("1 from 1 to 2"));
    QTest::keyClick(&view, Qt::Key_Left);
    QTest::keyClick(&view, Qt::Key_Left);
    EXPECT_EQ(view.told(), QStringLiteral("1 from 0 to 1"));
}

TEST(LatestWorker, DeliversOnlyTheLatest) {
    LatestWorker worker;
    std::atomic<bool> mayGo = false;
    std::vector<int> delivered;
    for (int i = 0; i < 5; ++i) {
        worker.request([&, i]() -> std::function<void()> {
            while (!mayGo) {
                std::this_thread::yield();
            }
            return [&delivered, i] { delivered.push_back(i); };
        });
    }
    mayGo = true;
    EXPECT_TRUE(QTest::qWaitFor([&worker] { return !worker.isBusy(); }, longestWait));
    EXPECT_EQ(delivered, std::vector<int>{4});
    worker.request([&delivered]() -> std::function<void()> {
        return [&delivered] { delivered.push_back(9); };
    });
    worker.cancel();
    QTest::qWait(50);
    EXPECT_EQ(delivered.size(), 1U);
}

TEST(BackgroundRun, AFailureIsToldAsASentence) {
    BackgroundRun run;
    QSignalSpy failed(&run, &BackgroundRun::failed);
    run.start([](const BackgroundRun::Proceed&) -> std::function<void()> {
        throw std::runtime_error("no luck");
    });
    EXPECT_TRUE(QTest::qWaitFor([&run] { return !run.isRunning(); }, longestWait));
    ASSERT_EQ(failed.size(), 1);
    EXPECT_EQ(failed[0][0].toString(), QStringLiteral("no luck"));
}

} // namespace
} // namespace cornerwright
