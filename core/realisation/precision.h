#pragma once

#include "core/numerics/figure.h"
#include "core/realisation/difference_equation.h"

#include <functional>
#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// How large one stored signal of a fixed-point equation can become for an input of full scale
/// (size 1.0), and what the word leaves above it.
struct SignalBound {
    std::string signal;   ///< "section 2, output"
    Figure l1;            ///< over all inputs of size 1: no overflow below the range
    Figure l_infinity;    ///< over all sine inputs of size 1
    Figure headroom_bits; ///< lg2(range/l1); negative: can overflow (then it saturates)
};

/// Every stored signal in the order of execution. Empty unless the format is fixed.
std::vector<SignalBound> signal_bounds(const DifferenceEquation& equation);

/// The error that rounding of signals puts on the output.
struct RoundingNoise {
    /// Root mean square by theory: each rounding an independent uniform error of one step (variance
    /// step^2/12). Fixed point only. Infinite where an integrator adds the errors up; in a loop the
    /// feedback takes that away.
    Figure theory_rms;
    /// Root mean square found over `samples` of white input, against the same coefficients without
    /// rounding of signals.
    double simulated_rms = 0.0;
    double input_size = 0.0; ///< of that input
    int samples = 0;
};

RoundingNoise rounding_noise(const DifferenceEquation& equation);

/// What the output does after the input has fallen to zero.
struct ZeroInputCycle {
    Figure
        amplitude;  ///< largest |output| (without an integrator), or half its swing; 0: none found
    int period = 0; ///< in samples; 1 is an output stuck away from 0
};

/// Simulated from the states that full-scale white noise and a full-scale step left; the larger of
/// the two. Other states may hold other cycles.
ZeroInputCycle zero_input_cycle(const DifferenceEquation& equation);

/// The smallest constant error that still moves the last integrator, by simulation; in floating
/// point with the output at 1.0. Not determined without a plain integrator; infinite where not even
/// full scale moves it.
Figure smallest_integrated_error(const DifferenceEquation& equation);

/// How well one structure keeps the poles.
struct PoleError {
    Structure structure = Structure::direct_form_1;
    /// Largest |d - d_exact|/|d_exact| over the poles, d = z - 1: the relative error of the corner.
    Figure largest_relative_error;
};

/// Each structure in the number format of `realisation`.
std::vector<PoleError> pole_errors(const Chain& chain, const Sampling& sampling,
                                   const Realisation& realisation);

/// The structure of the smallest error; the earlier of equals.
std::optional<PoleError> best_structure(const std::vector<PoleError>& errors);

/// The smallest fraction_bits (of a fixed format) whose difference equation exists and satisfies
/// `meets`; nothing where none does.
std::optional<int>
smallest_fraction_bits(const Chain& chain, const Sampling& sampling, const Realisation& realisation,
                       const std::function<bool(const DifferenceEquation&)>& meets);

} // namespace cornerwright
