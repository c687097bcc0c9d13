#pragma once

#include <QPointF>

#include <vector>

namespace cornerwright {

/// A curve of constant closed-loop magnitude or phase in the plane of open-loop phase (degrees, x)
/// and magnitude (decibel, y), from -360 to 0 degrees; it repeats every 360.
struct NicholsContour {
    double value = 0.0; ///< dB or degrees
    std::vector<QPointF> points;
};

/// Where |T| = `db` (not 0 dB exactly: that one runs to infinity and is cut at 80 dB).
/// Source: L = T/(1 - T) with T = L/(1 + L).
NicholsContour magnitudeContour(double db);

/// Where arg T = `degrees`, in (-360, 0) without -180.
NicholsContour phaseContour(double degrees);

/// Where |S| = `db` > 0: the curve has to stay outside. Source: L = 1/S - 1.
NicholsContour sensitivityContour(double db);

/// The contours that are drawn as ground.
const std::vector<NicholsContour>& magnitudeContours();
const std::vector<NicholsContour>& phaseContours();

} // namespace cornerwright
