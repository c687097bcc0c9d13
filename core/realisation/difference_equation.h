#pragma once

#include "core/compensator/chain.h"
#include "core/realisation/realisation.h"

#include <array>
#include <cstdint>
#include <string>
#include <vector>

namespace cornerwright {

/// One second-order section as it runs, after rounding to the number format.
/// Direct forms: y = b0 x + b1 x' + b2 x'' - a1 y' - a2 y''; a[0] is 1.
/// Delta: the same function written with d = z - 1,
///   (beta0 d^2 + beta1 d + beta2) / (d^2 + alpha1 d + alpha2), whose rounded coefficients run.
/// The form that does not run holds the equal coefficients as far as a double can tell them. A
/// first-order section is (b0 z + b1)/(z + a1) = (beta0 d + beta1)/(d + alpha1), the last entries
/// 0.
struct DiscreteSection {
    std::array<double, 3> b{1.0, 0.0, 0.0};
    std::array<double, 3> a{1.0, 0.0, 0.0};
    std::array<double, 3> beta{1.0, 0.0, 0.0};
    std::array<double, 3> alpha{1.0, 0.0, 0.0}; ///< alpha[0] = 1
    /// Fixed only: b = b_integers / 2^(fraction_bits - shift), a likewise. In the delta structure
    /// they are beta and alpha, entry i over 2^(fraction_bits - shift + i delta_shift).
    std::array<std::int64_t, 3> b_integers{};
    std::array<std::int64_t, 3> a_integers{};
    int shift = 0;
    int delta_shift = 0;

    bool operator==(const DiscreteSection&) const = default;
};

/// The compensator as it will run: sections in their order of execution, the input of one being the
/// output of the one before.
struct DifferenceEquation {
    double sample_period_s = 0.0;
    Realisation realisation;
    std::vector<DiscreteSection> sections;
    std::vector<std::string> notes; ///< what a reader should know: how the gain was spread, ...

    bool operator==(const DifferenceEquation&) const = default;
};

/// Makes the difference equation of a chain. Throws InputError (no place; the section named) where
/// it cannot be: compensator improper, a corner at or above pi/Ts, an invariant method on a section
/// with more zeros than poles, a number format that cannot hold a coefficient, no sample period.
DifferenceEquation discretise(const Chain& chain, const Sampling& sampling,
                              const Realisation& realisation);

/// The exact function of the rounded sections in d = z - 1 (all sections multiplied, roots side by
/// side). Working in z - 1 keeps the digits of corners far below the sample rate.
RootForm roots_in_z_minus_1(const DifferenceEquation& equation);

} // namespace cornerwright
