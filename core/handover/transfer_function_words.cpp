#include "core/handover/transfer_function_words.h"

#include "core/numerics/number_text.h"

namespace cornerwright {
namespace {

/// "s/20 + 1".
std::string first_order(double w) {
    return "s/" + number_text(w) + " + 1";
}

/// "s^2/w^2 + 2*0.5*s/w + 1" with numbers.
std::string second_order(double w, double damping) {
    const std::string corner = number_text(w);
    return "s^2/" + corner + "^2 + 2*" + number_text(damping) + "*s/" + corner + " + 1";
}

} // namespace

std::string algebra_of(const Section& section) {
    const double w = section.corner_rad_s;
    switch (section.kind) {
    case SectionKind::gain:
        return number_text(section.gain);
    case SectionKind::integrator:
        return "1/s";
    case SectionKind::pi:
        return "1 + " + number_text(w) + "/s";
    case SectionKind::lead:
    case SectionKind::lag:
        return "(" + first_order(section.zero_rad_s) + ")/(" + first_order(section.pole_rad_s) +
               ")";
    case SectionKind::real_zero:
        return first_order(section.zero_rad_s);
    case SectionKind::real_pole:
        return "1/(" + first_order(section.pole_rad_s) + ")";
    case SectionKind::complex_zeros:
        return second_order(w, section.damping);
    case SectionKind::complex_poles:
        return "1/(" + second_order(w, section.damping) + ")";
    case SectionKind::notch:
        return "(" + second_order(w, section.zero_damping) + ")/(" +
               second_order(w, section.pole_damping) + ")";
    case SectionKind::washout:
        break;
    }
    return "(s/" + number_text(w) + ")/(" + first_order(w) + ")";
}

std::vector<std::string> transfer_function_words(const Chain& chain) {
    std::vector<std::string> lines{"Compensator C(s), s in rad/s, the product of:"};
    for (const Section& section : chain) {
        if (!section.enabled)
            continue;
        std::string line = "  ";
        line += name_of(section.kind);
        if (!section.label.empty())
            line += " \"" + section.label + "\"";
        lines.push_back(line + ": " + algebra_of(section));
    }
    if (lines.size() == 1)
        lines.emplace_back("  1");
    return lines;
}

} // namespace cornerwright
