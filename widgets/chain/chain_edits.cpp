#include "widgets/chain/chain_edits.h"

#include <algorithm>

namespace cornerwright {

namespace {

std::ptrdiff_t at(std::size_t index) {
    return static_cast<std::ptrdiff_t>(index);
}

} // namespace

Project withSectionAdded(const Project& project, const Section& section, std::size_t before) {
    Project next = project;
    const std::size_t place = std::min(before, next.compensator.size());
    next.compensator.insert(next.compensator.begin() + at(place), section);
    return next;
}

Project withSectionChanged(const Project& project, std::size_t index, const Section& section) {
    Project next = project;
    next.compensator.at(index) = section;
    return next;
}

Project withSectionRemoved(const Project& project, std::size_t index) {
    Project next = project;
    next.compensator.erase(next.compensator.begin() + at(index));
    return next;
}

Project withSectionMoved(const Project& project, std::size_t from, std::size_t to) {
    Project next = project;
    const Section moved = next.compensator.at(from);
    next.compensator.erase(next.compensator.begin() + at(from));
    next.compensator.insert(next.compensator.begin() + at(to), moved);
    return next;
}

} // namespace cornerwright
