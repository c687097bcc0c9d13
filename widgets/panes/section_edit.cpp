#include "widgets/panes/section_edit.h"

#include <algorithm>
#include <utility>

namespace cornerwright {

std::optional<Project> withSection(const Project& project, std::size_t index, Section section) {
    if (index >= project.compensator.size())
        return std::nullopt;
    Project changed = project;
    changed.compensator[index] = std::move(section);
    return changed;
}

Project withLoopGain(const Project& project, double factor) {
    Project changed = project;
    changed.compensator = withGainFactor(std::move(changed.compensator), factor);
    return changed;
}

std::optional<Project> withLimitMoved(const Project& project, std::size_t index, double step) {
    constexpr double least_limit = 0.1; // dB or degrees
    if (index >= project.requirements.size() || !project.requirements[index].at_least)
        return std::nullopt;
    Project changed = project;
    std::optional<double>& limit = changed.requirements[index].at_least;
    limit = std::max(*limit + step, least_limit);
    return changed;
}

} // namespace cornerwright
