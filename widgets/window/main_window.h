#pragma once

#include "widgets/document/document.h"
#include "widgets/document/live_content.h"
#include "widgets/trials/trial_book.h"
#include "widgets/view_state.h"
#include "widgets/window/appearance.h"

#include <QMainWindow>
#include <QSettings>
#include <QTimer>

#include <memory>

class QStackedWidget;

namespace cornerwright {

class CasesPanel;
class ChainPanel;
class DesignCommands;
class FileFlow;
class HandoverFlow;
class HelpPanel;
class LedgerPanel;
class MeasurementFlow;
class NoticeStrip;
class PlacementRun;
class RunStatus;
class TopBar;
class WindowActions;
class WorkArea;

/// The window. It holds the document and the shared view state and connects the parts; what the
/// parts do is theirs.
class MainWindow : public QMainWindow {
    Q_OBJECT

  public:
    /// Where the window remembers its layout and recent files, and where recovery copies lie.
    struct Places {
        QString settingsFile;
        QString recoveryFolder;
    };

    explicit MainWindow(const Places& places, QWidget* parent = nullptr);
    ~MainWindow() override;

    /// The ground that was chosen in this window last.
    Ground rememberedGround() const;

    Document& document() { return document_; }
    ViewState& viewState() { return viewState_; }
    LiveContent& live() { return live_; }
    TrialBook& trials() { return trials_; }
    FileFlow& files() { return *files_; }
    HandoverFlow& handover() { return *handover_; }
    DesignCommands& designCommands() { return *designCommands_; }
    MeasurementFlow& measurements() { return *measurements_; }
    PlacementRun& placement() { return *placement_; }
    WorkArea& area() { return *area_; }
    ChainPanel& chain() { return *chain_; }
    CasesPanel& cases() { return *cases_; }
    LedgerPanel& ledger() { return *ledger_; }
    NoticeStrip& notices() { return *notices_; }
    HelpPanel& help() { return *help_; }
    WindowActions& actions() { return *actions_; }

  protected:
    void closeEvent(QCloseEvent* event) override;
    void dragEnterEvent(QDragEnterEvent* event) override;
    void dropEvent(QDropEvent* event) override;
    bool event(QEvent* event) override;
    void moveEvent(QMoveEvent* event) override;
    void resizeEvent(QResizeEvent* event) override;

  private:
    void build();
    void connectActions();
    void connectChoices();
    void connectHelp();
    void connectSectionActions();
    void connectDocument();
    void connectPanes();
    void connectTrials();
    void connectHandover();
    void connectMeasurements();
    void connectPlacement();
    void takePlacement(const ProjectPointer& start, const ProjectPointer& placed,
                       const QStringList& words);
    void showContent();
    void showHistory();
    void showCases();
    void showAbout(bool on);
    void stepCase(int by);
    void goToWorst();
    void setWholePane();
    void printPane();
    void drawOnlyShownCase();
    void saveLayout();

    QSettings settings_;
    Document document_;
    ViewState viewState_;
    LiveContent live_;
    TrialBook trials_;
    WindowActions* actions_;
    TopBar* bar_;
    NoticeStrip* notices_;
    QStackedWidget* pages_;
    ChainPanel* chain_;
    CasesPanel* cases_;
    LedgerPanel* ledger_;
    WorkArea* area_;
    RunStatus* status_;
    HelpPanel* help_;
    QTimer layoutRest_; ///< runs while the layout is being changed
    FileFlow* files_;
    HandoverFlow* handover_;
    MeasurementFlow* measurements_;
    PlacementRun* placement_;
    DesignCommands* designCommands_;
    bool mayClose_ = false;
};

} // namespace cornerwright
