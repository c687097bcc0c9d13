#include "core/handover/svg_plot.h"

#include "core/handover/markup.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <optional>
#include <utility>

namespace cornerwright {
namespace {

constexpr double left_margin = 62.0;
constexpr double right_margin = 14.0;
constexpr double top_margin = 26.0;
constexpr double bottom_margin = 58.0;
constexpr const char* ink = "#1F2328";
constexpr const char* muted = "#6B6F76";
constexpr const char* grid = "#EBE9E3";
constexpr const char* hairline = "#DEDBD3";

/// A coordinate with a tenth of a unit, which no eye resolves further.
std::string at(double value) {
    return number_text(std::round(value * 10.0) / 10.0);
}

std::string attributes(const LineStyle& style) {
    std::string text = " stroke=\"" + style.colour + "\" stroke-width=\"" +
                       number_text(style.width, 3) + "\" fill=\"none\"";
    if (!style.dash.empty())
        text += " stroke-dasharray=\"" + style.dash + "\"";
    return text;
}

std::string straight(double x0, double y0, double x1, double y1, const LineStyle& style) {
    return "<line x1=\"" + at(x0) + "\" y1=\"" + at(y0) + "\" x2=\"" + at(x1) + "\" y2=\"" +
           at(y1) + "\"" + attributes(style) + "/>\n";
}

std::string words(double x, double y, const std::string& text, const std::string& anchor,
                  const std::string& colour, const std::string& extra = "") {
    return "<text x=\"" + at(x) + "\" y=\"" + at(y) + "\" text-anchor=\"" + anchor + "\" fill=\"" +
           colour + "\"" + extra + ">" + escaped(text) + "</text>\n";
}

struct Point {
    double x = 0.0;
    double y = 0.0;
    bool operator==(const Point&) const = default;
};

struct Frame {
    Point low;
    Point high;
};

Frame frame_of(double width, double height) {
    return {{left_margin, top_margin}, {width - right_margin, height - bottom_margin}};
}

/// The part of a straight line inside the frame (Liang and Barsky's parametric clipping). Cut here
/// and not by a clip path, which simple SVG readers ignore.
std::optional<std::pair<Point, Point>> clipped(Point from, Point to, const Frame& frame) {
    const Point step{to.x - from.x, to.y - from.y};
    double enter = 0.0;
    double leave = 1.0;
    const std::array<std::pair<double, double>, 4> borders{{{-step.x, from.x - frame.low.x},
                                                            {step.x, frame.high.x - from.x},
                                                            {-step.y, from.y - frame.low.y},
                                                            {step.y, frame.high.y - from.y}}};
    for (const auto& [towards, room] : borders) {
        if (towards == 0.0 && room < 0.0)
            return {};
        if (towards < 0.0)
            enter = std::max(enter, room / towards);
        else if (towards > 0.0)
            leave = std::min(leave, room / towards);
    }
    if (enter > leave)
        return {};
    const auto along = [&](double part) {
        return Point{from.x + part * step.x, from.y + part * step.y};
    };
    return std::pair{enter == 0.0 ? from : along(enter), leave == 1.0 ? to : along(leave)};
}

std::vector<double> logarithmic_ticks(const PlotAxis& axis) {
    const double decades = std::log10(axis.high / axis.low);
    std::vector<double> steps{1.0};
    if (decades < 3.5)
        steps = {1.0, 2.0, 5.0};
    const int every = std::max(1, static_cast<int>(std::ceil(decades / 9.0)));
    std::vector<double> ticks;
    const int first = static_cast<int>(std::floor(std::log10(axis.low)));
    const int last = static_cast<int>(std::ceil(std::log10(axis.high)));
    for (int decade = first; decade <= last; decade += every) {
        for (const double step : steps) {
            const double value = step * std::pow(10.0, decade);
            if (value >= axis.low * (1.0 - 1e-9) && value <= axis.high * (1.0 + 1e-9))
                ticks.push_back(value);
        }
    }
    return ticks;
}

double linear_step(double span, bool in_degrees) {
    constexpr double wanted_ticks = 6.0;
    const double rough = span / wanted_ticks;
    if (in_degrees) {
        for (const double step : {5.0, 15.0, 30.0, 45.0, 90.0, 180.0})
            if (step >= rough)
                return step;
        return 360.0 * std::ceil(rough / 360.0);
    }
    const double decade = std::pow(10.0, std::floor(std::log10(rough)));
    for (const double step : {1.0, 2.0, 5.0})
        if (step * decade >= rough)
            return step * decade;
    return 10.0 * decade;
}

} // namespace

std::vector<double> tick_values(const PlotAxis& axis, bool in_degrees) {
    if (axis.logarithmic)
        return logarithmic_ticks(axis);
    const double step = linear_step(axis.high - axis.low, in_degrees);
    std::vector<double> ticks;
    const auto first = static_cast<long>(std::ceil(axis.low / step - 1e-9));
    const auto last = static_cast<long>(std::floor(axis.high / step + 1e-9));
    for (long i = first; i <= last; ++i)
        ticks.push_back(static_cast<double>(i) * step);
    return ticks;
}

SvgPlot::SvgPlot(std::string title, double width, double height, PlotAxis x, PlotAxis y)
    : title_(std::move(title)),
      width_(width),
      height_(height),
      x_(std::move(x)),
      y_(std::move(y)) {}

double SvgPlot::x_of(double value) const {
    const double place = x_.logarithmic ? std::log(value / x_.low) / std::log(x_.high / x_.low)
                                        : (value - x_.low) / (x_.high - x_.low);
    return left_margin + place * (width_ - left_margin - right_margin);
}

double SvgPlot::y_of(double value) const {
    const double place = (value - y_.low) / (y_.high - y_.low);
    return height_ - bottom_margin - place * (height_ - top_margin - bottom_margin);
}

bool SvgPlot::is_inside(double x, double y) const {
    return x >= x_.low && x <= x_.high && y >= y_.low && y <= y_.high;
}

void SvgPlot::line(std::span<const double> x, std::span<const double> y, const LineStyle& style) {
    constexpr double thinnest = 0.35;
    const Frame frame = frame_of(width_, height_);
    std::string path;
    std::optional<Point> last;
    bool pen_down = false;
    for (std::size_t i = 0; i < x.size(); ++i) {
        if (!std::isfinite(x[i]) || !std::isfinite(y[i]) || (x_.logarithmic && x[i] <= 0.0)) {
            last.reset();
            pen_down = false;
            continue;
        }
        const Point here{x_of(x[i]), y_of(y[i])};
        if (last && i + 1 < x.size() && std::hypot(here.x - last->x, here.y - last->y) < thinnest)
            continue;
        const auto visible = last ? clipped(*last, here, frame) : std::nullopt;
        if (visible) {
            if (!pen_down || visible->first != *last)
                path += "M" + at(visible->first.x) + " " + at(visible->first.y);
            path += "L" + at(visible->second.x) + " " + at(visible->second.y);
        }
        pen_down = visible && visible->second == here;
        last = here;
    }
    if (!path.empty())
        drawn_ += "<path d=\"" + path + "\"" + attributes(style) + "/>\n";
}

void SvgPlot::segment(double x0, double y0, double x1, double y1, const LineStyle& style) {
    const auto visible =
        clipped({x_of(x0), y_of(y0)}, {x_of(x1), y_of(y1)}, frame_of(width_, height_));
    if (visible)
        drawn_ += straight(visible->first.x, visible->first.y, visible->second.x, visible->second.y,
                           style);
}

void SvgPlot::horizontal(double y, const LineStyle& style) {
    segment(x_.low, y, x_.high, y, style);
}

void SvgPlot::vertical(double x, const LineStyle& style) {
    segment(x, y_.low, x, y_.high, style);
}

void SvgPlot::word(double x, double y, const std::string& text, const std::string& colour) {
    if (!is_inside(x, y))
        return;
    const bool to_the_left = x_of(x) > width_ * 0.7;
    const auto written = [&](const std::string& fill, const std::string& extra) {
        return words(x_of(x) + (to_the_left ? -6.0 : 6.0), y_of(y) - 4.0, text,
                     to_the_left ? "end" : "start", fill, extra);
    };
    // A ground behind the letters, so that a curve below them does not strike them out.
    drawn_ += written("#FFFFFF", " stroke=\"#FFFFFF\" stroke-width=\"3\" aria-hidden=\"true\"");
    drawn_ += written(colour, "");
}

void SvgPlot::mark(double x, double y, Mark mark, const std::string& colour) {
    if (!is_inside(x, y))
        return;
    constexpr double size = 4.5;
    const double px = x_of(x);
    const double py = y_of(y);
    const LineStyle style{colour, 1.6, ""};
    switch (mark) {
    case Mark::cross:
        drawn_ += straight(px - size, py - size, px + size, py + size, style);
        drawn_ += straight(px - size, py + size, px + size, py - size, style);
        break;
    case Mark::circle:
        drawn_ += "<circle cx=\"" + at(px) + "\" cy=\"" + at(py) + "\" r=\"" + at(size) + "\"" +
                  attributes(style) + "/>\n";
        break;
    case Mark::drop:
        drawn_ += "<circle cx=\"" + at(px) + "\" cy=\"" + at(py) + "\" r=\"3.2\" fill=\"" + colour +
                  "\"/>\n";
        break;
    }
}

void SvgPlot::key(const std::string& text, const LineStyle& style) {
    keys_.emplace_back(text, style);
}

std::string SvgPlot::frame_and_ticks() const {
    const double x0 = left_margin;
    const double x1 = width_ - right_margin;
    const double y0 = height_ - bottom_margin;
    const double y1 = top_margin;
    std::string text = "<rect x=\"" + at(x0) + "\" y=\"" + at(y1) + "\" width=\"" + at(x1 - x0) +
                       "\" height=\"" + at(y0 - y1) + "\" fill=\"#FFFFFF\" stroke=\"" + hairline +
                       "\"/>\n";
    for (const double tick : tick_values(x_)) {
        text += straight(x_of(tick), y0, x_of(tick), y1, {grid, 1.0, ""});
        text += words(x_of(tick), y0 + 14.0, number_text(tick, 4), "middle", muted);
    }
    const bool in_degrees = y_.label.find("deg") != std::string::npos;
    for (const double tick : tick_values(y_, in_degrees)) {
        text += straight(x0, y_of(tick), x1, y_of(tick), {grid, 1.0, ""});
        text += words(x0 - 6.0, y_of(tick) + 4.0, number_text(tick, 4), "end", muted);
    }
    text += words((x0 + x1) / 2.0, y0 + 29.0, x_.label, "middle", ink);
    text += words(x0, y1 - 9.0, title_, "start", ink, " font-weight=\"bold\"");
    text += words(x1, y1 - 9.0, y_.label, "end", muted);
    return text;
}

std::string SvgPlot::key_entries() const {
    std::string text;
    double x = left_margin;
    for (const auto& [name, style] : keys_) {
        const double y = height_ - 12.0;
        text += straight(x, y - 4.0, x + 22.0, y - 4.0, style);
        text += words(x + 27.0, y, name, "start", muted);
        // Helvetica-like letters at 11 units are about 5.6 units wide.
        x += 27.0 + 5.6 * static_cast<double>(name.size()) + 18.0;
    }
    return text;
}

std::string SvgPlot::svg() const {
    const std::string size = at(width_) + " " + at(height_);
    return "<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 " + size + "\" width=\"" +
           at(width_) + "\" height=\"" + at(height_) +
           "\" role=\"img\" style=\"font-family:Inter,'DejaVu Sans',Helvetica,sans-serif;"
           "font-size:11px\">\n<title>" +
           escaped(title_) + "</title>\n" + frame_and_ticks() + drawn_ + key_entries() + "</svg>\n";
}

} // namespace cornerwright
