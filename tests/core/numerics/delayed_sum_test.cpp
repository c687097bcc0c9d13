#include "core/numerics/delayed_sum.h"
#include "tests/core/numerics/random_roots.h"

#include <gtest/gtest.h>

namespace cornerwright {
namespace {

using test::RandomRoots;

/// s + k exp(-s): the roots are the branches of Lambert's W, W_l(-k).
DelayedSum integrator(double gain) {
    return {FactoredSum({{0.0}}, {{}}, gain), 1.0};
}

// R. M. Corless et al., On the Lambert W function, Adv. Comput. Math. 5 (1996) (citation from
// memory): W_0(-1) = -0.318131505204764 +- 1.337235701430689j, W_1(-1) = -2.062277729598284 +
// 7.588631178472513j.
TEST(DelayedSum, IntegratorWithDeadTimeHasLambertsRoots) {
    const RootsInside inside = roots_inside(integrator(1.0), {-3.0, 2.0, 10.0});
    EXPECT_TRUE(inside.confirmed);
    ASSERT_EQ(inside.roots.size(), 4u);
    EXPECT_LT(test::worst_mismatch(inside.roots, {{-0.318131505204764, 1.337235701430689},
                                                  {-0.318131505204764, -1.337235701430689},
                                                  {-2.062277729598284, 7.588631178472513},
                                                  {-2.062277729598284, -7.588631178472513}}),
              1e-14);
}

TEST(DelayedSum, DoubleRootIsCountedTwice) {
    // k = 1/e puts both real roots at -1.
    const RootsInside inside = roots_inside(integrator(std::exp(-1.0)), {-3.0, 1.0, 5.0});
    EXPECT_TRUE(inside.confirmed);
    ASSERT_EQ(inside.roots.size(), 2u);
    for (const Complex& root : inside.roots)
        EXPECT_LT(std::abs(root + 1.0), 1e-7);
}

TEST(DelayedSum, RightmostRectangleLosesNoneToTheRight) {
    const DelayedSum function = integrator(3.0);
    const SymmetricRectangle rectangle = rightmost_rectangle(function, 3.0, 1e3);
    SymmetricRectangle larger = rectangle;
    larger.real_high *= 3.0;
    larger.imag_high *= 3.0;
    EXPECT_EQ(count_roots_inside(function, rectangle), count_roots_inside(function, larger));
    EXPECT_GT(count_roots_inside(function, rectangle), 2);
}

TEST(DelayedSum, NumberFoundIsTheNumberThatTheArgumentPrincipleCounts) {
    RandomRoots random(6);
    int confirmed = 0;
    constexpr int runs = 300;
    for (int run = 0; run < runs; ++run) {
        const int order = random.integer(1, 8);
        ComplexVector poles = random.roots(order, 4.0);
        const ComplexVector zeros = random.roots(random.integer(0, order - 1), 4.0);
        const double delay = random.log_uniform(0.05, 5.0);
        const double w = random.uniform(0.1, 1.0) / delay;
        Complex loop = 1.0;
        for (const Complex& zero : zeros)
            loop *= Complex(0.0, w) - zero;
        for (const Complex& pole : poles)
            loop /= Complex(0.0, w) - pole;
        const DelayedSum function{FactoredSum({poles}, {zeros}, 1.0 / std::abs(loop)), delay};
        const RootsInside inside =
            roots_inside(function, rightmost_rectangle(function, 3.0, 250.0 / delay));
        confirmed += inside.confirmed ? 1 : 0;
        for (const Complex& root : inside.roots) {
            const CoarseStep step = function.coarse(root);
            // Two roots close together leave Newton's step at the blur of the data.
            EXPECT_LE(std::abs(step.newton), 1e-10 * std::abs(root) + 100.0 * step.data);
        }
    }
    EXPECT_GE(confirmed, runs - 6); // the rest says so itself: `confirmed` is false
}

} // namespace
} // namespace cornerwright
