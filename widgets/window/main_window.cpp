#include "widgets/window/main_window.h"

#include "widgets/cases/cases_panel.h"
#include "widgets/chain/chain_edits.h"
#include "widgets/chain/chain_panel.h"
#include "widgets/figure_text.h"
#include "widgets/handover/export_row.h"
#include "widgets/handover/handover_flow.h"
#include "widgets/handover/realisation_pane.h"
#include "widgets/help/help_panel.h"
#include "widgets/help/help_topic.h"
#include "widgets/ledger/ledger_panel.h"
#include "widgets/panes/plot_pane.h"
#include "widgets/placement/placement_run.h"
#include "widgets/trials/trial_menu.h"
#include "widgets/window/about_page.h"
#include "widgets/window/appearance.h"
#include "widgets/window/design_commands.h"
#include "widgets/window/file_flow.h"
#include "widgets/window/language.h"
#include "widgets/window/measurement_flow.h"
#include "widgets/window/notice_strip.h"
#include "widgets/window/pane_set.h"
#include "widgets/window/pane_slot.h"
#include "widgets/window/run_status.h"
#include "widgets/window/top_bar.h"
#include "widgets/window/verdict_pill.h"
#include "widgets/window/window_actions.h"
#include "widgets/window/window_menus.h"
#include "widgets/window/work_area.h"

#include <QApplication>
#include <QCloseEvent>
#include <QMimeData>
#include <QStackedWidget>
#include <QStatusTipEvent>
#include <QTableView>
#include <QVBoxLayout>

#include <chrono>

