#pragma once

#include "widgets/pane.h"
#include "widgets/parts/panel_frame.h"

#include <vector>

class QScrollArea;
class QVBoxLayout;

namespace cornerwright {

class CaseRow;
class Document;
class FormulaEntry;
class LinkButton;
class TextLabel;
class ViewState;

/// The plant cases: which are drawn, which is shown, what is known of each; measurements and
/// formulas are added here.
class CasesPanel : public PanelFrame {
    Q_OBJECT

  public:
    CasesPanel(Document& document, ViewState& viewState, QWidget* parent = nullptr);

    void setContent(const PaneContent& content);
    /// Opens the line for a formula.
    void beginFormula();
    const std::vector<CaseRow*>& rows() const { return rows_; }

  Q_SIGNALS:
    /// The person wants to choose measurement files.
    void measurementAsked();
    /// The person wants a model of the case at `index`.
    void fitAsked(std::size_t index);

  private:
    void refresh();
    void refreshMarks();
    void makeRows(std::size_t count);
    void setDrawn(std::size_t index, bool drawn);

    Document& document_;
    ViewState& viewState_;
    PaneContent content_;
    QScrollArea* scroll_;
    QWidget* list_;
    QVBoxLayout* listLayout_;
    FormulaEntry* formula_;
    TextLabel* foot_;
    LinkButton* fit_;
    std::vector<CaseRow*> rows_;
};

} // namespace cornerwright
