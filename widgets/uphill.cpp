#include "widgets/uphill.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

constexpr double leastPart = 0.02; // of the strongest pull

UphillSign signOf(double slope, const std::vector<UphillPull>& pulls) {
    double strongest = 0.0;
    for (const UphillPull& pull : pulls)
        strongest = std::max(strongest, std::abs(pull.slope));
    if (strongest == 0.0 || std::abs(slope) < leastPart * strongest)
        return {};
    return {slope > 0.0 ? 1 : -1, std::min(1.0, std::abs(slope) / strongest)};
}

bool isOf(SectionPart part, double Section::*value) {
    switch (part) {
    case SectionPart::zero:
        return value == &Section::zero_rad_s;
    case SectionPart::pole:
        return value == &Section::pole_rad_s;
    case SectionPart::corner:
    case SectionPart::grip:
        break;
    }
    return value == &Section::corner_rad_s || value == &Section::zero_rad_s ||
           value == &Section::pole_rad_s;
}

} // namespace

UphillSign uphillOf(const std::vector<UphillPull>& pulls, const Chain& chain, std::size_t section,
                    SectionPart part) {
    if (section >= chain.size())
        return {};
    double slope = 0.0;
    for (const UphillPull& pull : pulls) {
        if (pull.section == section && isOf(part, pull.value))
            slope += pull.slope;
    }
    return signOf(slope, pulls);
}

UphillSign uphillOfGain(const std::vector<UphillPull>& pulls, const Chain& chain) {
    for (const UphillPull& pull : pulls) {
        if (pull.value == &Section::gain && pull.section < chain.size() &&
            chain[pull.section].kind == SectionKind::gain)
            return signOf(pull.slope, pulls);
    }
    return {};
}

} // namespace cornerwright
