#include "core/numerics/wide_polynomial.h"

#include <algorithm>
#include <limits>
#include <numbers>
#include <numeric>

namespace cornerwright {
namespace {

constexpr int coarse_rounds = 100;
constexpr int fine_rounds = 40;
constexpr double coarse_step = 1e-12; // relative step at which double precision has no more to give
constexpr double fine_step = 1e-24;   // the next step of the cubic iteration is below 32 digits
constexpr double crowd_reach = 0.02;  // of the size of the centre
constexpr double crowd_gap = 0.03;    // of the farthest distance: nearer gaps part no crowd
constexpr double fine_residual = 1e-30; // |p| over sum |a_k x^k|: the rounding of the evaluation

/// Points on the circles of the Newton polygon, off the real axis and off each other's directions.
ComplexVector start_points(const std::vector<double>& log_sizes) {
    const int degree = static_cast<int>(log_sizes.size()) - 1;
    ComplexVector points;
    int left = 0;
    while (left < degree) {
        int next = left + 1;
        double steepest = -std::numeric_limits<double>::infinity();
        for (int right = left + 1; right <= degree; ++right) {
            const double slope = (log_sizes[static_cast<std::size_t>(right)] -
                                  log_sizes[static_cast<std::size_t>(left)]) /
                                 (right - left);
            if (slope >= steepest) {
                steepest = slope;
                next = right;
            }
        }
        const double radius = std::exp(-steepest);
        for (int k = 0; k < next - left; ++k)
            points.push_back(
                std::polar(radius, 2.0 * std::numbers::pi * k / (next - left) + 0.7 + 0.37 * left));
        left = next;
    }
    return points;
}

/// p/p' at x from real coefficients; far out through the reversed polynomial, which stays in range.
Complex newton_step(const std::vector<double>& coefficients, Complex x) {
    const std::size_t degree = coefficients.size() - 1;
    Complex value = 0.0;
    Complex slope = 0.0;
    if (std::abs(x) <= 1.0) {
        for (std::size_t k = degree + 1; k-- > 0;) {
            slope = times(slope, x) + value;
            value = times(value, x) + coefficients[k];
        }
        return value / slope;
    }
    const Complex inverse_x = 1.0 / x;
    for (std::size_t k = 0; k <= degree; ++k) {
        slope = times(slope, inverse_x) + value;
        value = times(value, inverse_x) + coefficients[k];
    }
    // p(x) = x^n q(1/x), p'(x) = n x^(n-1) q - x^(n-2) q'
    return value /
           (static_cast<double>(degree) * value * inverse_x - slope * inverse_x * inverse_x);
}

struct WideStep {
    WideComplex newton;
    bool settled = false;
};

WideStep newton_step(const std::vector<DoubleDouble>& coefficients, const WideComplex& x) {
    WideComplex value;
    WideComplex slope;
    double sum_of_sizes = 0.0;
    const double size = x.size();
    for (std::size_t k = coefficients.size(); k-- > 0;) {
        slope = slope * x + value;
        value = value * x + WideComplex(coefficients[k]);
        sum_of_sizes = sum_of_sizes * size + std::abs(coefficients[k].high);
    }
    if (value.size() <= fine_residual * sum_of_sizes || slope.size() == 0.0)
        return {{}, true};
    return {value / slope, false};
}

void iterate_coarse(const std::vector<double>& coefficients, ComplexVector& roots) {
    std::vector<bool> done(roots.size(), false);
    for (int round = 0; round < coarse_rounds; ++round) {
        bool moving = false;
        for (std::size_t i = 0; i < roots.size(); ++i) {
            if (done[i])
                continue;
            const Complex newton = newton_step(coefficients, roots[i]);
            Complex repulsion = 0.0;
            for (std::size_t j = 0; j < roots.size(); ++j)
                if (j != i && roots[j] != roots[i])
                    repulsion += inverse(roots[i] - roots[j]);
            const Complex step = newton / (1.0 - newton * repulsion);
            if (!std::isfinite(step.real()) || !std::isfinite(step.imag())) {
                done[i] = true;
                continue;
            }
            roots[i] -= step;
            done[i] = std::abs(step) <= coarse_step * std::abs(roots[i]);
            moving = moving || !done[i];
        }
        if (!moving)
            return;
    }
}

void iterate_fine(const std::vector<DoubleDouble>& coefficients, std::vector<WideComplex>& roots) {
    std::vector<bool> done(roots.size(), false);
    for (int round = 0; round < fine_rounds; ++round) {
        bool moving = false;
        for (std::size_t i = 0; i < roots.size(); ++i) {
            if (done[i])
                continue;
            const WideStep step = newton_step(coefficients, roots[i]);
            if (step.settled) {
                done[i] = true;
                continue;
            }
            // The repulsion only steers the iteration: double precision serves.
            Complex repulsion = 0.0;
            for (std::size_t j = 0; j < roots.size(); ++j) {
                const Complex distance = (roots[i] - roots[j]).rounded();
                if (j != i && distance != 0.0)
                    repulsion += inverse(distance);
            }
            const WideComplex newton = step.newton;
            const WideComplex move = newton / (WideComplex(1.0) - newton * WideComplex(repulsion));
            roots[i] = roots[i] - move;
            done[i] = move.size() <= fine_step * roots[i].size();
            moving = moving || !done[i];
        }
        if (!moving)
            return;
    }
}

/// All roots, not yet in exact pairs. Lowest and highest coefficient are not zero.
ComplexVector unpaired_roots(const std::vector<DoubleDouble>& polynomial) {
    std::vector<DoubleDouble> coefficients;
    std::vector<double> coarse;
    std::vector<double> log_sizes;
    for (const DoubleDouble& coefficient : polynomial) {
        const DoubleDouble scaled = coefficient / polynomial.back();
        coefficients.push_back(scaled);
        coarse.push_back(scaled.rounded());
        log_sizes.push_back(std::log(std::abs(scaled.rounded())));
    }
    ComplexVector roots = start_points(log_sizes);
    iterate_coarse(coarse, roots);
    std::vector<WideComplex> wide(roots.begin(), roots.end());
    iterate_fine(coefficients, wide);
    std::transform(wide.begin(), wide.end(), roots.begin(),
                   [](const WideComplex& root) { return root.rounded(); });
    return roots;
}

/// The coefficients of p(x + centre).
std::vector<DoubleDouble> shifted(std::vector<DoubleDouble> coefficients, double centre) {
    for (std::size_t done = 0; done + 1 < coefficients.size(); ++done)
        for (std::size_t k = coefficients.size() - 1; k-- > done;)
            coefficients[k] = coefficients[k] + coefficients[k + 1] * DoubleDouble(centre);
    return coefficients;
}

/// Replaces `members`, the roots nearest to `centre`, by the smallest roots of p(x + centre).
void resolve_about(const std::vector<DoubleDouble>& coefficients, double centre,
                   const std::vector<std::size_t>& members, ComplexVector& roots) {
    const std::vector<DoubleDouble> local = shifted(coefficients, centre);
    if (local.front().high == 0.0)
        return;
    ComplexVector offsets = unpaired_roots(local);
    std::sort(offsets.begin(), offsets.end(),
              [](Complex a, Complex b) { return std::abs(a) < std::abs(b); });
    for (std::size_t k = 0; k < members.size(); ++k)
        roots[members[k]] = centre + offsets[k];
}

/// Indices of the roots about `centre` up to the widest gap in their distances, no farther than
/// `farthest`.
std::vector<std::size_t> nearest_to(const ComplexVector& roots, double centre, double farthest) {
    std::vector<std::size_t> order(roots.size());
    std::iota(order.begin(), order.end(), std::size_t{0});
    const auto distance = [&](std::size_t i) { return std::abs(roots[i] - centre); };
    std::sort(order.begin(), order.end(),
              [&](std::size_t a, std::size_t b) { return distance(a) < distance(b); });
    std::size_t count = 0;
    double widest = 1.0;
    for (std::size_t k = 0; k < order.size() && distance(order[k]) <= farthest; ++k) {
        const double next = k + 1 < order.size() ? distance(order[k + 1]) : 10.0 * farthest;
        if (next > crowd_gap * farthest && next >= widest * distance(order[k])) {
            widest = next / distance(order[k]);
            count = k + 1;
        }
    }
    order.resize(count);
    return order;
}

/// Roots crowded about a point of the real axis are each known badly, though their sum and product
/// are known well. Counted from the middle of the crowd they are the small roots of the shifted
/// polynomial, and as such come out consistent with each other.
void resolve_crowds(const std::vector<DoubleDouble>& coefficients, ComplexVector& roots) {
    constexpr std::size_t crowd = 3; // two share 32 digits and keep 16 each
    std::vector<bool> taken(roots.size(), false);
    for (std::size_t i = 0; i < roots.size(); ++i) {
        if (taken[i])
            continue;
        const double reach = crowd_reach * std::abs(roots[i]);
        std::vector<std::size_t> members;
        Complex sum = 0.0;
        for (std::size_t j = 0; j < roots.size(); ++j)
            if (!taken[j] && std::abs(roots[j] - roots[i]) <= reach) {
                members.push_back(j);
                sum += roots[j];
            }
        const Complex mean = sum / static_cast<double>(members.size());
        if (members.size() < crowd || std::abs(mean.imag()) > 0.5 * reach)
            continue;
        resolve_about(coefficients, mean.real(), members, roots);
        for (const std::size_t member : members)
            taken[member] = true;
    }
}

/// Makes conjugate pairs exact: a root whose mirror image is nearer to itself than to any other
/// root is real.
ComplexVector paired(ComplexVector roots) {
    ComplexVector result;
    while (!roots.empty()) {
        const Complex root = roots.back();
        roots.pop_back();
        auto partner = std::min_element(roots.begin(), roots.end(), [&](Complex a, Complex b) {
            return std::abs(a - std::conj(root)) < std::abs(b - std::conj(root));
        });
        const double to_itself = 2.0 * std::abs(root.imag());
        if (partner == roots.end() || to_itself <= std::abs(*partner - std::conj(root))) {
            result.emplace_back(root.real(), 0.0);
            continue;
        }
        const Complex mean = 0.5 * (root + std::conj(*partner));
        roots.erase(partner);
        result.emplace_back(mean.real(), std::abs(mean.imag()));
        result.emplace_back(mean.real(), -std::abs(mean.imag()));
    }
    std::sort(result.begin(), result.end(), [](Complex a, Complex b) {
        return a.real() != b.real() ? a.real() < b.real() : a.imag() < b.imag();
    });
    return result;
}

} // namespace

WidePolynomial times_root(const WidePolynomial& left, const WideComplex& root) {
    WidePolynomial product(left.size() + 1);
    for (std::size_t k = 0; k < left.size(); ++k) {
        product[k + 1] = product[k + 1] + left[k];
        product[k] = product[k] - root * left[k];
    }
    return product;
}

void add_scaled(WidePolynomial& target, const WideComplex& factor, const WidePolynomial& term) {
    if (target.size() < term.size())
        target.resize(term.size());
    for (std::size_t k = 0; k < term.size(); ++k)
        target[k] = target[k] + factor * term[k];
}

ComplexVector roots_of_wide_polynomial(const WidePolynomial& polynomial,
                                       std::optional<double> crowded_about) {
    std::size_t at_zero = 0;
    while (at_zero + 1 < polynomial.size() && polynomial[at_zero].re.high == 0.0)
        ++at_zero;
    std::vector<DoubleDouble> coefficients;
    for (std::size_t k = at_zero; k < polynomial.size(); ++k)
        coefficients.push_back(polynomial[k].re);
    ComplexVector roots = unpaired_roots(coefficients);
    resolve_crowds(coefficients, roots);
    if (crowded_about)
        resolve_about(coefficients, *crowded_about,
                      nearest_to(roots, *crowded_about, 0.6 * std::abs(*crowded_about)), roots);
    roots = paired(std::move(roots));
    roots.insert(roots.end(), at_zero, Complex(0.0));
    return roots;
}

} // namespace cornerwright
