#pragma once

#include "core/loop/loop.h"
#include "core/response/measured_interpolation.h"
#include "core/response/rational_response.h"

#include <memory>
#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// The loop at one frequency, with the slopes that the search for crossings and peaks runs on.
struct CurvePoint {
    double w_rad_s = 0.0;
    Complex compensator;
    Complex plant; ///< held and delayed as the loop's definition says
    Complex loop;
    Complex sensitivity;
    Complex complementary;
    double compensator_log = 0.0; ///< ln|C|
    double plant_log = 0.0;
    double plant_phase_rad = 0.0; ///< accumulated, as all phases here
    double loop_log = 0.0;
    double loop_phase_rad = 0.0;
    Complex compensator_slope;       ///< d ln C / dw
    Complex slope_before;            ///< d ln L / dw towards lower frequencies
    Complex slope_after;             ///< the same towards higher ones; differs on measured points
    bool gap_after = false;          ///< an axis pole, or a zero of L, lies behind this point
    bool drawn = true;               ///< false: serves the search only
    std::optional<std::size_t> node; ///< index of the measured point that lies here
};

/// Suprema approached towards an end of the axis, as plain magnitudes (infinite allowed). What
/// cannot be known (beyond a measurement) is empty.
struct EndLimits {
    std::optional<double> sensitivity;
    std::optional<double> complementary;
    std::optional<double> control_effort;
};

/// One loop along its frequency axis: what every figure is computed from, whatever the plant and
/// whether C is continuous or a difference equation.
class LoopCurve {
  public:
    virtual ~LoopCurve() = default;

    /// The loop anywhere between the first and the last point.
    virtual CurvePoint at(double w_rad_s) const = 0;

    /// Points that follow every root, ascending.
    std::vector<CurvePoint> points;

    bool measured = false;
    bool realised = false;
    EndLimits at_zero;
    EndLimits at_end;               ///< at infinity; empty where the axis ends with the points
    bool ends_at_half_rate = false; ///< the last point is pi/Ts
    int integrators = 0;            ///< of L: its order at s = 0 (z = 1), zeros counting negative
    /// lim s^integrators L (realised: of ((z-1)/Ts)^integrators L); only its sign for a
    /// measurement, 0 where that cannot be told.
    double low_gain = 0.0;
    std::optional<double> loop_at_zero;   ///< L(0) of a model where it is finite
    int open_right_poles = 0;             ///< of L
    bool turns_without_end = false;       ///< dead time or hold: phase crossings without end
    double listed_up_to_rad_s = HUGE_VAL; ///< last w with |L| = 0.01 where it turns without end
    /// |L| towards infinity where it does not roll off, else 0.
    double flat_end = 0.0;
    std::vector<std::string> remarks;

    const MeasuredInterpolation* interpolation() const { return interpolation_.get(); }

  protected:
    std::shared_ptr<const MeasuredInterpolation> interpolation_;
};

/// `closed_loop_poles` (s, or z for the realised loop) only guide the grid.
std::unique_ptr<LoopCurve> loop_curve(const DesignLoop& loop,
                                      const ComplexVector& closed_loop_poles);
std::unique_ptr<LoopCurve> loop_curve(const RealisedLoop& loop,
                                      const ComplexVector& closed_loop_poles_z);

} // namespace cornerwright
