// Difference equations that textbooks print or give a rule for. Each test names its source; figures
// with more digits than a book prints are worked by hand from the book's formula.
#include "tests/core/realisation/realised.h"
#include "tests/core/realisation/section_builders.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright::test {
namespace {

constexpr double ulps = 4e-15; // relative: some units in the last digit of a double

void expect_near_relative(double found, double expected, const char* what) {
    EXPECT_NEAR(found, expected, ulps * std::max(1.0, std::abs(expected))) << what;
}

DiscreteSection only_section(const Chain& chain, double period_s, const Realisation& realisation) {
    const DifferenceEquation equation = realised(chain, period_s, realisation);
    EXPECT_EQ(equation.sections.size(), 1u);
    return equation.sections.front();
}

/// A. Tustin, J. IEE 94 IIA (1947); K. J. Astrom, B. Wittenmark, Computer-Controlled Systems, 3rd
/// ed., ch. 8 (citation from memory): 1/(s + 1) becomes (Ts/(2 + Ts)) (z + 1)/(z - (2 - Ts)/(2 +
/// Ts)).
TEST(PublishedEquations, TustinOfAFirstOrderLag) {
    const DiscreteSection section =
        only_section({pole_at(1.0)}, 0.1, realisation_of(Method::tustin));
    expect_near_relative(section.b[0], 0.1 / 2.1, "b0");
    expect_near_relative(section.b[1], 0.1 / 2.1, "b1");
    expect_near_relative(section.a[1], -1.9 / 2.1, "a1");
}

/// The same source: 1/s becomes the trapezoidal rule (Ts/2) (z + 1)/(z - 1).
TEST(PublishedEquations, TustinOfAnIntegratorIsTheTrapezoidalRule) {
    const DiscreteSection section =
        only_section({plain_integrator()}, 0.02, realisation_of(Method::tustin));
    EXPECT_EQ(section.b[0], 0.01);
    EXPECT_EQ(section.b[1], 0.01);
    EXPECT_EQ(section.a[1], -1.0);
}

/// The unwarped map moves a corner w to (2/Ts) atan(w Ts/2): Astrom and Wittenmark, as above; A. V.
/// Oppenheim, R. W. Schafer, Discrete-Time Signal Processing, ch. 7 (citations from memory). A 1
/// kHz notch lands at 892.83 Hz at 5 kHz and at 968.92 Hz at 10 kHz.
TEST(PublishedEquations, UnwarpedTustinMovesANotch) {
    const double wanted = 2.0 * std::numbers::pi * 1000.0;
    for (const auto& [rate, expected] :
         {std::pair(5000.0, 892.830767648), std::pair(10000.0, 968.921916140)}) {
        const DifferenceEquation equation =
            realised({notch_at(wanted, 0.0, 0.5)}, 1.0 / rate, realisation_of(Method::tustin));
        const Complex zero = roots_in_z_minus_1(equation).zeros.front();
        const double angle = std::abs(std::arg(1.0 + zero));
        EXPECT_NEAR(angle * rate / (2.0 * std::numbers::pi), expected, 1e-8);
    }
}

/// Prewarping, s = w0/tan(w0 Ts/2) (z - 1)/(z + 1), is exact at w0: the same sources. Coefficients
/// of the notch by hand: with c = 1/tan(w0 Ts/2) numerator and denominator are
/// (c^2 + 1 +- 2 damping c, 2 - 2 c^2, ...).
TEST(PublishedEquations, PrewarpedNotchByHand) {
    const double w0 = 800.0;
    const double period = 0.001;
    const DiscreteSection section =
        only_section({notch_at(w0, 0.02, 0.5)}, period, realisation_of(Method::tustin_at_corners));
    const double c = 1.0 / std::tan(w0 * period / 2.0);
    const double lead = c * c + 1.0 + 2.0 * 0.5 * c;
    expect_near_relative(section.b[0], (c * c + 1.0 + 2.0 * 0.02 * c) / lead, "b0");
    expect_near_relative(section.b[1], (2.0 - 2.0 * c * c) / lead, "b1");
    expect_near_relative(section.b[2], (c * c + 1.0 - 2.0 * 0.02 * c) / lead, "b2");
    expect_near_relative(section.a[1], (2.0 - 2.0 * c * c) / lead, "a1");
    expect_near_relative(section.a[2], (c * c + 1.0 - 2.0 * 0.5 * c) / lead, "a2");
    const DifferenceEquation equation =
        realised({notch_at(w0, 0.02, 0.5)}, period, realisation_of(Method::tustin_at_corners));
    const Complex at_corner = response(equation, std::polar(1.0, w0 * period));
    EXPECT_NEAR(std::abs(at_corner), 0.04, 1e-14); // 0.02/0.5
    EXPECT_NEAR(std::abs(response(
                    realised({notch_at(w0, 0.02, 0.5)}, period, realisation_of(Method::tustin)),
                    std::polar(1.0, w0 * period))),
                0.11716940071580, 1e-13); // what leaving the warping out costs
}

/// Matched roots: G. F. Franklin, J. D. Powell, M. L. Workman, Digital Control of Dynamic Systems,
/// 3rd ed., ch. 6 (citation from memory): 2/(s + 2), Ts = 0.1, becomes k (z + 1)/(z - e^-0.2) with
/// k = (1 - e^-0.2)/2.
TEST(PublishedEquations, MatchedRootsOfALag) {
    const DiscreteSection section =
        only_section({pole_at(2.0)}, 0.1, realisation_of(Method::matched_roots));
    const double pole = std::exp(-0.2);
    expect_near_relative(section.b[0], (1.0 - pole) / 2.0, "b0");
    expect_near_relative(section.b[1], (1.0 - pole) / 2.0, "b1");
    expect_near_relative(section.a[1], -pole, "a1");
}

/// The same rule on the lead (s/2 + 1)/(s/20 + 1): zero e^-0.2, pole e^-2, gain at rest 1.
TEST(PublishedEquations, MatchedRootsOfALead) {
    const DiscreteSection section =
        only_section({lead_of(2.0, 20.0)}, 0.1, realisation_of(Method::matched_roots));
    expect_near_relative(section.b[0], std::expm1(-2.0) / std::expm1(-0.2), "b0");
    expect_near_relative(section.b[1] / section.b[0], -0.81873075307798, "zero");
    expect_near_relative(section.a[1], -0.13533528323661, "pole");
}

/// Matched roots where the gain at rest is 0 or infinite, by hand from the rule of the project
/// format: in size at the own corner, at 0.1/Ts for an integrator.
TEST(PublishedEquations, MatchedRootsWithoutAGainAtRest) {
    const double period = 0.01;
    const DiscreteSection integrator =
        only_section({plain_integrator()}, period, realisation_of(Method::matched_roots));
    // |k (e^j0.1 + 1)/(e^j0.1 - 1)| = k/tan(0.05), wanted Ts/0.1
    expect_near_relative(integrator.b[0], period / 0.1 * std::tan(0.05), "integrator");
    const double w = 30.0;
    const DiscreteSection washout =
        only_section({washout_at(w)}, period, realisation_of(Method::matched_roots));
    const Complex z = std::polar(1.0, w * period);
    expect_near_relative(washout.b[0],
                         1.0 / std::sqrt(2.0) / std::abs((z - 1.0) / (z - std::exp(-w * period))),
                         "washout");
    EXPECT_EQ(washout.b[1], -washout.b[0]);
}

/// Hold equivalents of 2/(s + 2), Ts = 0.1: Franklin, Powell and Workman, as above.
TEST(PublishedEquations, HoldEquivalentsOfALag) {
    const DiscreteSection step =
        only_section({pole_at(2.0)}, 0.1, realisation_of(Method::step_invariant));
    EXPECT_EQ(step.b[0], 0.0);
    expect_near_relative(step.b[1], 0.18126924692202, "step, gain");
    expect_near_relative(step.a[1], -0.81873075307798, "pole");
    const DiscreteSection ramp =
        only_section({pole_at(2.0)}, 0.1, realisation_of(Method::ramp_invariant));
    expect_near_relative(ramp.b[0], 0.093653765389909, "ramp, gain");
    expect_near_relative(ramp.b[1] / ramp.b[0], 0.93552545556859, "ramp, zero");
    expect_near_relative(ramp.a[1], -0.81873075307798, "pole");
}

/// The delta operator without 1/Ts, d = z - 1: R. H. Middleton, G. C. Goodwin, Digital Control and
/// Estimation: A Unified Approach, ch. 2 (citation from memory). By hand for Tustin of 1/(s + 1):
/// b (z + 1)/(z - p) = b (d + 2)/(d + 1 - p) with 1 - p = 2 Ts/(2 + Ts).
TEST(PublishedEquations, DeltaFormByHand) {
    const DiscreteSection section =
        only_section({pole_at(1.0)}, 0.1, realisation_of(Method::tustin, Structure::delta));
    expect_near_relative(section.beta[0], 0.1 / 2.1, "beta0");
    expect_near_relative(section.beta[1], 0.2 / 2.1, "beta1");
    expect_near_relative(section.alpha[1], 0.2 / 2.1, "alpha1");
}

/// The same of second order: alpha1 = 2 + a1, alpha2 = 1 + a1 + a2, by hand from z = d + 1. The
/// matched poles of a damped pair are e^(-z w Ts) at angle +-w sqrt(1 - z^2) Ts.
TEST(PublishedEquations, DeltaFormOfADampedPairByHand) {
    const double w = 3.0;
    const double damping = 0.6;
    const double period = 0.05;
    const DiscreteSection section = only_section(
        {poles_at(w, damping)}, period, realisation_of(Method::matched_roots, Structure::delta));
    const double radius = std::exp(-damping * w * period);
    const double angle = w * std::sqrt(1.0 - damping * damping) * period;
    const double a1 = -2.0 * radius * std::cos(angle);
    const double a2 = radius * radius;
    EXPECT_NEAR(section.alpha[1], 2.0 + a1, 1e-15);
    EXPECT_NEAR(section.alpha[2], 1.0 + a1 + a2, 1e-15);
    // Two zeros at infinity go to z = -1: beta is b0 (d + 2)^2, and b0 4 = alpha2 at rest.
    EXPECT_NEAR(section.beta[2], section.alpha[2], 1e-15);
    EXPECT_NEAR(section.beta[1], section.alpha[2], 1e-15);
    EXPECT_NEAR(section.beta[0], section.alpha[2] / 4.0, 1e-15);
}

} // namespace
} // namespace cornerwright::test
