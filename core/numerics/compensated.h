#pragma once

#include "core/numerics/complex.h"

namespace cornerwright {

/// Arithmetic at about twice double precision by error-free transformations.
/// Source: T. J. Dekker, A floating-point technique for extending the available precision, Numer.
/// Math. 18 (1971); T. Ogita, S. M. Rump, S. Oishi, Accurate sum and dot product, SIAM J. Sci.
/// Comput. 26 (2005) (citations from memory).

/// A real number as the unevaluated sum of two doubles.
struct TwoTerms {
    double value = 0.0;
    double error = 0.0;
};

/// left + right exactly.
inline TwoTerms two_sum(double left, double right) {
    const double sum = left + right;
    const double shift = sum - left;
    return {sum, (left - (sum - shift)) + (right - shift)};
}

/// left * right exactly, for factors below 2^996.
inline TwoTerms two_product(double left, double right) {
    constexpr double splitter = 134217729.0; // 2^27 + 1 halves the 53 bits
    const double left_shifted = splitter * left;
    const double left_high = left_shifted - (left_shifted - left);
    const double left_low = left - left_high;
    const double right_shifted = splitter * right;
    const double right_high = right_shifted - (right_shifted - right);
    const double right_low = right - right_high;
    const double product = left * right;
    return {product,
            ((left_high * right_high - product) + left_high * right_low + left_low * right_high) +
                left_low * right_low};
}

/// Product and reciprocal without the special cases of infinite operands, which never arise here;
/// several times quicker than the library's.
inline Complex times(Complex left, Complex right) {
    return {left.real() * right.real() - left.imag() * right.imag(),
            left.real() * right.imag() + left.imag() * right.real()};
}
inline Complex inverse(Complex value) {
    const double scale = 1.0 / (value.real() * value.real() + value.imag() * value.imag());
    return {value.real() * scale, -value.imag() * scale};
}

/// A complex number as the unevaluated sum of two.
struct PreciseComplex {
    Complex value;
    Complex error;

    Complex rounded() const { return value + error; }
};

inline PreciseComplex operator+(const PreciseComplex& left, const PreciseComplex& right) {
    const TwoTerms real = two_sum(left.value.real(), right.value.real());
    const TwoTerms imag = two_sum(left.value.imag(), right.value.imag());
    return {{real.value, imag.value}, Complex(real.error, imag.error) + (left.error + right.error)};
}

inline PreciseComplex operator*(const PreciseComplex& left, const PreciseComplex& right) {
    const TwoTerms rr = two_product(left.value.real(), right.value.real());
    const TwoTerms ii = two_product(-left.value.imag(), right.value.imag());
    const TwoTerms ri = two_product(left.value.real(), right.value.imag());
    const TwoTerms ir = two_product(left.value.imag(), right.value.real());
    const TwoTerms real = two_sum(rr.value, ii.value);
    const TwoTerms imag = two_sum(ri.value, ir.value);
    const Complex cross = times(left.value, right.error) + times(left.error, right.value);
    return {{real.value, imag.value},
            Complex(real.error + (rr.error + ii.error), imag.error + (ri.error + ir.error)) +
                cross};
}

} // namespace cornerwright
