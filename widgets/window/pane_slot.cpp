#include "widgets/window/pane_slot.h"

#include "widgets/pane.h"
#include "widgets/parts/glyph_button.h"
#include "widgets/theme.h"

#include <QContextMenuEvent>
#include <QHBoxLayout>
#include <QMenu>
#include <QPainter>
#include <QToolButton>

namespace cornerwright {

namespace {
constexpr double cornerRadius = 5.0;
}

PaneSlot::PaneSlot(bool canSwitch, QWidget* parent)
    : QFrame(parent),
      name_(new QToolButton(this)),
      help_(new GlyphButton(Glyph::help, tr("What is this?"), this)),
      whole_(new GlyphButton(Glyph::whole_window, tr("Take the whole window"), this)),
      head_(new QHBoxLayout),
      body_(new QVBoxLayout) {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(2, 3, 2, 2);
    whole->setSpacing(0);
    head_->setContentsMargins(6, 0, 6, 0);
    head_->setSpacing(6);
    head_->addWidget(name_);
    head_->addStretch(1);
    head_->addWidget(help_);
    head_->addWidget(whole_);
    whole->addLayout(head_);
    whole->addLayout(body_, 1);

    name_->setAutoRaise(true);
    name_->setToolButtonStyle(Qt::ToolButtonTextOnly);
    name_->setFont(fontOf(FontRole::strong));
    if (canSwitch) {
        // Not as the button's own menu: that draws a small mark over the text.
        menu_ = new QMenu(name_);
        name_->setToolTip(tr("Show another pane here"));
        connect(name_, &QToolButton::clicked, this, &PaneSlot::openMenu);
        connect(menu_, &QMenu::aboutToShow, this, [this] {
            menu_->clear();
            Q_EMIT menuAsked(menu_);
        });
    } else {
        name_->setFocusPolicy(Qt::NoFocus);
        name_->setAttribute(Qt::WA_TransparentForMouseEvents);
    }
    connect(help_, &GlyphButton::clicked, this, &PaneSlot::helpAsked);
    connect(whole_, &GlyphButton::clicked, this, &PaneSlot::wholeAsked);
}

void PaneSlot::setPane(Pane* pane) {
    if (pane_ == pane) {
        return;
    }
    if (Pane* before = takePane()) {
        before->hide();
    }
    pane_ = pane;
    if (pane_ == nullptr) {
        return;
    }
    name_->setText(menu_ != nullptr ? pane_->title() + QStringLiteral(" ▾") : pane_->title());
    name_->setAccessibleName(tr("Pane: %1").arg(pane_->title()));
    help_->setAccessibleName(tr("%1: what is this?").arg(pane_->title()));
    whole_->setAccessibleName(tr("%1: take the whole window").arg(pane_->title()));
    headWidget_ = pane_->headWidget();
    if (headWidget_ != nullptr) {
        head_->insertWidget(head_->indexOf(help_), headWidget_);
        headWidget_->show();
    }
    body_->addWidget(pane_);
    pane_->show();
}

Pane* PaneSlot::takePane() {
    Pane* const taken = pane_;
    pane_ = nullptr;
    if (taken != nullptr) {
        body_->removeWidget(taken);
        if (headWidget_ != nullptr) {
            head_->removeWidget(headWidget_);
            headWidget_->hide();
            headWidget_ = nullptr;
        }
    }
    return taken;
}

void PaneSlot::setWhole(bool whole) {
    whole_->setGlyph(whole ? Glyph::back_from_whole : Glyph::whole_window);
    whole_->setName(whole ? tr("Go back to all panes") : tr("Take the whole window"));
}

void PaneSlot::openMenu() {
    if (menu_ != nullptr) {
        menu_->popup(name_->mapToGlobal(QPoint(0, name_->height())));
    }
}

void PaneSlot::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    painter.setPen(theme.colour(ColourRole::hairline));
    painter.setBrush(theme.colour(ColourRole::pane));
    painter.drawRoundedRect(QRectF(rect()).adjusted(0.5, 0.5, -0.5, -0.5), cornerRadius,
                            cornerRadius);
}

void PaneSlot::contextMenuEvent(QContextMenuEvent* event) {
    if (pane_ == nullptr || pane_->actions().isEmpty()) {
        return;
    }
    QMenu menu(this);
    menu.addActions(pane_->actions());
    menu.exec(event->globalPos());
}

} // namespace cornerwright
