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
/// where |s| delay is below m; the open loop's poles and zeros, where the loop has little or much
/// gain; and for the branches of the logarithm, s = (ln(-L0(s)) + 2 pi i l)/delay, one step from
/// L0(s) on the axis, near the chain of roots that the dead time makes.
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
    points.insert(points.end(), right.roots.begin(), right.roots.end());

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

/// Points all over the upper half plane, evenly in the logarithm of the distance from the origin.
ComplexVector net_points(const DelayedSum& function, double reach) {
    double nearest = 1.0 / function.delay;
    for (const FactorList* list : {&function.sum.left(), &function.sum.right()})
        for (const Complex& root : list->roots)
            if (root != Complex(0.0))
                nearest = std::min(nearest, std::abs(root));
    constexpr int radii = 16;
    constexpr int angles = 9;
    ComplexVector points;
    for (int k = 0; k < radii; ++k)
        for (int j = 0; j < angles; ++j)
            points.push_back(
                std::polar(0.3 * nearest * std::pow(4.0 * reach / nearest, k / (radii - 1.0)),
                           std::numbers::pi * (j + 0.5) / angles));
    return points;
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
            if (step < 1e-12 * length)
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
    ComplexVector found; // all with imaginary part >= 0
    // Roots that the rounding of the gain cannot tell apart count as the same one at first.
    const auto take = [&](Complex root) {
        const double blur =
            std::max(1e-12 * std::abs(root), 8.0 * std::abs(function.coarse(root).data));
        root = std::abs(root.imag()) <= blur ? Complex(root.real())
                                             : Complex(root.real(), std::abs(root.imag()));
        const bool known = std::any_of(found.begin(), found.end(), [&](Complex other) {
            return std::abs(other - root) <= blur;
        });
        if (!known && rectangle.contains(root))
            found.push_back(root);
    };
    ComplexVector starts = start_points(function, rectangle.imag_high);
    for (const Complex& start : starts)
        if (start.imag() >= -1e-6 * std::abs(start))
            if (const std::optional<Complex> root = newton(function, start, {}))
                take(*root);

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
    if (count > static_cast<int>(inside.roots.size())) {
        // What is missing is looked for with the known roots divided out; it may be a second root
        // at the place of one of them.
        const ComplexVector net = net_points(function, rectangle.imag_high);
        starts.insert(starts.end(), net.begin(), net.end());
        for (const Complex& start : starts) {
            const std::optional<Complex> root = newton(function, start, inside.roots);
            if (!root || !rectangle.contains(*root))
                continue;
            const bool is_real = std::abs(root->imag()) <= 1e-7 * std::abs(*root);
            found.emplace_back(root->real(), is_real ? 0.0 : std::abs(root->imag()));
            inside.roots = both_halves();
            if (count <= static_cast<int>(inside.roots.size()))
                break;
        }
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
    // ln of a bound of |gain prod(s - right)/prod(s - left)| for all |s| >= radius.
    const auto loop_bound = [&](double radius) {
        double bound = std::log(std::abs(function.sum.gain()));
        for (const Complex& root : function.sum.right().roots)
            bound += std::log(radius + std::abs(root));
        for (const Complex& root : function.sum.left().roots)
            bound -= std::log(radius - std::abs(root));
        return bound;
    };
    // A root has |loop| = exp(delay * real part): none lies further right than the first radius
    // below, none right of the low edge further out than the second.
    const double least = std::max(2.0 * largest, 1.0 / function.delay);
    double right_reach = least;
    while (loop_bound(right_reach) >= function.delay * right_reach)
        right_reach *= 1.5;
    double reach = least;
    while (loop_bound(reach) >= -decay && reach < imag_limit)
        reach *= 1.5;
    return {-decay / function.delay, 1.01 * right_reach, std::min(1.01 * reach, imag_limit)};
}

} // namespace cornerwright
