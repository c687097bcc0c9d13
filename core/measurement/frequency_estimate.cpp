#include "core/measurement/frequency_estimate.h"

#include "core/measurement/stepped_sine.h"
#include "core/numerics/error.h"
#include "core/numerics/fourier_transform.h"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <span>

namespace cornerwright {
namespace {

/// Fewer samples make no spectrum worth the name.
constexpr std::size_t shortest_piece = 8;

[[noreturn]] void refuse(std::string expected, std::string found) {
    throw InputError({}, std::move(expected), std::move(found));
}

/// Periodic windows: the sample behind the last would equal the first.
std::vector<double> window_of(EstimateOptions::Window kind, std::size_t length) {
    std::vector<double> window(length, 1.0);
    for (std::size_t n = 0; n < length; ++n) {
        const double angle =
            2.0 * std::numbers::pi * static_cast<double>(n) / static_cast<double>(length);
        switch (kind) {
        case EstimateOptions::Window::hann:
            window[n] = 0.5 - 0.5 * std::cos(angle);
            break;
        case EstimateOptions::Window::hamming:
            window[n] = 0.54 - 0.46 * std::cos(angle);
            break;
        case EstimateOptions::Window::blackman:
            window[n] = 0.42 - 0.5 * std::cos(angle) + 0.08 * std::cos(2.0 * angle);
            break;
        case EstimateOptions::Window::rectangular:
            break;
        }
    }
    return window;
}

/// Offset at the middle and slope a sample, as taken off a piece.
struct Trend {
    double middle = 0.0;
    double slope = 0.0;
};

Trend trend_of(std::span<const double> piece, EstimateOptions::Detrend kind) {
    Trend trend;
    if (kind == EstimateOptions::Detrend::none)
        return trend;
    const auto count = static_cast<double>(piece.size());
    const double centre = (count - 1.0) / 2.0;
    double moment = 0.0;
    for (std::size_t n = 0; n < piece.size(); ++n) {
        trend.middle += piece[n] / count;
        moment += piece[n] * (static_cast<double>(n) - centre);
    }
    // Sum of squared distances from the centre: N (N^2 - 1) / 12.
    if (kind == EstimateOptions::Detrend::line)
        trend.slope = 12.0 * moment / (count * (count * count - 1.0));
    return trend;
}

/// What the channels are divided by before the transform that they share, so that the rounding of
/// one does not hide the other.
struct Sizes {
    double excitation = 1.0;
    double response = 1.0;
};

double size_of(const std::vector<double>& channel, const std::string& name) {
    const auto [low, high] = std::minmax_element(channel.begin(), channel.end());
    if (!(*high > *low))
        refuse("a channel that moves", "a constant " + name);
    return *high - *low;
}

/// Power below this is rounding, for channels of size 1: a bin sums `length` values, each with a
/// rounding of 1e-16 or so.
double rounding_power(std::size_t pieces, std::size_t length) {
    const double amplitude = 1e-15 * static_cast<double>(length);
    return static_cast<double>(pieces) * amplitude * amplitude;
}

struct Spectra {
    std::vector<double> excitation; ///< S_uu
    std::vector<double> response;   ///< S_yy
    ComplexVector cross;            ///< S_yu
};

class Welch {
  public:
    Welch(const EstimateOptions& options, std::size_t length, Sizes sizes)
        : options_(options),
          sizes_(sizes),
          window_(window_of(options.window, length)),
          transform_(length),
          values_(length) {
        const std::size_t bins = length / 2;
        spectra_.excitation.assign(bins, 0.0);
        spectra_.response.assign(bins, 0.0);
        spectra_.cross.assign(bins, 0.0);
    }

