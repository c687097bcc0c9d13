#include "core/fitting/pole_relocation.h"

#include <Eigen/Dense>
#include <Eigen/Eigenvalues>

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

using Eigen::Index;

/// 1/z without the guards of the library's division.
Complex inverse_of(Complex z) {
    return std::conj(z) / std::norm(z);
}

/// Conjugate pairs adjacent, the upper one first; real poles first.
ComplexVector in_pair_order(const ComplexVector& poles) {
    ComplexVector ordered;
    for (const Complex& pole : poles) {
        if (pole.imag() == 0.0)
            ordered.push_back(pole);
    }
    for (const Complex& pole : poles) {
        if (pole.imag() > 0.0) {
            ordered.push_back(pole);
            ordered.push_back(std::conj(pole));
        }
    }
    return ordered;
}

/// The real-coefficient partial-fraction basis at s, one entry a pole.
void fill_basis(const ComplexVector& poles, Complex s, ComplexVector& basis) {
    basis.resize(poles.size());
    for (std::size_t i = 0; i < poles.size(); ++i) {
        const Complex first = inverse_of(s - poles[i]);
        if (poles[i].imag() == 0.0) {
            basis[i] = first;
            continue;
        }
        const Complex second = inverse_of(s - poles[i + 1]);
        basis[i] = first + second;
        basis[i + 1] = Complex(0.0, 1.0) * (first - second);
        ++i;
    }
}

/// Zeros of c^T basis(s) + d: eigenvalues of A - b c^T / d in the real block form of the poles.
ComplexVector zeros_of(const ComplexVector& poles, const Eigen::VectorXd& c, double d) {
    const auto n = static_cast<Index>(poles.size());
    Eigen::MatrixXd a = Eigen::MatrixXd::Zero(n, n);
    Eigen::VectorXd b = Eigen::VectorXd::Zero(n);
    for (Index i = 0; i < n; ++i) {
        const Complex pole = poles[static_cast<std::size_t>(i)];
        a(i, i) = pole.real();
        if (pole.imag() == 0.0) {
            b(i) = 1.0;
            continue;
        }
        a(i, i + 1) = pole.imag();
        a(i + 1, i) = -pole.imag();
        a(i + 1, i + 1) = pole.real();
        b(i) = 2.0;
        ++i;
    }
    a -= b * (c.transpose() / d);
    if (!a.allFinite())
        return {};
    const Eigen::VectorXcd values = a.eigenvalues();
    ComplexVector zeros;
    for (Index i = 0; i < n; ++i) {
        // Eigenvalues of a real matrix come in exact conjugate pairs.
        zeros.push_back(values(i));
    }
    return in_pair_order(zeros);
}

/// The points with the delay taken off.
ComplexVector without_delay(const FitPoints& points, double delay_s) {
    ComplexVector response = points.response;
    for (std::size_t i = 0; i < response.size(); ++i)
        response[i] *= std::polar(1.0, points.w[i] * delay_s);
    return response;
}

Eigen::VectorXd solve_scaled(Eigen::MatrixXd& matrix, const Eigen::VectorXd& right) {
    Eigen::VectorXd scale = matrix.colwise().norm().transpose();
    scale = (scale.array() > 0.0).select(scale.cwiseInverse(), 1.0);
    matrix *= scale.asDiagonal();
    return scale.cwiseProduct(matrix.householderQr().solve(right));
}

/// One round: the sum sigma F = sum of fractions solved for sigma, whose zeros are the new poles.
ComplexVector moved_poles(const FitPoints& points, const ComplexVector& response,
                          const ComplexVector& poles) {
    const auto rows = static_cast<Index>(points.w.size());
    const auto n = static_cast<Index>(poles.size());
    Eigen::MatrixXd matrix(2 * rows + 1, 2 * n + 2);
    Eigen::VectorXd right = Eigen::VectorXd::Zero(2 * rows + 1);
    Eigen::RowVectorXd mean = Eigen::RowVectorXd::Zero(2 * n + 2);
    ComplexVector basis;
    for (Index k = 0; k < rows; ++k) {
        const auto i = static_cast<std::size_t>(k);
        fill_basis(poles, {0.0, points.w[i]}, basis);
        const Complex weight = points.weight[i] * inverse_of(response[i]);
        const auto set = [&](Index column, Complex value) {
            matrix(2 * k, column) = value.real();
            matrix(2 * k + 1, column) = value.imag();
        };
        for (Index j = 0; j < n; ++j) {
            const Complex function = basis[static_cast<std::size_t>(j)];
            set(j, weight * function);
            set(n + 1 + j, -points.weight[i] * function);
            mean(n + 1 + j) += function.real();
        }
        set(n, weight);
        set(2 * n + 1, -points.weight[i]);
        mean(2 * n + 1) += 1.0;
    }
    // The relaxed condition: the mean of sigma is 1, so that sigma = 0 is no solution.
    matrix.row(2 * rows) = mean;
    right(2 * rows) = static_cast<double>(rows);
    const Eigen::VectorXd solution = solve_scaled(matrix, right);
    constexpr double least_direct_term = 1e-8;
    double direct = solution(2 * n + 1);
    if (std::abs(direct) < least_direct_term)
        direct = std::copysign(least_direct_term, direct);
    return zeros_of(poles, solution.segment(n + 1, n), direct);
}

