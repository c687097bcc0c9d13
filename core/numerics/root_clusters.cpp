#include "core/numerics/root_clusters.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <numeric>

namespace cornerwright {
namespace {

struct Cluster {
    std::vector<std::size_t> members; ///< the root itself first
    double radius = 0.0;
};

/// The smallest set of nearest neighbours that stands clear of the rest, when the product of the
/// distances to them is known to within the noise of F: with F = leading * prod(s - root),
/// radius^m = noise / (leading * prod over the others |s - other|).
Cluster cluster_around(const RootProblem& problem, const ComplexVector& roots, std::size_t i) {
    const std::size_t n = roots.size();
    std::vector<std::size_t> order(n);
    std::iota(order.begin(), order.end(), std::size_t{0});
    std::swap(order[0], order[i]);
    std::sort(order.begin() + 1, order.end(), [&](std::size_t left, std::size_t right) {
        return std::norm(roots[left] - roots[i]) < std::norm(roots[right] - roots[i]);
    });
    // log_product = ln(noise/leading) less the logarithms of all distances outside the set.
    double log_product = problem.log_noise(roots[i]) - problem.log_leading();
    for (std::size_t k = n; k-- > 1;) {
        const double distance = std::abs(roots[order[k]] - roots[i]);
        if (distance == 0.0)
            break;
        log_product -= std::log(distance);
    }
    for (std::size_t m = 1; m <= n; ++m) {
        const double radius = std::exp(log_product / static_cast<double>(m));
        const double beyond = m < n ? std::abs(roots[order[m]] - roots[i]) : 0.0;
        if (m == n || radius < 0.25 * beyond)
            return {{order.begin(), order.begin() + static_cast<std::ptrdiff_t>(m)}, radius};
        if (beyond > 0.0)
            log_product += std::log(beyond);
    }
    return {};
}

/// The common root of a cluster of m: s - m F/F' averaged over four points of a circle about the
/// mean. The circle is wide enough for the rounding of F at twice the precision, (rounding)^2 /
/// circle^(m - 1), and narrow enough for the terms that the average leaves, circle^m.
Complex polished_mean(const RootProblem& problem, Complex mean, double spread, std::size_t m) {
    const double multiplicity = static_cast<double>(m);
    const double circle =
        std::max(std::abs(mean) * std::exp2(-106.0 / (2.0 * multiplicity - 1.0)), 4.0 * spread);
    Complex correction = 0.0;
    for (const Complex corner : {Complex(1, 1), Complex(-1, 1), Complex(-1, -1), Complex(1, -1)}) {
        const Complex point = mean + corner * circle;
        const Complex newton = problem.precise({point, 0.0}).newton;
        correction += 0.25 * ((point - mean) - multiplicity * newton);
    }
    return mean + correction;
}

} // namespace

std::vector<double> root_uncertainty(const RootProblem& problem, const ComplexVector& roots) {
    std::vector<double> uncertainty(roots.size());
    for (std::size_t i = 0; i < roots.size(); ++i) {
        const double simple = problem.coarse(roots[i]).data;
        double nearest = std::numeric_limits<double>::infinity();
        for (std::size_t j = 0; j < roots.size(); ++j)
            if (j != i)
                nearest = std::min(nearest, std::abs(roots[i] - roots[j]));
        uncertainty[i] =
            simple < 0.01 * nearest ? simple : cluster_around(problem, roots, i).radius;
    }
    return uncertainty;
}

void merge_clusters(const RootProblem& problem, ComplexVector& roots) {
    std::vector<bool> merged(roots.size(), false);
    const ComplexVector before = roots;
    for (std::size_t i = 0; i < roots.size(); ++i) {
        if (merged[i])
            continue;
        const Cluster cluster = cluster_around(problem, before, i);
        if (cluster.members.size() < 2)
            continue;
        const std::size_t size = cluster.members.size();
        Complex mean = 0.0;
        for (const std::size_t member : cluster.members)
            mean += before[member] / static_cast<double>(size);
        double spread = 0.0;
        for (const std::size_t member : cluster.members)
            spread = std::max(spread, std::abs(before[member] - mean));
        const bool mirrors_itself = std::abs(mean.imag()) <= cluster.radius;
        if (mirrors_itself)
            mean = mean.real();
        const Complex polished = polished_mean(problem, mean, spread, size);
        if (std::abs(polished - mean) <= cluster.radius)
            mean = mirrors_itself ? Complex(polished.real()) : polished;
        for (const std::size_t member : cluster.members) {
            roots[member] = mean;
            merged[member] = true;
        }
    }
}

void pair_conjugates(ComplexVector& roots) {
    struct Match {
        double distance;
        std::size_t i, j;
    };
    std::vector<Match> matches;
    for (std::size_t i = 0; i < roots.size(); ++i)
        for (std::size_t j = i; j < roots.size(); ++j)
            matches.push_back({std::abs(roots[i] - std::conj(roots[j])), i, j});
    std::stable_sort(matches.begin(), matches.end(), [](const Match& left, const Match& right) {
        return left.distance < right.distance;
    });
    std::vector<bool> taken(roots.size(), false);
    for (const Match& match : matches) {
        if (taken[match.i] || taken[match.j])
            continue;
        taken[match.i] = taken[match.j] = true;
        const Complex mean = 0.5 * (roots[match.i] + std::conj(roots[match.j]));
        const bool upper = mean.imag() >= 0.0;
        roots[match.i] = upper ? mean : std::conj(mean);
        roots[match.j] = match.i == match.j ? Complex(mean.real()) : std::conj(roots[match.i]);
    }
}

} // namespace cornerwright
