#include "widgets/plot_geometry.h"

#include "widgets/figure_text.h"

#include <algorithm>
#include <array>
#include <cmath>

namespace cornerwright {

namespace {

bool isFinite(const QPointF& point) {
    return std::isfinite(point.x()) && std::isfinite(point.y());
}

std::vector<Tick> evenTicks(AxisRange range, double step) {
    std::vector<Tick> ticks;
    const double slack = 1e-9 * step;
    for (double n = std::ceil((range.low - slack) / step); n * step <= range.high + slack; n += 1.0)
        ticks.push_back({n * step, true});
    return ticks;
}

/// One pixel column of a curve being thinned.
struct Column {
    QPointF first, lowest, highest, last;

    explicit Column(const QPointF& point)
        : first(point), lowest(point), highest(point), last(point) {}

    void add(const QPointF& point) {
        if (point.y() < lowest.y())
            lowest = point;
        if (point.y() > highest.y())
            highest = point;
        last = point;
    }

    void appendTo(QPolygonF& line) const {
        const bool lowestFirst = lowest.x() <= highest.x();
        const std::array<QPointF, 4> inOrder{first, lowestFirst ? lowest : highest,
                                             lowestFirst ? highest : lowest, last};
        for (const QPointF& point : inOrder)
            if (line.isEmpty() || line.back() != point)
                line.append(point);
    }
};

} // namespace

AxisMap::AxisMap(AxisRange range, PixelSpan pixels, bool logarithmic)
    : range_(range), logarithmic_(logarithmic) {
    const double low = logarithmic ? std::log(range.low) : range.low;
    const double high = logarithmic ? std::log(range.high) : range.high;
    scale_ = (pixels.at_high - pixels.at_low) / (high - low);
    offset_ = pixels.at_low - scale_ * low;
}

double AxisMap::toPixel(double value) const {
    return offset_ + scale_ * (logarithmic_ ? std::log(value) : value);
}

double AxisMap::toValue(double pixel) const {
    const double position = (pixel - offset_) / scale_;
    return logarithmic_ ? std::exp(position) : position;
}

double AxisMap::moved(double value, double pixels) const {
    return logarithmic_ ? value * std::exp(pixels / scale_) : value + pixels / scale_;
}

double linearStep(double width, int labels) {
    const double rough = width / std::max(labels, 1);
    const double power = std::pow(10.0, std::floor(std::log10(rough)));
    const double share = rough / power;
    // Limits halfway (in the logarithm) between the steps 1, 2, 5 and 10.
    const double step = share < 1.42 ? 1.0 : share < 3.17 ? 2.0 : share < 7.08 ? 5.0 : 10.0;
    return step * power;
}

double degreeStep(double width, int labels) {
    static constexpr std::array<double, 7> steps{15.0, 30.0, 45.0, 60.0, 90.0, 180.0, 360.0};
    const double rough = width / std::max(labels, 1);
    if (rough < 10.0)
        return linearStep(width, labels);
    for (const double step : steps)
        if (step >= 0.8 * rough)
            return step;
    return 360.0 * std::ceil(rough / 360.0);
}

std::vector<Tick> linearTicks(AxisRange range, int labels) {
    return evenTicks(range, linearStep(range.high - range.low, labels));
}

std::vector<Tick> degreeTicks(AxisRange range, int labels) {
    return evenTicks(range, degreeStep(range.high - range.low, labels));
}

std::vector<Tick> logTicks(AxisRange range, int labels) {
    const double decades = std::log10(range.high / range.low);
    if (decades < 0.5)
        return linearTicks(range, labels);
    // Every n-th power of ten is labelled where even the powers are too many.
    const int everyPower =
        std::max(1, static_cast<int>(std::ceil(decades / std::max(labels, 1) - 0.25)));
    const bool withTwoAndFive = 3.0 * decades <= 1.3 * labels;
    std::vector<Tick> ticks;
    const int first = static_cast<int>(std::floor(std::log10(range.low) + 1e-9));
    const int last = static_cast<int>(std::floor(std::log10(range.high) + 1e-9));
    for (int power = first; power <= last; ++power) {
        const double decade = std::pow(10.0, power);
        for (int n = 1; n <= 9; ++n) {
            const double value = n * decade;
            if (value < range.low * (1.0 - 1e-9) || value > range.high * (1.0 + 1e-9))
                continue;
            const bool labelled =
                n == 1 ? power % everyPower == 0 : withTwoAndFive && (n == 2 || n == 5);
            ticks.push_back({value, labelled});
        }
    }
    return ticks;
}

QString tickText(double value, double step) {
    const double magnitude = std::abs(value);
    if (magnitude >= 1e5 || (magnitude > 0.0 && magnitude < 1e-4))
        return numberText(value, 3);
    const int decimals = std::max(0, static_cast<int>(std::ceil(-std::log10(step) - 1e-9)));
    return fixedText(value, std::min(decimals, 9));
}

std::optional<LogPosition> findOnLog(std::span<const double> x, double at) {
    if (x.size() < 2 || !(at >= x.front()) || !(at <= x.back()))
        return std::nullopt;
    const auto above = std::upper_bound(x.begin(), x.end() - 1, at);
    const auto index = static_cast<std::size_t>(above - x.begin()) - 1;
    return LogPosition{index, std::log(at / x[index]) / std::log(x[index + 1] / x[index])};
}

std::optional<double> interpolateOnLog(std::span<const double> x, std::span<const double> y,
                                       double at) {
    const auto position = findOnLog(x, at);
    if (!position || y.size() != x.size())
        return std::nullopt;
    const double value = std::lerp(y[position->index], y[position->index + 1], position->share);
    return std::isfinite(value) ? std::optional(value) : std::nullopt;
}

std::vector<QPolygonF> thinnedToColumns(std::span<const QPointF> points) {
    std::vector<QPolygonF> lines;
    QPolygonF line;
    std::optional<Column> column;
    const auto endLine = [&] {
        if (column)
            column->appendTo(line);
        column.reset();
        if (line.size() > 1)
            lines.push_back(std::move(line));
        line = {};
    };
    for (const QPointF& point : points) {
        if (!isFinite(point)) {
            endLine();
            continue;
        }
        if (column && std::floor(column->first.x()) == std::floor(point.x())) {
            column->add(point);
            continue;
        }
        if (column)
            column->appendTo(line);
        column.emplace(point);
    }
    endLine();
    return lines;
}

std::optional<Segment> clipped(Segment segment, const QRectF& rectangle) {
    const QPointF step = segment.to - segment.from;
    double enter = 0.0;
    double leave = 1.0;
    const std::array<std::array<double, 2>, 4> edges{
        {{-step.x(), segment.from.x() - rectangle.left()},
         {step.x(), rectangle.right() - segment.from.x()},
         {-step.y(), segment.from.y() - rectangle.top()},
         {step.y(), rectangle.bottom() - segment.from.y()}}};
    for (const auto& [direction, room] : edges) {
        if (direction == 0.0) {
            if (room < 0.0)
                return std::nullopt;
            continue;
        }
        const double at = room / direction;
        if (direction < 0.0)
            enter = std::max(enter, at);
        else
            leave = std::min(leave, at);
    }
    if (enter > leave)
        return std::nullopt;
    return Segment{segment.from + enter * step, segment.from + leave * step};
}

std::vector<QPolygonF> thinnedInPlane(std::span<const QPointF> points, const QRectF& clip,
                                      double distance) {
    std::vector<QPolygonF> lines;
    QPolygonF line;
    const auto endLine = [&] {
        if (line.size() > 1)
            lines.push_back(std::move(line));
        line = {};
    };
    std::optional<QPointF> kept;
    for (std::size_t i = 0; i < points.size(); ++i) {
        const QPointF& point = points[i];
        if (!isFinite(point)) {
            endLine();
            kept.reset();
            continue;
        }
        const bool isLast = i + 1 == points.size() || !isFinite(points[i + 1]);
        if (kept && !isLast && (point - *kept).manhattanLength() < distance)
            continue;
        if (kept) {
            const auto inside = clipped({*kept, point}, clip);
            if (!inside) {
                endLine();
            } else {
                if (line.isEmpty() || line.back() != inside->from) {
                    endLine();
                    line.append(inside->from);
                }
                line.append(inside->to);
            }
        }
        kept = point;
    }
    endLine();
    return lines;
}

std::optional<AxisRange> rangeOf(std::span<const double> values, double margin, double smallest) {
    std::optional<AxisRange> range;
    for (const double value : values) {
        if (!std::isfinite(value))
            continue;
        if (!range)
            range = AxisRange{value, value};
        range->low = std::min(range->low, value);
        range->high = std::max(range->high, value);
    }
    if (!range)
        return std::nullopt;
    const double width = std::max((range->high - range->low) * (1.0 + 2.0 * margin), smallest);
    const double centre = 0.5 * (range->low + range->high);
    return AxisRange{centre - 0.5 * width, centre + 0.5 * width};
}

AxisRange zoomed(AxisRange range, double fixed, double factor, bool logarithmic) {
    if (!logarithmic)
        return {fixed + (range.low - fixed) * factor, fixed + (range.high - fixed) * factor};
    return {fixed * std::pow(range.low / fixed, factor),
            fixed * std::pow(range.high / fixed, factor)};
}

} // namespace cornerwright
