#pragma once

#include "core/numerics/root_form.h"

namespace cornerwright {

/// Takes roots that stand in numerator and denominator, no farther apart than `distance` (0: alike
/// bit by bit), out of both and returns them as they stood in the denominator.
ComplexVector take_common_roots(RootForm& form, double distance = 0.0);

/// Residue of `form` at a simple pole; 0 where it has none there.
Complex residue_at(RootForm form, Complex pole);

} // namespace cornerwright
