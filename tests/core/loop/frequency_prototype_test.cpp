#include "tests/core/loop/frequency_practice.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double wn = 7.0;

/// L = wn^2 / (s (s + 2 zeta wn)).
FrequencyAssessment assess_prototype(double zeta) {
    const DesignLoop loop = practice::plant_alone({{}, {0.0, -2.0 * zeta * wn}, wn * wn});
    const Complex root = std::sqrt(Complex(zeta * zeta - 1.0, 0.0));
    const ComplexVector poles{wn * (-zeta + root), wn * (-zeta - root)};
    return assess_frequency(loop, {}, poles);
}

double db(double magnitude) {
    return 20.0 * std::log10(magnitude);
}

class Prototype : public testing::TestWithParam<double> {};

// Phase margin, crossover and delay margin: K. Ogata, Modern Control Engineering, 5th ed., ch. 7;
// G. F. Franklin, J. D. Powell, A. Emami-Naeini, Feedback Control of Dynamic Systems, ch. 6
// (citations from memory).
TEST_P(Prototype, MarginsFollowTheFormula) {
    const double zeta = GetParam();
    const FrequencyFigures f = assess_prototype(zeta).figures;
    const double x = std::sqrt(std::sqrt(1.0 + 4.0 * std::pow(zeta, 4)) - 2.0 * zeta * zeta);
    const double margin = std::atan(2.0 * zeta / x);
    ASSERT_EQ(f.crossovers_rad_s.size(), 1u);
    EXPECT_NEAR(f.crossovers_rad_s[0], wn * x, 1e-12 * wn);
    EXPECT_NEAR(f.phase_margin_deg.value(), margin * 180.0 / std::numbers::pi, 1e-10);
    EXPECT_NEAR(f.delay_margin_s.value(), margin / (wn * x), 1e-11);
    EXPECT_EQ(f.gain_margin_db.kind(), Figure::Kind::infinite);
    EXPECT_EQ(f.gain_reduction_margin_db.kind(), Figure::Kind::infinite);
    EXPECT_TRUE(f.phase_crossings_rad_s.empty());
}

// Resonant peak, its place and bandwidth: K. Ogata, as above, ch. 7; B. C. Kuo, F. Golnaraghi,
// Automatic Control Systems (citations from memory).
TEST_P(Prototype, ResonantPeakAndBandwidthFollowTheFormula) {
    const double zeta = GetParam();
    const FrequencyFigures f = assess_prototype(zeta).figures;
    if (zeta < std::numbers::sqrt2 / 2.0) {
        const double height = 1.0 / (2.0 * zeta * std::sqrt(1.0 - zeta * zeta));
        EXPECT_NEAR(f.complementary_peak_db.value(), db(height), 1e-10);
        EXPECT_NEAR(f.complementary_peak_at_rad_s.value(), wn * std::sqrt(1.0 - 2.0 * zeta * zeta),
                    1e-7 * wn);
    } else {
        EXPECT_EQ(f.complementary_peak_db.value(), 0.0);
        EXPECT_EQ(f.complementary_peak_at_rad_s.value(), 0.0);
    }
    const double z2 = zeta * zeta;
    const double bandwidth =
        wn * std::sqrt(1.0 - 2.0 * z2 + std::sqrt(4.0 * z2 * z2 - 4.0 * z2 + 2.0));
    EXPECT_NEAR(f.bandwidth_rad_s.value(), bandwidth, 1e-11 * bandwidth);
}

// |S|^2 = x (x + 4 zeta^2) / ((1 - x)^2 + 4 zeta^2 x), x = (w/wn)^2, stationary at
// x = (1 + sqrt(1 + 8 zeta^2)) / 2: derived from S = s (s + 2 zeta wn)/(s^2 + 2 zeta wn s + wn^2).
TEST_P(Prototype, SensitivityPeakFollowsTheFormula) {
    const double zeta = GetParam();
    const FrequencyFigures f = assess_prototype(zeta).figures;
    const double x = 0.5 * (1.0 + std::sqrt(1.0 + 8.0 * zeta * zeta));
    const double squared =
        x * (x + 4.0 * zeta * zeta) / ((1.0 - x) * (1.0 - x) + 4.0 * zeta * zeta * x);
    EXPECT_NEAR(f.sensitivity_peak_db.value(), db(std::sqrt(squared)), 1e-10);
    EXPECT_NEAR(f.sensitivity_peak_at_rad_s.value(), wn * std::sqrt(x), 1e-8 * wn);
}

TEST_P(Prototype, IsStableWithAFiniteRampError) {
    const double zeta = GetParam();
    const FrequencyAssessment a = assess_prototype(zeta);
    EXPECT_EQ(a.stability.stable, true);
    EXPECT_EQ(a.steady_state_error.step.value(), 0.0);
    EXPECT_NEAR(a.steady_state_error.ramp.value(), 2.0 * zeta / wn, 1e-15);
    EXPECT_EQ(a.steady_state_error.parabola.kind(), Figure::Kind::infinite);
}

INSTANTIATE_TEST_SUITE_P(Damping, Prototype,
                         testing::Values(0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 1.0,
                                         1.1, 1.2));

} // namespace
} // namespace cornerwright
