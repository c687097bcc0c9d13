// Measurement files dropped on the window, corrected in the import panel, taken in, and fitted.

#include "core/engine/loop_without_plant.h"
#include "core/measurement/random_error.h"
#include "shell_samples.h"
#include "widgets/figure_text.h"
#include "widgets/fitting/fit_panel.h"
#include "widgets/import/column_table.h"
#include "widgets/import/import_form.h"
#include "widgets/import/import_panel.h"
#include "widgets/import/response_preview.h"
#include "widgets/window/file_flow.h"
#include "widgets/window/main_window.h"
#include "widgets/window/measurement_flow.h"
#include "widgets/window/window_actions.h"

#include <QCheckBox>
#include <QComboBox>
#include <QFile>
#include <QLineEdit>
#include <QPushButton>
#include <QSignalSpy>
#include <QSpinBox>
#include <QTemporaryDir>
#include <QTest>
#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr int longestWait = 20000; // ms

/// 60/(s (0.02 s + 1)), a drive.
Complex driveAt(double w) {
    const Complex s{0.0, w};
    return 60.0 / (s * (0.02 * s + 1.0));
}

/// 80 lines from 0.2 to 200 Hz made by `row` from frequency in Hz and response.
template <class Row>
QByteArray table(const QByteArray& heading, Row row) {
    QByteArray text = heading + '\n';
    for (int i = 0; i < 80; ++i) {
        const double hertz = 0.2 * std::pow(1000.0, i / 79.0);
        text += row(hertz, driveAt(2.0 * std::numbers::pi * hertz)) + '\n';
    }
    return text;
}

QByteArray number(double value) {
    return QByteArray::number(value, 'g', 12);
}
QByteArray decibels(Complex value) {
    return number(20.0 * std::log10(std::abs(value)));
}
QByteArray degrees(Complex value) {
    return number(std::arg(value) * 180.0 / std::numbers::pi);
}

QByteArray plainTable() {
    return table("Frequency (Hz),Magnitude (dB),Phase (deg)", [](double hertz, Complex value) {
        return number(hertz) + ',' + decibels(value) + ',' + degrees(value);
    });
}

double worstError(const MeasuredResponse& measured) {
    double worst = measured.w_rad_s.empty() ? HUGE_VAL : 0.0;
    for (std::size_t i = 0; i < measured.w_rad_s.size(); ++i) {
        const Complex expected = driveAt(measured.w_rad_s[i]);
        worst = std::max(worst, std::abs(measured.response[i] - expected) / std::abs(expected));
    }
    return worst;
}

class ImportTest : public testing::Test {
  protected:
    ImportTest() {
        window.document().reset(smallProject(), QString(), folder.path());
        window.document().save(folder.filePath(QStringLiteral("axis.cornerwright.json")));
        window.show();
        settle();
    }

    QString write(const QString& name, const QByteArray& text) {
        QFile file(folder.filePath(name));
        EXPECT_TRUE(file.open(QIODevice::WriteOnly));
        file.write(text);
        return file.fileName();
    }

    void settle() {
        QSignalSpy changed(&window.live(), &LiveContent::contentChanged);
        while (window.live().runner().isBusy()) {
            ASSERT_TRUE(changed.wait(longestWait));
        }
        QCoreApplication::processEvents();
    }

    void waitForPanel() {
        ASSERT_TRUE(QTest::qWaitFor([&] { return !panel().isBusy(); }, longestWait));
    }

    static void choose(QComboBox* box, const QString& data) {
        ASSERT_NE(box, nullptr);
        const int index = box->findData(data);
        ASSERT_GE(index, 0) << data.toStdString();
        box->setCurrentIndex(index);
        Q_EMIT box->activated(index);
    }

    /// Keys into a field of the form, by its name.
    void type(const QString& name, const QString& keys) {
        for (QLineEdit* field : panel().form().findChildren<QLineEdit*>()) {
            if (field->accessibleName() == name) {
                field->setFocus();
                QTest::keyClicks(field, keys);
                return;
            }
        }
        FAIL() << "no field " << name.toStdString();
    }

    QComboBox* formBox(const QString& name) {
        for (QComboBox* box : panel().form().findChildren<QComboBox*>()) {
            if (box->accessibleName() == name) {
                return box;
            }
        }
        return nullptr;
    }

    ImportPanel& panel() { return window.measurements().importPanel(); }
    FitPanel& fitPanel() { return window.measurements().fitPanel(); }
    const std::vector<PlantCase>& cases() { return window.document().project().plant_cases; }
    const MeasurementSource& sourceOf(std::size_t index) {
        return std::get<MeasurementSource>(cases().at(index).source);
    }

