#pragma once

#include "core/compensator/chain.h"
#include "core/realisation/realisation.h"

namespace cornerwright {

/// Throws InputError, one sentence that names the section, where a difference equation cannot be
/// made: no sample period, a number out of its bounds, a compensator with more zeros than poles, a
/// corner or the matched frequency at or above pi/Ts, an invariant method on a section with more
/// zeros than poles, a word or limits that make no sense.
void check_realisable(const Chain& chain, const Sampling& sampling, const Realisation& realisation);

} // namespace cornerwright
