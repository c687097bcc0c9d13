#pragma once

#include "core/placement/tolerance.h"
#include "widgets/pane.h"

class QTableWidget;

namespace cornerwright {

class HistogramView;
class LinkButton;
class RunRow;
class TextLabel;
class ToleranceForm;

/// Seeded samples of the plants and the compensator's components inside stated spreads: yield, how
/// the smallest headroom spreads, and the worst sample to keep as a plant case.
class TolerancePane : public Pane {
    Q_OBJECT

  public:
    TolerancePane(ViewState& viewState, QWidget* parent = nullptr);

    void setContent(const PaneContent& content) override;
    QString title() const override { return tr("Tolerance"); }

    void start();
    ToleranceForm& form() const { return *form_; }
    RunRow& row() const { return *row_; }
    const HistogramView& histogram() const { return *histogram_; }
    QString yieldText() const;
    LinkButton* keepButton() const { return keep_; }

  Q_SIGNALS:
    /// The worst sample shall become a plant case.
    void keepAsked(const cornerwright::LoopPlant& plant, const QString& name);

  private:
    void take(const std::shared_ptr<const Project>& project, std::vector<std::string> plants,
              ToleranceResult result);
    void showRequirements();
    void tellAge();

    PaneContent content_;
    std::shared_ptr<const Project> judged_; ///< the project of the result
    std::vector<std::string> plants_;       ///< names, as the result counts them
    ToleranceResult result_;
    ToleranceForm* form_;
    TextLabel* yield_;
    TextLabel* worst_;
    HistogramView* histogram_;
    QTableWidget* table_;
    LinkButton* keep_;
    RunRow* row_;
};

} // namespace cornerwright
