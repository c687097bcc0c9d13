#pragma once

#include "core/loop/modal_sum.h"

#include <optional>

namespace cornerwright {

/// Searches on a modal sum from `begin` on, made safe by its bound on the deviation from a straight
/// line: an interval is left unsplit only where that bound shows that nothing is hidden in it, so a
/// ripple far faster than the rest is neither missed nor followed where it does not matter.
/// Branch and bound; sizes are told by `scale`, below a part of 1e-7 of which nothing is resolved.
struct ModalSearch {
    const ModalSum* sum = nullptr;
    double begin = 0.0;
    double end = 0.0; ///< from here on the sum is its constant for every purpose
    double scale = 1.0;

    struct Extreme {
        double t = 0.0;
        double value = 0.0;
    };

    /// The largest of sign * sum over [begin, end].
    Extreme largest(double sign) const;
    /// The first time at which sign * sum reaches `level`.
    std::optional<double> first_reaching(double level, double sign) const;
    /// The last time at which the sum lies farther than `band` from `middle`; nothing: never.
    std::optional<double> last_outside(double middle, double band) const;
};

/// The time from which `sum.envelope` stays below `level` (> 0); infinite where it never does.
double envelope_below(const ModalSum& sum, double level, double begin);

} // namespace cornerwright
