// Time of a rational fit. `fit_against_scipy.py` runs this beside a general-purpose optimiser.

#include "core/fitting/fit.h"

#include <benchmark/benchmark.h>

#include <cmath>
#include <random>

namespace cornerwright {
namespace {

void add_pair(ComplexVector& roots, double w, double damping) {
    const double imaginary = w * std::sqrt(1.0 - damping * damping);
    roots.emplace_back(-damping * w, imaginary);
    roots.emplace_back(-damping * w, -imaginary);
}

/// `pairs` light modes over three decades with a zero pair above each.
PlantModel modes(int pairs) {
    PlantModel plant;
    for (int i = 0; i < pairs; ++i) {
        const double w = 3.0 * std::pow(300.0, (i + 0.5) / pairs);
        add_pair(plant.roots.poles, w, 0.01);
        if (i + 1 < pairs)
            add_pair(plant.roots.zeros, 1.25 * w, 0.02);
    }
    plant.roots.gain = 1.0 / std::abs(evaluate(plant.roots, {0.0, 1.0}));
    return plant;
}

MeasuredResponse measured(const PlantModel& plant, int points) {
    constexpr double coherence = 0.999;
    constexpr double averages = 16.0;
    std::mt19937 random(7);
    std::normal_distribution<> normal(0.0,
                                      std::sqrt((1.0 - coherence) / (2.0 * averages * coherence)));
    MeasuredResponse result;
    for (int i = 0; i < points; ++i) {
        const double w = std::pow(1000.0, static_cast<double>(i) / (points - 1));
        const Complex error{1.0 + normal(random), normal(random)};
        result.w_rad_s.push_back(w);
        result.response.push_back(evaluate(plant.roots, {0.0, w}) * error);
        result.coherence.push_back(coherence);
    }
    return result;
}

/// Arguments: order, points.
void fit(benchmark::State& state) {
    const int order = static_cast<int>(state.range(0));
    const MeasuredResponse points = measured(modes(order / 2), static_cast<int>(state.range(1)));
    FitOptions options;
    options.order = order;
    double misfit = 0.0;
    for (auto _ : state)
        misfit = fit_model(points, options).misfit_db;
    state.counters["misfit_db"] = misfit;
}
BENCHMARK(fit)->Args({6, 400})->Args({12, 1000})->Unit(benchmark::kMillisecond);

} // namespace
} // namespace cornerwright
