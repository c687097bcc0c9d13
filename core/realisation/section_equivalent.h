#pragma once

#include "core/compensator/section.h"
#include "core/realisation/realisation.h"

namespace cornerwright {

/// What a method makes of one section at a sample period: roots and gain in d = z - 1, where a
/// corner far below the sample rate keeps its digits. A zero at infinity that a method puts at
/// z = -1 stands as d = -2, exactly; a section with more zeros than poles gets poles there.
/// The corner of the section must lie below pi/Ts and, for the invariant methods, the section must
/// be proper (the caller checks both).
///
/// Sources: A. Tustin, J. IEE 94 IIA (1947); K. J. Astrom, B. Wittenmark, Computer-Controlled
/// Systems, 3rd ed., ch. 8 (prewarping); G. F. Franklin, J. D. Powell, M. L. Workman, Digital
/// Control of Dynamic Systems, 3rd ed., ch. 6 (matched roots, hold equivalents) (citations from
/// memory).
RootForm discrete_equivalent(const Section& section, const Realisation& realisation,
                             double sample_period_s);

/// exp(x) - 1 without cancellation near 0.
Complex complex_expm1(Complex x);

} // namespace cornerwright