    QTemporaryDir folder;
    MainWindow window{{folder.filePath(QStringLiteral("window.ini")),
                       folder.filePath(QStringLiteral("recovery"))}};
};

TEST_F(ImportTest, FourDroppedFilesOfFourKindsBecomeFourCasesInOneStep) {
    const Project before = window.document().project();
    const QStringList files{
        write(QStringLiteral("unit 1.csv"), plainTable()),
        write(QStringLiteral("unit 2.csv"), table("Frequenz (Hz);Betrag (dB);Phase (°)",
                                                  [](double hertz, Complex value) {
                                                      return QByteArray(number(hertz) + ';' +
                                                                        decibels(value) + ';' +
                                                                        degrees(value))
                                                          .replace('.', ',');
                                                  })),
        write(QStringLiteral("unit 3.csv"),
              table("w (rad/s)\tRe\tIm",
                    [](double hertz, Complex value) {
                        return number(2.0 * std::numbers::pi * hertz) + '\t' +
                               number(value.real()) + '\t' + number(value.imag());
                    })),
        write(QStringLiteral("unit 4.csv"), table("f (kHz),|P| (V/V),Phase (rad)",
                                                  [](double hertz, Complex value) {
                                                      return number(hertz / 1000.0) + ',' +
                                                             number(std::abs(value)) + ',' +
                                                             number(std::arg(value));
                                                  })),
    };
    window.files().take(files);
    EXPECT_TRUE(panel().isVisible());
    waitForPanel();
    EXPECT_EQ(window.document().project(), before) << "nothing enters before it is taken in";
    panel().takeButton()->click();
    EXPECT_FALSE(panel().isVisible());
    ASSERT_EQ(cases().size(), before.plant_cases.size() + 4);
    for (std::size_t i = 0; i < 4; ++i) {
        const MeasurementSource& source = sourceOf(before.plant_cases.size() + i);
        EXPECT_EQ(source.response->w_rad_s.size(), 80u) << i;
        EXPECT_LT(worstError(*source.response), 1e-9) << i;
        EXPECT_EQ(source.sha256.size(), 64u);
        EXPECT_EQ(source.file, "unit " + std::to_string(i + 1) + ".csv");
    }
    window.actions().undo->trigger();
    EXPECT_EQ(window.document().project(), before);
}

TEST_F(ImportTest, AWrongUnitIsCorrectedAndTheCorrectionSurvivesAReopening) {
    // The phase is in radians, but its heading says degrees.
    const QString file =
        write(QStringLiteral("slip.csv"),
              table("Frequency (Hz),Magnitude (dB),Phase (deg)", [](double hertz, Complex value) {
                  return number(hertz) + ',' + decibels(value) + ',' + number(std::arg(value));
              }));
    window.files().take({file});
    waitForPanel();
    ASSERT_NE(panel().entries().front().look->plant, nullptr);
    EXPECT_GT(worstError(*panel().entries().front().look->plant), 0.5);
    choose(panel().table().unitBox(3), QStringLiteral("rad"));
    waitForPanel();
    EXPECT_LT(worstError(*panel().entries().front().look->plant), 1e-9);
    ASSERT_EQ(panel().preview().curves().size(), 1u);
    EXPECT_NEAR(panel().preview().curves().front().degrees.front(),
                std::arg(driveAt(0.4 * std::numbers::pi)) * 180.0 / std::numbers::pi, 1e-6);
    const std::size_t count = cases().size();
    panel().takeIn();
    ASSERT_EQ(cases().size(), count + 1);
    EXPECT_EQ(sourceOf(count).file, "slip-plant.csv");
    QFile written(folder.filePath(QStringLiteral("slip-plant.csv")));
    ASSERT_TRUE(written.open(QIODevice::ReadOnly));
    const QByteArray text = written.readAll();
    EXPECT_TRUE(text.contains("# taken from slip.csv, SHA-256 ")) << text.left(300).toStdString();
    EXPECT_TRUE(text.contains("# column 3 taken as phase rad"));
    ASSERT_TRUE(window.files().save());
    const Project reopened = load_project(window.document().filePath().toStdString()).project;
    EXPECT_EQ(reopened, window.document().project());
}

