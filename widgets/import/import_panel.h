#pragma once

#include "widgets/import/import_entry.h"
#include "widgets/parts/panel_frame.h"

#include <vector>

class QListWidget;
class QPushButton;

namespace cornerwright {

class ColumnTable;
class Document;
class ImportForm;
class ResponsePreview;
class TextLabel;
class ViewState;

/// Measurement files on their way to plant cases, in place of the work area: the files, the lines
/// of the one that is looked at beside what was understood of them, its magnitude and phase, and
/// everything that can be settled. Nothing enters the project before it is taken in, as one step.
class ImportPanel : public PanelFrame {
    Q_OBJECT

  public:
    ImportPanel(Document& document, ViewState& viewState, QWidget* parent = nullptr);

    /// Adds files and looks at the first of them.
    void add(const QStringList& paths);
    /// Takes every file in that has a plant; files with open questions stay.
    void takeIn();
    /// Lets the files go; the project stays as it is.
    void dismiss();

    const std::vector<ImportEntry>& entries() const { return entries_; }
    bool isBusy() const { return runner_.isBusy(); }
    void select(int row);
    QListWidget& list() const { return *list_; }
    ColumnTable& table() const { return *table_; }
    ImportForm& form() const { return *form_; }
    ResponsePreview& preview() const { return *preview_; }
    QPushButton* takeButton() const { return take_; }

  Q_SIGNALS:
    /// Nothing is left to settle, or the person has gone back.
    void closed();
    /// Cases were added; a sentence says which and what was written.
    void taken(const QString& sentence);
    void failed(const QString& why);
    /// Something that the panel shows is different now.
    void refreshed();

  protected:
    void keyPressEvent(QKeyEvent* event) override;

  private:
    void buildLists();
    ImportEntry* shown();
    void ask(ImportEntry& entry);
    void takeLook(int id, const ImportLookPointer& look);
    void takeForm();
    void takeColumn(int column, const QString& meaning, const QString& unit);
    void removeShown();
    void settleAllAlike();
    void refreshList();
    void refreshShown();
    void refreshWords();

    Document& document_;
    ImportRunner runner_;
    std::vector<ImportEntry> entries_;
    int lastId_ = 0;
    QListWidget* list_;
    ColumnTable* table_;
    ResponsePreview* preview_;
    ImportForm* form_;
    TextLabel* words_;
    TextLabel* problem_;
    QPushButton* take_;
    QPushButton* alike_;
};

} // namespace cornerwright
