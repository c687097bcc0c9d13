// The arithmetic of one sample, by hand.
#include "core/realisation/bit_true_run.h"
#include "tests/core/realisation/realised.h"
#include "tests/core/realisation/sample_compensators.h"
#include "tests/core/realisation/section_builders.h"

#include <gtest/gtest.h>

#include <cmath>

namespace cornerwright::test {
namespace {

constexpr double period = 0.001;

DifferenceEquation fixed_gain(double gain, int word_bits, int fraction_bits) {
    return realised({gain_of(gain)}, period,
                    realisation_of(Method::tustin, Structure::direct_form_1,
                                   fixed_format(word_bits, fraction_bits)));
}

TEST(BitTrueRun, RoundsToNearestWithTiesAwayFromZero) {
    // Steps of 1/4; gain 1/2 makes 1/8 of 1/4: a tie.
    BitTrueRun run(fixed_gain(0.5, 16, 2));
    EXPECT_EQ(run.step(0.25), 0.25);
    EXPECT_EQ(run.step(-0.25), -0.25);
    EXPECT_EQ(run.step(0.75), 0.5);
    EXPECT_EQ(run.step(-0.75), -0.5);
    EXPECT_EQ(run.step(0.5), 0.25);
}

TEST(BitTrueRun, SaturatesAtBothEndsOfTheWord) {
    BitTrueRun run(fixed_gain(3.0, 16, 13)); // -4 ... 4 - 2^-13
    EXPECT_EQ(run.step(3.5), 4.0 - std::ldexp(1.0, -13));
    EXPECT_EQ(run.step(-3.5), -4.0);
    EXPECT_EQ(run.step(100.0), 4.0 - std::ldexp(1.0, -13)); // the input is cut off as well
}

/// In double precision every structure gives the sums of the written difference equation.
TEST(BitTrueRun, FollowsTheDifferenceEquation) {
    for (const Structure structure : all_structures()) {
        const DifferenceEquation equation =
            realised({notch_at(800.0, 0.1, 0.5), lead_of(40.0, 300.0)}, period,
                     realisation_of(Method::tustin_at_corners, structure));
        BitTrueRun run(equation);
        std::vector<double> x{0.0, 0.0};
        std::vector<std::vector<double>> y(equation.sections.size(), {0.0, 0.0});
        for (int n = 0; n < 200; ++n) {
            double signal = std::sin(0.1 * n) + (n % 7 == 0 ? 1.0 : 0.0);
            const double output = run.step(signal);
            for (std::size_t i = 0; i < equation.sections.size(); ++i) {
                const DiscreteSection& s = equation.sections[i];
                const std::vector<double>& input = i == 0 ? x : y[i - 1];
                const std::size_t now = y[i].size();
                if (i == 0)
                    x.push_back(signal);
                y[i].push_back(s.b[0] * input[now] + s.b[1] * input[now - 1] +
                               s.b[2] * input[now - 2] - s.a[1] * y[i][now - 1] -
                               s.a[2] * y[i][now - 2]);
                signal = y[i].back();
            }
            ASSERT_NEAR(output, signal, 1e-10) << name_of(structure) << " " << n;
        }
    }
}

TEST(BitTrueRun, StartsBumplessAtAGivenOutput) {
    for (const Structure structure : all_structures())
        for (const NumberFormat& format : all_formats()) {
            BitTrueRun run(realised({gain_of(0.9), pi_at(30.0)}, period,
                                    realisation_of(Method::tustin, structure, format)));
            run.reset(0.375);
            for (int n = 0; n < 50; ++n)
                EXPECT_EQ(run.step(0.0), 0.375) << name_of(structure) << " " << n;
        }
}

/// Conditional integration: after a long time against the limit the output leaves it at the first
/// sample at which the error has turned.
TEST(BitTrueRun, DoesNotWindUpAtALimit) {
    for (const Structure structure : all_structures())
        for (const NumberFormat& format : all_formats()) {
            Realisation realisation = realisation_of(Method::tustin, structure, format);
            realisation.output_limits = OutputLimits{-0.5, 0.75};
            BitTrueRun run(realised({gain_of(0.9), pi_at(30.0)}, period, realisation));
            double output = 0.0;
            for (int n = 0; n < 5000; ++n)
                output = run.step(0.5);
            EXPECT_EQ(output, 0.75) << words_of(realisation);
            EXPECT_LT(run.step(-0.1), 0.75) << words_of(realisation);
            for (int n = 0; n < 5000; ++n)
                output = run.step(-0.5);
            EXPECT_EQ(output, -0.5) << words_of(realisation);
            EXPECT_GT(run.step(0.1), -0.5) << words_of(realisation);
        }
}

TEST(BitTrueRun, InitForgetsEverything) {
    const DifferenceEquation equation = realised({gain_of(0.9), pi_at(30.0), poles_at(400.0, 0.5)},
                                                 period, realisation_of(Method::tustin));
    BitTrueRun fresh(equation);
    BitTrueRun used(equation);
    for (int n = 0; n < 30; ++n)
        used.step(1.0);
    used.init();
    for (int n = 0; n < 30; ++n)
        EXPECT_EQ(used.step(0.3), fresh.step(0.3));
}

} // namespace
} // namespace cornerwright::test
