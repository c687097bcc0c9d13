#include "core/engine/engine.h"
#include "shell_samples.h"
#include "widgets/cases/case_row.h"
#include "widgets/cases/cases_panel.h"
#include "widgets/chain/chain_panel.h"
#include "widgets/chain/section_card.h"
#include "widgets/handover/handover_flow.h"
#include "widgets/ledger/ledger_model.h"
#include "widgets/ledger/ledger_panel.h"
#include "widgets/panes/plot_pane.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/placement/placement_run.h"
#include "widgets/theme.h"
#include "widgets/trials/trial_book.h"
#include "widgets/window/appearance.h"
#include "widgets/window/file_flow.h"
#include "widgets/window/main_window.h"
#include "widgets/window/notice_strip.h"
#include "widgets/window/pane_slot.h"
#include "widgets/window/window_actions.h"
#include "widgets/window/work_area.h"

#include <QAbstractButton>
#include <QCheckBox>
#include <QComboBox>
#include <QFileInfo>
#include <QLineEdit>
#include <QMenuBar>
#include <QPrinter>
#include <QSignalSpy>
#include <QTableView>
#include <QTemporaryDir>
#include <QTest>
#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr int longestWait = 20000; // ms

class WindowTest : public testing::Test {
  protected:
    WindowTest() {
        window.document().reset(smallProject(), QString(), QDir::currentPath());
        window.show();
        settle();
    }

    void settle() {
        QSignalSpy changed(&window.live(), &LiveContent::contentChanged);
        while (window.live().runner().isBusy()) {
            ASSERT_TRUE(changed.wait(longestWait));
        }
        QCoreApplication::processEvents();
    }

    QAbstractButton* choice(const QString& text) {
        for (QAbstractButton* button : window.notices().findChildren<QAbstractButton*>()) {
            if (button->text() == text && button->isVisible()) {
                return button;
            }
        }
        return nullptr;
    }

    QTemporaryDir folder;
    MainWindow window{{folder.filePath(QStringLiteral("window.ini")),
                       folder.filePath(QStringLiteral("recovery"))}};
};

TEST_F(WindowTest, EveryControlHasANameForThoseWhoDoNotSeeIt) {
    window.ledger().add(Measure::roll_off); // opens the editor
    window.trials().keep(window.live().content().project, window.live().content().assessment);
    settle();
    int controls = 0;
    for (const QWidget* widget : window.findChildren<QWidget*>()) {
        const bool isControl = qobject_cast<const QAbstractButton*>(widget) != nullptr ||
                               qobject_cast<const QLineEdit*>(widget) != nullptr ||
                               qobject_cast<const QComboBox*>(widget) != nullptr ||
                               qobject_cast<const QAbstractItemView*>(widget) != nullptr ||
                               qobject_cast<const SectionCard*>(widget) != nullptr ||
                               qobject_cast<const CaseRow*>(widget) != nullptr;
        // Parts that Qt makes inside its own widgets are named through their owner.
        const bool isInner = widget->objectName().startsWith(QStringLiteral("qt_")) ||
                             qobject_cast<const QComboBox*>(widget->parentWidget()) != nullptr ||
                             QString::fromLatin1(widget->metaObject()->className())
                                 .contains(QStringLiteral("QComboBoxPrivate")) ||
                             widget->inherits("QHeaderView") ||
                             widget->inherits("QTableCornerButton") ||
                             widget->inherits("QComboBoxListView");
        if (!isControl || isInner || widget->focusPolicy() == Qt::NoFocus) {
            continue;
        }
        ++controls;
        const auto* button = qobject_cast<const QAbstractButton*>(widget);
        const QString name = !widget->accessibleName().isEmpty() ? widget->accessibleName()
                             : button != nullptr                 ? button->text()
                                                                 : QString();
        EXPECT_FALSE(name.isEmpty()) << widget->metaObject()->className() << " in "
                                     << widget->parentWidget()->metaObject()->className();
    }
    EXPECT_GT(controls, 40);
}

