#pragma once

#include <QPointF>
#include <QPolygonF>
#include <QRectF>
#include <QString>

#include <optional>
#include <span>
#include <vector>

namespace cornerwright {

/// An interval of an axis, low < high.
struct AxisRange {
    double low = 0.0;
    double high = 1.0;

    bool operator==(const AxisRange&) const = default;
};

/// Pixel positions of an axis; `at_low` may be greater than `at_high` (vertical axes).
struct PixelSpan {
    double at_low = 0.0;
    double at_high = 1.0;
};

/// Value <-> pixel of one axis, linear or logarithmic. Logarithmic ranges are above zero.
class AxisMap {
  public:
    AxisMap(AxisRange range, PixelSpan pixels, bool logarithmic);

    double toPixel(double value) const;
    double toValue(double pixel) const;
    /// How the value changes over `pixels` from `value`: added (linear) or multiplied (log).
    double moved(double value, double pixels) const;
    AxisRange range() const { return range_; }
    bool isLogarithmic() const { return logarithmic_; }

  private:
    AxisRange range_;
    double offset_; ///< pixel = offset + scale * (value or ln value)
    double scale_;
    bool logarithmic_;
};

struct Tick {
    double value = 0.0;
    bool labelled = false;

    bool operator==(const Tick&) const = default;
};

/// Ticks at 1..9 times powers of ten; labelled are as many of {1}, {1, 2, 5} or all as fit at about
/// `labels`. Over less than half a decade the ticks are those of `linearTicks`.
std::vector<Tick> logTicks(AxisRange range, int labels);

/// Evenly spaced labelled ticks at 1, 2 or 5 times a power of ten, about `labels` of them.
std::vector<Tick> linearTicks(AxisRange range, int labels);

/// Multiples of 15, 30, 45, 60, 90, 180 or 360 degrees, about `labels` of them.
std::vector<Tick> degreeTicks(AxisRange range, int labels);

/// The distance between the ticks of `linearTicks` and of `degreeTicks`.
double linearStep(double width, int labels);
double degreeStep(double width, int labels);

/// Labels of evenly spaced ticks: as many decimals as the step needs and no more.
QString tickText(double value, double step);

/// Index i with x[i] <= at < x[i + 1] and the share of the way in ln x; empty outside [x.front(),
/// x.back()]. x ascends strictly and is above zero.
struct LogPosition {
    std::size_t index = 0;
    double share = 0.0;
};
std::optional<LogPosition> findOnLog(std::span<const double> x, double at);

/// y at `at`, linear over ln x; empty outside x or where a neighbour is not finite.
std::optional<double> interpolateOnLog(std::span<const double> x, std::span<const double> y,
                                       double at);

/// A curve with ascending pixel x, thinned: at most four points (first, lowest, highest, last) a
/// pixel column, which draw the same picture. Points that are not finite split the curve.
std::vector<QPolygonF> thinnedToColumns(std::span<const QPointF> points);

/// A curve in the plane, thinned by leaving out points less than `distance` pixels from the last
/// one kept, and cut to `clip`.
std::vector<QPolygonF> thinnedInPlane(std::span<const QPointF> points, const QRectF& clip,
                                      double distance = 0.7);

/// The part of the segment inside the rectangle, empty if there is none (Liang and Barsky 1984,
/// "A new concept and method for line clipping").
struct Segment {
    QPointF from;
    QPointF to;
};
std::optional<Segment> clipped(Segment segment, const QRectF& rectangle);

/// The smallest range of the finite values, widened by `margin` of its width at both ends and to at
/// least `smallest`; empty without a finite value.
std::optional<AxisRange> rangeOf(std::span<const double> values, double margin, double smallest);

/// Zoomed by `factor` (< 1: closer) so that `fixed` stays where it is.
AxisRange zoomed(AxisRange range, double fixed, double factor, bool logarithmic);

} // namespace cornerwright
