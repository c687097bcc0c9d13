// What each method promises, on every kind of section.
#include "core/compensator/chain.h"
#include "tests/core/realisation/realised.h"
#include "tests/core/realisation/sample_compensators.h"
#include "tests/core/realisation/section_builders.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright::test {
namespace {

constexpr double period = 0.001;

Complex on_circle(double w) {
    return std::polar(1.0, w * period);
}

std::vector<Section> one_of_each_warped_kind() {
    return {lead_of(40.0, 400.0), lag_of(80.0, 9.0),          pole_at(700.0),
            poles_at(900.0, 0.3), notch_at(800.0, 0.02, 0.5), washout_at(50.0)};
}

TEST(MethodProperties, TustinAtCornersIsExactAtTheOwnFrequencyOfEachSection) {
    for (const Section& section : one_of_each_warped_kind()) {
        const double w = characteristic_rad_s(section);
        const DifferenceEquation equation =
            realised({section}, period, realisation_of(Method::tustin_at_corners));
        const Complex exact = evaluate(roots_of(section), Complex(0.0, w));
        EXPECT_LT(std::abs(response(equation, on_circle(w)) - exact), 1e-12 * std::abs(exact))
            << name_of(section.kind);
    }
}

TEST(MethodProperties, TustinAtOneFrequencyIsExactThereForTheWholeCompensator) {
    Realisation realisation = realisation_of(Method::tustin_at);
    realisation.match_rad_s = 350.0;
    for (const SampleCompensator& sample : sample_compensators()) {
        const Complex exact = evaluate(roots_of(sample.chain), Complex(0.0, 350.0));
        const DifferenceEquation equation = realised(sample.chain, period, realisation);
        EXPECT_LT(std::abs(response(equation, on_circle(350.0)) - exact), 1e-11 * std::abs(exact))
            << sample.name;
    }
}

TEST(MethodProperties, TustinIsTheSubstitutionEverywhere) {
    for (const SampleCompensator& sample : sample_compensators()) {
        const DifferenceEquation equation =
            realised(sample.chain, period, realisation_of(Method::tustin));
        for (const double w : {0.3, 7.0, 110.0, 1200.0, 2900.0}) {
            const Complex z = on_circle(w);
            const Complex s = 2.0 / period * (z - 1.0) / (z + 1.0);
            const Complex exact = evaluate(roots_of(sample.chain), s);
            EXPECT_LT(std::abs(response(equation, z) - exact), 1e-11 * std::abs(exact))
                << sample.name << " at " << w;
        }
    }
}

TEST(MethodProperties, MatchedRootsAreTheExponentialsOfTheContinuousOnes) {
    for (const SampleCompensator& sample : sample_compensators()) {
        const RootForm continuous = roots_of(sample.chain);
        const RootForm discrete = roots_in_z_minus_1(realised(
            sample.chain, period, realisation_of(Method::matched_roots, Structure::delta)));
        for (const Complex& pole : continuous.poles) {
            double nearest = 1.0;
            for (const Complex& d : discrete.poles)
                nearest = std::min(nearest, std::abs(1.0 + d - std::exp(pole * period)));
            // A double pole splits by the square root of what rounding does to the coefficients.
            const bool single = std::ranges::count(continuous.poles, pole) == 1;
            EXPECT_LT(nearest, single ? 1e-12 : 1e-8) << sample.name;
        }
    }
}

/// Samples of the response of one rounded section to an input sequence.
template <class Input>
std::vector<double> samples_of(const DiscreteSection& section, Input input, int count) {
    std::vector<double> y(2, 0.0);
    for (int n = 0; n < count; ++n) {
        const auto x = [&](int k) { return n - k < 0 ? 0.0 : input(n - k); };
        const std::size_t at = y.size();
        y.push_back(section.b[0] * x(0) + section.b[1] * x(1) + section.b[2] * x(2) -
                    section.a[1] * y[at - 1] - section.a[2] * y[at - 2]);
    }
    return {y.begin() + 2, y.end()};
}

/// Step and ramp responses in closed form: K. Ogata, Modern Control Engineering, ch. 5 (citation
/// from memory), for w = 600 rad/s and damping 0.25.
struct DampedPair {
    double w = 600.0;
    double damping = 0.25;
    double fast() const { return w * std::sqrt(1.0 - damping * damping); }

    double step(double t) const {
        const double decay = std::exp(-damping * w * t);
        return 1.0 - decay * (std::cos(fast() * t) + damping * w / fast() * std::sin(fast() * t));
    }
    double ramp(double t) const {
        const double decay = std::exp(-damping * w * t);
        const double lag = 2.0 * damping / w;
        return t - lag +
               decay * (lag * std::cos(fast() * t) +
                        (2.0 * damping * damping - 1.0) / fast() * std::sin(fast() * t));
    }
};

TEST(MethodProperties, StepInvariantRepeatsTheStepResponse) {
    const DampedPair pair;
    const DifferenceEquation equation =
        realised({poles_at(pair.w, pair.damping)}, period, realisation_of(Method::step_invariant));
    const std::vector<double> y = samples_of(
        equation.sections[0], [](int) { return 1.0; }, 60);
    for (std::size_t n = 0; n < y.size(); ++n)
        EXPECT_NEAR(y[n], pair.step(static_cast<double>(n) * period), 1e-13) << n;
}

TEST(MethodProperties, RampInvariantRepeatsTheRampResponse) {
    const DampedPair pair;
    const DifferenceEquation equation =
        realised({poles_at(pair.w, pair.damping)}, period, realisation_of(Method::ramp_invariant));
    const std::vector<double> y = samples_of(
        equation.sections[0], [](int n) { return n * period; }, 60);
    for (std::size_t n = 0; n < y.size(); ++n)
        EXPECT_NEAR(y[n], pair.ramp(static_cast<double>(n) * period), 1e-15) << n;
}

TEST(MethodProperties, EveryStructureIsTheSameFunctionInDoublePrecision) {
    for (const SampleCompensator& sample : sample_compensators()) {
        const DifferenceEquation direct =
            realised(sample.chain, period, realisation_of(Method::tustin_at_corners));
        const DifferenceEquation delta = realised(
            sample.chain, period, realisation_of(Method::tustin_at_corners, Structure::delta));
        for (const double w : {2.0, 60.0, 900.0}) {
            const Complex one = response(direct, on_circle(w));
            EXPECT_LT(std::abs(response(delta, on_circle(w)) - one), 1e-9 * std::abs(one))
                << sample.name << " at " << w;
        }
    }
}

TEST(MethodProperties, AnIntegratorStaysOneInEveryFormat) {
    for (const NumberFormat& format : all_formats())
        for (const Structure structure : all_structures()) {
            const DifferenceEquation equation =
                realised({gain_of(0.9), pi_at(30.0), poles_at(500.0, 0.4)}, period,
                         realisation_of(Method::tustin, structure, format));
            const RootForm roots = roots_in_z_minus_1(equation);
            EXPECT_EQ(std::ranges::count(roots.poles, Complex(0.0)), 1)
                << words_of(equation.realisation);
        }
}

TEST(MethodProperties, SectionsSwitchedOffDoNotCount) {
    Section off = notch_at(700.0, 0.1, 0.5);
    off.enabled = false;
    EXPECT_EQ(realised({gain_of(2.0), off, pi_at(3.0)}, period, realisation_of(Method::tustin)),
              realised({gain_of(2.0), pi_at(3.0)}, period, realisation_of(Method::tustin)));
}

} // namespace
} // namespace cornerwright::test
