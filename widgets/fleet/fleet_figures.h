#pragma once

#include "core/engine/fleet.h"

#include <QString>

#include <optional>
#include <span>
#include <vector>

namespace cornerwright {

/// A figure of the fleet on one loop, as a person chooses it.
struct FleetFigureChoice {
    std::size_t figure = 0; ///< index into `fleet_figure_names`
    LoopName loop = LoopName::design;
    QString name; ///< "Phase margin, design"
};

/// Every figure that at least one unit has determined.
std::vector<FleetFigureChoice> figureChoices(std::span<const FleetUnit> units);

/// Its values over the units where it is determined, infinite ones included.
std::vector<double> valuesOf(std::span<const FleetUnit> units, const FleetFigureChoice& choice);

/// The measure that judges the figure.
Measure measureOf(const FleetFigureChoice& choice);

/// The limit of the first requirement on it.
std::optional<double> limitOf(std::span<const Requirement> requirements,
                              const FleetFigureChoice& choice);

} // namespace cornerwright
