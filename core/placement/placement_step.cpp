#include "core/placement/placement_step.h"

#include "core/placement/linear_program.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// Least distance, in ln, that ordered pairs keep: 2 %.
constexpr double order_gap = 0.02;
/// Slack that keeps a start on a border strictly inside for the interior-point method.
constexpr double border_slack = 1e-7;

std::optional<std::size_t> index_of(const std::vector<FreeParameter>& parameters,
                                    std::size_t section, double Section::*value) {
    for (std::size_t i = 0; i < parameters.size(); ++i) {
        if (parameters[i].section == section && parameters[i].parameter.value == value)
            return i;
    }
    return {};
}

void append_order(ParameterRoom& room, const std::vector<FreeParameter>& parameters,
                  std::size_t section, double Section::*lower, double Section::*upper) {
    const auto low = index_of(parameters, section, lower);
    const auto high = index_of(parameters, section, upper);
    if (low && high)
        room.orders.push_back({*low, *high});
}

} // namespace

ParameterRoom room_of(const Chain& chain, const std::vector<FreeParameter>& parameters,
                      double widest_factor, double highest_rad_s) {
    ParameterRoom room;
    const std::vector<double> centre = logarithms_of(chain, parameters);
    const double width = std::log(widest_factor);
    for (std::size_t i = 0; i < parameters.size(); ++i) {
        room.low.push_back(centre[i] - width);
        const double top =
            parameters[i].parameter.is_frequency ? std::log(highest_rad_s) : HUGE_VAL;
        room.high.push_back(std::max(std::min(centre[i] + width, top), room.low.back()));
    }
    for (std::size_t s = 0; s < chain.size(); ++s) {
        if (chain[s].kind == SectionKind::lead)
            append_order(room, parameters, s, &Section::zero_rad_s, &Section::pole_rad_s);
        else if (chain[s].kind == SectionKind::lag)
            append_order(room, parameters, s, &Section::pole_rad_s, &Section::zero_rad_s);
        else if (chain[s].kind == SectionKind::notch)
            append_order(room, parameters, s, &Section::zero_damping, &Section::pole_damping);
    }
    return room;
}

std::vector<double> inside(const ParameterRoom& room, std::vector<double> logarithms) {
    for (std::size_t i = 0; i < logarithms.size(); ++i)
        logarithms[i] = std::clamp(logarithms[i], room.low[i], room.high[i]);
    for (const ParameterRoom::Order& order : room.orders) {
        double& low = logarithms[order.lower];
        double& high = logarithms[order.upper];
        if (low + order_gap > high) {
            const double middle = 0.5 * (low + high);
            low = middle - 0.5 * order_gap;
            high = middle + 0.5 * order_gap;
        }
    }
    return logarithms;
}

std::optional<PlacementStep> best_step(const std::vector<ShareGradient>& gradients,
                                       const ParameterRoom& room,
                                       const std::vector<double>& logarithms, double radius) {
    const std::size_t n = logarithms.size();
    LinearProgram program;
    program.cost.assign(n + 1, 0.0);
    program.cost[n] = -1.0;
    double smallest = HUGE_VAL;
    for (const ShareGradient& gradient : gradients) {
        std::vector<double> row(n + 1, 1.0);
        for (std::size_t i = 0; i < n; ++i)
            row[i] = -gradient.slope[i];
        program.rows.push_back(std::move(row));
        program.bounds.push_back(gradient.share);
        smallest = std::min(smallest, gradient.share);
    }
    const auto bound = [&](std::size_t i, double sign, double limit) {
        std::vector<double> row(n + 1, 0.0);
        row[i] = sign;
        program.rows.push_back(std::move(row));
        program.bounds.push_back(std::max(limit, 0.0) + border_slack);
    };
    for (std::size_t i = 0; i < n; ++i) {
        bound(i, 1.0, std::min(radius, room.high[i] - logarithms[i]));
        bound(i, -1.0, std::min(radius, logarithms[i] - room.low[i]));
    }
    for (const ParameterRoom::Order& order : room.orders) {
        std::vector<double> row(n + 1, 0.0);
        row[order.lower] = 1.0;
        row[order.upper] = -1.0;
        const double distance = logarithms[order.upper] - logarithms[order.lower];
        program.rows.push_back(std::move(row));
        program.bounds.push_back(std::max(distance - order_gap, 0.0) + border_slack);
    }

    std::vector<double> start(n + 1, 0.0);
    start[n] = smallest - 1.0;
    const auto solution = solve(program, start);
    if (!solution)
        return {};
    PlacementStep step;
    step.move.assign(solution->point.begin(), solution->point.end() - 1);
    step.predicted = solution->point.back();
    step.weights.assign(solution->multipliers.begin(),
                        solution->multipliers.begin() +
                            static_cast<std::ptrdiff_t>(gradients.size()));
    return step;
}

} // namespace cornerwright
