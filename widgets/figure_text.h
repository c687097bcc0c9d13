#pragma once

#include "core/compensator/section.h"
#include "core/numerics/figure.h"
#include "core/requirements/requirement.h"

#include <QString>

#include <optional>

namespace cornerwright {

// Figures as people read them: three or four digits that carry information, the unit beside them,
// prefixes where they shorten, a true minus sign. Independent of the locale: the decimal sign is
// the point everywhere in this program.

/// `value` with `digits` significant digits, no exponent between 0.001 and 99999: "41.9", "0.050",
/// "−3.1". Trailing zeros are kept.
QString numberText(double value, int digits = 3);

/// `value` with a fixed number of decimals and a true minus sign; never "−0.0".
QString fixedText(double value, int decimals);

/// The same with an SI prefix from n to G before the unit: "151 ms", "1.25 kHz".
QString prefixedText(double value, const QString& unit, int digits = 3);

/// A frequency given in rad/s: "12.3 Hz" or "77.3 rad/s".
QString frequencyText(double w_rad_s, bool hertz, int digits = 3);
QString timeText(double seconds, int digits = 3);
/// One decimal: "−15.3 dB".
QString decibelText(double db);
/// One decimal: "41.9°".
QString degreeText(double degrees);

/// A figure with its unit; "41.9° ± 1.2°" with one standard deviation where one is known. "∞", "−∞"
/// where infinite, "?" where not determined.
QString figureText(const Figure& figure, MeasureUnit unit, bool hertz);
/// A finite value in the unit of a measure.
QString valueText(double value, MeasureUnit unit, bool hertz);

/// "≥ 45.0°", "60 … 200 rad/s".
QString limitText(const Requirement& requirement, bool hertz);
/// "Phase margin", "Settling time, 2 %", "Rejection up to 1 Hz".
QString requirementText(const Requirement& requirement, bool hertz);
QString measureText(Measure measure);
/// A text that starts with a noun, as it stands inside a sentence: "phase margin", but
/// "Phasenreserve" in a language that writes nouns large everywhere.
QString insideSentence(QString text);
/// "met", "unmet", "not determined".
QString stateText(State state);

/// "Lead", "Complex zeros": what a kind of section is called.
QString kindText(SectionKind kind);
/// The label the user gave, else the kind.
QString sectionText(const Section& section);
/// "zero", "corner", "damping": what a number of a section is called.
QString parameterText(const SectionParameter& parameter);

/// The unit in which frequencies are shown: "Hz" or "rad/s".
QString frequencyUnitText(bool hertz);
/// rad/s to the unit shown, and back.
double toShownFrequency(double w_rad_s, bool hertz);
double fromShownFrequency(double shown, bool hertz);

/// What a person typed for a frequency, rad/s: "12", "12 Hz", "1.5 kHz", "80 rad/s", "12,5". A bare
/// number is in the unit shown. Empty where it cannot be read.
std::optional<double> readFrequency(const QString& text, bool hertz);
/// What a person typed for a plain number; a decimal comma and a true minus are understood.
std::optional<double> readNumber(const QString& text);

} // namespace cornerwright
