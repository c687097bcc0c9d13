#include "core/realisation/fixed_sections.h"
#include "core/realisation/node_bounds.h"
#include "core/realisation/precision.h"
#include "core/realisation/quadratic.h"
#include "core/realisation/section_coefficients.h"
#include "core/realisation/section_equivalent.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numbers>

namespace cornerwright {
namespace {

Complex polynomial(const std::array<double, 3>& c, std::size_t order, Complex d) {
    Complex value = c[0];
    for (std::size_t i = 1; i <= order; ++i)
        value = value * d + c[i];
    return value;
}

/// Angles in (0, pi] on which the response of every section is looked at: an even logarithmic grid,
/// and a fine one around each pole, whose peak is as wide as the pole is deep.
std::vector<double> angles_for(const DifferenceEquation& equation) {
    constexpr int per_decade = 40;
    constexpr int decades = 7;
    constexpr int around_pole = 8;
    std::vector<double> angles;
    for (int i = 0; i <= per_decade * decades; ++i)
        angles.push_back(std::numbers::pi * std::pow(10.0, -static_cast<double>(i) / per_decade));
    for (const Complex& pole : roots_in_z_minus_1(equation).poles) {
        const double angle = std::abs(std::arg(1.0 + pole));
        const double depth = std::abs(1.0 - std::abs(1.0 + pole));
        for (int i = -around_pole; i <= around_pole; ++i) {
            const double near = angle + depth * static_cast<double>(i) / around_pole;
            if (near > 0.0 && near <= std::numbers::pi)
                angles.push_back(near);
        }
    }
    return angles;
}

/// Largest size over the grid of output and stored states of every section, infinite behind an
/// integrator.
std::vector<NodeBounds> l_infinity_bounds(const DifferenceEquation& equation) {
    const Structure structure = equation.realisation.structure;
    std::vector<NodeBounds> bounds(equation.sections.size());
    for (const double angle : angles_for(equation)) {
        const Complex d = complex_expm1(Complex(0.0, angle));
        Complex input = 1.0;
        for (std::size_t i = 0; i < bounds.size(); ++i) {
            const DiscreteSection& section = equation.sections[i];
            const std::size_t order = order_of(section, structure);
            const Complex transfer =
                polynomial(section.beta, order, d) / polynomial(section.alpha, order, d);
            bounds[i].output = std::max(bounds[i].output, std::abs(input * transfer));
            if (structure != Structure::direct_form_1) {
                const auto& b = structure == Structure::delta ? section.beta : section.b;
                const auto& a = structure == Structure::delta ? section.alpha : section.a;
                const Complex step = structure == Structure::delta ? d : 1.0 + d;
                const Complex w1 = transfer - b[0]; // y = b0 x + w1
                const Complex w2 = (b[2] - a[2] * transfer) / step;
                bounds[i].states[0] = std::max(bounds[i].states[0], std::abs(input * w1));
                bounds[i].states[1] = std::max(
                    bounds[i].states[1], std::ldexp(std::abs(input * w2), section.delta_shift));
            }
            input *= transfer;
        }
    }
    bool unbounded = false;
    for (std::size_t i = 0; i < bounds.size(); ++i) {
        unbounded = unbounded || has_integrator(equation.sections[i], structure);
        if (unbounded)
            bounds[i].output = std::numeric_limits<double>::infinity();
    }
    return bounds;
}

SignalBound bound_of(std::string signal, double l1, double l_infinity, double range) {
    return {std::move(signal), Figure::of(l1), Figure::of(l_infinity),
            Figure::of(std::log2(range / l1))};
}

} // namespace

std::vector<SignalBound> signal_bounds(const DifferenceEquation& equation) {
    const NumberFormat& format = equation.realisation.number_format;
    if (format.type != NumberFormat::Type::fixed)
        return {};
    const Structure structure = equation.realisation.structure;
    const std::vector<NodeBounds> l1 = l1_bounds(equation.sections, structure);
    const std::vector<NodeBounds> l_infinity = l_infinity_bounds(equation);
    const double range = range_of(format);
    std::vector<SignalBound> result;
    for (std::size_t i = 0; i < l1.size(); ++i) {
        const std::string place = "section " + std::to_string(i + 1) + ", ";
        result.push_back(bound_of(place + "output", l1[i].output, l_infinity[i].output, range));
        if (structure == Structure::direct_form_1)
            continue;
        for (std::size_t state = 0; state < order_of(equation.sections[i], structure); ++state)
            result.push_back(bound_of(place + (state == 0 ? "w1" : "w2"), l1[i].states[state],
                                      std::isinf(l1[i].states[state]) ? l1[i].states[state]
                                                                      : l_infinity[i].states[state],
                                      range));
    }
    return result;
}

} // namespace cornerwright
