// Time of a full assessment, design and realised loop, of a 14th-order plant with six sections, and
// of an update of its root locus. `assess_scipy.py` runs this beside the same figures in SciPy.

#include "core/engine/engine.h"

#include <benchmark/benchmark.h>

#include <fstream>
#include <sstream>

namespace cornerwright {
namespace {

Project fourteenth_order() {
    std::ostringstream text;
    text << std::ifstream(CORNERWRIGHT_TEST_DATA "/bench/fourteenth_order.cornerwright.json")
                .rdbuf();
    return parse_project(text.str(), "fourteenth_order.cornerwright.json", ".").project;
}

/// A new engine each time: nothing is remembered.
void assess_everything(benchmark::State& state) {
    const Project project = fourteenth_order();
    for (auto _ : state) {
        Engine engine;
        benchmark::DoNotOptimize(engine.assess(project));
    }
}
BENCHMARK(assess_everything)->Unit(benchmark::kMillisecond);

void assess_design_loop(benchmark::State& state) {
    const Project project = fourteenth_order();
    const DesignLoop loop = design_loop_of(project, project.plant_cases.front());
    for (auto _ : state)
        benchmark::DoNotOptimize(assess_loop(loop, {}));
}
BENCHMARK(assess_design_loop)->Unit(benchmark::kMillisecond);

void assess_realised_loop(benchmark::State& state) {
    const Project project = fourteenth_order();
    const RealisedLoop loop =
        realised_loop_of(project, project.plant_cases.front(),
                         discretise(project.compensator, *project.sampling, *project.realisation));
    for (auto _ : state)
        benchmark::DoNotOptimize(assess_loop(loop, {}));
}
BENCHMARK(assess_realised_loop)->Unit(benchmark::kMillisecond);

/// The gain moves by a per cent between updates, as under a dragging hand.
void update_locus(benchmark::State& state) {
    Project project = fourteenth_order();
    Engine engine;
    std::size_t points = 0;
    for (auto _ : state) {
        project.compensator.front().gain *= 1.01;
        const auto locus = engine.locus(project, 0);
        points = locus->factors.size();
        benchmark::DoNotOptimize(locus);
    }
    state.counters["factors"] = static_cast<double>(points);
}
BENCHMARK(update_locus)->Unit(benchmark::kMillisecond);

} // namespace
} // namespace cornerwright
