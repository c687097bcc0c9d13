#include "core/realisation/fixed_sections.h"

#include "core/numerics/error.h"
#include "core/numerics/number_text.h"
#include "core/realisation/node_bounds.h"

#include <algorithm>
#include <cmath>
#include <optional>

namespace cornerwright {
namespace {

using Three = SectionCoefficients::Three;
using Integers = std::array<std::int64_t, 3>;

/// One section on its way into integers: its own numerator times 2^exponent.
struct ScaledSection {
    SectionCoefficients exact;
    int exponent = 0;
};

bool is_delta(const Realisation& realisation) {
    return realisation.structure == Structure::delta;
}

Three running_numerator(const ScaledSection& section, bool delta) {
    Three c = delta ? section.exact.beta : section.exact.b();
    for (long double& entry : c)
        entry = std::ldexp(entry, section.exponent);
    return c;
}

Three running_denominator(const ScaledSection& section, bool delta) {
    return delta ? section.exact.alpha : section.exact.a();
}

/// c[i] times 2^(bits + i delta_shift), to the nearest integer, ties away from zero.
Integers to_integers(const Three& c, int bits, int delta_shift) {
    Integers result{};
    for (int i = 0; i < 3; ++i) {
        // Beyond any word already: kept out of the range of the conversion.
        constexpr long double limit = 0x1p+60L;
        const auto at = static_cast<std::size_t>(i);
        const long double scaled = std::round(std::ldexp(c[at], bits + i * delta_shift));
        result[at] = static_cast<std::int64_t>(std::clamp(scaled, -limit, limit));
    }
    return result;
}

/// The last entry takes up what rounding left of a sum that is 0. Only in the shift form: a delta
/// section holds the sum itself.
void keep_zero_sum(Integers& c, std::size_t order) {
    if (order == 1)
        c[1] = -c[0];
    else
        c[1] = -(c[0] + c[2]);
}

/// Integers of a section at one shift, or nothing where they do not fit.
struct IntegerSection {
    Integers b{};
    Integers a{};
};

IntegerSection integer_section(const ScaledSection& section, const Realisation& realisation,
                               int shift, int delta_shift) {
    const bool delta = is_delta(realisation);
    const int bits = realisation.number_format.fraction_bits - shift;
    IntegerSection result{to_integers(running_numerator(section, delta), bits, delta_shift),
                          to_integers(running_denominator(section, delta), bits, delta_shift)};
    if (!delta && section.exact.has_zero_at_rest())
        keep_zero_sum(result.b, section.exact.order);
    if (!delta && section.exact.has_integrator())
        keep_zero_sum(result.a, section.exact.order);
    return result;
}

/// Whether the coefficients fit into the word and no sum of products of word-sized signals can
/// leave twice the word: each stored state counts as a coefficient of 1, and half of what the shift
/// back divides by is added before it.
bool fits(const IntegerSection& c, const Realisation& realisation, int shift, int delta_shift) {
    const NumberFormat& format = realisation.number_format;
    const std::int64_t word = std::int64_t{1} << (format.word_bits - 1);
    for (std::size_t i = 0; i < 3; ++i)
        if (std::abs(c.b[i]) >= word || (i > 0 && std::abs(c.a[i]) >= word))
            return false;
    const int bits = format.fraction_bits - shift;
    const std::int64_t one = std::int64_t{1} << bits;
    const int half_bits = std::max(bits + delta_shift - format.word_bits, 0);
    const std::int64_t limit = 2 * word - (std::int64_t{1} << half_bits);
    const auto term = [&c](std::size_t i) { return std::abs(c.b[i]) + std::abs(c.a[i]); };
    if (realisation.structure == Structure::direct_form_1)
        return std::abs(c.b[0]) + term(1) + term(2) <= limit;
    return std::abs(c.b[0]) + one <= limit && term(1) + one <= limit && term(2) <= limit;
}

std::optional<int> smallest_shift(const ScaledSection& section, const Realisation& realisation,
                                  int delta_shift) {
    for (int shift = 0; shift <= realisation.number_format.fraction_bits; ++shift)
        if (fits(integer_section(section, realisation, shift, delta_shift), realisation, shift,
                 delta_shift))
            return shift;
    return std::nullopt;
}

/// The largest scale 2^delta_shift of the delta states that costs the section no shift.
int delta_shift_of(const ScaledSection& section, const Realisation& realisation) {
    if (!is_delta(realisation) || section.exact.order == 0)
        return 0;
    const std::optional<int> needed = smallest_shift(section, realisation, 0);
    int best = 0;
    // Beyond the word there is nothing to gain.
    for (int scale = 1; scale < realisation.number_format.word_bits; ++scale) {
        if (smallest_shift(section, realisation, scale) != needed)
            break;
        best = scale;
    }
    return best;
}

[[noreturn]] void refuse_coefficient(const ScaledSection& section, std::size_t index,
                                     const Realisation& realisation) {
    const NumberFormat& format = realisation.number_format;
    double largest = 0.0;
    for (const Three& c : {running_numerator(section, is_delta(realisation)),
                           running_denominator(section, is_delta(realisation))})
        for (const long double entry : c)
            largest = std::max(largest, std::abs(static_cast<double>(entry)));
    throw InputError({},
                     "coefficients that a word of " + std::to_string(format.word_bits) +
                         " bits with " + std::to_string(format.fraction_bits) +
                         " fraction bits can hold (below " +
                         number_text(std::ldexp(1.0, format.word_bits - 1)) +
                         " with every fraction bit given up)",
                     number_text(largest, 6) + " in section " + std::to_string(index + 1) +
                         " of the difference equation");
}

/// Coefficients in double precision, for the bounds.
DiscreteSection unrounded(const ScaledSection& section, Structure structure, int delta_shift) {
    DiscreteSection result;
    const auto narrowed = [](const Three& c) {
        return std::array{static_cast<double>(c[0]), static_cast<double>(c[1]),
                          static_cast<double>(c[2])};
    };
    result.b = narrowed(section.exact.b());
    result.a = narrowed(section.exact.a());
    result.beta = narrowed(section.exact.beta);
    result.alpha = narrowed(section.exact.alpha);
    result.delta_shift = structure == Structure::delta ? delta_shift : 0;
    return result;
}

/// Whether 2^exponent in the numerator leaves the shift that the denominator needs anyway.
bool costs_no_shift(ScaledSection section, int exponent, const Realisation& realisation,
                    int delta_shift) {
    ScaledSection denominator_alone = section;
    denominator_alone.exact.beta = {};
    section.exponent = exponent;
    return smallest_shift(section, realisation, delta_shift) ==
           smallest_shift(denominator_alone, realisation, delta_shift);
}

/// Spreads the gain: the exponent of each section, and the power of two that is left.
int spread_gain(std::vector<ScaledSection>& sections, const Realisation& realisation) {
    std::vector<DiscreteSection> doubles;
    std::vector<int> delta_shifts;
    for (const ScaledSection& section : sections) {
        delta_shifts.push_back(delta_shift_of(section, realisation));
        doubles.push_back(unrounded(section, realisation.structure, delta_shifts.back()));
    }
    const std::vector<NodeBounds> bounds = l1_bounds(doubles, realisation.structure);
    const double range = range_of(realisation.number_format);
    // No inner signal is cut off earlier than the output, and none beyond the range for an input
    // of full scale.
    const double target = std::min(range, std::max(1.0, bounds.back().output));

    // What amplification on the way gains against the rounding of signals, the last numerators lose
    // in bits of their coefficients: no more than a quarter of them (our choice).
    const int most = realisation.number_format.fraction_bits / 4;

    int so_far = 0;
    for (std::size_t i = 0; i < sections.size(); ++i) {
        const double bound = bounds[i].largest();
        int exponent = -so_far; // behind an integrator there is no bound to keep
        if (std::isfinite(bound) && bound > 0.0) {
            const int allowed = static_cast<int>(std::floor(std::log2(target / bound))) - so_far;
            exponent = i + 1 == sections.size() ? std::min(allowed, -so_far) : allowed;
        }
        exponent = std::min(exponent, most - so_far);
        while (exponent > -realisation.number_format.word_bits - so_far &&
               !costs_no_shift(sections[i], exponent, realisation, delta_shifts[i]))
            --exponent;
        sections[i].exponent = exponent;
        so_far += exponent;
    }
    if (so_far > 0) {
        sections.back().exponent -= so_far;
        so_far = 0;
    }
    return -so_far;
}

DiscreteSection rounded_section(const ScaledSection& section, std::size_t index,
                                const Realisation& realisation) {
    const int delta_shift = delta_shift_of(section, realisation);
    const std::optional<int> shift = smallest_shift(section, realisation, delta_shift);
    if (!shift)
        refuse_coefficient(section, index, realisation);
    const IntegerSection c = integer_section(section, realisation, *shift, delta_shift);
    if (c.b == Integers{})
        throw InputError({}, "a number format whose steps are finer than the coefficients",
                         "section " + std::to_string(index + 1) +
                             " of the difference equation, whose numerator rounds to 0");
    DiscreteSection result;
    result.b_integers = c.b;
    result.a_integers = c.a;
    result.shift = *shift;
    result.delta_shift = delta_shift;
    auto& numerator = is_delta(realisation) ? result.beta : result.b;
    auto& denominator = is_delta(realisation) ? result.alpha : result.a;
    for (int i = 0; i < 3; ++i) {
        const auto at = static_cast<std::size_t>(i);
        const int bits = realisation.number_format.fraction_bits - *shift + i * delta_shift;
        numerator[at] = std::ldexp(static_cast<double>(c.b[at]), -bits);
        denominator[at] = std::ldexp(static_cast<double>(c.a[at]), -bits);
    }
    complete_other_form(result, realisation.structure);
    return result;
}

/// "2^-3, 2^1".
std::string powers_text(const std::vector<ScaledSection>& sections) {
    std::string text;
    for (const ScaledSection& section : sections)
        text += (text.empty() ? "2^" : ", 2^") + std::to_string(section.exponent);
    return text;
}

} // namespace

double range_of(const NumberFormat& format) {
    return std::ldexp(1.0, format.word_bits - 1 - format.fraction_bits);
}

FixedSections fixed_sections(std::span<const SectionCoefficients> sections,
                             const Realisation& realisation) {
    std::vector<ScaledSection> scaled;
    for (const SectionCoefficients& section : sections)
        scaled.push_back({section, 0});
    FixedSections result;
    const bool dynamic = sections.front().order > 0;
    const int left = dynamic ? spread_gain(scaled, realisation) : 0;
    result.notes.push_back("Gain in the first section, spread over the sections as " +
                           powers_text(scaled) +
                           " so that no stored state overflows for a full-scale input of 1.0.");
    if (left > 0) {
        scaled.push_back({{{1.0L, 0.0L, 0.0L}, {1.0L, 0.0L, 0.0L}, 0}, left});
        result.notes.push_back("A last section multiplies by 2^" + std::to_string(left) +
                               ", saturating.");
    }
    for (std::size_t i = 0; i < scaled.size(); ++i)
        result.sections.push_back(rounded_section(scaled[i], i, realisation));
    return result;
}

} // namespace cornerwright
