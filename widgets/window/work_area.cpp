#include "widgets/window/work_area.h"

#include "widgets/help/help_topic.h"
#include "widgets/window/pane_slot.h"

#include <QHBoxLayout>
#include <QMenu>
#include <QSettings>
#include <QSplitter>

#include <algorithm>

namespace cornerwright {

namespace {

constexpr int gap = 7;

QSplitter* makeSplitter(Qt::Orientation orientation, const QString& name, QWidget* parent) {
    auto* splitter = new QSplitter(orientation, parent);
    splitter->setObjectName(name);
    splitter->setHandleWidth(gap);
    splitter->setChildrenCollapsible(false);
    return splitter;
}

// Shares of the room, as long as nobody has moved a splitter: what is looked at most while dragging
// stands widest. Later room is shared out the same way, but the left column keeps its width.
void setShares(QSplitter* splitter, int first, int second) {
    const int room =
        splitter->orientation() == Qt::Horizontal ? splitter->width() : splitter->height();
    splitter->setSizes({room * first / (first + second), room * second / (first + second)});
}

} // namespace

WorkArea::WorkArea(QWidget* chain, QWidget* cases, QWidget* ledger, QWidget* parent)
    : QWidget(parent),
      columns_(makeSplitter(Qt::Horizontal, QStringLiteral("columns"), this)),
      left_(makeSplitter(Qt::Vertical, QStringLiteral("left"), columns_)),
      right_(makeSplitter(Qt::Vertical, QStringLiteral("right"), columns_)),
      panesRow_(makeSplitter(Qt::Horizontal, QStringLiteral("panes"), right_)),
      centre_(makeSplitter(Qt::Vertical, QStringLiteral("centre"), panesRow_)),
      side_(makeSplitter(Qt::Vertical, QStringLiteral("side"), panesRow_)) {
    auto* layout = new QHBoxLayout(this);
    layout->setContentsMargins(gap, gap, gap, gap);
    layout->addWidget(columns_);
    left_->addWidget(chain);
    left_->addWidget(cases);
    right_->addWidget(ledger);
    for (int i = 0; i < placeCount_; ++i) {
        const auto place = static_cast<Place>(i);
        slots_[place] =
            new PaneSlot(place != upper_centre, place <= lower_centre ? centre_ : side_);
        connect(slots_[place], &PaneSlot::menuAsked, this,
                [this, place](QMenu* menu) { fillMenu(menu, place); });
        connect(slots_[place], &PaneSlot::helpAsked, this,
                [this, place] { Q_EMIT helpAsked(helpTopicOf(slots_[place]->pane())); });
        connect(slots_[place], &PaneSlot::wholeAsked, this,
                [this, place] { setWhole(whole_ == slots_[place] ? nullptr : slots_[place]); });
    }
    for (const QSplitter* splitter : {columns_, left_, right_, panesRow_, centre_, side_}) {
        connect(splitter, &QSplitter::splitterMoved, this, &WorkArea::layoutChanged);
    }
    columns_->setStretchFactor(0, 0);
    columns_->setStretchFactor(1, 1);
}

void WorkArea::showEvent(QShowEvent* event) {
    QWidget::showEvent(event);
    if (std::exchange(arranged_, true)) {
        return;
    }
    layout()->activate();
    setShares(columns_, 18, 82);
    setShares(right_, 70, 30);
    setShares(panesRow_, 61, 39);
    setShares(left_, 64, 36);
    setShares(centre_, 55, 45);
    setShares(side_, 51, 49);
}

void WorkArea::addPane(const QString& key, Pane* pane) {
    setHelpTopic(*pane, QStringLiteral("pane-") + key);
    pane->hide();
    pane->setParent(this);
    panes_.emplace_back(key, pane);
    if (panes_.size() <= placeCount_) {
        slots_[panes_.size() - 1]->setPane(pane);
    }
}

Pane* WorkArea::pane(const QString& key) const {
    const auto found = std::ranges::find(panes_, key, &std::pair<QString, Pane*>::first);
    return found == panes_.end() ? nullptr : found->second;
}

bool WorkArea::isShown(const QString& key) const {
    const Pane* wanted = pane(key);
    return wanted != nullptr && std::ranges::any_of(slots_, [wanted](const PaneSlot* slot) {
               return slot->pane() == wanted;
           });
}

void WorkArea::show(const QString& key, Place place) {
    Pane* const wanted = pane(key);
    if (wanted == nullptr || slots_[place]->pane() == wanted) {
        return;
    }
    const auto other = std::ranges::find_if(
        slots_, [wanted](const PaneSlot* slot) { return slot->pane() == wanted; });
    if (other == slots_.end()) {
        slots_[place]->setPane(wanted);
    } else {
        (*other)->takePane();
        Pane* const given = slots_[place]->takePane();
        slots_[place]->setPane(wanted);
        (*other)->setPane(given);
    }
    wanted->setContent(content_);
    Q_EMIT layoutChanged();
}

void WorkArea::reveal(const QString& key, Place fallback) {
    setWhole(nullptr);
    if (!isShown(key)) {
        show(key, fallback);
    }
    if (Pane* shown = pane(key)) {
        shown->setFocus(Qt::OtherFocusReason);
    }
}

void WorkArea::fillMenu(QMenu* menu, Place place) {
    for (const auto& [key, pane] : panes_) {
        if (pane == slots_[upper_centre]->pane()) {
            continue;
        }
        QAction* action =
            menu->addAction(pane->title(), this, [this, key = key, place] { show(key, place); });
        action->setCheckable(true);
        action->setChecked(slots_[place]->pane() == pane);
    }
    if (slots_[place]->pane() != nullptr && !slots_[place]->pane()->actions().isEmpty()) {
        menu->addSeparator();
        menu->addActions(slots_[place]->pane()->actions());
    }
}

void WorkArea::setContent(const PaneContent& content) {
    content_ = content;
    for (const PaneSlot* slot : slots_) {
        if (slot->pane() != nullptr) {
            slot->pane()->setContent(content);
        }
    }
}

void WorkArea::setWhole(QWidget* widget) {
    if (whole_ == widget) {
        return;
    }
    whole_ = widget;
    setWholeFrom(widget, columns_);
    for (PaneSlot* slot : slots_) {
        slot->setWhole(slot == widget);
    }
}

void WorkArea::setWholeFrom(QWidget* widget, QSplitter* splitter) {
    for (int i = 0; i < splitter->count(); ++i) {
        QWidget* const child = splitter->widget(i);
        child->setVisible(widget == nullptr || child == widget || child->isAncestorOf(widget));
        if (auto* inner = qobject_cast<QSplitter*>(child)) {
            setWholeFrom(widget, inner);
        }
    }
}

void WorkArea::save(QSettings& settings) const {
    for (const QSplitter* splitter : {columns_, left_, right_, panesRow_, centre_, side_}) {
        settings.setValue(QStringLiteral("splitters/") + splitter->objectName(),
                          splitter->saveState());
    }
    for (int i = 0; i < placeCount_; ++i) {
        for (const auto& [key, pane] : panes_) {
            if (pane == slots_[static_cast<std::size_t>(i)]->pane()) {
                settings.setValue(QStringLiteral("places/%1").arg(i), key);
            }
        }
    }
}

void WorkArea::restore(const QSettings& settings) {
    for (QSplitter* splitter : {columns_, left_, right_, panesRow_, centre_, side_}) {
        const QByteArray state =
            settings.value(QStringLiteral("splitters/") + splitter->objectName()).toByteArray();
        arranged_ = splitter->restoreState(state) || arranged_;
        splitter->setChildrenCollapsible(false);
        splitter->setHandleWidth(gap);
    }
    for (int i = lower_centre; i < placeCount_; ++i) {
        show(settings.value(QStringLiteral("places/%1").arg(i)).toString(), static_cast<Place>(i));
    }
}

} // namespace cornerwright
