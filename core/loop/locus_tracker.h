#pragma once

#include "core/loop/loop_model.h"
#include "core/numerics/delayed_sum.h"

namespace cornerwright {

/// The characteristic equation of a loop with the factor of its gain as the parameter:
/// A(s) + factor gain B(s) exp(-s delay) = 0, factors common to A and B taken out.
class LocusEquation {
  public:
    explicit LocusEquation(const LoopModel& model);

    struct At {
        Complex newton;       ///< F/F'
        Complex rate;         ///< ds/d ln(factor) of the root
        bool settled = false; ///< |F| is within the rounding of its evaluation
    };
    At at(Complex s, double factor) const;

    /// The rational part with this factor on the gain.
    FactoredSum sum(double factor) const;
    bool has_delay() const { return delay_ > 0.0; }
    DelayedSum delayed(double factor) const { return {sum(factor), delay_}; }

    const ComplexVector& poles() const { return unit_.left().roots; }
    const ComplexVector& zeros() const { return unit_.right().roots; }
    const ComplexVector& common_roots() const { return unit_.common_roots(); }
    /// -1/L0(s) e^(s delay): the complex factor that would make `s` a root.
    Complex factor_for(Complex s) const;

  private:
    FactoredSum unit_;
    double delay_ = 0.0;
};

/// Closed-loop poles at one factor, in the order of their branches.
struct LocusState {
    double log_factor = 0.0;
    ComplexVector poles;
    ComplexVector rates;
    std::vector<std::size_t> mirror; ///< index of the conjugate; itself for a real pole

    /// Poles on the real axis and above it; the others are mirrors.
    bool leads(std::size_t i) const { return mirror[i] == i || poles[i].imag() > 0.0; }
};

/// How far a pole may move in one step.
struct LocusStepLimit {
    double plain = 0.0;    ///< rad/s within `region` of the origin
    double region = 0.0;   ///< rad/s
    double smallest = 0.0; ///< rad/s: below this near the origin no closer look is taken

    double at(Complex s) const;
};

/// A state with rates and mirrors from poles that are symmetric about the real axis.
LocusState locus_state(const LocusEquation& equation, double log_factor, ComplexVector poles);

/// Follows all poles of `from` to `to_log_factor` (up or down), predictor along the rates, Newton
/// corrector, steps halved until each pole's next place is plain: it moved by less than its
/// distance from any other and nearly as predicted. Where two meet (breakaway), the step goes past
/// the meeting and both turn left. Returns the states after `from`, the last exactly at
/// `to_log_factor`.
std::vector<LocusState> track_locus(const LocusEquation& equation, const LocusState& from,
                                    double to_log_factor, const LocusStepLimit& limit);

/// For each of `old` the index of its own partner among `fresh` (at least as many), nearest pairs
/// first.
std::vector<std::size_t> match_nearest(const ComplexVector& old, const ComplexVector& fresh);

} // namespace cornerwright
