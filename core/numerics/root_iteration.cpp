#include "core/numerics/root_iteration.h"

#include "core/numerics/root_clusters.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double half_ulp = 0x1p-53;

bool is_finite(Complex value) {
    return std::isfinite(value.real()) && std::isfinite(value.imag());
}

/// sum over the others of 1/(s_i - s_j): the pull that keeps two iterates off the same root.
Complex repulsion(const ComplexVector& roots, std::size_t i) {
    Complex sum = 0.0;
    for (std::size_t j = 0; j < roots.size(); ++j) {
        const Complex difference = roots[i] - roots[j];
        if (difference != Complex(0.0)) // itself, or a twin that the next round moves away
            sum += inverse(difference);
    }
    return sum;
}

Complex aberth_correction(Complex newton, Complex repelled) {
    return times(newton, inverse(1.0 - times(newton, repelled)));
}

/// One iterate of the polished stage, real and imaginary part as unevaluated sums.
struct Iterate {
    PreciseComplex s;
    bool is_real = false;
    double rounding = 0.0; ///< error left in `s`

    void subtract(Complex correction) {
        const Complex low = s.error - correction;
        const TwoTerms real = two_sum(s.value.real(), low.real());
        const TwoTerms imag = two_sum(s.value.imag(), is_real ? 0.0 : low.imag());
        s = {{real.value, imag.value}, {real.error, imag.error}};
    }
};

/// Distance to the nearest other root.
double gap(const ComplexVector& roots, std::size_t i) {
    double nearest = std::numeric_limits<double>::infinity();
    for (std::size_t j = 0; j < roots.size(); ++j)
        if (j != i)
            nearest = std::min(nearest, std::norm(roots[i] - roots[j]));
    return std::sqrt(nearest);
}

/// Newton's method at twice the precision for a simple root, `room` away from all others. False
/// where it wanders off.
bool polish_simple(const RootProblem& problem, Iterate& iterate, double room) {
    const Complex from = iterate.s.value;
    for (int round = 0; round < 8; ++round) {
        const PreciseStep step = problem.precise(iterate.s);
        if (!is_finite(step.newton))
            return false;
        iterate.subtract(step.newton);
        const double size = std::abs(step.newton);
        // Quadratic convergence: what a step leaves is about its square over the room.
        const double left = size * size / room;
        iterate.rounding = step.rounding + left;
        if (left <= 0x1p-90 * std::abs(iterate.s.value) || size <= step.rounding)
            return std::abs(iterate.s.value - from) < 0.25 * room;
    }
    return false;
}

/// True where the sum value + error rounds to `value` however the error of the sum falls out.
bool rounds_safely(double value, double error, double uncertainty) {
    const double towards = std::copysign(std::numeric_limits<double>::infinity(), error);
    const double boundary = 0.5 * std::abs(std::nextafter(value, towards) - value);
    return boundary - std::abs(error) > 8.0 * uncertainty;
}

struct Attempt {
    ComplexVector roots;
    bool found = false;  ///< every root isolated and polished
    bool unique = false; ///< no other start can round to other bits
};

/// The index of the iterate that is the mirror of each; itself for a real one. Empty where the
/// iterates are not clearly isolated, each with its mirror.
std::vector<std::size_t> mirrors(const RootProblem& problem, const ComplexVector& roots) {
    const std::size_t n = roots.size();
    std::vector<double> radius(n);
    for (std::size_t i = 0; i < n; ++i) {
        const CoarseStep step = problem.coarse(roots[i]);
        radius[i] = 4.0 * (std::abs(step.newton) + step.rounding + half_ulp * std::abs(roots[i]));
        if (!(static_cast<double>(n) * 4.0 * radius[i] < gap(roots, i)))
            return {};
    }
    std::vector<std::size_t> mirror(n);
    for (std::size_t i = 0; i < n; ++i) {
        std::size_t best = i;
        double distance = std::norm(roots[i] - std::conj(roots[i]));
        for (std::size_t j = 0; j < n; ++j) {
            const double other = std::norm(roots[j] - std::conj(roots[i]));
            if (other < distance) {
                best = j;
                distance = other;
            }
        }
        if (!(std::sqrt(distance) <= radius[i] + radius[best]))
            return {};
        mirror[i] = best;
    }
    for (std::size_t i = 0; i < n; ++i)
        if (mirror[mirror[i]] != i)
            return {};
    return mirror;
}

/// The quick way: every root simple and well apart, one of each pair polished.
Attempt solve_isolated(const RootProblem& problem, ComplexVector roots) {
    Attempt attempt;
    if (!iterate_roots(problem, roots))
        return attempt;
    const std::vector<std::size_t> mirror = mirrors(problem, roots);
    if (mirror.size() != roots.size())
        return attempt;
    attempt.unique = true;
    for (std::size_t i = 0; i < roots.size(); ++i) {
        const bool is_real = mirror[i] == i;
        if (!is_real && roots[i].imag() < 0.0)
            continue;
        const double room = gap(roots, i);
        Iterate iterate{{is_real ? Complex(roots[i].real()) : roots[i], {}}, is_real};
        if (!polish_simple(problem, iterate, std::min(room, 1e300)))
            return attempt;
        double real = iterate.s.value.real();
        const double imag = iterate.s.value.imag();
        if (std::abs(real) <= 4.0 * iterate.rounding)
            real = 0.0;
        else
            attempt.unique &= rounds_safely(real, iterate.s.error.real(), iterate.rounding);
        if (!is_real) {
            attempt.unique &= rounds_safely(imag, iterate.s.error.imag(), iterate.rounding);
            attempt.roots.emplace_back(real, -imag);
        }
        attempt.roots.emplace_back(real, imag);
    }
    attempt.found = attempt.roots.size() == roots.size();
    return attempt;
}

