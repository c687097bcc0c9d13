#pragma once

#include "core/numerics/complex.h"

#include <cstddef>

namespace cornerwright {

/// Discrete Fourier transform of one length, X[k] = sum x[n] exp(-2 pi i k n / N), for any N >= 1
/// in O(N log N): by halves where N is a power of two (Cooley and Tukey, 1965), else as a
/// convolution with a chirp (Bluestein, 1970). The tables are made once; `forward` may be called
/// from several threads at a time.
class FourierTransform {
  public:
    explicit FourierTransform(std::size_t length);

    std::size_t length() const { return length_; }

    /// In place; `values` has `length()` elements.
    void forward(ComplexVector& values) const;

  private:
    void forward_power_of_two(ComplexVector& values) const;
    void forward_chirp(ComplexVector& values) const;

    std::size_t length_;
    std::size_t inner_length_;     ///< the power of two that is transformed
    ComplexVector twiddles_;       ///< exp(-2 pi i k / inner_length), k below half of it
    ComplexVector chirp_;          ///< exp(-pi i n^2 / length); empty for a power of two
    ComplexVector chirp_spectrum_; ///< of the conjugate chirp, wrapped around
};

} // namespace cornerwright
