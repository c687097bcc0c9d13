#pragma once

#include "core/compensator/chain.h"
#include "widgets/section_drag.h"

#include <cstddef>
#include <vector>

namespace cornerwright {

/// How the smallest headroom answers to one number of the chain.
struct UphillPull {
    std::size_t section = 0;
    double Section::*value = nullptr;
    double slope = 0.0; ///< share of headroom by ln(value)

    bool operator==(const UphillPull&) const = default;
};

/// Which way a handle should go.
struct UphillSign {
    int direction = 0;     ///< +1: up in frequency or gain, -1: down, 0: not worth a mark
    double strength = 0.0; ///< 0 to 1, against the strongest pull on the chain
};

/// For a corner, or the grip between two corners, of a section. Pulls below a part of the strongest
/// one are left unmarked.
UphillSign uphillOf(const std::vector<UphillPull>& pulls, const Chain& chain, std::size_t section,
                    SectionPart part);

/// For the loop gain.
UphillSign uphillOfGain(const std::vector<UphillPull>& pulls, const Chain& chain);

} // namespace cornerwright
