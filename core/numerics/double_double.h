#pragma once

#include "core/numerics/compensated.h"

#include <cmath>

namespace cornerwright {

/// A real number kept to about 32 digits as a normalised sum of two doubles, with the arithmetic
/// that forming and factoring a polynomial needs.
/// Source: T. J. Dekker, as in compensated.h; Y. Hida, X. S. Li, D. H. Bailey, Library for
/// double-double and quad-double arithmetic (2007) (citations from memory).
struct DoubleDouble {
    double high = 0.0;
    double low = 0.0;

    constexpr DoubleDouble() = default;
    constexpr DoubleDouble(double value) : high(value) {}
    constexpr DoubleDouble(double high_part, double low_part) : high(high_part), low(low_part) {}

    double rounded() const { return high + low; }
    DoubleDouble operator-() const { return {-high, -low}; }
};

/// The sum again as a normalised pair; |high| is the larger.
inline DoubleDouble normalised(double high, double low) {
    const double sum = high + low;
    return {sum, low - (sum - high)};
}

inline DoubleDouble operator+(DoubleDouble left, DoubleDouble right) {
    const TwoTerms high = two_sum(left.high, right.high);
    const TwoTerms low = two_sum(left.low, right.low);
    const DoubleDouble first = normalised(high.value, high.error + low.value);
    return normalised(first.high, first.low + low.error);
}
inline DoubleDouble operator-(DoubleDouble left, DoubleDouble right) {
    return left + (-right);
}
inline DoubleDouble operator*(DoubleDouble left, DoubleDouble right) {
    const TwoTerms product = two_product(left.high, right.high);
    return normalised(product.value,
                      product.error + (left.high * right.low + left.low * right.high));
}
inline DoubleDouble operator/(DoubleDouble left, DoubleDouble right) {
    const double first = left.high / right.high;
    const DoubleDouble remainder = left - right * first;
    const double second = remainder.high / right.high;
    const DoubleDouble rest = remainder - right * second;
    return normalised(first, second) + DoubleDouble(rest.high / right.high);
}

/// A complex number with such parts.
struct WideComplex {
    DoubleDouble re;
    DoubleDouble im;

    constexpr WideComplex() = default;
    constexpr WideComplex(double value) : re(value) {}
    constexpr WideComplex(DoubleDouble real, DoubleDouble imag = {}) : re(real), im(imag) {}
    constexpr WideComplex(Complex value) : re(value.real()), im(value.imag()) {}

    Complex rounded() const { return {re.rounded(), im.rounded()}; }
    /// Size in plain double precision.
    double size() const { return std::abs(Complex(re.high, im.high)); }
    WideComplex operator-() const { return {-re, -im}; }
};

inline WideComplex operator+(const WideComplex& left, const WideComplex& right) {
    return {left.re + right.re, left.im + right.im};
}
inline WideComplex operator-(const WideComplex& left, const WideComplex& right) {
    return {left.re - right.re, left.im - right.im};
}
inline WideComplex operator*(const WideComplex& left, const WideComplex& right) {
    return {left.re * right.re - left.im * right.im, left.re * right.im + left.im * right.re};
}
inline WideComplex operator/(const WideComplex& left, const WideComplex& right) {
    const DoubleDouble norm = right.re * right.re + right.im * right.im;
    const WideComplex product = left * WideComplex(right.re, -right.im);
    return {product.re / norm, product.im / norm};
}

} // namespace cornerwright
