#pragma once

#include "core/loop/frequency_figures.h"

#include <random>

namespace cornerwright::practice {

/// Loop of a plant alone, no compensator.
inline DesignLoop plant_alone(RootForm roots, double dead_time_s = 0.0) {
    DesignLoop loop;
    loop.plant = PlantModel{std::move(roots), dead_time_s};
    return loop;
}

/// A strictly proper loop with real and complex roots over several decades, damped from 1 down to
/// 1e-4, at times with an integrator, a zero or a pole on the right. `random` is seeded by the
/// caller.
inline RootForm random_roots(std::mt19937& random, int order) {
    std::uniform_real_distribution<double> unit(0.0, 1.0);
    RootForm form;
    const auto size = [&] { return std::pow(10.0, -2.0 + 5.0 * unit(random)); };
    const auto add = [&](ComplexVector& roots, double chance_right) {
        const double side = unit(random) < chance_right ? 1.0 : -1.0;
        const double w = size();
        if (unit(random) < 0.5) {
            roots.emplace_back(side * w, 0.0);
            return;
        }
        const double damping = std::pow(10.0, -4.0 * unit(random));
        const Complex root(side * damping * w, w * std::sqrt(1.0 - damping * damping));
        roots.push_back(root);
        roots.push_back(std::conj(root));
    };
    if (unit(random) < 0.5)
        form.poles.emplace_back(0.0, 0.0);
    while (static_cast<int>(form.poles.size()) < order)
        add(form.poles, 0.1);
    while (form.zeros.size() + 3 < form.poles.size() && unit(random) < 0.7)
        add(form.zeros, 0.1);
    // A gain that puts |L| around 1 somewhere among the roots.
    const double w = size();
    form.gain = (unit(random) < 0.1 ? -1.0 : 1.0) / std::abs(evaluate(form, Complex(0.0, w)));
    return form;
}

} // namespace cornerwright::practice