/// The slow way, for roots that are multiple or nearly so: simultaneous iteration at twice the
/// precision (linear convergence), then what the data cannot tell apart is made one.
ComplexVector solve_clustered(const RootProblem& problem) {
    ComplexVector roots = problem.start();
    iterate_roots(problem, roots);
    const std::size_t n = roots.size();
    std::vector<Iterate> iterates(n);
    for (std::size_t i = 0; i < n; ++i)
        iterates[i].s.value = roots[i];
    std::vector<bool> settled(n, false);
    constexpr int rounds = 100; // 1e-8 to 1e-16 at a half a round takes 27, a triple root 46
    for (int round = 0; round < rounds; ++round) {
        bool all = true;
        for (std::size_t i = 0; i < n; ++i) {
            if (settled[i])
                continue;
            const PreciseStep step = problem.precise(iterates[i].s);
            Complex correction = aberth_correction(step.newton, repulsion(roots, i));
            if (!is_finite(correction))
                correction = 0.0;
            iterates[i].subtract(correction);
            roots[i] = iterates[i].s.value;
            settled[i] = std::abs(step.newton) <= step.rounding ||
                         std::abs(correction) <= half_ulp * std::abs(roots[i]);
            all = all && settled[i];
        }
        if (all)
            break;
    }
    merge_clusters(problem, roots);
    pair_conjugates(roots);
    return roots;
}

} // namespace

bool iterate_roots(const RootProblem& problem, ComplexVector& roots, int limit) {
    std::vector<bool> settled(roots.size(), false);
    for (int round = 0; round < limit; ++round) {
        bool all = true;
        for (std::size_t i = 0; i < roots.size(); ++i) {
            if (settled[i])
                continue;
            const CoarseStep step = problem.coarse(roots[i]);
            const Complex correction = aberth_correction(step.newton, repulsion(roots, i));
            if (!is_finite(correction)) {
                roots[i] = times(roots[i], Complex(1.0, 0.1)); // off a stationary point
                all = false;
                continue;
            }
            roots[i] -= correction;
            settled[i] =
                step.settled() || std::abs(correction) <= 4.0 * half_ulp * std::abs(roots[i]);
            all = all && settled[i];
        }
        if (all)
            return true;
    }
    return false;
}

SolvedRoots solve_roots(const RootProblem& problem, const ComplexVector& warm_start) {
    SolvedRoots solved;
    if (problem.count() == 0)
        return solved;
    Attempt attempt;
    if (warm_start.size() == problem.count()) {
        attempt = solve_isolated(problem, warm_start);
        attempt.found = attempt.found && attempt.unique;
    }
    if (!attempt.found)
        attempt = solve_isolated(problem, problem.start());
    solved.roots = attempt.found ? std::move(attempt.roots) : solve_clustered(problem);

    // One rounding of the data away from zero is zero.
    for (std::size_t i = 0; i < solved.roots.size(); ++i) {
        const double data = problem.coarse(solved.roots[i]).data;
        if (std::abs(solved.roots[i]) <= 4.0 * data && data < 0.01 * gap(solved.roots, i))
            solved.roots[i] = 0.0;
    }
    std::sort(solved.roots.begin(), solved.roots.end(), [](Complex left, Complex right) {
        return left.real() != right.real() ? left.real() < right.real()
                                           : left.imag() < right.imag();
    });
    solved.uncertainty = root_uncertainty(problem, solved.roots);
    return solved;
}

ComplexVector newton_polygon_points(const std::vector<double>& log_sizes) {
    const std::size_t n = log_sizes.size() - 1;
    const std::size_t first =
        static_cast<std::size_t>(std::find_if(log_sizes.begin(), log_sizes.end(),
                                              [](double size) { return std::isfinite(size); }) -
                                 log_sizes.begin());
    std::vector<std::size_t> hull; // upper convex hull
    for (std::size_t i = first; i <= n; ++i) {
        if (!std::isfinite(log_sizes[i]))
            continue;
        const auto slope = [&](std::size_t from, std::size_t to) {
            return (log_sizes[to] - log_sizes[from]) / static_cast<double>(to - from);
        };
        while (hull.size() >= 2 &&
               slope(hull[hull.size() - 2], hull.back()) <= slope(hull.back(), i))
            hull.pop_back();
        hull.push_back(i);
    }
    ComplexVector points(first, 0.0); // vanishing lowest coefficients: roots at zero
    for (std::size_t k = 0; k + 1 < hull.size(); ++k) {
        const std::size_t low = hull[k];
        const double members = static_cast<double>(hull[k + 1] - low);
        const double radius = std::exp((log_sizes[low] - log_sizes[hull[k + 1]]) / members);
        for (std::size_t j = 0; j < hull[k + 1] - low; ++j) {
            // No angle is its own mirror, so that symmetry does not trap the iteration.
            const double angle = 2.0 * std::numbers::pi *
                                     (static_cast<double>(j) / members +
                                      static_cast<double>(low) / static_cast<double>(n)) +
                                 0.7;
            points.push_back(std::polar(radius, angle));
        }
    }
    return points;
}

} // namespace cornerwright
