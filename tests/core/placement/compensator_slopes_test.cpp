// The slopes of ln C against an independent complex-step derivative (W. Squire, G. Trapp, Using
// complex variables to estimate derivatives of real functions, SIAM Review 40 (1998); citation from
// memory): the magnitude and angle are real functions, so each section's formula is written here
// once more with complex parameters.

#include "core/placement/compensator_slopes.h"
#include "tests/core/placement/placement_practice.h"

#include <gtest/gtest.h>

#include <array>

namespace cornerwright {
namespace {

using namespace practice;

/// a + b e + c j + d j e: complex numbers in j whose parts carry an imaginary step e.
struct Bicomplex {
    Complex real; ///< a + b e
    Complex imag; ///< c + d e
};
Bicomplex operator+(Bicomplex a, Bicomplex b) {
    return {a.real + b.real, a.imag + b.imag};
}
Bicomplex operator*(Bicomplex a, Bicomplex b) {
    return {a.real * b.real - a.imag * b.imag, a.real * b.imag + a.imag * b.real};
}
Bicomplex operator/(Bicomplex a, Bicomplex b) {
    const Complex size = b.real * b.real + b.imag * b.imag;
    const Bicomplex product = a * Bicomplex{b.real, -b.imag};
    return {product.real / size, product.imag / size};
}

/// The numbers of one section, one of them with an imaginary step.
struct Numbers {
    Complex gain, corner, zero, pole, damping, zero_damping, pole_damping;
};

Bicomplex real(Complex value) {
    return {value, 0.0};
}
Bicomplex first_order(Bicomplex s, Complex corner) {
    return s / real(corner) + real(1.0);
}
Bicomplex quadratic(Bicomplex s, Complex corner, Complex damping) {
    const Bicomplex x = s / real(corner);
    return x * x + real(2.0 * damping) * x + real(1.0);
}

/// From the table in the project-file format.
Bicomplex value_of(SectionKind kind, const Numbers& n, Bicomplex s) {
    const Bicomplex one = real(1.0);
    switch (kind) {
    case SectionKind::gain:
        return real(n.gain);
    case SectionKind::integrator:
        return one / s;
    case SectionKind::pi:
        return (s + real(n.corner)) / s;
    case SectionKind::lead:
    case SectionKind::lag:
        return first_order(s, n.zero) / first_order(s, n.pole);
    case SectionKind::real_zero:
        return first_order(s, n.zero);
    case SectionKind::real_pole:
        return one / first_order(s, n.pole);
    case SectionKind::complex_zeros:
        return quadratic(s, n.corner, n.damping);
    case SectionKind::complex_poles:
        return one / quadratic(s, n.corner, n.damping);
    case SectionKind::notch:
        return quadratic(s, n.corner, n.zero_damping) / quadratic(s, n.corner, n.pole_damping);
    case SectionKind::washout:
        break;
    }
    return s / (s + real(n.corner));
}

Numbers numbers_of(const Section& section, double Section::*stepped, double step) {
    const auto number = [&](double Section::*value) {
        const double plain = section.*value;
        return Complex(plain, value == stepped ? plain * step : 0.0);
    };
    return {number(&Section::gain),        number(&Section::corner_rad_s),
            number(&Section::zero_rad_s),  number(&Section::pole_rad_s),
            number(&Section::damping),     number(&Section::zero_damping),
            number(&Section::pole_damping)};
}

Complex complex_step_slope(const Section& section, double Section::*value, double w) {
    constexpr double step = 1e-30;
    const Bicomplex c = value_of(section.kind, numbers_of(section, value, step), {0.0, w});
    const Complex slope(c.real.imag() / step, c.imag.imag() / step);
    return slope / Complex(c.real.real(), c.imag.real());
}

Chain every_kind() {
    Chain chain{gain_of(-3.0),
                corner_of(SectionKind::integrator, 1.0),
                corner_of(SectionKind::pi, 4.0),
                pair_of(SectionKind::lead, 10.0, 55.0),
                pair_of(SectionKind::lag, 2.0, 0.3),
                pair_of(SectionKind::real_zero, 30.0, 1.0),
                pair_of(SectionKind::real_pole, 1.0, 200.0),
                second_order_of(SectionKind::complex_zeros, 40.0, 0.2),
                second_order_of(SectionKind::complex_poles, 90.0, 0.6),
                notch_of(70.0, 0.05, 0.5),
                corner_of(SectionKind::washout, 0.7)};
    return chain;
}

TEST(CompensatorSlopes, AreThoseOfTheComplexStep) {
    const Chain chain = every_kind();
    const auto parameters = free_parameters(chain);
    ASSERT_EQ(parameters.size(), 16U);
    for (const double w : {0.1, 3.0, 41.0, 71.0, 900.0}) {
        const ComplexVector slopes = log_derivatives(chain, parameters, {0.0, w});
        for (std::size_t i = 0; i < parameters.size(); ++i) {
            const Section& section = chain[parameters[i].section];
            const Complex expected = complex_step_slope(section, parameters[i].parameter.value, w);
            EXPECT_LE(std::abs(slopes[i] - expected), 1e-12 * (1.0 + std::abs(expected)))
                << name_of(section.kind) << " " << parameters[i].parameter.key << " at " << w;
        }
    }
}

TEST(CompensatorSlopes, OfTheDifferenceEquationTendToTheContinuousOnesFarBelowTheSampleRate) {
    PlacementProblem problem;
    problem.compensator = {gain_of(2.0), pair_of(SectionKind::lead, 10.0, 55.0),
                           notch_of(70.0, 0.05, 0.5)};
    problem.sampling = Sampling{1e-5, 0.0, true};
    problem.realisation = Realisation{};
    const auto parameters = free_parameters(problem.compensator);
    const CompensatorSlopes slopes(problem, problem.compensator, parameters);
    const ComplexVector design = slopes.design(50.0);
    const ComplexVector realised = slopes.realised(50.0);
    // The trapezoidal rule bends the axis by (w Ts)^2/12 = 2e-8 at 50 rad/s.
    for (std::size_t i = 0; i < parameters.size(); ++i)
        EXPECT_LE(std::abs(realised[i] - design[i]), 1e-6) << parameters[i].parameter.key;
}

TEST(FreeParameters, LeaveLockedAndDisabledSectionsAndZeroDampingAlone) {
    Chain chain{gain_of(2.0), pair_of(SectionKind::lead, 1.0, 5.0), notch_of(70.0, 0.0, 0.5)};
    chain[0].locked = true;
    chain[1].enabled = false;
    const auto parameters = free_parameters(chain);
    ASSERT_EQ(parameters.size(), 2U);
    EXPECT_EQ(parameters[0].parameter.value, &Section::corner_rad_s);
    EXPECT_EQ(parameters[1].parameter.value, &Section::pole_damping);
}

TEST(FreeParameters, KeepTheSignOfAGain) {
    const Chain chain{gain_of(-2.0)};
    const auto parameters = free_parameters(chain);
    const Chain moved = with_logarithms(chain, parameters, {std::log(5.0)});
    EXPECT_DOUBLE_EQ(moved[0].gain, -5.0);
}

} // namespace
} // namespace cornerwright
