#include "widgets/panes/nyquist_plane.h"

#include "widgets/figure_text.h"
#include "widgets/panes/axis_styles.h"

#include <cmath>
#include <numbers>

namespace cornerwright {

namespace {

double compressed(double radius) {
    return radius <= 1.0 ? radius : 1.0 + std::log(radius);
}

double expanded(double drawn) {
    return drawn <= 1.0 ? drawn : std::exp(drawn - 1.0);
}

/// 0, and the powers of ten from 1 on both sides, as they are drawn.
std::vector<Tick> compressedTicks(AxisRange range, int) {
    std::vector<Tick> ticks;
    const auto add = [&](double value) {
        if (value >= range.low && value <= range.high)
            ticks.push_back({value, true});
    };
    const double farthest = std::max(std::abs(range.low), std::abs(range.high));
    const int last = static_cast<int>(std::floor(std::log10(std::max(expanded(farthest), 1.0))));
    for (int power = last; power >= 0; --power)
        add(-compressed(std::pow(10.0, power)));
    add(0.0);
    for (int power = 0; power <= last; ++power)
        add(compressed(std::pow(10.0, power)));
    return ticks;
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
        const double value = std::copysign(std::round(expanded(std::abs(drawn))), drawn);
        return fixedText(value, 0);
    };
    return style;
}

} // namespace cornerwright
