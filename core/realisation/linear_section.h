#pragma once

#include "core/realisation/difference_equation.h"

#include <array>
#include <cmath>

namespace cornerwright {

/// One rounded section on `Real` numbers without any rounding of the signals, stepped as its
/// structure stores its states (direct form 1 as its transposed equal).
template <class Real>
class LinearSection {
  public:
    LinearSection(const DiscreteSection& section, Structure structure)
        : delta_(structure == Structure::delta), delta_shift_(delta_ ? section.delta_shift : 0) {
        for (std::size_t i = 0; i < 3; ++i) {
            b_[i] = delta_ ? section.beta[i] : section.b[i];
            a_[i] = delta_ ? section.alpha[i] : section.a[i];
        }
    }

    Real step(Real x) {
        const Real y = b_[0] * x + w_[0];
        const Real first = b_[1] * x - a_[1] * y + w_[1];
        const Real second = b_[2] * x - a_[2] * y;
        w_ = delta_ ? std::array{w_[0] + first, w_[1] + second} : std::array{first, second};
        return y;
    }

    /// w1 or w2 as stored: w2 of a delta section times 2^delta_shift.
    Real stored(std::size_t state) const {
        return state == 0 ? w_[0] : std::ldexp(w_[1], delta_shift_);
    }

    /// Adds to w1 or w2, in stored units.
    void disturb(std::size_t state, Real stored_units) {
        w_[state] += state == 0 ? stored_units : std::ldexp(stored_units, -delta_shift_);
    }

    /// A disturbance of the output before it is fed back, for the next steps to work off.
    void disturb_output(Real y) {
        const Real first = w_[0] - a_[1] * y;
        const Real second = w_[1] - a_[2] * y;
        w_ = {first, second};
    }

  private:
    bool delta_;
    int delta_shift_;
    std::array<Real, 3> b_{};
    std::array<Real, 3> a_{};
    std::array<Real, 2> w_{};
};

} // namespace cornerwright
