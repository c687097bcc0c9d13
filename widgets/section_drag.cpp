#include "widgets/section_drag.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {

namespace {

// Dragging ends here; exact entry may go further.
constexpr double smallest_damping = 0.001;
constexpr double largest_damping = 50.0;
constexpr double deepest_notch_db = -80.0;
constexpr double shallowest_notch_db = -0.1;
constexpr double smallest_corner = 1e-9;
constexpr double largest_corner = 1e12;

/// Damping of a root: the cosine of its angle from the negative real axis.
double dampingOf(std::complex<double> root) {
    return -root.real() / std::max(std::abs(root), smallest_corner);
}

bool hasTwoCorners(const Section& section) {
    return section.kind == SectionKind::lead || section.kind == SectionKind::lag;
}

double ratioToDecibel(double ratio) {
    return 20.0 * std::log10(ratio);
}

std::complex<double> upperRoot(double w, double damping) {
    if (damping >= 1.0)
        return {-w * damping, 0.0};
    return {-w * damping, w * std::sqrt(1.0 - damping * damping)};
}

} // namespace

std::vector<SectionCorner> cornersOf(const Section& section) {
    const double w = section.corner_rad_s;
    switch (section.kind) {
    case SectionKind::gain:
    case SectionKind::integrator:
        return {};
    case SectionKind::pi:
        return {{SectionPart::corner, w, true, false, false}};
    case SectionKind::lead:
    case SectionKind::lag:
        return {{SectionPart::zero, section.zero_rad_s, true, false, false},
                {SectionPart::pole, section.pole_rad_s, false, true, false}};
    case SectionKind::real_zero:
        return {{SectionPart::corner, section.zero_rad_s, true, false, false}};
    case SectionKind::real_pole:
        return {{SectionPart::corner, section.pole_rad_s, false, true, false}};
    case SectionKind::complex_zeros:
        return {{SectionPart::corner, w, true, false, true}};
    case SectionKind::complex_poles:
        return {{SectionPart::corner, w, false, true, true}};
    case SectionKind::notch:
        return {{SectionPart::corner, w, true, true, true}};
    case SectionKind::washout:
        return {{SectionPart::corner, w, false, true, false}};
    }
    return {};
}

Section withCornerAt(Section section, SectionPart part, double w_rad_s) {
    const double w = std::clamp(w_rad_s, smallest_corner, largest_corner);
    if (hasTwoCorners(section)) {
        const bool zeroBelow = section.kind == SectionKind::lead;
        if (part == SectionPart::zero)
            section.zero_rad_s = zeroBelow ? std::min(w, section.pole_rad_s / least_ratio)
                                           : std::max(w, section.pole_rad_s * least_ratio);
        else if (part == SectionPart::pole)
            section.pole_rad_s = zeroBelow ? std::max(w, section.zero_rad_s * least_ratio)
                                           : std::min(w, section.zero_rad_s / least_ratio);
        else {
            const double factor = w / std::sqrt(section.zero_rad_s * section.pole_rad_s);
            section.zero_rad_s *= factor;
            section.pole_rad_s *= factor;
        }
        return section;
    }
    switch (section.kind) {
    case SectionKind::real_zero:
        section.zero_rad_s = w;
        break;
    case SectionKind::real_pole:
        section.pole_rad_s = w;
        break;
    default:
        section.corner_rad_s = w;
        break;
    }
    return section;
}

double ratioOf(const Section& section) {
    return std::max(section.pole_rad_s / section.zero_rad_s,
                    section.zero_rad_s / section.pole_rad_s);
}

Section withRatio(Section section, double ratio) {
    if (!hasTwoCorners(section))
        return section;
    const double centre = std::sqrt(section.zero_rad_s * section.pole_rad_s);
    const double half = std::sqrt(std::max(ratio, least_ratio));
    const bool zeroBelow = section.kind == SectionKind::lead;
    section.zero_rad_s = zeroBelow ? centre / half : centre * half;
    section.pole_rad_s = zeroBelow ? centre * half : centre / half;
    return section;
}

double depthOf(const Section& section) {
    return ratioToDecibel(section.zero_damping / section.pole_damping);
}

Section withDepth(Section section, double depth_db) {
    const double depth = std::clamp(depth_db, deepest_notch_db, shallowest_notch_db);
    section.zero_damping = section.pole_damping * std::pow(10.0, depth / 20.0);
    return section;
}

Section withWidthFactor(Section section, double factor) {
    const double old = section.pole_damping;
    section.pole_damping = std::clamp(old * factor, smallest_damping, largest_damping);
    section.zero_damping *= section.pole_damping / old;
    return section;
}

Section withDampingFactor(Section section, double factor) {
    section.damping = std::clamp(std::max(section.damping, smallest_damping) * factor,
                                 smallest_damping, largest_damping);
    return section;
}

