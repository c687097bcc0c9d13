#pragma once

#include "core/numerics/root_form.h"

namespace cornerwright {

/// Takes roots that stand bit by bit alike in numerator and denominator out of both and returns
/// them.
ComplexVector take_common_roots(RootForm& form);

/// Residue of `form` at a simple pole; 0 where it has none there.
Complex residue_at(RootForm form, Complex pole);

} // namespace cornerwright
