#include "widgets/parts/quantity_field.h"

#include "widgets/theme.h"

#include <QFocusEvent>
#include <QKeyEvent>
#include <QPainter>

namespace cornerwright {

namespace {
constexpr double coarseStep = 1.01;
constexpr double fineStep = 1.001;
} // namespace

QuantityField::QuantityField(QuantityKind kind, QWidget* parent) : QLineEdit(parent), kind_(kind) {
    setAlignment(Qt::AlignRight);
    connect(this, &QLineEdit::textEdited, this, [this] {
        typing_ = true;
        setProblem({});
    });
    showAtRest();
}

void QuantityField::setKind(QuantityKind kind) {
    kind_ = kind;
    setValue(std::nullopt);
}

void QuantityField::setValue(std::optional<double> value) {
    const bool same = value_ == value;
    value_ = value;
    if (typing_) {
        return; // a live change from elsewhere does not take the text out of a typing hand
    }
    if (!hasFocus()) {
        showAtRest();
    } else if (!same) {
        showExact();
    }
}

void QuantityField::setShowsHertz(bool on) {
    showsHertz_ = on;
    if (!typing_) {
        hasFocus() ? showExact() : showAtRest();
    }
}

void QuantityField::showAtRest() {
    typing_ = false;
    const ShownQuantity shown = shownQuantity(value_.value_or(0.0), kind_, showsHertz_);
    shownUnit_ = shown.unit;
    setText(value_ ? shown.text() : QString());
}

void QuantityField::showExact() {
    typing_ = false;
    shownUnit_ = shownQuantity(value_.value_or(1.0), kind_, showsHertz_).unit;
    if (!value_) {
        clear();
        return;
    }
    const ShownQuantity exact{exactNumber(*value_, kind_, shownUnit_), shownUnit_};
    setText(exact.text());
    selectAll();
}

bool QuantityField::take() {
    if (!typing_) {
        return problem_.isEmpty();
    }
    if (mayBeEmpty_ && text().trimmed().isEmpty()) {
        typing_ = false;
        setProblem({});
        if (value_) {
            value_.reset();
            Q_EMIT valueEntered(value_);
        }
        return true;
    }
    const ReadQuantity read = readQuantity(text(), kind_, shownUnit_);
    QString problem = read.problem;
    if (read.value && check_) {
        problem = check_(*read.value);
    }
    if (!problem.isEmpty()) {
        setProblem(problem);
        return false;
    }
    typing_ = false;
    setProblem({});
    if (read.value != value_) {
        value_ = read.value;
        Q_EMIT valueEntered(value_);
    }
    hasFocus() ? showExact() : showAtRest();
    return true;
}

void QuantityField::setProblem(const QString& problem) {
    if (problem_ != problem) {
        problem_ = problem;
        setToolTip(problem);
        update();
        Q_EMIT problemChanged(problem);
    }
}

void QuantityField::step(double factor) {
    if (!take() || !value_) {
        return;
    }
    const double moved = *value_ * factor;
    if (check_ && !check_(moved).isEmpty()) {
        return;
    }
    value_ = moved;
    Q_EMIT valueEntered(value_);
    showExact();
}

bool QuantityField::event(QEvent* event) {
    if (event->type() == QEvent::ShortcutOverride && !typing_) {
        const auto* key = static_cast<QKeyEvent*>(event);
        if (key->matches(QKeySequence::Undo) || key->matches(QKeySequence::Redo)) {
            // A value once taken is a step of the window's history, not of this line's.
            event->ignore();
            return false;
        }
    }
    return QLineEdit::event(event);
}

void QuantityField::focusInEvent(QFocusEvent* event) {
    QLineEdit::focusInEvent(event);
    if (!typing_) {
        showExact();
    }
}

void QuantityField::focusOutEvent(QFocusEvent* event) {
    QLineEdit::focusOutEvent(event);
    // The window losing the focus, or a context menu, is no end of typing.
    if (event->reason() == Qt::ActiveWindowFocusReason || event->reason() == Qt::PopupFocusReason) {
        return;
    }
    if (!take()) {
        setProblem({});
        typing_ = false;
    }
    showAtRest();
}

void QuantityField::paintEvent(QPaintEvent* event) {
    QLineEdit::paintEvent(event);
    if (hasFrame()) {
        return;
    }
    // Without a frame the field reads as text; a line below it tells where typing goes.
    const bool refused = !problem_.isEmpty();
    if (refused || hasFocus() || underMouse()) {
        const Theme& theme = Theme::of(palette());
        const ColourRole role = refused      ? ColourRole::unmet
                                : hasFocus() ? ColourRole::accent
                                             : ColourRole::hairline;
        QPainter painter(this);
        painter.fillRect(QRect(0, height() - 2, width(), 2), theme.colour(role));
    }
}

void QuantityField::keyPressEvent(QKeyEvent* event) {
    const bool fine = event->modifiers().testFlag(Qt::ShiftModifier);
    switch (event->key()) {
    case Qt::Key_Return:
    case Qt::Key_Enter:
        take();
        event->accept();
        return;
    case Qt::Key_Escape:
        if (!typing_) {
            event->ignore();
            return;
        }
        setProblem({});
        showExact();
        event->accept();
        return;
    case Qt::Key_Up:
    case Qt::Key_Down:
        if (stepsByKeys_) {
            const double factor = fine ? fineStep : coarseStep;
            step(event->key() == Qt::Key_Up ? factor : 1.0 / factor);
            event->accept();
            return;
        }
        break;
    default:
        break;
    }
    QLineEdit::keyPressEvent(event);
}

} // namespace cornerwright
