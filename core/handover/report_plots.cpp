#include "core/handover/report_plots.h"

#include "core/handover/svg_plot.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

constexpr double plot_width = 720.0;
constexpr double plot_height = 300.0;

const LineStyle design_style{"#1F2328", 1.4, ""};
const LineStyle realised_style{"#1F2328", 1.4, "6 3"};
const LineStyle plant_style{"#8A8F98", 1.2, ""};
const LineStyle faint_style{"#C9CCD1", 0.8, ""};
const LineStyle reference_style{"#6B6F76", 1.0, ""};
const LineStyle margin_style{"#0F766E", 2.0, ""};
const LineStyle crossing_style{"#0F766E", 1.0, "2 3"};
constexpr const char* accent = "#0F766E";
constexpr const char* graphite = "#8A8F98";

struct Range {
    double low = HUGE_VAL;
    double high = -HUGE_VAL;

    void include(double value) {
        if (!std::isfinite(value))
            return;
        low = std::min(low, value);
        high = std::max(high, value);
    }
    bool empty() const { return low > high; }
    Range widened(double step, double most_low, double most_high) const {
        if (empty())
            return {most_low, most_high};
        return {std::max(std::floor(low / step) * step - step / 2.0, most_low),
                std::min(std::ceil(high / step) * step + step / 2.0, most_high)};
    }
};

void include_crossings(Range& range, const LoopFigures& figures) {
    for (const double w : figures.frequency.crossovers_rad_s)
        range.include(w);
    const Figure& at = figures.frequency.gain_margin_at_rad_s;
    if (at.is_value())
        range.include(at.value());
}

/// The decades around the crossings, within what the curves cover.
PlotAxis frequency_axis(const Assessment& assessment, std::size_t shown) {
    constexpr double decades_below = 100.0;
    constexpr double decades_above = 30.0;
    const CaseAssessment& plant_case = assessment.cases[shown];
    Range covered;
    for (const double w : plant_case.design.curves.w_rad_s)
        covered.include(w);
    Range crossings;
    include_crossings(crossings, plant_case.design.figures);
    if (plant_case.realised)
        include_crossings(crossings, plant_case.realised->figures);
    if (covered.empty() || covered.low <= 0.0)
        return {true, 0.1, 100.0, "rad/s"};
    if (crossings.empty() || crossings.low <= 0.0)
        return {true, covered.low, covered.high, "rad/s"};
    const double low = std::max(covered.low, crossings.low / decades_below);
    const double high = std::min(covered.high, crossings.high * decades_above);
    return {true, low, std::max(high, 2.0 * low), "rad/s"};
}

Range values_within(const LoopCurves& curves, const std::vector<double>& values,
                    const PlotAxis& axis) {
    Range range;
    for (std::size_t i = 0; i < std::min(values.size(), curves.w_rad_s.size()); ++i) {
        if (curves.w_rad_s[i] >= axis.low && curves.w_rad_s[i] <= axis.high)
            range.include(values[i]);
    }
    return range;
}

/// Every other case's curve faint, then whatever the caller draws full.
template <typename Curve>
void draw_others(SvgPlot& plot, const Assessment& assessment, std::size_t shown, Curve curve) {
    for (std::size_t i = 0; i < assessment.cases.size(); ++i) {
        const LoopCurves& curves = assessment.cases[i].design.curves;
        if (i != shown)
            plot.line(curves.w_rad_s, curve(curves), faint_style);
    }
}

void add_loop_keys(SvgPlot& plot, const Assessment& assessment, std::size_t shown) {
    const CaseAssessment& plant_case = assessment.cases[shown];
    plot.key("design loop, " + plant_case.name, design_style);
    if (plant_case.realised)
        plot.key("realised loop", realised_style);
    if (assessment.cases.size() > 1)
        plot.key("other cases", faint_style);
}

std::string margin_word(const char* name, const Figure& figure, const char* unit) {
    return std::string(name) + " " + number_text(figure.value(), 3) + unit;
}

} // namespace

