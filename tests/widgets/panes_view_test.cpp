// Looking at the panes: zoom, pan, reset, the linked cursor, which cases are drawn, the place a
// ledger row leads to, and what leaves the window.

#include "core/project/load_measurement.h"
#include "gesture_hand.h"
#include "widgets/ledger/ledger_model.h"
#include "widgets/ledger/ledger_panel.h"
#include "widgets/panes/case_choice.h"
#include "widgets/panes/followed_place.h"
#include "widgets/panes/quality_pane.h"

#include <QFile>
#include <QFileInfo>
#include <QImage>
#include <QTest>

#include <cmath>

namespace cornerwright {
namespace {

const char* const all_panes[] = {"magnitude", "phase",   "root-locus",  "step",
                                 "nyquist",   "nichols", "sensitivity", "quality"};

class Views : public GestureTest {};

TEST_F(Views, TheWheelZoomsAboutTheMouseAndHomeGoesBack) {
    PlotPane& magnitude = pane(QStringLiteral("magnitude"));
    const PlotRanges fitted = magnitude.ranges();
    const QPointF at = magnitude.plotArea().center();
    wheel(magnitude, at, 3);
    EXPECT_GT(magnitude.ranges().x.low, fitted.x.low);
    EXPECT_LT(magnitude.ranges().x.high, fitted.x.high);
    EXPECT_EQ(magnitude.ranges().y, fitted.y);
    const double middle = std::sqrt(fitted.x.low * fitted.x.high);
    EXPECT_NEAR(std::sqrt(magnitude.ranges().x.low * magnitude.ranges().x.high), middle,
                0.01 * middle);
    // The frequency window is shared.
    EXPECT_EQ(pane(QStringLiteral("phase")).ranges().x, magnitude.ranges().x);
    wheel(magnitude, at, 2, Qt::ShiftModifier);
    EXPECT_LT(magnitude.ranges().y.high - magnitude.ranges().y.low, fitted.y.high - fitted.y.low);
    QTest::keyClick(&magnitude, Qt::Key_Home);
    settle();
    EXPECT_EQ(magnitude.ranges(), fitted);
    EXPECT_EQ(pane(QStringLiteral("phase")).ranges().x, fitted.x);
}

TEST_F(Views, ABoxWithControlZoomsAndFreeGroundPans) {
    PlotPane& magnitude = pane(QStringLiteral("magnitude"));
    const QRectF area = magnitude.plotArea();
    const PlotRanges fitted = magnitude.ranges();
    drag(magnitude, area.topLeft() + QPointF(200.0, 40.0), {160.0, 90.0}, Qt::ControlModifier);
    const PlotRanges boxed = magnitude.ranges();
    const double decades = std::log10(fitted.x.high / fitted.x.low);
    EXPECT_NEAR(std::log10(boxed.x.high / boxed.x.low), decades * 160.0 / area.width(), 1e-3);
    drag(magnitude, area.topLeft() + QPointF(10.0, 10.0), {25.0, 0.0});
    EXPECT_LT(magnitude.ranges().x.low, boxed.x.low);
    EXPECT_NEAR(magnitude.ranges().x.high / magnitude.ranges().x.low, boxed.x.high / boxed.x.low,
                1e-6 * boxed.x.high / boxed.x.low);
    EXPECT_EQ(project(), original()) << "looking is no edit";
}

TEST_F(Views, ABoxOnAPlaneKeepsCirclesRound) {
    PlotPane& nyquist = pane(QStringLiteral("nyquist"));
    const auto unitsPerPixel = [&] {
        const PlotRanges ranges = nyquist.ranges();
        return std::pair((ranges.x.high - ranges.x.low) / nyquist.plotArea().width(),
                         (ranges.y.high - ranges.y.low) / nyquist.plotArea().height());
    };
    EXPECT_NEAR(unitsPerPixel().first, unitsPerPixel().second, 1e-9);
    drag(nyquist, nyquist.plotArea().topLeft() + QPointF(20.0, 20.0), {120.0, 30.0},
         Qt::ControlModifier);
    EXPECT_NEAR(unitsPerPixel().first, unitsPerPixel().second, 1e-9);
    window.resize(1300, 800);
    settle();
    settle();
    EXPECT_NEAR(unitsPerPixel().first, unitsPerPixel().second, 1e-9);
}

TEST_F(Views, AxesStandStillWhileADragRuns) {
    for (const char* key : all_panes)
        pane(QString::fromLatin1(key));
    window.area().show(QStringLiteral("nyquist"), WorkArea::lower_centre);
    settle();
    PlotPane& magnitude = pane(QStringLiteral("magnitude"));
    const char* const looked_at[] = {"magnitude", "nyquist", "root-locus", "step"};
    std::vector<PlotRanges> before;
    for (const char* key : looked_at)
        before.push_back(pane(QString::fromLatin1(key)).ranges());
    const QPointF at = magnitude.pixelAtFrequency(20.0).value_or(QPointF());
    press(magnitude, at);
    for (const double up : {40.0, 90.0, 140.0}) {
        move(magnitude, at - QPointF(0.0, up));
        settle();
        for (std::size_t i = 0; i < before.size(); ++i)
            EXPECT_EQ(pane(QString::fromLatin1(looked_at[i])).ranges(), before[i]) << looked_at[i];
    }
    QTest::keyClick(&magnitude, Qt::Key_Escape);
}

TEST_F(Views, TheCursorIsLinkedThroughAllPanes) {
    PlotPane& magnitude = pane(QStringLiteral("magnitude"));
    const QRectF area = magnitude.plotArea();
    move(magnitude, area.center() + QPointF(0.0, 60.0));
    ASSERT_TRUE(window.viewState().cursorRadS().has_value());
    const double w = *window.viewState().cursorRadS();
    EXPECT_NEAR(w, std::sqrt(magnitude.ranges().x.low * magnitude.ranges().x.high), 0.02 * w);
    // Every pane draws it: its picture on the screen differs from the one without.
    for (const char* key : all_panes) {
        PlotPane& other = pane(QString::fromLatin1(key));
        if (other.title() == QStringLiteral("Step response"))
            continue; // its axis is time
        window.viewState().setCursorRadS(std::nullopt);
        settle();
        const QImage without = other.plotWidget()->grab().toImage();
        window.viewState().setCursorRadS(60.0);
        settle();
        EXPECT_NE(other.plotWidget()->grab().toImage(), without) << key;
    }
    PlotPane& nyquist = pane(QStringLiteral("nyquist"));
    move(nyquist, nyquist.pixelAtFrequency(60.0).value_or(QPointF()) + QPointF(3.0, 0.0));
    ASSERT_TRUE(window.viewState().cursorRadS().has_value());
    EXPECT_NEAR(*window.viewState().cursorRadS(), 60.0, 8.0);
}

TEST_F(Views, OneSomeOrAllCasesAreShown) {
    PlotPane& magnitude = pane(QStringLiteral("magnitude"));
    const QImage all = magnitude.plotWidget()->grab().toImage();
    const auto run = [&](const QString& text) {
        for (QAction* action : magnitude.actions())
            if (action->text() == text)
                action->trigger();
        settle();
    };
    run(QStringLiteral("Hide the other cases"));
    EXPECT_EQ(window.viewState().hiddenCases(), (std::set<std::size_t>{1, 2}));
    const QImage one = magnitude.plotWidget()->grab().toImage();
    EXPECT_NE(one, all);
    run(QStringLiteral("Show every case"));
    EXPECT_TRUE(window.viewState().hiddenCases().empty());
    EXPECT_EQ(magnitude.plotWidget()->grab().toImage(), all);
}

TEST_F(Views, TheWorstCaseOfEachRequirementStandsForIt) {
    const Assessment& assessment = *window.live().content().assessment;
    for (const RequirementResult& result : assessment.verdict.requirements) {
        const auto worst = worstCases(assessment, {result.requirement.measure});
        ASSERT_EQ(worst.size(), 1u);
        EXPECT_EQ(assessment.cases[*worst.begin()].name, result.worst.case_name);
    }
}

TEST_F(Views, ARowOfTheLedgerLeadsToCaseLoopAndPlace) {
    LedgerModel& model = *window.ledger().model();
    for (int row = 0; row < model.rowCount(); ++row) {
        window.ledger().goToWorst(row);
        settle();
        const Judgement& worst = model.result(row).worst;
        const auto& followed = window.viewState().followed();
        ASSERT_TRUE(followed.has_value());
        EXPECT_EQ(followed->loop, worst.loop);
        EXPECT_EQ(followed->requirement, model.requirementOf(row));
        const Judgement* shown =
            followedJudgement(window.viewState(), *window.live().content().assessment);
        ASSERT_NE(shown, nullptr);
        EXPECT_EQ(*shown, worst);
    }
    window.viewState().setShownCase((window.viewState().shownCase() + 1) % 3);
    settle();
    EXPECT_EQ(followedJudgement(window.viewState(), *window.live().content().assessment), nullptr)
        << "another case is shown";
}

TEST_F(Views, EveryPaneLeavesAsPictureAndAsData) {
    for (const char* key : all_panes) {
        PlotPane& shown = pane(QString::fromLatin1(key));
        for (const char* suffix : {"png", "pdf", "svg"}) {
            const QString file = folder.filePath(
                QStringLiteral("%1.%2").arg(QLatin1String(key), QLatin1String(suffix)));
            EXPECT_TRUE(shown.savePicture(file)) << file.toStdString();
            EXPECT_GT(QFileInfo(file).size(), 1000) << file.toStdString();
        }
        const QString text = shown.csv();
        const qsizetype lines = text.count(QLatin1Char('\n'));
        const qsizetype columns =
            text.left(text.indexOf(QLatin1Char('\n'))).count(QLatin1Char(','));
        EXPECT_GT(columns, 2) << key;
        const bool isOfMeasurements = qobject_cast<QualityPane*>(&shown) != nullptr;
        EXPECT_GT(lines, isOfMeasurements ? 0 : 100) << key;
        for (const QString& line : text.split(QLatin1Char('\n'), Qt::SkipEmptyParts))
            ASSERT_EQ(line.count(QLatin1Char(',')), columns) << key;
    }
}

TEST_F(Views, TheQualityPaneTellsWhatTheFileSays) {
    QFile file(folder.filePath(QStringLiteral("unit 7.csv")));
    ASSERT_TRUE(file.open(QIODevice::WriteOnly));
    file.write("frequency (Hz),magnitude (dB),phase (deg),coherence\n"
               "1,20,-95,0.99\n2,14,-100,0.98\nnan,7,-105,0.9\n5,5,-110,0.95\n10,-2,-125,0.7\n");
    file.close();
    auto* quality = qobject_cast<QualityPane*>(&pane(QStringLiteral("quality")));
    ASSERT_NE(quality, nullptr);
    EXPECT_TRUE(quality->words().contains(QStringLiteral("model")));
    ReadResult read = read_measurement(file.fileName().toStdString());
    MeasurementSource source;
    source.file = "unit 7.csv";
    source.reading = std::make_shared<const ReadingRecord>(record_of(read));
    source.response = std::make_shared<const MeasuredResponse>(std::move(read.response));
    Project measured = original();
    measured.plant_cases.push_back({"unit 7", source});
    window.document().apply(measured, QStringLiteral("take unit 7 in"));
    window.viewState().setShownCase(3);
    settle();
    EXPECT_TRUE(quality->words().contains(QStringLiteral("4 rows gave points, 1 skipped")))
        << quality->words().toStdString();
    EXPECT_TRUE(quality->words().contains(QStringLiteral("how many averages")));
    const QImage coherence = quality->plotWidget()->grab().toImage();
    quality->showQuality(QualityPane::Quality::random_error);
    settle();
    EXPECT_NE(quality->plotWidget()->grab().toImage(), coherence);
    EXPECT_TRUE(quality->csv().contains(QStringLiteral("0.95")));
}

} // namespace
} // namespace cornerwright
