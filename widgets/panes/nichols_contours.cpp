#include "widgets/panes/nichols_contours.h"

#include "core/numerics/complex.h"

#include <cmath>
#include <numbers>

namespace cornerwright {

namespace {

constexpr double degrees_of_radian = 180.0 / std::numbers::pi;
constexpr double highest_db = 80.0;

double sizeOf(double db) {
    return std::pow(10.0, db / 20.0);
}

/// Phase in (-360, 0].
void append(std::vector<QPointF>& points, Complex loop) {
    const double size = std::abs(loop);
    if (!std::isfinite(size) || size == 0.0)
        return;
    const double db = 20.0 * std::log10(size);
    if (std::abs(db) > highest_db)
        return;
    double phase = degrees_of_radian * std::arg(loop);
    if (phase > 0.0)
        phase -= 360.0;
    points.emplace_back(phase, db);
}

} // namespace

NicholsContour magnitudeContour(double db) {
    NicholsContour contour{db, {}};
    constexpr int steps = 240;
    // Both ends of an open contour are at 0 degrees: half a step inside, so that neither wraps.
    for (int i = 0; i < steps; ++i) {
        const double angle = -2.0 * std::numbers::pi * (i + 0.5) / steps;
        const Complex closed = std::polar(sizeOf(db), angle);
        append(contour.points, closed / (1.0 - closed));
    }
    if (db > 0.0 && !contour.points.empty())
        contour.points.push_back(contour.points.front());
    return contour;
}

NicholsContour phaseContour(double degrees) {
    NicholsContour contour{degrees, {}};
    for (double db = -highest_db; db <= highest_db; db += 1.0) {
        const Complex closed = std::polar(sizeOf(db), degrees / degrees_of_radian);
        append(contour.points, closed / (1.0 - closed));
    }
    return contour;
}

NicholsContour sensitivityContour(double db) {
    NicholsContour contour{db, {}};
    constexpr int steps = 180;
    for (int i = 0; i <= steps; ++i)
        append(contour.points,
               std::polar(1.0 / sizeOf(db), 2.0 * std::numbers::pi * i / steps) - 1.0);
    return contour;
}

const std::vector<NicholsContour>& magnitudeContours() {
    static const std::vector<NicholsContour> contours = [] {
        std::vector<NicholsContour> made;
        for (const double db : {-40.0, -20.0, -12.0, -6.0, -3.0, -1.0, 0.25, 1.0, 3.0, 6.0, 12.0})
            made.push_back(magnitudeContour(db));
        return made;
    }();
    return contours;
}

const std::vector<NicholsContour>& phaseContours() {
    static const std::vector<NicholsContour> contours = [] {
        std::vector<NicholsContour> made;
        for (const double degrees : {-350.0, -330.0, -300.0, -270.0, -240.0, -210.0, -195.0, -165.0,
                                     -150.0, -120.0, -90.0, -60.0, -30.0, -10.0})
            made.push_back(phaseContour(degrees));
        return made;
    }();
    return contours;
}

} // namespace cornerwright
