#include "widgets/panes/nyquist_plane.h"

#include "widgets/panes/axis_styles.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {

namespace {

double compressed(double radius) {
    return radius <= 1.0 ? radius : 1.0 + std::log10(1.0 + (radius - 1.0) * std::numbers::ln10);
}

double expanded(double drawn) {
    return drawn <= 1.0 ? drawn : 1.0 + (std::pow(10.0, drawn - 1.0) - 1.0) / std::numbers::ln10;
}

/// 0 and powers of ten on both sides, as they are drawn: every n-th where all are too many.
std::vector<Tick> compressedTicks(AxisRange range, int labels) {
    std::vector<Tick> ticks;
    const auto add = [&](double value) {
        if (value >= range.low && value <= range.high)
            ticks.push_back({value, true});
    };
    const double farthest = std::max({std::abs(range.low), std::abs(range.high), 1.0});
    const int last = static_cast<int>(std::floor(std::log10(expanded(farthest))));
    const double units = range.high - range.low;
    const int step = std::max(1, static_cast<int>(std::ceil(units / std::max(labels, 1) - 0.5)));
    for (int power = last - last % step; power >= 0; power -= step)
        add(-compressed(std::pow(10.0, power)));
    add(0.0);
    for (int power = 0; power <= last; power += step)
        add(compressed(std::pow(10.0, power)));
    return ticks;
}

/// "−10", "1000", "10⁵".
QString powerText(int power, bool isNegative) {
    constexpr int longest_plain = 3;
    static const QString raised = QStringLiteral("⁰¹²³⁴⁵⁶⁷⁸⁹");
    QString text = isNegative ? QStringLiteral("\u2212") : QString();
    if (power <= longest_plain)
        return text + QLatin1Char('1') + QString(power, QLatin1Char('0'));
    text += QStringLiteral("10");
    for (const QChar digit : QString::number(power))
        text += raised[digit.digitValue()];
    return text;
}

} // namespace

QPointF toDrawn(Complex value, RadiusScale scale) {
    const double radius = std::abs(value);
    if (scale == RadiusScale::compressed && radius > 1.0)
        value *= compressed(radius) / radius;
    return {value.real(), value.imag()};
}

Complex fromDrawn(const QPointF& place, RadiusScale scale) {
    const Complex value(place.x(), place.y());
    const double drawn = std::abs(value);
    if (scale == RadiusScale::linear || drawn <= 1.0)
        return value;
    return value * (expanded(drawn) / drawn);
}

std::vector<QPointF> drawnCircle(Complex centre, double radius, RadiusScale scale) {
    constexpr int points = 180;
    std::vector<QPointF> circle;
    circle.reserve(points + 1);
    for (int i = 0; i <= points; ++i)
        circle.push_back(
            toDrawn(centre + std::polar(radius, 2.0 * std::numbers::pi * i / points), scale));
    return circle;
}

AxisStyle nyquistAxis(RadiusScale scale) {
    if (scale == RadiusScale::linear)
        return linearAxis({});
    AxisStyle style;
    style.ticks = compressedTicks;
    style.label = [](const std::vector<Tick>& ticks, std::size_t index) {
        const double drawn = ticks[index].value;
        if (drawn == 0.0)
            return QStringLiteral("0");
        const double power = std::log10(expanded(std::abs(drawn)));
        return powerText(static_cast<int>(std::lround(power)), drawn < 0.0);
    };
    return style;
}

} // namespace cornerwright
