#pragma once

#include "core/numerics/double_double.h"

#include <optional>
#include <vector>

namespace cornerwright {

/// A polynomial with coefficients to about 32 digits, lowest power first.
using WidePolynomial = std::vector<WideComplex>;

/// left * (x - root).
WidePolynomial times_root(const WidePolynomial& left, const WideComplex& root);

/// target += factor * term; `target` grows as needed.
void add_scaled(WidePolynomial& target, const WideComplex& factor, const WidePolynomial& term);

/// Roots of a polynomial with real coefficients (imaginary parts are not looked at), rounded to
/// double, conjugate pairs exact; zero trailing coefficients give roots at exactly 0. The highest
/// coefficient is not zero. Simultaneous iteration in double precision, then at full width until
/// the residual is down to rounding, so that a root is as good as the 32 digits of the coefficients
/// allow.
/// Source: O. Aberth, Iteration methods for finding all zeros of a polynomial simultaneously, Math.
/// Comp. 27 (1973); start points: D. A. Bini, Numerical computation of polynomial zeros by means of
/// Aberth's method, Numer. Algorithms 13 (1996) (citations from memory).
/// `crowded_about` names a point of the real axis about which many roots are known to gather (z = 0
/// of a sampled plant, -1 in z - 1): their offsets from it then come out with all their digits.
ComplexVector roots_of_wide_polynomial(const WidePolynomial& polynomial,
                                       std::optional<double> crowded_about = {});

} // namespace cornerwright
