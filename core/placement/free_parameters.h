#pragma once

#include "core/compensator/chain.h"
#include "core/numerics/complex.h"

#include <cstddef>
#include <vector>

namespace cornerwright {

/// One number of the chain that placement may move: of an enabled, unlocked section. It moves in
/// its natural logarithm, so that a corner an octave up counts like one an octave down; a gain
/// keeps its sign.
struct FreeParameter {
    std::size_t section = 0;
    SectionParameter parameter;
};

/// In the order of the chain. A damping of exactly zero is not free (it has no logarithm).
std::vector<FreeParameter> free_parameters(const Chain& chain);

/// ln|value| of each.
std::vector<double> logarithms_of(const Chain& chain, const std::vector<FreeParameter>& parameters);

/// The chain with each parameter at exp(its logarithm), signs kept.
Chain with_logarithms(Chain chain, const std::vector<FreeParameter>& parameters,
                      const std::vector<double>& logarithms);

/// d ln C(s) / d ln(value) of each parameter, exactly, from the section's own formula.
ComplexVector log_derivatives(const Chain& chain, const std::vector<FreeParameter>& parameters,
                              Complex s);

} // namespace cornerwright
