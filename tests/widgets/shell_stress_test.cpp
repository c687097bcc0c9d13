#include "core/engine/engine.h"
#include "shell_samples.h"
#include "widgets/cases/case_edits.h"
#include "widgets/chain/chain_edits.h"
#include "widgets/chain/chain_panel.h"
#include "widgets/ledger/ledger_model.h"
#include "widgets/ledger/ledger_panel.h"
#include "widgets/panes/plot_pane.h"
#include "widgets/placement/placement_run.h"
#include "widgets/trials/trial_book.h"
#include "widgets/window/file_flow.h"
#include "widgets/window/main_window.h"
#include "widgets/window/pane_slot.h"
#include "widgets/window/window_actions.h"
#include "widgets/window/work_area.h"

#include <QDir>
#include <QMouseEvent>
#include <QSignalSpy>
#include <QTableView>
#include <QTemporaryDir>
#include <QTest>
#include <gtest/gtest.h>

#include <random>

namespace cornerwright {
namespace {

constexpr int longestWait = 20000; // ms

/// A hand that does anything at any time.
class RandomHand {
  public:
    RandomHand(MainWindow& window, unsigned seed) : window_(window), random_(seed) {}

    void act() {
        switch (below(22)) {
        case 0:
            return add();
        case 1:
            return changeSection([](Section& section) { section.enabled = !section.enabled; });
        case 2:
            return changeSection([this](Section& section) { section.corner_rad_s *= factor(); });
        case 3:
            return drag();
        case 4:
        case 5:
            return window_.actions().undo->trigger();
        case 6:
            return window_.actions().redo->trigger();
        case 7:
            return select();
        case 8:
            return window_.actions().removeSection->trigger();
        case 9:
            return window_.actions().nextCase->trigger();
        case 10:
            return editCases();
        case 11:
            return window_.actions().hertz->toggle();
        case 12:
            return showPane();
        case 13:
            return trial();
        case 14:
        case 15:
            return mouseOnPane();
        case 16:
        case 17:
            return keyOnPane();
        case 18:
            return editRequirements();
        case 19:
            return look();
        case 20:
            return placeAndStop();
        default:
            return saveAndReopen();
        }
    }

  private:
    std::size_t below(std::size_t bound) {
        return std::uniform_int_distribution<std::size_t>(0, bound - 1)(random_);
    }
    double factor() { return std::uniform_real_distribution<double>(0.7, 1.4)(random_); }
    const Project& project() { return window_.document().project(); }

    void add() {
        if (project().compensator.size() < 12) {
            window_.chain().add(all_section_kinds()[below(all_section_kinds().size())]);
        }
    }

    template <typename Change>
    void changeSection(Change change) {
        if (!project().compensator.empty()) {
            const std::size_t index = below(project().compensator.size());
            Section section = project().compensator[index];
            change(section);
            window_.document().apply(withSectionChanged(project(), index, section),
                                     QStringLiteral("change"));
        }
    }

    void drag() {
        Document& document = window_.document();
        const Project start = document.project();
        document.beginDrag(QStringLiteral("drag"));
        for (std::size_t i = below(6); i > 0 && !start.compensator.empty(); --i) {
            auto proposed = std::make_shared<Project>(start);
            proposed->compensator.front().gain *= factor();
            document.previewDrag(proposed);
            QCoreApplication::processEvents();
        }
        below(3) == 0 ? document.cancelDrag() : document.commitDrag();
    }

    void select() {
        if (!project().compensator.empty()) {
            window_.viewState().setSelectedSection(below(project().compensator.size()));
        }
    }

    void editCases() {
        const std::size_t count = project().plant_cases.size();
        if (count > 1 && below(2) == 0) {
            window_.document().apply(withCaseRemoved(project(), below(count)),
                                     QStringLiteral("remove case"));
        } else if (count < 5) {
            const QString name = freeCaseName(project(), QStringLiteral("more"));
            window_.document().apply(
                withCaseAdded(project(), {name.toStdString(), FormulaSource{"20/(s (s/40 + 1))"}}),
                QStringLiteral("add case"));
        }
    }

    void showPane() {
        const auto& panes = window_.area().panes();
        const std::size_t index = 1 + below(panes.size() - 1);
        const auto place = static_cast<WorkArea::Place>(1 + below(3));
        window_.area().show(panes[index].first, place);
        window_.area().setWhole(below(4) == 0 ? window_.area().slotAt(place) : nullptr);
    }

    void trial() {
        if (window_.trials().trials().size() > 3) {
            window_.trials().remove(below(4));
        } else {
            window_.actions().keepTrial->trigger();
        }
    }

    PlotPane* anyPane() {
        const auto place = static_cast<WorkArea::Place>(below(WorkArea::placeCount_));
        auto* pane = qobject_cast<PlotPane*>(window_.area().slotAt(place)->pane());
        return pane != nullptr && pane->isVisible() ? pane : nullptr;
    }

