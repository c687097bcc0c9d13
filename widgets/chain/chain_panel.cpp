#include "widgets/chain/chain_panel.h"

#include "widgets/chain/chain_edits.h"
#include "widgets/chain/section_card.h"
#include "widgets/design/design_panel.h"
#include "widgets/document/document.h"
#include "widgets/figure_text.h"
#include "widgets/parts/link_button.h"
#include "widgets/section_drag.h"
#include "widgets/view_state.h"

#include <QMenu>
#include <QScrollArea>
#include <QVBoxLayout>

#include <algorithm>

namespace cornerwright {

namespace {
constexpr int gap = 6;
constexpr double fallbackPlace = 10.0; // rad/s, where no crossover tells a better one
} // namespace

ChainPanel::ChainPanel(Document& document, ViewState& viewState, QWidget* parent)
    : PanelFrame(tr("Chain"), parent),
      document_(document),
      viewState_(viewState),
      placeForNew_([] { return fallbackPlace; }),
      addButton_(new LinkButton(tr("+ add section"), this)),
      addMenu_(new QMenu(this)),
      designButton_(new LinkButton(tr("design"), this)),
      designMenu_(new QMenu(this)),
      design_(new DesignPanel(document, viewState, this)),
      scroll_(new QScrollArea(this)),
      list_(new QWidget),
      listLayout_(new QVBoxLayout(list_)),
      dropLine_(new QFrame(list_)) {
    for (const SectionKind kind : all_section_kinds()) {
        addMenu_->addAction(kindText(kind), this, [this, kind] { add(kind); });
    }
    addMenu_->setTitle(tr("Add section"));
    addButton_->setAccessibleName(tr("Add section"));
    connect(addButton_, &LinkButton::clicked, this,
            [this] { addMenu_->popup(addButton_->mapToGlobal(QPoint(0, addButton_->height()))); });
    designMenu_->setTitle(tr("Section design"));
    designButton_->setAccessibleName(tr("Section design"));
    designButton_->setToolTip(tr("Sections worked out from what is wanted"));
    connect(designButton_, &LinkButton::clicked, this, [this] {
        designMenu_->popup(designButton_->mapToGlobal(QPoint(0, designButton_->height())));
    });
    addToHead(designButton_);
    addToHead(addButton_);

    listLayout_->setContentsMargins(gap, 2, gap, 2);
    listLayout_->setSpacing(gap);
    listLayout_->addStretch(1);
    scroll_->setWidget(list_);
    scroll_->setWidgetResizable(true);
    scroll_->setFrameShape(QFrame::NoFrame);
    scroll_->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
    scroll_->setFocusPolicy(Qt::NoFocus);
    scroll_->setAccessibleName(tr("Sections"));
    scroll_->viewport()->setAutoFillBackground(false);
    list_->setAutoFillBackground(false);
    body()->addWidget(scroll_, 1);
    body()->addWidget(design_);
    dropLine_->setFrameShape(QFrame::HLine);
    dropLine_->setLineWidth(2);
    dropLine_->hide();

    connect(&document_, &Document::projectChanged, this, &ChainPanel::refresh);
    connect(&viewState_, &ViewState::selectedSectionChanged, this, &ChainPanel::showSelection);
    connect(&viewState_, &ViewState::unitChanged, this, [this] {
        for (SectionCard* card : cards_) {
            card->setShowsHertz(viewState_.showsHertz());
        }
    });
    refresh();
}

void ChainPanel::refresh() {
    const Chain& chain = document_.project().compensator;
    const bool sameCards =
        chain.size() == cards_.size() &&
        std::ranges::equal(chain, cards_, [](const Section& section, const SectionCard* card) {
            return section.kind == card->section().kind;
        });
    if (!sameCards) {
        rebuild(chain);
        return;
    }
    for (std::size_t i = 0; i < chain.size(); ++i) {
        cards_[i]->setSection(chain[i]);
    }
}

void ChainPanel::rebuild(const Chain& chain) {
    for (SectionCard* card : cards_) {
        card->hide();
        card->deleteLater(); // it may be the sender of the signal that led here
    }
    cards_.clear();
    for (std::size_t i = 0; i < chain.size(); ++i) {
        cards_.push_back(makeCard(i, chain[i]));
        listLayout_->insertWidget(static_cast<int>(i), cards_.back());
    }
    showSelection();
}

SectionCard* ChainPanel::makeCard(std::size_t index, const Section& section) {
    auto* card = new SectionCard(index, section, list_);
    card->setShowsHertz(viewState_.showsHertz());
    connect(card, &SectionCard::edited, this,
            [this, index](const Section& next, const QString& what) {
                document_.apply(withSectionChanged(document_.project(), index, next), what);
            });
    connect(card, &SectionCard::picked, this,
            [this, index] { viewState_.setSelectedSection(index); });
    connect(card, &SectionCard::removeAsked, this, [this, index] { remove(index); });
    connect(card, &SectionCard::moveAsked, this, [this, index](int by) {
        const auto to = static_cast<std::ptrdiff_t>(index) + by;
        if (to >= 0 && to < std::ssize(cards_)) {
            move(index, static_cast<std::size_t>(to));
        }
    });
    connect(card, &SectionCard::gripMoved, this,
            [this, index](const QPoint& global, bool dropped) { dragTo(index, global, dropped); });
    return card;
}

void ChainPanel::add(SectionKind kind) {
    const std::size_t end = document_.project().compensator.size();
    const Section section = newSection(kind, placeForNew_());
    document_.apply(withSectionAdded(document_.project(), section, end),
                    tr("Add %1").arg(kindText(kind)));
    viewState_.setSelectedSection(end);
    cards_.back()->setFocus(Qt::OtherFocusReason);
    scroll_->ensureWidgetVisible(cards_.back());
}

void ChainPanel::remove(std::size_t index) {
    const QString name = sectionText(document_.project().compensator.at(index));
    document_.apply(withSectionRemoved(document_.project(), index), tr("Remove %1").arg(name));
    if (!cards_.empty()) {
        cards_[std::min(index, cards_.size() - 1)]->setFocus(Qt::OtherFocusReason);
    }
}

void ChainPanel::move(std::size_t from, std::size_t to) {
    if (from == to) {
        return;
    }
    const QString name = sectionText(document_.project().compensator.at(from));
    document_.apply(withSectionMoved(document_.project(), from, to), tr("Move %1").arg(name));
    viewState_.setSelectedSection(to);
    cards_[to]->setFocus(Qt::OtherFocusReason);
}

void ChainPanel::dragTo(std::size_t from, const QPoint& global, bool dropped) {
    const int y = list_->mapFromGlobal(global).y();
    // The gap nearest to the mouse: as many cards stand above it as have their middle above it.
    const auto above = static_cast<std::size_t>(std::ranges::count_if(
        cards_, [y](const SectionCard* card) { return card->geometry().center().y() < y; }));
    if (dropped) {
        dropLine_->hide();
        move(from, above > from ? above - 1 : above);
        return;
    }
    const int lineY = above < cards_.size() ? cards_[above]->y() - gap / 2
                                            : cards_.back()->geometry().bottom() + gap / 2;
    dropLine_->setGeometry(gap, lineY - 1, list_->width() - 2 * gap, 3);
    dropLine_->raise();
    dropLine_->show();
}

void ChainPanel::showSelection() {
    for (std::size_t i = 0; i < cards_.size(); ++i) {
        cards_[i]->setSelected(viewState_.selectedSection() == i);
    }
    const std::optional<std::size_t> selected = viewState_.selectedSection();
    if (selected && *selected < cards_.size()) {
        scroll_->ensureWidgetVisible(cards_[*selected], 0, gap);
    }
}

} // namespace cornerwright
