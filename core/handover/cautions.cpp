#include "core/handover/cautions.h"

namespace cornerwright {

std::vector<std::string> cautions() {
    return {"Closing a loop on real equipment can move, heat or energise it without warning.",
            "First close it with limited effort, an independent stop, and nobody in reach.",
            "These figures rest on the plant data given and say nothing of saturation, faults or "
            "what was not measured.",
            "Local codes, the machine's risk assessment and licensed practice decide."};
}

} // namespace cornerwright
