#include "widgets/parts/panel_frame.h"

#include "widgets/parts/text_label.h"
#include "widgets/theme.h"

#include <QHBoxLayout>
#include <QPainter>
#include <QVBoxLayout>

namespace cornerwright {

namespace {
constexpr int margin = 8;
constexpr double cornerRadius = 5.0;
} // namespace

PanelFrame::PanelFrame(const QString& title, QWidget* parent)
    : QFrame(parent),
      title_(new TextLabel(title, TextLabel::Kind::strong, this)),
      note_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      head_(new QHBoxLayout),
      body_(new QVBoxLayout) {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(1, margin / 2, 1, margin / 2);
    whole->setSpacing(2);
    head_->setContentsMargins(margin + 2, 0, margin, 0);
    head_->setSpacing(margin);
    head_->addWidget(title_);
    head_->addWidget(note_, 1);
    note_->setSizePolicy(QSizePolicy::Ignored, QSizePolicy::Preferred);
    body_->setContentsMargins(0, 0, 0, 0);
    whole->addLayout(head_);
    whole->addLayout(body_, 1);
    setAccessibleName(title);
}

void PanelFrame::setTitle(const QString& title) {
    title_->setText(title);
    setAccessibleName(title);
}

void PanelFrame::setNote(const QString& note) {
    note_->setText(note);
}

void PanelFrame::addToHead(QWidget* widget) {
    head_->addWidget(widget);
}

void PanelFrame::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    painter.setPen(theme.colour(ColourRole::hairline));
    painter.setBrush(theme.colour(ColourRole::pane));
    painter.drawRoundedRect(QRectF(rect()).adjusted(0.5, 0.5, -0.5, -0.5), cornerRadius,
                            cornerRadius);
}

} // namespace cornerwright
