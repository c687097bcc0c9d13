#include "widgets/cases/case_row.h"

#include "widgets/parts/text_label.h"
#include "widgets/theme.h"

#include <QCheckBox>
#include <QContextMenuEvent>
#include <QGridLayout>
#include <QKeyEvent>
#include <QLineEdit>
#include <QMenu>
#include <QPainter>

namespace cornerwright {

CaseRow::CaseRow(QWidget* parent)
    : QFrame(parent),
      check_(new QCheckBox(this)),
      name_(new TextLabel(QString(), TextLabel::Kind::body, this)),
      nameEdit_(new QLineEdit(this)),
      fact_(new TextLabel(QString(), TextLabel::Kind::muted, this)) {
    setFocusPolicy(Qt::StrongFocus);
    auto* grid = new QGridLayout(this);
    grid->setContentsMargins(6, 3, 6, 3);
    grid->setHorizontalSpacing(6);
    grid->setVerticalSpacing(0);
    grid->addWidget(check_, 0, 0);
    grid->addWidget(name_, 0, 1);
    grid->addWidget(nameEdit_, 0, 1);
    grid->addWidget(fact_, 1, 1);
    grid->setColumnStretch(1, 1);
    for (TextLabel* label : {name_, fact_}) {
        label->setSizePolicy(QSizePolicy::Ignored, QSizePolicy::Preferred);
    }
    nameEdit_->setAccessibleName(tr("Name of the case"));
    nameEdit_->hide();
    nameEdit_->installEventFilter(this);
    connect(check_, &QCheckBox::toggled, this, &CaseRow::drawnToggled);
}

void CaseRow::setCase(const QString& name, const QString& fact, bool binds) {
    nameText_ = name;
    factText_ = fact;
    binds_ = binds;
    name_->setText(name);
    fact_->setText(fact);
    setToolTip(fact);
    tellName();
}

void CaseRow::tellName() {
    setAccessibleName(shown_ ? tr("Plant case %1, shown").arg(nameText_)
                             : tr("Plant case %1").arg(nameText_));
    setAccessibleDescription(factText_);
    check_->setAccessibleName(tr("Draw %1").arg(nameText_));
    check_->setToolTip(tr("Draw the curves of %1 (it is judged all the same)").arg(nameText_));
    update();
}

void CaseRow::setDrawn(bool drawn) {
    const QSignalBlocker quiet(check_);
    check_->setChecked(drawn);
}

void CaseRow::setShown(bool shown) {
    shown_ = shown;
    name_->setKind(shown ? TextLabel::Kind::strong : TextLabel::Kind::body);
    tellName();
}

void CaseRow::beginNaming() {
    nameEdit_->setText(nameText_);
    name_->hide();
    nameEdit_->show();
    nameEdit_->setFocus();
    nameEdit_->selectAll();
}

void CaseRow::endNaming(bool take) {
    if (nameEdit_->isHidden()) {
        return;
    }
    const QString name = nameEdit_->text().trimmed();
    nameEdit_->hide();
    name_->show();
    setFocus();
    if (take && !name.isEmpty() && name != nameText_) {
        Q_EMIT renameAsked(name);
    }
}

bool CaseRow::eventFilter(QObject* watched, QEvent* event) {
    if (event->type() == QEvent::KeyPress) {
        const int key = static_cast<QKeyEvent*>(event)->key();
        if (key == Qt::Key_Return || key == Qt::Key_Enter || key == Qt::Key_Escape) {
            endNaming(key != Qt::Key_Escape);
            return true;
        }
    } else if (event->type() == QEvent::FocusOut) {
        endNaming(true);
    }
    return QFrame::eventFilter(watched, event);
}

void CaseRow::paintEvent(QPaintEvent*) {
    const Theme& theme = Theme::of(palette());
    QPainter painter(this);
    painter.setRenderHint(QPainter::Antialiasing);
    const QRectF frame = QRectF(rect()).adjusted(1.0, 0.5, -1.0, -0.5);
    if (shown_) {
        constexpr double tint = 0.08;
        const ColourRole role = binds_ ? ColourRole::unmet : ColourRole::accent;
        painter.setPen(theme.faint(role, 4 * tint));
        painter.setBrush(theme.faint(role, tint));
        painter.drawRoundedRect(frame, 4.0, 4.0);
    }
    if (hasFocus()) {
        painter.setPen(QPen(theme.colour(ColourRole::accent), 1.5));
        painter.setBrush(Qt::NoBrush);
        painter.drawRoundedRect(frame, 4.0, 4.0);
    }
}

void CaseRow::keyPressEvent(QKeyEvent* event) {
    switch (event->key()) {
    case Qt::Key_Space:
        check_->toggle();
        return;
    case Qt::Key_Return:
    case Qt::Key_Enter:
        Q_EMIT showAsked();
        return;
    case Qt::Key_F2:
        beginNaming();
        return;
    case Qt::Key_F:
        if (measured_) {
            Q_EMIT fitAsked();
        }
        return;
    case Qt::Key_Delete:
        Q_EMIT removeAsked();
        return;
    case Qt::Key_Up:
        focusPreviousChild();
        return;
    case Qt::Key_Down:
        focusNextChild();
        return;
    default:
        QFrame::keyPressEvent(event);
    }
}

void CaseRow::mousePressEvent(QMouseEvent* event) {
    QFrame::mousePressEvent(event);
    Q_EMIT showAsked();
}

void CaseRow::mouseDoubleClickEvent(QMouseEvent*) {
    beginNaming();
}

void CaseRow::contextMenuEvent(QContextMenuEvent* event) {
    QMenu menu(this);
    menu.addAction(tr("Show this case\tEnter"), this, &CaseRow::showAsked);
    menu.addAction(check_->isChecked() ? tr("Do not draw it\tSpace") : tr("Draw it\tSpace"), this,
                   [this] { check_->toggle(); });
    menu.addAction(tr("Rename\tF2"), this, &CaseRow::beginNaming);
    if (measured_) {
        menu.addAction(tr("Fit a model\tF"), this, &CaseRow::fitAsked);
    }
    menu.addSeparator();
    menu.addAction(tr("Remove\tDel"), this, &CaseRow::removeAsked);
    menu.exec(event->globalPos());
}

void CaseRow::focusInEvent(QFocusEvent* event) {
    QFrame::focusInEvent(event);
    update();
}

void CaseRow::focusOutEvent(QFocusEvent* event) {
    QFrame::focusOutEvent(event);
    update();
}

} // namespace cornerwright
