#include "core/fitting/factored_model.h"

#include <Eigen/Dense>

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

Complex value_of(const Factor& factor, Complex s) {
    return factor.degree == 1 ? s + factor.c0 : (s + factor.c1) * s + factor.c0;
}

/// 1/z without the guards of the library's division, which cost more than all else here; factors on
/// the frequency axis are far from the ends of the number range.
Complex inverse_of(Complex z) {
    return std::conj(z) / std::norm(z);
}

/// Where the refinement finds each number that it may move.
std::vector<double*> free_numbers(FactoredModel& model, bool with_dead_time) {
    std::vector<double*> numbers;
    for (std::vector<Factor>* side : {&model.zeros, &model.poles}) {
        for (Factor& factor : *side) {
            if (factor.fixed)
                continue;
            numbers.push_back(&factor.c0);
            if (factor.degree == 2)
                numbers.push_back(&factor.c1);
        }
    }
    if (with_dead_time)
        numbers.push_back(&model.dead_time_s);
    return numbers;
}

/// d ln(model)/d(number) at s in the order of `free_numbers`, behind them d/d ln|gain| = 1.
void log_derivatives(const FactoredModel& model, Complex s, bool with_dead_time,
                     ComplexVector& derivatives) {
    derivatives.clear();
    double sign = 1.0;
    for (const std::vector<Factor>* side : {&model.zeros, &model.poles}) {
        for (const Factor& factor : *side) {
            if (factor.fixed)
                continue;
            const Complex inverse = sign * inverse_of(value_of(factor, s));
            derivatives.push_back(inverse);
            if (factor.degree == 2)
                derivatives.push_back(s * inverse);
        }
        sign = -1.0;
    }
    if (with_dead_time)
        derivatives.push_back(-s);
    derivatives.emplace_back(1.0);
}

struct NormalEquations {
    Eigen::MatrixXd matrix;
    Eigen::VectorXd gradient;
};

NormalEquations normal_equations(const FactoredModel& model, const FitPoints& points,
                                 bool with_dead_time, Eigen::Index unknowns) {
    const auto rows = static_cast<Eigen::Index>(points.w.size());
    Eigen::MatrixXd jacobian(2 * rows, unknowns);
    Eigen::VectorXd residual(2 * rows);
    ComplexVector derivatives;
    for (Eigen::Index k = 0; k < rows; ++k) {
        const auto i = static_cast<std::size_t>(k);
        const Complex ratio = response_at(model, points.w[i]) * inverse_of(points.response[i]);
        const Complex error = points.weight[i] * (ratio - 1.0);
        residual(2 * k) = error.real();
        residual(2 * k + 1) = error.imag();
        log_derivatives(model, {0.0, points.w[i]}, with_dead_time, derivatives);
        for (Eigen::Index j = 0; j < unknowns; ++j) {
            const Complex slope =
                points.weight[i] * ratio * derivatives[static_cast<std::size_t>(j)];
            jacobian(2 * k, j) = slope.real();
            jacobian(2 * k + 1, j) = slope.imag();
        }
    }
    NormalEquations equations{Eigen::MatrixXd::Zero(unknowns, unknowns),
                              jacobian.transpose() * residual};
    equations.matrix.selfadjointView<Eigen::Lower>().rankUpdate(jacobian.transpose());
    equations.matrix.triangularView<Eigen::StrictlyUpper>() = equations.matrix.transpose();
    return equations;
}

FactoredModel moved(const FactoredModel& model, const Eigen::VectorXd& step, bool with_dead_time) {
    FactoredModel result = model;
    const std::vector<double*> numbers = free_numbers(result, with_dead_time);
    for (std::size_t i = 0; i < numbers.size(); ++i)
        *numbers[i] += step(static_cast<Eigen::Index>(i));
    result.gain *= std::exp(std::clamp(step(step.size() - 1), -1.0, 1.0));
    result.dead_time_s = std::max(result.dead_time_s, 0.0);
    return result;
}

/// The step of the damped normal equations, scaled so that every number counts alike.
Eigen::VectorXd damped_step(const NormalEquations& equations, double damping) {
    const Eigen::VectorXd diagonal = equations.matrix.diagonal();
    const double floor = diagonal.maxCoeff() * 1e-300;
    const Eigen::VectorXd scale = diagonal.cwiseMax(floor).cwiseSqrt().cwiseInverse();
    Eigen::MatrixXd scaled = scale.asDiagonal() * equations.matrix * scale.asDiagonal();
    scaled.diagonal().array() += damping;
    const Eigen::VectorXd right = scale.cwiseProduct(equations.gradient);
    return -scale.cwiseProduct(scaled.ldlt().solve(right));
}

} // namespace

