#pragma once

#include "widgets/pane.h"

#include <QWidget>

#include <array>
#include <utility>
#include <vector>

class QSettings;
class QSplitter;

namespace cornerwright {

class PaneSlot;

/// The three columns: the left one, the four pane slots, and the ledger below them, all between
/// splitters. Knows which pane stands in which slot.
class WorkArea : public QWidget {
    Q_OBJECT

  public:
    /// Where a pane can stand. The upper centre always shows the magnitude.
    enum Place { upper_centre, lower_centre, upper_right, lower_right, placeCount_ };

    WorkArea(QWidget* chain, QWidget* cases, QWidget* ledger, QWidget* parent = nullptr);

    /// Takes a pane in under a name for the settings. The first four take the four places.
    void addPane(const QString& key, Pane* pane);
    const std::vector<std::pair<QString, Pane*>>& panes() const { return panes_; }
    Pane* pane(const QString& key) const;

    /// Shows a pane in a place; if another place has it, the two change places.
    void show(const QString& key, Place place);
    /// Shows a pane somewhere: where it is already, else in `fallback`.
    void reveal(const QString& key, Place fallback);
    bool isShown(const QString& key) const;
    PaneSlot* slotAt(Place place) const { return slots_[place]; }

    /// One widget (a slot, the ledger) alone in the whole area; null: all again.
    void setWhole(QWidget* widget);
    QWidget* whole() const { return whole_; }

    void setContent(const PaneContent& content);

    void save(QSettings& settings) const;
    void restore(const QSettings& settings);

  Q_SIGNALS:
    /// A person wants to know what a topic of the help texts is.
    void helpAsked(const QString& topic);
    /// Splitters or the places of panes were changed by hand.
    void layoutChanged();

  protected:
    void showEvent(QShowEvent* event) override;

  private:
    void fillMenu(QMenu* menu, Place place);
    void setWholeFrom(QWidget* widget, QSplitter* splitter);

    QSplitter* columns_;
    QSplitter* left_;
    QSplitter* right_;
    QSplitter* panesRow_;
    QSplitter* centre_;
    QSplitter* side_;
    std::array<PaneSlot*, placeCount_> slots_{};
    std::vector<std::pair<QString, Pane*>> panes_;
    QWidget* whole_ = nullptr;
    bool arranged_ = false; ///< the splitters have their sizes
    PaneContent content_;
};

} // namespace cornerwright
