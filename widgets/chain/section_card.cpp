#include "widgets/chain/section_card.h"

#include "widgets/figure_text.h"
#include "widgets/help/help_topic.h"
#include "widgets/parts/glyph_button.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/parts/text_label.h"
#include "widgets/theme.h"

#include <QContextMenuEvent>
#include <QHBoxLayout>
#include <QKeyEvent>
#include <QMenu>
#include <QPainter>
#include <QPainterPath>
#include <QVBoxLayout>

namespace cornerwright {

namespace {
constexpr int barWidth = 5;
constexpr double cornerRadius = 4.0;
} // namespace

SectionCard::SectionCard(std::size_t index, const Section& section, QWidget* parent)
    : QFrame(parent), index_(index), section_(section), cardFields_(cardFieldsOf(section.kind)) {
    setFocusPolicy(Qt::StrongFocus);
    const std::string_view kind = name_of(section.kind);
    setHelpTopic(*this, QString::fromUtf8(kind.data(), std::ssize(kind)));
    build();
    refresh();
}

void SectionCard::build() {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(barWidth + 7, 4, 6, 5);
    whole->setSpacing(1);

    auto* head = new QHBoxLayout;
    head->setSpacing(0);
    name_ = new TextLabel(QString(), TextLabel::Kind::strong, this);
    name_->setSizePolicy(QSizePolicy::Ignored, QSizePolicy::Preferred);
    nameEdit_ = new QLineEdit(this);
    nameEdit_->setAccessibleName(tr("Name of the section"));
    nameEdit_->hide();
    nameEdit_->installEventFilter(this);
    lock_ = new GlyphButton(Glyph::unlocked, tr("Lock"), this);
    switch_ = new GlyphButton(Glyph::on, tr("Turn off"), this);
    grip_ = new GlyphButton(Glyph::grip, tr("Drag to move in the chain"), this);
    grip_->setCursor(Qt::OpenHandCursor);
    grip_->setFocusPolicy(Qt::NoFocus);
    grip_->installEventFilter(this);
    head->addWidget(name_, 1);
    head->addWidget(nameEdit_, 1);
    head->addWidget(lock_);
    head->addWidget(switch_);
    head->addWidget(grip_);
    whole->addLayout(head);

    for (std::size_t i = 0; i < cardFields_.size(); ++i) {
        auto* row = new QWidget(this);
        auto* line = new QHBoxLayout(row);
        line->setContentsMargins(0, 0, 0, 0);
        line->setSpacing(6);
        auto* label = new TextLabel(cardFields_[i].label, TextLabel::Kind::muted, row);
        auto* field = new QuantityField(cardFields_[i].kind, row);
        field->setFrame(false);
        label->setBuddy(field);
        line->addWidget(label);
        line->addWidget(field, 1);
        whole->addWidget(row);
        rows_.push_back(row);
        fields_.push_back(field);
        field->setCheck([this, i](double value) {
            Section next = section_;
            cardFields_[i].write(next, value);
            return problemOf(next);
        });
        connect(field, &QuantityField::valueEntered, this, [this, i](std::optional<double> value) {
            if (value) {
                enter(i, *value);
            }
        });
        connect(field, &QuantityField::problemChanged, this, &SectionCard::showProblem);
        connect(field, &QuantityField::selectionChanged, this, [this, field] {
            if (field->hasFocus()) {
                Q_EMIT picked();
            }
        });
    }
    fact_ = new TextLabel(QString(), TextLabel::Kind::muted, this);
    fact_->setAlignment(Qt::AlignRight);
    fact_->setSizePolicy(QSizePolicy::Ignored, QSizePolicy::Preferred);
    problem_ = new TextLabel(QString(), TextLabel::Kind::problem, this);
    problem_->setWordWrap(true);
    problem_->hide();
    whole->addWidget(fact_);
    whole->addWidget(problem_);

    connect(lock_, &GlyphButton::clicked, this, &SectionCard::toggleLocked);
    connect(switch_, &GlyphButton::clicked, this, &SectionCard::toggleEnabled);
}

void SectionCard::setSection(const Section& section) {
    if (section_ != section) {
        section_ = section;
        refresh();
    }
}

void SectionCard::setShowsHertz(bool on) {
    hertz_ = on;
    for (QuantityField* field : fields_) {
        field->setShowsHertz(on);
    }
    refresh();
}

void SectionCard::setSelected(bool on) {
    if (selected_ != on) {
        selected_ = on;
        update();
    }
}

void SectionCard::refresh() {
    const QString name = sectionText(section_);
    name_->setText(name);
    name_->setKind(section_.enabled ? TextLabel::Kind::strong : TextLabel::Kind::muted);
    setAccessibleName(section_.enabled ? tr("Section %1: %2").arg(index_ + 1).arg(name)
                                       : tr("Section %1: %2, off").arg(index_ + 1).arg(name));
    for (std::size_t i = 0; i < fields_.size(); ++i) {
        rows_[i]->setVisible(section_.enabled);
        fields_[i]->setValue(cardFields_[i].read(section_));
        fields_[i]->setAccessibleName(tr("%1, %2").arg(name, cardFields_[i].label));
        fields_[i]->setReadOnly(section_.locked);
    }
    lock_->setGlyph(section_.locked ? Glyph::locked : Glyph::unlocked);
    lock_->setName(section_.locked ? tr("Unlock %1").arg(name)
                                   : tr("Lock %1: its corners stay where they are").arg(name));
    switch_->setGlyph(section_.enabled ? Glyph::on : Glyph::off);
    switch_->setName(section_.enabled ? tr("Turn %1 off").arg(name) : tr("Turn %1 on").arg(name));
    grip_->setAccessibleName(tr("Move %1").arg(name));
    const QString fact =
        section_.enabled ? factOf(section_, hertz_) : tr("off · press space to turn on");
    fact_->setText(fact);
    fact_->setVisible(!fact.isEmpty());
    update();
}

void SectionCard::showProblem(const QString& problem) {
    problem_->setText(QStringLiteral("✗ ") + problem);
    problem_->setVisible(!problem.isEmpty());
}

void SectionCard::enter(std::size_t field, double value) {
    Section next = section_;
    cardFields_[field].write(next, value);
    Q_EMIT edited(next, tr("Change %1 of %2").arg(cardFields_[field].label, sectionText(section_)));
}

void SectionCard::toggleEnabled() {
    Section next = section_;
    next.enabled = !section_.enabled;
    const QString what = next.enabled ? tr("Turn %1 on") : tr("Turn %1 off");
    Q_EMIT edited(next, what.arg(sectionText(section_)));
}

void SectionCard::toggleLocked() {
    Section next = section_;
    next.locked = !section_.locked;
    const QString what = next.locked ? tr("Lock %1") : tr("Unlock %1");
    Q_EMIT edited(next, what.arg(sectionText(section_)));
}

void SectionCard::beginNaming() {
    nameEdit_->setText(QString::fromStdString(section_.label));
    nameEdit_->setPlaceholderText(kindText(section_.kind));
    name_->hide();
    nameEdit_->show();
    nameEdit_->setFocus();
    nameEdit_->selectAll();
}

void SectionCard::endNaming(bool take) {
    if (nameEdit_->isHidden()) {
        return;
    }
    const std::string label = nameEdit_->text().trimmed().toStdString();
    nameEdit_->hide();
    name_->show();
    setFocus();
    if (take && label != section_.label) {
        Section next = section_;
        next.label = label;
        Q_EMIT edited(next, tr("Rename %1").arg(sectionText(section_)));
    }
}

bool SectionCard::eventFilter(QObject* watched, QEvent* event) {
    if (watched == grip_) {
        const bool released = event->type() == QEvent::MouseButtonRelease;
        if (released || (event->type() == QEvent::MouseMove &&
                         static_cast<QMouseEvent*>(event)->buttons().testFlag(Qt::LeftButton))) {
            Q_EMIT gripMoved(static_cast<QMouseEvent*>(event)->globalPosition().toPoint(),
                             released);
        }
        return false;
    }
    if (watched == nameEdit_ && event->type() == QEvent::KeyPress) {
        const int key = static_cast<QKeyEvent*>(event)->key();
        if (key == Qt::Key_Return || key == Qt::Key_Enter || key == Qt::Key_Escape) {
            endNaming(key != Qt::Key_Escape);
            return true;
        }
    }
    if (watched == nameEdit_ && event->type() == QEvent::FocusOut) {
        endNaming(true);
    }
    return QFrame::eventFilter(watched, event);
}

void SectionCard::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    const QRectF frame = QRectF(rect()).adjusted(0.75, 0.75, -0.75, -0.75);
    const QColor colour =
        section_.enabled ? theme.section(index_) : theme.colour(ColourRole::hairline);
    QPainterPath outline;
    outline.addRoundedRect(frame, cornerRadius, cornerRadius);
    painter.fillPath(outline,
                     theme.colour(section_.enabled ? ColourRole::pane : ColourRole::paper));
    painter.setClipPath(outline);
    painter.fillRect(QRectF(frame.left(), frame.top(), barWidth, frame.height()), colour);
    painter.setClipping(false);
    const QColor edge = selected_ ? theme.section(index_) : theme.colour(ColourRole::hairline);
    painter.strokePath(outline, QPen(edge, selected_ ? 2.0 : 1.0));
    if (hasFocus()) {
        painter.setPen(QPen(theme.colour(ColourRole::accent), 1.5, Qt::DotLine));
        painter.drawRoundedRect(frame.adjusted(2.5, 2.5, -2.5, -2.5), cornerRadius, cornerRadius);
    }
}

