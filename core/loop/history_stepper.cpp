#include "core/loop/history_stepper.h"

#include <Eigen/Dense>

#include <algorithm>
#include <cmath>
#include <unsupported/Eigen/MatrixFunctions>

namespace cornerwright {
namespace {

constexpr std::size_t nodes = HistoryStepper::nodes;
constexpr Eigen::Index node_count = static_cast<Eigen::Index>(nodes);

// A quartic over an interval of this many time constants is within 1e-6 of an exponential.
constexpr double resolved = 0.5;
constexpr double least_intervals = 4.0; // in one delay, for the closed loop's own turns
constexpr double dead = 1e-5;           // what a kink excites of a block, when it is of no interest

/// Taylor coefficients (times the power of the length) at the start of the quartic through values
/// at 0, 1/4, 1/2, 3/4, 1 of an interval: the inverse of their Vandermonde matrix, exact.
Eigen::MatrixXd taylor_from_nodes() {
    Eigen::MatrixXd vandermonde(node_count, node_count);
    for (Eigen::Index i = 0; i < node_count; ++i)
        for (Eigen::Index k = 0; k < node_count; ++k)
            vandermonde(i, k) = k == 0 ? 1.0 : std::pow(0.25 * static_cast<double>(i), k);
    return vandermonde.inverse();
}

/// The chain of blocks behind a polynomial drive: first the drive and its scaled derivatives, then
/// the disturbance, then the states; outputs as rows on all of these.
struct Chain {
    Eigen::MatrixXcd matrix;
    Eigen::RowVectorXcd compensator;
    Eigen::RowVectorXcd plant;
};

/// Appends the blocks of `form` driven by `row`, which becomes their output.
void append_blocks(const RootForm& form, Eigen::MatrixXcd& matrix, Eigen::RowVectorXcd& row,
                   Eigen::Index& next) {
    ComplexVector zeros = form.zeros;
    double gain = form.gain;
    for (const Complex& pole : form.poles) {
        const Eigen::Index i = next++;
        Complex coupling = 0.0;
        const bool has_zero = !zeros.empty();
        if (has_zero) {
            const auto nearest =
                std::min_element(zeros.begin(), zeros.end(), [&](Complex a, Complex b) {
                    return std::abs(a - pole) < std::abs(b - pole);
                });
            coupling = pole - *nearest;
            zeros.erase(nearest);
        }
        const double size = has_zero ? std::abs(coupling) : std::abs(pole);
        const double scale = size > 0.0 ? size : 1.0;
        matrix.row(i) = scale * row;
        matrix(i, i) = pole;
        if (has_zero) {
            row(i) = coupling / scale;
        } else {
            row.setZero();
            row(i) = 1.0;
            gain /= scale;
        }
    }
    row *= gain;
}

Chain make_chain(const RootForm& compensator, const RootForm& plant, double length) {
    const auto order = static_cast<Eigen::Index>(compensator.poles.size() + plant.poles.size());
    const Eigen::Index size = node_count + 1 + order;
    Chain chain{Eigen::MatrixXcd::Zero(size, size), Eigen::RowVectorXcd::Zero(size),
                Eigen::RowVectorXcd::Zero(size)};
    for (Eigen::Index k = 0; k + 1 < node_count; ++k)
        chain.matrix(k, k + 1) = static_cast<double>(k + 1) / length;
    Eigen::Index next = node_count + 1;
    chain.compensator(0) = 1.0;
    append_blocks(compensator, chain.matrix, chain.compensator, next);
    chain.plant = chain.compensator;
    chain.plant(node_count) = 1.0;
    append_blocks(plant, chain.matrix, chain.plant, next);
    return chain;
}

} // namespace

void HistoryStepper::grade(const ComplexVector& poles, double delay_s) {
    double fastest = least_intervals * resolved / delay_s;
    for (const Complex& pole : poles)
        fastest = std::max(fastest, std::abs(pole));
    constexpr int most_levels = 40;
    const int halvings =
        std::min(most_levels, static_cast<int>(std::ceil(std::log2(fastest * delay_s / resolved))));
    shortest_s_ = std::ldexp(delay_s, -halvings);
    const auto longest_at = [&](double t) {
        double longest = delay_s / least_intervals;
        for (const Complex& pole : poles)
            if (std::exp(std::min(0.0, pole.real()) * t) > dead)
                longest = std::min(longest, resolved / std::abs(pole));
        return longest;
    };
    const auto whole = std::size_t{1} << halvings;
    for (std::size_t at = 0; at < whole;) {
        const double begin = static_cast<double>(at) * shortest_s_;
        const double longest = longest_at(begin);
        std::size_t level = 0;
        while ((std::size_t{2} << level) <= whole - at &&
               std::ldexp(shortest_s_, static_cast<int>(level) + 1) <= longest)
            ++level;
        intervals_.push_back({begin, std::ldexp(shortest_s_, static_cast<int>(level)), level});
        at += std::size_t{1} << level;
    }
}

HistoryStepper::HistoryStepper(const RootForm& compensator, const RootForm& plant, double delay_s)
    : order_(compensator.poles.size() + plant.poles.size()) {
    ComplexVector poles = compensator.poles;
    poles.insert(poles.end(), plant.poles.begin(), plant.poles.end());
    grade(poles, delay_s);

    std::size_t highest = 0;
    for (const Interval& interval : intervals_)
        highest = std::max(highest, interval.level);
    const Eigen::MatrixXd taylor = taylor_from_nodes();
    const Chain chain = make_chain(compensator, plant, shortest_s_);
    const auto order = static_cast<Eigen::Index>(order_);
    const Eigen::Index size = chain.matrix.rows();
    Eigen::MatrixXcd quarter = (chain.matrix * (0.25 * shortest_s_)).exp();
    for (std::size_t l = 0; l <= highest; ++l) {
        std::array<Eigen::MatrixXcd, nodes> powers;
        powers[0] = Eigen::MatrixXcd::Identity(size, size);
        powers[1] = quarter;
        powers[2] = quarter * quarter;
        powers[3] = powers[2] * quarter;
        powers[4] = powers[2] * powers[2];
        Eigen::MatrixXcd rows(order + 2 * node_count, size);
        rows.topRows(order) = powers[4].bottomRows(order);
        for (Eigen::Index k = 0; k < node_count; ++k) {
            const Eigen::MatrixXcd& power = powers[static_cast<std::size_t>(k)];
            rows.row(order + k) = chain.compensator * power;
            rows.row(order + node_count + k) = chain.plant * power;
        }
        // From values at the nodes instead of derivatives; the chain's unit is the shortest length.
        for (Eigen::Index k = 1; k < node_count; ++k)
            rows.col(k) *= std::ldexp(1.0, -static_cast<int>(l) * static_cast<int>(k));
        const Eigen::MatrixXcd drive = rows.leftCols(node_count) * taylor;
        rows.leftCols(node_count) = drive;
        Level level;
        for (Eigen::Index i = 0; i < rows.rows(); ++i)
            for (Eigen::Index j = 0; j < size; ++j)
                level.rows.push_back(rows(i, j));
        levels_.push_back(std::move(level));
        quarter = powers[2];
    }
}

HistoryStepper::Outputs HistoryStepper::advance(const Interval& interval, const Nodes& drive,
                                                double disturbance, ComplexVector& state) const {
    const Complex* row = levels_[interval.level].rows.data();
    const auto applied = [&](std::size_t columns) {
        double real = row[nodes].real() * disturbance;
        double imag = row[nodes].imag() * disturbance;
        for (std::size_t k = 0; k < nodes; ++k) {
            real += row[k].real() * drive[k];
            imag += row[k].imag() * drive[k];
        }
        const Complex* entry = row + nodes + 1;
        for (std::size_t k = 0; k < columns; ++k) {
            real += entry[k].real() * state[k].real() - entry[k].imag() * state[k].imag();
            imag += entry[k].real() * state[k].imag() + entry[k].imag() * state[k].real();
        }
        row += nodes + 1 + order_;
        return Complex(real, imag);
    };
    ComplexVector next(order_);
    for (std::size_t i = 0; i < order_; ++i)
        next[i] = applied(i + 1); // lower triangular
    Outputs outputs;
    for (double& value : outputs.compensator)
        value = applied(order_).real();
    for (double& value : outputs.plant)
        value = applied(order_).real();
    state = std::move(next);
    return outputs;
}

HistoryStepper::Nodes node_slopes(const HistoryStepper::Nodes& v, double length_s) {
    // Five-point differences; M. Abramowitz, I. A. Stegun, Handbook of Mathematical Functions,
    // table 25.2 (citation from memory).
    const double scale = 4.0 / (12.0 * length_s);
    return {scale * (-25.0 * v[0] + 48.0 * v[1] - 36.0 * v[2] + 16.0 * v[3] - 3.0 * v[4]),
            scale * (-3.0 * v[0] - 10.0 * v[1] + 18.0 * v[2] - 6.0 * v[3] + v[4]),
            scale * (v[0] - 8.0 * v[1] + 8.0 * v[3] - v[4]),
            scale * (-v[0] + 6.0 * v[1] - 18.0 * v[2] + 10.0 * v[3] + 3.0 * v[4]),
            scale * (3.0 * v[0] - 16.0 * v[1] + 36.0 * v[2] - 48.0 * v[3] + 25.0 * v[4])};
}

} // namespace cornerwright
