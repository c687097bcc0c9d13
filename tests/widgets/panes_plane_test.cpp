#include "widgets/panes/nichols_contours.h"
#include "widgets/panes/nyquist_plane.h"

#include <gtest/gtest.h>

#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

Complex loopAt(const QPointF& place) {
    return std::polar(std::pow(10.0, place.y() / 20.0), place.x() * std::numbers::pi / 180.0);
}

double decibels(Complex value) {
    return 20.0 * std::log10(std::abs(value));
}

TEST(NyquistPlane, LeavesTheUnitDiscAloneAndKeepsDirections) {
    for (const double radius : {0.01, 0.5, 1.0, 1.001, 30.0, 1e6})
        for (const double angle : {-3.0, -1.2, 0.0, 0.4, 2.5}) {
            const Complex value = std::polar(radius, angle);
            const QPointF drawn = toDrawn(value, RadiusScale::compressed);
            EXPECT_NEAR(std::atan2(drawn.y(), drawn.x()), angle, 1e-12);
            if (radius <= 1.0)
                EXPECT_EQ(drawn, QPointF(value.real(), value.imag()));
            else
                EXPECT_NEAR(std::hypot(drawn.x(), drawn.y()),
                            1.0 + std::log10(1.0 + (radius - 1.0) * std::numbers::ln10), 1e-9);
            EXPECT_NEAR(std::abs(fromDrawn(drawn, RadiusScale::compressed) - value), 0.0,
                        1e-9 * radius);
            EXPECT_EQ(fromDrawn(toDrawn(value, RadiusScale::linear), RadiusScale::linear), value);
        }
}

TEST(NyquistPlane, CompressedAxesSayTheValue) {
    const AxisStyle axis = nyquistAxis(RadiusScale::compressed);
    const auto ticks = axis.ticks({-3.6, 3.6}, 8);
    ASSERT_FALSE(ticks.empty());
    QStringList labels;
    for (std::size_t i = 0; i < ticks.size(); ++i)
        labels << axis.label(ticks, i);
    EXPECT_EQ(labels.join(QLatin1Char(' ')),
              QStringLiteral("\u2212100 \u221210 \u22121 0 1 10 100"));
    const auto wide = axis.ticks({-8.5, 8.5}, 4);
    EXPECT_LT(wide.size(), 8u);
    EXPECT_EQ(axis.label(wide, wide.size() - 1), QStringLiteral("10⁴"));
}

TEST(NyquistPlane, IsSmoothAtTheUnitCircle) {
    const auto drawn = [](double radius) { return toDrawn(radius, RadiusScale::compressed).x(); };
    constexpr double step = 1e-6;
    EXPECT_NEAR((drawn(1.0 + step) - drawn(1.0)) / step, (drawn(1.0) - drawn(1.0 - step)) / step,
                1e-4);
}

TEST(NicholsContours, LieWhereTheClosedLoopHasTheirMagnitude) {
    for (const NicholsContour& contour : magnitudeContours()) {
        ASSERT_GT(contour.points.size(), 20u);
        for (const QPointF& point : contour.points) {
            const Complex loop = loopAt(point);
            EXPECT_NEAR(decibels(loop / (1.0 + loop)), contour.value, 1e-6);
            EXPECT_GT(point.x(), -360.0);
            EXPECT_LE(point.x(), 0.0);
        }
    }
}

TEST(NicholsContours, LieWhereTheClosedLoopHasTheirPhase) {
    for (const NicholsContour& contour : phaseContours())
        for (const QPointF& point : contour.points) {
            const Complex loop = loopAt(point);
            const double phase = std::arg(loop / (1.0 + loop)) * 180.0 / std::numbers::pi;
            EXPECT_NEAR(std::remainder(phase - contour.value, 360.0), 0.0, 1e-6);
        }
}

TEST(NicholsContours, RunOnWithoutJumps) {
    for (const auto* contours : {&magnitudeContours(), &phaseContours()})
        for (const NicholsContour& contour : *contours)
            for (std::size_t i = 1; i < contour.points.size(); ++i)
                EXPECT_LT(std::abs(contour.points[i].x() - contour.points[i - 1].x()), 100.0)
                    << contour.value;
}

TEST(NicholsContours, TheSensitivityContourKeepsItsDistanceFromTheCriticalPoint) {
    for (const double db : {1.0, 3.5, 6.0, 12.0})
        for (const QPointF& point : sensitivityContour(db).points)
            EXPECT_NEAR(-decibels(1.0 + loopAt(point)), db, 1e-6);
}

} // namespace
} // namespace cornerwright
