#include "core/numerics/delayed_sum.h"

#include "core/numerics/root_clusters.h"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <optional>

namespace cornerwright {
namespace {

constexpr double half_ulp = 0x1p-53;

bool is_finite(Complex value) {
    return std::isfinite(value.real()) && std::isfinite(value.imag());
}

/// Newton's method; with `found` roots divided out, so that it ends on a new one.
std::optional<Complex> newton(const DelayedSum& function, Complex s, const ComplexVector& found) {
    for (int round = 0; round < 40; ++round) {
        const CoarseStep step = function.coarse(s);
        Complex repelled = 0.0;
        for (const Complex& other : found)
            if (s != other)
                repelled += inverse(s - other);
        Complex correction = times(step.newton, inverse(1.0 - times(step.newton, repelled)));
        if (!is_finite(correction))
            return std::nullopt;
        // The exponential changes by e over 1/delay: longer steps are blind.
        const double longest = 1.5 / function.delay + 0.25 * std::abs(s);
        if (std::abs(correction) > longest)
            correction *= longest / std::abs(correction);
        s -= correction;
        if (step.settled() || std::abs(correction) <= 4.0 * half_ulp * std::abs(s))
            return s;
    }
    return std::nullopt;
}

/// Roots of the rational approximation exp(-x) = ((1 - x/2m)/(1 + x/2m))^m, near the true ones
/// where |s| delay is below m; the open loop's poles, near light resonances of little gain; and
/// for the branches of the logarithm, s = (ln(-L0(s)) + 2 pi i l)/delay, one step from L0(s) on the
/// axis, near the chain of roots that the dead time makes.
ComplexVector start_points(const DelayedSum& function, double imag_high) {
    constexpr int order = 8;
    FactorList left = function.sum.left();
    FactorList right = function.sum.right();
    left.repeated_root = -2.0 * order / function.delay;
    right.repeated_root = 2.0 * order / function.delay;
    left.repeated = right.repeated = order; // even, so that (-1)^order is 1
    const FactoredSum approximation(left, right, function.sum.gain());
    ComplexVector points = approximation.start();
    iterate_roots(approximation, points);

    points.insert(points.end(), left.roots.begin(), left.roots.end());

    constexpr double most_chain_links = 400.0;
    const double spacing = 2.0 * std::numbers::pi / function.delay;
    const double links = std::min(imag_high / spacing + 1.0, most_chain_links);
    for (int link = 1; link <= static_cast<int>(links); ++link) {
        const Complex axis(0.0, spacing * link);
        const FactoredSum::Sides at = function.sum.sides(axis);
        const Complex loop = function.sum.gain() * at.right / at.left;
        const Complex logarithm = std::log(-loop);
        if (is_finite(logarithm))
            points.push_back(axis + logarithm / function.delay);
    }
    return points;
}

void keep_new(ComplexVector& found, Complex root, double resolution) {
    const bool known = std::any_of(found.begin(), found.end(), [&](Complex other) {
        return std::abs(other - root) <= resolution * std::abs(root);
    });
    if (!known)
        found.push_back(root);
}

/// The angle of F from one corner to another, in steps short against the distance of any root.
std::optional<double> turn(const DelayedSum& function, Complex from, Complex to) {
    const double length = std::abs(to - from);
    const Complex direction = (to - from) / length;
    double at = 0.0;
    double step = length / 64.0;
    double angle = 0.0;
    Complex slope = function.logarithmic_derivative(from);
    FactoredSum::Sides sides = function.sides(from);
    Complex value = sides.left + function.sum.gain() * sides.right;
    constexpr double longest = 0.7; // rad of F in one step at either end's rate
    while (at < length) {
        if (!is_finite(slope))
            return std::nullopt;
        step = std::min({step, length - at, longest / std::abs(slope)});
        const Complex s = at + step >= length ? to : from + direction * (at + step);
        const Complex next_slope = function.logarithmic_derivative(s);
        if (!(std::abs(next_slope) * step <= 2.0 * longest)) {
            step *= 0.5;
            if (step < 1e-9 * length)
                return std::nullopt;
            continue;
        }
        sides = function.sides(s);
        const Complex next = sides.left + function.sum.gain() * sides.right;
        angle += std::arg(times(next, std::conj(value)) / (std::abs(next) * std::abs(value)));
        at += step;
        step *= 2.0;
        slope = next_slope;
        value = next;
    }
    return angle;
}

} // namespace

FactoredSum::Sides DelayedSum::sides(Complex s) const {
    FactoredSum::Sides at = sum.sides(s);
    const Complex exponential = std::exp(-s * delay);
    at.right_derivative = times(at.right_derivative - delay * at.right, exponential);
    at.right = times(at.right, exponential);
    return at;
}

CoarseStep DelayedSum::coarse(Complex s) const {
    const FactoredSum::Sides at = sides(s);
    const Complex right = sum.gain() * at.right;
    const Complex derivative = at.left_derivative + sum.gain() * at.right_derivative;
    const double unit = half_ulp * (std::abs(at.left) + std::abs(right)) / std::abs(derivative);
    const double terms = static_cast<double>(sum.left().degree() + sum.right().degree() + 2) +
                         0.5 * std::abs(s) * delay; // the exponential's own argument is rounded
    return {times(at.left + right, inverse(derivative)), 4.0 * terms * unit, unit};
}

Complex DelayedSum::logarithmic_derivative(Complex s) const {
    const FactoredSum::Sides at = sides(s);
    return (at.left_derivative + sum.gain() * at.right_derivative) /
           (at.left + sum.gain() * at.right);
}

int count_roots_inside(const DelayedSum& function, const SymmetricRectangle& rectangle) {
    // F is real on the real axis: the upper half of the edge makes half of the turn.
    const Complex corners[] = {
        rectangle.real_high, Complex(rectangle.real_high, rectangle.imag_high),
        Complex(rectangle.real_low, rectangle.imag_high), rectangle.real_low};
    double angle = 0.0;
    for (int k = 0; k < 3; ++k) {
        const std::optional<double> edge = turn(function, corners[k], corners[k + 1]);
        if (!edge)
            return -1;
        angle += *edge;
    }
    return static_cast<int>(std::lround(angle / std::numbers::pi));
}

RootsInside roots_inside(const DelayedSum& function, const SymmetricRectangle& rectangle) {
    constexpr double resolution = 1e-9; // roots closer than this count as found once at first
    const ComplexVector starts = start_points(function, rectangle.imag_high);
    ComplexVector found; // all with imaginary part >= 0
    const auto take = [&](std::optional<Complex> root) {
        if (!root)
            return;
        const double rounding = 1e-13 * std::abs(*root);
        const Complex upper = std::abs(root->imag()) <= rounding
                                  ? Complex(root->real())
                                  : Complex(root->real(), std::abs(root->imag()));
        if (rectangle.contains(upper))
            keep_new(found, upper, resolution);
    };
    for (const Complex& start : starts)
        if (start.imag() >= -1e-6 * std::abs(start))
            take(newton(function, start, {}));

    const auto both_halves = [&found] {
        ComplexVector all;
        for (const Complex& root : found) {
            all.push_back(root);
            if (root.imag() > 0.0)
                all.push_back(std::conj(root));
        }
        return all;
    };
    const int count = count_roots_inside(function, rectangle);
    RootsInside inside{both_halves(), false};
    // What is missing is looked for with the known roots divided out, from a net of points.
    constexpr int net = 12;
    for (int k = 0; k < net * net && count > static_cast<int>(inside.roots.size()); ++k) {
        const double across = (k % net + 0.5) / net;
        const double up = (k / net + 0.5) / net;
        const Complex start(std::lerp(rectangle.real_low, rectangle.real_high, across),
                            rectangle.imag_high * up * up); // denser towards the real axis
        std::optional<Complex> root = newton(function, start, inside.roots);
        if (!root || !rectangle.contains(*root))
            continue;
        if (std::abs(root->imag()) <= 1e-7 * std::abs(*root))
            root = root->real(); // a double root on the axis, as exact as it can be
        found.emplace_back(root->real(), std::abs(root->imag()));
        inside.roots = both_halves();
    }
    inside.confirmed = count == static_cast<int>(inside.roots.size());
    std::sort(inside.roots.begin(), inside.roots.end(), [](Complex left, Complex right) {
        return left.real() != right.real() ? left.real() < right.real()
                                           : left.imag() < right.imag();
    });
    return inside;
}

SymmetricRectangle rightmost_rectangle(const DelayedSum& function, double decay,
                                       double imag_limit) {
    double largest = 0.0;
    for (const FactorList* list : {&function.sum.left(), &function.sum.right()})
        for (const Complex& root : list->roots)
            largest = std::max(largest, std::abs(root));
    // Beyond this radius |gain prod(s - right)| exp(decay) stays below |prod(s - left)|.
    const auto loop_bound = [&](double radius) {
        double bound = std::log(std::abs(function.sum.gain())) + decay;
        for (const Complex& root : function.sum.right().roots)
            bound += std::log(radius + std::abs(root));
        for (const Complex& root : function.sum.left().roots)
            bound -= std::log(radius - std::abs(root));
        return bound;
    };
    double radius = std::max(2.0 * largest, 1.0 / function.delay);
    constexpr double far = 1e12; // a loop that does not roll off never gets below
    while (loop_bound(radius) >= 0.0 && radius < far * imag_limit)
        radius *= 1.5;
    const double low = -decay / function.delay;
    const double reach = radius * 1.01;
    return {low, reach, std::min(reach, imag_limit)};
}

} // namespace cornerwright
