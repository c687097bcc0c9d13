#include "core/numerics/fourier_transform.h"

#include <bit>
#include <cmath>
#include <cstdint>
#include <numbers>
#include <utility>

namespace cornerwright {
namespace {

Complex unit_at(double turns) {
    const double angle = -2.0 * std::numbers::pi * turns;
    return {std::cos(angle), std::sin(angle)};
}

} // namespace

FourierTransform::FourierTransform(std::size_t length)
    : length_(length),
      inner_length_(std::has_single_bit(length) ? length : std::bit_ceil(2 * length)) {
    const auto inner = static_cast<double>(inner_length_);
    for (std::size_t k = 0; k < inner_length_ / 2; ++k)
        twiddles_.push_back(unit_at(static_cast<double>(k) / inner));
    if (inner_length_ == length_)
        return;
    // n^2 is reduced modulo 2N before it becomes an angle, so that no digits are lost.
    const std::uint64_t turn = 2 * static_cast<std::uint64_t>(length_);
    for (std::uint64_t n = 0; n < length_; ++n)
        chirp_.push_back(unit_at(static_cast<double>(n * n % turn) / static_cast<double>(turn)));
    chirp_spectrum_.assign(inner_length_, 0.0);
    for (std::size_t n = 0; n < length_; ++n) {
        chirp_spectrum_[n] = std::conj(chirp_[n]);
        chirp_spectrum_[(inner_length_ - n) % inner_length_] = std::conj(chirp_[n]);
    }
    forward_power_of_two(chirp_spectrum_);
}

void FourierTransform::forward(ComplexVector& values) const {
    if (chirp_.empty())
        forward_power_of_two(values);
    else
        forward_chirp(values);
}

void FourierTransform::forward_power_of_two(ComplexVector& values) const {
    const std::size_t size = inner_length_;
    for (std::size_t i = 1, j = 0; i < size; ++i) {
        std::size_t bit = size / 2;
        for (; (j & bit) != 0; bit /= 2)
            j ^= bit;
        j ^= bit;
        if (i < j)
            std::swap(values[i], values[j]);
    }
    for (std::size_t span = 1; span < size; span *= 2) {
        const std::size_t step = size / (2 * span);
        for (std::size_t begin = 0; begin < size; begin += 2 * span)
            for (std::size_t k = 0; k < span; ++k) {
                const Complex even = values[begin + k];
                const Complex factor = twiddles_[k * step];
                const Complex given = values[begin + k + span];
                // Written out: a library product would test for NaN and infinity each time.
                const Complex odd{given.real() * factor.real() - given.imag() * factor.imag(),
                                  given.real() * factor.imag() + given.imag() * factor.real()};
                values[begin + k] = even + odd;
                values[begin + k + span] = even - odd;
            }
    }
}

void FourierTransform::forward_chirp(ComplexVector& values) const {
    ComplexVector padded(inner_length_, 0.0);
    for (std::size_t n = 0; n < length_; ++n)
        padded[n] = values[n] * chirp_[n];
    forward_power_of_two(padded);
    // The inverse transform is the conjugate of the forward transform of the conjugate.
    for (std::size_t k = 0; k < inner_length_; ++k)
        padded[k] = std::conj(padded[k] * chirp_spectrum_[k]);
    forward_power_of_two(padded);
    const auto inner = static_cast<double>(inner_length_);
    for (std::size_t n = 0; n < length_; ++n)
        values[n] = std::conj(padded[n]) / inner * chirp_[n];
}

} // namespace cornerwright
