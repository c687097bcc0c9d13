#pragma once

#include "core/engine/assessment.h"
#include "core/handover/limited_step.h"
#include "core/project/project.h"
#include "core/realisation/precision.h"

#include <functional>
#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// How the requirements stand on the realised loops of every case with one method, everything else
/// as the project has it.
struct MethodOutcome {
    Method method = Method::tustin;
    std::string problem;               ///< why there is no difference equation; then no judgements
    std::vector<Judgement> worst;      ///< one a requirement, in the order of the project
    State state = State::undetermined; ///< of the realised loops alone
};

/// The fewest fraction bits with which the realised loops of every case meet every requirement.
struct FractionBits {
    int word_bits = 32;
    std::optional<int> smallest;
    std::string reason; ///< why there is none
};

/// What each choice of a realisation costs.
struct RealisationStudy {
    std::vector<MethodOutcome> methods;
    std::vector<PoleError> pole_errors;      ///< each structure in the number format of the project
    std::vector<FractionBits> fraction_bits; ///< for words of 16 and 32 bits
    std::vector<SignalBound> signal_bounds;
    std::optional<RoundingNoise> noise;
    std::optional<ZeroInputCycle> zero_input_cycle;
    Figure smallest_integrated_error;
};

/// False stops the work soon; the study then holds what was found so far.
using StudyProceeds = std::function<bool()>;

/// Needs sampling and a realisation; else, and where the compensator cannot be realised, the study
/// holds nothing but the methods and why they cannot. A measurement without its points leaves
/// requirements undetermined, as in an assessment.
RealisationStudy study_realisation(const Project& project, const StudyProceeds& proceeds);

/// The smallest fraction bits alone, for words of this size.
FractionBits smallest_fraction_bits(const Project& project, int word_bits,
                                    const StudyProceeds& proceeds);

/// Sentences for people: the smallest fraction bits or why there are none; the pole error of each
/// structure and the one that keeps the poles best.
std::string fraction_bits_words(const FractionBits& bits);
std::vector<std::string> pole_error_words(const std::vector<PoleError>& errors);

} // namespace cornerwright