TEST_F(WindowTest, AnExactValueWithItsUnitIsTypedIntoACard) {
    QuantityField* zero = window.chain().cards().at(1)->fields().at(0);
    zero->setFocus();
    zero->selectAll();
    QTest::keyClicks(zero, QStringLiteral("12 Hz"));
    QTest::keyClick(zero, Qt::Key_Return);
    EXPECT_DOUBLE_EQ(window.document().project().compensator[1].zero_rad_s,
                     12.0 * 2.0 * std::numbers::pi);
    settle();
    const auto fresh = Engine().assess(window.document().project());
    EXPECT_EQ(window.live().content().assessment->verdict, fresh->verdict);
    window.actions().undo->trigger();
    EXPECT_EQ(window.document().project(), smallProject());
    EXPECT_DOUBLE_EQ(zero->value().value_or(0.0), 25.0);
}

TEST_F(WindowTest, UndoInAFieldThatIsNotBeingTypedInIsTheWindowsUndo) {
    window.activateWindow();
    QuantityField* zero = window.chain().cards().at(1)->fields().at(0);
    zero->setFocus();
    zero->selectAll();
    QTest::keyClicks(zero, QStringLiteral("12 Hz"));
    QTest::keyClick(zero, Qt::Key_Z, Qt::ControlModifier); // takes the typing back
    EXPECT_EQ(window.document().project(), smallProject());
    QTest::keyClicks(zero, QStringLiteral("12 Hz"));
    QTest::keyClick(zero, Qt::Key_Return);
    ASSERT_NE(window.document().project(), smallProject());
    QTest::keyClick(zero, Qt::Key_Z, Qt::ControlModifier);
    EXPECT_EQ(window.document().project(), smallProject());
}

TEST_F(WindowTest, AValueThatCannotStandIsRefusedInPlace) {
    QuantityField* zero = window.chain().cards().at(1)->fields().at(0);
    zero->setFocus();
    zero->selectAll();
    QTest::keyClicks(zero, QStringLiteral("900 Hz")); // above the pole: no lead any more
    QTest::keyClick(zero, Qt::Key_Return);
    EXPECT_FALSE(zero->problem().isEmpty());
    EXPECT_EQ(window.document().project(), smallProject());
    QTest::keyClick(zero, Qt::Key_Escape);
    EXPECT_TRUE(zero->problem().isEmpty());
    EXPECT_DOUBLE_EQ(zero->value().value_or(0.0), 25.0);
}

TEST_F(WindowTest, UpAndDownMoveAFieldByOnePercent) {
    QuantityField* gain = window.chain().cards().at(0)->fields().at(0);
    gain->setFocus();
    QTest::keyClick(gain, Qt::Key_Up);
    EXPECT_DOUBLE_EQ(window.document().project().compensator[0].gain, 1.6 * 1.01);
    QTest::keyClick(gain, Qt::Key_Up, Qt::ShiftModifier);
    EXPECT_DOUBLE_EQ(window.document().project().compensator[0].gain, 1.6 * 1.01 * 1.001);
}

TEST_F(WindowTest, KeysOnACardSwitchMoveAndRemoveIt) {
    const auto card = [this](std::size_t index) { return window.chain().cards().at(index); };
    QTest::keyClick(card(1), Qt::Key_Space);
    EXPECT_FALSE(window.document().project().compensator[1].enabled);
    QTest::keyClick(card(1), Qt::Key_L);
    EXPECT_TRUE(window.document().project().compensator[1].locked);
    QTest::keyClick(card(1), Qt::Key_Down, Qt::AltModifier);
    EXPECT_EQ(window.document().project().compensator[2].kind, SectionKind::lead);
    EXPECT_EQ(window.viewState().selectedSection(), 2u);
    QTest::keyClick(card(2), Qt::Key_Delete);
    EXPECT_EQ(window.document().project().compensator.size(), 4u);
    for (int i = 0; i < 4; ++i) {
        window.actions().undo->trigger();
    }
    EXPECT_EQ(window.document().project(), smallProject());
}

