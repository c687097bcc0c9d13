#include "widgets/import/import_form.h"

#include "widgets/parts/quantity_field.h"

#include <QCheckBox>
#include <QComboBox>
#include <QFormLayout>
#include <QLabel>
#include <QLineEdit>
#include <QSpinBox>

#include <algorithm>

namespace cornerwright {

namespace {

constexpr int mostAverages = 100000;
/// As many as a project file allows.
constexpr int mostPoles = 100;

using EstimateMethod = EstimateOptions::Method;
using Window = EstimateOptions::Window;
using Detrend = EstimateOptions::Detrend;

template <class Value>
Value chosen(const QComboBox* box) {
    return static_cast<Value>(box->currentData().toInt());
}

template <class Value>
void choose(QComboBox* box, Value value) {
    box->setCurrentIndex(box->findData(static_cast<int>(value)));
}

std::string textOf(const QComboBox* box) {
    return box->currentData().toString().toStdString();
}

} // namespace

ImportForm::ImportForm(QWidget* parent)
    : QWidget(parent),
      form_(new QFormLayout(this)),
      name_(new QLineEdit(this)),
      holds_(new QComboBox(this)),
      parameter_(new QComboBox(this)),
      excitation_(new QComboBox(this)),
      response_(new QComboBox(this)),
      samplePeriod_(new QuantityField(QuantityKind::period, this)),
      method_(new QComboBox(this)),
      averages_(new QSpinBox(this)),
      window_(new QComboBox(this)),
      trend_(new QComboBox(this)),
      quantity_(new QComboBox(this)),
      sign_(new QCheckBox(tr("Turn the sign"), this)),
      delay_(new QuantityField(QuantityKind::time, this)),
      coherence_(new QuantityField(QuantityKind::plain, this)),
      integrators_(new QSpinBox(this)),
      unstablePoles_(new QSpinBox(this)) {
    form_->setContentsMargins(8, 4, 8, 4);
    form_->setRowWrapPolicy(QFormLayout::WrapLongRows);
    form_->setFieldGrowthPolicy(QFormLayout::AllNonFixedFieldsGrow);
    addCommonRows();
    addRecordRows();
    addPlantRows();
    for (QComboBox* box :
         {holds_, parameter_, excitation_, response_, method_, window_, trend_, quantity_}) {
        box->setSizeAdjustPolicy(QComboBox::AdjustToMinimumContentsLengthWithIcon);
        box->setMinimumContentsLength(10);
        connect(box, &QComboBox::activated, this, &ImportForm::changed);
    }
    for (QuantityField* field : {samplePeriod_, delay_, coherence_}) {
        field->setMayBeEmpty(true);
        field->setStepsByKeys(false);
        connect(field, &QuantityField::valueEntered, this, &ImportForm::changed);
    }
    for (QSpinBox* box : {averages_, integrators_, unstablePoles_}) {
        box->setKeyboardTracking(false);
        connect(box, &QSpinBox::valueChanged, this, &ImportForm::changed);
    }
    connect(sign_, &QCheckBox::toggled, this, &ImportForm::changed);
    connect(name_, &QLineEdit::editingFinished, this, &ImportForm::nameChanged);
}

void ImportForm::addCommonRows() {
    form_->addRow(tr("Case"), name_);
    holds_->addItem(tr("a frequency response"), static_cast<int>(ImportChoices::Holds::response));
    holds_->addItem(tr("a time record"), static_cast<int>(ImportChoices::Holds::time_record));
    form_->addRow(tr("File holds"), holds_);
    parameter_->addItem(tr("as usual (21, of one port 11)"), QString());
    for (const char* parameter : {"11", "21", "12", "22"}) {
        parameter_->addItem(QString::fromLatin1(parameter), QString::fromLatin1(parameter));
    }
    form_->addRow(tr("Network parameter"), parameter_);
}

void ImportForm::addRecordRows() {
    form_->addRow(tr("Excitation"), excitation_);
    form_->addRow(tr("Response"), response_);
    samplePeriod_->setPlaceholderText(tr("as the file says"));
    form_->addRow(tr("Sample period"), samplePeriod_);
    method_->addItem(tr("H1: noise on the response"), static_cast<int>(EstimateMethod::h1));
    method_->addItem(tr("H2: noise on the excitation"), static_cast<int>(EstimateMethod::h2));
    method_->addItem(tr("tone by tone: stepped sine"), static_cast<int>(EstimateMethod::tones));
    form_->addRow(tr("Estimate"), method_);
    averages_->setRange(1, mostAverages);
    form_->addRow(tr("Averages"), averages_);
    window_->addItem(tr("Hann"), static_cast<int>(Window::hann));
    window_->addItem(tr("Hamming"), static_cast<int>(Window::hamming));
    window_->addItem(tr("Blackman"), static_cast<int>(Window::blackman));
    window_->addItem(tr("rectangular"), static_cast<int>(Window::rectangular));
    form_->addRow(tr("Window"), window_);
    trend_->addItem(tr("a straight line"), static_cast<int>(Detrend::line));
    trend_->addItem(tr("the mean"), static_cast<int>(Detrend::mean));
    trend_->addItem(tr("nothing"), static_cast<int>(Detrend::none));
    form_->addRow(tr("Taken off"), trend_);
}

void ImportForm::addPlantRows() {
    quantity_->addItem(tr("the plant P"), static_cast<int>(MeasuredQuantity::plant));
    quantity_->addItem(tr("loop gain L, with this compensator"),
                       static_cast<int>(MeasuredQuantity::loop_gain));
    quantity_->addItem(tr("closed loop T, with this compensator"),
                       static_cast<int>(MeasuredQuantity::closed_loop));
    form_->addRow(tr("Measured was"), quantity_);
    form_->addRow(QString(), sign_);
    delay_->setPlaceholderText(tr("none"));
    form_->addRow(tr("Delay to take out"), delay_);
    coherence_->setPlaceholderText(tr("none"));
    coherence_->setCheck([](double least) {
        return least < 0.0 || least > 1.0 ? tr("a coherence is from 0 to 1") : QString();
    });
    form_->addRow(tr("Leave out below coherence"), coherence_);
    for (QSpinBox* box : {integrators_, unstablePoles_}) {
        box->setRange(0, mostPoles);
    }
    form_->addRow(tr("Integrators"), integrators_);
    form_->addRow(tr("Unstable poles"), unstablePoles_);
    for (int row = 0; row < form_->rowCount(); ++row) {
        QWidget* field = form_->itemAt(row, QFormLayout::FieldRole)->widget();
        if (const auto* label = qobject_cast<QLabel*>(form_->labelForField(field))) {
            field->setAccessibleName(label->text().isEmpty() ? sign_->text() : label->text());
        }
    }
}

void ImportForm::setShown(QWidget* field, bool shown) {
    field->setVisible(shown);
    if (QWidget* label = form_->labelForField(field)) {
        label->setVisible(shown);
    }
}

void ImportForm::setEntry(const ImportChoices& choices, const ImportLook& look) {
    const QSignalBlocker quiet(this);
    name_->setText(choices.name);
    choose(holds_, choices.holds);
    parameter_->setCurrentIndex(
        parameter_->findData(QString::fromStdString(choices.reading.parameter)));
    setChannels(choices, look);
    const double period = choices.record.sample_period_s;
    samplePeriod_->setValue(period > 0.0 ? std::optional(period) : std::nullopt);
    choose(method_, choices.estimate.method);
    averages_->setValue(choices.estimate.averages);
    choose(window_, choices.estimate.window);
    choose(trend_, choices.estimate.detrend);
    choose(quantity_, choices.quantity);
    sign_->setChecked(choices.reading.flip_sign);
    const double delay = choices.reading.remove_delay_s;
    delay_->setValue(delay != 0.0 ? std::optional(delay) : std::nullopt);
    const double least = choices.leastCoherence;
    coherence_->setValue(least > 0.0 ? std::optional(least) : std::nullopt);
    integrators_->setValue(choices.integrators);
    unstablePoles_->setValue(choices.unstablePoles);
    showRows(choices, look);
}

void ImportForm::setChannels(const ImportChoices& choices, const ImportLook& look) {
    for (QComboBox* box : {excitation_, response_}) {
        box->clear();
        box->addItem(tr("? choose"), QString());
        for (qsizetype i = 0; i < look.channels.size(); ++i) {
            // By number, since two columns may have one heading.
            box->addItem(look.channels[i], QString::number(i + 1));
        }
    }
    const auto find = [](QComboBox* box, const std::string& channel) {
        box->setCurrentIndex(std::max(0, box->findData(QString::fromStdString(channel))));
    };
    find(excitation_, choices.record.excitation);
    find(response_, choices.record.response);
}

void ImportForm::showRows(const ImportChoices& choices, const ImportLook& look) {
    const bool record = choices.holds == ImportChoices::Holds::time_record;
    const bool tones = choices.estimate.method == EstimateMethod::tones;
    setShown(holds_, look.preview.kind == Preview::Kind::text_table);
    setShown(parameter_, look.preview.kind == Preview::Kind::touchstone);
    for (QWidget* field : {static_cast<QWidget*>(excitation_), static_cast<QWidget*>(response_),
                           static_cast<QWidget*>(samplePeriod_), static_cast<QWidget*>(method_)}) {
        setShown(field, record);
    }
    for (QWidget* field : {static_cast<QWidget*>(averages_), static_cast<QWidget*>(window_),
                           static_cast<QWidget*>(trend_)}) {
        setShown(field, record && !tones);
    }
}

ImportChoices ImportForm::choicesFrom(ImportChoices start) const {
    start.name = name_->text().trimmed();
    start.holds = chosen<ImportChoices::Holds>(holds_);
    start.reading.parameter = textOf(parameter_);
    start.reading.flip_sign = sign_->isChecked();
    start.reading.remove_delay_s = delay_->value().value_or(0.0);
    start.record.excitation = textOf(excitation_);
    start.record.response = textOf(response_);
    start.record.sample_period_s = samplePeriod_->value().value_or(0.0);
    start.estimate.method = chosen<EstimateMethod>(method_);
    start.estimate.averages = averages_->value();
    start.estimate.window = chosen<Window>(window_);
    start.estimate.detrend = chosen<Detrend>(trend_);
    start.quantity = chosen<MeasuredQuantity>(quantity_);
    start.leastCoherence = coherence_->value().value_or(0.0);
    start.integrators = integrators_->value();
    start.unstablePoles = unstablePoles_->value();
    return start;
}

} // namespace cornerwright
