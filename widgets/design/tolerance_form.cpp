#include "widgets/design/tolerance_form.h"

#include "widgets/parts/quantity_field.h"
#include "widgets/parts/text_label.h"

#include <QComboBox>
#include <QGridLayout>

namespace cornerwright {

namespace {

constexpr double firstGainPercent = 10.0;
constexpr double firstCornerPercent = 5.0;
constexpr std::size_t firstSamples = 500;
constexpr double mostSamples = 1e6;
constexpr double mostSeed = 1e9;
constexpr double mostPercent = 99.9;
constexpr int columns = 2;

} // namespace

ToleranceForm::ToleranceForm(QWidget* parent) : QWidget(parent), shape_(new QComboBox(this)) {
    options_.spreads.plant_gain_percent = firstGainPercent;
    options_.spreads.plant_corner_percent = firstCornerPercent;
    options_.samples = firstSamples;
    auto* grid = new QGridLayout(this);
    grid->setContentsMargins(0, 0, 0, 0);
    grid->setVerticalSpacing(2);
    addPercent(tr("plant gain ±"), &Spreads::plant_gain_percent);
    addPercent(tr("plant corners ±"), &Spreads::plant_corner_percent);
    addPercent(tr("plant damping ±"), &Spreads::plant_damping_percent);
    addPercent(tr("dead time ±"), &Spreads::dead_time_percent);
    addPercent(tr("components ±"), &Spreads::component_percent);
    const int next = static_cast<int>(parts_.size());
    grid->addWidget(new TextLabel(tr("falls"), TextLabel::Kind::muted, this), next / columns,
                    2 * (next % columns));
    grid->addWidget(shape_, next / columns, 2 * (next % columns) + 1);
    shape_->addItems({tr("evenly"), tr("as a bell, spread = 3 σ")});
    shape_->setAccessibleName(tr("How values fall inside the spread"));
    connect(shape_, &QComboBox::activated, this, [this](int index) {
        options_.spreads.shape = index == 0 ? SpreadShape::uniform : SpreadShape::normal;
    });
    samples_ = addField(tr("samples"), next + 1, 0);
    seed_ = addField(tr("seed"), next + 1, 1);
    const auto wholeUpTo = [](double low, double high) {
        return [low, high](double value) {
            return value >= low && value <= high
                       ? QString()
                       : tr("expected %1 to %2").arg(low, 0, 'g').arg(high, 0, 'g');
        };
    };
    samples_->setCheck(wholeUpTo(1.0, mostSamples));
    seed_->setCheck(wholeUpTo(0.0, mostSeed));
    connect(samples_, &QuantityField::valueEntered, this, [this](std::optional<double> value) {
        options_.samples = static_cast<std::size_t>(value.value_or(firstSamples));
    });
    connect(seed_, &QuantityField::valueEntered, this, [this](std::optional<double> value) {
        options_.seed = static_cast<std::uint64_t>(value.value_or(1.0));
    });
    setOptions(options_);
}

QuantityField* ToleranceForm::addField(const QString& label, int row, int column) {
    auto* grid = static_cast<QGridLayout*>(layout());
    const bool isPercent = row < static_cast<int>(parts_.size());
    auto* field = new QuantityField(isPercent ? QuantityKind::percent : QuantityKind::count, this);
    field->setAccessibleName(label);
    field->setStepsByKeys(isPercent);
    const int line = isPercent ? row / columns : static_cast<int>(parts_.size()) / columns + 1;
    const int at = isPercent ? row % columns : column;
    grid->addWidget(new TextLabel(label, TextLabel::Kind::muted, this), line, 2 * at);
    grid->addWidget(field, line, 2 * at + 1);
    connect(field, &QuantityField::problemChanged, this, &ToleranceForm::problemChanged);
    fields_.push_back(field);
    return field;
}

void ToleranceForm::addPercent(const QString& label, double Spreads::*part) {
    parts_.push_back(part);
    QuantityField* field = addField(label, static_cast<int>(parts_.size()) - 1, 0);
    field->setCheck([](double percent) {
        return percent >= 0.0 && percent <= mostPercent ? QString() : tr("expected 0 to 99.9 %");
    });
    connect(field, &QuantityField::valueEntered, this, [this, part](std::optional<double> value) {
        options_.spreads.*part = value.value_or(0.0);
    });
}

void ToleranceForm::setOptions(const ToleranceOptions& options) {
    options_ = options;
    for (std::size_t i = 0; i < parts_.size(); ++i) {
        fields_[i]->setValue(options_.spreads.*parts_[i]);
    }
    shape_->setCurrentIndex(options_.spreads.shape == SpreadShape::uniform ? 0 : 1);
    samples_->setValue(static_cast<double>(options_.samples));
    seed_->setValue(static_cast<double>(options_.seed));
}

void ToleranceForm::takeTyped() {
    for (QuantityField* field : fields_) {
        field->take();
    }
}

} // namespace cornerwright
