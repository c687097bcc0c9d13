#pragma once

#include "core/placement/problem.h"

#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// What a section design would do, before it is taken: an ordinary chain with ordinary sections.
struct SectionProposal {
    bool possible = false;
    Chain compensator;              ///< with the new sections; as it was where nothing is possible
    std::vector<std::size_t> added; ///< indices of the new sections
    std::vector<std::string> words; ///< what it does, or why it cannot be done
};

/// The textbook lead before it is solved exactly.
struct LeadEstimate {
    double lift_deg = 0.0; ///< by each section
    int sections = 1;
    double ratio = 1.0; ///< pole over zero
    double centre_rad_s = 0.0;
};

struct PhaseLift {
    double phase_margin_deg = 45.0;
    double allowance_deg = 10.0; ///< for the crossover that moves up; common practice is 5 to 12
    /// Where the loop of the worst case shall cross 0 dB, rad/s: the centre stands there and the
    /// gain goes along. Empty: the gain stays and the crossover moves up.
    std::optional<double> crossover_rad_s;
};

/// The first cut of `lift_phase`: lift = wanted - present + allowance, ratio = (1 + sin lift)/
/// (1 - sin lift), centre where the loop of the worst case lies 10 lg(ratio) below 0 dB for each
/// section. Empty where the loop has no crossover, is met already, or falls short of that level.
/// Source: K. Ogata, Modern Control Engineering, 5th ed., ch. 7 (citation from memory).
std::optional<LeadEstimate> lead_estimate(const PlacementProblem& problem, const PhaseLift& wanted);

/// Adds one lead, or two where more than 60 deg is needed, whose lift is then solved so that the
/// smallest phase margin over all cases and loops is the wanted one.
SectionProposal lift_phase(const PlacementProblem& problem, const PhaseLift& wanted);

struct LowFrequencyHold {
    ErrorInput input = ErrorInput::ramp;
    double error = 0.0;           ///< steady-state error wanted; 0 asks for an integrator
    double phase_spent_deg = 5.0; ///< most that the new section may take at crossover
};

/// Raises the gain at low frequencies and leaves it at crossover: a lag with the gain raised by its
/// ratio, or a PI section where only an integrator meets the error.
SectionProposal hold_low_frequency(const PlacementProblem& problem, const LowFrequencyHold& wanted);

/// The same for the rejection wanted: |S| at most `rejection_db` up to `up_to_rad_s`.
SectionProposal hold_rejection(const PlacementProblem& problem, double rejection_db,
                               double up_to_rad_s, double phase_spent_deg);

/// Sets the gain so that the largest steady-state error over all cases is the wanted one.
SectionProposal gain_for_error(const PlacementProblem& problem, ErrorInput input, double error);

struct ResonanceQuieting {
    double from_rad_s = 0.0; ///< where the resonance is looked for
    double to_rad_s = 0.0;
    double below_db = -6.0; ///< |L| wanted at the resonance of every case
};

/// A notch at the centre of the resonance peaks of all cases, wide enough for their spread.
SectionProposal quiet_resonance(const PlacementProblem& problem, const ResonanceQuieting& wanted);

struct RollOff {
    double from_rad_s = 0.0;
    double below_db = 0.0;      ///< |T| wanted from there on
    bool complex_poles = false; ///< a pair with damping 0.7 in place of one real pole
};

/// Poles whose corner is the highest that gives the attenuation on every case.
SectionProposal roll_off(const PlacementProblem& problem, const RollOff& wanted);

} // namespace cornerwright
