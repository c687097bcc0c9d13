#include "widgets/parts/quantity.h"

#include "widgets/figure_text.h"

#include <QCoreApplication>
#include <QStringList>

#include <array>
#include <charconv>
#include <cmath>
#include <numbers>
#include <span>

namespace cornerwright {

namespace {

/// How a unit turns into the base unit of its kind.
struct Unit {
    enum class Law { times, inverse, decibel };

    QStringView text;
    double factor = 1.0;
    Law law = Law::times;
    bool takesPrefix = false; ///< "kHz", "ms"
};

struct Prefix {
    QStringView text;
    double factor;
};

constexpr double turn = 2.0 * std::numbers::pi;

constexpr std::array<Unit, 2> frequencyUnits{
    {{u"Hz", turn, Unit::Law::times, true}, {u"rad/s", 1.0, Unit::Law::times, true}}};
constexpr std::array<Unit, 3> timeUnits{
    {{u"s", 1.0, Unit::Law::times, true}, {u"min", 60.0}, {u"h", 3600.0}}};
constexpr std::array<Unit, 3> periodUnits{
    {{u"s", 1.0, Unit::Law::times, true}, {u"min", 60.0}, {u"Hz", 1.0, Unit::Law::inverse, true}}};
constexpr std::array<Unit, 2> gainUnits{{{u"", 1.0}, {u"dB", 1.0, Unit::Law::decibel}}};
constexpr std::array<Unit, 3> angleUnits{
    {{u"°", 1.0}, {u"deg", 1.0}, {u"rad", 180.0 / std::numbers::pi}}};
constexpr std::array<Unit, 1> decibelUnits{{{u"dB", 1.0}}};
constexpr std::array<Unit, 1> percentUnits{{{u"%", 1.0}}};
constexpr std::array<Unit, 2> plainUnits{{{u"", 1.0}, {u"%", 0.01}}};

constexpr std::array<Unit, 1> countUnits{{{u"", 1.0}}};

constexpr std::array<Prefix, 9> prefixes{{{u"", 1.0},
                                          {u"n", 1e-9},
                                          {u"\u00b5", 1e-6},
                                          {u"\u03bc", 1e-6},
                                          {u"u", 1e-6},
                                          {u"m", 1e-3},
                                          {u"k", 1e3},
                                          {u"M", 1e6},
                                          {u"G", 1e9}}};

QString tr(const char* text) {
    return QCoreApplication::translate("cornerwright", text);
}

std::span<const Unit> unitsOf(QuantityKind kind) {
    switch (kind) {
    case QuantityKind::frequency:
        return frequencyUnits;
    case QuantityKind::time:
        return timeUnits;
    case QuantityKind::period:
        return periodUnits;
    case QuantityKind::gain:
        return gainUnits;
    case QuantityKind::angle:
        return angleUnits;
    case QuantityKind::decibel:
        return decibelUnits;
    case QuantityKind::percent:
        return percentUnits;
    case QuantityKind::count:
        return countUnits;
    case QuantityKind::plain:
        break;
    }
    return plainUnits;
}

double toBase(double number, const Unit& unit) {
    switch (unit.law) {
    case Unit::Law::times:
        return number * unit.factor;
    case Unit::Law::inverse:
        return 1.0 / (number * unit.factor);
    case Unit::Law::decibel:
        return std::pow(10.0, number / 20.0);
    }
    return number;
}

double fromBase(double value, const Unit& unit) {
    switch (unit.law) {
    case Unit::Law::times:
        return value / unit.factor;
    case Unit::Law::inverse:
        return 1.0 / (value * unit.factor);
    case Unit::Law::decibel:
        return 20.0 * std::log10(value);
    }
    return value;
}

/// The unit written so, with its prefix worked into the factor. Case counts, "M" is not "m"; but
/// "hz" and "db" are understood.
std::optional<Unit> findUnit(QuantityKind kind, const QString& written) {
    for (const Unit& unit : unitsOf(kind)) {
        if (!written.endsWith(unit.text, Qt::CaseInsensitive)) {
            continue;
        }
        const QString front = written.chopped(unit.text.size());
        for (const Prefix& prefix : prefixes) {
            if (prefix.text == front && (front.isEmpty() || unit.takesPrefix)) {
                Unit scaled = unit;
                scaled.factor *= prefix.factor;
                return scaled;
            }
        }
    }
    return std::nullopt;
}

QString withDigits(double number, int digits) {
    std::array<char, 40> buffer{};
    const auto end = std::to_chars(buffer.data(), buffer.data() + buffer.size(), number,
                                   std::chars_format::general, digits);
    return QString::fromLatin1(buffer.data(), end.ptr - buffer.data());
}

/// "500" for "5e+02"; very large and very small numbers keep their exponent.
QString withoutExponent(double number, const QString& text) {
    constexpr double least = 1e-5;
    constexpr double most = 1e9;
    if (!text.contains(QLatin1Char('e')) || std::abs(number) < least || std::abs(number) > most) {
        return text;
    }
    std::array<char, 40> buffer{};
    const auto end = std::to_chars(buffer.data(), buffer.data() + buffer.size(), number,
                                   std::chars_format::fixed);
    return QString::fromLatin1(buffer.data(), end.ptr - buffer.data());
}

QString unknownUnit(QuantityKind kind, const QString& written) {
    QStringList known;
    for (const Unit& unit : unitsOf(kind)) {
        if (!unit.text.isEmpty()) {
            known << unit.text.toString();
        }
    }
    if (known.isEmpty()) {
        return tr("Expected no unit, found \"%1\".").arg(written);
    }
    return tr("Expected a unit such as %1, found \"%2\".")
        .arg(known.join(QStringLiteral(", ")), written);
}

QString fewDigits(double value, QuantityKind kind, bool hertz) {
    switch (kind) {
    case QuantityKind::frequency:
        return frequencyText(value, hertz);
    case QuantityKind::time:
    case QuantityKind::period:
        return timeText(value);
    case QuantityKind::angle:
        return degreeText(value);
    case QuantityKind::decibel:
        return decibelText(value);
    case QuantityKind::percent:
        return valueText(value, MeasureUnit::percent, hertz);
    case QuantityKind::count:
        return fixedText(value, 0);
    case QuantityKind::gain:
    case QuantityKind::plain:
        break;
    }
    return numberText(value);
}

} // namespace

QString ShownQuantity::text() const {
    const bool close = unit.isEmpty() || unit == QStringLiteral("°");
    return close ? number + unit : number + QLatin1Char(' ') + unit;
}

ShownQuantity shownQuantity(double value, QuantityKind kind, bool hertz) {
    QString text = fewDigits(value, kind, hertz);
    qsizetype split = text.indexOf(QLatin1Char(' '));
    if (split < 0) {
        split = text.endsWith(QChar(u'°')) ? text.size() - 1 : text.size();
    }
    return {text.left(split), text.mid(split).trimmed()};
}

QString exactNumber(double value, QuantityKind kind, const QString& unitText) {
    const Unit unit = findUnit(kind, unitText).value_or(Unit{});
    const double number = fromBase(value, unit);
    constexpr int mostDigits = 17;
    for (int digits = 1; digits < mostDigits; ++digits) {
        const QString text = withDigits(number, digits);
        const std::optional<double> back = readNumber(text);
        if (back && toBase(*back, unit) == value) {
            return withoutExponent(*back, text);
        }
    }
    return withDigits(number, mostDigits);
}

ReadQuantity readQuantity(QStringView typed, QuantityKind kind, const QString& unitIfSilent) {
    const QString text = typed.trimmed().toString();
    // The number is the longest front part that reads as one, so that "2e3 Hz" is not cut at "2".
    qsizetype split = text.size();
    std::optional<double> number;
    while (split > 0 && !(number = readNumber(text.left(split)))) {
        --split;
    }
    if (!number) {
        return {std::nullopt, text.isEmpty() ? tr("Expected a number, found nothing.")
                                             : tr("Expected a number, found \"%1\".").arg(text)};
    }
    const QString written = text.mid(split).trimmed();
    const std::optional<Unit> unit = findUnit(kind, written.isEmpty() ? unitIfSilent : written);
    if (!unit) {
        return {std::nullopt, unknownUnit(kind, written)};
    }
    const double value = toBase(*number, *unit);
    if (!std::isfinite(value)) {
        return {std::nullopt, tr("%1 is no usable value here.").arg(text)};
    }
    return {value, {}};
}

} // namespace cornerwright