namespace cornerwright {

namespace {

constexpr QSize firstSize(1600, 950);
constexpr int helpMargin = 7; // as between the panes
const QString groundKey = QStringLiteral("ground");
constexpr std::chrono::milliseconds layoutRest{1000};
const QString geometryKey = QStringLiteral("geometry");

QStringList localPaths(const QMimeData& data) {
    QStringList paths;
    for (const QUrl& url : data.urls()) {
        if (url.isLocalFile()) {
            paths << url.toLocalFile();
        }
    }
    return paths;
}

} // namespace

MainWindow::MainWindow(const Places& places, QWidget* parent)
    : QMainWindow(parent),
      settings_(places.settingsFile, QSettings::IniFormat),
      live_(document_, viewState_),
      actions_(new WindowActions(this)) {
    setAcceptDrops(true);
    build();
    files_ = new FileFlow(document_, *notices_, settings_, places.recoveryFolder, this);
    handover_ = new HandoverFlow(this);
    measurements_ = new MeasurementFlow(document_, viewState_, *notices_, *pages_, this);
    placement_ = new PlacementRun(this);
    designCommands_ = new DesignCommands(*this);
    fillMenus(*this);
    connectActions();
    connectChoices();
    connectHelp();
    connectSectionActions();
    connectDocument();
    connectPanes();
    connectTrials();
    connectHandover();
    connectMeasurements();
    connectPlacement();
    showHistory();
    showCases();
    resize(firstSize);
    restoreGeometry(settings_.value(geometryKey).toByteArray());
    area_->restore(settings_);
    // After a crash too, the window comes back as it was left.
    layoutRest_.setSingleShot(true);
    layoutRest_.setInterval(layoutRest);
    connect(&layoutRest_, &QTimer::timeout, this, &MainWindow::saveLayout);
    connect(area_, &WorkArea::layoutChanged, &layoutRest_, qOverload<>(&QTimer::start));
}

MainWindow::~MainWindow() = default;

void MainWindow::build() {
    bar_ = new TopBar(*actions_, this);
    notices_ = new NoticeStrip(this);
    chain_ = new ChainPanel(document_, viewState_, this);
    cases_ = new CasesPanel(document_, viewState_, this);
    ledger_ = new LedgerPanel(document_, viewState_, this);
    area_ = new WorkArea(chain_, cases_, ledger_, this);
    makePanes(*area_, viewState_, trials_);
    auto* about = new AboutPage(this);
    status_ = new RunStatus(this);
    help_ = new HelpPanel(HelpTexts(spokenLanguage()), this);
    setHelpTopic(*cases_, QStringLiteral("plant_case"));
    setHelpTopic(*bar_->pill(), QStringLiteral("verdict"));
    pages_ = new QStackedWidget(this);
    pages_->addWidget(area_);
    pages_->addWidget(about);

    auto* whole = new QWidget(this);
    auto* layout = new QVBoxLayout(whole);
    layout->setContentsMargins(0, 0, 0, 0);
    layout->setSpacing(0);
    layout->addWidget(bar_);
    layout->addWidget(notices_);
    auto* middle = new QHBoxLayout;
    middle->setSpacing(0);
    middle->addWidget(pages_, 1);
    auto* helpPlace = new QVBoxLayout;
    helpPlace->setContentsMargins(0, helpMargin, helpMargin, helpMargin);
    helpPlace->addWidget(help_);
    middle->addLayout(helpPlace);
    layout->addLayout(middle, 1);
    layout->addWidget(status_);
    setCentralWidget(whole);
    connect(about, &AboutPage::closed, this, [this] { showAbout(false); });
}

void MainWindow::connectActions() {
    connect(actions_->newProject, &QAction::triggered, files_, &FileFlow::newProject);
    connect(actions_->open, &QAction::triggered, files_, &FileFlow::chooseAndOpen);
    connect(actions_->save, &QAction::triggered, files_, &FileFlow::save);
    connect(actions_->saveAs, &QAction::triggered, files_, &FileFlow::saveAs);
    connect(actions_->addMeasurements, &QAction::triggered, files_, &FileFlow::chooseMeasurements);
    connect(cases_, &CasesPanel::measurementAsked, files_, &FileFlow::chooseMeasurements);
    connect(actions_->quit, &QAction::triggered, this, &QWidget::close);
    connect(actions_->undo, &QAction::triggered, &document_, &Document::undo);
    connect(actions_->redo, &QAction::triggered, &document_, &Document::redo);
    connect(actions_->addFormula, &QAction::triggered, cases_, &CasesPanel::beginFormula);
    connect(actions_->hertz, &QAction::toggled, &viewState_, &ViewState::setShowsHertz);
    connect(actions_->onlyShownCase, &QAction::triggered, this, &MainWindow::drawOnlyShownCase);
    connect(actions_->everyCase, &QAction::triggered, this,
            [this] { viewState_.setHiddenCases({}); });
    connect(actions_->printPane, &QAction::triggered, this, &MainWindow::printPane);
    connect(actions_->nextCase, &QAction::triggered, this, [this] { stepCase(1); });
    connect(actions_->previousCase, &QAction::triggered, this, [this] { stepCase(-1); });
    connect(actions_->wholePane, &QAction::triggered, this, &MainWindow::setWholePane);
    connect(actions_->allPanes, &QAction::triggered, this, [this] { area_->setWhole(nullptr); });
    connect(actions_->about, &QAction::triggered, this, [this] { showAbout(true); });
    connect(bar_, &TopBar::caseChosen, this,
            [this](int index) { viewState_.setShownCase(static_cast<std::size_t>(index)); });
    connect(bar_->pill(), &VerdictPill::clicked, this, &MainWindow::goToWorst);
}

void MainWindow::connectChoices() {
    const auto check = [](const QActionGroup& group, const QVariant& chosen) {
        for (QAction* action : group.actions()) {
            action->setChecked(action->data() == chosen);
        }
    };
    check(*actions_->grounds, static_cast<int>(rememberedGround()));
    check(*actions_->languageChoices, rememberedLanguage(settings_));
    connect(actions_->languageChoices, &QActionGroup::triggered, this,
            [this](const QAction* action) {
                rememberLanguage(settings_, action->data().toString());
                notices_->show(NoticeStrip::Kind::information,
                               tr("The language changes when the program is started next."),
                               QStringLiteral("language"));
            });
    connect(actions_->grounds, &QActionGroup::triggered, this, [this](const QAction* action) {
        applyAppearance(static_cast<Ground>(action->data().toInt()));
        settings_.setValue(groundKey, action->data());
    });
}

void MainWindow::connectHelp() {
    connect(area_, &WorkArea::helpAsked, help_, &HelpPanel::explain);
    connect(ledger_, &LedgerPanel::helpAsked, help_, &HelpPanel::explain);
    connect(actions_->explain, &QAction::triggered, this,
            [this] { help_->explain(helpTopicOf(QApplication::focusWidget())); });
    connect(actions_->windowHelp, &QAction::triggered, this,
            [this] { help_->explain(QStringLiteral("window")); });
}

void MainWindow::connectSectionActions() {
    const auto changeSelected = [this](auto change, const QString& what) {
        const std::optional<std::size_t> selected = viewState_.selectedSection();
        if (selected) {
            Section section = document_.project().compensator[*selected];
            change(section);
            document_.apply(withSectionChanged(document_.project(), *selected, section), what);
        }
    };
    connect(actions_->switchSection, &QAction::triggered, this, [changeSelected] {
        changeSelected([](Section& section) { section.enabled = !section.enabled; },
                       tr("Turn section off or on"));
    });
    connect(actions_->lockSection, &QAction::triggered, this, [changeSelected] {
        changeSelected([](Section& section) { section.locked = !section.locked; },
                       tr("Lock or unlock section"));
    });
    connect(actions_->removeSection, &QAction::triggered, this, [this] {
        const std::optional<std::size_t> selected = viewState_.selectedSection();
        if (selected) {
            const QString name = sectionText(document_.project().compensator[*selected]);
            document_.apply(withSectionRemoved(document_.project(), *selected),
                            tr("Remove %1").arg(name));
        }
    });
}

void MainWindow::connectDocument() {
    connect(&document_, &Document::historyChanged, this, &MainWindow::showHistory);
    connect(&document_, &Document::fileChanged, this, &MainWindow::showHistory);
    connect(&document_, &Document::projectChanged, this, &MainWindow::showCases);
    connect(&viewState_, &ViewState::shownCaseChanged, this, &MainWindow::showCases);
    connect(&viewState_, &ViewState::unitChanged, this, [this] {
        actions_->hertz->setChecked(viewState_.showsHertz());
        bar_->setHertz(viewState_.showsHertz());
        showContent();
    });
    connect(&live_, &LiveContent::contentChanged, this, &MainWindow::showContent);
    AssessmentRunner& runner = live_.runner();
    connect(&runner, &AssessmentRunner::busyChanged, this, [this](bool busy) {
        if (!placement_->isRunning()) {
            busy ? status_->begin(tr("Assessing every case …")) : status_->end();
        }
    });
    connect(&runner, &AssessmentRunner::failed, this, [this](const QString& why) {
        notices_->show(NoticeStrip::Kind::problem, tr("The assessment failed: %1").arg(why),
                       QStringLiteral("assessment"));
    });
    connect(status_, &RunStatus::cancelAsked, this,
            [this, &runner] { placement_->isRunning() ? placement_->cancel() : runner.cancel(); });
    chain_->setPlaceForNew([this] {
        constexpr double fallback = 10.0;
        const PaneContent& content = live_.content();
        if (!content.assessment || viewState_.shownCase() >= content.assessment->cases.size()) {
            return fallback;
        }
        const auto& crossovers = content.assessment->cases[viewState_.shownCase()]
                                     .design.figures.frequency.crossovers_rad_s;
        return crossovers.empty() ? fallback : crossovers.back();
    });
}

void MainWindow::connectPanes() {
    for (const auto& [key, pane] : area_->panes()) {
        connect(pane, &Pane::failed, this, [this](const QString& why) {
            notices_->show(NoticeStrip::Kind::problem, why, QStringLiteral("pane"));
        });
        connect(pane, &Pane::dragStarted, &document_, &Document::beginDrag);
        connect(pane, &Pane::dragMoved, &document_, &Document::previewDrag);
        connect(pane, &Pane::dragFinished, &document_, &Document::commitDrag);
        connect(pane, &Pane::dragCancelled, &document_, &Document::cancelDrag);
        connect(pane, &Pane::edited, this,
                [this](const std::shared_ptr<const Project>& proposed, const QString& what) {
                    document_.apply(*proposed, what);
                });
    }
}

void MainWindow::connectTrials() {
    followTrials(*bar_->trialMenu(), trials_);
    connect(actions_->keepTrial, &QAction::triggered, this, [this] {
        const PaneContent& content = live_.content();
        if (content.assessment) {
            trials_.keep(content.project, content.assessment);
        }
    });
    connect(actions_->showTrials, &QAction::triggered, this,
            [this] { area_->reveal(QStringLiteral("trials"), WorkArea::lower_right); });
    connect(&document_, &Document::projectReplaced, &trials_, &TrialBook::clear);
    connect(&trials_, &TrialBook::changed, this, [this] {
        const Trial* trial = trials_.comparedTrial();
        bar_->setTrialName(trial == nullptr ? QString() : trial->name);
        live_.setTrial(trial == nullptr ? nullptr : trial->assessment);
    });
}

void MainWindow::connectHandover() {
    const auto* pane = qobject_cast<RealisationPane*>(area_->pane(QStringLiteral("handover")));
    connect(&pane->exports(), &ExportRow::exportAsked, handover_, &HandoverFlow::chooseAndExport);
    connect(&pane->exports(), &ExportRow::reportAsked, handover_, &HandoverFlow::chooseAndReport);
    connect(actions_->writeReport, &QAction::triggered, handover_, &HandoverFlow::chooseAndReport);
    connect(actions_->showHandover, &QAction::triggered, this,
            [this] { area_->reveal(QStringLiteral("handover"), WorkArea::lower_right); });
    connect(handover_, &HandoverFlow::done, this, [this](const QString& sentence) {
        notices_->show(NoticeStrip::Kind::information, sentence, QStringLiteral("handover"));
    });
    connect(handover_, &HandoverFlow::failed, this, [this](const QString& sentence) {
        notices_->show(NoticeStrip::Kind::problem, sentence, QStringLiteral("handover"));
    });
}

void MainWindow::connectMeasurements() {
    connect(files_, &FileFlow::measurementsGiven, measurements_, &MeasurementFlow::takeIn);
    connect(cases_, &CasesPanel::fitAsked, measurements_, &MeasurementFlow::fit);
    connect(actions_->fitModel, &QAction::triggered, this,
            [this] { measurements_->fit(viewState_.shownCase()); });
}

void MainWindow::connectPlacement() {
    connect(actions_->place, &QAction::triggered, this, [this] {
        document_.cancelDrag();
        placement_->start(document_.shared());
        status_->begin(tr("Placing the unlocked corners …"));
    });
    connect(placement_, &PlacementRun::progressed, this, [this](double share) {
        status_->begin(tr("Placing the unlocked corners … %1 %").arg(qRound(100.0 * share)));
    });
    connect(placement_, &PlacementRun::finished, this, &MainWindow::takePlacement);
    connect(placement_, &PlacementRun::failed, this, [this](const QString& why) {
        status_->end();
        notices_->show(NoticeStrip::Kind::problem, why, QStringLiteral("placement"));
    });
}

void MainWindow::takePlacement(const ProjectPointer& start, const ProjectPointer& placed,
                               const QStringList& words) {
    status_->end();
    const QString told = words.join(QLatin1Char(' '));
    const auto take = [this, placed] { document_.apply(*placed, tr("Place corners")); };
    if (document_.project() == *start) {
        take();
        notices_->show(NoticeStrip::Kind::information, told, QStringLiteral("placement"));
        return;
    }
    // What was edited meanwhile is not overwritten unasked.
    notices_->show(NoticeStrip::Kind::question,
                   tr("The design was changed while corners were placed. %1").arg(told),
                   QStringLiteral("placement"),
                   {{tr("Take the placed corners"), take}, {tr("Keep the present design"), [] {}}});
}

void MainWindow::showContent() {
    const PaneContent& content = live_.content();
    area_->setContent(content);
    ledger_->setContent(content);
    cases_->setContent(content);
    handover_->setContent(content);
    designCommands_->setContent(content);
    bar_->pill()->setVerdict(content.assessment ? &content.assessment->verdict : nullptr,
                             viewState_.showsHertz());
}

void MainWindow::showHistory() {
    actions_->setUndo(document_.canUndo(), document_.undoText());
    actions_->setRedo(document_.canRedo(), document_.redoText());
    setWindowTitle(tr("%1[*] - Cornerwright").arg(document_.displayName()));
    setWindowModified(document_.isModified());
    setWindowFilePath(document_.filePath());
    handover_->setProjectFile(document_.isModified() ? QString() : document_.filePath());
    status_->setFacts(document_.isModified() ? tr("unsaved changes") : QString());
}

void MainWindow::showCases() {
    QStringList names;
    for (const PlantCase& plantCase : document_.project().plant_cases) {
        names << QString::fromStdString(plantCase.name);
    }
    bar_->setCases(names, static_cast<int>(viewState_.shownCase()));
}

void MainWindow::showAbout(bool on) {
    pages_->setCurrentIndex(on ? 1 : 0);
    pages_->currentWidget()->setFocus(Qt::OtherFocusReason);
}

void MainWindow::stepCase(int by) {
    const auto count = static_cast<int>(document_.project().plant_cases.size());
    if (count > 0) {
        const int next = (static_cast<int>(viewState_.shownCase()) + by + count) % count;
        viewState_.setShownCase(static_cast<std::size_t>(next));
    }
}

void MainWindow::goToWorst() {
    area_->setWhole(nullptr);
    ledger_->goToFirst();
}

void MainWindow::setWholePane() {
    QWidget* widget = QApplication::focusWidget();
    while (widget != nullptr && qobject_cast<PaneSlot*>(widget) == nullptr && widget != ledger_) {
        widget = widget->parentWidget();
    }
    area_->setWhole(widget != nullptr && widget != area_->whole() ? widget : nullptr);
}

void MainWindow::printPane() {
    for (QWidget* at = QApplication::focusWidget(); at != nullptr; at = at->parentWidget()) {
        if (auto* pane = qobject_cast<PlotPane*>(at)) {
            pane->askAndPrint();
            return;
        }
    }
    notices_->show(NoticeStrip::Kind::information,
                   tr("Click the pane to print first, or print it from the menu Panes."),
                   QStringLiteral("print"));
}

void MainWindow::drawOnlyShownCase() {
    std::set<std::size_t> hidden;
    for (std::size_t i = 0; i < document_.project().plant_cases.size(); ++i) {
        if (i != viewState_.shownCase()) {
            hidden.insert(i);
        }
    }
    viewState_.setHiddenCases(std::move(hidden));
}

void MainWindow::saveLayout() {
    settings_.setValue(geometryKey, saveGeometry());
    area_->save(settings_);
    settings_.sync();
}

Ground MainWindow::rememberedGround() const {
    return static_cast<Ground>(settings_.value(groundKey, 0).toInt());
}

void MainWindow::closeEvent(QCloseEvent* event) {
    if (!mayClose_ && document_.isModified()) {
        event->ignore();
        files_->whenSafe(
            tr("%1 has unsaved changes. Save them before leaving?").arg(document_.displayName()),
            [this] {
                mayClose_ = true;
                close();
            });
        return;
    }
    saveLayout();
    event->accept();
}

void MainWindow::dragEnterEvent(QDragEnterEvent* event) {
    if (!localPaths(*event->mimeData()).isEmpty()) {
        event->acceptProposedAction();
    }
}

void MainWindow::dropEvent(QDropEvent* event) {
    files_->take(localPaths(*event->mimeData()));
    event->acceptProposedAction();
}

void MainWindow::moveEvent(QMoveEvent* event) {
    QMainWindow::moveEvent(event);
    layoutRest_.start();
}

void MainWindow::resizeEvent(QResizeEvent* event) {
    QMainWindow::resizeEvent(event);
    layoutRest_.start();
}

bool MainWindow::event(QEvent* event) {
    if (event->type() == QEvent::StatusTip) {
        status_->setHint(static_cast<QStatusTipEvent*>(event)->tip());
        return true;
    }
    return QMainWindow::event(event);
}

} // namespace cornerwright
