// What a number format costs, against direct simulation or against values known beforehand.
#include "core/realisation/bit_true_run.h"
#include "core/realisation/precision.h"
#include "core/realisation/run_plan.h"
#include "core/realisation/white_input.h"
#include "tests/core/realisation/realised.h"
#include "tests/core/realisation/sample_compensators.h"
#include "tests/core/realisation/section_builders.h"

#include <gtest/gtest.h>

#include <algorithm>
#include <cmath>

namespace cornerwright::test {
namespace {

constexpr double period = 0.001;

DifferenceEquation fixed_equation(const Chain& chain, Structure structure, int word, int fraction) {
    return realised(chain, period,
                    realisation_of(Method::tustin, structure, fixed_format(word, fraction)));
}

/// A first-order lag b/(z - p) has the L1 norm b/(1 - p): its gain at rest, as its impulse
/// response never changes sign. The same is the largest of its frequency response.
TEST(SignalBounds, OfALagAreItsGainAtRest) {
    const DifferenceEquation equation =
        fixed_equation({gain_of(0.8), pole_at(20.0)}, Structure::direct_form_1, 32, 28);
    const std::vector<SignalBound> bounds = signal_bounds(equation);
    ASSERT_EQ(bounds.size(), 1u);
    EXPECT_NEAR(bounds[0].l1.value(), 0.8, 1e-6);
    EXPECT_NEAR(bounds[0].l_infinity.value(), 0.8, 1e-6);
    EXPECT_NEAR(bounds[0].headroom_bits.value(), std::log2(8.0 / 0.8), 1e-5);
}

/// The worst input is the sign of the impulse response turned back in time. It reaches the bound of
/// the output.
TEST(SignalBounds, AreReachedByTheWorstInput) {
    const Chain chain{gain_of(0.2), poles_at(300.0, 0.1), notch_at(500.0, 0.05, 0.4)};
    constexpr int length = 3000;
    std::vector<double> impulse;
    BitTrueRun once(realised(chain, period, realisation_of(Method::tustin)));
    for (int n = 0; n < length; ++n)
        impulse.push_back(once.step(n == 0 ? 1.0 : 0.0));
    for (const Structure structure : all_structures()) {
        const DifferenceEquation equation = fixed_equation(chain, structure, 32, 20);
        const std::string output =
            "section " + std::to_string(equation.sections.size()) + ", output";
        const std::vector<SignalBound> bounds = signal_bounds(equation);
        const auto bound = std::ranges::find(bounds, output, &SignalBound::signal);
        ASSERT_NE(bound, bounds.end());
        BitTrueRun worst(equation);
        double reached = 0.0;
        for (std::size_t n = length; n-- > 0;)
            reached = worst.step(impulse[n] > 0.0 ? 1.0 : -1.0);
        EXPECT_NEAR(reached, bound->l1.value(), 2e-3 * bound->l1.value()) << name_of(structure);
    }
}

TEST(SignalBounds, NoStateOverflowsForAFullScaleInput) {
    for (const SampleCompensator& sample : sample_compensators())
        for (const Structure structure : all_structures()) {
            const DifferenceEquation equation = fixed_equation(sample.chain, structure, 32, 24);
            const std::vector<SignalBound> bounds = signal_bounds(equation);
            for (std::size_t i = 0; i + 1 < bounds.size(); ++i) {
                if (!bounds[i].l1.is_value())
                    continue;
                EXPECT_GE(bounds[i].headroom_bits.value(), -1e-9)
                    << sample.name << ", " << name_of(structure) << ", " << bounds[i].signal;
            }
        }
}

TEST(SignalBounds, AreInfiniteBehindAnIntegrator) {
    const std::vector<SignalBound> bounds =
        signal_bounds(fixed_equation({pi_at(30.0)}, Structure::direct_form_1, 32, 24));
    ASSERT_FALSE(bounds.empty());
    EXPECT_EQ(bounds.back().l1, Figure::infinite());
    EXPECT_TRUE(
        signal_bounds(realised({pi_at(30.0)}, period, realisation_of(Method::tustin))).empty());
}

/// Rounding noise by theory agrees with the simulated one (J. B. Knowles, R. Edwards, Effect of a
/// finite-word-length computer in a sampled-data feedback system, Proc. IEE 112 (1965); citation
/// from memory) as far as independent uniform errors describe it.
TEST(RoundingNoise, OfTheoryAgreesWithSimulation) {
    const Chain chains[] = {{pole_at(20.0)},
                            {gain_of(0.4), poles_at(300.0, 0.3)},
                            {notch_at(800.0, 0.05, 0.5), poles_at(600.0, 0.7)}};
    for (const Chain& chain : chains)
        for (const Structure structure :
             {Structure::direct_form_1, Structure::direct_form_2_transposed}) {
            const RoundingNoise noise = rounding_noise(fixed_equation(chain, structure, 32, 20));
            ASSERT_TRUE(noise.theory_rms.is_value());
            EXPECT_GT(noise.simulated_rms, 0.7 * noise.theory_rms.value()) << name_of(structure);
            EXPECT_LT(noise.simulated_rms, 1.4 * noise.theory_rms.value()) << name_of(structure);
        }
}

/// One fraction bit more halves it.
TEST(RoundingNoise, HalvesWithEveryFractionBit) {
    const Chain chain{gain_of(0.4), poles_at(300.0, 0.3)};
    for (int bits = 16; bits < 24; bits += 2) {
        const double coarse =
            rounding_noise(fixed_equation(chain, Structure::direct_form_1, 32, bits)).simulated_rms;
        const double fine =
            rounding_noise(fixed_equation(chain, Structure::direct_form_1, 32, bits + 2))
                .simulated_rms;
        EXPECT_NEAR(coarse / fine, 4.0, 0.8) << bits;
    }
}

/// The classic dead band of y[n] = round(0.9 y[n-1]) (L. B. Jackson, An analysis of limit cycles
/// due to multiplicative rounding, Allerton 1969; citation from memory): stuck at up to
/// 0.5/(1 - 0.9) = 5 steps.
TEST(ZeroInputCycle, OfAFirstOrderLagIsTheKnownDeadBand) {
    DifferenceEquation equation = fixed_equation({pole_at(20.0)}, Structure::direct_form_1, 16, 8);
    const double step = std::ldexp(1.0, -8);
    DiscreteSection& section = equation.sections[0];
    const ZeroInputCycle cycle = zero_input_cycle(equation);
    const double pole = -section.a[1];
    ASSERT_TRUE(cycle.amplitude.is_value());
    EXPECT_GT(cycle.amplitude.value(), 0.0);
    EXPECT_EQ(cycle.period, 1);
    EXPECT_LE(cycle.amplitude.value(), 0.5 / (1.0 - pole) * step);
    EXPECT_GE(cycle.amplitude.value(), (0.5 / (1.0 - pole) - 1.0) * step);
}

TEST(ZeroInputCycle, IsNotFoundInDoublePrecision) {
    const ZeroInputCycle cycle =
        zero_input_cycle(realised({poles_at(600.0, 0.7)}, period, realisation_of(Method::tustin)));
    ASSERT_TRUE(cycle.amplitude.is_value());
    EXPECT_EQ(cycle.amplitude.value(), 0.0);
    EXPECT_EQ(cycle.period, 0);
}

/// By hand: the trapezoidal integrator of gain 2 adds 2 Ts e = 0.002 e a sample; with steps of
/// 2^-12 the increment rounds to nothing below half a step.
TEST(SmallestIntegratedError, OfAPlainIntegratorByHand) {
    const DifferenceEquation equation =
        fixed_equation({gain_of(2.0), plain_integrator()}, Structure::direct_form_1, 32, 12);
    const Figure smallest = smallest_integrated_error(equation);
    ASSERT_TRUE(smallest.is_value());
    BitTrueRun run(equation);
    run.step(0.0);
    const double step = std::ldexp(1.0, -12);
    for (int n = 0; n < 100; ++n)
        run.step(smallest.value() - step);
    const double stuck = run.step(smallest.value() - step);
    for (int n = 0; n < 100; ++n)
        EXPECT_EQ(run.step(smallest.value() - step), stuck);
    EXPECT_NEAR(smallest.value(), 0.5 * step / 0.002, 0.3 * 0.5 * step / 0.002);
}

TEST(SmallestIntegratedError, IsNotDeterminedWithoutAnIntegrator) {
    EXPECT_FALSE(
        smallest_integrated_error(fixed_equation({pole_at(20.0)}, Structure::direct_form_1, 32, 20))
            .is_determined());
}

/// A corner of 0.5 rad/s at 20 kHz: d = -2.5e-5. Near 1 a float32 coefficient has steps of 6e-8
/// (0.2 % of d) for one pole; of a pair 1 + a1 + a2 is 6e-10, below a step, and the pair is lost.
/// The delta form keeps seven digits.
TEST(PoleErrors, OfALowCornerAtAHighRateInSinglePrecision) {
    const Sampling sampling{1.0 / 20000.0, 0.0, true};
    const Realisation realisation = realisation_of(
        Method::tustin, Structure::direct_form_2_transposed, {NumberFormat::Type::float32, 32, 28});
    const auto errors_of = [&](const Chain& chain) {
        return pole_errors(chain, sampling, realisation);
    };
    for (const Chain& chain : {Chain{pole_at(0.5)}, Chain{poles_at(0.5, 0.7)}}) {
        const std::vector<PoleError> errors = errors_of(chain);
        ASSERT_EQ(errors.size(), 3u);
        const std::optional<PoleError> best = best_structure(errors);
        ASSERT_TRUE(best);
        EXPECT_EQ(best->structure, Structure::delta);
        EXPECT_LT(best->largest_relative_error.value(), 2e-7);
    }
    const std::vector<PoleError> single = errors_of({pole_at(0.5)});
    EXPECT_LT(single[0].largest_relative_error.value(), 3e-8 / 2.5e-5 * 1.01);
    EXPECT_GT(single[0].largest_relative_error.value(), 1e-6);
    const std::vector<PoleError> pair = errors_of({poles_at(0.5, 0.7)});
    EXPECT_TRUE(!pair[0].largest_relative_error.is_value() ||
                pair[0].largest_relative_error.value() > 0.5);
}

TEST(PoleErrors, VanishInDoublePrecisionAndLeaveIntegratorsAlone) {
    const std::vector<PoleError> errors =
        pole_errors({pi_at(30.0), poles_at(500.0, 0.4)}, Sampling{period, 0.0, true},
                    realisation_of(Method::matched_roots));
    for (const PoleError& error : errors)
        EXPECT_LT(error.largest_relative_error.value(), 1e-11);
}

TEST(SmallestFractionBits, IsTheFirstThatSatisfies) {
    const Chain chain{gain_of(0.7), lead_of(40.0, 400.0)};
    const Realisation realisation =
        realisation_of(Method::tustin, Structure::direct_form_1, fixed_format(16, 8));
    const Sampling sampling{period, 0.0, true};
    const Complex z = std::polar(1.0, 0.2);
    const Complex exact = response(discretise(chain, sampling, realisation_of(Method::tustin)), z);
    const auto within = [&](double tolerance) {
        return [&exact, &z, tolerance](const DifferenceEquation& equation) {
            return std::abs(response(equation, z) - exact) < tolerance * std::abs(exact);
        };
    };
    const std::optional<int> bits =
        smallest_fraction_bits(chain, sampling, realisation, within(0.01));
    ASSERT_TRUE(bits);
    Realisation choice = realisation;
    choice.number_format.fraction_bits = *bits;
    EXPECT_TRUE(within(0.01)(discretise(chain, sampling, choice)));
    for (int fewer = 1; fewer < *bits; ++fewer) {
        choice.number_format.fraction_bits = fewer;
        try {
            EXPECT_FALSE(within(0.01)(discretise(chain, sampling, choice))) << fewer;
        } catch (const std::runtime_error&) {
            continue; // cannot even hold the coefficients
        }
    }
    EXPECT_FALSE(smallest_fraction_bits(chain, sampling, realisation, within(0.0)));
}

} // namespace
} // namespace cornerwright::test
