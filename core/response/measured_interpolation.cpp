#include "core/response/measured_interpolation.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {

MeasuredInterpolation::MeasuredInterpolation(const MeasuredResponse& measured)
    : w_(measured.w_rad_s), coherence_(measured.coherence), averages_(measured.averages) {
    log_w_.reserve(w_.size());
    log_magnitude_.reserve(w_.size());
    phase_rad_.reserve(w_.size());
    for (std::size_t i = 0; i < w_.size(); ++i) {
        log_w_.push_back(std::log(w_[i]));
        log_magnitude_.push_back(std::log(std::abs(measured.response[i])));
        double phase = std::arg(measured.response[i]);
        if (i > 0)
            phase += 2.0 * std::numbers::pi *
                     std::round((phase_rad_.back() - phase) / (2.0 * std::numbers::pi));
        phase_rad_.push_back(phase);
    }
}

std::size_t MeasuredInterpolation::piece_of(double w_rad_s) const {
    const auto above = std::upper_bound(w_.begin(), w_.end(), w_rad_s);
    const auto index = static_cast<std::size_t>(above - w_.begin());
    return std::clamp<std::size_t>(index, 1, std::max<std::size_t>(w_.size(), 2) - 1) - 1;
}

Complex MeasuredInterpolation::log_slope(std::size_t index) const {
    const std::size_t i = std::min(index, w_.size() - 2);
    const double step = log_w_[i + 1] - log_w_[i];
    return {(log_magnitude_[i + 1] - log_magnitude_[i]) / step,
            (phase_rad_[i + 1] - phase_rad_[i]) / step};
}

ResponseSample MeasuredInterpolation::node(std::size_t index) const {
    return {std::polar(std::exp(log_magnitude_[index]), phase_rad_[index]), log_magnitude_[index],
            phase_rad_[index], log_slope(index) / w_[index]};
}

ResponseSample MeasuredInterpolation::at(double w_rad_s) const {
    const std::size_t i = piece_of(w_rad_s);
    const Complex slope = log_slope(i);
    const double step = std::log(w_rad_s) - log_w_[i];
    const double log_magnitude = log_magnitude_[i] + slope.real() * step;
    const double phase = phase_rad_[i] + slope.imag() * step;
    return {std::polar(std::exp(log_magnitude), phase), log_magnitude, phase, slope / w_rad_s};
}

std::optional<double> MeasuredInterpolation::random_error(double w_rad_s) const {
    if (coherence_.size() != w_.size() || averages_ <= 0.0)
        return std::nullopt;
    const std::size_t i = piece_of(w_rad_s);
    const double step = (std::log(w_rad_s) - log_w_[i]) / (log_w_[i + 1] - log_w_[i]);
    const double coherence = coherence_[i] + (coherence_[i + 1] - coherence_[i]) * step;
    if (coherence <= 0.0)
        return std::nullopt;
    return std::sqrt(std::max(0.0, 1.0 - coherence) / (2.0 * averages_ * coherence));
}

} // namespace cornerwright
