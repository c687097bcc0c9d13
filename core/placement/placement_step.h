#pragma once

#include "core/placement/free_parameters.h"
#include "core/placement/share_gradient.h"

#include <optional>
#include <vector>

namespace cornerwright {

/// Where the logarithms of the free parameters may go: each in its range, and pairs that must keep
/// their order (the pole of a lead above its zero, ...).
struct ParameterRoom {
    struct Order {
        std::size_t lower = 0; ///< ln(lower) + gap <= ln(upper)
        std::size_t upper = 0;
    };
    std::vector<double> low;
    std::vector<double> high;
    std::vector<Order> orders;
};

/// Each value within a factor of its start, corners below `highest_rad_s` (infinite: no bound).
ParameterRoom room_of(const Chain& chain, const std::vector<FreeParameter>& parameters,
                      double widest_factor, double highest_rad_s);

/// `logarithms` moved into the room.
std::vector<double> inside(const ParameterRoom& room, std::vector<double> logarithms);

struct PlacementStep {
    std::vector<double> move;    ///< change of each logarithm, at most the radius
    double predicted = 0.0;      ///< smallest linearised share after the move
    std::vector<double> weights; ///< multiplier of each gradient, sum 1
};

/// The move within `radius` that raises the smallest linearised share most. Empty where the linear
/// program could not be solved.
std::optional<PlacementStep> best_step(const std::vector<ShareGradient>& gradients,
                                       const ParameterRoom& room,
                                       const std::vector<double>& logarithms, double radius);

} // namespace cornerwright
