#include "core/measurement/response_edits.h"

#include "core/numerics/error.h"

#include <cmath>
#include <complex>
#include <utility>

namespace cornerwright {
namespace {

void require_compensator(const MeasuredResponse& measured, std::span<const Complex> compensator) {
    if (compensator.size() != measured.response.size())
        throw InputError({},
                         std::to_string(measured.response.size()) + " values of the compensator",
                         std::to_string(compensator.size()));
    for (const Complex value : compensator)
        if (value == 0.0 || !std::isfinite(std::abs(value)))
            throw InputError({},
                             "a compensator that is neither zero nor infinite on the measured band",
                             "one that is");
}

void require_usable(const MeasuredResponse& measured, const char* found) {
    for (const Complex value : measured.response)
        if (value == 0.0 || !std::isfinite(value.real()) || !std::isfinite(value.imag()))
            throw InputError({}, "a measurement that gives a finite plant", found);
}

/// The coherence that tells a relative error `factor` times as great: the square of the error goes
/// as (1 - c)/c.
double coherence_of_error_times(double factor, double coherence) {
    const double grown = factor * factor * (1.0 - coherence);
    return coherence == 0.0 ? 0.0 : coherence / (coherence + grown);
}

} // namespace

MeasuredResponse with_sign_flipped(MeasuredResponse measured) {
    for (Complex& value : measured.response)
        value = -value;
    return measured;
}

MeasuredResponse with_delay_removed(MeasuredResponse measured, double delay_s) {
    for (std::size_t i = 0; i < measured.response.size(); ++i) {
        const double angle = measured.w_rad_s[i] * delay_s;
        measured.response[i] *= Complex{std::cos(angle), std::sin(angle)};
    }
    return measured;
}

MeasuredResponse with_least_coherence(const MeasuredResponse& measured, double least) {
    if (measured.coherence.empty())
        throw InputError({}, "a measurement with coherence, to leave points out by it", "none");
    MeasuredResponse kept;
    kept.averages = measured.averages;
    for (std::size_t i = 0; i < measured.w_rad_s.size(); ++i) {
        if (measured.coherence[i] < least)
            continue;
        kept.w_rad_s.push_back(measured.w_rad_s[i]);
        kept.response.push_back(measured.response[i]);
        kept.coherence.push_back(measured.coherence[i]);
    }
    if (kept.w_rad_s.size() < 2)
        throw InputError({}, "at least two points of that coherence",
                         std::to_string(kept.w_rad_s.size()));
    return kept;
}

MeasuredResponse edited(MeasuredResponse measured, const ReadOptions& options) {
    if (options.flip_sign)
        measured = with_sign_flipped(std::move(measured));
    if (options.remove_delay_s != 0.0)
        measured = with_delay_removed(std::move(measured), options.remove_delay_s);
    return measured;
}

MeasuredResponse plant_from_loop_gain(MeasuredResponse loop_gain,
                                      std::span<const Complex> compensator) {
    require_compensator(loop_gain, compensator);
    for (std::size_t i = 0; i < compensator.size(); ++i)
        loop_gain.response[i] /= compensator[i];
    require_usable(loop_gain, "a loop gain that does not");
    return loop_gain;
}

MeasuredResponse plant_from_closed_loop(MeasuredResponse closed_loop,
                                        std::span<const Complex> compensator) {
    require_compensator(closed_loop, compensator);
    for (std::size_t i = 0; i < compensator.size(); ++i) {
        const Complex t = closed_loop.response[i];
        closed_loop.response[i] = t / (compensator[i] * (1.0 - t));
        if (!closed_loop.coherence.empty() && t != 1.0)
            closed_loop.coherence[i] =
                coherence_of_error_times(1.0 / std::abs(1.0 - t), closed_loop.coherence[i]);
    }
    require_usable(closed_loop, "a closed loop of exactly 1 somewhere");
    return closed_loop;
}

MeasuredResponse plant_from(MeasuredQuantity quantity, MeasuredResponse measured,
                            std::span<const Complex> compensator) {
    switch (quantity) {
    case MeasuredQuantity::loop_gain:
        return plant_from_loop_gain(std::move(measured), compensator);
    case MeasuredQuantity::closed_loop:
        return plant_from_closed_loop(std::move(measured), compensator);
    case MeasuredQuantity::plant:
        break;
    }
    return measured;
}

} // namespace cornerwright
