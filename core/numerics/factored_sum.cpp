#include "core/numerics/factored_sum.h"

#include "core/numerics/scaled_product.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr double half_ulp = 0x1p-53;

Complex difference(Complex s, Complex root) {
    return s - root;
}

PreciseComplex difference(const PreciseComplex& s, Complex root) {
    return s + PreciseComplex{-root, 0.0};
}

template <typename Number>
Number one() {
    if constexpr (std::is_same_v<Number, Complex>)
        return 1.0;
    else
        return {1.0, 0.0};
}

/// factor^power with its derivative, by repeated squaring.
template <typename Number>
ScaledProduct<Number> power_of(const Number& factor, int power) {
    ScaledProduct<Number> result{one<Number>(), Number{}};
    ScaledProduct<Number> square{factor, one<Number>()};
    for (int left = power; left > 0; left /= 2) {
        if (left % 2 == 1)
            result.multiply(square);
        if (left > 1)
            square.multiply(ScaledProduct<Number>(square));
    }
    return result;
}

template <typename Number>
ScaledProduct<Number> product_at(const FactorList& list, const Number& s) {
    ScaledProduct<Number> product{one<Number>(), Number{}};
    int pending = 0;
    for (const Complex& root : list.roots) {
        product.multiply_unchecked(difference(s, root));
        if (++pending == ScaledProduct<Number>::unchecked) {
            product.keep_in_range();
            pending = 0;
        }
    }
    product.keep_in_range();
    if (list.repeated > 0)
        product.multiply(power_of<Number>(difference(s, list.repeated_root), list.repeated));
    return product;
}

/// Brings both to the larger exponent of the two; what falls below the range is nothing beside it.
template <typename Number>
void align(ScaledProduct<Number>& left, ScaledProduct<Number>& right) {
    if (left.exponent > right.exponent)
        right.scale(right.exponent - left.exponent);
    else
        left.scale(left.exponent - right.exponent);
}

using LongComplex = std::complex<long double>;

/// Coefficients of prod(x + centre - root), lowest power first. Long double for its range.
std::vector<LongComplex> expand(const FactorList& list, double centre) {
    std::vector<LongComplex> coefficients{1.0L};
    const auto multiply = [&](Complex root) {
        const long double real = static_cast<long double>(root.real()) - centre;
        const long double imag = root.imag();
        coefficients.insert(coefficients.begin(), 0.0L);
        for (std::size_t k = 0; k + 1 < coefficients.size(); ++k) {
            const LongComplex above = coefficients[k + 1];
            coefficients[k] -= LongComplex(above.real() * real - above.imag() * imag,
                                           above.real() * imag + above.imag() * real);
        }
    };
    for (const Complex& root : list.roots)
        multiply(root);
    if (list.repeated_root == centre) {
        coefficients.insert(coefficients.begin(), static_cast<std::size_t>(list.repeated), 0.0L);
        return coefficients;
    }
    for (int k = 0; k < list.repeated; ++k)
        multiply(list.repeated_root);
    return coefficients;
}

bool take_one(FactorList& list, Complex root) {
    const auto found = std::find(list.roots.begin(), list.roots.end(), root);
    if (found != list.roots.end()) {
        list.roots.erase(found);
        return true;
    }
    if (list.repeated > 0 && root == Complex(list.repeated_root)) {
        --list.repeated;
        return true;
    }
    return false;
}

} // namespace

FactoredSum::FactoredSum(FactorList left, FactorList right, double gain)
    : left_(std::move(left)), right_(std::move(right)), gain_(gain) {
    take_out_common_factors();
    find_degree();
}

void FactoredSum::take_out_common_factors() {
    for (std::size_t k = 0; k < right_.roots.size();) {
        const Complex root = right_.roots[k];
        if (take_one(left_, root)) {
            common_roots_.push_back(root);
            right_.roots.erase(right_.roots.begin() + static_cast<std::ptrdiff_t>(k));
        } else {
            ++k;
        }
    }
}

