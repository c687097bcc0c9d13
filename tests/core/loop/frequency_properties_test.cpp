#include "core/loop/closed_loop_poles.h"
#include "core/loop/loop_curve.h"
#include "core/loop/nyquist.h"
#include "tests/core/loop/frequency_practice.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr int trials = 150;

struct Assessed {
    DesignLoop loop;
    RootForm roots;
    ComplexVector poles;
    FrequencyAssessment assessment;
};

template <typename Check>
void for_random_loops(unsigned seed, Check&& check) {
    std::mt19937 random(seed);
    for (int trial = 0; trial < trials; ++trial) {
        SCOPED_TRACE("trial " + std::to_string(trial));
        Assessed a;
        a.roots = practice::random_roots(random, 2 + trial % 13);
        a.loop = practice::plant_alone(a.roots);
        a.poles = closed_loop_poles(a.loop).poles;
        a.assessment = assess_frequency(a.loop, {}, a.poles);
        check(a);
    }
}

Complex loop_at(const Assessed& a, double w) {
    return evaluate(a.roots, Complex(0.0, w));
}

TEST(FrequencyProperties, CrossingsLieOnTheCurve) {
    for_random_loops(21, [](const Assessed& a) {
        for (const double w : a.assessment.figures.crossovers_rad_s)
            EXPECT_NEAR(std::abs(loop_at(a, w)), 1.0, 1e-9);
        for (const double w : a.assessment.figures.phase_crossings_rad_s) {
            if (w == 0.0)
                continue;
            const Complex value = loop_at(a, w);
            EXPECT_LT(value.real(), 0.0);
            EXPECT_LT(std::abs(value.imag()), 1e-8 * std::abs(value));
        }
    });
}

/// Counts sign changes on a scan of its own: 20 000 places and 400 around every root.
TEST(FrequencyProperties, NoGainCrossoverIsMissed) {
    for_random_loops(22, [](const Assessed& a) {
        std::vector<double> scan;
        for (int i = 0; i <= 20000; ++i)
            scan.push_back(std::pow(10.0, -7.0 + 14.0 * i / 20000.0));
        for (const ComplexVector* roots : {&a.roots.zeros, &a.roots.poles})
            for (const Complex& root : *roots)
                for (int i = -200; i <= 200; ++i) {
                    const double w =
                        std::abs(root.imag()) + root.real() * std::sinh(i / 200.0 * 8.0);
                    if (w > 1e-7 && w < 1e7)
                        scan.push_back(w);
                }
        std::sort(scan.begin(), scan.end());
        std::size_t changes = 0;
        bool above = std::abs(loop_at(a, scan.front())) >= 1.0;
        for (const double w : scan) {
            const bool now = std::abs(loop_at(a, w)) >= 1.0;
            changes += now != above ? 1 : 0;
            above = now;
        }
        std::size_t found = 0;
        for (const double w : a.assessment.figures.crossovers_rad_s)
            found += w > 1e-7 && w < 1e7 ? 1 : 0;
        EXPECT_GE(found, changes);
        EXPECT_EQ((found - changes) % 2, 0u);
    });
}

/// No place of a scan of its own, also around every closed-loop pole, lies above the peak.
TEST(FrequencyProperties, NothingLiesAboveThePeaks) {
    for_random_loops(23, [](const Assessed& a) {
        const FrequencyFigures& f = a.assessment.figures;
        std::vector<double> scan;
        for (int i = 0; i <= 5000; ++i)
            scan.push_back(std::pow(10.0, -5.0 + 10.0 * i / 5000.0));
        for (const Complex& pole : a.poles)
            for (int i = -50; i <= 50; ++i)
                scan.push_back(std::abs(pole.imag()) + pole.real() * i / 10.0);
        double sensitivity = 0.0;
        double complementary = 0.0;
        for (const double w : scan) {
            if (w <= 0.0)
                continue;
            const Complex value = loop_at(a, w);
            sensitivity = std::max(sensitivity, 1.0 / std::abs(1.0 + value));
            complementary = std::max(complementary, std::abs(value / (1.0 + value)));
        }
        EXPECT_LE(20.0 * std::log10(sensitivity), f.sensitivity_peak_db.value() + 1e-6);
        EXPECT_LE(20.0 * std::log10(complementary), f.complementary_peak_db.value() + 1e-6);
    });
}

