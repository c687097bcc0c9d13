#include "core/realisation/float_sections.h"

#include "core/numerics/error.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <cmath>
#include <limits>
#include <string>

namespace cornerwright {
namespace {

using Three = SectionCoefficients::Three;

double rounded_to(long double value, NumberFormat::Type type) {
    if (type == NumberFormat::Type::float32)
        return static_cast<double>(static_cast<float>(value));
    return static_cast<double>(value);
}

int precision_bits(NumberFormat::Type type) {
    return type == NumberFormat::Type::float32 ? std::numeric_limits<float>::digits
                                               : std::numeric_limits<double>::digits;
}

/// Rounds c so that its sum is exactly 0 (it is 0 but for the representation): all entries become
/// multiples of one unit so coarse that every sum of them is exact in the format.
std::array<double, 3> rounded_with_zero_sum(const Three& c, NumberFormat::Type type) {
    const long double largest = std::max({std::abs(c[0]), std::abs(c[1]), std::abs(c[2])});
    int exponent = 0;
    std::frexp(largest, &exponent);
    const long double unit = std::ldexp(1.0L, exponent + 1 - precision_bits(type));
    const long double first = std::round(c[0] / unit) * unit;
    if (c[2] == 0.0L)
        return {rounded_to(c[0], type), -rounded_to(c[0], type), 0.0};
    const long double last = std::round(c[2] / unit) * unit;
    return {static_cast<double>(first), static_cast<double>(-(first + last)),
            static_cast<double>(last)};
}

std::array<double, 3> rounded(const Three& c, NumberFormat::Type type) {
    return {rounded_to(c[0], type), rounded_to(c[1], type), rounded_to(c[2], type)};
}

void check_range(const std::array<double, 3>& values, const Three& wanted,
                 NumberFormat::Type type) {
    const std::string format(name_of(type));
    for (std::size_t i = 0; i < values.size(); ++i)
        if (!std::isfinite(values[i]))
            throw InputError({}, "coefficients that " + format + " can hold",
                             "one of " + number_text(static_cast<double>(wanted[i]), 6));
    if (std::ranges::all_of(values, [](double value) { return value == 0.0; }))
        throw InputError({}, "coefficients that " + format + " can hold",
                         "a section whose gain rounds to 0");
}

DiscreteSection rounded_section(const SectionCoefficients& exact, const Realisation& realisation) {
    const NumberFormat::Type type = realisation.number_format.type;
    DiscreteSection section;
    if (realisation.structure == Structure::delta) {
        section.beta = rounded(exact.beta, type);
        section.alpha = rounded(exact.alpha, type);
        check_range(section.beta, exact.beta, type);
    } else {
        section.b = exact.has_zero_at_rest() ? rounded_with_zero_sum(exact.b(), type)
                                             : rounded(exact.b(), type);
        section.a = exact.has_integrator() ? rounded_with_zero_sum(exact.a(), type)
                                           : rounded(exact.a(), type);
        check_range(section.b, exact.b(), type);
    }
    complete_other_form(section, realisation.structure);
    return section;
}

} // namespace

std::vector<DiscreteSection> float_sections(std::span<const SectionCoefficients> sections,
                                            const Realisation& realisation) {
    std::vector<DiscreteSection> result;
    result.reserve(sections.size());
    for (const SectionCoefficients& section : sections)
        result.push_back(rounded_section(section, realisation));
    return result;
}

} // namespace cornerwright
