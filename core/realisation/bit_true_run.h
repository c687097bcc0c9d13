#pragma once

#include "core/realisation/difference_equation.h"

#include <memory>
#include <vector>

namespace cornerwright {

/// The difference equation run exactly as the generated code runs it: the same order of operations
/// in double, single or integer arithmetic, so that every output agrees bit for bit (a zero may
/// carry another sign).
///
/// Fixed point: signals are words with fraction_bits behind the point. Products are accumulated at
/// twice the width, shifted back with rounding to nearest (ties away from zero) and saturated.
///
/// Output limits: where the output has reached a limit and the error drives it further, the
/// integrating sections keep their state (conditional integration); the output is cut off.
class BitTrueRun {
  public:
    explicit BitTrueRun(const DifferenceEquation& equation);
    ~BitTrueRun();
    BitTrueRun(BitTrueRun&&) noexcept;
    BitTrueRun& operator=(BitTrueRun&&) noexcept;

    /// One sample. `error` is first rounded to the format; the output is exact in a double.
    double step(double error);

    /// Everything at rest.
    void init();

    /// Bumpless start: at rest, but for the last integrator, which holds `output` (cut to the
    /// limits), so that with no error the output stays there. A compensator without a plain
    /// integrator behind all its dynamics follows the error from rest.
    void reset(double output);

    /// Every stored number, in the order of the sections.
    std::vector<double> state() const;

    struct Machine;

  private:
    std::unique_ptr<Machine> machine_;
};

} // namespace cornerwright
