#include "widgets/figure_text.h"

#include <QCoreApplication>

#include <array>
#include <cmath>
#include <numbers>

namespace cornerwright {

namespace {

QString tr(const char* text) {
    return QCoreApplication::translate("cornerwright", text);
}

QString withTrueMinus(QString text) {
    return text.replace(QLatin1Char('-'), QChar(0x2212));
}

struct Prefix {
    double factor;
    QStringView sign;
};
constexpr std::array<Prefix, 7> prefixes{
    {{1e-9, u"n"}, {1e-6, u"µ"}, {1e-3, u"m"}, {1.0, u""}, {1e3, u"k"}, {1e6, u"M"}, {1e9, u"G"}}};

/// The value as it reads after rounding to `digits` significant digits: 999.96 is 1000 at three.
double rounded(double value, int digits) {
    return QString::number(value, 'e', digits - 1).toDouble();
}

} // namespace

QString fixedText(double value, int decimals) {
    const QString text = QString::number(value, 'f', decimals);
    const bool isZero = text.toDouble() == 0.0;
    return withTrueMinus(isZero ? QString::number(0.0, 'f', decimals) : text);
}

QString numberText(double value, int digits) {
    if (!std::isfinite(value))
        return value > 0.0 ? QStringLiteral("∞") : QStringLiteral("−∞");
    if (value == 0.0)
        return QStringLiteral("0");
    const double shown = std::abs(rounded(value, digits));
    if (shown < 1e-3 || shown >= 1e5)
        return withTrueMinus(QString::number(value, 'e', digits - 1));
    const int power = static_cast<int>(std::floor(std::log10(shown) + 1e-12));
    return fixedText(value, std::max(0, digits - 1 - power));
}

QString prefixedText(double value, const QString& unit, int digits) {
    if (!std::isfinite(value) || value == 0.0)
        return QStringLiteral("%1 %2").arg(numberText(value, digits), unit);
    const double shown = std::abs(rounded(value, digits));
    const Prefix* best = &prefixes.front();
    for (const Prefix& prefix : prefixes)
        if (shown >= prefix.factor * (1.0 - 1e-12))
            best = &prefix;
    return QStringLiteral("%1 %2%3").arg(numberText(value / best->factor, digits), best->sign,
                                         unit);
}

QString frequencyUnitText(bool hertz) {
    return hertz ? QStringLiteral("Hz") : QStringLiteral("rad/s");
}

double toShownFrequency(double w_rad_s, bool hertz) {
    return hertz ? w_rad_s / (2.0 * std::numbers::pi) : w_rad_s;
}

double fromShownFrequency(double shown, bool hertz) {
    return hertz ? shown * 2.0 * std::numbers::pi : shown;
}

QString frequencyText(double w_rad_s, bool hertz, int digits) {
    return prefixedText(toShownFrequency(w_rad_s, hertz), frequencyUnitText(hertz), digits);
}

QString timeText(double seconds, int digits) {
    return prefixedText(seconds, QStringLiteral("s"), digits);
}

QString decibelText(double db) {
    return fixedText(db, 1) + QStringLiteral(" dB");
}

QString degreeText(double degrees) {
    return fixedText(degrees, 1) + QStringLiteral("°");
}

QString valueText(double value, MeasureUnit unit, bool hertz) {
    switch (unit) {
    case MeasureUnit::deg:
        return degreeText(value);
    case MeasureUnit::db:
        return decibelText(value);
    case MeasureUnit::rad_s:
        return frequencyText(value, hertz);
    case MeasureUnit::s:
        return timeText(value);
    case MeasureUnit::percent:
        return fixedText(value, 1) + QStringLiteral(" %");
    case MeasureUnit::plain:
        break;
    }
    return numberText(value);
}

namespace {

/// One standard deviation in two digits, however small.
QString deviationText(double deviation, MeasureUnit unit, bool hertz) {
    constexpr int digits = 2;
    if (unit == MeasureUnit::deg)
        return numberText(deviation, digits) + QChar(0xb0);
    if (unit == MeasureUnit::db)
        return numberText(deviation, digits) + QStringLiteral(" dB");
    return valueText(deviation, unit, hertz);
}

} // namespace

QString figureText(const Figure& figure, MeasureUnit unit, bool hertz) {
    switch (figure.kind()) {
    case Figure::Kind::undetermined:
        return QStringLiteral("?");
    case Figure::Kind::infinite:
        return QStringLiteral("∞");
    case Figure::Kind::minus_infinite:
        return QStringLiteral("−∞");
    case Figure::Kind::value:
        break;
    }
    const QString value = valueText(figure.value(), unit, hertz);
    if (figure.standard_deviation() > 0.0)
        return QStringLiteral("%1 ± %2").arg(
            value, deviationText(figure.standard_deviation(), unit, hertz));
    return value;
}

QString limitText(const Requirement& requirement, bool hertz) {
    const MeasureUnit unit = unit_of(requirement.measure);
    if (requirement.at_least && requirement.at_most)
        return QStringLiteral("%1 … %2").arg(valueText(*requirement.at_least, unit, hertz),
                                             valueText(*requirement.at_most, unit, hertz));
    if (requirement.at_least)
        return QStringLiteral("≥ ") + valueText(*requirement.at_least, unit, hertz);
    if (requirement.at_most)
        return QStringLiteral("≤ ") + valueText(*requirement.at_most, unit, hertz);
    return {};
}

QString insideSentence(QString text) {
    const bool small = QCoreApplication::translate(
                           "cornerwright", "small",
                           "how nouns start inside a sentence: translate to small or large") ==
                       QLatin1String("small");
    if (small && !text.isEmpty()) {
        text[0] = text[0].toLower();
    }
    return text;
}

QString measureText(Measure measure) {
    switch (measure) {
    case Measure::phase_margin:
        return tr("Phase margin");
    case Measure::gain_margin:
        return tr("Gain margin");
    case Measure::gain_reduction_margin:
        return tr("Gain reduction margin");
    case Measure::delay_margin:
        return tr("Delay margin");
    case Measure::sensitivity_peak:
        return tr("Sensitivity peak");
    case Measure::complementary_peak:
        return tr("Complementary peak");
    case Measure::control_effort_peak:
        return tr("Control effort peak");
    case Measure::bandwidth:
        return tr("Bandwidth");
    case Measure::disturbance_rejection:
        return tr("Rejection");
    case Measure::roll_off:
        return tr("Roll-off");
    case Measure::overshoot:
        return tr("Overshoot");
    case Measure::peak_time:
        return tr("Peak time");
    case Measure::rise_time:
        return tr("Rise time");
    case Measure::settling_time:
        return tr("Settling time");
    case Measure::steady_state_error:
        return tr("Steady-state error");
    case Measure::control_peak:
        return tr("Control peak");
    case Measure::disturbance_peak:
        return tr("Disturbance peak");
    }
    return {};
}

QString requirementText(const Requirement& requirement, bool hertz) {
    switch (requirement.measure) {
    case Measure::settling_time:
        return tr("Settling time, %1 %").arg(numberText(requirement.band_percent, 2));
    case Measure::disturbance_rejection:
        return tr("Rejection up to %1").arg(frequencyText(requirement.up_to_rad_s, hertz));
    case Measure::roll_off:
        return tr("Roll-off from %1").arg(frequencyText(requirement.from_rad_s, hertz));
    case Measure::steady_state_error:
        switch (requirement.input) {
        case ErrorInput::step:
            return tr("Step error");
        case ErrorInput::ramp:
            return tr("Ramp error");
        case ErrorInput::parabola:
            return tr("Parabola error");
        }
        break;
    default:
        break;
    }
    return measureText(requirement.measure);
}

QString stateText(State state) {
    switch (state) {
    case State::met:
        return tr("met");
    case State::unmet:
        return tr("unmet");
    case State::undetermined:
        break;
    }
    return tr("not determined");
}

QString kindText(SectionKind kind) {
    switch (kind) {
    case SectionKind::gain:
        return tr("Gain");
    case SectionKind::integrator:
        return tr("Integrator");
    case SectionKind::pi:
        return tr("PI");
    case SectionKind::lead:
        return tr("Lead");
    case SectionKind::lag:
        return tr("Lag");
    case SectionKind::real_zero:
        return tr("Real zero");
    case SectionKind::real_pole:
        return tr("Low-pass, first order");
    case SectionKind::complex_zeros:
        return tr("Complex zeros");
    case SectionKind::complex_poles:
        return tr("Low-pass, second order");
    case SectionKind::notch:
        return tr("Notch");
    case SectionKind::washout:
        return tr("Washout");
    }
    return {};
}

QString sectionText(const Section& section) {
    return section.label.empty() ? kindText(section.kind) : QString::fromStdString(section.label);
}

QString parameterText(const SectionParameter& parameter) {
    if (parameter.value == &Section::gain)
        return tr("gain");
    if (parameter.value == &Section::corner_rad_s)
        return tr("corner");
    if (parameter.value == &Section::zero_rad_s)
        return tr("zero");
    if (parameter.value == &Section::pole_rad_s)
        return tr("pole");
    if (parameter.value == &Section::damping)
        return tr("damping");
    if (parameter.value == &Section::zero_damping)
        return tr("zero damping");
    return tr("pole damping");
}

std::optional<double> readNumber(const QString& text) {
    QString plain = text.trimmed();
    plain.replace(QChar(0x2212), QLatin1Char('-'));
    if (!plain.contains(QLatin1Char('.')))
        plain.replace(QLatin1Char(','), QLatin1Char('.'));
    bool ok = false;
    const double value = plain.toDouble(&ok);
    if (!ok || !std::isfinite(value))
        return std::nullopt;
    return value;
}

std::optional<double> readFrequency(const QString& text, bool hertz) {
    struct Unit {
        QStringView name;
        double factor;
    };
    constexpr double turn = 2.0 * std::numbers::pi;
    // Longer names first: "krad/s" ends in "rad/s" as well.
    static constexpr std::array<Unit, 7> units{{{u"krad/s", 1e3},
                                                {u"mrad/s", 1e-3},
                                                {u"rad/s", 1.0},
                                                {u"kHz", 1e3 * turn},
                                                {u"MHz", 1e6 * turn},
                                                {u"mHz", 1e-3 * turn},
                                                {u"Hz", turn}}};
    const QString trimmed = text.trimmed();
    for (const Unit& unit : units)
        if (trimmed.endsWith(unit.name)) {
            const auto value = readNumber(trimmed.chopped(unit.name.size()));
            return value ? std::optional(*value * unit.factor) : std::nullopt;
        }
    const auto value = readNumber(trimmed);
    return value ? std::optional(fromShownFrequency(*value, hertz)) : std::nullopt;
}

} // namespace cornerwright