Complex response_at(const FactoredModel& model, double w) {
    const Complex s{0.0, w};
    Complex value = std::polar(std::abs(model.gain), -w * model.dead_time_s);
    if (model.gain < 0.0)
        value = -value;
    const std::size_t pairs = std::max(model.zeros.size(), model.poles.size());
    for (std::size_t i = 0; i < pairs; ++i) {
        if (i < model.zeros.size())
            value *= value_of(model.zeros[i], s);
        if (i < model.poles.size())
            value *= inverse_of(value_of(model.poles[i], s));
    }
    return value;
}

int degree_of(const std::vector<Factor>& factors) {
    int degree = 0;
    for (const Factor& factor : factors)
        degree += factor.degree;
    return degree;
}

std::vector<Factor> factors_of(const ComplexVector& roots) {
    std::vector<Factor> factors;
    std::vector<double> real_roots;
    for (const Complex& root : roots) {
        if (root.imag() > 0.0)
            factors.push_back({2, std::norm(root), -2.0 * root.real(), false});
        else if (root.imag() == 0.0)
            real_roots.push_back(root.real());
    }
    std::sort(real_roots.begin(), real_roots.end(),
              [](double a, double b) { return std::abs(a) > std::abs(b); });
    for (std::size_t i = 0; i + 1 < real_roots.size(); i += 2) {
        const double a = real_roots[i];
        const double b = real_roots[i + 1];
        factors.push_back({2, a * b, -(a + b), false});
    }
    if (real_roots.size() % 2 == 1)
        factors.push_back({1, -real_roots.back(), 0.0, false});
    return factors;
}

ComplexVector roots_of(const std::vector<Factor>& factors) {
    ComplexVector roots;
    for (const Factor& factor : factors) {
        if (factor.degree == 1) {
            roots.emplace_back(-factor.c0, 0.0);
            continue;
        }
        const double middle = -0.5 * factor.c1;
        const double discriminant = middle * middle - factor.c0;
        if (discriminant < 0.0) {
            const double imaginary = std::sqrt(-discriminant);
            roots.emplace_back(middle, imaginary);
            roots.emplace_back(middle, -imaginary);
            continue;
        }
        const double far = middle + std::copysign(std::sqrt(discriminant), middle);
        roots.emplace_back(far, 0.0);
        roots.emplace_back(far == 0.0 ? 0.0 : factor.c0 / far, 0.0);
    }
    return roots;
}

PlantModel plant_model_of(const FactoredModel& model) {
    return {{roots_of(model.zeros), roots_of(model.poles), model.gain}, model.dead_time_s};
}

double weighted_cost(const FactoredModel& model, const FitPoints& points) {
    double cost = 0.0;
    for (std::size_t i = 0; i < points.w.size(); ++i)
        cost += std::norm(points.weight[i] *
                          (response_at(model, points.w[i]) * inverse_of(points.response[i]) - 1.0));
    return std::isfinite(cost) ? cost : HUGE_VAL;
}

Refined refine(const FactoredModel& start, const FitPoints& points, bool with_dead_time,
               int most_steps) {
    // Below this mean relative error squared rounding decides, not the model.
    constexpr double exact = 1e-28;
    constexpr double negligible_gain = 1e-8;
    constexpr double greatest_damping = 1e12;

    Refined best{start, weighted_cost(start, points)};
    FactoredModel counted = start;
    const auto unknowns =
        static_cast<Eigen::Index>(free_numbers(counted, with_dead_time).size() + 1);
    const double enough = exact * static_cast<double>(points.w.size());
    double damping = 1e-3;
    for (int step = 0; step < most_steps && best.cost > enough; ++step) {
        const NormalEquations equations =
            normal_equations(best.model, points, with_dead_time, unknowns);
        if (!equations.matrix.allFinite())
            break;
        double gained = -1.0;
        while (gained < 0.0 && damping < greatest_damping) {
            FactoredModel trial =
                moved(best.model, damped_step(equations, damping), with_dead_time);
            const double cost = weighted_cost(trial, points);
            if (cost < best.cost) {
                gained = (best.cost - cost) / best.cost;
                best = {std::move(trial), cost};
                damping = std::max(damping * 0.2, 1e-14);
            } else {
                damping *= 8.0;
            }
        }
        if (gained < negligible_gain)
            break;
    }
    return best;
}

} // namespace cornerwright
