// What people in the trade go by. Common practice, no source: each is a round figure, and the
// tolerance says how round.

#include "core/compensator/section.h"
#include "core/loop/loop_assessment.h"
#include "tests/core/loop/frequency_practice.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

/// A lead of that ratio at the frequency between its corners, where it lifts most.
Complex at_centre_of_lead(double ratio) {
    Section lead;
    lead.kind = SectionKind::lead;
    lead.zero_rad_s = 20.0;
    lead.pole_rad_s = 20.0 * ratio;
    return evaluate(roots_of(lead), Complex(0.0, characteristic_rad_s(lead)));
}

/// Common practice, no source: 45 degrees of phase margin go with about 25 % of overshoot on a loop
/// that is much like one of second order.
TEST(TradeFacts, FortyFiveDegreesGoWithAQuarterOfOvershoot) {
    // wn^2 / (s (s + 2 zeta wn)), zeta raised until the margin is 45 degrees.
    constexpr double wn = 30.0;
    LoopAssessment assessed;
    for (double zeta = 0.3; zeta < 0.6; zeta += 0.001) {
        assessed = assess_loop(practice::plant_alone({{}, {0.0, -2.0 * zeta * wn}, wn * wn}), {});
        if (assessed.figures.frequency.phase_margin_deg.value() >= 45.0)
            break;
    }
    EXPECT_NEAR(assessed.figures.frequency.phase_margin_deg.value(), 45.0, 0.1);
    EXPECT_NEAR(assessed.figures.time.overshoot_percent.value(), 25.0, 2.0);
}

/// Common practice, no source: a lead ratio of 4.6 gives 40 degrees.
TEST(TradeFacts, ARatioOfFourPointSixLiftsByFortyDegrees) {
    EXPECT_NEAR(std::arg(at_centre_of_lead(4.6)) * 180.0 / std::numbers::pi, 40.0, 0.1);
}

/// Common practice, no source: a ratio of 5 raises the gain by about 7 dB at the centre.
TEST(TradeFacts, ARatioOfFiveRaisesTheCentreBySevenDecibel) {
    EXPECT_NEAR(20.0 * std::log10(std::abs(at_centre_of_lead(5.0))), 7.0, 0.05);
}

} // namespace
} // namespace cornerwright
