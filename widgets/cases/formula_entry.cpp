#include "widgets/cases/formula_entry.h"

#include "core/numerics/error.h"
#include "core/plant/plant_case.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/text_label.h"

#include <QHBoxLayout>
#include <QKeyEvent>
#include <QLineEdit>
#include <QVBoxLayout>

namespace cornerwright {

FormulaEntry::FormulaEntry(QWidget* parent)
    : QWidget(parent),
      name_(new QLineEdit(this)),
      formula_(new QLineEdit(this)),
      problem_(new TextLabel(QString(), TextLabel::Kind::problem, this)) {
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(10, 2, 10, 2);
    whole->setSpacing(3);
    name_->setPlaceholderText(tr("name"));
    name_->setAccessibleName(tr("Name of the new case"));
    formula_->setPlaceholderText(tr("such as 42 exp(-0.0008 s) / (s (s/31 + 1))"));
    formula_->setAccessibleName(tr("Plant as a formula in s"));
    problem_->setWordWrap(true);
    problem_->hide();
    auto* buttons = new QHBoxLayout;
    auto* add = new LinkButton(tr("Add"), this);
    auto* leave = new LinkButton(tr("Cancel"), this);
    buttons->addStretch(1);
    buttons->addWidget(leave);
    buttons->addWidget(add);
    whole->addWidget(name_);
    whole->addWidget(formula_);
    whole->addWidget(problem_);
    whole->addLayout(buttons);
    connect(formula_, &QLineEdit::textEdited, this, [this] {
        const QString wrong = formula_->text().trimmed().isEmpty() ? QString() : problem();
        problem_->setText(QStringLiteral("✗ ") + wrong);
        problem_->setVisible(!wrong.isEmpty());
    });
    connect(formula_, &QLineEdit::returnPressed, this, &FormulaEntry::take);
    connect(name_, &QLineEdit::returnPressed, formula_,
            [this] { formula_->setFocus(Qt::TabFocusReason); });
    connect(add, &LinkButton::clicked, this, &FormulaEntry::take);
    connect(leave, &LinkButton::clicked, this, &QWidget::hide);
    hide();
}

void FormulaEntry::open() {
    name_->clear();
    formula_->clear();
    problem_->hide();
    show();
    name_->setFocus(Qt::OtherFocusReason);
}

QString FormulaEntry::problem() const {
    try {
        model_of(FormulaSource{formula_->text().toStdString()});
        return {};
    } catch (const InputError& error) {
        return QString::fromUtf8(error.what());
    }
}

void FormulaEntry::take() {
    const QString wrong = problem();
    problem_->setText(QStringLiteral("✗ ") + wrong);
    problem_->setVisible(!wrong.isEmpty());
    if (wrong.isEmpty()) {
        hide();
        const QString name = name_->text().trimmed();
        Q_EMIT entered(name.isEmpty() ? tr("model") : name, formula_->text().trimmed());
    }
}

void FormulaEntry::keyPressEvent(QKeyEvent* event) {
    if (event->key() == Qt::Key_Escape) {
        hide();
        return;
    }
    QWidget::keyPressEvent(event);
}

} // namespace cornerwright
