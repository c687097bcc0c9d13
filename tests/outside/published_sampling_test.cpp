// Sampling and difference equations against published formulas. Every citation is from memory.

#include "core/loop/decibel.h"
#include "core/loop/frequency_figures.h"
#include "core/loop/sampled_plant.h"
#include "core/realisation/difference_equation.h"
#include "tests/outside/published.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright::outside {
namespace {

constexpr double pi = std::numbers::pi;
constexpr double period = 0.1;

DifferenceEquation equation_of(const Section& section, Method method, double sample_period_s) {
    Realisation realisation;
    realisation.method = method;
    return discretise({section}, {sample_period_s, 0.0, true}, realisation);
}

Section real_pole(double pole) {
    Section section;
    section.kind = SectionKind::real_pole;
    section.pole_rad_s = pole;
    return section;
}

/// Leading coefficient, zero and pole of the only section, of first order.
struct FirstOrder {
    double gain;
    double zero;
    double pole;
};

FirstOrder first_order(const DifferenceEquation& equation) {
    const DiscreteSection& section = equation.sections.front();
    return {section.b[0], -section.b[1] / section.b[0], -section.a[1]};
}

double size_at(const DifferenceEquation& equation, double w) {
    const Complex d = std::polar(1.0, w * equation.sample_period_s) - 1.0;
    return std::abs(evaluate(roots_in_z_minus_1(equation), d));
}

// A. Tustin, A method of analysing the behaviour of linear systems in terms of time series, J. IEE
// 94 IIA (1947); K. J. Astrom, B. Wittenmark, Computer-Controlled Systems, 3rd ed., ch. 8.
TEST(PublishedSampling, TustinOfALag) {
    const FirstOrder f = first_order(equation_of(real_pole(1.0), Method::tustin, period));
    EXPECT_NEAR(f.gain, 0.047619047619048, 1e-15);
    EXPECT_NEAR(f.pole, 0.90476190476190, 1e-14);
    EXPECT_NEAR(f.zero, -1.0, 1e-14);
}

// A corner w lands at (2/Ts) atan(w Ts/2), prewarped it stays: Astrom and Wittenmark, as above,
// ch. 8; A. V. Oppenheim, R. W. Schafer, Discrete-Time Signal Processing, ch. 7.
TEST(PublishedSampling, NotchWarpedAndNot) {
    constexpr double millisecond = 1e-3;
    Section notch;
    notch.kind = SectionKind::notch;
    notch.corner_rad_s = 800.0;
    notch.zero_damping = 0.02;
    notch.pole_damping = 0.5;
    EXPECT_NEAR(std::abs(evaluate(roots_of(notch), Complex(0.0, 800.0))), 0.04, 1e-14);
    EXPECT_NEAR(size_at(equation_of(notch, Method::tustin_at_corners, millisecond), 800.0), 0.04,
                1e-13);
    const DifferenceEquation unwarped = equation_of(notch, Method::tustin, millisecond);
    EXPECT_NEAR(size_at(unwarped, 800.0), 0.11716940071580, 1e-13);
    EXPECT_NEAR(size_at(unwarped, 761.012754225), 0.04, 1e-12);
}

// The same formula: 1 kHz lands at 893 Hz when sampled at 5 kHz, at 969 Hz at 10 kHz.
TEST(PublishedSampling, WhereTustinPutsOneKilohertz) {
    struct Row {
        double rate_hz;
        double lands_at_hz;
    };
    for (const Row& row : {Row{5e3, 892.830767648}, Row{1e4, 968.921916140}}) {
        Section pair;
        pair.kind = SectionKind::notch;
        pair.corner_rad_s = 2.0 * pi * 1e3;
        pair.zero_damping = 0.0;
        pair.pole_damping = 0.5;
        const DifferenceEquation equation = equation_of(pair, Method::tustin, 1.0 / row.rate_hz);
        const Complex zero = 1.0 + roots_in_z_minus_1(equation).zeros.front();
        EXPECT_NEAR(std::abs(std::arg(zero)) * row.rate_hz / (2.0 * pi), row.lands_at_hz, 1e-8);
    }
}

void expect_roots(ComplexVector found, std::vector<double> z) {
    ASSERT_EQ(found.size(), z.size());
    std::sort(found.begin(), found.end(), [](Complex a, Complex b) { return a.real() < b.real(); });
    std::sort(z.begin(), z.end());
    for (std::size_t i = 0; i < z.size(); ++i)
        EXPECT_LT(std::abs(1.0 + found[i] - z[i]), 1e-11 * std::max(1.0, std::abs(z[i])));
}

// Ts^2 (z + 1)/(2 (z - 1)^2): Astrom and Wittenmark, as above, ch. 2, table of hold equivalents.
TEST(PublishedSampling, HeldDoubleIntegrator) {
    const SampledPlant held = sample_plant({{{}, {0.0, 0.0}, 1.0}, 0.0}, 0.0, period);
    EXPECT_EQ(held.whole_samples, 0);
    EXPECT_NEAR(held.delta_form.gain, 0.005, 1e-16);
    expect_roots(held.delta_form.zeros, {-1.0});
    expect_roots(held.delta_form.poles, {1.0, 1.0});
}

// ((Ts - tau)^2 z^2 + (Ts^2 + 2 Ts tau - 2 tau^2) z + tau^2)/(2 z (z - 1)^2): as above, sampling of
// a system with time delay.
TEST(PublishedSampling, HeldDoubleIntegratorBehindAFractionalDelay) {
    const SampledPlant held = sample_plant({{{}, {0.0, 0.0}, 1.0}, 0.04}, 0.0, period);
    EXPECT_NEAR(held.delta_form.gain, 0.0018, 1e-16);
    expect_roots(held.delta_form.zeros, {-0.111111111111, -4.0});
    expect_roots(held.delta_form.poles, {0.0, 1.0, 1.0});
}

// ((1 - e^{-a(Ts-tau)}) z + e^{-a(Ts-tau)} - e^{-a Ts})/(z (z - e^{-a Ts})): as above.
TEST(PublishedSampling, HeldLagBehindAFractionalDelay) {
    const SampledPlant held = sample_plant({{{}, {-1.0}, 1.0}, 0.04}, 0.0, period);
    EXPECT_NEAR(held.delta_form.gain, 0.0582354664158, 1e-13);
    expect_roots(held.delta_form.zeros, {-0.0369271155483 / 0.0582354664158});
    expect_roots(held.delta_form.poles, {0.0, 0.904837418036});
}

// Zeros of the Euler polynomial z^2 + 4 z + 1: K. J. Astrom, P. Hagander, J. Sternby, Zeros of
// sampled systems, Automatica 20 (1984).
TEST(PublishedSampling, SampledZerosOfAThirdOrderIntegrator) {
    const SampledPlant held = sample_plant({{{}, {0.0, 0.0, 0.0}, 1.0}, 0.0}, 0.0, 1.0);
    EXPECT_NEAR(held.delta_form.gain, 1.0 / 6.0, 1e-15);
    expect_roots(held.delta_form.zeros, {-0.267949192431, -3.73205080757});
}

// k (z + 1)/(z - e^{-0.2}): G. F. Franklin, J. D. Powell, M. L. Workman, Digital Control of Dynamic
// Systems, 3rd ed., ch. 6.
TEST(PublishedSampling, MatchedRootsOfALag) {
    const FirstOrder f = first_order(equation_of(real_pole(2.0), Method::matched_roots, period));
    EXPECT_NEAR(f.gain, 0.090634623461009, 1e-15);
    EXPECT_NEAR(f.pole, 0.81873075307798, 1e-14);
    EXPECT_NEAR(f.zero, -1.0, 1e-14);
}

// As above, worked by hand from the rule.
TEST(PublishedSampling, MatchedRootsOfALead) {
    Section lead;
    lead.kind = SectionKind::lead;
    lead.zero_rad_s = 2.0;
    lead.pole_rad_s = 20.0;
    const FirstOrder f = first_order(equation_of(lead, Method::matched_roots, period));
    EXPECT_NEAR(f.zero, 0.81873075307798, 1e-13);
    EXPECT_NEAR(f.pole, 0.13533528323661, 1e-14);
    EXPECT_NEAR(f.gain, 4.7700574225664, 1e-12);
}

// Step- and ramp-invariant equivalents: Franklin, Powell, Workman, as above, ch. 6.
TEST(PublishedSampling, InvariantEquivalentsOfALag) {
    const DifferenceEquation step = equation_of(real_pole(2.0), Method::step_invariant, period);
    const DiscreteSection& held = step.sections.front();
    // (1 - e^{-0.2})/(z - e^{-0.2})
    EXPECT_NEAR(held.b[0], 0.0, 1e-17);
    EXPECT_NEAR(held.b[1], 0.18126924692202, 1e-14);
    EXPECT_NEAR(held.a[1], -0.81873075307798, 1e-14);
    const FirstOrder ramp =
        first_order(equation_of(real_pole(2.0), Method::ramp_invariant, period));
    EXPECT_NEAR(ramp.gain, 0.093653765389909, 1e-14);
    EXPECT_NEAR(ramp.zero, -0.93552545556859, 1e-13);
    EXPECT_NEAR(ramp.pole, 0.81873075307798, 1e-14);
}

// Lag of the hold w Ts/2, of one sample w Ts: Astrom and Wittenmark, as above, ch. 8; Franklin,
// Powell, Workman, as above.
TEST(PublishedSampling, LagOfHoldAndComputation) {
    struct Row {
        double part_of_rate;
        double hold_deg;
        double computation_deg;
    };
    for (const Row& row : {Row{10.0, 18.0, 36.0}, Row{20.0, 9.0, 18.0}, Row{30.0, 6.0, 12.0}}) {
        const std::vector<double> w{2.0 * pi / period / row.part_of_rate};
        const auto phase_deg = [&](double hold_s, double delay_s) {
            DesignLoop loop = loop_of("1/(s + 1)");
            loop.hold_period_s = hold_s;
            loop.computation_delay_s = delay_s;
            return std::arg(loop_points(loop, w).front().loop) * deg_per_rad;
        };
        const double plain = phase_deg(0.0, 0.0);
        EXPECT_NEAR(plain - phase_deg(period, 0.0), row.hold_deg, 1e-10);
        EXPECT_NEAR(plain - phase_deg(0.0, period), row.computation_deg, 1e-10);
    }
}

} // namespace
} // namespace cornerwright::outside
