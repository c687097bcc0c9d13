#pragma once

#include "widgets/pane.h"
#include "widgets/parts/panel_frame.h"

#include <optional>

class QMenu;
class QTableView;

namespace cornerwright {

class Document;
class LedgerModel;
class RequirementEditor;
class ViewState;

/// The requirement ledger with its editor. A click on a row goes to the case and the frequency
/// where the worst value stands; Enter or a double click opens the requirement for editing, delete
/// removes it.
class LedgerPanel : public PanelFrame {
    Q_OBJECT

  public:
    LedgerPanel(Document& document, ViewState& viewState, QWidget* parent = nullptr);

    void setContent(const PaneContent& content);
    /// Adds a requirement of the measure and opens it.
    void add(Measure measure);
    /// Selects the most pressing requirement and goes to where it is measured.
    void goToFirst();
    /// Shows the case that stands for this row, marks the loop and the place it is measured at.
    void goToWorst(int row);
    QMenu* addMenu() const { return addMenu_; }
    QTableView* view() const { return view_; }
    LedgerModel* model() const { return model_; }

  Q_SIGNALS:
    /// A person wants to know what a topic of the help texts is.
    void helpAsked(const QString& topic);

  protected:
    bool eventFilter(QObject* watched, QEvent* event) override;
    void changeEvent(QEvent* event) override;

  private:
    void buildView();
    void fitColumns();
    void dressHeader();
    void followTopic();
    void showRowMenu(const QPoint& at);
    void edit(std::size_t requirement);
    void endEditing();
    void removeRequirement(std::size_t requirement);
    void refreshEditor();

    Document& document_;
    ViewState& viewState_;
    PaneContent content_;
    LedgerModel* model_;
    QTableView* view_;
    RequirementEditor* editor_;
    QMenu* addMenu_;
    std::optional<std::size_t> edited_;
};

} // namespace cornerwright
