#pragma once

#include "widgets/pane.h"

class QTableWidget;
class QVBoxLayout;

namespace cornerwright {

class TextLabel;
class TrialBook;

/// The kept trials, and how their figures differ from the present design.
class TrialsPane : public Pane {
    Q_OBJECT

  public:
    TrialsPane(ViewState& viewState, TrialBook& book, QWidget* parent = nullptr);

    void setContent(const PaneContent& content) override;
    QString title() const override { return tr("Trials"); }

  private:
    void showTrials();
    void showDifferences();
    QWidget* makeRow(std::size_t index);

    TrialBook& book_;
    PaneContent content_;
    QWidget* rows_ = nullptr;
    QVBoxLayout* layout_;
    TextLabel* hint_;
    QTableWidget* table_;
};

} // namespace cornerwright
