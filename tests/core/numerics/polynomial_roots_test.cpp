#include "core/numerics/polynomial_roots.h"
#include "tests/core/numerics/random_roots.h"

#include <Eigen/Eigenvalues>
#include <gtest/gtest.h>

namespace cornerwright {
namespace {

using test::is_conjugate_symmetric;
using test::RandomRoots;
using test::worst_mismatch;

/// Highest power first.
std::vector<double> expand(const ComplexVector& roots) {
    std::vector<std::complex<long double>> coefficients{1.0L};
    for (const Complex& root : roots) {
        coefficients.push_back(0.0L);
        for (std::size_t k = coefficients.size() - 1; k > 0; --k)
            coefficients[k] -= std::complex<long double>(root) * coefficients[k - 1];
    }
    std::vector<double> real;
    for (const auto& coefficient : coefficients)
        real.push_back(static_cast<double>(coefficient.real()));
    return real;
}

TEST(PolynomialRoots, NothingForAConstant) {
    EXPECT_TRUE(polynomial_roots({}).empty());
    EXPECT_TRUE(polynomial_roots(std::vector<double>{5.0}).empty());
    EXPECT_TRUE(polynomial_roots(std::vector<double>{0.0, 0.0, 5.0}).empty());
}

TEST(PolynomialRoots, ZerosAtTheOriginAreExact) {
    const ComplexVector roots = polynomial_roots(std::vector<double>{0.2, 1.0, 0.0, 0.0});
    ASSERT_EQ(roots.size(), 3u);
    EXPECT_EQ(roots[0], Complex(-5.0));
    EXPECT_EQ(roots[1], Complex(0.0));
    EXPECT_EQ(roots[2], Complex(0.0));
}

TEST(PolynomialRoots, PairOnTheAxisStaysOnTheAxis) {
    const ComplexVector roots = polynomial_roots(std::vector<double>{1.0, 0.0, 4.0});
    ASSERT_EQ(roots.size(), 2u);
    EXPECT_EQ(roots[0], Complex(0.0, -2.0));
    EXPECT_EQ(roots[1], Complex(0.0, 2.0));
}

TEST(PolynomialRoots, RootsManyDecadesApart) {
    // (s + 1e-6)(s + 1)(s + 1e9), each to full precision.
    const ComplexVector expected{-1e9, -1.0, -1e-6};
    EXPECT_LT(worst_mismatch(polynomial_roots(expand(expected)), expected), 1e-15);
}

TEST(PolynomialRoots, CoefficientsOverHundredsOfDecades) {
    const ComplexVector roots = polynomial_roots(std::vector<double>{1e-150, 1.0, 1e140});
    ASSERT_EQ(roots.size(), 2u);
    EXPECT_NEAR(roots[0].real() / -1e150, 1.0, 1e-9);
    EXPECT_NEAR(roots[1].real() / -1e140, 1.0, 1e-9);
}

TEST(PolynomialRoots, MultipleRootsComeOutAsOne) {
    for (const int multiplicity : {2, 3, 4}) {
        const ComplexVector expected(static_cast<std::size_t>(multiplicity), -1.0);
        EXPECT_LT(worst_mismatch(polynomial_roots(expand(expected)), expected), 1e-14)
            << multiplicity;
    }
    const ComplexVector on_axis{{0, 1}, {0, 1}, {0, -1}, {0, -1}};
    EXPECT_LT(worst_mismatch(polynomial_roots(expand(on_axis)), on_axis), 1e-14);
}

TEST(PolynomialRoots, DoubleRootBlurredByTheRoundingOfItsCoefficients) {
    // (s + 0.1)^2 in doubles is not a square; its true roots are 1e-9 apart.
    const ComplexVector roots = polynomial_roots(std::vector<double>{1.0, 0.2, 0.01});
    EXPECT_LT(worst_mismatch(roots, {-0.1, -0.1}), 1e-9);
}

// J. H. Wilkinson, The evaluation of the zeros of ill-conditioned polynomials, Numer. Math. 1
// (1959) (citation from memory): prod(x - i), at degree 15 exactly representable in double
// precision.
TEST(PolynomialRoots, WilkinsonsPolynomialOfDegree15) {
    ComplexVector expected;
    for (int i = 1; i <= 15; ++i)
        expected.emplace_back(i);
    EXPECT_LT(worst_mismatch(polynomial_roots(expand(expected)), expected), 1e-14);
}

TEST(PolynomialRoots, RandomRootsComeBack) {
    RandomRoots random(1);
    for (int run = 0; run < 500; ++run) {
        const ComplexVector expected = random.roots(random.integer(1, 8), 6.0);
        // Roots by chance close together are ill-conditioned; their distance tells how much.
        double closest = 1.0;
        for (std::size_t i = 0; i < expected.size(); ++i)
            for (std::size_t j = 0; j < i; ++j)
                closest = std::min(closest, std::abs(expected[i] - expected[j]) /
                                                std::abs(expected[i] + expected[j]));
        if (closest < 0.05)
            continue;
        const ComplexVector found = polynomial_roots(expand(expected));
        EXPECT_LT(worst_mismatch(found, expected), 1e-9) << "run " << run;
        EXPECT_TRUE(is_conjugate_symmetric(found));
    }
}

TEST(PolynomialRoots, AgreeWithCompanionEigenvalues) {
    RandomRoots random(2);
    for (int run = 0; run < 200; ++run) {
        const int degree = random.integer(2, 10);
        std::vector<double> coefficients(static_cast<std::size_t>(degree) + 1);
        for (double& coefficient : coefficients)
            coefficient = random.uniform(-1.0, 1.0);
        coefficients[0] = 1.0;
        Eigen::MatrixXd companion = Eigen::MatrixXd::Zero(degree, degree);
        for (int k = 0; k < degree; ++k)
            companion(0, k) = -coefficients[static_cast<std::size_t>(k) + 1];
        for (int k = 1; k < degree; ++k)
            companion(k, k - 1) = 1.0;
        const Eigen::VectorXcd values = companion.eigenvalues();
        const ComplexVector expected(values.begin(), values.end());
        EXPECT_LT(worst_mismatch(polynomial_roots(coefficients), expected), 1e-8) << "run " << run;
    }
}

} // namespace
} // namespace cornerwright
