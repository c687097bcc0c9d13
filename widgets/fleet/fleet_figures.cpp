#include "widgets/fleet/fleet_figures.h"

#include "widgets/figure_text.h"

#include <QCoreApplication>

#include <algorithm>

namespace cornerwright {

namespace {

/// In the order of `fleet_figure_names`.
constexpr std::array<Measure, fleet_figure_names.size()> measures{
    Measure::phase_margin,        Measure::gain_margin,      Measure::gain_reduction_margin,
    Measure::delay_margin,        Measure::sensitivity_peak, Measure::complementary_peak,
    Measure::control_effort_peak, Measure::bandwidth};

const Figure& figureOf(const FleetUnit& unit, const FleetFigureChoice& choice) {
    return (choice.loop == LoopName::design ? unit.design : unit.realised)[choice.figure];
}

} // namespace

std::vector<FleetFigureChoice> figureChoices(std::span<const FleetUnit> units) {
    std::vector<FleetFigureChoice> choices;
    for (const LoopName loop : {LoopName::design, LoopName::realised}) {
        const QString loopName = loop == LoopName::design
                                     ? QCoreApplication::translate("FleetFigures", "design loop")
                                     : QCoreApplication::translate("FleetFigures", "realised loop");
        for (std::size_t figure = 0; figure < fleet_figure_names.size(); ++figure) {
            const FleetFigureChoice choice{
                figure, loop,
                QStringLiteral("%1, %2").arg(measureText(measures[figure]), loopName)};
            if (std::ranges::any_of(units, [&choice](const FleetUnit& unit) {
                    return figureOf(unit, choice).is_determined();
                })) {
                choices.push_back(choice);
            }
        }
    }
    return choices;
}

std::vector<double> valuesOf(std::span<const FleetUnit> units, const FleetFigureChoice& choice) {
    std::vector<double> values;
    for (const FleetUnit& unit : units) {
        const Figure& figure = figureOf(unit, choice);
        if (figure.is_determined()) {
            values.push_back(figure.value());
        }
    }
    return values;
}

Measure measureOf(const FleetFigureChoice& choice) {
    return measures[choice.figure];
}

std::optional<double> limitOf(std::span<const Requirement> requirements,
                              const FleetFigureChoice& choice) {
    for (const Requirement& requirement : requirements) {
        if (requirement.measure == measureOf(choice)) {
            return requirement.at_least ? requirement.at_least : requirement.at_most;
        }
    }
    return std::nullopt;
}

} // namespace cornerwright
