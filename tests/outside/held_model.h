#pragma once

#include "core/plant/plant_case.h"

#include <complex>
#include <vector>

namespace cornerwright::outside {

using Wide = long double;
using WideComplex = std::complex<Wide>;
using WideVector = std::vector<WideComplex>;

/// A proper rational function behind a zero-order or a triangle hold, sampled: matrix exponentials
/// of a chain of first-order blocks in extended precision. Written for the tests alone.
/// Source: K. J. Astrom, B. Wittenmark, Computer-Controlled Systems, 3rd ed., ch. 2; G. F.
/// Franklin, J. D. Powell, M. L. Workman, Digital Control of Dynamic Systems, 3rd ed., ch. 6
/// (citations from memory).
class HeldModel {
  public:
    /// `delay_s` of any size lies before the zero-order hold's equivalent.
    HeldModel(const RootForm& form, double period_s, double delay_s = 0.0);

    /// Behind a zero-order hold and the delay, at d = z - 1.
    WideComplex step_equivalent(WideComplex d) const;
    /// Its poles' polynomial at d, those at z = 0 included.
    WideComplex denominator(WideComplex d) const;
    /// Behind a triangle hold without delay, at d = z - 1.
    WideComplex ramp_equivalent(WideComplex d) const;

  private:
    /// What `duration` does: `change` of the states (row by row, lower triangular), the states that
    /// a held input of 1 leaves, and those that an input rising by 1 a period leaves.
    struct Passage {
        WideVector change;
        WideVector held;
        WideVector ramp;
    };
    void make_chain(const RootForm& form);
    Passage passage(Wide duration) const;
    WideVector advanced(const Passage& by, WideVector states) const;
    /// output . (d I - change)^-1 input
    WideComplex output_of(WideComplex d, WideVector input) const;

    std::size_t order_ = 0;
    Wide period_ = 0.0L;
    WideVector matrix_; ///< row by row
    WideVector input_;
    WideVector output_;
    WideComplex direct_;
    int whole_samples_ = 0; ///< of the delay
    bool splits_period_ = false;
    Passage whole_;
    WideVector early_; ///< states left by an input that comes after the rest of the delay
    WideVector late_;  ///< and by the one before it
};

} // namespace cornerwright::outside
