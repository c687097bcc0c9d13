#include "core/plant/factored.h"

#include "core/numerics/polynomial_roots.h"

#include <algorithm>
#include <cmath>
#include <limits>

namespace cornerwright {
namespace {

using Real = long double;
using Root = std::complex<long double>;
using Roots = std::vector<Root>;
using Coefficients = std::vector<long double>; // lowest power first

constexpr Real epsilon = std::numeric_limits<Real>::epsilon();

/// A sum or discriminant this many roundings from zero cannot be told from zero: each of its terms
/// was itself rounded once when it was read and once when it was multiplied.
constexpr Real roundings = 8.0L;

/// gain * prod(s - root) written out; a conjugate pair enters as one real quadratic.
Coefficients expand(Real gain, const Roots& roots) {
    Coefficients product{gain};
    const auto multiply = [&product](std::initializer_list<Real> factor) {
        Coefficients next(product.size() + factor.size() - 1, 0.0L);
        for (std::size_t i = 0; i < product.size(); ++i)
            for (std::size_t j = 0; j < factor.size(); ++j)
                next[i + j] += product[i] * factor.begin()[j];
        product = std::move(next);
    };
    for (const Root& root : roots) {
        if (root.imag() == 0.0L)
            multiply({-root.real(), 1.0L});
        else if (root.imag() > 0.0L)
            multiply({std::norm(root), -2.0L * root.real(), 1.0L});
    }
    return product;
}

Roots quadratic_roots(Real a, Real b, Real c) {
    Real discriminant = std::fma(b, b, -4.0L * a * c);
    if (std::abs(discriminant) <= roundings * epsilon * b * b)
        discriminant = 0.0L;
    if (discriminant < 0.0L) {
        const Root root(-b / (2.0L * a), std::sqrt(-discriminant) / std::abs(2.0L * a));
        return {root, std::conj(root)};
    }
    // The root of larger size first: the other by the product of both loses no digits.
    const Real large = -(b + std::copysign(std::sqrt(discriminant), b)) / 2.0L;
    return {Root(large / a), Root(c / large)};
}

/// Roots of an order-3-or-more polynomial without roots at 0. The variable is scaled so that the
/// product of the roots has size 1, which keeps the coefficients inside double's range.
Roots high_order_roots(const Coefficients& p) {
    const auto degree = static_cast<Real>(p.size() - 1);
    const Real scale =
        std::exp((std::log(std::abs(p.front())) - std::log(std::abs(p.back()))) / degree);
    Coefficients scaled(p.size());
    Real power = 1.0L / (p.back() * std::pow(scale, degree));
    for (std::size_t i = 0; i < p.size(); ++i, power *= scale)
        scaled[i] = p[i] * power;
    std::vector<double> highest_first(p.size());
    std::transform(scaled.rbegin(), scaled.rend(), highest_first.begin(),
                   [](Real c) { return static_cast<double>(c); });
    Roots roots;
    for (const Complex& root : polynomial_roots(highest_first))
        roots.push_back(scale * Root(root.real(), root.imag()));
    return roots;
}

/// The roots of `from` that are left when each of `taken` has removed one that equals it exactly.
Roots without(Roots from, const Roots& taken) {
    for (const Root& root : taken)
        if (const auto found = std::find(from.begin(), from.end(), root); found != from.end())
            from.erase(found);
    return from;
}

Roots shared(const Roots& left, const Roots& right) {
    return without(left, without(left, right));
}

Roots joined(Roots left, const Roots& right) {
    left.insert(left.end(), right.begin(), right.end());
    return left;
}

ComplexVector rounded(const Roots& roots) {
    ComplexVector result;
    result.reserve(roots.size());
    for (const Root& root : roots)
        result.emplace_back(static_cast<double>(root.real()), static_cast<double>(root.imag()));
    return result;
}

} // namespace

Factored from_coefficients(std::span<const long double> lowest_first) {
    auto end = lowest_first.size();
    while (end > 0 && lowest_first[end - 1] == 0.0L)
        --end;
    if (end == 0)
        return {};
    std::size_t begin = 0;
    while (lowest_first[begin] == 0.0L)
        ++begin;
    const Coefficients p(lowest_first.begin() + static_cast<std::ptrdiff_t>(begin),
                         lowest_first.begin() + static_cast<std::ptrdiff_t>(end));
    Factored result{p.back(), Roots(begin, Root(0.0L)), {}, 0.0L};
    switch (p.size()) {
    case 1:
        break;
    case 2:
        result.zeros.emplace_back(-p[0] / p[1]);
        break;
    case 3:
        result.zeros = joined(std::move(result.zeros), quadratic_roots(p[2], p[1], p[0]));
        break;
    default:
        result.zeros = joined(std::move(result.zeros), high_order_roots(p));
    }
    return result;
}

Factored operator*(const Factored& left, const Factored& right) {
    if (left.is_zero() || right.is_zero())
        return {};
    return {left.gain * right.gain, joined(left.zeros, right.zeros),
            joined(left.poles, right.poles), left.dead_time + right.dead_time};
}

Factored operator/(const Factored& numerator, const Factored& denominator) {
    if (numerator.is_zero())
        return {};
    return {numerator.gain / denominator.gain, joined(numerator.zeros, denominator.poles),
            joined(numerator.poles, denominator.zeros), numerator.dead_time};
}

Factored sum(std::span<const Factored> terms) {
    std::vector<Factored> present;
    std::copy_if(terms.begin(), terms.end(), std::back_inserter(present),
                 [](const Factored& term) { return !term.is_zero(); });
    if (present.empty())
        return {};
    if (present.size() == 1)
        return present.front();

    Roots common_zeros = present.front().zeros;
    Roots denominator;
    for (const Factored& term : present) {
        common_zeros = shared(common_zeros, term.zeros);
        denominator = joined(std::move(denominator), without(term.poles, denominator));
    }
    Coefficients total;
    Coefficients size;
    for (const Factored& term : present) {
        const Coefficients numerator = expand(
            term.gain, joined(without(term.zeros, common_zeros), without(denominator, term.poles)));
        total.resize(std::max(total.size(), numerator.size()), 0.0L);
        size.resize(total.size(), 0.0L);
        for (std::size_t i = 0; i < numerator.size(); ++i) {
            total[i] += numerator[i];
            size[i] += std::abs(numerator[i]);
        }
    }
    for (std::size_t i = 0; i < total.size(); ++i)
        if (std::abs(total[i]) <= roundings * epsilon * size[i])
            total[i] = 0.0L;
    Factored result = from_coefficients(total);
    if (result.is_zero())
        return {};
    result.zeros = joined(std::move(common_zeros), result.zeros);
    result.poles = std::move(denominator);
    result.dead_time = present.front().dead_time;
    return result;
}

PlantModel to_model(const Factored& factored) {
    return {{rounded(factored.zeros), rounded(factored.poles), static_cast<double>(factored.gain)},
            static_cast<double>(factored.dead_time)};
}

} // namespace cornerwright
