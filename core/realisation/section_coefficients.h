#pragma once

#include "core/realisation/difference_equation.h"
#include "core/realisation/second_order_pairs.h"

#include <array>

namespace cornerwright {

/// Coefficients of one section before rounding, highest power first, monic in the denominator.
/// A first-order section leaves the last entries 0 in both forms:
///   shift form: (b0 z + b1)/(z + a1), delta form: (beta0 d + beta1)/(d + alpha1).
struct SectionCoefficients {
    using Three = std::array<long double, 3>;
    Three beta{1.0L, 0.0L, 0.0L};
    Three alpha{1.0L, 0.0L, 0.0L};
    std::size_t order = 0;

    Three b() const { return shifted(beta); }
    Three a() const { return shifted(alpha); }

    bool has_integrator() const { return order > 0 && alpha[order] == 0.0L; }
    bool has_zero_at_rest() const { return order > 0 && beta[order] == 0.0L; }

  private:
    /// From powers of d to powers of z.
    Three shifted(const Three& delta) const;
};

/// gain * prod(d - zero) / prod(d - pole).
SectionCoefficients section_coefficients(const SectionRoots& roots, double gain);

/// Fills what the running coefficients leave open: beta and alpha of a direct form, b and a of a
/// delta section. Sums such as 1 + a1 + a2 are formed without loss.
void complete_other_form(DiscreteSection& section, Structure structure);

/// 0, 1 or 2: the order that the rounded coefficients leave in this structure.
std::size_t order_of(const DiscreteSection& section, Structure structure);

/// True where the section, as rounded, holds a pole at z = 1 exactly.
bool has_integrator(const DiscreteSection& section, Structure structure);

} // namespace cornerwright