std::size_t worst_case_of(const Assessment& assessment) {
    double smallest = HUGE_VAL;
    std::string name;
    for (const RequirementResult& result : assessment.verdict.requirements) {
        if (result.worst.share.is_determined() && result.worst.share.value() < smallest) {
            smallest = result.worst.share.value();
            name = result.worst.case_name;
        }
    }
    for (std::size_t i = 0; i < assessment.cases.size(); ++i) {
        if (assessment.cases[i].name == name)
            return i;
    }
    return 0;
}

std::string magnitude_plot(const Assessment& assessment, std::size_t shown) {
    const CaseAssessment& plant_case = assessment.cases[shown];
    const PlotAxis x = frequency_axis(assessment, shown);
    const LoopCurves& curves = plant_case.design.curves;
    const Range y = values_within(curves, curves.loop_db, x).widened(20.0, -100.0, 120.0);
    SvgPlot plot("Magnitude of plant and loop", plot_width, plot_height, x,
                 {false, y.low, y.high, "dB"});
    draw_others(plot, assessment, shown, [](const LoopCurves& c) { return c.loop_db; });
    plot.line(curves.w_rad_s, curves.plant_db, plant_style);
    plot.horizontal(0.0, reference_style);
    plot.line(curves.w_rad_s, curves.loop_db, design_style);
    if (plant_case.realised)
        plot.line(plant_case.realised->curves.w_rad_s, plant_case.realised->curves.loop_db,
                  realised_style);
    const LoopFigures& figures =
        plant_case.realised ? plant_case.realised->figures : plant_case.design.figures;
    const FrequencyFigures& f = figures.frequency;
    if (f.gain_margin_db.is_value() && f.gain_margin_at_rad_s.is_value()) {
        const double w = f.gain_margin_at_rad_s.value();
        plot.segment(w, 0.0, w, -f.gain_margin_db.value(), margin_style);
        plot.word(w, -f.gain_margin_db.value() / 2.0,
                  margin_word("gain margin", f.gain_margin_db, " dB"), accent);
    }
    if (f.phase_margin_at_rad_s.is_value())
        plot.vertical(f.phase_margin_at_rad_s.value(), crossing_style);
    plot.key("plant", plant_style);
    add_loop_keys(plot, assessment, shown);
    return plot.svg();
}

std::string phase_plot(const Assessment& assessment, std::size_t shown) {
    const CaseAssessment& plant_case = assessment.cases[shown];
    const PlotAxis x = frequency_axis(assessment, shown);
    const LoopCurves& curves = plant_case.design.curves;
    const Range y = values_within(curves, curves.loop_phase_deg, x).widened(45.0, -720.0, 360.0);
    SvgPlot plot("Phase of the loop", plot_width, plot_height, x, {false, y.low, y.high, "deg"});
    draw_others(plot, assessment, shown, [](const LoopCurves& c) { return c.loop_phase_deg; });
    plot.horizontal(-180.0, reference_style);
    plot.line(curves.w_rad_s, curves.loop_phase_deg, design_style);
    if (plant_case.realised)
        plot.line(plant_case.realised->curves.w_rad_s, plant_case.realised->curves.loop_phase_deg,
                  realised_style);
    const LoopFigures& figures =
        plant_case.realised ? plant_case.realised->figures : plant_case.design.figures;
    const FrequencyFigures& f = figures.frequency;
    if (f.phase_margin_deg.is_value() && f.phase_margin_at_rad_s.is_value()) {
        const double w = f.phase_margin_at_rad_s.value();
        plot.vertical(w, crossing_style);
        plot.segment(w, -180.0, w, -180.0 + f.phase_margin_deg.value(), margin_style);
        plot.word(w, -180.0 + f.phase_margin_deg.value() / 2.0,
                  margin_word("phase margin", f.phase_margin_deg, " deg"), accent);
    }
    add_loop_keys(plot, assessment, shown);
    return plot.svg();
}