TEST_F(ImportTest, WhatTheFileLeavesOpenIsAskedInThePanel) {
    const QString file =
        write(QStringLiteral("open.csv"),
              table("Frequency (Hz),Gain,Phase (deg)", [](double hertz, Complex value) {
                  return number(hertz) + ',' + number(std::abs(value)) + ',' + degrees(value);
              }));
    window.files().take({file});
    waitForPanel();
    const ImportEntry& entry = panel().entries().front();
    EXPECT_EQ(entry.look->plant, nullptr);
    EXPECT_TRUE(entry.look->isOpen);
    EXPECT_FALSE(panel().takeButton()->isEnabled());
    EXPECT_EQ(panel().table().unitBox(2)->currentText(), QStringLiteral("? choose"));
    choose(panel().table().unitBox(2), QStringLiteral("linear"));
    waitForPanel();
    ASSERT_NE(panel().entries().front().look->plant, nullptr);
    EXPECT_LT(worstError(*panel().entries().front().look->plant), 1e-9);
}

TEST_F(ImportTest, LoopGainAndClosedLoopBecomeThePlant) {
    const Project& project = window.document().project();
    const auto loopAt = [&project](double hertz, Complex plant) {
        const std::vector<double> w{2.0 * std::numbers::pi * hertz};
        return loop_without_plant(project, w).front() * plant;
    };
    const QByteArray heading = "Frequency (Hz),Real,Imaginary";
    const auto parts = [](double hertz, Complex value) {
        return number(hertz) + ',' + number(value.real()) + ',' + number(value.imag());
    };
    const QStringList files{
        write(QStringLiteral("loop.csv"),
              table(heading, [&](double hertz,
                                 Complex plant) { return parts(hertz, loopAt(hertz, plant)); })),
        write(QStringLiteral("closed.csv"), table(heading, [&](double hertz, Complex plant) {
                  const Complex loop = loopAt(hertz, plant);
                  return parts(hertz, loop / (1.0 + loop));
              }))};
    window.files().take(files);
    waitForPanel();
    const QString measured = QStringLiteral("Measured was");
    for (int row = 0; row < 2; ++row) {
        panel().select(row);
        QComboBox* box = formBox(measured);
        ASSERT_NE(box, nullptr);
        box->setCurrentIndex(row + 1);
        Q_EMIT box->activated(row + 1);
        waitForPanel();
    }
    const std::size_t count = cases().size();
    panel().takeIn();
    ASSERT_EQ(cases().size(), count + 2);
    EXPECT_LT(worstError(*sourceOf(count).response), 1e-8);
    EXPECT_LT(worstError(*sourceOf(count + 1).response), 1e-5);
    QFile written(folder.filePath(QStringLiteral("loop-plant.csv")));
    ASSERT_TRUE(written.open(QIODevice::ReadOnly));
    EXPECT_TRUE(written.readAll().contains("# plant P = L/(C H) from the measured loop gain L"));
}

TEST_F(ImportTest, SignAndDelayAreTakenOut) {
    const QString file =
        write(QStringLiteral("delayed.csv"),
              table("Frequency (Hz),Real,Imaginary", [](double hertz, Complex value) {
                  const Complex seen =
                      -value * std::exp(Complex{0.0, -2.0 * std::numbers::pi * hertz * 2e-3});
                  return number(hertz) + ',' + number(seen.real()) + ',' + number(seen.imag());
              }));
    window.files().take({file});
    waitForPanel();
    for (QCheckBox* box : panel().form().findChildren<QCheckBox*>()) {
        box->click();
    }
    type(QStringLiteral("Delay to take out"), QStringLiteral("2 ms\r"));
    waitForPanel();
    ASSERT_NE(panel().entries().front().look->plant, nullptr);
    EXPECT_LT(worstError(*panel().entries().front().look->plant), 1e-9);
}

TEST_F(ImportTest, ATimeRecordIsRecognisedAndItsUncertaintyTravelsToTheMargins) {
    // A gain with which the loop crosses 0 dB inside the measured band.
    Project slow = window.document().project();
    slow.compensator.resize(1);
    slow.compensator.front().gain = 0.5;
    window.document().apply(slow, QStringLiteral("Lower the gain"));
    window.files().take(
        {QStringLiteral(CORNERWRIGHT_TEST_DATA "/core/measurement/data/records/belt-sweep.csv")});
    waitForPanel();
    EXPECT_EQ(panel().entries().front().choices.holds, ImportChoices::Holds::time_record);
    EXPECT_TRUE(panel().entries().front().look->isOpen) << "which column is which is asked";
    choose(formBox(QStringLiteral("Excitation")), QStringLiteral("2"));
    waitForPanel();
    choose(formBox(QStringLiteral("Response")), QStringLiteral("3"));
    waitForPanel();
    ASSERT_NE(panel().entries().front().look->plant, nullptr)
        << panel().entries().front().look->problem.toStdString();
    type(QStringLiteral("Leave out below coherence"), QStringLiteral("0.8\r"));
    waitForPanel();
    const std::size_t count = cases().size();
    panel().takeIn();
    ASSERT_EQ(cases().size(), count + 1);
    const MeasuredResponse& response = *sourceOf(count).response;
    EXPECT_GE(*std::ranges::min_element(response.coherence), 0.8);
    EXPECT_EQ(response.averages, 15.0);
    EXPECT_EQ(random_errors(response).size(), response.w_rad_s.size());
    EXPECT_TRUE(QFile::exists(folder.filePath(QStringLiteral("belt-sweep-plant.csv"))));
    settle();
    const FrequencyFigures& figures =
        window.live().content().assessment->cases.back().design.figures.frequency;
    ASSERT_TRUE(figures.phase_margin_deg.is_value()) << figures.phase_margin_deg.reason();
    EXPECT_GT(figures.phase_margin_deg.standard_deviation(), 0.0);
    EXPECT_TRUE(figureText(figures.phase_margin_deg, MeasureUnit::deg, true)
                    .contains(QStringLiteral("° ± ")));
}

