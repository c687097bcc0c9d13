#include "core/realisation/node_bounds.h"

#include "core/realisation/linear_section.h"
#include "core/realisation/quadratic.h"
#include "core/realisation/section_coefficients.h"

#include <algorithm>
#include <cmath>
#include <limits>

namespace cornerwright {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();

/// Sections up to the first with an integrator: behind it nothing is bounded.
std::size_t bounded_sections(std::span<const DiscreteSection> sections, Structure structure) {
    const auto first = std::ranges::find_if(sections, [structure](const DiscreteSection& section) {
        return has_integrator(section, structure);
    });
    return static_cast<std::size_t>(first - sections.begin());
}

void add_sizes(NodeBounds& bounds, double output, const LinearSection<double>& section,
               double weight) {
    bounds.output += weight * std::abs(output);
    for (std::size_t state = 0; state < 2; ++state)
        bounds.states[state] += weight * std::abs(section.stored(state));
}

/// |pole| of the slowest mode that is not an integrator.
double slowest_radius(std::span<const DiscreteSection> sections) {
    double radius = 0.0;
    for (const DiscreteSection& section : sections)
        for (const Complex& d :
             quadratic_roots({section.alpha[0], section.alpha[1], section.alpha[2]}).roots)
            if (d != 0.0)
                radius = std::max(radius, std::abs(1.0 + d));
    return radius;
}

} // namespace

ImpulseLength impulse_length(std::span<const DiscreteSection> sections) {
    constexpr double time_constants = 20.0;
    constexpr double fewest = 64.0;
    constexpr double most = 200000.0;
    const double radius = slowest_radius(sections);
    if (radius >= 1.0)
        return {0, 0.0, false};
    const double time_constant = radius > 0.0 ? -1.0 / std::log(radius) : 0.0;
    const double samples = std::ceil(time_constants * time_constant);
    return {static_cast<int>(std::clamp(samples, fewest, most)),
            samples > most ? time_constant : 0.0, true};
}

double NodeBounds::largest() const {
    return std::max({output, states[0], states[1]});
}

std::vector<NodeBounds> l1_bounds(std::span<const DiscreteSection> sections, Structure structure) {
    const std::size_t bounded = bounded_sections(sections, structure);
    std::vector<NodeBounds> bounds(sections.size(), NodeBounds{infinity, {infinity, infinity}});
    std::vector<LinearSection<double>> run;
    for (std::size_t i = 0; i < bounded; ++i) {
        run.emplace_back(sections[i], structure);
        bounds[i] = {};
    }
    const ImpulseLength length = impulse_length(sections.first(bounded));
    if (!length.decays) { // rounding pushed a pole out of the unit circle
        std::ranges::fill(bounds, NodeBounds{infinity, {infinity, infinity}});
        return bounds;
    }
    for (int n = 0; n < length.samples; ++n) {
        double signal = n == 0 ? 1.0 : 0.0;
        const double weight = n + 1 == length.samples ? 1.0 + length.tail : 1.0;
        for (std::size_t i = 0; i < bounded; ++i) {
            signal = run[i].step(signal);
            add_sizes(bounds[i], signal, run[i], weight);
        }
    }
    if (structure == Structure::direct_form_1)
        for (std::size_t i = 0; i < bounded; ++i)
            bounds[i].states = {};
    return bounds;
}

} // namespace cornerwright
