#include "core/response/rational_response.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numbers>
#include <random>

namespace cornerwright {
namespace {

constexpr double pi = std::numbers::pi;

/// A random function with roots on both sides, over many decades, seeded.
RootForm random_form(std::mt19937& random, int order) {
    std::uniform_real_distribution<double> decade(-3.0, 5.0);
    std::uniform_real_distribution<double> unit(-1.0, 1.0);
    RootForm form;
    form.gain = unit(random) * 10.0;
    for (ComplexVector* roots : {&form.zeros, &form.poles}) {
        while (static_cast<int>(roots->size()) < order) {
            const double size = std::pow(10.0, decade(random));
            if (unit(random) > 0.0) {
                roots->emplace_back(unit(random) * size, 0.0);
            } else {
                const Complex root(0.3 * unit(random) * size, size);
                roots->push_back(root);
                roots->push_back(std::conj(root));
            }
        }
    }
    return form;
}

std::vector<double> log_grid(double low, double high, int count) {
    std::vector<double> grid;
    for (int i = 0; i < count; ++i)
        grid.push_back(low * std::pow(high / low, static_cast<double>(i) / (count - 1)));
    return grid;
}

TEST(RationalResponse, AgreesWithTheFactoredValue) {
    std::mt19937 random(11);
    for (int trial = 0; trial < 200; ++trial) {
        const RootForm form = random_form(random, 1 + trial % 20);
        const RationalResponse response(form);
        for (const double w : {1e-4, 0.03, 1.7, 55.0, 4e3, 1e7}) {
            const ResponseSample sample = response.at(w);
            const Complex value = evaluate(form, Complex(0.0, w));
            EXPECT_LT(std::abs(sample.value - value), 1e-11 * std::abs(value));
            EXPECT_NEAR(sample.log_magnitude, std::log(std::abs(value)), 1e-11);
            EXPECT_NEAR(std::remainder(sample.phase_rad - std::arg(value), 2.0 * pi), 0.0, 1e-10);
        }
    }
}

TEST(RationalResponse, PhaseIsContinuousOverDecades) {
    std::mt19937 random(12);
    for (int trial = 0; trial < 50; ++trial) {
        const RationalResponse response(random_form(random, 1 + trial % 16));
        const std::vector<double> grid = log_grid(1e-5, 1e7, 60000);
        std::vector<ResponseSample> samples(grid.size());
        response.evaluate(grid, samples);
        for (std::size_t i = 1; i < grid.size(); ++i)
            ASSERT_LT(std::abs(samples[i].phase_rad - samples[i - 1].phase_rad), 3.0)
                << "trial " << trial << " at " << grid[i];
    }
}

TEST(RationalResponse, PhaseStartsWithTheIntegratorsAndTheSign) {
    const auto start_deg = [](const RootForm& form) {
        return RationalResponse(form).at(1e-6).phase_rad * 180.0 / pi;
    };
    EXPECT_NEAR(start_deg({{}, {-1.0, -2.0}, 3.0}), 0.0, 1e-3);
    EXPECT_NEAR(start_deg({{}, {0.0, 0.0, -2.0}, 3.0}), -180.0, 1e-3);
    EXPECT_NEAR(start_deg({{0.0}, {-1.0}, 3.0}), 90.0, 1e-3);
    EXPECT_NEAR(start_deg({{}, {1.0}, 3.0}), -180.0, 1e-3);
    EXPECT_NEAR(start_deg({{120.0}, {-1.0}, -3.0}), 0.0, 1e-3);
    EXPECT_NEAR(start_deg({{}, {{1.0, 4.0}, {1.0, -4.0}}, 3.0}), 0.0, 1e-3);
}

TEST(RationalResponse, PhaseEndsWithTheSumOfAllAngles) {
    // Six poles left, one zero right: 6 * -90 - 90 degrees.
    const RootForm form{
        {5.0}, {-1.0, -2.0, {-1.0, 30.0}, {-1.0, -30.0}, {-0.01, 9.0}, {-0.01, -9.0}}, -2.0};
    EXPECT_NEAR(RationalResponse(form).at(1e9).phase_rad * 180.0 / pi, -630.0, 1e-4);
}

TEST(RationalResponse, SlopeIsTheDerivativeOfTheLogarithm) {
    std::mt19937 random(13);
    for (int trial = 0; trial < 100; ++trial) {
        const RationalResponse response(random_form(random, 1 + trial % 12));
        for (const double w : {0.02, 1.3, 77.0}) {
            const double step = 1e-6 * w;
            const ResponseSample above = response.at(w + step);
            const ResponseSample below = response.at(w - step);
            const Complex slope((above.log_magnitude - below.log_magnitude) / (2.0 * step),
                                (above.phase_rad - below.phase_rad) / (2.0 * step));
            EXPECT_LT(std::abs(response.at(w).slope - slope), 1e-6 * (std::abs(slope) + 1.0 / w));
        }
    }
}

TEST(RationalResponse, AnUndampedPairTurnsThePhaseByHalfATurn) {
    const RationalResponse poles({{}, {{0.0, 30.0}, {0.0, -30.0}}, 900.0});
    EXPECT_NEAR(poles.at(29.999).phase_rad, 0.0, 1e-12);
    EXPECT_NEAR(poles.at(30.001).phase_rad, -pi, 1e-12);
    EXPECT_EQ(poles.axis_rad_s(), std::vector<double>{30.0});
    const RationalResponse zeros({{{0.0, 30.0}, {0.0, -30.0}}, {-1.0, -1.0}, 1.0});
    EXPECT_GT(zeros.at(30.001).phase_rad, zeros.at(29.999).phase_rad + 3.0);
}

TEST(RationalResponse, TheSameBitsComeOutAloneAndInABatch) {
    std::mt19937 random(14);
    const RationalResponse response(random_form(random, 14));
    const std::vector<double> grid = log_grid(1e-3, 1e5, 333);
    std::vector<ResponseSample> samples(grid.size());
    response.evaluate(grid, samples);
    for (std::size_t i = 0; i < grid.size(); ++i) {
        const ResponseSample alone = response.at(grid[i]);
        EXPECT_EQ(alone.value, samples[i].value);
        EXPECT_EQ(alone.phase_rad, samples[i].phase_rad);
        EXPECT_EQ(alone.slope, samples[i].slope);
    }
}

TEST(RationalResponse, TwentyRootsOverTwelveDecadesStayInRange) {
    RootForm form;
    for (int i = 0; i < 20; ++i)
        form.poles.emplace_back(-std::pow(10.0, -3.0 + 0.45 * i), 0.0);
    const ResponseSample sample = RationalResponse(form).at(1e12);
    EXPECT_NEAR(sample.log_magnitude, -20.0 * std::log(1e12), 1e-4);
    EXPECT_NEAR(sample.phase_rad, -10.0 * pi, 1e-4);
}

TEST(RationalResponse, AsymptotesOfBothEnds) {
    const RationalResponse response({{-2.0}, {0.0, -4.0, {-1.0, 3.0}, {-1.0, -3.0}}, 5.0});
    EXPECT_EQ(response.at_zero().order, 1);
    EXPECT_DOUBLE_EQ(response.at_zero().gain, 5.0 * 2.0 / (4.0 * 10.0));
    EXPECT_EQ(response.at_infinity().order, 3);
    EXPECT_DOUBLE_EQ(response.at_infinity().gain, 5.0);
}

} // namespace
} // namespace cornerwright