TEST_F(ImportTest, ABrokenFileStaysAndIsToldWhileTheOthersAreTakenIn) {
    const QString good = write(QStringLiteral("unit 7.csv"), plainTable());
    const QString bad = write(QStringLiteral("unit 8.csv"),
                              "frequency (Hz),magnitude (dB),phase (deg)\n1,x,2\n2,3,4\n3,4,5\n");
    const std::size_t count = cases().size();
    window.files().take({good, good, bad});
    waitForPanel();
    panel().takeIn();
    ASSERT_EQ(cases().size(), count + 2);
    EXPECT_EQ(cases()[count].name, "unit 7");
    EXPECT_EQ(cases()[count + 1].name, "unit 7 2");
    EXPECT_TRUE(panel().isVisible());
    ASSERT_EQ(panel().entries().size(), 1u);
    EXPECT_THAT(panel().entries().front().look->problem.toStdString(),
                testing::HasSubstr("unit 8.csv, line 2, column 2: expected a number"));
    panel().dismiss();
    EXPECT_FALSE(panel().isVisible());
    EXPECT_EQ(cases().size(), count + 2);
}

TEST_F(ImportTest, AFitIsShownTakenIntoTheCaseAndFollowedByLocusAndStep) {
    window.files().take({write(QStringLiteral("unit 9.csv"), plainTable())});
    waitForPanel();
    panel().takeIn();
    settle();
    ASSERT_TRUE(window.live().content().assessment);
    EXPECT_FALSE(window.live()
                     .content()
                     .assessment->cases.back()
                     .design.figures.time.overshoot_percent.is_determined());
    const Project before = window.document().project();
    window.actions().fitModel->trigger();
    EXPECT_TRUE(fitPanel().isVisible());
    ASSERT_TRUE(QTest::qWaitFor([&] { return fitPanel().result().has_value(); }, longestWait));
    EXPECT_EQ(fitPanel().preview().curves().size(), 2u);
    EXPECT_EQ(fitPanel().result()->order, 2);
    EXPECT_LT(fitPanel().result()->misfit_db, 1e-6);
    EXPECT_EQ(window.document().project(), before) << "the model waits for the person";
    fitPanel().takeButton()->click();
    EXPECT_FALSE(fitPanel().isVisible());
    settle();
    ASSERT_TRUE(sourceOf(cases().size() - 1).fit.has_value());
    const Assessment& assessment = *window.live().content().assessment;
    const Figure& overshoot = assessment.cases.back().design.figures.time.overshoot_percent;
    ASSERT_TRUE(overshoot.is_determined()) << overshoot.reason();
    EXPECT_THAT(overshoot.note(), testing::HasSubstr("fit"));
    ASSERT_TRUE(window.live().content().locus);
    EXPECT_FALSE(window.live().content().locus->branches.empty());
    EXPECT_THAT(window.live().content().locus->note, testing::HasSubstr("fit"));
    window.actions().undo->trigger();
    EXPECT_EQ(window.document().project(), before);
}

TEST_F(ImportTest, AFitCanBeStoppedAndLeavesTheCaseAlone) {
    window.files().take(
        {QStringLiteral(CORNERWRIGHT_TEST_DATA "/core/fitting/data/exact-order-16.csv")});
    waitForPanel();
    panel().takeIn();
    settle();
    const Project before = window.document().project();
    window.actions().fitModel->trigger();
    EXPECT_TRUE(fitPanel().isRunning());
    fitPanel().dismiss();
    ASSERT_TRUE(QTest::qWaitFor([&] { return !fitPanel().isRunning(); }, longestWait));
    EXPECT_FALSE(fitPanel().isVisible());
    EXPECT_FALSE(fitPanel().result().has_value());
    EXPECT_EQ(window.document().project(), before);
}

} // namespace
} // namespace cornerwright
