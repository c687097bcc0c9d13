#include "core/placement/linear_program.h"

#include <Eigen/Dense>
#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <random>

namespace cornerwright {
namespace {

double value_of(const LinearProgram& program, const std::vector<double>& z) {
    double value = 0.0;
    for (std::size_t i = 0; i < z.size(); ++i)
        value += program.cost[i] * z[i];
    return value;
}

double row_of(const LinearProgram& program, std::size_t row, const std::vector<double>& z) {
    double value = 0.0;
    for (std::size_t i = 0; i < z.size(); ++i)
        value += program.rows[row][i] * z[i];
    return value;
}

/// The best vertex of a bounded program: every choice of n rows whose crossing is feasible.
double best_vertex(const LinearProgram& program) {
    const std::size_t n = program.cost.size();
    const std::size_t m = program.rows.size();
    double best = HUGE_VAL;
    std::vector<bool> chosen(m, false);
    std::fill(chosen.begin(), chosen.begin() + static_cast<std::ptrdiff_t>(n), true);
    do {
        Eigen::MatrixXd a(n, n);
        Eigen::VectorXd b(n);
        Eigen::Index at = 0;
        for (std::size_t row = 0; row < m; ++row) {
            if (!chosen[row])
                continue;
            for (std::size_t i = 0; i < n; ++i)
                a(at, static_cast<Eigen::Index>(i)) = program.rows[row][i];
            b(at++) = program.bounds[row];
        }
        const Eigen::FullPivLU<Eigen::MatrixXd> factors(a);
        if (!factors.isInvertible())
            continue;
        const Eigen::VectorXd z = factors.solve(b);
        const std::vector<double> point(z.begin(), z.end());
        bool feasible = true;
        for (std::size_t row = 0; row < m && feasible; ++row)
            feasible = row_of(program, row, point) <= program.bounds[row] + 1e-9;
        if (feasible)
            best = std::min(best, value_of(program, point));
    } while (std::prev_permutation(chosen.begin(), chosen.end()));
    return best;
}

TEST(LinearProgram, OfTwoUnknownsSolvedByHand) {
    // maximise 3 x + 5 y with x <= 4, 2 y <= 12, 3 x + 2 y <= 18, x, y >= 0: (2, 6), value 36, and
    // multipliers 0, 3/2, 1. Source: F. S. Hillier, G. J. Lieberman, Introduction to Operations
    // Research, the first example of the chapter on linear programming (citation from memory).
    const LinearProgram program{{-3.0, -5.0},
                                {{1.0, 0.0}, {0.0, 2.0}, {3.0, 2.0}, {-1.0, 0.0}, {0.0, -1.0}},
                                {4.0, 12.0, 18.0, 0.0, 0.0}};
    const auto solution = solve(program, {1.0, 1.0});
    ASSERT_TRUE(solution);
    EXPECT_NEAR(solution->point[0], 2.0, 1e-6);
    EXPECT_NEAR(solution->point[1], 6.0, 1e-6);
    EXPECT_NEAR(solution->multipliers[0], 0.0, 1e-6);
    EXPECT_NEAR(solution->multipliers[1], 1.5, 1e-6);
    EXPECT_NEAR(solution->multipliers[2], 1.0, 1e-6);
}

TEST(LinearProgram, AStartOnTheBorderIsRefused) {
    const LinearProgram program{{1.0}, {{-1.0}, {1.0}}, {0.0, 5.0}};
    EXPECT_FALSE(solve(program, {0.0}));
    EXPECT_TRUE(solve(program, {1.0}));
}

TEST(LinearProgram, RandomOnesReachTheBestVertexAndBalanceTheirMultipliers) {
    std::mt19937_64 random(7);
    std::normal_distribution<> normal;
    for (int round = 0; round < 200; ++round) {
        constexpr std::size_t n = 4;
        LinearProgram program;
        for (std::size_t i = 0; i < n; ++i)
            program.cost.push_back(normal(random));
        for (std::size_t row = 0; row < 6; ++row) {
            std::vector<double> entries;
            for (std::size_t i = 0; i < n; ++i)
                entries.push_back(normal(random));
            program.rows.push_back(std::move(entries));
            program.bounds.push_back(0.1 + std::abs(normal(random)));
        }
        for (std::size_t i = 0; i < n; ++i) {
            for (const double sign : {1.0, -1.0}) {
                std::vector<double> row(n, 0.0);
                row[i] = sign;
                program.rows.push_back(std::move(row));
                program.bounds.push_back(1.0);
            }
        }
        const auto solution = solve(program, std::vector<double>(n, 0.0));
        ASSERT_TRUE(solution) << round;
        EXPECT_NEAR(value_of(program, solution->point), best_vertex(program), 1e-7) << round;
        for (std::size_t row = 0; row < program.rows.size(); ++row) {
            EXPECT_LE(row_of(program, row, solution->point), program.bounds[row] + 1e-9);
            EXPECT_GE(solution->multipliers[row], 0.0);
        }
        for (std::size_t i = 0; i < n; ++i) {
            double balance = program.cost[i];
            for (std::size_t row = 0; row < program.rows.size(); ++row)
                balance += solution->multipliers[row] * program.rows[row][i];
            EXPECT_NEAR(balance, 0.0, 1e-7) << round;
        }
    }
}

} // namespace
} // namespace cornerwright
