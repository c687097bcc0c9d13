#include "core/loop/held_plant.h"

#include "core/numerics/compensated.h"

#include <Eigen/Dense>

#include <algorithm>
#include <cmath>
#include <unsupported/Eigen/MatrixFunctions>

namespace cornerwright {
namespace {

constexpr double least_points = 8.0; // a period, by the contract
constexpr double resolved = 0.6;     // time constants of a live mode between points
constexpr double dead = 1e-3;        // part of a mode that no cubic needs to follow

std::vector<double> points_of_period(const ComplexVector& poles, double period,
                                     std::vector<double> switches) {
    std::sort(switches.begin(), switches.end());
    switches.push_back(period);
    std::vector<double> points{0.0};
    double last_switch = 0.0;
    for (const double next_switch : switches) {
        while (points.back() < next_switch) {
            double longest = period / least_points;
            for (const Complex& pole : poles) {
                const double since = points.back() - last_switch;
                if (std::exp(std::min(0.0, pole.real()) * since) > dead)
                    longest = std::min(longest, resolved / std::abs(pole));
            }
            const double left = next_switch - points.back();
            // Two even parts rather than a whole one and a splinter.
            const double step = left <= longest ? left : std::min(longest, 0.5 * left);
            points.push_back(step == left ? next_switch : points.back() + step);
        }
        last_switch = next_switch;
    }
    return points;
}

/// Re(row . state).
double real_product(const ComplexVector& row, const ComplexVector& state) {
    double sum = 0.0;
    for (std::size_t i = 0; i < row.size(); ++i)
        sum += row[i].real() * state[i].real() - row[i].imag() * state[i].imag();
    return sum;
}

} // namespace

void BlockChain::add_rate(ComplexVector& state, double v) const {
    // Lower triangular: from the last state up, none is needed once it is overwritten.
    for (std::size_t i = order; i-- > 0;) {
        Complex change = input[i] * v;
        for (std::size_t k = 0; k <= i; ++k)
            change += times(matrix[i * order + k], state[k]);
        state[i] += change;
    }
}

double BlockChain::out(const ComplexVector& state, double v) const {
    return real_product(output, state) + direct * v;
}

double BlockChain::slope(const ComplexVector& state, double v) const {
    return real_product(slope_output, state) + slope_direct * v;
}

BlockChain block_chain(const RootForm& form) {
    BlockChain chain;
    const std::size_t order = chain.order = form.poles.size();
    chain.matrix.resize(order * order);
    chain.input.resize(order);
    ComplexVector zeros = form.zeros;
    ComplexVector row(order); // what the blocks so far give out, on their states
    Complex direct = 1.0;
    double gain = form.gain;
    for (std::size_t i = 0; i < order; ++i) {
        const Complex pole = form.poles[i];
        const bool has_zero = !zeros.empty();
        Complex coupling = 0.0;
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
        for (std::size_t k = 0; k < i; ++k)
            chain.matrix[i * order + k] = scale * row[k];
        chain.input[i] = scale * direct;
        chain.matrix[i * order + i] = pole;
        if (has_zero) {
            row[i] = coupling / scale;
        } else {
            std::fill(row.begin(), row.end(), Complex(0.0));
            row[i] = 1.0;
            direct = 0.0;
            gain /= scale;
        }
    }
    chain.output = row;
    for (Complex& entry : chain.output)
        entry *= gain;
    chain.direct = gain * direct.real();
    chain.slope_output.resize(order);
    for (std::size_t i = 0; i < order; ++i) {
        for (std::size_t k = 0; k <= i; ++k)
            chain.slope_output[k] += times(chain.output[i], chain.matrix[i * order + k]);
        chain.slope_direct += times(chain.output[i], chain.input[i]).real();
    }
    return chain;
}

HeldPlant::HeldPlant(const RootForm& plant, double period_s, std::vector<double> switches_s)
    : chain_(block_chain(plant)) {
    const std::vector<double> points = points_of_period(plant.poles, period_s, switches_s);
    for (std::size_t i = 0; i + 1 < points.size(); ++i) {
        const bool may_jump = i == 0 || std::find(switches_s.begin(), switches_s.end(),
                                                  points[i]) != switches_s.end();
        if (may_jump) {
            Segment segment;
            segment.begin_s = points[i];
            segment.matrix.resize(chain_.order * chain_.order);
            segment.input.resize(chain_.order);
            for (std::size_t state = 0; state < chain_.order; ++state)
                segment.matrix[state * chain_.order + state] = 1.0;
            segments_.push_back(std::move(segment));
            ++points_;
        }
        Segment& segment = segments_.back();
        lengthen(segment, step_of(points[i + 1] - points[i]));
        segment.outlets.push_back(outlet_of(segment, points[i + 1] - segment.begin_s));
        ++points_;
    }
}

/// Lower triangular matrices: by.matrix * segment.matrix in its place, the input likewise.
void HeldPlant::lengthen(Segment& segment, const Step& by) const {
    const std::size_t order = chain_.order;
    for (std::size_t i = order; i-- > 0;) {
        Complex input = by.input[i];
        for (std::size_t k = 0; k <= i; ++k)
            input += times(by.matrix[i * order + k], segment.input[k]);
        segment.input[i] = input;
        for (std::size_t column = 0; column <= i; ++column) {
            Complex sum = 0.0;
            for (std::size_t k = column; k <= i; ++k)
                sum += times(by.matrix[i * order + k], segment.matrix[k * order + column]);
            segment.matrix[i * order + column] = sum;
        }
    }
}

HeldPlant::Outlet HeldPlant::outlet_of(const Segment& segment, double after_s) const {
    const std::size_t order = chain_.order;
    Outlet outlet;
    outlet.after_s = after_s;
    const auto through = [&](const ComplexVector& row, double direct, ComplexVector& on_states,
                             double& on_input) {
        on_states.resize(order);
        on_input = direct + real_product(row, segment.input);
        for (std::size_t i = 0; i < order; ++i)
            for (std::size_t k = 0; k <= i; ++k)
                on_states[k] += times(row[i], segment.matrix[i * order + k]);
    };
    through(chain_.output, chain_.direct, outlet.value, outlet.value_input);
    through(chain_.slope_output, chain_.slope_direct, outlet.slope, outlet.slope_input);
    return outlet;
}

std::pair<double, double> HeldPlant::read(const Outlet& outlet, double input,
                                          const ComplexVector& state) const {
    return {real_product(outlet.value, state) + outlet.value_input * input,
            real_product(outlet.slope, state) + outlet.slope_input * input};
}

const HeldPlant::Step& HeldPlant::step_of(double length_s) {
    constexpr double rounding = 1e-12; // pieces that differ by it are one length
    for (const Step& known : steps_)
        if (std::abs(known.length_s - length_s) <= rounding * length_s)
            return known;
    const auto order = static_cast<Eigen::Index>(chain_.order);
    // The held input as a state that does not move.
    Eigen::MatrixXcd matrix = Eigen::MatrixXcd::Zero(order + 1, order + 1);
    for (Eigen::Index i = 0; i < order; ++i) {
        matrix(i + 1, 0) = chain_.input[static_cast<std::size_t>(i)];
        for (Eigen::Index k = 0; k < order; ++k)
            matrix(i + 1, k + 1) = chain_.matrix[static_cast<std::size_t>(i * order + k)];
    }
    const Eigen::MatrixXcd exponential = (matrix * length_s).exp();
    Step step;
    step.length_s = length_s;
    for (Eigen::Index i = 0; i < order; ++i) {
        step.input.push_back(exponential(i + 1, 0));
        for (Eigen::Index k = 0; k < order; ++k)
            step.matrix.push_back(exponential(i + 1, k + 1));
    }
    steps_.push_back(std::move(step));
    return steps_.back();
}

void HeldPlant::advance(const Segment& segment, double input, ComplexVector& state) const {
    const std::size_t order = chain_.order;
    // Lower triangular: from the last state up, none is needed once it is overwritten.
    for (std::size_t i = order; i-- > 0;) {
        Complex sum = segment.input[i] * input;
        for (std::size_t k = 0; k <= i; ++k)
            sum += times(segment.matrix[i * order + k], state[k]);
        state[i] = sum;
    }
}

} // namespace cornerwright
