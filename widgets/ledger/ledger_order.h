#pragma once

#include "core/requirements/verdict.h"

#include <cstddef>
#include <vector>

namespace cornerwright {

/// The requirements as the ledger lists them: unmet ones first, then met, then not determined; the
/// smallest share first in each, equal ones as in the project.
std::vector<std::size_t> ledgerOrder(const Verdict& verdict);

/// Where a share stands on the headroom bar: 0 at the limit, towards 1 with room to spare, towards
/// -1 short of it. A share of 1 ("a bit") stands at one half, so that no bar ever leaves its cell.
double barPosition(double share);

} // namespace cornerwright
