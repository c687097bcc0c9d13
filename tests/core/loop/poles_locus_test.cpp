#include "core/loop/root_locus.h"
#include "core/numerics/delayed_sum.h"
#include "core/numerics/error.h"
#include "tests/core/numerics/random_roots.h"

#include <gtest/gtest.h>

namespace cornerwright {
namespace {

using test::is_conjugate_symmetric;
using test::RandomRoots;
using test::worst_mismatch;

DesignLoop loop_of(RootForm plant, double dead_time = 0.0) {
    return {RootForm{}, PlantModel{std::move(plant), dead_time}};
}

const RootForm three_lags{{}, {0.0, -1.0, -2.0}, 1.0};

ComplexVector poles_at(const RootLocus& locus, std::size_t k) {
    ComplexVector poles;
    for (const LocusBranch& branch : locus.branches)
        poles.push_back(branch.poles[k]);
    return poles;
}

/// Newton's step towards the nearest root of A + factor k B e^(-s tau), relative to the root.
double distance_from_root(const RootForm& form, double dead_time, double factor, Complex s) {
    Complex slope = dead_time;
    for (const Complex& pole : form.poles)
        slope += 1.0 / (s - pole);
    for (const Complex& zero : form.zeros)
        slope -= 1.0 / (s - zero);
    const Complex loop = factor * evaluate(form, s) * std::exp(-s * dead_time);
    const Complex step = (1.0 + loop) / (loop * slope); // d ln L/ds = -slope
    return std::isfinite(std::abs(step)) ? std::abs(step) / std::abs(s) : 0.0;
}

// K. Ogata, Modern Control Engineering, 5th ed., ch. 5 and 6 (citation from memory):
// K/(s(s+1)(s+2)) crosses the axis at sqrt 2 rad/s with K = 6, leaves the real axis at
// -1 + 1/sqrt 3 with K = 0.3849, and has asymptotes from -1 at 60, 180 and 300 degrees.
TEST(RootLocus, TextbookCrossing) {
    const RootLocus locus = root_locus(loop_of(three_lags));
    ASSERT_EQ(locus.crossings.size(), 1u);
    EXPECT_NEAR(locus.crossings[0].factor, 6.0, 6e-9);
    EXPECT_NEAR(locus.crossings[0].w_rad_s, std::sqrt(2.0), 1.4e-9);
}

TEST(RootLocus, TextbookBreakaway) {
    const RootLocus locus = root_locus(loop_of(three_lags));
    const double breakaway = -1.0 + 1.0 / std::sqrt(3.0);
    const double gain = 0.384900179459751;
    for (std::size_t k = 0; k < locus.factors.size(); ++k) {
        int complex = 0;
        for (const Complex& pole : poles_at(locus, k))
            complex += pole.imag() != 0.0 ? 1 : 0;
        EXPECT_EQ(complex, locus.factors[k] > gain ? 2 : 0) << locus.factors[k];
        if (std::abs(locus.factors[k] / gain - 1.0) < 1e-5) {
            EXPECT_NEAR(locus.branches[0].poles[k].real(), breakaway, 2e-2);
        }
    }
}

TEST(RootLocus, TextbookAsymptotes) {
    const RootLocus locus = root_locus(loop_of(three_lags));
    const ComplexVector last = poles_at(locus, locus.factors.size() - 1);
    Complex sum = 0.0;
    for (const Complex& pole : last)
        sum += pole;
    EXPECT_NEAR(sum.real() / 3.0, -1.0, 1e-10);
    // About the centroid F is u^3 - u + K: the angle errs by about 1/(3 |u|^2).
    for (const Complex& pole : last) {
        const Complex from_centroid = pole + 1.0;
        const double angle = std::abs(std::arg(from_centroid)) * 180.0 / std::numbers::pi;
        const double nearest = angle > 120.0 ? 180.0 : 60.0;
        EXPECT_NEAR(angle, nearest, 25.0 / std::norm(from_centroid));
        EXPECT_GT(std::abs(from_centroid), 5.0);
    }
}

TEST(RootLocus, BranchesKeepTheirIdentityThroughTheBreakaway) {
    const RootLocus locus = root_locus(loop_of(three_lags));
    for (const LocusBranch& branch : locus.branches) {
        ASSERT_EQ(branch.poles.size(), locus.factors.size());
        for (std::size_t k = 1; k < branch.poles.size(); ++k)
            EXPECT_LT(std::abs(branch.poles[k] - branch.poles[k - 1]),
                      0.15 * std::abs(branch.poles[k]) + 0.06)
                << locus.factors[k];
    }
    EXPECT_EQ(locus.branches[2].poles.front(), Complex(-2.0));
    EXPECT_EQ(locus.branches[2].poles.back().imag(), 0.0);
}

/// A pair far from the real axis was seen to change places with its twin where two other poles
/// leave the axis.
TEST(RootLocus, TwinsKeepTheirHalfPlaneWhileOthersBreakAway) {
    const RootForm notched{
        {Complex(-39.0, 779.0), Complex(-39.0, -779.0), -2.0, -25.0},
        {Complex(-390.0, 675.5), Complex(-390.0, -675.5), 0.0, 0.0, -22.0, -300.0},
        12672.0};
    for (const double dead_time : {0.0, 0.0008}) {
        const RootLocus locus = root_locus(loop_of(notched, dead_time));
        bool breaks_away = false;
        for (const LocusBranch& branch : locus.branches)
            for (std::size_t k = 1; k < branch.poles.size(); ++k) {
                const double before = branch.poles[k - 1].imag();
                const double now = branch.poles[k].imag();
                breaks_away = breaks_away || (before == 0.0) != (now == 0.0);
                EXPECT_FALSE(before * now < 0.0)
                    << dead_time << ": " << before << " to " << now << " at " << locus.factors[k];
            }
        EXPECT_TRUE(breaks_away);
    }
}

TEST(RootLocus, StartsAtThePolesEndsAtTheZerosAndContainsThePresentGain) {
    const RootForm form{{-3.0, Complex(-1.0, 4.0), Complex(-1.0, -4.0)},
                        {0.0, -1.0, -6.0, Complex(-2.0, 2.0), Complex(-2.0, -2.0)},
                        7.0};
    const RootLocus locus = root_locus(loop_of(form));
    EXPECT_EQ(locus.factors.front(), 0.0);
    EXPECT_EQ(worst_mismatch(poles_at(locus, 0), form.poles), 0.0);
    ComplexVector last = poles_at(locus, locus.factors.size() - 1);
    for (const Complex& zero : form.zeros) {
        double nearest = 1e9;
        for (const Complex& pole : last)
            nearest = std::min(nearest, std::abs(pole - zero));
        EXPECT_LT(nearest, 0.2);
    }
    const auto present = std::find(locus.factors.begin(), locus.factors.end(), 1.0);
    ASSERT_NE(present, locus.factors.end());
    EXPECT_EQ(
        worst_mismatch(poles_at(locus, static_cast<std::size_t>(present - locus.factors.begin())),
                       locus.closed_loop_poles),
        0.0);
    EXPECT_TRUE(std::is_sorted(locus.factors.begin(), locus.factors.end()));
}

TEST(RootLocus, PositiveFeedbackCrossesAtTheOrigin) {
    // L = -1/((s + 1)(s + 2)): the slower pole goes through the origin at factor 2.
    const RootLocus locus = root_locus(loop_of({{}, {-1.0, -2.0}, -1.0}));
    ASSERT_EQ(locus.crossings.size(), 1u);
    EXPECT_EQ(locus.crossings[0].w_rad_s, 0.0);
    EXPECT_NEAR(locus.crossings[0].factor, 2.0, 1e-14);
}

TEST(RootLocus, FourBranchesThatMeetAtOnePoint) {
    // s (s + 2)((s + 1)^2 + 1) = (u^2 - 1)(u^2 + 1) with u = s + 1: u^4 = 1 - K, all meet at -1.
    const RootLocus locus =
        root_locus(loop_of({{}, {0.0, -2.0, Complex(-1.0, 1.0), Complex(-1.0, -1.0)}, 1.0}));
    for (std::size_t k = 1; k < locus.factors.size(); ++k)
        for (const Complex& pole : poles_at(locus, k)) {
            const Complex u = pole + 1.0;
            EXPECT_LT(std::abs(u * u * u * u - (1.0 - locus.factors[k])),
                      1e-10 * (1.0 + locus.factors[k]));
        }
    ASSERT_EQ(locus.crossings.size(), 1u);
    EXPECT_NEAR(locus.crossings[0].factor, 5.0, 1e-9); // u = 1 + j: u^4 = -4
    EXPECT_NEAR(locus.crossings[0].w_rad_s, 1.0, 1e-9);
}

TEST(RootLocus, ConditionallyStableLoopCrossesAtItsLowerLimit) {
    // Routh on s^3 + K (s + 1)^2: stable for K > 1/2, crossing at 1 rad/s.
    const RootLocus locus = root_locus(loop_of({{-1.0, -1.0}, {0.0, 0.0, 0.0}, 2.0}));
    ASSERT_EQ(locus.crossings.size(), 1u);
    EXPECT_NEAR(locus.crossings[0].factor, 0.25, 1e-9);
    EXPECT_NEAR(locus.crossings[0].w_rad_s, 1.0, 1e-9);
}

TEST(RootLocus, DoubleIntegratorRunsAlongTheAxisWithoutCrossing) {
    EXPECT_TRUE(root_locus(loop_of({{}, {0.0, 0.0}, 1.0})).crossings.empty());
}

TEST(RootLocus, RandomLociAreRootsSymmetricAndContinuous) {
    RandomRoots random(31);
    for (int run = 0; run < 100; ++run) {
        const int order = random.integer(1, 10);
        RootForm form{random.roots(random.integer(0, order), 4.0), random.roots(order, 4.0), 1.0};
        const double w = random.log_uniform(0.01, 100.0);
        form.gain = 1.0 / std::abs(evaluate(form, Complex(0.0, w)));
        const RootLocus locus = root_locus(loop_of(form));
        ASSERT_EQ(locus.branches.size(), form.poles.size());
        ASSERT_LT(locus.factors.size(), 2000u);
        for (std::size_t k = 1; k < locus.factors.size(); ++k) {
            const ComplexVector poles = poles_at(locus, k);
            EXPECT_TRUE(is_conjugate_symmetric(poles)) << "run " << run << " " << k;
            for (const Complex& pole : poles)
                EXPECT_LT(distance_from_root(form, 0.0, locus.factors[k], pole), 1e-8)
                    << "run " << run << " factor " << locus.factors[k] << pole;
        }
        for (const AxisCrossing& crossing : locus.crossings) {
            // A little off the origin, where a pole may stand on a zero.
            const Complex s(0.0, std::max(crossing.w_rad_s, 1e-12));
            const Complex loop = crossing.factor * evaluate(form, s);
            EXPECT_LT(std::abs(1.0 + loop), 1e-9) << "run " << run;
        }
    }
}

TEST(RootLocus, DeadTimeFollowsTheTrueRoots) {
    const RootForm form{{}, {0.0}, 1.0};
    const LocusWindow window{-4.0, 2.0, -12.0, 12.0};
    const RootLocus locus = root_locus(loop_of(form, 1.0), &window);
    EXPECT_FALSE(locus.note.empty());
    // The axis is met at K = pi/2, 5 pi/2, ... (see the limit in the test of the poles).
    ASSERT_GE(locus.crossings.size(), 2u);
    EXPECT_NEAR(locus.crossings[0].factor, std::numbers::pi / 2.0, 1e-9);
    EXPECT_NEAR(locus.crossings[1].factor, 5.0 * std::numbers::pi / 2.0, 1e-9);
    const SymmetricRectangle shown{-4.0, 2.0, 12.0};
    for (std::size_t k = 0; k < locus.factors.size(); k += 7) {
        int inside = 0;
        for (const Complex& pole : poles_at(locus, k)) {
            inside += shown.contains(pole) ? 1 : 0;
            EXPECT_LT(distance_from_root(form, 1.0, locus.factors[k], pole), 1e-8);
        }
        const DelayedSum function{FactoredSum({form.poles}, {form.zeros}, locus.factors[k]), 1.0};
        EXPECT_EQ(inside, count_roots_inside(function, shown)) << locus.factors[k];
    }
}

TEST(RootLocus, RaisingTheGainToACrossingPutsAPoleOnTheAxis) {
    for (const double dead_time : {0.0, 0.35}) {
        const DesignLoop loop = loop_of(three_lags, dead_time);
        const RootLocus locus = root_locus(loop);
        ASSERT_FALSE(locus.crossings.empty());
        const double factors[] = {locus.crossings[0].factor};
        const ComplexVector poles = locus_poles(loop, factors)[0];
        double nearest = 1e9;
        for (const Complex& pole : poles)
            nearest = std::min(nearest, std::abs(pole - Complex(0.0, locus.crossings[0].w_rad_s)));
        EXPECT_LT(nearest, 1e-9) << dead_time;
    }
}

TEST(LocusPoles, AtGivenFactors) {
    const double factors[] = {0.0, 1.0, 6.0};
    const std::vector<ComplexVector> points = locus_poles(loop_of(three_lags), factors);
    ASSERT_EQ(points.size(), 3u);
    EXPECT_EQ(worst_mismatch(points[0], three_lags.poles), 0.0);
    EXPECT_LT(worst_mismatch(points[2], {-3.0, {0.0, std::sqrt(2.0)}, {0.0, -std::sqrt(2.0)}}),
              1e-14);
}

TEST(LocusPoles, NegativeFactorIsRefused) {
    const double factors[] = {1.0, -0.5};
    EXPECT_THROW(locus_poles(loop_of(three_lags), factors), InputError);
}

} // namespace
} // namespace cornerwright
