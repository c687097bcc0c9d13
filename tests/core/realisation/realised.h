#pragma once

#include "core/realisation/difference_equation.h"

namespace cornerwright::test {

/// A realisation in double precision (or `format`) with everything else as it stands by default.
inline Realisation realisation_of(Method method,
                                  Structure structure = Structure::direct_form_2_transposed,
                                  NumberFormat format = {}) {
    Realisation realisation;
    realisation.method = method;
    realisation.structure = structure;
    realisation.number_format = format;
    return realisation;
}

inline DifferenceEquation realised(const Chain& chain, double period_s,
                                   const Realisation& realisation) {
    return discretise(chain, Sampling{period_s, 0.0, true}, realisation);
}

constexpr NumberFormat fixed_format(int word_bits, int fraction_bits) {
    return {NumberFormat::Type::fixed, word_bits, fraction_bits};
}

/// The rounded equation at z.
inline Complex response(const DifferenceEquation& equation, Complex z) {
    return evaluate(roots_in_z_minus_1(equation), z - 1.0);
}

} // namespace cornerwright::test