TEST_F(WindowTest, EverySectionKindCanBeAddedAndJudged) {
    for (const SectionKind kind : all_section_kinds()) {
        window.chain().add(kind);
        const Section& added = window.document().project().compensator.back();
        EXPECT_EQ(added.kind, kind);
        EXPECT_NO_THROW(check(added));
    }
    settle();
    EXPECT_TRUE(window.live().content().assessment != nullptr);
}

TEST_F(WindowTest, ARowOfTheLedgerLeadsToCaseAndFrequency) {
    window.ledger().goToFirst();
    const RequirementResult& first = window.ledger().model()->result(0);
    const std::size_t shown = window.viewState().shownCase();
    EXPECT_EQ(window.document().project().plant_cases[shown].name, first.worst.case_name);
    ASSERT_TRUE(first.worst.at_rad_s.is_value());
    EXPECT_EQ(window.viewState().cursorRadS(), first.worst.at_rad_s.value());
}

TEST_F(WindowTest, UnsavedChangesAreAskedInPlace) {
    window.chain().add(SectionKind::lead);
    EXPECT_FALSE(window.close());
    ASSERT_TRUE(window.isVisible());
    ASSERT_NE(choice(QStringLiteral("Stay")), nullptr);
    choice(QStringLiteral("Stay"))->click();
    EXPECT_TRUE(window.isVisible());
    EXPECT_FALSE(window.close());
    choice(QStringLiteral("Discard changes"))->click();
    EXPECT_FALSE(window.isVisible());
}

TEST_F(WindowTest, AFileThatIsWrongIsToldAndNothingIsLost) {
    const QString path = folder.filePath(QStringLiteral("wrong.cornerwright.json"));
    QFile file(path);
    ASSERT_TRUE(file.open(QIODevice::WriteOnly));
    file.write("{\"cornerwright\": 1, \"titel\": \"slip\"}");
    file.close();
    window.files().open(path);
    EXPECT_EQ(window.document().project(), smallProject());
    ASSERT_FALSE(window.notices().texts().isEmpty());
    EXPECT_TRUE(window.notices().texts().first().contains(QStringLiteral("titel")));
}

TEST_F(WindowTest, APaneTakesTheWholeWindowAndGoesBack) {
    PaneSlot* slot = window.area().slotAt(WorkArea::lower_centre);
    window.area().setWhole(slot);
    EXPECT_TRUE(slot->isVisible());
    EXPECT_FALSE(window.area().slotAt(WorkArea::upper_centre)->isVisible());
    EXPECT_FALSE(window.ledger().isVisible());
    EXPECT_FALSE(window.chain().isVisible());
    window.area().setWhole(nullptr);
    EXPECT_TRUE(window.area().slotAt(WorkArea::upper_centre)->isVisible());
    EXPECT_TRUE(window.ledger().isVisible());
    EXPECT_TRUE(window.chain().isVisible());
}

TEST_F(WindowTest, EveryPaneCanStandInEveryPlace) {
    for (const auto& [key, pane] : window.area().panes()) {
        if (key == QStringLiteral("magnitude")) {
            continue;
        }
        for (const auto place :
             {WorkArea::lower_centre, WorkArea::upper_right, WorkArea::lower_right}) {
            window.area().show(key, place);
            QCoreApplication::processEvents();
            EXPECT_EQ(window.area().slotAt(place)->pane(), pane);
            EXPECT_TRUE(pane->isVisible()) << key.toStdString();
        }
    }
}

