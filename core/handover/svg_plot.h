#pragma once

#include <span>
#include <string>
#include <vector>

namespace cornerwright {

/// One axis of a plot. Limits of a logarithmic axis are above zero.
struct PlotAxis {
    bool logarithmic = false;
    double low = 0.0;
    double high = 1.0;
    std::string label;
};

struct LineStyle {
    std::string colour = "#1F2328";
    double width = 1.2;
    std::string dash; ///< SVG dash list such as "5 3"; empty: solid
};

/// A plot as scalable vector graphics: axes with ticks, lines, marks and words. The same calls give
/// the same bytes.
class SvgPlot {
  public:
    /// `title` is read aloud by assistive programs and stands above the plot.
    SvgPlot(std::string title, double width, double height, PlotAxis x, PlotAxis y);

    /// What lies outside the axes is cut; points closer than a third of a unit are thinned away.
    void line(std::span<const double> x, std::span<const double> y, const LineStyle& style);
    void segment(double x0, double y0, double x1, double y1, const LineStyle& style);
    /// A line across the whole plot.
    void horizontal(double y, const LineStyle& style);
    void vertical(double x, const LineStyle& style);
    /// A word beside a point, kept inside the plot.
    void word(double x, double y, const std::string& text, const std::string& colour);
    enum class Mark { cross, circle, drop };
    void mark(double x, double y, Mark mark, const std::string& colour);
    /// One entry of the key below the plot.
    void key(const std::string& text, const LineStyle& style);

    std::string svg() const;

  private:
    double x_of(double value) const;
    double y_of(double value) const;
    bool is_inside(double x, double y) const;
    std::string frame_and_ticks() const;
    std::string key_entries() const;

    std::string title_;
    double width_;
    double height_;
    PlotAxis x_;
    PlotAxis y_;
    std::string drawn_;
    std::vector<std::pair<std::string, LineStyle>> keys_;
};

/// Values at which an axis is marked: decades (and 2, 5 where there is room) on a logarithmic axis,
/// multiples of 1, 2, 5 times a power of ten, or of 45 where `in_degrees`, on a linear one.
std::vector<double> tick_values(const PlotAxis& axis, bool in_degrees = false);

} // namespace cornerwright
