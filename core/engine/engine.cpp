#include "core/engine/engine.h"

#include "core/loop/loop_assessment.h"
#include "core/loop/sampled_plant.h"
#include "core/numerics/error.h"
#include "core/numerics/shared_work.h"

#include <utility>

namespace cornerwright {
namespace {

/// What the figures of one case follow from; equal keys give equal figures. An edit that leaves a
/// key alone (a limit, a label, a title, another case) leaves the figures alone.
struct DesignKey {
    PlantSource plant;
    RootForm compensator;
    double computation_delay_s = 0.0;
    double hold_period_s = 0.0;
    FigureRequest request;

    bool operator==(const DesignKey&) const = default;
};

struct RealisedKey {
    PlantSource plant;
    DifferenceEquation equation;
    double computation_delay_s = 0.0;
    FigureRequest request;

    bool operator==(const RealisedKey&) const = default;
};

struct CaseKeys {
    DesignKey design;
    std::optional<RealisedKey> realised;
    /// The sampled plant of `realised`, which an edit of the compensator leaves alone; null where
    /// it has none.
    std::shared_ptr<const SampledPlants> sampled;
};

struct EquationKey {
    Chain compensator;
    std::optional<Sampling> sampling;
    std::optional<Realisation> realisation;

    bool operator==(const EquationKey&) const = default;
};

/// The difference equation that a project asks for, or why there is none.
struct EquationOutcome {
    std::optional<DifferenceEquation> equation;
    std::string problem;
};

EquationOutcome make_equation(const EquationKey& key) {
    if (!key.realisation)
        return {};
    try {
        return {discretise(key.compensator, key.sampling.value_or(Sampling{}), *key.realisation),
                {}};
    } catch (const InputError& error) {
        return {{}, error.what()};
    }
}

CaseAssessment case_header(const PlantCase& plant_case) {
    CaseAssessment header;
    header.name = plant_case.name;
    if (const auto* measurement = std::get_if<MeasurementSource>(&plant_case.source)) {
        header.measured = true;
        header.fitted = measurement->fit.has_value();
    }
    return header;
}

std::vector<JudgedLoop> judged_loops(const std::vector<CaseAssessment>& cases) {
    std::vector<JudgedLoop> loops;
    for (const CaseAssessment& assessed : cases) {
        loops.push_back({assessed.name, LoopName::design, &assessed.design.figures});
        if (assessed.realised)
            loops.push_back({assessed.name, LoopName::realised, &assessed.realised->figures});
    }
    return loops;
}

} // namespace

struct Engine::Memory {
    EquationKey equation_key;
    EquationOutcome equation;
    std::vector<CaseKeys> case_keys;
    std::shared_ptr<const Assessment> last;

    std::shared_ptr<const RootLocus> locus; ///< a start for the next

