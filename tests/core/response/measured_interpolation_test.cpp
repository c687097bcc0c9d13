#include "core/response/measured_interpolation.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

MeasuredResponse three_points() {
    MeasuredResponse measured;
    measured.w_rad_s = {1.0, 10.0, 100.0};
    measured.response = {std::polar(100.0, -1.0), std::polar(1.0, -3.0), std::polar(0.01, 2.0)};
    return measured;
}

TEST(MeasuredInterpolation, IsLinearOverLogFrequency) {
    const MeasuredInterpolation joined(three_points());
    const ResponseSample middle = joined.at(std::sqrt(10.0));
    EXPECT_NEAR(std::abs(middle.value), 10.0, 1e-12);
    EXPECT_NEAR(middle.phase_rad, -2.0, 1e-14);
    EXPECT_NEAR(middle.slope.real() * std::sqrt(10.0), -2.0, 1e-14);
}

TEST(MeasuredInterpolation, UnwrapsByNeighbours) {
    const MeasuredInterpolation joined(three_points());
    EXPECT_NEAR(joined.node(2).phase_rad, 2.0 - 2.0 * std::numbers::pi, 1e-14);
    EXPECT_NEAR(joined.log_slope(1).imag() * std::log(10.0), 5.0 - 2.0 * std::numbers::pi, 1e-14);
}

TEST(MeasuredInterpolation, GivesThePointsThemselves) {
    const MeasuredResponse measured = three_points();
    const MeasuredInterpolation joined(measured);
    for (std::size_t i = 0; i < measured.w_rad_s.size(); ++i)
        EXPECT_LT(std::abs(joined.at(measured.w_rad_s[i]).value - measured.response[i]),
                  1e-14 * std::abs(measured.response[i]));
}

TEST(MeasuredInterpolation, RandomErrorOfCoherenceAndAverages) {
    MeasuredResponse measured = three_points();
    EXPECT_FALSE(MeasuredInterpolation(measured).random_error(5.0));
    measured.coherence = {1.0, 0.8, 0.8};
    EXPECT_FALSE(MeasuredInterpolation(measured).random_error(5.0)) << "averages unknown";
    measured.averages = 10.0;
    // sqrt((1 - c)/(2 n c)), Bendat and Piersol, Random Data, ch. 9 (from memory).
    EXPECT_NEAR(*MeasuredInterpolation(measured).random_error(50.0), std::sqrt(0.2 / 16.0), 1e-15);
    EXPECT_NEAR(*MeasuredInterpolation(measured).random_error(1.0), 0.0, 1e-15);
}

} // namespace
} // namespace cornerwright
