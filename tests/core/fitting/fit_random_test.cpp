// Seeded random plants of many kinds, measured with noise: the fit must come down to the noise
// floor and tell the stable from the unstable.

#include "tests/core/fitting/practice_fit.h"

#include <gtest/gtest.h>

#include <cmath>
#include <random>

namespace cornerwright {
namespace {

constexpr double averages = 16.0;

class Plants {
  public:
    explicit Plants(unsigned seed) : random_(seed) {}

    double logarithmic(double low, double high) {
        return low * std::pow(high / low, std::uniform_real_distribution<>(0.0, 1.0)(random_));
    }
    int whole(int low, int high) { return std::uniform_int_distribution<>(low, high)(random_); }
    double normal() { return std::normal_distribution<>()(random_); }

    /// A pole now and then at the origin, real poles and lightly damped modes in the band 1 to 1000
    /// rad/s, zeros between the modes.
    PlantModel make(int modes, int real_poles, bool integrator, bool unstable, double dead_time) {
        PlantModel plant;
        plant.dead_time_s = dead_time;
        double w = logarithmic(5.0, 20.0);
        for (int i = 0; i < modes; ++i) {
            add_pair(plant.roots.poles, w, logarithmic(0.003, 0.1));
            add_pair(plant.roots.zeros, w * logarithmic(1.15, 1.6), logarithmic(0.005, 0.2));
            w *= logarithmic(2.0, 3.5);
        }
        for (int i = 0; i < real_poles; ++i)
            plant.roots.poles.emplace_back(-logarithmic(2.0, 300.0));
        if (integrator)
            plant.roots.poles.emplace_back(0.0);
        if (unstable)
            plant.roots.poles.emplace_back(logarithmic(5.0, 50.0));
        plant.roots.gain = 1.0 / std::abs(response_of(plant, 30.0));
        return plant;
    }

    MeasuredResponse measure(const PlantModel& plant, int points, double coherence) {
        MeasuredResponse measured;
        for (int i = 0; i < points; ++i) {
            const double w = std::pow(1000.0, static_cast<double>(i) / (points - 1));
            const double sigma = std::sqrt((1.0 - coherence) / (2.0 * averages * coherence));
            const Complex error{1.0 + sigma * normal(), sigma * normal()};
            measured.w_rad_s.push_back(w);
            measured.response.push_back(response_of(plant, w) * error);
            measured.coherence.push_back(coherence);
        }
        return measured;
    }

  private:
    static void add_pair(ComplexVector& roots, double w, double damping) {
        const double imaginary = w * std::sqrt(1.0 - damping * damping);
        roots.emplace_back(-damping * w, imaginary);
        roots.emplace_back(-damping * w, -imaginary);
    }

    std::mt19937 random_;
};

class FitRandom : public testing::TestWithParam<unsigned> {};

TEST_P(FitRandom, ComesDownToTheNoiseFloor) {
    Plants plants(GetParam());
    const int modes = plants.whole(0, 3);
    const bool unstable = plants.whole(0, 4) == 0;
    const bool delayed = plants.whole(0, 2) == 0;
    const PlantModel plant =
        plants.make(modes, plants.whole(1, 3), plants.whole(0, 1) == 1, unstable,
                    delayed ? plants.logarithmic(0.0005, 0.02) : 0.0);
    const double coherence = 1.0 - plants.logarithmic(1e-5, 0.05);
    const MeasuredResponse measured = plants.measure(plant, plants.whole(250, 400), coherence);
    const double floor = misfit_in_sigma(plant, plant, measured, averages);

    for (const bool automatic : {false, true}) {
        FitOptions options;
        if (!automatic)
            options.order = static_cast<int>(plant.roots.poles.size());
        if (delayed)
            options.dead_time_s.reset();
        const FitResult fit = fit_model(measured, options);
        EXPECT_LE(misfit_in_sigma(fit.model, plant, measured, averages), 1.1 * floor)
            << (automatic ? "automatic order" : "true order");
        EXPECT_LE(fit.order, static_cast<int>(plant.roots.poles.size()) + 2);
        EXPECT_EQ(unstable_poles_of(fit.model, 1.0), unstable ? 1 : 0);
    }
}

INSTANTIATE_TEST_SUITE_P(Seeded, FitRandom, testing::Range(1U, 25U));

} // namespace
} // namespace cornerwright