    /// A press, moves and a release anywhere, half of them on a handle; Escape now and then.
    void mouseOnPane() {
        PlotPane* pane = anyPane();
        if (pane == nullptr) {
            return;
        }
        QWidget* plot = pane->plotWidget();
        const auto anywhere = [&] {
            return QPoint(static_cast<int>(below(static_cast<std::size_t>(plot->width()))),
                          static_cast<int>(below(static_cast<std::size_t>(plot->height()))));
        };
        const std::vector<Handle> handles = pane->handles();
        const bool onHandle = !handles.empty() && below(2) == 0;
        const QPoint start = onHandle ? handles[below(handles.size())].at.toPoint() : anywhere();
        const Qt::KeyboardModifiers keys[] = {Qt::NoModifier, Qt::ShiftModifier,
                                              Qt::ControlModifier};
        const Qt::KeyboardModifiers key = keys[below(3)];
        QTest::mousePress(plot, Qt::LeftButton, key, start);
        for (std::size_t i = below(5); i > 0; --i) {
            const QPointF to = onHandle && below(3) > 0
                                   ? QPointF(start) + QPointF(20.0 * factor(), -15.0 * factor())
                                   : QPointF(anywhere());
            QMouseEvent move(QEvent::MouseMove, to, plot->mapToGlobal(to), Qt::NoButton,
                             Qt::LeftButton, key);
            QCoreApplication::sendEvent(plot, &move);
            QCoreApplication::processEvents();
        }
        if (below(4) == 0) {
            QTest::keyClick(pane, Qt::Key_Escape);
        }
        QTest::mouseRelease(plot, Qt::LeftButton, key, anywhere());
    }

    void keyOnPane() {
        constexpr Qt::Key keys[] = {Qt::Key_Tab,  Qt::Key_Left, Qt::Key_Right, Qt::Key_Up,
                                    Qt::Key_Down, Qt::Key_Home, Qt::Key_Space, Qt::Key_Delete};
        if (PlotPane* pane = anyPane()) {
            QTest::keyClick(pane, keys[below(std::size(keys))]);
        }
    }

    void editRequirements() {
        const std::size_t count = project().requirements.size();
        if (count < 12 && below(2) == 0) {
            window_.ledger().add(all_measures()[below(all_measures().size())]);
        } else if (window_.ledger().model()->rowCount() > 0) {
            constexpr Qt::Key keys[] = {Qt::Key_Down, Qt::Key_Space, Qt::Key_Return, Qt::Key_F1,
                                        Qt::Key_Delete};
            window_.ledger().view()->selectRow(0);
            QTest::keyClick(window_.ledger().view(), keys[below(std::size(keys))]);
        }
    }

    void look() {
        QAction* const actions[] = {window_.actions().onlyShownCase, window_.actions().everyCase,
                                    window_.actions().explain,       window_.actions().wholePane,
                                    window_.actions().allPanes,      window_.actions().about,
                                    window_.actions().showHandover,  window_.actions().showTrials};
        actions[below(std::size(actions))]->trigger();
        if (below(20) == 0) {
            const QList<QAction*> grounds = window_.actions().grounds->actions();
            grounds[static_cast<qsizetype>(below(3))]->trigger();
        }
    }

    void placeAndStop() {
        if (below(10) == 0) {
            window_.actions().place->trigger();
            QCoreApplication::processEvents();
            window_.placement().cancel();
        }
    }

    void saveAndReopen() {
        if (below(4) != 0) {
            return;
        }
        const QString path = folder_.filePath(QStringLiteral("stress.cornerwright.json"));
        ASSERT_TRUE(window_.files().saveTo(path));
        if (below(2) == 0) {
            const std::string saved = to_text(project());
            window_.files().open(path);
            ASSERT_EQ(to_text(project()), saved);
        }
    }

    MainWindow& window_;
    std::mt19937 random_;
    QTemporaryDir folder_;
};

/// How long the hand works: short in the everyday run, as long as wished when asked for.
int actionCount() {
    constexpr int everyday = 200;
    bool given = false;
    const int wished = qEnvironmentVariableIntValue("CORNERWRIGHT_STRESS_ACTIONS", &given);
    return given ? wished : everyday;
}

TEST(Window, WithstandsAHandThatDoesAnythingAndShowsWhatAFreshEngineSays) {
    const QTemporaryDir folder;
    MainWindow window({folder.filePath(QStringLiteral("window.ini")),
                       folder.filePath(QStringLiteral("recovery"))});
    window.document().reset(smallProject(), QString(), QDir::currentPath());
    window.show();
    constexpr unsigned seed = 5;
    RandomHand hand(window, seed);
    const int actions = actionCount();
    constexpr int checkEvery = 40;
    QSignalSpy changed(&window.live(), &LiveContent::contentChanged);
    for (int i = 1; i <= actions; ++i) {
        hand.act();
        QCoreApplication::processEvents();
        if (i % checkEvery == 0) {
            while (window.live().runner().isBusy()) {
                ASSERT_TRUE(changed.wait(longestWait));
            }
            const auto fresh = Engine().assess(window.document().project());
            ASSERT_EQ(window.live().content().assessment->verdict, fresh->verdict)
                << "after action " << i;
        }
    }
}

} // namespace
} // namespace cornerwright
