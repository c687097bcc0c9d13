#include "core/engine/fleet.h"

#include "core/measurement/read_measurement.h"
#include "core/numerics/error.h"
#include "core/numerics/shared_work.h"
#include "core/placement/problem.h"

#include <algorithm>
#include <cctype>
#include <utility>

namespace cornerwright {
namespace {

namespace fs = std::filesystem;

bool is_known_suffix(std::string suffix) {
    std::transform(suffix.begin(), suffix.end(), suffix.begin(),
                   [](unsigned char c) { return static_cast<char>(std::tolower(c)); });
    constexpr std::array<std::string_view, 8> known{".csv", ".txt", ".dat", ".tsv",
                                                    ".uff", ".unv", ".ts",  ".asc"};
    if (std::find(known.begin(), known.end(), suffix) != known.end())
        return true;
    // Touchstone: .s1p, .s2p, ...
    return suffix.size() >= 4 && suffix[1] == 's' && suffix.back() == 'p' &&
           std::all_of(suffix.begin() + 2, suffix.end() - 1,
                       [](unsigned char c) { return std::isdigit(c) != 0; });
}

FleetFigures figures_of(const FrequencyFigures& f) {
    return {f.phase_margin_deg,       f.gain_margin_db,      f.gain_reduction_margin_db,
            f.delay_margin_s,         f.sensitivity_peak_db, f.complementary_peak_db,
            f.control_effort_peak_db, f.bandwidth_rad_s};
}

FleetUnit judged(const PlacementProblem& problem, FleetUnit unit) {
    const Evaluation evaluation = evaluate(problem, problem.compensator);
    for (const PlacementLoop& loop : evaluation.loops)
        (loop.name == LoopName::design ? unit.design : unit.realised) =
            figures_of(loop.assessment.figures.frequency);
    for (const RequirementResult& result : evaluation.verdict.requirements)
        unit.judgements.push_back(
            {result.worst.value, result.worst.share, result.worst.loop, result.worst.state});
    unit.state = evaluation.verdict.state;
    return unit;
}

/// `problem` has one plant, which is replaced.
FleetUnit unit_of(PlacementProblem& problem, const fs::path& file, const FleetOptions& options) {
    FleetUnit unit;
    unit.file = file.filename().string();
    try {
        auto response = std::make_shared<const MeasuredResponse>(read_measurement(file).response);
        problem.plants = {
            {unit.file,
             MeasuredPlant{std::move(response), options.integrators, options.unstable_poles, {}}}};
        return judged(problem, unit);
    } catch (const InputError& error) {
        InputPlace place = error.place();
        // The folder is the caller's to know; the same file then gives the same sentence anywhere.
        place.file = unit.file;
        unit.problem = InputError(place, error.expected(), error.found()).what();
    }
    return unit;
}

} // namespace

std::vector<fs::path> fleet_files(const fs::path& folder) {
    std::error_code error;
    if (!fs::is_directory(folder, error))
        throw InputError({folder.string(), {}, {}}, "a folder of measurement files", "none");
    std::vector<fs::path> files;
    for (const fs::directory_entry& entry : fs::directory_iterator(folder, error)) {
        if (entry.is_regular_file(error) && is_known_suffix(entry.path().extension().string()))
            files.push_back(entry.path());
    }
    std::sort(files.begin(), files.end(), [](const fs::path& a, const fs::path& b) {
        return a.filename().native() < b.filename().native();
    });
    return files;
}

void declare_as_first_case(const Project& project, FleetOptions& options) {
    if (project.plant_cases.empty())
        return;
    const PlantSource& source = project.plant_cases.front().source;
    if (const auto* measurement = std::get_if<MeasurementSource>(&source)) {
        options.integrators = measurement->integrators;
        options.unstable_poles = measurement->unstable_poles;
        return;
    }
    const auto model = model_of(source);
    const auto count = [&](const auto& is_one) {
        return static_cast<int>(
            std::count_if(model->roots.poles.begin(), model->roots.poles.end(), is_one));
    };
    options.integrators = count([](const Complex& pole) { return pole == Complex(0.0); });
    options.unstable_poles = count([](const Complex& pole) { return pole.real() > 0.0; });
}

std::vector<FleetUnit> run_fleet(const Project& project, const std::vector<fs::path>& files,
                                 const FleetOptions& options) {
    const PlacementProblem problem{
        project.compensator, {}, project.sampling, project.realisation, project.requirements};
    if (problem.realisation)
        discretise(problem.compensator, problem.sampling.value_or(Sampling{}),
                   *problem.realisation);
    std::vector<fs::path> own;
    for (auto i = static_cast<std::size_t>(options.shard - 1); i < files.size();
         i += static_cast<std::size_t>(options.shards))
        own.push_back(files[i]);
    std::vector<FleetUnit> units(own.size());
    std::vector<char> is_done(own.size(), 0); // not bool: workers write neighbours at a time
    SharedWork work{own.size(), options.workers, {}};
    if (options.proceed)
        work.proceed = [&](std::size_t done) { return options.proceed(done, own.size()); };
    do_shared(work, [&]() -> WorkOnIndex {
        return [&, of_this_thread = problem](std::size_t i) mutable {
            units[i] = unit_of(of_this_thread, own[i], options);
            is_done[i] = 1;
        };
    });
    std::vector<FleetUnit> done;
    for (std::size_t i = 0; i < units.size(); ++i) {
        if (is_done[i] != 0)
            done.push_back(std::move(units[i]));
    }
    return done;
}

} // namespace cornerwright
