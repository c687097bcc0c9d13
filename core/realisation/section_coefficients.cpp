#include "core/realisation/section_coefficients.h"

namespace cornerwright {
namespace {

using Three = SectionCoefficients::Three;

/// prod(d - root) with its leading 1 at the power of the number of roots, written for a section of
/// `order`: a numerator of lower degree starts with zeros.
Three monic(const ComplexVector& roots, std::size_t order) {
    Three result{};
    const std::size_t first = order - roots.size();
    result[first] = 1.0L;
    if (roots.size() == 1)
        result[first + 1] = -static_cast<long double>(roots[0].real());
    if (roots.size() == 2) {
        const std::complex<long double> r0(roots[0]);
        const std::complex<long double> r1(roots[1]);
        result[first + 1] = -(r0 + r1).real();
        result[first + 2] = (r0 * r1).real();
    }
    return result;
}

/// From powers of z to powers of d.
std::array<double, 3> to_delta(const std::array<double, 3>& c, std::size_t order) {
    const long double c0 = c[0];
    const long double c1 = c[1];
    const long double c2 = c[2];
    if (order == 0)
        return {c[0], 0.0, 0.0};
    if (order == 1)
        return {c[0], static_cast<double>(c0 + c1), 0.0};
    return {c[0], static_cast<double>(2.0L * c0 + c1), static_cast<double>(c0 + c1 + c2)};
}

std::array<double, 3> to_shift(const std::array<double, 3>& c, std::size_t order) {
    const long double c0 = c[0];
    const long double c1 = c[1];
    const long double c2 = c[2];
    if (order == 0)
        return {c[0], 0.0, 0.0};
    if (order == 1)
        return {c[0], static_cast<double>(c1 - c0), 0.0};
    return {c[0], static_cast<double>(c1 - 2.0L * c0), static_cast<double>(c0 - c1 + c2)};
}

std::size_t order_from(const std::array<double, 3>& numerator,
                       const std::array<double, 3>& denominator) {
    for (std::size_t order = 2; order > 0; --order)
        if (numerator[order] != 0.0 || denominator[order] != 0.0)
            return order;
    return 0;
}

} // namespace

Three SectionCoefficients::shifted(const Three& delta) const {
    if (order == 0)
        return delta;
    if (order == 1)
        return {delta[0], delta[1] - delta[0], 0.0L};
    return {delta[0], delta[1] - 2.0L * delta[0], delta[0] - delta[1] + delta[2]};
}

SectionCoefficients section_coefficients(const SectionRoots& roots, double gain) {
    SectionCoefficients result;
    result.order = roots.poles.size();
    result.alpha = monic(roots.poles, result.order);
    result.beta = monic(roots.zeros, result.order);
    for (long double& entry : result.beta)
        entry *= gain;
    return result;
}

void complete_other_form(DiscreteSection& section, Structure structure) {
    const std::size_t order = order_of(section, structure);
    if (structure == Structure::delta) {
        section.b = to_shift(section.beta, order);
        section.a = to_shift(section.alpha, order);
        return;
    }
    section.beta = to_delta(section.b, order);
    section.alpha = to_delta(section.a, order);
}

std::size_t order_of(const DiscreteSection& section, Structure structure) {
    return structure == Structure::delta ? order_from(section.beta, section.alpha)
                                         : order_from(section.b, section.a);
}

bool has_integrator(const DiscreteSection& section, Structure structure) {
    const std::size_t order = order_of(section, structure);
    return order > 0 && section.alpha[order] == 0.0;
}

} // namespace cornerwright