void SectionCard::keyPressEvent(QKeyEvent* event) {
    const bool alt = event->modifiers().testFlag(Qt::AltModifier);
    switch (event->key()) {
    case Qt::Key_Space:
        toggleEnabled();
        return;
    case Qt::Key_Delete:
    case Qt::Key_Backspace:
        Q_EMIT removeAsked();
        return;
    case Qt::Key_L:
        toggleLocked();
        return;
    case Qt::Key_F2:
        beginNaming();
        return;
    case Qt::Key_Up:
    case Qt::Key_Down:
        if (alt) {
            Q_EMIT moveAsked(event->key() == Qt::Key_Up ? -1 : 1);
            return;
        }
        event->key() == Qt::Key_Up ? focusPreviousChild() : focusNextChild();
        return;
    case Qt::Key_Return:
    case Qt::Key_Enter:
        if (!fields_.empty() && section_.enabled) {
            fields_.front()->setFocus(Qt::TabFocusReason);
        }
        return;
    default:
        QFrame::keyPressEvent(event);
    }
}

void SectionCard::mousePressEvent(QMouseEvent* event) {
    Q_EMIT picked();
    QFrame::mousePressEvent(event);
}

void SectionCard::mouseDoubleClickEvent(QMouseEvent* event) {
    if (name_->geometry().contains(event->position().toPoint())) {
        beginNaming();
    }
}

void SectionCard::focusInEvent(QFocusEvent* event) {
    QFrame::focusInEvent(event);
    Q_EMIT picked();
    update();
}

void SectionCard::focusOutEvent(QFocusEvent* event) {
    QFrame::focusOutEvent(event);
    update();
}

void SectionCard::contextMenuEvent(QContextMenuEvent* event) {
    QMenu menu(this);
    menu.addAction(section_.enabled ? tr("Turn off\tSpace") : tr("Turn on\tSpace"), this,
                   &SectionCard::toggleEnabled);
    menu.addAction(section_.locked ? tr("Unlock\tL") : tr("Lock\tL"), this,
                   &SectionCard::toggleLocked);
    menu.addAction(tr("Rename\tF2"), this, &SectionCard::beginNaming);
    menu.addSeparator();
    menu.addAction(tr("Move up\tAlt+Up"), this, [this] { Q_EMIT moveAsked(-1); });
    menu.addAction(tr("Move down\tAlt+Down"), this, [this] { Q_EMIT moveAsked(1); });
    menu.addSeparator();
    menu.addAction(tr("Remove\tDel"), this, &SectionCard::removeAsked);
    menu.exec(event->globalPos());
}

} // namespace cornerwright
