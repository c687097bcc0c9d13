#pragma once

#include "core/numerics/compensated.h"

#include <algorithm>
#include <cmath>
#include <type_traits>

namespace cornerwright {

/// A product and its derivative, divided by 2^exponent so that hundreds of factors stay in range.
/// `Number` is Complex or PreciseComplex.
template <typename Number>
struct ScaledProduct {
    Number value;
    Number derivative;
    int exponent = 0;

    /// Times (s - root) where that is `factor`. After every `unchecked` of these at most,
    /// keep_in_range is due.
    static constexpr int unchecked = 4; // of sizes between 1e-45 and 1e45
    void multiply_unchecked(const Number& factor) {
        if constexpr (std::is_same_v<Number, Complex>) {
            derivative = times(derivative, factor) + value;
            value = times(value, factor);
        } else {
            derivative = derivative * factor + value;
            value = value * factor;
        }
    }

    /// Times another product.
    void multiply(const ScaledProduct& other) {
        if constexpr (std::is_same_v<Number, Complex>) {
            derivative = times(derivative, other.value) + times(value, other.derivative);
            value = times(value, other.value);
        } else {
            derivative = derivative * other.value + value * other.derivative;
            value = value * other.value;
        }
        exponent += other.exponent;
        keep_in_range();
    }

    void keep_in_range() {
        constexpr double large = 0x1p250; // two such numbers and their squares still fit
        const double largest = std::max(size(value), size(derivative));
        if (largest > large)
            scale(-500);
        else if (largest < 1.0 / large && largest > 0.0)
            scale(500);
    }

    void scale(int shift) {
        scale_number(value, shift);
        scale_number(derivative, shift);
        exponent -= shift;
    }

  private:
    static void scale_number(Complex& number, int shift) {
        number = {std::ldexp(number.real(), shift), std::ldexp(number.imag(), shift)};
    }
    static void scale_number(PreciseComplex& number, int shift) {
        scale_number(number.value, shift);
        scale_number(number.error, shift);
    }
    static double size(const Complex& number) {
        return std::max(std::abs(number.real()), std::abs(number.imag()));
    }
    static double size(const PreciseComplex& number) { return size(number.value); }
};

} // namespace cornerwright
