#pragma once

#include "core/numerics/root_form.h"

#include <array>
#include <vector>

namespace cornerwright {

/// Compensator and plant in a row, without their delays, stepped over one delay after another:
/// the compensator is driven by a known past, the plant by the compensator and by a constant
/// disturbance. Both are chains of first-order blocks, so that no coefficient is formed.
class HistoryStepper {
  public:
    /// Points of an interval at which the past is known and outputs are told: both ends and three
    /// between, evenly.
    static constexpr std::size_t nodes = 5;
    using Nodes = std::array<double, nodes>;

    /// Both proper. The intervals of one delay are graded: as short as the fastest block asks just
    /// behind its start, where the past may have a kink, longer as fast blocks die away.
    HistoryStepper(const RootForm& compensator, const RootForm& plant, double delay_s);

    struct Interval {
        double begin_s = 0.0; ///< from the start of the delay
        double length_s = 0.0;
        std::size_t level = 0;
    };
    const std::vector<Interval>& intervals() const { return intervals_; }

    /// State at rest.
    ComplexVector rest() const { return ComplexVector(order_); }

    struct Outputs {
        Nodes compensator{};
        Nodes plant{};
    };
    /// Carries `state` over `interval`; `drive` is the compensator's input at the nodes.
    Outputs advance(const Interval& interval, const Nodes& drive, double disturbance,
                    ComplexVector& state) const;

  private:
    /// What one interval length makes of state, drive and disturbance: rows of the state, then one
    /// row for each node of the compensator's output, then of the plant's; columns drive at the
    /// nodes, disturbance, states.
    struct Level {
        ComplexVector rows;
    };

    void grade(const ComplexVector& poles, double delay_s);

    std::size_t order_ = 0;
    std::vector<Interval> intervals_;
    std::vector<Level> levels_;
    double shortest_s_ = 0.0;
};

/// Derivative at the nodes of the quartic through their values.
HistoryStepper::Nodes node_slopes(const HistoryStepper::Nodes& values, double length_s);

} // namespace cornerwright