FactoredModel with_residues(const FitPoints& points, const ComplexVector& response,
                            const ComplexVector& poles, double delay_s) {
    const auto rows = static_cast<Index>(points.w.size());
    const auto n = static_cast<Index>(poles.size());
    Eigen::MatrixXd matrix(2 * rows, n + 1);
    Eigen::VectorXd right(2 * rows);
    ComplexVector basis;
    for (Index k = 0; k < rows; ++k) {
        const auto i = static_cast<std::size_t>(k);
        fill_basis(poles, {0.0, points.w[i]}, basis);
        basis.emplace_back(1.0);
        const Complex weight = points.weight[i] * inverse_of(response[i]);
        for (Index j = 0; j <= n; ++j) {
            const Complex value = weight * basis[static_cast<std::size_t>(j)];
            matrix(2 * k, j) = value.real();
            matrix(2 * k + 1, j) = value.imag();
        }
        right(2 * k) = points.weight[i];
        right(2 * k + 1) = 0.0;
    }
    const Eigen::VectorXd solution = solve_scaled(matrix, right);
    // A direct term that is nothing beside the response would put a zero out of all range.
    const double smallest =
        std::abs(*std::min_element(response.begin(), response.end(),
                                   [](Complex a, Complex b) { return std::abs(a) < std::abs(b); }));
    double direct = solution(n);
    if (std::abs(direct) < 1e-9 * smallest)
        direct = std::copysign(1e-9 * smallest, direct);
    FactoredModel model;
    model.gain = direct;
    model.zeros = factors_of(zeros_of(poles, solution.head(n), direct));
    model.poles = factors_of(poles);
    model.dead_time_s = delay_s;
    return model;
}

void reflect(ComplexVector& poles) {
    for (Complex& pole : poles)
        pole.real(-std::abs(pole.real()));
}

} // namespace

ComplexVector spread_pairs(double w_low, double w_high, int count) {
    constexpr double start_damping = 0.01;
    ComplexVector poles;
    const int pairs = count / 2;
    for (int i = 0; i < pairs; ++i) {
        const double place = (i + 0.5) / pairs;
        const double w = w_low * std::pow(w_high / w_low, place);
        poles.emplace_back(-start_damping * w, w);
        poles.emplace_back(-start_damping * w, -w);
    }
    if (count % 2 == 1)
        poles.emplace_back(-std::sqrt(w_low * w_high), 0.0);
    return in_pair_order(poles);
}

ComplexVector spread_real(double w_low, double w_high, int count) {
    ComplexVector poles;
    for (int i = 0; i < count; ++i)
        poles.emplace_back(-w_low * std::pow(w_high / w_low, (i + 0.5) / count), 0.0);
    return poles;
}

FactoredModel relocate(const FitPoints& points, ComplexVector poles, double delay_s, bool stable,
                       int rounds) {
    constexpr double at_rest = 1e-7;
    const ComplexVector response = without_delay(points, delay_s);
    poles = in_pair_order(poles);
    for (int round = 0; round < rounds; ++round) {
        ComplexVector next = moved_poles(points, response, poles);
        if (next.size() != poles.size())
            break;
        if (stable)
            reflect(next);
        double change = 0.0;
        for (std::size_t i = 0; i < poles.size(); ++i)
            change = std::max(change, std::abs(next[i] - poles[i]) / std::abs(next[i]));
        poles = std::move(next);
        if (change < at_rest)
            break;
    }
    return with_residues(points, response, poles, delay_s);
}

} // namespace cornerwright
