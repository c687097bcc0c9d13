#include "widgets/handover/realisation_pane.h"

#include "widgets/handover/export_row.h"
#include "widgets/handover/limited_step_view.h"
#include "widgets/handover/study_run.h"
#include "widgets/handover/study_view.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/parts/text_label.h"
#include "widgets/view_state.h"

#include <QCheckBox>
#include <QComboBox>
#include <QGridLayout>
#include <QScrollArea>
#include <QVBoxLayout>

#include <algorithm>
#include <numbers>

namespace cornerwright {

namespace {

constexpr double firstPeriod = 1e-3; // s, where the project did not sample before
constexpr double firstLimit = 1.0;   // of the output, until the user says what the actuator can do

template <typename Value>
void choose(QComboBox& box, Value value) {
    box.setCurrentIndex(box.findData(static_cast<int>(value)));
}

QString outcomeText(const Assessment& assessment) {
    if (!assessment.realisation_problem.empty()) {
        return QString::fromStdString(assessment.realisation_problem);
    }
    if (!assessment.equation) {
        return RealisationPane::tr("No difference equation: only the design loop is judged.");
    }
    QStringList lines{
        RealisationPane::tr("%1 second-order sections").arg(assessment.equation->sections.size())};
    for (const std::string& note : assessment.equation->notes) {
        lines << QString::fromStdString(note);
    }
    return lines.join(QLatin1Char('\n'));
}

} // namespace

RealisationPane::RealisationPane(ViewState& viewState, QWidget* parent)
    : Pane(viewState, parent),
      period_(new QuantityField(QuantityKind::period, this)),
      delay_(new QuantityField(QuantityKind::time, this)),
      includesHold_(new QCheckBox(this)),
      realise_(new QCheckBox(this)),
      method_(new QComboBox(this)),
      match_(new QuantityField(QuantityKind::frequency, this)),
      structure_(new QComboBox(this)),
      format_(new QComboBox(this)),
      wordBits_(new QComboBox(this)),
      fractionBits_(new QuantityField(QuantityKind::count, this)),
      limits_(new QCheckBox(this)),
      lowest_(new QuantityField(QuantityKind::plain, this)),
      highest_(new QuantityField(QuantityKind::plain, this)),
      outcome_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      problem_(new TextLabel(QString(), TextLabel::Kind::problem, this)),
      exports_(new ExportRow(this)),
      study_(new StudyView(this)),
      limitedStep_(new LimitedStepView(this)),
      limitedSentence_(new TextLabel(QString(), TextLabel::Kind::muted, this)),
      run_(new StudyRun(this)) {
    build();
    connectFields();
    connectLimits();
    connectStudy();
    connect(&viewState, &ViewState::unitChanged, this, [this] {
        match_->setShowsHertz(this->viewState().showsHertz());
        study_->setShowsHertz(this->viewState().showsHertz());
    });
    setFocusProxy(period_);
}

void RealisationPane::addRow(QGridLayout& grid, const QString& label, QWidget* field) {
    const int row = grid.rowCount();
    auto* name = new TextLabel(label, TextLabel::Kind::muted, this);
    name->setBuddy(field);
    if (field == match_) {
        matchLabel_ = name;
    }
    field->setAccessibleName(label);
    grid.addWidget(name, row, 0);
    grid.addWidget(field, row, 1);
}

void RealisationPane::buildFields(QGridLayout& grid) {
    grid.setHorizontalSpacing(12);
    grid.setVerticalSpacing(4);
    const auto addWide = [&grid](QWidget* field) {
        grid.addWidget(field, grid.rowCount(), 0, 1, 2);
    };
    addRow(grid, tr("Sample period or rate"), period_);
    addRow(grid, tr("Computation delay"), delay_);
    addWide(includesHold_);
    addWide(realise_);
    addRow(grid, tr("Method"), method_);
    addRow(grid, tr("Exact at"), match_);
    addRow(grid, tr("Structure"), structure_);
    addRow(grid, tr("Number format"), format_);
    addRow(grid, tr("Word length"), wordBits_);
    addRow(grid, tr("Fraction bits"), fractionBits_);
    addWide(limits_);
    addRow(grid, tr("Lowest output"), lowest_);
    addRow(grid, tr("Highest output"), highest_);
    grid.setColumnStretch(1, 1);
}

void RealisationPane::build() {
    includesHold_->setText(tr("design loop counts hold and delay"));
    realise_->setText(tr("judge the difference equation"));
    limits_->setText(tr("limit the output, with conditional integration"));
    for (const Method method :
         {Method::tustin, Method::tustin_at_corners, Method::tustin_at, Method::matched_roots,
          Method::step_invariant, Method::ramp_invariant}) {
        method_->addItem(methodText(method), static_cast<int>(method));
    }
    structure_->addItem(tr("direct form 1"), static_cast<int>(Structure::direct_form_1));
    structure_->addItem(tr("direct form 2 transposed"),
                        static_cast<int>(Structure::direct_form_2_transposed));
    structure_->addItem(tr("delta operator"), static_cast<int>(Structure::delta));
    format_->addItem(tr("64-bit floating point"), static_cast<int>(NumberFormat::Type::float64));
    format_->addItem(tr("32-bit floating point"), static_cast<int>(NumberFormat::Type::float32));
    format_->addItem(tr("fixed point"), static_cast<int>(NumberFormat::Type::fixed));
    for (const int bits : {16, 32}) {
        wordBits_->addItem(tr("%1 bits").arg(bits), bits);
    }

    for (QComboBox* box : {method_, structure_, format_, wordBits_}) {
        constexpr int leastCharacters = 8;
        box->setSizeAdjustPolicy(QComboBox::AdjustToMinimumContentsLengthWithIcon);
        box->setMinimumContentsLength(leastCharacters);
    }

    auto* grid = new QGridLayout;
    buildFields(*grid);
    // The panel is longer than a small pane; it scrolls there.
    auto* scroll = new QScrollArea(this);
    auto* content = new QWidget;
    scroll->setWidget(content);
    scroll->setWidgetResizable(true);
    scroll->setFrameShape(QFrame::NoFrame);
    scroll->setFocusPolicy(Qt::NoFocus);
    scroll->setHorizontalScrollBarPolicy(Qt::ScrollBarAlwaysOff);
    scroll->setAccessibleName(tr("Sampling, realisation and handover"));
    scroll->viewport()->setAutoFillBackground(false);
    content->setAutoFillBackground(false);
    auto* frame = new QVBoxLayout(this);
    frame->setContentsMargins(0, 0, 0, 0);
    frame->addWidget(scroll);
    auto* whole = new QVBoxLayout(content);
    whole->setContentsMargins(10, 4, 10, 6);
    whole->addLayout(grid);
    whole->addWidget(outcome_);
    whole->addWidget(problem_);
    whole->addWidget(limitedStep_);
    whole->addWidget(limitedSentence_);
    whole->addWidget(study_);
    whole->addWidget(exports_);
    whole->addStretch(1);
    limitedSentence_->setWordWrap(true);
    limitedSentence_->setVisible(false);
    outcome_->setWordWrap(true);
    problem_->setWordWrap(true);
}

void RealisationPane::connectFields() {
    const auto positive = [](double value) {
        return value > 0.0 ? QString() : tr("Expected a value above zero.");
    };
    period_->setCheck(positive);
    match_->setCheck(positive);
    delay_->setCheck([](double value) {
        return value >= 0.0 ? QString() : tr("Expected a delay of zero or more.");
    });
    fractionBits_->setCheck([this](double value) {
        const int word = wordBits_->currentData().toInt();
        return value == static_cast<int>(value) && value >= 0.0 && value < word
                   ? QString()
                   : tr("Expected a whole number from 0 to %1.").arg(word - 1);
    });
    fractionBits_->setStepsByKeys(false);
    for (QuantityField* field : {period_, delay_, match_, fractionBits_}) {
        connect(field, &QuantityField::problemChanged, problem_, &QLabel::setText);
    }
    connect(period_, &QuantityField::valueEntered, this, [this](std::optional<double> value) {
        change(tr("Change sample period"),
               [&](Project& project) { project.sampling->sample_period_s = *value; });
    });
    connect(delay_, &QuantityField::valueEntered, this, [this](std::optional<double> value) {
        change(tr("Change computation delay"),
               [&](Project& project) { project.sampling->computation_delay_s = *value; });
    });
    connect(includesHold_, &QCheckBox::clicked, this, [this](bool on) {
        change(tr("Count hold in the design loop"),
               [on](Project& project) { project.sampling->design_includes_hold = on; });
    });
    connect(realise_, &QCheckBox::clicked, this, [this](bool on) {
        change(tr("Judge the difference equation"), [on](Project& project) {
            project.realisation = on ? std::optional(Realisation{}) : std::nullopt;
        });
    });
    connect(match_, &QuantityField::valueEntered, this, [this](std::optional<double> value) {
        change(tr("Change matched frequency"),
               [&](Project& project) { project.realisation->match_rad_s = *value; });
    });
    connect(fractionBits_, &QuantityField::valueEntered, this, [this](std::optional<double> value) {
        change(tr("Change fraction bits"), [&](Project& project) {
            project.realisation->number_format.fraction_bits = static_cast<int>(*value);
        });
    });
    connect(method_, &QComboBox::activated, this, [this] {
        change(tr("Change method"), [this](Project& project) {
            project.realisation->method = static_cast<Method>(method_->currentData().toInt());
            if (project.realisation->match_rad_s <= 0.0) {
                // A tenth of half the rate: inside the band until the user says where.
                constexpr double share = 0.1 * std::numbers::pi;
                project.realisation->match_rad_s = share / project.sampling->sample_period_s;
            }
        });
    });
    connect(structure_, &QComboBox::activated, this, [this] {
        change(tr("Change structure"), [this](Project& project) {
            project.realisation->structure =
                static_cast<Structure>(structure_->currentData().toInt());
        });
    });
    connect(format_, &QComboBox::activated, this, [this] {
        change(tr("Change number format"), [this](Project& project) {
            project.realisation->number_format.type =
                static_cast<NumberFormat::Type>(format_->currentData().toInt());
        });
    });
    connect(wordBits_, &QComboBox::activated, this, [this] {
        change(tr("Change word length"), [this](Project& project) {
            NumberFormat& format = project.realisation->number_format;
            format.word_bits = wordBits_->currentData().toInt();
            format.fraction_bits = std::min(format.fraction_bits, format.word_bits - 1);
        });
    });
}

void RealisationPane::connectLimits() {
    for (QuantityField* field : {lowest_, highest_}) {
        field->setStepsByKeys(false);
        connect(field, &QuantityField::problemChanged, problem_, &QLabel::setText);
        connect(field, &QuantityField::valueEntered, this, &RealisationPane::changeLimits);
    }
    lowest_->setCheck([this](double value) {
        return value < highest_->value().value_or(firstLimit)
                   ? QString()
                   : tr("Expected a value below the highest output.");
    });
    highest_->setCheck([this](double value) {
        return value > lowest_->value().value_or(-firstLimit)
                   ? QString()
                   : tr("Expected a value above the lowest output.");
    });
    connect(limits_, &QCheckBox::clicked, this, &RealisationPane::changeLimits);
}

void RealisationPane::changeLimits() {
    change(tr("Change output limits"), [this](Project& project) {
        if (!limits_->isChecked()) {
            project.realisation->output_limits.reset();
            return;
        }
        project.realisation->output_limits = OutputLimits{lowest_->value().value_or(-firstLimit),
                                                          highest_->value().value_or(firstLimit)};
    });
}

void RealisationPane::connectStudy() {
    connect(run_, &StudyRun::stepReady, this, [this](const auto& step) {
        const auto& realisation = content_.project->realisation;
        if (realisation && realisation->output_limits) {
            limitedStep_->setStep(step, *realisation->output_limits);
            limitedSentence_->setText(limitedStep_->sentence());
            limitedSentence_->setVisible(true);
        }
    });
    connect(run_, &StudyRun::studyReady, this,
            [this](const auto& study) { study_->setStudy(content_.project, study); });
    connect(study_, &StudyView::methodChosen, this, [this](Method method) {
        choose(*method_, method);
        Q_EMIT method_->activated(method_->currentIndex());
    });
    connect(&viewState(), &ViewState::shownCaseChanged, this, &RealisationPane::wantStudy);
}

void RealisationPane::wantStudy() {
    const bool realised = content_.project && content_.project->realisation;
    if (!realised || !content_.project->realisation->output_limits) {
        limitedStep_->clear();
        limitedSentence_->setVisible(false);
    }
    if (!realised || !content_.assessment) {
        run_->stop();
        study_->setStudy(nullptr, nullptr);
        return;
    }
    if (isVisible()) {
        study_->setPending();
        run_->want({content_.project, content_.assessment, viewState().shownCase()});
    }
}

void RealisationPane::showEvent(QShowEvent* event) {
    Pane::showEvent(event);
    wantStudy();
}

void RealisationPane::change(const QString& what, const std::function<void(Project&)>& edit) {
    if (!content_.project) {
        return;
    }
    auto next = std::make_shared<Project>(*content_.project);
    if (!next->sampling) {
        next->sampling = Sampling{.sample_period_s = firstPeriod};
    }
    edit(*next);
    Q_EMIT edited(std::move(next), what);
}

void RealisationPane::setContent(const PaneContent& content) {
    const bool other = content.assessment != content_.assessment;
    content_ = content;
    refresh();
    if (other) {
        wantStudy();
    }
}

void RealisationPane::refresh() {
    exports_->setAssessment(content_.assessment.get());
    setEnabled(content_.project != nullptr);
    if (!content_.project) {
        return;
    }
    const std::optional<Sampling>& sampling = content_.project->sampling;
    const std::optional<Realisation>& realisation = content_.project->realisation;
    period_->setValue(sampling ? std::optional(sampling->sample_period_s) : std::nullopt);
    delay_->setValue(sampling ? std::optional(sampling->computation_delay_s) : std::nullopt);
    includesHold_->setChecked(sampling && sampling->design_includes_hold);
    realise_->setChecked(realisation.has_value());
    const Realisation shown = realisation.value_or(Realisation{});
    choose(*method_, shown.method);
    choose(*structure_, shown.structure);
    choose(*format_, shown.number_format.type);
    choose(*wordBits_, shown.number_format.word_bits);
    match_->setValue(shown.match_rad_s);
    fractionBits_->setValue(shown.number_format.fraction_bits);
    const bool fixed = shown.number_format.type == NumberFormat::Type::fixed;
    for (QWidget* field : std::initializer_list<QWidget*>{method_, structure_, format_}) {
        field->setEnabled(realisation.has_value());
    }
    wordBits_->setEnabled(realisation && fixed);
    fractionBits_->setEnabled(realisation && fixed);
    limits_->setEnabled(realisation.has_value());
    limits_->setChecked(shown.output_limits.has_value());
    for (QuantityField* field : {lowest_, highest_}) {
        field->setEnabled(shown.output_limits.has_value());
    }
    lowest_->setValue(shown.output_limits ? std::optional(shown.output_limits->at_least)
                                          : std::nullopt);
    highest_->setValue(shown.output_limits ? std::optional(shown.output_limits->at_most)
                                           : std::nullopt);
    const bool matches = shown.method == Method::tustin_at;
    match_->setVisible(matches);
    matchLabel_->setVisible(matches);
    outcome_->setText(content_.assessment ? outcomeText(*content_.assessment) : QString());
}

} // namespace cornerwright
