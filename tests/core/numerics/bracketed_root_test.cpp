#include "core/numerics/bracketed_root.h"

#include <gtest/gtest.h>

#include <cmath>

namespace cornerwright {
namespace {

double root_between(double a, double b, double wanted) {
    const auto f = [wanted](double x) { return std::log(wanted / x); };
    return bracketed_root(f, a, f(a), b, f(b));
}

// A crossover at exactly 1 rad/s stood on a point of the grid and was reported at the next one.
TEST(BracketedRoot, AnEndOnTheRootIsTheRoot) {
    EXPECT_EQ(root_between(1.0, 1.01, 1.0), 1.0);
    EXPECT_EQ(root_between(0.99, 1.0, 1.0), 1.0);
}

TEST(BracketedRoot, FindsTheLastDigitsFromEitherSide) {
    for (const double wanted : {1e-7, 0.3, 2.0, 5e9}) {
        const double allowed = 1e-15 * wanted;
        EXPECT_NEAR(root_between(0.7 * wanted, 40.0 * wanted, wanted), wanted, allowed);
        EXPECT_NEAR(root_between(40.0 * wanted, 0.7 * wanted, wanted), wanted, allowed);
    }
}

} // namespace
} // namespace cornerwright
