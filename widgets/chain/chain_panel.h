#pragma once

#include "core/compensator/chain.h"
#include "widgets/parts/panel_frame.h"

#include <functional>
#include <vector>

class QMenu;
class QScrollArea;
class QVBoxLayout;

namespace cornerwright {

class Document;
class DesignPanel;
class LinkButton;
class SectionCard;
class ViewState;

/// The chain as cards, with everything that can be done to it by hand or keyboard.
class ChainPanel : public PanelFrame {
    Q_OBJECT

  public:
    ChainPanel(Document& document, ViewState& viewState, QWidget* parent = nullptr);

    /// Where a new section's corners go, rad/s (the crossover of the shown case, say).
    void setPlaceForNew(std::function<double()> place) { placeForNew_ = std::move(place); }
    /// Adds a section of the kind at the end of the chain and selects it.
    void add(SectionKind kind);
    QMenu* addMenu() const { return addMenu_; }
    /// The section design in the making, below the cards.
    DesignPanel& design() const { return *design_; }
    /// The menu behind "design" in the head; whoever owns the commands fills it.
    QMenu* designMenu() const { return designMenu_; }
    const std::vector<SectionCard*>& cards() const { return cards_; }

  private:
    void refresh();
    void rebuild(const Chain& chain);
    SectionCard* makeCard(std::size_t index, const Section& section);
    void remove(std::size_t index);
    void move(std::size_t from, std::size_t to);
    void dragTo(std::size_t from, const QPoint& global, bool dropped);
    void showSelection();

    Document& document_;
    ViewState& viewState_;
    std::function<double()> placeForNew_;
    LinkButton* addButton_;
    QMenu* addMenu_;
    LinkButton* designButton_;
    QMenu* designMenu_;
    DesignPanel* design_;
    QScrollArea* scroll_;
    QWidget* list_;
    QVBoxLayout* listLayout_;
    QFrame* dropLine_;
    std::vector<SectionCard*> cards_;
};

} // namespace cornerwright