TEST_F(WindowTest, ATrialIsComparedAndReturnedTo) {
    window.actions().keepTrial->trigger();
    const auto kept = window.live().content().assessment;
    EXPECT_EQ(window.live().content().trial, kept);
    window.chain().add(SectionKind::real_pole);
    settle();
    EXPECT_NE(window.live().content().assessment, kept);
    EXPECT_EQ(window.live().content().trial, kept);
    window.trials().compare(std::nullopt);
    EXPECT_EQ(window.live().content().trial, nullptr);
}

TEST_F(WindowTest, PlacementRaisesTheSmallestHeadroomAsOneUndoStep) {
    const auto smallest = [this] {
        double share = HUGE_VAL;
        for (const RequirementResult& result :
             window.live().content().assessment->verdict.requirements) {
            share = std::min(share, result.worst.share.value());
        }
        return share;
    };
    const double before = smallest();
    QSignalSpy finished(&window.placement(), &PlacementRun::finished);
    window.actions().place->trigger();
    ASSERT_TRUE(finished.wait(longestWait));
    settle();
    EXPECT_GT(smallest(), before);
    EXPECT_FALSE(window.notices().texts().isEmpty());
    window.actions().undo->trigger();
    EXPECT_EQ(window.document().project(), smallProject());
}

TEST_F(WindowTest, AnEditDuringPlacementIsNotOverwritten) {
    QSignalSpy finished(&window.placement(), &PlacementRun::finished);
    window.actions().place->trigger();
    Project edited = smallProject();
    edited.compensator[0].gain = 1.7;
    window.document().apply(edited, QStringLiteral("edit"));
    window.placement().cancel();
    ASSERT_TRUE(finished.wait(longestWait));
    EXPECT_EQ(window.document().project(), edited);
    ASSERT_NE(choice(QStringLiteral("Keep the present design")), nullptr);
}

TEST_F(WindowTest, HandoverFilesAreWrittenAndAFailureIsTold) {
    window.handover().exportTo(HandoverForm::c99, QStringLiteral("lift"), folder.path());
    for (const char* name : {"lift.h", "lift.c", "lift_selfcheck.c"}) {
        EXPECT_TRUE(QFile::exists(folder.filePath(QString::fromLatin1(name)))) << name;
    }
    window.handover().reportTo(folder.filePath(QStringLiteral("review.html")));
    EXPECT_GT(QFileInfo(folder.filePath(QStringLiteral("review.html"))).size(), 1000);
    QSignalSpy failed(&window.handover(), &HandoverFlow::failed);
    window.handover().reportTo(folder.filePath(QStringLiteral("no/such/folder/review.html")));
    EXPECT_EQ(failed.count(), 1);
}

TEST_F(WindowTest, TheGroundChangesUnderARunningWindow) {
    for (QAction* ground : window.actions().grounds->actions()) {
        ground->trigger();
        QCoreApplication::processEvents();
        const bool dark = ground->data().toInt() == static_cast<int>(Ground::dark);
        if (ground->data().toInt() != static_cast<int>(Ground::system)) {
            EXPECT_EQ(Theme::of(window.palette()).isDark(), dark);
            EXPECT_EQ(Theme::of(window.chain().palette()).isDark(), dark);
        }
    }
    applyAppearance(Ground::light);
}

TEST_F(WindowTest, CasesAreAddedByFormulaHiddenAndRemoved) {
    QCheckBox* box = window.cases().rows().at(1)->checkBox();
    box->click();
    EXPECT_TRUE(window.viewState().hiddenCases().contains(1));
    QTest::keyClick(window.cases().rows().at(2), Qt::Key_Delete);
    EXPECT_EQ(window.document().project().plant_cases.size(), 2u);
    window.actions().undo->trigger();
    EXPECT_EQ(window.document().project(), smallProject());
}

TEST_F(WindowTest, OneCaseOrEveryCaseIsDrawn) {
    window.actions().nextCase->trigger();
    window.actions().onlyShownCase->trigger();
    EXPECT_EQ(window.viewState().hiddenCases(), (std::set<std::size_t>{0, 2}));
    window.actions().everyCase->trigger();
    EXPECT_TRUE(window.viewState().hiddenCases().empty());
}

