#include "core/handover/realisation_study.h"

#include "core/engine/engine.h"
#include "core/handover/report_tables.h"
#include "core/numerics/error.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <array>
#include <limits>

namespace cornerwright {
namespace {

constexpr std::array methods{Method::tustin,         Method::tustin_at_corners,
                             Method::tustin_at,      Method::matched_roots,
                             Method::step_invariant, Method::ramp_invariant};

double share_of(const Judgement& judgement) {
    return judgement.share.is_determined() ? judgement.share.value()
                                           : std::numeric_limits<double>::infinity();
}

/// The worst of one requirement on realised loops; undetermined stands above unmet only.
Judgement worst_realised(const RequirementResult& result) {
    const auto badness = [](const Judgement& judgement) {
        const int rank = judgement.state == State::unmet          ? 0
                         : judgement.state == State::undetermined ? 1
                                                                  : 2;
        return std::pair(rank, share_of(judgement));
    };
    const Judgement* worst = nullptr;
    for (const Judgement& judgement : result.all)
        if (judgement.loop == LoopName::realised &&
            (worst == nullptr || badness(judgement) < badness(*worst)))
            worst = &judgement;
    return worst == nullptr ? Judgement{} : *worst;
}

State joined(const std::vector<Judgement>& judgements) {
    const auto any = [&](State state) {
        return std::ranges::any_of(
            judgements, [state](const Judgement& judgement) { return judgement.state == state; });
    };
    return any(State::unmet)          ? State::unmet
           : any(State::undetermined) ? State::undetermined
                                      : State::met;
}

MethodOutcome outcome_of(const Project& project, Method method, Engine& engine) {
    Project changed = project;
    changed.realisation->method = method;
    const auto assessment = engine.assess(changed);
    MethodOutcome outcome;
    outcome.method = method;
    outcome.problem = assessment->realisation_problem;
    if (!assessment->equation)
        return outcome;
    for (const RequirementResult& result : assessment->verdict.requirements)
        outcome.worst.push_back(worst_realised(result));
    outcome.state = joined(outcome.worst);
    return outcome;
}

/// Whether the realised loops of every case meet every requirement.
bool meets_everything(const Assessment& assessment) {
    return assessment.equation &&
           std::ranges::all_of(assessment.verdict.requirements, [](const RequirementResult& one) {
               return worst_realised(one).state == State::met;
           });
}

FractionBits smallest_with(Engine& engine, const Project& project, int word_bits,
                           const StudyProceeds& proceeds) {
    FractionBits result;
    result.word_bits = word_bits;
    if (!project.sampling || !project.realisation) {
        result.reason = "the project has no realisation";
        return result;
    }
    if (project.requirements.empty()) {
        result.reason = "the project states no requirement";
        return result;
    }
    Project changed = project;
    changed.realisation->number_format = {};
    if (!meets_everything(*engine.assess(changed))) {
        result.reason = "in double precision not every requirement is met either";
        return result;
    }
    Realisation fixed = *project.realisation;
    fixed.number_format = {NumberFormat::Type::fixed, word_bits, word_bits - 1};
    const auto meets = [&](const DifferenceEquation& equation) {
        if (!proceeds())
            return true; // ends the search; the answer is thrown away
        changed.realisation = equation.realisation;
        return meets_everything(*engine.assess(changed));
    };
    result.smallest = smallest_fraction_bits(project.compensator, *project.sampling, fixed, meets);
    if (!proceeds()) {
        result.smallest.reset();
        result.reason = "the search was stopped";
    } else if (!result.smallest) {
        result.reason = "no number of fraction bits meets every requirement";
    }
    return result;
}

void study_format(RealisationStudy& study, const Project& project) {
    try {
        study.pole_errors =
            pole_errors(project.compensator, *project.sampling, *project.realisation);
        const DifferenceEquation equation =
            discretise(project.compensator, *project.sampling, *project.realisation);
        study.signal_bounds = signal_bounds(equation);
        study.noise = rounding_noise(equation);
        study.zero_input_cycle = zero_input_cycle(equation);
        study.smallest_integrated_error = smallest_integrated_error(equation);
    } catch (const InputError&) {
        return; // the outcome of the method says why
    }
}

} // namespace

RealisationStudy study_realisation(const Project& project, const StudyProceeds& proceeds) {
    RealisationStudy study;
    if (!project.sampling || !project.realisation)
        return study;
    study_format(study, project);
    Engine engine;
    for (const Method method : methods) {
        if (!proceeds())
            return study;
        study.methods.push_back(outcome_of(project, method, engine));
    }
    for (const int word_bits : {16, 32})
        study.fraction_bits.push_back(smallest_with(engine, project, word_bits, proceeds));
    return study;
}

FractionBits smallest_fraction_bits(const Project& project, int word_bits,
                                    const StudyProceeds& proceeds) {
    Engine engine;
    return smallest_with(engine, project, word_bits, proceeds);
}

std::string fraction_bits_words(const FractionBits& bits) {
    const std::string head = "Smallest fraction_bits with which every realised loop meets every "
                             "requirement, in words of " +
                             std::to_string(bits.word_bits) + " bits: ";
    return head +
           (bits.smallest ? std::to_string(*bits.smallest) : "not determined, " + bits.reason);
}

std::vector<std::string> pole_error_words(const std::vector<PoleError>& errors) {
    std::vector<std::string> lines;
    for (const PoleError& error : errors) {
        const Figure& relative = error.largest_relative_error;
        lines.push_back("Largest relative pole error in " + std::string(name_of(error.structure)) +
                        ": " +
                        (relative.is_value() ? number_text(relative.value(), 3)
                                             : "not determined, " + relative.reason()));
    }
    if (const auto best = best_structure(errors))
        lines.push_back("The structure that keeps the poles best: " +
                        std::string(name_of(best->structure)));
    return lines;
}

} // namespace cornerwright
