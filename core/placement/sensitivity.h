#pragma once

#include "core/placement/problem.h"

#include <functional>
#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// What ends the room of a value.
enum class RoomEnd {
    none,        ///< nothing fails as far as was looked
    requirement, ///< a requirement that is met now
    stability,   ///< a loop that is stable now
    realisation, ///< the section keeps no order there, or no difference equation can be made
};

/// How far one value may move one way, everything else staying.
struct ValueReach {
    RoomEnd end = RoomEnd::none;
    double factor = 1.0; ///< of the value, where `end` comes; the farthest looked at if none
    std::size_t requirement = 0; ///< index into the problem's; RoomEnd::requirement only
    std::string case_name;       ///< where it fails; empty for none and realisation
    LoopName loop = LoopName::design;
};

/// The room of one corner, damping or gain of the chain, or of one coefficient as it runs.
struct ValueRoom {
    bool is_coefficient = false;
    std::size_t section = 0; ///< of the chain, or of the difference equation
    std::string key;         ///< "zero_rad_s"; "b1", or "beta1" in the delta structure
    double value = 0.0;
    ValueReach down; ///< towards zero
    ValueReach up;
};

struct SensitivityOptions {
    double farthest_factor = 10.0; ///< values of the chain are looked at from 1/this to this
    /// Told the part done from 0 to 1; false stops.
    std::function<bool(double)> proceed;
};

struct Sensitivity {
    std::vector<ValueRoom> values;       ///< enabled sections, locked ones included, chain order
    std::vector<ValueRoom> coefficients; ///< empty where the project has no realisation
    std::vector<std::size_t> left_out;   ///< requirements that are not met now
    bool stopped = false;
};

/// For every value how far it may move before some requirement that is met now fails. Looked for at
/// growing distances and then closed in to a part in a million of the distance; a requirement that
/// fails and recovers between two of them is not seen. A coefficient moves alone, both forms of its
/// section kept equal, and is judged on the realised loops; it is looked at from 0 to twice its
/// value. Throws InputError where no plant case can be used or no requirement is met.
Sensitivity sensitivity(const PlacementProblem& problem, const SensitivityOptions& options = {});

} // namespace cornerwright
