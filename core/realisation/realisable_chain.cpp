#include "core/realisation/realisable_chain.h"

#include "core/numerics/error.h"
#include "core/numerics/number_text.h"
#include "core/realisation/fixed_sections.h"

#include <cmath>
#include <numbers>
#include <string>

namespace cornerwright {
namespace {

/// Digits that a person needs to recognise his own number in a message.
constexpr int message_digits = 6;

std::string text(double value) {
    return number_text(value, message_digits);
}

/// "section 3 (lead "phase lift")".
std::string words_of(const Section& section, std::size_t index) {
    std::string words = "section " + std::to_string(index + 1) + " (";
    words += name_of(section.kind);
    if (!section.label.empty())
        words += " \"" + section.label + "\"";
    return words + ")";
}

void check_sampling(const Sampling& sampling, const Realisation& realisation) {
    const double period = sampling.sample_period_s;
    if (!(period > 0.0) || !std::isfinite(period))
        throw InputError({}, "a sample period above 0 s to realise the compensator",
                         text(period) + " s");
    if (realisation.method == Method::tustin_at) {
        const double w = realisation.match_rad_s;
        if (!(w > 0.0) || !(w < std::numbers::pi / period))
            throw InputError({},
                             "match_rad_s above 0 and below pi/Ts = " +
                                 text(std::numbers::pi / period) + " rad/s",
                             text(w) + " rad/s");
    }
}

void check_format(const Realisation& realisation) {
    const NumberFormat& format = realisation.number_format;
    if (format.type == NumberFormat::Type::fixed) {
        if (format.word_bits != 16 && format.word_bits != 32)
            throw InputError({}, "word_bits of 16 or 32", std::to_string(format.word_bits));
        if (format.fraction_bits < 1 || format.fraction_bits > format.word_bits - 1)
            throw InputError({},
                             "fraction_bits from 1 to " + std::to_string(format.word_bits - 1) +
                                 " in a word of " + std::to_string(format.word_bits) + " bits",
                             std::to_string(format.fraction_bits));
    }
    if (realisation.output_limits &&
        !(realisation.output_limits->at_least < realisation.output_limits->at_most))
        throw InputError({}, "output limits with at_least below at_most",
                         text(realisation.output_limits->at_least) + " and " +
                             text(realisation.output_limits->at_most));
}

void check_limits_fit(const Realisation& realisation) {
    if (!realisation.output_limits || realisation.number_format.type != NumberFormat::Type::fixed)
        return;
    const double range = range_of(realisation.number_format);
    const double step = std::ldexp(1.0, -realisation.number_format.fraction_bits);
    for (const double limit :
         {realisation.output_limits->at_least, realisation.output_limits->at_most})
        if (limit < -range || limit > range - step)
            throw InputError({},
                             "output limits within the range of the word, " + text(-range) +
                                 " to " + text(range - step),
                             text(limit));
}

void check_section(const Section& section, std::size_t index, double period, Method method) {
    check(section);
    const double half_rate = std::numbers::pi / period;
    for (const SectionParameter& parameter : parameters_of(section.kind)) {
        const double value = section.*parameter.value;
        if (parameter.is_frequency && value >= half_rate)
            throw InputError({},
                             "every corner below pi/Ts = " + text(half_rate) +
                                 " rad/s (sample period " + text(period) + " s)",
                             std::string(parameter.key) + " " + text(value) + " rad/s in " +
                                 words_of(section, index));
    }
    const bool invariant = method == Method::step_invariant || method == Method::ramp_invariant;
    if (invariant && !roots_of(section).is_proper())
        throw InputError({},
                         "sections with no more zeros than poles for the method " +
                             std::string(name_of(method)),
                         words_of(section, index) + ", which has more zeros than poles");
}

} // namespace

void check_realisable(const Chain& chain, const Sampling& sampling,
                      const Realisation& realisation) {
    check_sampling(sampling, realisation);
    check_format(realisation);
    check_limits_fit(realisation);
    const RootForm compensator = roots_of(chain);
    if (!compensator.is_proper())
        throw InputError({}, "a compensator with no more zeros than poles to realise",
                         std::to_string(compensator.zeros.size()) + " zeros and " +
                             std::to_string(compensator.poles.size()) + " poles");
    for (std::size_t i = 0; i < chain.size(); ++i)
        if (chain[i].enabled)
            check_section(chain[i], i, sampling.sample_period_s, realisation.method);
}

} // namespace cornerwright