void FactoredSum::find_degree() {
    // Many equal factors put their roots on a circle about the repeated one.
    start_centre_ = left_.repeated > 2 && right_.repeated == 0 ? left_.repeated_root : 0.0;
    const std::vector<LongComplex> left = expand(left_, start_centre_);
    const std::vector<LongComplex> right = expand(right_, start_centre_);
    log_sizes_.clear();
    std::vector<bool> cancelled;
    for (std::size_t k = 0; k < std::max(left.size(), right.size()); ++k) {
        const long double one_side = k < left.size() ? left[k].real() : 0.0L;
        const long double other_side = k < right.size() ? gain_ * right[k].real() : 0.0L;
        const long double size = std::abs(one_side + other_side);
        // A leading term that cancels to within the rounding of the expansion is not there.
        cancelled.push_back(size <= 0x1p-56L * (std::abs(one_side) + std::abs(other_side)));
        log_sizes_.push_back(static_cast<double>(std::log(size)));
    }
    while (!cancelled.empty() && cancelled.back()) {
        cancelled.pop_back();
        log_sizes_.pop_back();
    }
    count_ = log_sizes_.empty() ? 0 : log_sizes_.size() - 1;
    log_leading_ = log_sizes_.empty() ? 0.0 : log_sizes_.back();
}

ComplexVector FactoredSum::start() const {
    ComplexVector points = newton_polygon_points(log_sizes_);
    for (Complex& point : points)
        point += start_centre_;
    return points;
}

FactoredSum::Sides FactoredSum::sides(Complex s) const {
    ScaledProduct<Complex> left = product_at<Complex>(left_, s);
    ScaledProduct<Complex> right = product_at<Complex>(right_, s);
    if (left.exponent != right.exponent)
        align(left, right);
    return {left.value, left.derivative, right.value, right.derivative, left.exponent};
}

CoarseStep FactoredSum::coarse(Complex s) const {
    const Sides at = sides(s);
    const Complex right = gain_ * at.right;
    const Complex derivative = at.left_derivative + gain_ * at.right_derivative;
    const double size = std::abs(at.left) + std::abs(right);
    const double unit = half_ulp * size / std::abs(derivative);
    // Each complex factor costs a subtraction and a product, together less than 4 half units.
    const double factors = static_cast<double>(left_.degree() + right_.degree() + 1);
    return {times(at.left + right, inverse(derivative)), 4.0 * factors * unit, unit};
}

PreciseStep FactoredSum::precise(const PreciseComplex& s) const {
    ScaledProduct<PreciseComplex> left = product_at<PreciseComplex>(left_, s);
    ScaledProduct<PreciseComplex> right = product_at<PreciseComplex>(right_, s);
    if (left.exponent != right.exponent)
        align(left, right);
    const PreciseComplex gain{gain_, 0.0};
    const PreciseComplex right_value = gain * right.value;
    const Complex value = (left.value + right_value).rounded();
    const Complex derivative = (left.derivative + gain * right.derivative).rounded();
    const double size = std::abs(left.value.value) + std::abs(right_value.value);
    const double terms = 4.0 * static_cast<double>(left_.degree() + right_.degree() + 1) * half_ulp;
    const Complex newton = value / derivative;
    return {newton,
            terms * terms * size / std::abs(derivative) + 16.0 * half_ulp * std::abs(newton)};
}

double FactoredSum::log_noise(Complex s) const {
    const Sides at = sides(s);
    return std::log(half_ulp * (std::abs(at.left) + std::abs(gain_ * at.right))) +
           std::numbers::ln2 * at.exponent;
}

SolvedRoots roots_of_sum(const FactoredSum& sum, const ComplexVector& warm_start) {
    SolvedRoots solved = solve_roots(sum, warm_start);
    for (const Complex& root : sum.common_roots()) {
        solved.roots.push_back(root);
        solved.uncertainty.push_back(0.0);
    }
    return solved;
}

} // namespace cornerwright
