#include "widgets/window/window_menus.h"

#include "widgets/chain/chain_panel.h"
#include "widgets/ledger/ledger_panel.h"
#include "widgets/window/design_commands.h"
#include "widgets/window/file_flow.h"
#include "widgets/window/main_window.h"
#include "widgets/window/window_actions.h"
#include "widgets/window/work_area.h"

#include <QFileInfo>
#include <QMenuBar>

namespace cornerwright {

namespace {

void fillRecent(QMenu& menu, MainWindow& window) {
    menu.clear();
    for (const QString& path : window.files().recentPaths()) {
        QAction* action = menu.addAction(QFileInfo(path).fileName(), &window,
                                         [&window, path] { window.files().open(path); });
        action->setToolTip(path);
    }
    menu.setEnabled(!menu.isEmpty());
}

/// The commands of every pane that is in sight: copy, save, print and what it can show.
void fillPanes(QMenu& menu, const WorkArea& area) {
    menu.clear();
    for (const auto& [key, pane] : area.panes()) {
        if (area.isShown(key) && !pane->actions().isEmpty()) {
            menu.addMenu(pane->title())->addActions(pane->actions());
        }
    }
}

/// "Lower centre" with every pane in it, and so on.
void addPlaces(QMenu& menu, WorkArea& area) {
    const std::pair<QString, WorkArea::Place> places[] = {
        {MainWindow::tr("&Lower centre"), WorkArea::lower_centre},
        {MainWindow::tr("&Upper right"), WorkArea::upper_right},
        {MainWindow::tr("Lower &right"), WorkArea::lower_right},
    };
    for (const auto& [name, place] : places) {
        QMenu* inner = menu.addMenu(name);
        for (const auto& [key, pane] : area.panes()) {
            if (pane != area.panes().front().second) {
                inner->addAction(pane->title(), &area,
                                 [&area, key = key, place = place] { area.show(key, place); });
            }
        }
    }
}

} // namespace

void fillMenus(MainWindow& window) {
    const WindowActions& actions = window.actions();
    QMenuBar* bar = window.menuBar();

    QMenu* file = bar->addMenu(MainWindow::tr("&File"));
    file->addActions({actions.newProject, actions.open});
    QMenu* recent = file->addMenu(MainWindow::tr("Open &recent"));
    QObject::connect(file, &QMenu::aboutToShow, recent,
                     [recent, &window] { fillRecent(*recent, window); });
    file->addActions({actions.save, actions.saveAs});
    file->addSeparator();
    file->addActions({actions.addMeasurements, actions.printPane});
    file->addSeparator();
    file->addAction(actions.quit);

    QMenu* edit = bar->addMenu(MainWindow::tr("&Edit"));
    edit->addActions({actions.undo, actions.redo});
    edit->addSeparator();
    edit->addMenu(window.chain().addMenu());
    edit->addActions({actions.switchSection, actions.lockSection, actions.removeSection});
    edit->addSeparator();
    edit->addActions({actions.addMeasurements, actions.addFormula});
    edit->addMenu(window.ledger().addMenu());

    QMenu* view = bar->addMenu(MainWindow::tr("&View"));
    view->addActions({actions.hertz, actions.previousCase, actions.nextCase, actions.onlyShownCase,
                      actions.everyCase});
    view->addSeparator();
    addPlaces(*view, window.area());
    view->addActions({actions.wholePane, actions.allPanes});
    view->addSeparator();
    view->addActions(actions.grounds->actions());
    view->addMenu(MainWindow::tr("Langua&ge"))->addActions(actions.languageChoices->actions());

    QMenu* panes = bar->addMenu(MainWindow::tr("&Panes"));
    QObject::connect(panes, &QMenu::aboutToShow, panes,
                     [panes, &window] { fillPanes(*panes, window.area()); });
    fillPanes(*panes, window.area());

    QMenu* design = bar->addMenu(MainWindow::tr("&Design"));
    design->addActions({actions.place, actions.fitModel});
    window.designCommands().addTo(*design);
    design->addSeparator();
    design->addActions({actions.keepTrial, actions.showTrials});
    design->addSeparator();
    design->addActions({actions.showHandover, actions.writeReport});

    QMenu* help = bar->addMenu(MainWindow::tr("&Help"));
    help->addActions({actions.explain, actions.windowHelp});
    help->addSeparator();
    help->addAction(actions.about);
}

} // namespace cornerwright
