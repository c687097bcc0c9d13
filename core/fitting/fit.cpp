#include "core/fitting/fit.h"

#include "core/fitting/order_search.h"
#include "core/numerics/error.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

void check(const MeasuredResponse& measured, const FitOptions& options) {
    if (options.order && (*options.order < 1 || *options.order > highest_fit_order))
        throw InputError({}, "an order from 1 to " + std::to_string(highest_fit_order),
                         std::to_string(*options.order));
    if (options.dead_time_s && !(*options.dead_time_s >= 0.0))
        throw InputError({}, "a dead time of zero or above", std::to_string(*options.dead_time_s));
    const std::size_t least = static_cast<std::size_t>(options.order.value_or(1)) + 2;
    if (measured.w_rad_s.size() < least)
        throw InputError({}, "at least " + std::to_string(least) + " points for this order",
                         std::to_string(measured.w_rad_s.size()));
}

/// Frequencies over `scale`, so that roots are of order 1 and their powers stay in range.
FitPoints scaled_points(const MeasuredResponse& measured, double scale) {
    FitPoints points{measured.w_rad_s, measured.response, fit_weights(measured)};
    for (double& w : points.w)
        w /= scale;
    return points;
}

PlantModel unscaled(const FactoredModel& model, double scale) {
    PlantModel plant = plant_model_of(model);
    for (Complex& zero : plant.roots.zeros)
        zero *= scale;
    for (Complex& pole : plant.roots.poles)
        pole *= scale;
    const int relative_degree = degree_of(model.poles) - degree_of(model.zeros);
    plant.roots.gain *= std::pow(scale, relative_degree);
    plant.dead_time_s /= scale;
    return plant;
}

/// model/measured - 1 at one point.
Complex relative_error(const PlantModel& model, const MeasuredResponse& measured,
                       std::size_t point) {
    const double w = measured.w_rad_s[point];
    const Complex response =
        evaluate(model.roots, {0.0, w}) * std::polar(1.0, -w * model.dead_time_s);
    return response / measured.response[point] - 1.0;
}

} // namespace

std::vector<double> fit_weights(const MeasuredResponse& measured) {
    constexpr double greatest_coherence = 1.0 - 1e-6;
    constexpr double least_coherence = 1e-6;
    std::vector<double> weights(measured.w_rad_s.size(), 1.0);
    if (measured.coherence.empty())
        return weights;
    double sum = 0.0;
    for (std::size_t i = 0; i < weights.size(); ++i) {
        const double c = std::clamp(measured.coherence[i], least_coherence, greatest_coherence);
        weights[i] = std::sqrt(c / (1.0 - c));
        sum += weights[i] * weights[i];
    }
    const double scale = std::sqrt(static_cast<double>(weights.size()) / sum);
    for (double& weight : weights)
        weight *= scale;
    return weights;
}

double misfit_db(const PlantModel& model, const MeasuredResponse& measured) {
    const std::vector<double> weights = fit_weights(measured);
    double sum = 0.0;
    for (std::size_t i = 0; i < weights.size(); ++i)
        sum += std::norm(weights[i] * relative_error(model, measured, i));
    return 20.0 * std::log10(1.0 + std::sqrt(sum / static_cast<double>(weights.size())));
}

std::vector<double> misfits_db(const PlantModel& model, const MeasuredResponse& measured) {
    std::vector<double> misfits(measured.w_rad_s.size());
    for (std::size_t i = 0; i < misfits.size(); ++i)
        misfits[i] = 20.0 * std::log10(1.0 + std::abs(relative_error(model, measured, i)));
    return misfits;
}

FitResult fit_model(const MeasuredResponse& measured, const FitOptions& options) {
    check(measured, options);
    const double scale = std::sqrt(measured.w_rad_s.front()) * std::sqrt(measured.w_rad_s.back());
    SearchTask task{scaled_points(measured, scale), {}, options.stable};
    if (options.dead_time_s)
        task.dead_time = *options.dead_time_s * scale;

    const auto points = static_cast<int>(measured.w_rad_s.size());
    const int highest = std::min({options.highest_order, highest_fit_order, points - 2});
    const Candidate found = options.order ? fit_order(task, *options.order, nullptr)
                                          : fit_best_order(task, highest, options.proceed);
    FitResult result;
    result.model = unscaled(settled(task, found).model, scale);
    result.misfit_db = misfit_db(result.model, measured);
    result.order = static_cast<int>(result.model.roots.poles.size());
    return result;
}

} // namespace cornerwright
