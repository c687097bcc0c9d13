#include "core/engine/engine.h"
#include "shell_samples.h"
#include "widgets/cases/case_edits.h"
#include "widgets/chain/chain_edits.h"
#include "widgets/chain/chain_panel.h"
#include "widgets/ledger/ledger_panel.h"
#include "widgets/trials/trial_book.h"
#include "widgets/window/main_window.h"
#include "widgets/window/pane_slot.h"
#include "widgets/window/window_actions.h"
#include "widgets/window/work_area.h"

#include <QDir>
#include <QSignalSpy>
#include <QTemporaryDir>
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
        switch (below(14)) {
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
        default:
            return trial();
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

    MainWindow& window_;
    std::mt19937 random_;
};

TEST(Window, WithstandsAHandThatDoesAnythingAndShowsWhatAFreshEngineSays) {
    const QTemporaryDir folder;
    MainWindow window({folder.filePath(QStringLiteral("window.ini")),
                       folder.filePath(QStringLiteral("recovery"))});
    window.document().reset(smallProject(), QString(), QDir::currentPath());
    window.show();
    constexpr unsigned seed = 5;
    RandomHand hand(window, seed);
    constexpr int actions = 160;
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
