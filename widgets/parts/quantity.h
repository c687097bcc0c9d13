#pragma once

#include <QString>
#include <QStringView>

#include <optional>

namespace cornerwright {

/// What a typed or shown number is of. Values are always in the base unit named here.
enum class QuantityKind {
    frequency, ///< rad/s; typed in Hz, kHz, rad/s, ...
    time,      ///< s
    period,    ///< s; a rate in Hz may be typed for it
    gain,      ///< plain; dB may be typed for it
    angle,     ///< deg
    decibel,   ///< dB
    percent,   ///< %
    count,     ///< a whole number
    plain,     ///< no unit
};

/// A number and its unit as shown: "6.05" and "Hz".
struct ShownQuantity {
    QString number;
    QString unit;

    QString text() const;
    bool operator==(const ShownQuantity&) const = default;
};

/// The value in few digits and the unit that keeps it readable; frequencies in Hz or rad/s.
ShownQuantity shownQuantity(double value, QuantityKind kind, bool hertz);

/// The value with as many digits as give exactly this value when read back in the unit `unit`
/// (which must be one of the kind's).
QString exactNumber(double value, QuantityKind kind, const QString& unit);

/// What a person typed, or why it could not be taken.
struct ReadQuantity {
    std::optional<double> value; ///< in the base unit of the kind
    QString problem;             ///< one sentence; empty where there is a value
};

/// Reads "12 Hz", "75rad/s", "1.5e3", "0,25 s". A number alone has the unit `unitIfSilent`. The
/// decimal mark is a point; a comma is taken for one where there is no point.
ReadQuantity readQuantity(QStringView text, QuantityKind kind, const QString& unitIfSilent);

} // namespace cornerwright
