#include "core/loop/sampled_plant.h"
#include "core/numerics/error.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <numbers>
#include <random>

namespace cornerwright {
namespace {

PlantModel model(ComplexVector zeros, ComplexVector poles, double gain, double dead_time_s = 0.0) {
    return {{std::move(zeros), std::move(poles), gain}, dead_time_s};
}

ComplexVector zeros_in_z(const SampledPlant& plant) {
    ComplexVector zeros = plant.delta_form.zeros;
    for (Complex& zero : zeros)
        zero += 1.0;
    return zeros;
}

// Zero-order-hold equivalent of 1/s^2 is Ts^2 (z + 1)/(2 (z - 1)^2).
// Source: K. J. Astrom, B. Wittenmark, Computer-Controlled Systems, 3rd ed., ch. 2, table of hold
// equivalents (citation from memory).
TEST(sampled_plant, double_integrator_by_the_table) {
    const SampledPlant sampled = sample_plant(model({}, {0.0, 0.0}, 1.0), 0.0, 0.1);
    EXPECT_NEAR(sampled.delta_form.gain, 0.005, 1e-17);
    ASSERT_EQ(sampled.delta_form.zeros.size(), 1u);
    EXPECT_NEAR(std::abs(sampled.delta_form.zeros[0] + 2.0), 0.0, 1e-15);
    EXPECT_EQ(sampled.delta_form.poles, (ComplexVector{0.0, 0.0}));
    EXPECT_EQ(sampled.whole_samples, 0);
}

// ((Ts - tau)^2 z^2 + (Ts^2 + 2 Ts tau - 2 tau^2) z + tau^2)/(2 z (z - 1)^2) at Ts = 0.1,
// tau = 0.04. Source: Astrom and Wittenmark, as above, ch. 2, sampling a system with time delay
// (derived by hand from it).
TEST(sampled_plant, double_integrator_behind_a_fractional_delay) {
    const SampledPlant sampled = sample_plant(model({}, {0.0, 0.0}, 1.0, 0.01), 0.03, 0.1);
    EXPECT_NEAR(sampled.delta_form.gain, 0.0018, 1e-16);
    const ComplexVector zeros = zeros_in_z(sampled);
    ASSERT_EQ(zeros.size(), 2u);
    EXPECT_NEAR(std::abs(zeros[0] + 4.0), 0.0, 1e-12);
    EXPECT_NEAR(std::abs(zeros[1] + 1.0 / 9.0), 0.0, 1e-13);
    EXPECT_EQ(sampled.delta_form.poles, (ComplexVector{0.0, 0.0, -1.0}));
}

// ((1 - e^{-a(Ts-tau)}) z + e^{-a(Ts-tau)} - e^{-a Ts})/(z (z - e^{-a Ts})), a = 1, Ts = 0.1,
// tau = 0.04. Source: Astrom and Wittenmark, as above, ch. 2 (citation from memory).
TEST(sampled_plant, lag_behind_a_fractional_delay) {
    const SampledPlant sampled = sample_plant(model({}, {-1.0}, 1.0), 0.04, 0.1);
    EXPECT_NEAR(sampled.delta_form.gain, 0.0582354664158, 1e-13);
    ASSERT_EQ(sampled.delta_form.zeros.size(), 1u);
    EXPECT_NEAR(zeros_in_z(sampled)[0].real(), -0.634100108080, 1e-12);
    EXPECT_NEAR(sampled.delta_form.poles[0].real() + 1.0, 0.904837418036, 1e-12);
}

// The sampled zeros of 1/s^3 are those of the Euler polynomial z^2 + 4 z + 1, the gain Ts^3/6.
// Source: K. J. Astrom, P. Hagander, J. Sternby, Zeros of sampled systems, Automatica 20 (1984)
// (citation from memory).
TEST(sampled_plant, triple_integrator_has_the_zeros_of_the_euler_polynomial) {
    const SampledPlant sampled = sample_plant(model({}, {0.0, 0.0, 0.0}, 1.0), 0.0, 1.0);
    EXPECT_NEAR(sampled.delta_form.gain, 1.0 / 6.0, 1e-16);
    const ComplexVector zeros = zeros_in_z(sampled);
    ASSERT_EQ(zeros.size(), 2u);
    EXPECT_NEAR(std::abs(zeros[0] - (-2.0 - std::numbers::sqrt3)), 0.0, 1e-14);
    EXPECT_NEAR(std::abs(zeros[1] - (-2.0 + std::numbers::sqrt3)), 0.0, 1e-14);
}

TEST(sampled_plant, whole_samples_of_delay_are_counted_and_rounding_is_no_fraction) {
    // 0.001 + 0.0002 over 0.0004 is 2.9999999999999996 in double precision.
    const SampledPlant sampled = sample_plant(model({}, {-5.0}, 2.0, 0.001), 0.0002, 0.0004);
    EXPECT_EQ(sampled.whole_samples, 3);
    EXPECT_TRUE(sampled.delta_form.zeros.empty());
    EXPECT_EQ(sampled.delta_form.poles.size(), 1u);
}

TEST(sampled_plant, direct_term_acts_at_the_instant_or_behind_the_delay) {
    const PlantModel plant = model({-8.0}, {-2.0}, 3.0);
    const SampledPlant direct = sample_plant(plant, 0.0, 0.1);
    EXPECT_NEAR(direct.delta_form.gain, 3.0, 1e-15);
    EXPECT_EQ(direct.delta_form.zeros.size(), 1u);
    const SampledPlant delayed = sample_plant(plant, 0.05, 0.1);
    EXPECT_EQ(delayed.delta_form.poles.size(), 2u);
    EXPECT_NEAR(std::abs(evaluate(delayed, 0.0) - 12.0), 0.0, 1e-13);
}

TEST(sampled_plant, improper_plant_is_refused) {
    EXPECT_THROW(sample_plant(model({-1.0, -2.0}, {-3.0}, 1.0), 0.0, 0.1), InputError);
}

TEST(sampled_plant, plant_zero_at_zero_stays_exactly_there) {
    const SampledPlant sampled = sample_plant(model({0.0}, {-1.0, -30.0}, 40.0), 0.003, 0.01);
    EXPECT_EQ(evaluate(sampled, 0.0), Complex(0.0));
}

/// Poisson's sum over the aliases of P(s) exp(-s delay) behind the hold, which the sampled plant
/// equals on the unit circle. For a plant falling as 1/w^2 and more the rest of the sum beyond
/// `aliases` is integrated out of its own decay by Richardson's extrapolation.
/// Source: Astrom and Wittenmark, as above, ch. 7 (sampling in the frequency domain; citation from
/// memory).
Complex sum_over_aliases(const PlantModel& plant, double delay_s, double ts, double w,
                         int aliases) {
    Complex sum = 0.0;
    for (int k = -aliases; k <= aliases; ++k) {
        const Complex s(0.0, w + 2.0 * std::numbers::pi * k / ts);
        const Complex hold = (1.0 - std::exp(-Complex(0.0, w * ts))) / (s * ts);
        sum += hold * evaluate(plant.roots, s) * std::exp(-s * delay_s);
    }
    return sum;
}

TEST(sampled_plant, equals_the_sum_over_aliases) {
    const std::vector<PlantModel> plants = {
        model({}, {0.0, -31.0, -400.0, -450.0}, 42.0 * 31.0 * 180000.0, 0.0017),
        model({{-12, 700}, {-12, -700}}, {0.0, -25.0, {-10, 800}, {-10, -800}, -2000.0, -2000.0},
              3000.0 * 4e6),
        model({-50.0}, {7.0, -9.0, -9.0, -9.0, -9.0}, 1e4, 0.003),
        model({}, {{-1e-2, 900.0}, {-1e-2, -900.0}, -3.0, -3.0, -3.0}, 1e8, 0.02),
    };
    for (const PlantModel& plant : plants) {
        for (const double ts : {1e-4, 2e-3, 0.05}) {
            for (const double td : {0.0, 0.3, 1.6}) {
                const SampledPlant sampled = sample_plant(plant, td * ts, ts);
                for (const double part : {0.01, 0.31, 0.77, 1.0}) {
                    const double w = part * std::numbers::pi / ts;
                    // The hold and three orders of roll-off leave aliases of k^-4.
                    const Complex expected =
                        sum_over_aliases(plant, plant.dead_time_s + td * ts, ts, w, 20000);
                    const Complex d = std::polar(1.0, w * ts) - 1.0;
                    EXPECT_NEAR(std::abs(evaluate(sampled, d) / expected - 1.0), 0.0, 1e-9)
                        << ts << " " << td << " " << part;
                }
            }
        }
    }
}

TEST(sampled_plant, slow_dynamics_at_a_fast_rate_keep_their_digits) {
    // Far below the rate P_d(z) is P(s) times the hold's half-sample lag; poles and zeros in z - 1
    // are those of the plant times Ts.
    const PlantModel plant = model({-0.05, {-40, 700}, {-40, -700}},
                                   {0.0, -0.002, -3.0, {-20, 800}, {-20, -800}, -500.0}, 1e9);
    const double ts = 1e-7;
    const SampledPlant sampled = sample_plant(plant, 0.0, ts);
    for (const double w : {1e-4, 1e-2, 1.0, 100.0, 700.0}) {
        const Complex s(0.0, w);
        // z - 1 = exp(s Ts) - 1 by its series: s Ts is below 1e-4.
        const Complex x = s * ts;
        const Complex d = x * (1.0 + x / 2.0 * (1.0 + x / 3.0 * (1.0 + x / 4.0)));
        const Complex hold = 1.0 - x / 2.0 * (1.0 - x / 3.0 * (1.0 - x / 4.0));
        EXPECT_NEAR(std::abs(evaluate(sampled, d) / (evaluate(plant.roots, s) * hold) - 1.0), 0.0,
                    1e-11)
            << w;
    }
}

TEST(sampled_plant, order_twenty_agrees_with_the_steady_gain_and_its_own_conjugate) {
    std::mt19937 random(7);
    std::uniform_real_distribution<double> decade(-2.0, 5.0);
    for (int round = 0; round < 20; ++round) {
        ComplexVector poles;
        double gain = 2.0;
        for (int k = 0; k < 10; ++k) {
            const double size = std::pow(10.0, decade(random));
            poles.push_back(std::polar(size, 1.6 + 0.1 * k));
            poles.push_back(std::conj(poles.back()));
            gain *= size * size;
        }
        const SampledPlant sampled = sample_plant(model({}, poles, gain, 0.00123), 0.0, 0.001);
        EXPECT_NEAR(std::abs(evaluate(sampled, 0.0) - 2.0), 0.0, 1e-10);
        const Complex above = evaluate(sampled, {-0.5, 0.8});
        const Complex below = evaluate(sampled, {-0.5, -0.8});
        EXPECT_NEAR(std::abs(above - std::conj(below)), 0.0, 1e-12 * std::abs(above));
    }
}

} // namespace
} // namespace cornerwright