    /// Both signals go through one transform, as real and imaginary part.
    void add(std::span<const double> excitation, std::span<const double> response) {
        const std::size_t length = values_.size();
        const Trend u = trend_of(excitation, options_.detrend);
        const Trend y = trend_of(response, options_.detrend);
        const double centre = (static_cast<double>(length) - 1.0) / 2.0;
        for (std::size_t n = 0; n < length; ++n) {
            const double distance = static_cast<double>(n) - centre;
            values_[n] =
                window_[n] *
                Complex{(excitation[n] - u.middle - u.slope * distance) / sizes_.excitation,
                        (response[n] - y.middle - y.slope * distance) / sizes_.response};
        }
        transform_.forward(values_);
        for (std::size_t k = 1; k <= length / 2; ++k) {
            const Complex a = values_[k];
            const Complex b = std::conj(values_[length - k]);
            const Complex from_excitation = 0.5 * (a + b);
            const Complex from_response = Complex{0.0, -0.5} * (a - b);
            spectra_.excitation[k - 1] += std::norm(from_excitation);
            spectra_.response[k - 1] += std::norm(from_response);
            spectra_.cross[k - 1] += from_response * std::conj(from_excitation);
        }
    }

    const Spectra& spectra() const { return spectra_; }

  private:
    const EstimateOptions& options_;
    Sizes sizes_;
    std::vector<double> window_;
    FourierTransform transform_;
    ComplexVector values_;
    Spectra spectra_;
};

/// Points from the spectra; bins without power on either side give none.
void take_points(const Spectra& spectra, EstimateOptions::Method method, double least_power,
                 double step_rad_s, Estimate& estimate) {
    std::size_t silent = 0;
    for (std::size_t k = 0; k < spectra.cross.size(); ++k) {
        const double uu = spectra.excitation[k];
        const double yy = spectra.response[k];
        const Complex yu = spectra.cross[k];
        if (!(uu > least_power && yy > least_power) || yu == 0.0) {
            ++silent;
            continue;
        }
        const bool h2 = method == EstimateOptions::Method::h2;
        estimate.response.w_rad_s.push_back(static_cast<double>(k + 1) * step_rad_s);
        estimate.response.response.push_back(h2 ? yy / std::conj(yu) : yu / uu);
        estimate.response.coherence.push_back(std::min(1.0, std::norm(yu) / (uu * yy)));
    }
    if (silent > 0)
        estimate.warnings.push_back("no power: " + std::to_string(silent) +
                                    " frequencies without excitation or response left out");
    if (estimate.response.w_rad_s.size() < 2)
        refuse("an excitation and a response with power at two frequencies or more", "none");
}

Estimate estimate_by_welch(const TimeRecord& record, const EstimateOptions& options) {
    if (options.averages < 1)
        refuse("at least one average", std::to_string(options.averages));
    const std::size_t rows = record.excitation.size();
    const auto pieces = static_cast<std::size_t>(options.averages);
    const std::size_t length = 2 * rows / (pieces + 1) / 2 * 2;
    if (length < shortest_piece)
        refuse("at least " + std::to_string((pieces + 1) * shortest_piece / 2) + " rows for " +
                   std::to_string(pieces) + " averages",
               std::to_string(rows));
    const Sizes sizes{size_of(record.excitation, "excitation"),
                      size_of(record.response, "response")};
    Welch welch(options, length, sizes);
    for (std::size_t piece = 0; piece < pieces; ++piece)
        welch.add(std::span(record.excitation).subspan(piece * length / 2, length),
                  std::span(record.response).subspan(piece * length / 2, length));
    Estimate estimate;
    estimate.piece_length = length;
    estimate.response.averages = static_cast<double>(pieces);
    if (pieces == 1)
        estimate.warnings.push_back("one average: the coherence is 1 whatever the noise");
    const double step =
        2.0 * std::numbers::pi / (static_cast<double>(length) * record.sample_period_s);
    take_points(welch.spectra(), options.method, rounding_power(pieces, length), step, estimate);
    for (Complex& value : estimate.response.response)
        value *= sizes.response / sizes.excitation;
    return estimate;
}

} // namespace

Estimate estimate_response(const TimeRecord& record, const EstimateOptions& options) {
    if (record.excitation.size() != record.response.size() || !(record.sample_period_s > 0.0))
        refuse("two channels of one length and a sample period above zero", "something else");
    Estimate estimate = options.method == EstimateOptions::Method::tones
                            ? estimate_stepped_sine(record, options.tones_rad_s)
                            : estimate_by_welch(record, options);
    estimate.warnings.insert(estimate.warnings.begin(), record.warnings.begin(),
                             record.warnings.end());
    return estimate;
}

} // namespace cornerwright
