#include "core/placement/linear_program.h"

#include <Eigen/Dense>

#include <algorithm>
#include <cmath>
#include <utility>

namespace cornerwright {
namespace {

using Eigen::Index;
using Eigen::MatrixXd;
using Eigen::VectorXd;

/// A z + slack = b, A' y = -c, slack y = 0, slack and y above zero.
struct Iterate {
    VectorXd z;
    VectorXd slack;
    VectorXd y;
};

struct Direction {
    VectorXd z;
    VectorXd slack;
    VectorXd y;
};

VectorXd vector_of(const std::vector<double>& values) {
    return Eigen::Map<const VectorXd>(values.data(), static_cast<Index>(values.size()));
}

/// The longest step, up to 1, that keeps every entry above zero.
double longest_step(const VectorXd& from, const VectorXd& direction) {
    double step = 1.0;
    for (Index i = 0; i < from.size(); ++i) {
        if (direction(i) < 0.0)
            step = std::min(step, -from(i) / direction(i));
    }
    return step;
}

class InteriorPoint {
  public:
    InteriorPoint(MatrixXd rows, VectorXd bounds, VectorXd cost)
        : a_(std::move(rows)), b_(std::move(bounds)), c_(std::move(cost)) {}

    std::optional<Iterate> solve(VectorXd start) const {
        constexpr int most_rounds = 80;
        constexpr double small_gap = 1e-9;
        Iterate at{start, b_ - a_ * start, VectorXd::Ones(b_.size())};
        if (at.slack.minCoeff() <= 0.0)
            return {};
        for (int round = 0; round < most_rounds; ++round) {
            const double gap = at.slack.dot(at.y);
            const double scale = 1.0 + std::abs(c_.dot(at.z));
            const VectorXd dual = a_.transpose() * at.y + c_;
            if (gap < small_gap * scale &&
                dual.cwiseAbs().maxCoeff() < small_gap * (1.0 + c_.norm()))
                return at;
            if (!advance(at))
                return {};
        }
        return {};
    }

  private:
    bool advance(Iterate& at) const {
        // Short of the border, so that the next direction is not squeezed along it.
        constexpr double keep_off = 0.995;
        const auto rows = static_cast<double>(at.slack.size());
        const VectorXd weight = at.y.cwiseQuotient(at.slack);
        const MatrixXd normal = a_.transpose() * weight.asDiagonal() * a_;
        const Eigen::LDLT<MatrixXd> factors(normal);
        if (factors.info() != Eigen::Success)
            return false;
        const VectorXd products = at.slack.cwiseProduct(at.y);
        const Direction predictor = direction(at, factors, -products);
        const double reach =
            std::min(longest_step(at.slack, predictor.slack), longest_step(at.y, predictor.y));
        const double now = products.sum() / rows;
        const double then =
            (at.slack + reach * predictor.slack).dot(at.y + reach * predictor.y) / rows;
        const double ratio = then / now;
        const VectorXd aim = (-products - predictor.slack.cwiseProduct(predictor.y)).array() +
                             ratio * ratio * ratio * now;
        const Direction step = direction(at, factors, aim);
        if (!step.z.allFinite() || !step.y.allFinite())
            return false;
        const double length =
            keep_off * std::min(longest_step(at.slack, step.slack), longest_step(at.y, step.y));
        at.z += length * step.z;
        at.slack += length * step.slack;
        at.y += length * step.y;
        return at.slack.minCoeff() > 0.0 && at.y.minCoeff() > 0.0;
    }

    /// Newton's direction towards slack_i y_i = (present value) + aim_i.
    Direction direction(const Iterate& at, const Eigen::LDLT<MatrixXd>& factors,
                        const VectorXd& aim) const {
        const VectorXd dual_residual = a_.transpose() * at.y + c_;
        const VectorXd primal_residual = a_ * at.z + at.slack - b_;
        const VectorXd inner = (aim + at.y.cwiseProduct(primal_residual)).cwiseQuotient(at.slack);
        Direction result;
        result.z = factors.solve(-dual_residual - a_.transpose() * inner);
        result.slack = -primal_residual - a_ * result.z;
        result.y = (aim - at.y.cwiseProduct(result.slack)).cwiseQuotient(at.slack);
        return result;
    }

    MatrixXd a_;
    VectorXd b_;
    VectorXd c_;
};

} // namespace

std::optional<LinearSolution> solve(const LinearProgram& program,
                                    const std::vector<double>& start) {
    const auto rows = static_cast<Index>(program.rows.size());
    const auto columns = static_cast<Index>(program.cost.size());
    MatrixXd a(rows, columns);
    for (Index i = 0; i < rows; ++i)
        a.row(i) = vector_of(program.rows[static_cast<std::size_t>(i)]).transpose();
    const InteriorPoint method(std::move(a), vector_of(program.bounds), vector_of(program.cost));
    const auto found = method.solve(vector_of(start));
    if (!found)
        return {};
    return LinearSolution{{found->z.begin(), found->z.end()}, {found->y.begin(), found->y.end()}};
}

} // namespace cornerwright