    const EquationOutcome& equation_of(const Project& project);
    CaseAssessment assess_case(const Project& project, std::size_t index,
                               const FigureRequest& request, CaseKeys& keys);
    void assess_design(const Project& project, std::size_t index, const DesignKey& key,
                       CaseAssessment& result) const;
    void assess_realised(const Project& project, std::size_t index, CaseKeys& keys,
                         CaseAssessment& result) const;
    /// The sampled plant of the last assessment, if it is still that of `key`.
    std::shared_ptr<const SampledPlants> remembered_samples(std::size_t index,
                                                            const RealisedKey& key) const;
    /// The last result of the case now at `index`, if there is one.
    const CaseAssessment* remembered(std::size_t index) const;
};

const EquationOutcome& Engine::Memory::equation_of(const Project& project) {
    EquationKey key{project.compensator, project.sampling, project.realisation};
    if (!last || key != equation_key) {
        equation = make_equation(key);
        equation_key = std::move(key);
    }
    return equation;
}

const CaseAssessment* Engine::Memory::remembered(std::size_t index) const {
    return last && index < case_keys.size() ? &last->cases[index] : nullptr;
}

void Engine::Memory::assess_design(const Project& project, std::size_t index, const DesignKey& key,
                                   CaseAssessment& result) const {
    const CaseAssessment* before = remembered(index);
    if (before && case_keys[index].design == key) {
        result.design = before->design;
        result.unusable = before->unusable;
        return;
    }
    try {
        result.design =
            assess_loop(design_loop_of(project, project.plant_cases[index]), key.request);
    } catch (const InputError& error) {
        result.unusable = error.what();
        result.design = undetermined_loop(key.request, result.unusable);
    }
}

std::shared_ptr<const SampledPlants>
Engine::Memory::remembered_samples(std::size_t index, const RealisedKey& key) const {
    if (!remembered(index) || !case_keys[index].realised)
        return nullptr;
    const RealisedKey& before = *case_keys[index].realised;
    const bool same = before.plant == key.plant &&
                      before.computation_delay_s == key.computation_delay_s &&
                      before.equation.sample_period_s == key.equation.sample_period_s;
    return same ? case_keys[index].sampled : nullptr;
}

void Engine::Memory::assess_realised(const Project& project, std::size_t index, CaseKeys& keys,
                                     CaseAssessment& result) const {
    const RealisedKey& key = *keys.realised;
    const CaseAssessment* before = remembered(index);
    keys.sampled = remembered_samples(index, key);
    if (before && before->realised && case_keys[index].realised == key) {
        result.realised = before->realised;
        return;
    }
    if (!result.unusable.empty()) {
        result.realised = undetermined_loop(key.request, result.unusable);
        return;
    }
    try {
        RealisedLoop loop = realised_loop_of(project, project.plant_cases[index], key.equation);
        if (!keys.sampled && std::holds_alternative<PlantModel>(loop.plant))
            keys.sampled = sampled_plants_of(loop);
        loop.sampled = keys.sampled;
        result.realised = assess_loop(loop, key.request);
    } catch (const InputError& error) {
        result.realised = undetermined_loop(key.request, error.what());
    }
}

CaseAssessment Engine::Memory::assess_case(const Project& project, std::size_t index,
                                           const FigureRequest& request, CaseKeys& keys) {
    const PlantCase& plant_case = project.plant_cases[index];
    const Sampling sampling = project.sampling.value_or(Sampling{});
    const bool held = sampling.design_includes_hold;
    keys.design = {plant_case.source, roots_of(project.compensator),
                   held ? sampling.computation_delay_s : 0.0, held ? sampling.sample_period_s : 0.0,
                   request};
    keys.realised.reset();
    if (equation.equation)
        keys.realised = RealisedKey{plant_case.source, *equation.equation,
                                    sampling.computation_delay_s, request};

    CaseAssessment result = case_header(plant_case);
    assess_design(project, index, keys.design, result);
    if (keys.realised)
        assess_realised(project, index, keys, result);
    else if (project.realisation)
        result.realised = undetermined_loop(request, equation.problem);
    return result;
}

Engine::Engine() : memory_(std::make_unique<Memory>()) {}
Engine::~Engine() = default;
Engine::Engine(Engine&&) noexcept = default;
Engine& Engine::operator=(Engine&&) noexcept = default;

std::shared_ptr<const Assessment> Engine::assess(const Project& project) {
    const FigureRequest request = request_of(project.requirements);
    const EquationOutcome& outcome = memory_->equation_of(project);

    auto assessment = std::make_shared<Assessment>();
    assessment->title = project.title;
    assessment->equation = outcome.equation;
    assessment->realisation_problem = outcome.problem;
    std::vector<CaseKeys> keys(project.plant_cases.size());
    assessment->cases.resize(project.plant_cases.size());
    do_shared({project.plant_cases.size(), 0, {}}, [&]() -> WorkOnIndex {
        return [&](std::size_t i) {
            assessment->cases[i] = memory_->assess_case(project, i, request, keys[i]);
        };
    });
    assessment->verdict = judge(project.requirements, request, judged_loops(assessment->cases));

    memory_->case_keys = std::move(keys);
    memory_->last = assessment;
    return assessment;
}

std::shared_ptr<const RootLocus> Engine::locus(const Project& project, std::size_t case_index,
                                               const LocusWindow* window) {
    const PlantCase& plant_case = project.plant_cases.at(case_index);
    auto locus = std::make_shared<RootLocus>();
    try {
        *locus = root_locus(design_loop_of(project, plant_case), window, memory_->locus.get());
    } catch (const InputError& error) {
        locus->note = error.what();
        return locus;
    }
    memory_->locus = locus;
    return locus;
}

} // namespace cornerwright
