#pragma once

#include "core/engine/fleet_summary.h"
#include "widgets/pane.h"

#include <QString>

class QComboBox;
class QListWidget;
class QTableWidget;

namespace cornerwright {

class HistogramView;
class LinkButton;
class RunRow;
class TextLabel;

/// Every measured unit of a folder against the present compensator: the spread of any figure, the
/// worst units, and the files that could not be read.
class FleetPane : public Pane {
    Q_OBJECT

  public:
    FleetPane(ViewState& viewState, QWidget* parent = nullptr);

    void setContent(const PaneContent& content) override;
    QString title() const override { return tr("Fleet"); }

    void setFolder(const QString& folder);
    QString folder() const { return folder_; }
    /// Judges the fleet in the folder with the present design; asks for a folder where none is set.
    void start();
    RunRow& row() const { return *row_; }
    const HistogramView& histogram() const { return *histogram_; }
    QTableWidget* worstTable() const { return worst_; }
    QListWidget* unreadableList() const { return unreadable_; }
    QComboBox* figureChoice() const { return figure_; }
    /// Asks that the selected unit becomes a plant case.
    void takeSelected();

  Q_SIGNALS:
    /// The measurement file of a unit shall become a plant case.
    void unitAsked(const QString& path);

  private:
    struct Result {
        std::vector<Requirement> requirements;
        std::vector<FleetUnit> units;
        FleetSummary summary;
        bool stopped = false;
    };

    void chooseFolder();
    void take(const std::shared_ptr<const Project>& project, Result result);
    void fillFigures();
    void showFigure();
    void showUnits();
    void tellAge();

    PaneContent content_;
    QString folder_;
    std::shared_ptr<const Project> judged_; ///< the project of the result
    Result result_;
    TextLabel* folderLabel_;
    TextLabel* counts_;
    QComboBox* figure_;
    HistogramView* histogram_;
    QTableWidget* worst_;
    LinkButton* takeButton_;
    TextLabel* unreadableHead_;
    QListWidget* unreadable_;
    RunRow* row_;
};

} // namespace cornerwright
