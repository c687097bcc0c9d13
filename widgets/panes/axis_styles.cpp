#include "widgets/panes/axis_styles.h"

#include "widgets/figure_text.h"
#include "widgets/view_state.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

bool isPowerOfTen(double value) {
    const double power = std::log10(value);
    return std::abs(power - std::round(power)) < 1e-6;
}

double stepOf(const std::vector<Tick>& ticks) {
    return ticks.size() > 1 ? ticks[1].value - ticks[0].value : std::abs(ticks[0].value);
}

/// Label of the last tick with the unit, of others without.
QString labelWithUnit(const std::vector<Tick>& ticks, std::size_t index, const QString& unit) {
    const QString number = tickText(ticks[index].value, stepOf(ticks));
    const bool isLast = index + 1 == ticks.size();
    return isLast && !unit.isEmpty() ? number + QLatin1Char(' ') + unit : number;
}

} // namespace

AxisStyle frequencyAxis(const ViewState& viewState) {
    AxisStyle style;
    style.logarithmic = true;
    style.ticks = [&viewState](AxisRange range, int labels) {
        const bool hertz = viewState.showsHertz();
        auto ticks = logTicks(
            {toShownFrequency(range.low, hertz), toShownFrequency(range.high, hertz)}, labels);
        for (Tick& tick : ticks)
            tick.value = fromShownFrequency(tick.value, hertz);
        return ticks;
    };
    style.label = [&viewState](const std::vector<Tick>& ticks, std::size_t index) {
        const bool hertz = viewState.showsHertz();
        const double shown = toShownFrequency(ticks[index].value, hertz);
        const bool isFirst = std::none_of(ticks.begin(), ticks.begin() + static_cast<int>(index),
                                          [](const Tick& tick) { return tick.labelled; });
        const bool isRound = isPowerOfTen(shown);
        const int digits = isRound ? 1 : 4;
        // Prefixed as far as the digits go: "1 kHz", "2 k", "250".
        QString text =
            prefixedText(shown, isRound || isFirst ? frequencyUnitText(hertz) : QString(), digits);
        static const QString pointZeros = QStringLiteral(".");
        const qsizetype space = text.indexOf(QLatin1Char(' '));
        QString number = text.left(space);
        if (number.contains(pointZeros)) {
            while (number.endsWith(QLatin1Char('0')))
                number.chop(1);
            if (number.endsWith(QLatin1Char('.')))
                number.chop(1);
        }
        return (number + text.mid(space)).trimmed();
    };
    return style;
}

AxisStyle linearAxis(const QString& unit) {
    AxisStyle style;
    style.ticks = linearTicks;
    style.label = [unit](const std::vector<Tick>& ticks, std::size_t index) {
        return labelWithUnit(ticks, index, unit);
    };
    return style;
}

AxisStyle degreeAxis() {
    AxisStyle style;
    style.ticks = degreeTicks;
    style.label = [](const std::vector<Tick>& ticks, std::size_t index) {
        return tickText(ticks[index].value, stepOf(ticks)) + QStringLiteral("°");
    };
    return style;
}

AxisStyle timeAxis() {
    AxisStyle style;
    style.ticks = linearTicks;
    style.label = [](const std::vector<Tick>& ticks, std::size_t index) {
        // The prefix of the greatest tick serves the whole axis.
        const double greatest =
            std::max(std::abs(ticks.front().value), std::abs(ticks.back().value));
        const bool inMilli = greatest < 0.999;
        const bool inMicro = greatest < 0.999e-3;
        const double factor = inMicro ? 1e6 : inMilli ? 1e3 : 1.0;
        const QString unit = inMicro   ? QStringLiteral("µs")
                             : inMilli ? QStringLiteral("ms")
                                       : QStringLiteral("s");
        const QString number = tickText(ticks[index].value * factor, stepOf(ticks) * factor);
        return index + 1 == ticks.size() ? number + QLatin1Char(' ') + unit : number;
    };
    return style;
}

} // namespace cornerwright