std::string sensitivity_plot(const Assessment& assessment, std::size_t shown) {
    const CaseAssessment& plant_case = assessment.cases[shown];
    const PlotAxis x = frequency_axis(assessment, shown);
    const LoopAssessment& loop = plant_case.realised ? *plant_case.realised : plant_case.design;
    const LoopCurves& curves = loop.curves;
    const LineStyle complementary{"#0F766E", 1.4, ""};
    Range y = values_within(curves, curves.sensitivity_db, x);
    for (const double value : {6.0, -20.0})
        y.include(value);
    y = y.widened(20.0, -80.0, 60.0);
    SvgPlot plot("Sensitivity S and complementary sensitivity T", plot_width, plot_height, x,
                 {false, y.low, y.high, "dB"});
    plot.horizontal(0.0, reference_style);
    plot.line(curves.w_rad_s, curves.sensitivity_db, design_style);
    plot.line(curves.w_rad_s, curves.complementary_db, complementary);
    const FrequencyFigures& f = loop.figures.frequency;
    if (f.sensitivity_peak_db.is_value() && f.sensitivity_peak_at_rad_s.is_value())
        plot.word(f.sensitivity_peak_at_rad_s.value(), f.sensitivity_peak_db.value(),
                  margin_word("peak", f.sensitivity_peak_db, " dB"), "#1F2328");
    const std::string which = plant_case.realised ? " of the realised loop" : " of the design loop";
    plot.key("|S|" + which, design_style);
    plot.key("|T|" + which, complementary);
    return plot.svg();
}

std::string step_plot(const Assessment& assessment, std::size_t shown) {
    const CaseAssessment& plant_case = assessment.cases[shown];
    Range t;
    Range y;
    y.include(0.0);
    const auto take = [&](const StepCurves& curves) {
        for (const double value : curves.t_s)
            t.include(value);
        for (const double value : curves.y)
            y.include(value);
    };
    take(plant_case.design.step);
    if (plant_case.realised)
        take(plant_case.realised->step);
    if (t.empty() || t.high <= 0.0)
        return {};
    const double room = 0.08 * std::max(y.high - y.low, 1e-12);
    SvgPlot plot("Step of the reference: response of the output", plot_width, plot_height,
                 {false, 0.0, t.high, "s"}, {false, y.low - room, y.high + room, "output"});
    for (std::size_t i = 0; i < assessment.cases.size(); ++i) {
        const StepCurves& step = assessment.cases[i].design.step;
        if (i != shown)
            plot.line(step.t_s, step.y, faint_style);
    }
    plot.horizontal(1.0, reference_style);
    plot.line(plant_case.design.step.t_s, plant_case.design.step.y, design_style);
    if (plant_case.realised)
        plot.line(plant_case.realised->step.t_s, plant_case.realised->step.y, realised_style);
    add_loop_keys(plot, assessment, shown);
    return plot.svg();
}

std::string locus_plot(const RootLocus& locus, const std::string& case_name) {
    if (locus.branches.empty())
        return {};
    Range real;
    Range imaginary;
    const auto take = [&](const ComplexVector& roots) {
        for (const Complex& root : roots) {
            real.include(root.real());
            imaginary.include(root.imag());
        }
    };
    take(locus.closed_loop_poles);
    take(locus.poles);
    take(locus.zeros);
    const double reach = std::max({imaginary.high, -real.low, 1e-9}) * 1.15;
    const double right = std::max(real.high, 0.0) + 0.2 * reach;
    SvgPlot plot("Root locus, " + case_name + " (rad/s)", plot_width, 1.5 * plot_height,
                 {false, -reach, right, "real part"}, {false, -reach, reach, "imaginary part"});
    plot.vertical(0.0, reference_style);
    plot.horizontal(0.0, reference_style);
    for (const LocusBranch& branch : locus.branches) {
        std::vector<double> x;
        std::vector<double> y;
        for (const Complex& pole : branch.poles) {
            x.push_back(pole.real());
            y.push_back(pole.imag());
        }
        plot.line(x, y, design_style);
    }
    for (const Complex& pole : locus.poles)
        plot.mark(pole.real(), pole.imag(), SvgPlot::Mark::cross, graphite);
    for (const Complex& zero : locus.zeros)
        plot.mark(zero.real(), zero.imag(), SvgPlot::Mark::circle, graphite);
    for (const Complex& pole : locus.closed_loop_poles)
        plot.mark(pole.real(), pole.imag(), SvgPlot::Mark::drop, accent);
    for (const AxisCrossing& crossing : locus.crossings)
        plot.word(0.0, crossing.w_rad_s,
                  "gain x " + number_text(crossing.factor, 3) + " at " +
                      number_text(crossing.w_rad_s, 4) + " rad/s",
                  accent);
    return plot.svg();
}

} // namespace cornerwright
