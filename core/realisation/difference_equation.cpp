#include "core/realisation/difference_equation.h"

#include "core/numerics/error.h"
#include "core/realisation/fixed_sections.h"
#include "core/realisation/float_sections.h"
#include "core/realisation/quadratic.h"
#include "core/realisation/realisable_chain.h"
#include "core/realisation/second_order_pairs.h"
#include "core/realisation/section_equivalent.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

/// z = -1 in d = z - 1.
constexpr double half_rate = -2.0;

/// Poles at z = -1 come from improper sections alone and zeros there from the others; of a proper
/// chain every such pole has its zero, so that the pairs go.
void cancel_at_half_rate(RootForm& form) {
    const auto count = [](const ComplexVector& roots) {
        return std::ranges::count(roots, Complex(half_rate));
    };
    const auto remove = [](ComplexVector& roots, auto how_many) {
        for (; how_many > 0; --how_many)
            roots.erase(std::ranges::find(roots, Complex(half_rate)));
    };
    const auto pairs = std::min(count(form.zeros), count(form.poles));
    remove(form.zeros, pairs);
    remove(form.poles, pairs);
}

RootForm discrete_chain(const Chain& chain, double period, const Realisation& realisation) {
    RootForm product;
    for (const Section& section : chain)
        if (section.enabled)
            product = product * discrete_equivalent(section, realisation, period);
    cancel_at_half_rate(product);
    if (!std::isfinite(product.gain) || product.gain == 0.0)
        throw InputError({}, "a compensator gain within the range of a double",
                         "one that is not once discretised");
    return product;
}

std::vector<SectionCoefficients> exact_sections(const RootForm& function) {
    std::vector<SectionRoots> groups = second_order_pairs(function);
    if (groups.empty())
        groups.emplace_back(); // a plain gain
    std::vector<SectionCoefficients> sections;
    sections.reserve(groups.size());
    for (const SectionRoots& group : groups)
        sections.push_back(section_coefficients(group, sections.empty() ? function.gain : 1.0));
    return sections;
}

/// The polynomial of degree `order` that the first entries of `c` hold.
QuadraticRoots roots_of_order(const std::array<double, 3>& c, std::size_t order) {
    std::array<long double, 3> aligned{};
    for (std::size_t i = 0; i <= order; ++i)
        aligned[2 - order + i] = c[i];
    return quadratic_roots(aligned);
}

} // namespace

DifferenceEquation discretise(const Chain& chain, const Sampling& sampling,
                              const Realisation& realisation) {
    check_realisable(chain, sampling, realisation);
    const std::vector<SectionCoefficients> exact =
        exact_sections(discrete_chain(chain, sampling.sample_period_s, realisation));

    DifferenceEquation equation;
    equation.sample_period_s = sampling.sample_period_s;
    equation.realisation = realisation;
    if (realisation.number_format.type == NumberFormat::Type::fixed) {
        FixedSections fixed = fixed_sections(exact, realisation);
        equation.sections = std::move(fixed.sections);
        equation.notes = std::move(fixed.notes);
    } else {
        equation.sections = float_sections(exact, realisation);
        equation.notes.emplace_back("The overall gain sits in the numerator of the first section.");
    }
    return equation;
}

RootForm roots_in_z_minus_1(const DifferenceEquation& equation) {
    RootForm product;
    for (const DiscreteSection& section : equation.sections) {
        const std::size_t order = order_of(section, equation.realisation.structure);
        const QuadraticRoots zeros = roots_of_order(section.beta, order);
        const QuadraticRoots poles = roots_of_order(section.alpha, order);
        product = product * RootForm{zeros.roots, poles.roots, zeros.leading};
    }
    return product;
}

} // namespace cornerwright
