#pragma once

#include "core/plant/plant_case.h"
#include "core/response/measured_response.h"

#include <functional>
#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

struct FitOptions {
    /// Number of poles; empty: the order is chosen by the Bayesian information criterion.
    std::optional<int> order;
    /// The most poles that an automatic choice tries.
    int highest_order = 20;
    /// Dead time, >= 0; empty: found together with the roots.
    std::optional<double> dead_time_s = 0.0;
    /// Poles right of the axis are not allowed.
    bool stable = false;
    /// Told the progress from 0 to 1; returns false to stop with the best found so far.
    std::function<bool(double)> proceed;
};

struct FitResult {
    PlantModel model;
    double misfit_db = 0.0; ///< 20 lg(1 + weighted rms relative error)
    int order = 0;          ///< number of poles
    std::vector<std::string> notes;
};

/// Highest order that may be asked for.
inline constexpr int highest_fit_order = 40;

/// Rational model with dead time of a measured response: proper, real coefficients, conjugate pairs
/// exact. Relative errors are weighted by sqrt(c/(1 - c)) of the coherence c, scaled to mean square
/// 1; all by 1 where no coherence was measured.
///
/// Method: pole relocation in partial fractions (B. Gustavsen, A. Semlyen, Rational approximation
/// of frequency domain responses by vector fitting, IEEE Trans. Power Delivery 14, 1999; relaxed
/// form of B. Gustavsen, 21, 2006; citations from memory), then Levenberg-Marquardt on the factored
/// form, in which every factor counts in relative terms over any number of decades.
///
/// Throws InputError where the options make no sense or there are too few points for the order.
FitResult fit_model(const MeasuredResponse& measured, const FitOptions& options);

/// The weight of each point in the misfit, mean square 1. A coherence of 1 counts as
/// 1 - 1e-6, so that no single point outweighs all others.
std::vector<double> fit_weights(const MeasuredResponse& measured);

/// 20 lg(1 + m), m the weighted rms of model/measured - 1.
double misfit_db(const PlantModel& model, const MeasuredResponse& measured);

/// 20 lg(1 + |model/measured - 1|) at every point, unweighted: where a misfit comes from.
std::vector<double> misfits_db(const PlantModel& model, const MeasuredResponse& measured);

} // namespace cornerwright
