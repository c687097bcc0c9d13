#include "widgets/chain/card_fields.h"

#include "core/numerics/error.h"
#include "widgets/figure_text.h"

#include <QCoreApplication>

#include <cmath>
#include <numbers>

namespace cornerwright {

namespace {

QString tr(const char* text) {
    return QCoreApplication::translate("cornerwright", text);
}

QuantityKind quantityOf(const SectionParameter& parameter) {
    if (parameter.is_frequency) {
        return QuantityKind::frequency;
    }
    return parameter.value == &Section::gain ? QuantityKind::gain : QuantityKind::plain;
}

CardField plainField(const SectionParameter& parameter) {
    double Section::*const member = parameter.value;
    return {parameterText(parameter), quantityOf(parameter),
            [member](const Section& section) { return section.*member; },
            [member](Section& section, double value) { section.*member = value; }};
}

/// A notch reaches the ratio of its dampings at its centre, and is as wide as its pole damping.
std::vector<CardField> notchFields() {
    CardField centre{tr("centre"), QuantityKind::frequency,
                     [](const Section& section) { return section.corner_rad_s; },
                     [](Section& section, double value) { section.corner_rad_s = value; }};
    CardField depth{tr("depth"), QuantityKind::decibel,
                    [](const Section& section) {
                        return 20.0 * std::log10(section.zero_damping / section.pole_damping);
                    },
                    [](Section& section, double db) {
                        section.zero_damping = section.pole_damping * std::pow(10.0, db / 20.0);
                    }};
    CardField width{tr("width ζ"), QuantityKind::plain,
                    [](const Section& section) { return section.pole_damping; },
                    [](Section& section, double damping) {
                        section.zero_damping *= damping / section.pole_damping;
                        section.pole_damping = damping;
                    }};
    return {centre, depth, width};
}

} // namespace

std::vector<CardField> cardFieldsOf(SectionKind kind) {
    if (kind == SectionKind::notch) {
        return notchFields();
    }
    std::vector<CardField> fields;
    for (const SectionParameter& parameter : parameters_of(kind)) {
        fields.push_back(plainField(parameter));
    }
    return fields;
}

QString factOf(const Section& section, bool hertz) {
    const bool lead = section.kind == SectionKind::lead;
    if ((!lead && section.kind != SectionKind::lag) || !problemOf(section).isEmpty()) {
        return {};
    }
    const double w = characteristic_rad_s(section);
    const double degrees =
        std::arg(evaluate(roots_of(section), Complex(0.0, w))) * 180.0 / std::numbers::pi;
    const double ratio =
        lead ? section.pole_rad_s / section.zero_rad_s : section.zero_rad_s / section.pole_rad_s;
    const QString text = lead ? tr("ratio %1 · lifts %2° at %3") : tr("ratio %1 · lags %2° at %3");
    return text.arg(numberText(ratio, 2), fixedText(std::abs(degrees), 0), frequencyText(w, hertz));
}

QString problemOf(const Section& section) {
    try {
        check(section);
        return {};
    } catch (const InputError& error) {
        return QString::fromUtf8(error.what());
    }
}

} // namespace cornerwright
