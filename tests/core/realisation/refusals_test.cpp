// What cannot be realised is refused in one sentence that names the section and the bound.
#include "core/numerics/error.h"
#include "tests/core/realisation/realised.h"
#include "tests/core/realisation/section_builders.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace cornerwright::test {
namespace {

using testing::AllOf;
using testing::HasSubstr;

std::string refusal(const Chain& chain, double period_s, const Realisation& realisation) {
    try {
        realised(chain, period_s, realisation);
    } catch (const InputError& refused) {
        return refused.what();
    }
    return "accepted";
}

TEST(RealisationRefuses, MoreZerosThanPoles) {
    EXPECT_THAT(refusal({gain_of(3.0), zero_at(20.0)}, 0.001, realisation_of(Method::tustin)),
                HasSubstr("no more zeros than poles to realise, found 1 zeros and 0 poles"));
}

TEST(RealisationRefuses, ACornerAtOrAboveHalfTheRate) {
    Section fast = lead_of(100.0, 4000.0);
    fast.label = "phase lift";
    EXPECT_THAT(refusal({gain_of(1.0), fast}, 0.001, realisation_of(Method::tustin)),
                AllOf(HasSubstr("below pi/Ts = 3141.59 rad/s"),
                      HasSubstr("pole_rad_s 4000 rad/s in section 2 (lead \"phase lift\")")));
}

TEST(RealisationRefuses, AnInvariantMethodOnAnImproperSection) {
    for (const Method method : {Method::step_invariant, Method::ramp_invariant})
        EXPECT_THAT(refusal({zero_at(20.0), pole_at(90.0)}, 0.001, realisation_of(method)),
                    HasSubstr("section 1 (real_zero), which has more zeros than poles"));
}

TEST(RealisationRefuses, AMatchedFrequencyBeyondHalfTheRate) {
    Realisation realisation = realisation_of(Method::tustin_at);
    realisation.match_rad_s = 4000.0;
    EXPECT_THAT(refusal({pi_at(3.0)}, 0.001, realisation), HasSubstr("match_rad_s above 0"));
    realisation.match_rad_s = 0.0;
    EXPECT_THAT(refusal({pi_at(3.0)}, 0.001, realisation), HasSubstr("found 0 rad/s"));
}

TEST(RealisationRefuses, NoSamplePeriod) {
    EXPECT_THAT(refusal({pi_at(3.0)}, 0.0, realisation_of(Method::tustin)),
                HasSubstr("a sample period above 0 s"));
}

TEST(RealisationRefuses, AWordThatCannotHoldACoefficient) {
    // b0 = 300000 needs more than the 16 bits of the word even with every fraction bit given up.
    EXPECT_THAT(
        refusal({gain_of(300000.0)}, 0.001,
                realisation_of(Method::tustin, Structure::direct_form_1, fixed_format(16, 12))),
        AllOf(HasSubstr("a word of 16 bits with 12 fraction bits can hold"),
              HasSubstr("300000 in section 1")));
}

TEST(RealisationRefuses, ANumeratorThatRoundsToNothing) {
    EXPECT_THAT(
        refusal({gain_of(1e-4)}, 0.001,
                realisation_of(Method::tustin, Structure::direct_form_1, fixed_format(16, 8))),
        HasSubstr("whose numerator rounds to 0"));
}

TEST(RealisationRefuses, WordsThatDoNotExist) {
    const auto with = [](int word, int fraction) {
        return refusal(
            {pi_at(3.0)}, 0.001,
            realisation_of(Method::tustin, Structure::direct_form_1, fixed_format(word, fraction)));
    };
    EXPECT_THAT(with(24, 8), HasSubstr("word_bits of 16 or 32, found 24"));
    EXPECT_THAT(with(16, 16), HasSubstr("fraction_bits from 1 to 15"));
    EXPECT_THAT(with(16, 0), HasSubstr("found 0"));
}

TEST(RealisationRefuses, LimitsThatTheWordCannotHoldOrThatAreTurned) {
    Realisation realisation =
        realisation_of(Method::tustin, Structure::direct_form_1, fixed_format(16, 12));
    realisation.output_limits = OutputLimits{-20.0, 20.0}; // the word ends at 8
    EXPECT_THAT(refusal({pi_at(3.0)}, 0.001, realisation),
                HasSubstr("output limits within the range of the word, -8 to 7.99"));
    realisation.output_limits = OutputLimits{1.0, -1.0};
    EXPECT_THAT(refusal({pi_at(3.0)}, 0.001, realisation),
                HasSubstr("output limits with at_least below at_most"));
}

TEST(RealisationRefuses, AGainBeyondTheRangeOfSinglePrecision) {
    EXPECT_THAT(refusal({gain_of(1e39)}, 0.001,
                        realisation_of(Method::tustin, Structure::direct_form_1,
                                       {NumberFormat::Type::float32, 32, 28})),
                HasSubstr("coefficients that float32 can hold"));
}

} // namespace
} // namespace cornerwright::test
