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
/// The upper corner must stay above the lower one by the least ratio, in a lead the pole.
constexpr double dampingOfAngle(double real, double modulus) {
    return -real / modulus;
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
    const double damping = std::max(dampingOfAngle(s.real(), modulus), 0.0);
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
