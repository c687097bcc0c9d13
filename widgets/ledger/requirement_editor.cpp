#include "widgets/ledger/requirement_editor.h"

#include "widgets/figure_text.h"
#include "widgets/ledger/requirement_edits.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/parts/text_label.h"

#include <QComboBox>
#include <QHBoxLayout>
#include <QKeyEvent>
#include <QVBoxLayout>

namespace cornerwright {

namespace {

/// The member that holds the number a measure carries; null where it carries none.
double Requirement::*extraOf(Measure measure) {
    switch (measure) {
    case Measure::settling_time:
        return &Requirement::band_percent;
    case Measure::disturbance_rejection:
        return &Requirement::up_to_rad_s;
    case Measure::roll_off:
        return &Requirement::from_rad_s;
    default:
        return nullptr;
    }
}

constexpr int fieldWidth = 100;

} // namespace

RequirementEditor::RequirementEditor(QWidget* parent)
    : QWidget(parent),
      measure_(new QComboBox(this)),
      atLeast_(new QuantityField(QuantityKind::plain, this)),
      atMost_(new QuantityField(QuantityKind::plain, this)),
      extraLabel_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      extra_(new QuantityField(QuantityKind::plain, this)),
      input_(new QComboBox(this)),
      problem_(new TextLabel(QString(), TextLabel::Kind::problem, this)) {
    for (const Measure measure : all_measures()) {
        measure_->addItem(measureText(measure), static_cast<int>(measure));
    }
    measure_->setAccessibleName(tr("Measure"));
    atLeast_->setAccessibleName(tr("At least"));
    atMost_->setAccessibleName(tr("At most"));
    for (QuantityField* field : {atLeast_, atMost_}) {
        field->setMayBeEmpty(true);
        field->setStepsByKeys(false);
        field->setPlaceholderText(tr("none"));
    }
    for (QuantityField* field : {atLeast_, atMost_, extra_}) {
        field->setMaximumWidth(fieldWidth);
        connect(field, &QuantityField::problemChanged, this, &RequirementEditor::showProblem);
    }
    input_->addItem(tr("step"), static_cast<int>(ErrorInput::step));
    input_->addItem(tr("ramp"), static_cast<int>(ErrorInput::ramp));
    input_->addItem(tr("parabola"), static_cast<int>(ErrorInput::parabola));
    input_->setAccessibleName(tr("Input"));
    auto* remove = new LinkButton(tr("Remove"), this);
    auto* done = new LinkButton(tr("Done"), this);

    auto* line = new QHBoxLayout;
    line->setSpacing(8);
    line->addWidget(measure_);
    line->addWidget(new TextLabel(tr("at least"), TextLabel::Kind::muted, this));
    line->addWidget(atLeast_);
    line->addWidget(new TextLabel(tr("at most"), TextLabel::Kind::muted, this));
    line->addWidget(atMost_);
    line->addWidget(extraLabel_);
    line->addWidget(extra_);
    line->addWidget(input_);
    line->addStretch(1);
    line->addWidget(remove);
    line->addWidget(done);
    auto* whole = new QVBoxLayout(this);
    whole->setContentsMargins(10, 3, 8, 3);
    whole->setSpacing(2);
    whole->addLayout(line);
    whole->addWidget(problem_);
    problem_->hide();

    connect(measure_, &QComboBox::activated, this, &RequirementEditor::chooseMeasure);
    connect(input_, &QComboBox::activated, this, [this] {
        Requirement next = requirement_;
        next.input = static_cast<ErrorInput>(input_->currentData().toInt());
        propose(next);
    });
    connect(atLeast_, &QuantityField::valueEntered, this, [this](std::optional<double> value) {
        Requirement next = requirement_;
        next.at_least = value;
        propose(next);
    });
    connect(atMost_, &QuantityField::valueEntered, this, [this](std::optional<double> value) {
        Requirement next = requirement_;
        next.at_most = value;
        propose(next);
    });
    connect(extra_, &QuantityField::valueEntered, this,
            [this](std::optional<double> value) { enterExtra(value.value_or(0.0)); });
    connect(remove, &LinkButton::clicked, this, &RequirementEditor::removeAsked);
    connect(done, &LinkButton::clicked, this, &RequirementEditor::closed);
}

void RequirementEditor::setRequirement(const Requirement& requirement) {
    requirement_ = requirement;
    refresh();
}

void RequirementEditor::setShowsHertz(bool on) {
    for (QuantityField* field : {atLeast_, atMost_, extra_}) {
        field->setShowsHertz(on);
    }
}

void RequirementEditor::begin() {
    QuantityField* const limit = requirement_.at_least ? atLeast_ : atMost_;
    limit->setFocus(Qt::TabFocusReason);
}

void RequirementEditor::refresh() {
    const Measure measure = requirement_.measure;
    measure_->setCurrentIndex(measure_->findData(static_cast<int>(measure)));
    const QuantityKind kind = quantityOf(unit_of(measure));
    for (QuantityField* field : {atLeast_, atMost_}) {
        if (field->kind() != kind) {
            field->setKind(kind);
        }
    }
    atLeast_->setValue(requirement_.at_least);
    atMost_->setValue(requirement_.at_most);

    double Requirement::*const extra = extraOf(measure);
    extra_->setVisible(extra != nullptr);
    extraLabel_->setVisible(extra != nullptr || measure == Measure::steady_state_error);
    input_->setVisible(measure == Measure::steady_state_error);
    input_->setCurrentIndex(input_->findData(static_cast<int>(requirement_.input)));
    if (extra != nullptr) {
        const QuantityKind extraKind =
            measure == Measure::settling_time ? QuantityKind::percent : QuantityKind::frequency;
        if (extra_->kind() != extraKind) {
            extra_->setKind(extraKind);
        }
        extra_->setValue(requirement_.*extra);
    }
    switch (measure) {
    case Measure::settling_time:
        extraLabel_->setText(tr("band"));
        break;
    case Measure::disturbance_rejection:
        extraLabel_->setText(tr("up to"));
        break;
    case Measure::roll_off:
        extraLabel_->setText(tr("from"));
        break;
    default:
        extraLabel_->setText(tr("input"));
    }
    extra_->setAccessibleName(extraLabel_->text());
    problem_->hide();
}

void RequirementEditor::propose(const Requirement& next) {
    const QString problem = problemOf(next);
    showProblem(problem);
    if (problem.isEmpty()) {
        requirement_ = next;
        Q_EMIT edited(next);
    }
}

void RequirementEditor::showProblem(const QString& problem) {
    problem_->setText(QStringLiteral("✗ ") + problem);
    problem_->setVisible(!problem.isEmpty());
}

void RequirementEditor::chooseMeasure() {
    const auto measure = static_cast<Measure>(measure_->currentData().toInt());
    if (measure == requirement_.measure) {
        return;
    }
    // The place of a new one of that measure is told by the limit of a frequency it replaces, where
    // there is one.
    const double w = unit_of(requirement_.measure) == MeasureUnit::rad_s
                         ? requirement_.at_least.value_or(requirement_.at_most.value_or(1.0))
                         : 1.0;
    propose(newRequirement(measure, w));
}

void RequirementEditor::enterExtra(double value) {
    Requirement next = requirement_;
    if (double Requirement::*const extra = extraOf(next.measure)) {
        next.*extra = value;
        propose(next);
    }
}

void RequirementEditor::keyPressEvent(QKeyEvent* event) {
    if (event->key() == Qt::Key_Escape) {
        Q_EMIT closed();
        return;
    }
    QWidget::keyPressEvent(event);
}

} // namespace cornerwright
