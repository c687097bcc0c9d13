#include "core/realisation/node_bounds.h"

#include "core/realisation/quadratic.h"
#include "core/realisation/section_coefficients.h"

#include <algorithm>
#include <cmath>
#include <limits>

namespace cornerwright {
namespace {

constexpr double infinity = std::numeric_limits<double>::infinity();

/// One section on doubles, stepped as its structure stores its states.
class LinearSection {
  public:
    LinearSection(const DiscreteSection& section, Structure structure)
        : section_(&section), delta_(structure == Structure::delta) {
        if (delta_)
            scale_ = std::ldexp(1.0, section.delta_shift);
    }

    double step(double x) {
        if (delta_) {
            const double y = section_->beta[0] * x + w_[0];
            w_[0] += section_->beta[1] * x - section_->alpha[1] * y + w_[1];
            w_[1] += section_->beta[2] * x - section_->alpha[2] * y;
            return y;
        }
        const double y = section_->b[0] * x + w_[0];
        w_[0] = section_->b[1] * x - section_->a[1] * y + w_[1];
        w_[1] = section_->b[2] * x - section_->a[2] * y;
        return y;
    }

    double size(std::size_t state) const {
        return std::abs(w_[state]) * (state == 1 ? scale_ : 1.0);
    }

  private:
    const DiscreteSection* section_;
    bool delta_;
    double scale_ = 1.0;
    std::array<double, 2> w_{};
};

/// Sections up to the first with an integrator: behind it nothing is bounded.
std::size_t bounded_sections(std::span<const DiscreteSection> sections, Structure structure) {
    const auto first = std::ranges::find_if(sections, [structure](const DiscreteSection& section) {
        return has_integrator(section, structure);
    });
    return static_cast<std::size_t>(first - sections.begin());
}

/// |pole| of the slowest mode.
double slowest_radius(std::span<const DiscreteSection> sections) {
    double radius = 0.0;
    for (const DiscreteSection& section : sections)
        for (const Complex& d :
             quadratic_roots({section.alpha[0], section.alpha[1], section.alpha[2]}).roots)
            if (d != 0.0)
                radius = std::max(radius, std::abs(1.0 + d));
    return radius;
}

void add_sizes(NodeBounds& bounds, double output, const LinearSection& section) {
    bounds.output += std::abs(output);
    for (std::size_t state = 0; state < 2; ++state)
        bounds.states[state] += section.size(state);
}

} // namespace

double NodeBounds::largest() const {
    return std::max({output, states[0], states[1]});
}

std::vector<NodeBounds> l1_bounds(std::span<const DiscreteSection> sections, Structure structure) {
    // The sum runs over this many time constants of the slowest mode (the rest is below e^-20 of
    // the whole), within limits that keep the slowest corners at the highest rates affordable;
    // what is then left is added as a geometric tail.
    constexpr double time_constants = 20.0;
    constexpr double fewest = 64.0;
    constexpr double most = 200000.0;

    const std::size_t bounded = bounded_sections(sections, structure);
    std::vector<NodeBounds> bounds(sections.size(), NodeBounds{infinity, {infinity, infinity}});
    std::vector<LinearSection> run;
    for (std::size_t i = 0; i < bounded; ++i) {
        run.emplace_back(sections[i], structure);
        bounds[i] = {};
    }
    const double radius = slowest_radius(sections.first(bounded));
    if (radius >= 1.0) { // rounding pushed a pole out of the unit circle
        std::ranges::fill(bounds, NodeBounds{infinity, {infinity, infinity}});
        return bounds;
    }
    const double time_constant = radius > 0.0 ? -1.0 / std::log(radius) : 0.0;
    const double steps = std::clamp(time_constants * time_constant, fewest, most);
    const double tail = std::ceil(steps) < most ? 0.0 : time_constant;
    for (double n = 0.0; n < steps; n += 1.0) {
        double signal = n == 0.0 ? 1.0 : 0.0;
        const bool last = n + 1.0 >= steps;
        for (std::size_t i = 0; i < bounded; ++i) {
            signal = run[i].step(signal);
            add_sizes(bounds[i], last ? signal * (1.0 + tail) : signal, run[i]);
        }
    }
    if (structure == Structure::direct_form_1)
        for (std::size_t i = 0; i < bounded; ++i)
            bounds[i].states = {};
    return bounds;
}

} // namespace cornerwright