TEST_F(WindowTest, TheLayoutIsKeptWithoutAnEndInOrder) {
    window.area().show(QStringLiteral("nichols"), WorkArea::lower_right);
    const QString file = folder.filePath(QStringLiteral("window.ini"));
    ASSERT_TRUE(QTest::qWaitFor([&] {
        return QSettings(file, QSettings::IniFormat).value(QStringLiteral("places/3")) ==
               QStringLiteral("nichols");
    }));
    MainWindow next({file, folder.filePath(QStringLiteral("other"))});
    EXPECT_TRUE(next.area().isShown(QStringLiteral("nichols")));
}

TEST_F(WindowTest, APaneIsPrintedOnAPage) {
    const QString file = folder.filePath(QStringLiteral("magnitude.pdf"));
    QPrinter printer;
    printer.setOutputFormat(QPrinter::PdfFormat);
    printer.setOutputFileName(file);
    auto* pane = qobject_cast<PlotPane*>(window.area().pane(QStringLiteral("magnitude")));
    EXPECT_TRUE(pane->print(printer));
    QFile page(file);
    ASSERT_TRUE(page.open(QIODevice::ReadOnly));
    EXPECT_TRUE(page.readAll().startsWith("%PDF"));
}

TEST_F(WindowTest, EveryPaneInSightOffersItsCommandsInTheMenu) {
    const auto menuOf = [this](const QString& pane) -> const QMenu* {
        for (const QAction* top : window.menuBar()->actions()) {
            for (const QAction* entry : top->menu()->actions()) {
                if (entry->menu() != nullptr && entry->text() == pane) {
                    return entry->menu();
                }
            }
        }
        return nullptr;
    };
    for (const auto& [key, pane] : window.area().panes()) {
        if (window.area().isShown(key)) {
            const QMenu* menu = menuOf(pane->title());
            ASSERT_NE(menu, nullptr) << key.toStdString();
            EXPECT_EQ(menu->actions(), pane->actions());
        }
    }
}

TEST_F(WindowTest, AMeasurementThatChangedIsToldAndAcceptingItIsAChoice) {
    const auto write = [this](const QString& name, const QByteArray& text) {
        QFile file(folder.filePath(name));
        EXPECT_TRUE(file.open(QIODevice::WriteOnly));
        file.write(text);
        return file.fileName();
    };
    write(QStringLiteral("unit.csv"), "frequency (Hz),magnitude (dB),phase (deg)\n"
                                      "1,20,-95\n2,14,-100\n5,5,-110\n10,-2,-125\n20,-10,-140\n");
    const std::string old(64, 'a');
    Project project = smallProject();
    project.plant_cases = {{"unit", MeasurementSource{"unit.csv", old, 1, 0, {}, {}, {}}}};
    const QString path = folder.filePath(QStringLiteral("measured.cornerwright.json"));
    save_project(project, path.toStdString());
    const auto pin = [this] {
        const auto& source = window.document().project().plant_cases.at(0).source;
        return std::get<MeasurementSource>(source).sha256;
    };
    window.files().open(path);
    EXPECT_TRUE(
        window.notices().texts().join(QLatin1Char(' ')).contains(QStringLiteral("has changed")));
    EXPECT_EQ(pin(), old);
    QCoreApplication::processEvents();
    ASSERT_NE(choice(QStringLiteral("Accept changed measurements")), nullptr);
    choice(QStringLiteral("Accept changed measurements"))->click();
    EXPECT_NE(pin(), old);
    EXPECT_TRUE(window.files().save());
    window.files().open(path);
    QCoreApplication::processEvents();
    EXPECT_EQ(choice(QStringLiteral("Accept changed measurements")), nullptr);
    settle();
}

} // namespace
} // namespace cornerwright
