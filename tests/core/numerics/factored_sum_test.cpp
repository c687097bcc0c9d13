#include "core/numerics/factored_sum.h"
#include "tests/core/numerics/random_roots.h"

#include <gtest/gtest.h>

#include <cstring>

namespace cornerwright {
namespace {

using test::is_conjugate_symmetric;
using test::RandomRoots;
using test::worst_mismatch;

/// A gain that lets both sides matter.
double middling_gain(RandomRoots& random, const ComplexVector& left, const ComplexVector& right) {
    double gain = random.log_uniform(1e-2, 1e2);
    for (const Complex& root : left)
        gain *= root == Complex(0.0) ? 1.0 : std::abs(root);
    for (const Complex& root : right)
        gain /= root == Complex(0.0) ? 1.0 : std::abs(root);
    return random.uniform(0, 1) < 0.2 ? -gain : gain;
}

/// |F| against the size of its terms at the root, or what rounding the root itself makes of that.
double backward_error(const ComplexVector& left, const ComplexVector& right, double gain,
                      Complex s) {
    std::complex<long double> one = 1.0L;
    std::complex<long double> other = gain;
    long double rounding = 0.0L;
    for (const Complex& root : left) {
        one *= std::complex<long double>(s) - std::complex<long double>(root);
        rounding += std::abs(s) / std::abs(s - root);
    }
    for (const Complex& root : right) {
        other *= std::complex<long double>(s) - std::complex<long double>(root);
        rounding += std::abs(s) / std::abs(s - root);
    }
    return static_cast<double>(std::abs(one + other) / (std::abs(one) + std::abs(other)) /
                               (1.0L + rounding));
}

TEST(FactoredSum, FactorsOnBothSidesStayRoots) {
    const SolvedRoots solved = roots_of_sum(FactoredSum({{-1, -2}}, {{-1, -4}}, 5.0));
    // s + 2 + 5 (s + 4) = 0 beside the cancelled -1.
    EXPECT_LT(worst_mismatch(solved.roots, {-1.0, -22.0 / 6.0}), 1e-15);
}

TEST(FactoredSum, LeadingTermsThatCancelLowerTheDegree) {
    const SolvedRoots solved = roots_of_sum(FactoredSum({{-1, -2}}, {{-3, -4}}, -1.0));
    // 3 s + 2 - 7 s - 12 = 0
    EXPECT_LT(worst_mismatch(solved.roots, {-2.5}), 1e-15);
    EXPECT_TRUE(roots_of_sum(FactoredSum({{-1, -2}}, {{-1, -2}}, -1.0)).roots.size() == 2);
}

TEST(FactoredSum, MoreFactorsOnTheRight) {
    const SolvedRoots solved = roots_of_sum(FactoredSum({{-1}}, {{-3, -4}}, 5.0));
    const double root = std::sqrt(36.0 * 36.0 - 4.0 * 5.0 * 61.0);
    EXPECT_LT(worst_mismatch(solved.roots, {(-36.0 - root) / 10.0, (-36.0 + root) / 10.0}), 1e-14);
}

TEST(FactoredSum, RootThatTheGainPutsAtTheOriginIsZero) {
    EXPECT_EQ(roots_of_sum(FactoredSum({{-0.3}}, {{}}, -0.3)).roots, ComplexVector{0.0});
}

TEST(FactoredSum, GainsSoSmallOrLargeThatRootsStandOnTheOpenLoops) {
    const ComplexVector left{-1e-9, -1.0, -1e6};
    const ComplexVector right{-1e-3, -1e3};
    EXPECT_LT(worst_mismatch(roots_of_sum(FactoredSum({left}, {right}, 1e-30)).roots, left), 1e-15);
    EXPECT_LT(worst_mismatch(roots_of_sum(FactoredSum({left}, {right}, 1e30)).roots,
                             {-1e-3, -1e3, -1e30}),
              1e-15);
}

TEST(FactoredSum, CriticallyDampedIsADoubleRoot) {
    const SolvedRoots solved = roots_of_sum(FactoredSum({{0, -2}}, {{}}, 1.0));
    EXPECT_LT(worst_mismatch(solved.roots, {-1.0, -1.0}), 1e-15);
    EXPECT_GT(solved.uncertainty[0], 1e-9); // the square root of a rounding of the gain
}

TEST(FactoredSum, ARepeatedFactorIsThatFactorManyTimes) {
    RandomRoots random(5);
    for (int run = 0; run < 50; ++run) {
        ComplexVector left = random.roots(random.integer(1, 4), 2.0);
        const ComplexVector right = random.roots(random.integer(0, 3), 2.0);
        const int repeated = random.integer(1, 12);
        const double gain = random.uniform(-1.0, 1.0);
        const FactoredSum powered({left, -1.0, repeated}, {right}, gain);
        left.insert(left.end(), static_cast<std::size_t>(repeated), -1.0);
        const SolvedRoots plain = roots_of_sum(FactoredSum({left}, {right}, gain));
        EXPECT_LT(worst_mismatch(roots_of_sum(powered).roots, plain.roots), 1e-9) << "run " << run;
    }
}

TEST(FactoredSum, FiveHundredDelaysStandOnTheirCircle) {
    // (d + 1)^500 (d + 0.2) + 0.1 with d = z - 1: z^500 (z - 0.8) = -0.1.
    const SolvedRoots solved = roots_of_sum(FactoredSum({{-0.2}, -1.0, 500}, {{}}, 0.1));
    ASSERT_EQ(solved.roots.size(), 501u);
    for (const Complex& d : solved.roots) {
        const Complex z = 1.0 + d;
        const Complex log_left = 500.0 * std::log(z) + std::log(z - 0.8);
        EXPECT_NEAR(std::abs(std::exp(log_left) + 0.1), 0.0, 1e-12);
    }
    EXPECT_TRUE(is_conjugate_symmetric(solved.roots));
}

TEST(FactoredSum, RandomRootsSatisfyTheEquation) {
    RandomRoots random(3);
    for (int run = 0; run < 1000; ++run) {
        const int order = random.integer(1, 24);
        const ComplexVector left = random.roots(order, 9.0);
        const ComplexVector right = random.roots(random.integer(0, order), 9.0);
        const double gain = middling_gain(random, left, right);
        const SolvedRoots solved = roots_of_sum(FactoredSum({left}, {right}, gain));
        ASSERT_EQ(solved.roots.size(), left.size()) << "run " << run;
        EXPECT_TRUE(is_conjugate_symmetric(solved.roots));
        for (const Complex& root : solved.roots) {
            const bool common = std::count(left.begin(), left.end(), root) > 0 &&
                                std::count(right.begin(), right.end(), root) > 0;
            if (!common) {
                EXPECT_LT(backward_error(left, right, gain, root), 1e-12) << run << root;
            }
        }
    }
}

TEST(FactoredSum, WarmStartsNeverChangeABit) {
    RandomRoots random(4);
    for (int run = 0; run < 10000; ++run) {
        const int order = random.integer(1, 10);
        const ComplexVector left = random.roots(order, 6.0);
        const ComplexVector right = random.roots(random.integer(0, order), 6.0);
        const double gain = middling_gain(random, left, right);
        const FactoredSum sum({left}, {right}, gain);
        const SolvedRoots cold = roots_of_sum(sum);
        const FactoredSum nearby({left}, {right}, gain * random.uniform(0.9, 1.1));
        const SolvedRoots warm = roots_of_sum(sum, solve_roots(nearby).roots);
        ASSERT_EQ(cold.roots.size(), warm.roots.size());
        EXPECT_EQ(
            std::memcmp(cold.roots.data(), warm.roots.data(), cold.roots.size() * sizeof(Complex)),
            0)
            << "run " << run;
        EXPECT_EQ(cold.uncertainty, warm.uncertainty);
    }
}

} // namespace
} // namespace cornerwright