// Bounds: K. J. Astrom, T. Hagglund, PID Controllers, 2nd ed., ch. 4 (citation from memory).
TEST(FrequencyProperties, TheSensitivityPeakBoundsBothMargins) {
    int stable = 0;
    for_random_loops(24, [&](const Assessed& a) {
        if (a.assessment.stability.stable != true)
            return;
        ++stable;
        const FrequencyFigures& f = a.assessment.figures;
        const double peak = std::pow(10.0, f.sensitivity_peak_db.value() / 20.0);
        const double phase_bound =
            2.0 * std::asin(std::min(1.0, 0.5 / peak)) * 180.0 / std::numbers::pi;
        EXPECT_GE(std::abs(f.phase_margin_deg.value()), phase_bound - 1e-6);
        if (f.gain_margin_db.is_value()) {
            EXPECT_GE(f.gain_margin_db.value(), 20.0 * std::log10(peak / (peak - 1.0)) - 1e-6);
        }
    });
    EXPECT_GT(stable, trials / 10);
}

TEST(FrequencyProperties, NyquistCountsTheUnstableClosedLoopPoles) {
    int with_unstable = 0;
    for_random_loops(25, [&](const Assessed& a) {
        const auto unstable = static_cast<int>(std::count_if(
            a.poles.begin(), a.poles.end(), [](Complex pole) { return pole.real() > 0.0; }));
        with_unstable += unstable > 0 ? 1 : 0;
        const NyquistCount count = nyquist_count(*loop_curve(a.loop, {}));
        ASSERT_TRUE(count.unstable_poles.has_value()) << count.reason;
        EXPECT_EQ(*count.unstable_poles, unstable);
    });
    EXPECT_GT(with_unstable, trials / 10);
}

TEST(FrequencyProperties, GainMarginPutsAClosedLoopPoleOnTheAxis) {
    for_random_loops(26, [](const Assessed& a) {
        const FrequencyFigures& f = a.assessment.figures;
        if (!f.gain_margin_db.is_value() || f.gain_margin_at_rad_s.value() == 0.0)
            return;
        const double w = f.gain_margin_at_rad_s.value();
        const double factor = std::pow(10.0, f.gain_margin_db.value() / 20.0);
        EXPECT_LT(std::abs(1.0 + factor * loop_at(a, w)), 1e-8);
    });
}

TEST(FrequencyProperties, SensitivitiesAddUpToOne) {
    for_random_loops(27, [](const Assessed& a) {
        const std::vector<double> w{1e-3, 0.4, 12.0, 3e3};
        for (const LoopPoint& point : loop_points(a.loop, w)) {
            EXPECT_LT(std::abs(point.sensitivity + point.complementary - 1.0),
                      1e-12 * (1.0 + std::abs(point.sensitivity)));
            EXPECT_LT(std::abs(point.loop - point.compensator * point.plant),
                      1e-14 * std::abs(point.loop));
            EXPECT_LT(std::abs(point.loop - loop_at(a, point.w_rad_s)),
                      1e-9 * std::abs(point.loop));
        }
    });
}

TEST(FrequencyProperties, CurvesAscendAndTheirPhaseIsContinuous) {
    for_random_loops(28, [](const Assessed& a) {
        const LoopCurves& curves = a.assessment.curves;
        ASSERT_EQ(curves.loop_phase_deg.size(), curves.w_rad_s.size());
        for (std::size_t i = 1; i < curves.w_rad_s.size(); ++i) {
            ASSERT_LT(curves.w_rad_s[i - 1], curves.w_rad_s[i]);
            ASSERT_LT(std::abs(curves.loop_phase_deg[i] - curves.loop_phase_deg[i - 1]), 100.0);
        }
    });
}

} // namespace
} // namespace cornerwright
