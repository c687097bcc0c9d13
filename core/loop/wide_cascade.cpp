#include "core/loop/wide_cascade.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

WideComplex scaled(Complex root, double factor) {
    const TwoTerms real = two_product(root.real(), factor);
    const TwoTerms imag = two_product(root.imag(), factor);
    return {DoubleDouble(real.value, real.error), DoubleDouble(imag.value, imag.error)};
}

WideTriangle product(const WideTriangle& left, const WideTriangle& right) {
    WideTriangle result(left.size());
    for (std::size_t i = 0; i < left.size(); ++i)
        for (std::size_t j = 0; j <= i; ++j)
            for (std::size_t k = j; k <= i; ++k)
                result(i, j) = result(i, j) + left(i, k) * right(k, j);
    return result;
}

void add(WideTriangle& target, const WideTriangle& term, double factor) {
    for (std::size_t i = 0; i < target.size(); ++i)
        for (std::size_t j = 0; j <= i; ++j)
            target(i, j) = target(i, j) + term(i, j) * WideComplex(factor);
}

double largest_row_sum(const WideTriangle& matrix) {
    double largest = 0.0;
    for (std::size_t i = 0; i < matrix.size(); ++i) {
        double sum = 0.0;
        for (std::size_t j = 0; j <= i; ++j)
            sum += matrix(i, j).size();
        largest = std::max(largest, sum);
    }
    return largest;
}

/// x + x^2/2 + ... + x^20/20!, the first term left out being below 1e-32 for a norm up to 1/4.
/// Powers grouped in fours as Paterson and Stockmeyer do (Higham, sec. 4.2).
WideTriangle series(const WideTriangle& x) {
    constexpr int block = 4;
    constexpr int terms = 20;
    std::vector<WideTriangle> powers{x};
    for (int k = 1; k < block; ++k)
        powers.push_back(product(powers.back(), x));
    std::vector<WideComplex> reciprocal_factorials(terms + 1, WideComplex(1.0));
    for (int k = 1; k <= terms; ++k)
        reciprocal_factorials[static_cast<std::size_t>(k)] =
            reciprocal_factorials[static_cast<std::size_t>(k - 1)] / WideComplex(k);

    const std::size_t size = x.size();
    WideTriangle sum(size);
    for (int first = terms - block; first >= 0; first -= block) {
        // sum <- x^block * sum + coefficients of x^(first+1) ... x^(first+block)
        WideTriangle group(size);
        if (first + block < terms)
            group = product(powers.back(), sum);
        for (int k = 1; k <= block; ++k) {
            const WideComplex& factor = reciprocal_factorials[static_cast<std::size_t>(first + k)];
            const WideTriangle& power = powers[static_cast<std::size_t>(k - 1)];
            for (std::size_t i = 0; i < size; ++i)
                for (std::size_t j = 0; j <= i; ++j)
                    group(i, j) = group(i, j) + factor * power(i, j);
        }
        sum = std::move(group);
    }
    return sum;
}

/// Takes the zero whose size (and side) is nearest to the pole's out of `zeros`.
Complex take_nearest(ComplexVector& zeros, Complex pole) {
    auto nearest = std::min_element(zeros.begin(), zeros.end(), [&](Complex a, Complex b) {
        return std::abs(a - pole) < std::abs(b - pole);
    });
    const Complex zero = *nearest;
    zeros.erase(nearest);
    return zero;
}

} // namespace

WideCascade wide_cascade(const RootForm& form, double sample_period_s) {
    const std::size_t order = form.poles.size();
    WideCascade cascade{WideTriangle(order + 1), std::vector<WideComplex>(order + 1), form.gain};
    ComplexVector zeros = form.zeros;
    std::vector<WideComplex>& row = cascade.output; // what the blocks so far give out
    row[0] = WideComplex(1.0);
    for (std::size_t i = 1; i <= order; ++i) {
        const Complex pole = form.poles[i - 1];
        const WideComplex wide_pole = scaled(pole, sample_period_s);
        // (s - z)/(s - p) = 1 + (p - z)/(s - p), or scale/(s - p): both with unit-sized states.
        const bool has_zero = !zeros.empty();
        WideComplex coupling;
        if (has_zero)
            coupling = wide_pole - scaled(take_nearest(zeros, pole), sample_period_s);
        const double size = has_zero ? coupling.size() : wide_pole.size();
        const double scale = size > 0.0 ? size : 1.0;
        for (std::size_t k = 0; k < i; ++k)
            cascade.matrix(i, k) = row[k] * WideComplex(scale);
        cascade.matrix(i, i) = wide_pole;
        if (has_zero) {
            row[i] = coupling / WideComplex(scale);
        } else {
            std::fill(row.begin(), row.end(), WideComplex());
            row[i] = WideComplex(1.0);
            cascade.gain *= sample_period_s / scale;
        }
    }
    return cascade;
}

WideTriangle exponential_minus_identity(const WideTriangle& matrix, double duration) {
    const double norm = largest_row_sum(matrix) * duration;
    constexpr double small = 0.25; // the norm for which `series` holds 32 digits
    const int halvings = norm > small ? static_cast<int>(std::ceil(std::log2(norm / small))) : 0;
    WideTriangle scaled_matrix(matrix.size());
    const double factor = std::ldexp(1.0, -halvings);
    for (std::size_t i = 0; i < matrix.size(); ++i)
        for (std::size_t j = 0; j <= i; ++j)
            scaled_matrix(i, j) = matrix(i, j) * WideComplex(duration) * WideComplex(factor);
    WideTriangle result = series(scaled_matrix);
    for (int k = 0; k < halvings; ++k)
        result = compose(result, result);
    return result;
}

WideTriangle compose(const WideTriangle& later, const WideTriangle& earlier) {
    WideTriangle result = product(later, earlier);
    add(result, later, 1.0);
    add(result, earlier, 1.0);
    return result;
}

} // namespace cornerwright
