#include "core/placement/moved_coefficient.h"

#include "core/realisation/section_coefficients.h"

namespace cornerwright {
namespace {

using Coefficients = std::array<double, 3>;

bool is_delta(const DifferenceEquation& equation) {
    return equation.realisation.structure == Structure::delta;
}

Coefficients& running(DifferenceEquation& equation, const CoefficientName& name) {
    DiscreteSection& section = equation.sections[name.section];
    if (is_delta(equation))
        return name.is_numerator ? section.beta : section.alpha;
    return name.is_numerator ? section.b : section.a;
}

} // namespace

std::vector<CoefficientName> coefficients_of(const DifferenceEquation& equation) {
    std::vector<CoefficientName> names;
    for (std::size_t section = 0; section < equation.sections.size(); ++section) {
        for (const bool is_numerator : {true, false}) {
            for (std::size_t power = is_numerator ? 0 : 1; power < 3; ++power) {
                const CoefficientName name{section, is_numerator, power};
                if (coefficient(equation, name) != 0.0)
                    names.push_back(name);
            }
        }
    }
    return names;
}

double coefficient(const DifferenceEquation& equation, const CoefficientName& name) {
    const DiscreteSection& section = equation.sections[name.section];
    if (is_delta(equation))
        return (name.is_numerator ? section.beta : section.alpha)[name.power];
    return (name.is_numerator ? section.b : section.a)[name.power];
}

DifferenceEquation with_coefficient(DifferenceEquation equation, const CoefficientName& name,
                                    double value) {
    running(equation, name)[name.power] = value;
    complete_other_form(equation.sections[name.section], equation.realisation.structure);
    return equation;
}

std::string text_of(const CoefficientName& name, const DifferenceEquation& equation) {
    const char* letter = is_delta(equation) ? (name.is_numerator ? "beta" : "alpha")
                                            : (name.is_numerator ? "b" : "a");
    return letter + std::to_string(name.power);
}

} // namespace cornerwright
