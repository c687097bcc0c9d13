#pragma once

#include "core/numerics/root_form.h"

#include <vector>

namespace cornerwright {

/// Roots of one section in d = z - 1: at most two poles, no more zeros than poles.
struct SectionRoots {
    ComplexVector zeros;
    ComplexVector poles;
};

/// Splits a proper function (roots in d = z - 1) into sections of first and second order, in their
/// order of execution; the gain is left to the caller.
///
/// An integrator stands alone, so that its pole is exact in every number format and an output limit
/// can hold it. Of the other real poles the one nearest the unit circle goes with the one furthest
/// from it, and so on (two slow poles in one section would lose each other's digits); an odd one
/// out, the nearest, stands alone. Starting with the poles nearest the unit circle, each group
/// takes the zeros nearest to it (ties: the smaller angle); then the groups are ordered by rising
/// pole radius. Where complex zeros need a second-order section that is not there, single poles are
/// joined.
std::vector<SectionRoots> second_order_pairs(const RootForm& function);

} // namespace cornerwright
