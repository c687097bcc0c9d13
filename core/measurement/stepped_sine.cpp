#include "core/measurement/stepped_sine.h"

#include "core/numerics/error.h"

#include <Eigen/Dense>

#include <algorithm>
#include <cmath>
#include <numbers>
#include <numeric>
#include <optional>

namespace cornerwright {
namespace {

/// A crossing counts when the signal has been below minus and comes above plus this share of its
/// root mean square: noise around zero makes no crossings.
constexpr double crossing_band = 0.3;
/// A crossing belongs to the stretch if it lies this close to the line through the others, in
/// cycles; half a sample more is the resolution of a fast tone.
constexpr double line_tolerance = 0.04;
constexpr double sample_tolerance = 0.5;
constexpr std::size_t most_groups = 16;
/// Fewer samples do not hold sine, cosine, offset and slope apart from noise.
constexpr double least_samples_in_group = 8.0;
constexpr double tone_tolerance = 0.02;

std::vector<double> rising_crossings(std::span<const double> signal) {
    const auto count = static_cast<double>(signal.size());
    const double mean = std::accumulate(signal.begin(), signal.end(), 0.0) / count;
    double power = 0.0;
    for (const double value : signal)
        power += (value - mean) * (value - mean);
    const double band = crossing_band * std::sqrt(power / count);
    std::vector<double> crossings;
    bool below = false;
    double last_rise = 0.0;
    for (std::size_t n = 1; n < signal.size(); ++n) {
        const double before = signal[n - 1] - mean;
        const double now = signal[n] - mean;
        if (before < 0.0 && now >= 0.0)
            last_rise = static_cast<double>(n - 1) + before / (before - now);
        if (before < -band)
            below = true;
        if (below && now > band) {
            crossings.push_back(last_rise);
            below = false;
        }
    }
    return crossings;
}

/// A channel's amplitude at w (rad a sample) over whole cycles, phase counted from sample 0.
struct Amplitudes {
    Complex excitation;
    Complex response;
};

Amplitudes fit_group(const TimeRecord& record, double w, std::size_t begin, std::size_t end) {
    Eigen::Matrix4d normal = Eigen::Matrix4d::Zero();
    Eigen::Matrix<double, 4, 2> right = Eigen::Matrix<double, 4, 2>::Zero();
    const double centre = 0.5 * static_cast<double>(begin + end - 1);
    const double half = 0.5 * static_cast<double>(end - begin);
    for (std::size_t n = begin; n < end; ++n) {
        const double time = static_cast<double>(n);
        const Eigen::Vector4d basis{std::cos(w * time), std::sin(w * time), 1.0,
                                    (time - centre) / half};
        normal += basis * basis.transpose();
        right.col(0) += record.excitation[n] * basis;
        right.col(1) += record.response[n] * basis;
    }
    const Eigen::Matrix<double, 4, 2> solution = normal.ldlt().solve(right);
    // a cos + b sin is the real part of (a - jb) exp(jwt).
    return {{solution(0, 0), -solution(1, 0)}, {solution(0, 1), -solution(1, 1)}};
}

struct TonePoint {
    double w_rad_s = 0.0;
    std::size_t groups = 0;
    double excitation = 0.0; ///< S_uu
    double response = 0.0;   ///< S_yy
    Complex cross;           ///< S_yu
};

std::optional<TonePoint> measure(const TimeRecord& record, const ToneStep& step, double w_rad_s) {
    const std::size_t settling = std::max<std::size_t>(1, (step.cycles + 3) / 4);
    if (step.cycles < settling + 3)
        return std::nullopt;
    const std::size_t cycles = step.cycles - settling - 1;
    const auto cycles_of_group = static_cast<std::size_t>(
        std::max({1.0, std::ceil(least_samples_in_group / step.period),
                  std::ceil(static_cast<double>(cycles) / static_cast<double>(most_groups))}));
    TonePoint point;
    point.w_rad_s = w_rad_s;
    const double w = w_rad_s * record.sample_period_s;
    const double first = step.begin + static_cast<double>(settling) * step.period;
    for (std::size_t cycle = 0; cycle + cycles_of_group <= cycles; cycle += cycles_of_group) {
        const auto at = [&](std::size_t number) {
            return static_cast<std::size_t>(
                std::llround(first + static_cast<double>(number) * step.period));
        };
        const auto [u, y] = fit_group(record, w, at(cycle), at(cycle + cycles_of_group));
        point.excitation += std::norm(u);
        point.response += std::norm(y);
        point.cross += y * std::conj(u);
        ++point.groups;
    }
    if (point.groups < 2)
        return std::nullopt;
    return point;
}

/// The known tone nearest to the one found, or nothing; the found one itself where none is known.
std::optional<double> named_tone(double w_rad_s, const std::vector<double>& tones) {
    if (tones.empty())
        return w_rad_s;
    const double nearest = *std::min_element(tones.begin(), tones.end(), [&](double a, double b) {
        return std::abs(a - w_rad_s) < std::abs(b - w_rad_s);
    });
    if (std::abs(nearest - w_rad_s) > tone_tolerance * w_rad_s)
        return std::nullopt;
    return nearest;
}

/// Steps of the same tone become one point.
void merge_equal_tones(std::vector<TonePoint>& points) {
    constexpr double same = 1e-4;
    std::sort(points.begin(), points.end(),
              [](const TonePoint& a, const TonePoint& b) { return a.w_rad_s < b.w_rad_s; });
    std::vector<TonePoint> merged;
    for (const TonePoint& point : points) {
        if (merged.empty() || point.w_rad_s - merged.back().w_rad_s > same * point.w_rad_s) {
            merged.push_back(point);
            continue;
        }
        merged.back().groups += point.groups;
        merged.back().excitation += point.excitation;
        merged.back().response += point.response;
        merged.back().cross += point.cross;
    }
    points = std::move(merged);
}

} // namespace

std::vector<ToneStep> find_tone_steps(std::span<const double> excitation,
                                      std::size_t least_cycles) {
    const std::vector<double> crossings = rising_crossings(excitation);
    std::vector<ToneStep> steps;
    for (std::size_t begin = 0; begin + least_cycles < crossings.size();) {
        std::size_t last = begin + 1;
        double period = crossings[last] - crossings[begin];
        while (last + 1 < crossings.size()) {
            const double expected =
                crossings[begin] + static_cast<double>(last + 1 - begin) * period;
            if (std::abs(crossings[last + 1] - expected) >
                line_tolerance * period + sample_tolerance)
                break;
            ++last;
            period = (crossings[last] - crossings[begin]) / static_cast<double>(last - begin);
        }
        if (last - begin >= least_cycles)
            steps.push_back({crossings[begin], period, last - begin});
        // The cycle in which the tone changes belongs to neither step.
        begin = last - begin >= least_cycles ? last : begin + 1;
    }
    return steps;
}

Estimate estimate_stepped_sine(const TimeRecord& record, const std::vector<double>& tones_rad_s) {
    std::vector<TonePoint> points;
    std::size_t left_out = 0;
    for (const ToneStep& step : find_tone_steps(record.excitation)) {
        const double found = 2.0 * std::numbers::pi / (step.period * record.sample_period_s);
        const auto tone = named_tone(found, tones_rad_s);
        const auto point = tone ? measure(record, step, *tone) : std::nullopt;
        if (point && point->excitation > 0.0 && point->cross != 0.0)
            points.push_back(*point);
        else
            ++left_out;
    }
    merge_equal_tones(points);
    if (points.size() < 2)
        throw InputError({},
                         "an excitation that steps over at least two tones of eight cycles each",
                         points.empty() ? "none" : "one tone");
    Estimate estimate;
    std::size_t fewest = points.front().groups;
    for (const TonePoint& point : points) {
        estimate.response.w_rad_s.push_back(point.w_rad_s);
        estimate.response.response.push_back(point.cross / point.excitation);
        estimate.response.coherence.push_back(
            std::min(1.0, std::norm(point.cross) / (point.excitation * point.response)));
        fewest = std::min(fewest, point.groups);
    }
    estimate.response.averages = static_cast<double>(fewest);
    if (left_out > 0)
        estimate.warnings.push_back("tones left out: " + std::to_string(left_out) +
                                    " steps are too short, or none of the tones named");
    return estimate;
}

} // namespace cornerwright
