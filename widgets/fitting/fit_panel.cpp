#include "widgets/fitting/fit_panel.h"

#include "widgets/document/document.h"
#include "widgets/figure_text.h"
#include "widgets/fitting/fit_edits.h"
#include "widgets/import/response_preview.h"
#include "widgets/parts/link_button.h"
#include "widgets/parts/quantity_field.h"
#include "widgets/parts/text_label.h"
#include "widgets/view_state.h"

#include <QCheckBox>
#include <QComboBox>
#include <QFormLayout>
#include <QKeyEvent>
#include <QPushButton>
#include <QSpinBox>
#include <QSplitter>
#include <QVBoxLayout>

namespace cornerwright {

namespace {

enum class DeadTime { found, none, given };

QString toText(const std::string& text) {
    return QString::fromStdString(text);
}

} // namespace

FitPanel::FitPanel(Document& document, ViewState& viewState, QWidget* parent)
    : PanelFrame(tr("Fit a model"), parent),
      document_(document),
      preview_(new ResponsePreview(viewState, this)),
      order_(new QSpinBox(this)),
      deadTimeChoice_(new QComboBox(this)),
      deadTime_(new QuantityField(QuantityKind::time, this)),
      stable_(new QCheckBox(tr("no poles right of the axis"), this)),
      words_(new TextLabel(QString(), TextLabel::Kind::body, this)),
      problem_(new TextLabel(QString(), TextLabel::Kind::problem, this)),
      take_(new QPushButton(tr("Take the model into the case"), this)),
      cancel_(new LinkButton(tr("stop"), this)) {
    auto* back = new LinkButton(tr("back without a model"), this);
    addToHead(cancel_);
    addToHead(back);
    addToHead(take_);
    buildChoices();
    connect(back, &QPushButton::clicked, this, &FitPanel::dismiss);
    connect(take_, &QPushButton::clicked, this, &FitPanel::take);
    connect(cancel_, &QPushButton::clicked, this, [this] {
        again_ = false;
        run_.cancel();
    });
    connect(&run_, &FitRun::progressed, this, [this](double share) {
        setNote(tr("%1, fitting … %2 %").arg(toText(caseName_)).arg(qRound(100.0 * share)));
    });
    connect(&run_, &FitRun::finished, this, &FitPanel::show);
    connect(&run_, &FitRun::failed, this, [this](const QString& why) {
        problem_->setText(why);
        refresh();
    });
    connect(&run_, &FitRun::stopped, this, [this] {
        if (std::exchange(again_, false)) {
            startFit();
        }
        refresh();
    });
    refresh();
}

void FitPanel::buildChoices() {
    order_->setRange(0, highest_fit_order);
    order_->setSpecialValueText(tr("found from the data"));
    order_->setKeyboardTracking(false);
    deadTimeChoice_->addItem(tr("found from the data"), static_cast<int>(DeadTime::found));
    deadTimeChoice_->addItem(tr("none"), static_cast<int>(DeadTime::none));
    deadTimeChoice_->addItem(tr("given"), static_cast<int>(DeadTime::given));
    deadTime_->setValue(0.0);
    deadTime_->setCheck([](double seconds) {
        return seconds < 0.0 ? tr("a dead time is not negative") : QString();
    });
    words_->setWordWrap(true);
    words_->setTextInteractionFlags(Qt::TextSelectableByMouse);
    problem_->setWordWrap(true);

    auto* side = new QWidget(this);
    auto* form = new QFormLayout(side);
    form->setRowWrapPolicy(QFormLayout::WrapLongRows);
    form->addRow(tr("Order"), order_);
    form->addRow(tr("Dead time"), deadTimeChoice_);
    form->addRow(tr("Seconds"), deadTime_);
    form->addRow(QString(), stable_);
    form->addRow(problem_);
    form->addRow(words_);
    order_->setAccessibleName(tr("Order of the model, 0: found from the data"));
    deadTimeChoice_->setAccessibleName(tr("Dead time of the model"));
    deadTime_->setAccessibleName(tr("Given dead time"));
    auto* columns = new QSplitter(Qt::Horizontal, this);
    columns->addWidget(preview_);
    columns->addWidget(side);
    columns->setStretchFactor(0, 1);
    columns->setSizes({900, 340});
    columns->setChildrenCollapsible(false);
    body()->addWidget(columns, 1);
    connect(order_, &QSpinBox::valueChanged, this, &FitPanel::startFit);
    connect(deadTimeChoice_, &QComboBox::activated, this, &FitPanel::startFit);
    connect(deadTime_, &QuantityField::valueEntered, this, &FitPanel::startFit);
    connect(stable_, &QCheckBox::toggled, this, &FitPanel::startFit);
}

std::optional<std::size_t> FitPanel::caseIndex() const {
    return indexOfCase(document_.project(), caseName_);
}

std::shared_ptr<const MeasuredResponse> FitPanel::measured() const {
    const std::optional<std::size_t> index = caseIndex();
    return index ? measuredResponseOf(document_.project().plant_cases[*index]) : nullptr;
}

bool FitPanel::open(std::size_t caseIndex) {
    const Project& project = document_.project();
    if (caseIndex >= project.plant_cases.size() ||
        !measuredResponseOf(project.plant_cases[caseIndex])) {
        return false;
    }
    caseName_ = project.plant_cases[caseIndex].name;
    result_.reset();
    startFit();
    order_->setFocus(Qt::OtherFocusReason);
    return true;
}

FitOptions FitPanel::options() const {
    FitOptions options;
    if (order_->value() > 0) {
        options.order = order_->value();
    }
    switch (static_cast<DeadTime>(deadTimeChoice_->currentData().toInt())) {
    case DeadTime::found:
        options.dead_time_s.reset();
        break;
    case DeadTime::none:
        options.dead_time_s = 0.0;
        break;
    case DeadTime::given:
        options.dead_time_s = deadTime_->value().value_or(0.0);
        break;
    }
    options.stable = stable_->isChecked();
    return options;
}

void FitPanel::startFit() {
    const std::shared_ptr<const MeasuredResponse> points = measured();
    if (!points) {
        return;
    }
    result_.reset();
    problem_->clear();
    if (run_.isRunning()) {
        again_ = true;
        run_.cancel();
    } else {
        run_.start(points, options());
    }
    refresh();
}

void FitPanel::show(const FitResult& result) {
    result_ = result;
    refresh();
}

void FitPanel::refresh() {
    const bool running = run_.isRunning();
    deadTime_->setEnabled(deadTimeChoice_->currentData().toInt() ==
                          static_cast<int>(DeadTime::given));
    setNote(running ? tr("%1, fitting …").arg(toText(caseName_)) : toText(caseName_));
    cancel_->setVisible(running);
    take_->setEnabled(result_.has_value());
    problem_->setVisible(!problem_->text().isEmpty());
    std::vector<PreviewCurve> curves;
    if (const std::shared_ptr<const MeasuredResponse> points = measured()) {
        curves.push_back(previewCurve(*points));
        if (result_) {
            curves.push_back(previewOfModel(result_->model, *points));
        }
    }
    preview_->setCurves(std::move(curves));
    words_->setText(result_ ? fitWords(*result_) : QString());
    Q_EMIT refreshed();
}

void FitPanel::take() {
    const std::optional<std::size_t> index = caseIndex();
    if (!result_ || !index) {
        return;
    }
    const QString name = toText(caseName_);
    const QString misfit = decibelText(result_->misfit_db);
    document_.apply(withFit(document_.project(), *index, *result_), tr("Fit %1").arg(name));
    Q_EMIT taken(tr("%1 has a model of order %2 now, misfit %3. Root locus and step follow it.")
                     .arg(name)
                     .arg(result_->order)
                     .arg(misfit));
    dismiss();
}

void FitPanel::dismiss() {
    again_ = false;
    run_.cancel();
    caseName_.clear();
    result_.reset();
    Q_EMIT closed();
}

void FitPanel::keyPressEvent(QKeyEvent* event) {
    if (event->key() == Qt::Key_Escape) {
        dismiss();
        return;
    }
    PanelFrame::keyPressEvent(event);
}

} // namespace cornerwright
