#include "shell_samples.h"
#include "widgets/chain/chain_panel.h"
#include "widgets/chain/section_card.h"
#include "widgets/figure_text.h"
#include "widgets/handover/caution_text.h"
#include "widgets/help/help_panel.h"
#include "widgets/ledger/ledger_model.h"
#include "widgets/ledger/ledger_panel.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/window/language.h"
#include "widgets/window/main_window.h"
#include "widgets/window/pane_slot.h"
#include "widgets/window/work_area.h"

#include <QAbstractButton>
#include <QDir>
#include <QMenuBar>
#include <QSignalSpy>
#include <QTableView>
#include <QTemporaryDir>
#include <QTest>
#include <gtest/gtest.h>

namespace cornerwright {
namespace {

constexpr int longestWait = 20000; // ms

QString text(std::string_view name) {
    return QString::fromUtf8(name.data(), std::ssize(name));
}

class HelpTest : public testing::Test {
  protected:
    HelpTest() {
        window.document().reset(smallProject(), QString(), QDir::currentPath());
        window.show();
        window.activateWindow();
        QSignalSpy changed(&window.live(), &LiveContent::contentChanged);
        while (window.live().runner().isBusy()) {
            EXPECT_TRUE(changed.wait(longestWait));
        }
    }

    QTemporaryDir folder;
    MainWindow window{{folder.filePath(QStringLiteral("window.ini")),
                       folder.filePath(QStringLiteral("recovery"))}};
};

TEST_F(HelpTest, EveryFigureSectionAndPaneIsExplainedInEveryLanguage) {
    QStringList topics;
    for (const Measure measure : all_measures()) {
        topics << text(name_of(measure));
    }
    for (const SectionKind kind : all_section_kinds()) {
        topics << text(name_of(kind));
    }
    for (const auto& [key, pane] : window.area().panes()) {
        topics << QStringLiteral("pane-") + key;
    }
    for (const QString& language : languages()) {
        const HelpTexts texts(language);
        const bool german = language == QStringLiteral("de");
        for (const QString& topic : topics) {
            const QString told = texts.markdown(topic);
            EXPECT_TRUE(told.contains(german ? QStringLiteral("**Formel:**")
                                             : QStringLiteral("**Formula:**")))
                << language.toStdString() << ": " << topic.toStdString();
            EXPECT_TRUE(told.contains(german ? QStringLiteral("**Quelle:**")
                                             : QStringLiteral("**Source:**")))
                << language.toStdString() << ": " << topic.toStdString();
        }
        EXPECT_EQ(texts.topics(), HelpTexts(QStringLiteral("en")).topics());
    }
}

TEST_F(HelpTest, F1OnALedgerRowExplainsItsMeasureAndEscapeCloses) {
    QTableView* view = window.ledger().view();
    view->setFocus();
    for (int row = 0; row < window.ledger().model()->rowCount(); ++row) {
        view->selectRow(row);
        QTest::keyClick(view, Qt::Key_F1);
        ASSERT_TRUE(window.help().isVisible());
        EXPECT_EQ(window.help().topic(),
                  text(name_of(window.ledger().model()->result(row).requirement.measure)));
        EXPECT_FALSE(window.help().text().isEmpty());
        QTest::keyClick(&window.help(), Qt::Key_Escape);
        EXPECT_FALSE(window.help().isVisible());
    }
}

TEST_F(HelpTest, F1OnACardFieldExplainsItsSection) {
    for (const SectionCard* card : window.chain().cards()) {
        QuantityField* field = card->fields().at(0);
        field->setFocus();
        QTest::keyClick(field, Qt::Key_F1);
        EXPECT_EQ(window.help().topic(), text(name_of(card->section().kind)));
        QTest::keyClick(&window.help(), Qt::Key_Escape);
    }
}

TEST_F(HelpTest, TheQuestionMarkInAHeadExplainsThePane) {
    const PaneSlot* slot = window.area().slotAt(WorkArea::upper_right);
    for (QAbstractButton* button : slot->findChildren<QAbstractButton*>()) {
        if (button->accessibleName().endsWith(QLatin1Char('?'))) {
            button->click();
        }
    }
    EXPECT_EQ(window.help().topic(), QStringLiteral("pane-root-locus"));
}

TEST(Language, GermanStandsInTheWindowAndInTheFigures) {
    QStringList english;
    for (const Measure measure : all_measures()) {
        english << measureText(measure);
    }
    applyLanguage(QStringLiteral("de"));
    EXPECT_EQ(spokenLanguage(), QStringLiteral("de"));
    int number = 0;
    for (const Measure measure : all_measures()) {
        EXPECT_NE(measureText(measure), english[number++]);
    }
    {
        const QTemporaryDir folder;
        MainWindow window({folder.filePath(QStringLiteral("window.ini")),
                           folder.filePath(QStringLiteral("recovery"))});
        EXPECT_EQ(window.menuBar()->actions().front()->text(), QStringLiteral("&Datei"));
    }
    const QStringList cautionsThere = cautionSentences();
    applyLanguage(QStringLiteral("en"));
    ASSERT_EQ(cautionsThere.size(), cautionSentences().size());
    for (qsizetype i = 0; i < cautionsThere.size(); ++i) {
        EXPECT_NE(cautionsThere[i], cautionSentences()[i]);
    }
    EXPECT_EQ(measureText(Measure::phase_margin), english.front());
}

} // namespace
} // namespace cornerwright
