#include "core/measurement/random_error.h"
#include "core/measurement/response_edits.h"

#include <gtest/gtest.h>

#include <cmath>
#include <random>

namespace cornerwright {
namespace {

constexpr double averages = 40.0;

/// A plant with an integrator, a lag and a dead time.
Complex plant_at(double w) {
    const Complex s{0.0, w};
    return 30.0 * std::exp(-2e-3 * s) / (s * (s / 40.0 + 1.0));
}

Complex compensator_at(double w) {
    const Complex s{0.0, w};
    return 0.8 * (s / 20.0 + 1.0) / (s / 200.0 + 1.0);
}

/// `response_of` at 60 frequencies from 1 to 300 rad/s.
template <class Function>
MeasuredResponse sampled(Function response_of) {
    MeasuredResponse measured;
    for (int i = 0; i < 60; ++i) {
        const double w = std::pow(300.0, i / 59.0);
        measured.w_rad_s.push_back(w);
        measured.response.push_back(response_of(w));
        measured.coherence.push_back(0.9);
    }
    measured.averages = averages;
    return measured;
}

ComplexVector compensator_on(const MeasuredResponse& measured) {
    ComplexVector values;
    for (const double w : measured.w_rad_s)
        values.push_back(compensator_at(w));
    return values;
}

void expect_plant(const MeasuredResponse& found) {
    for (std::size_t i = 0; i < found.w_rad_s.size(); ++i) {
        const Complex expected = plant_at(found.w_rad_s[i]);
        EXPECT_LE(std::abs(found.response[i] - expected), 1e-12 * std::abs(expected));
    }
}

TEST(ResponseEdits, ALoopGainGivesThePlantWithTheSameRelativeError) {
    const auto loop = sampled([](double w) { return compensator_at(w) * plant_at(w); });
    const auto found = plant_from(MeasuredQuantity::loop_gain, loop, compensator_on(loop));
    expect_plant(found);
    EXPECT_EQ(found.coherence, loop.coherence);
    EXPECT_EQ(found.averages, averages);
}

TEST(ResponseEdits, AClosedLoopGivesThePlant) {
    const auto closed = sampled([](double w) {
        const Complex loop = compensator_at(w) * plant_at(w);
        return loop / (1.0 + loop);
    });
    expect_plant(plant_from(MeasuredQuantity::closed_loop, closed, compensator_on(closed)));
}

/// Small random errors on T, turned into P many times, scatter as the coherence of P tells.
TEST(ResponseEdits, TheErrorOfAClosedLoopGrowsWhereTheLoopIsStrong) {
    const auto closed = sampled([](double w) {
        const Complex loop = compensator_at(w) * plant_at(w);
        return loop / (1.0 + loop);
    });
    auto quiet = closed;
    quiet.coherence.assign(quiet.w_rad_s.size(), 1.0 - 1e-8);
    const auto found = plant_from_closed_loop(quiet, compensator_on(quiet));
    const auto before = random_errors(quiet);
    const auto told = random_errors(found);
    std::mt19937 random(5);
    std::normal_distribution<double> normal;
    constexpr int trials = 4000;
    std::vector<double> squares(quiet.w_rad_s.size(), 0.0);
    for (int trial = 0; trial < trials; ++trial) {
        auto noisy = quiet;
        for (std::size_t i = 0; i < noisy.response.size(); ++i)
            noisy.response[i] *= 1.0 + before[i] * Complex{normal(random), normal(random)};
        const auto plant = plant_from_closed_loop(noisy, compensator_on(noisy));
        for (std::size_t i = 0; i < squares.size(); ++i)
            squares[i] += std::norm(plant.response[i] / found.response[i] - 1.0);
    }
    for (std::size_t i = 0; i < squares.size(); ++i) {
        // Real and imaginary part share the square; 4000 trials scatter by 1 % or so.
        EXPECT_NEAR(std::sqrt(squares[i] / (2.0 * trials)) / told[i], 1.0, 0.06) << "point " << i;
    }
    EXPECT_GT(told.front(), 10.0 * before.front());
}

TEST(ResponseEdits, SignAndDelayAreTakenOut) {
    const auto measured = sampled([](double w) {
        return -plant_at(w) * std::exp(Complex{0.0, -w * 3e-3});
    });
    ReadOptions options;
    options.flip_sign = true;
    options.remove_delay_s = 3e-3;
    expect_plant(edited(measured, options));
}

TEST(ResponseEdits, PointsOfLowCoherenceAreLeftOutTogether) {
    auto measured = sampled(plant_at);
    measured.coherence[0] = 0.2;
    measured.coherence[30] = 0.49;
    measured.coherence[31] = 0.5;
    const auto kept = with_least_coherence(measured, 0.5);
    ASSERT_EQ(kept.w_rad_s.size(), measured.w_rad_s.size() - 2);
    ASSERT_EQ(kept.coherence.size(), kept.w_rad_s.size());
    EXPECT_EQ(kept.w_rad_s.front(), measured.w_rad_s[1]);
    EXPECT_EQ(kept.coherence[29], 0.5);
    EXPECT_EQ(kept.averages, averages);
    expect_plant(kept);
    EXPECT_THROW(with_least_coherence(measured, 0.95), InputError);
    measured.coherence.clear();
    EXPECT_THROW(with_least_coherence(measured, 0.5), InputError);
}

TEST(ResponseEdits, RefusesWhatGivesNoPlant) {
    const auto loop = sampled(plant_at);
    auto compensator = compensator_on(loop);
    compensator[3] = 0.0;
    EXPECT_THROW(plant_from_loop_gain(loop, compensator), InputError);
    compensator[3] = HUGE_VAL;
    EXPECT_THROW(plant_from_loop_gain(loop, compensator), InputError);
    compensator.pop_back();
    EXPECT_THROW(plant_from_loop_gain(loop, compensator), InputError);
    auto closed = loop;
    closed.response[7] = 1.0;
    EXPECT_THROW(plant_from_closed_loop(closed, compensator_on(closed)), InputError);
}

} // namespace
} // namespace cornerwright
