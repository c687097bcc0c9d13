// From an edit to the assessment: a corner of the first demo is moved a little each time, as a drag
// does, and everything judged anew. Says median and 99th percentile over single edits.

#include "core/engine/engine.h"

#include <benchmark/benchmark.h>

#include <algorithm>
#include <cmath>
#include <vector>

namespace cornerwright {
namespace {

Project demo() {
    return load_project(std::string(CORNERWRIGHT_DEMOS) +
                        "/seedling-gantry/seedling-gantry.cornerwright.json")
        .project;
}

/// The corner under the hand: that of the first section with a zero and a pole.
double& corner_of(Project& project) {
    for (Section& section : project.compensator)
        if (section.kind == SectionKind::lead || section.kind == SectionKind::lag)
            return section.zero_rad_s;
    return project.compensator.front().corner_rad_s;
}

void edit_to_assessment(benchmark::State& state, bool realised) {
    static Engine engine;
    static int edit = 0;
    Project project = demo();
    if (!realised)
        project.realisation.reset();
    // A new value each time: the engine remembers the last.
    corner_of(project) *= 1.0 + 1e-3 * std::sin(static_cast<double>(++edit));
    for (auto _ : state)
        benchmark::DoNotOptimize(engine.assess(project));
}

double percentile_99(const std::vector<double>& values) {
    std::vector<double> sorted = values;
    std::sort(sorted.begin(), sorted.end());
    const auto rank =
        static_cast<std::size_t>(std::ceil(0.99 * static_cast<double>(sorted.size())));
    return sorted[rank - 1];
}

constexpr int edits = 500;

BENCHMARK_CAPTURE(edit_to_assessment, design_loop, false)
    ->Iterations(1)
    ->Repetitions(edits)
    ->ReportAggregatesOnly()
    ->UseRealTime()
    ->Unit(benchmark::kMillisecond)
    ->ComputeStatistics("p99", percentile_99);
BENCHMARK_CAPTURE(edit_to_assessment, both_loops, true)
    ->Iterations(1)
    ->Repetitions(edits)
    ->ReportAggregatesOnly()
    ->UseRealTime()
    ->Unit(benchmark::kMillisecond)
    ->ComputeStatistics("p99", percentile_99);

} // namespace
} // namespace cornerwright