Section withResponseDrag(const Section& section, SectionPart part, const ResponseDrag& drag) {
    const double up = std::pow(10.0, drag.up_db / 20.0);
    if (section.kind == SectionKind::notch && drag.width)
        return withWidthFactor(section, drag.frequency_factor);
    const auto corners = cornersOf(section);
    const auto corner = std::find_if(corners.begin(), corners.end(),
                                     [&](const SectionCorner& c) { return c.part == part; });
    const double at = part == SectionPart::grip ? characteristic_rad_s(section)
                      : corner != corners.end() ? corner->w_rad_s
                                                : section.corner_rad_s;
    const Section moved = withCornerAt(section, part, at * drag.frequency_factor);
    if (drag.up_db == 0.0)
        return moved;
    if (part == SectionPart::grip)
        return withRatio(moved, ratioOf(moved) * up);
    switch (section.kind) {
    case SectionKind::notch:
        // From an endlessly deep notch the hand starts at the deepest that a drag reaches.
        return withDepth(moved, std::max(depthOf(section), deepest_notch_db) + drag.up_db);
    case SectionKind::complex_poles:
        return withDampingFactor(moved, 1.0 / up);
    case SectionKind::complex_zeros:
        return withDampingFactor(moved, up);
    default:
        return moved;
    }
}

std::vector<SectionRoot> draggableRootsOf(const Section& section) {
    const double w = section.corner_rad_s;
    switch (section.kind) {
    case SectionKind::gain:
    case SectionKind::integrator:
        return {};
    case SectionKind::pi:
        return {{SectionPart::corner, {-w, 0.0}, true}};
    case SectionKind::lead:
    case SectionKind::lag:
        return {{SectionPart::zero, {-section.zero_rad_s, 0.0}, true},
                {SectionPart::pole, {-section.pole_rad_s, 0.0}, false}};
    case SectionKind::real_zero:
        return {{SectionPart::corner, {-section.zero_rad_s, 0.0}, true}};
    case SectionKind::real_pole:
        return {{SectionPart::corner, {-section.pole_rad_s, 0.0}, false}};
    case SectionKind::complex_zeros:
        return {{SectionPart::corner, upperRoot(w, section.damping), true}};
    case SectionKind::complex_poles:
        return {{SectionPart::corner, upperRoot(w, section.damping), false}};
    case SectionKind::notch:
        return {{SectionPart::zero, upperRoot(w, section.zero_damping), true},
                {SectionPart::pole, upperRoot(w, section.pole_damping), false}};
    case SectionKind::washout:
        return {{SectionPart::corner, {-w, 0.0}, false}};
    }
    return {};
}

Section withRootAt(Section section, const SectionRoot& root, std::complex<double> s) {
    const double modulus = std::max(std::abs(s), smallest_corner);
    const double damping = std::max(dampingOf(s), 0.0);
    switch (section.kind) {
    case SectionKind::complex_zeros:
        section.corner_rad_s = modulus;
        section.damping = damping;
        return section;
    case SectionKind::complex_poles:
        section.corner_rad_s = modulus;
        section.damping = std::max(damping, smallest_damping);
        return section;
    case SectionKind::notch:
        section.corner_rad_s = modulus;
        // The zeros stay less damped than the poles by what the shallowest notch asks.
        if (root.is_zero)
            section.zero_damping = std::min(
                damping, section.pole_damping * std::pow(10.0, shallowest_notch_db / 20.0));
        else
            section.pole_damping =
                std::max({damping, smallest_damping,
                          section.zero_damping * std::pow(10.0, -shallowest_notch_db / 20.0)});
        return section;
    default:
        return withCornerAt(section, root.part, -s.real());
    }
}

Chain withGainFactor(Chain chain, double factor, std::size_t* index) {
    auto gain = std::find_if(chain.begin(), chain.end(), [](const Section& section) {
        return section.kind == SectionKind::gain && section.enabled;
    });
    if (gain == chain.end())
        gain = chain.insert(chain.begin(), Section{});
    gain->gain *= factor;
    if (index != nullptr)
        *index = static_cast<std::size_t>(gain - chain.begin());
    return chain;
}

Section newSection(SectionKind kind, double w_rad_s) {
    Section section;
    section.kind = kind;
    section.corner_rad_s = w_rad_s;
    section.zero_rad_s = w_rad_s;
    section.pole_rad_s = w_rad_s;
    switch (kind) {
    case SectionKind::lead:
        // A ratio of 4.6 lifts the phase by 40 degrees: asin((4.6 - 1) / (4.6 + 1)).
        return withRatio(section, 4.6);
    case SectionKind::lag:
        // Less than 6 degrees of lag a decade above the zero.
        section.pole_rad_s = w_rad_s / 3.0;
        return section;
    case SectionKind::complex_zeros:
    case SectionKind::complex_poles:
        section.damping = 0.7;
        return section;
    default:
        return section;
    }
}

} // namespace cornerwright
