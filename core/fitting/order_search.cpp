#include "core/fitting/order_search.h"

#include "core/fitting/pole_relocation.h"
#include "core/fitting/tidy.h"

#include <algorithm>
#include <cmath>
#include <numbers>

namespace cornerwright {
namespace {

constexpr int relocation_rounds = 12;
constexpr int refine_steps = 60;

/// Every so many points, at least the two ends, for a first look at dead times.
FitPoints thinned(const FitPoints& points, std::size_t most) {
    if (points.w.size() <= most)
        return points;
    FitPoints result;
    for (std::size_t i = 0; i < most; ++i) {
        const std::size_t k = i * (points.w.size() - 1) / (most - 1);
        result.w.push_back(points.w[k]);
        result.response.push_back(points.response[k]);
        result.weight.push_back(points.weight[k]);
    }
    return result;
}

Candidate refined(const SearchTask& task, const FactoredModel& start) {
    Refined result = refine(start, task.points, !task.dead_time, refine_steps);
    return rated(task, std::move(result.model), result.cost);
}

bool is_exact(const SearchTask& task, const Candidate& candidate) {
    constexpr double exact = 1e-18;
    return candidate.cost < exact * static_cast<double>(task.points.w.size());
}

/// The start poles of a lower order and one more, or a pair, where the model misses the data most.
ComplexVector grown_poles(const SearchTask& task, const Candidate& lower, int order) {
    ComplexVector poles = roots_of(lower.model.poles);
    double worst = -1.0;
    double where = task.points.w.front();
    for (std::size_t i = 0; i < task.points.w.size(); ++i) {
        const FitPoints one{{task.points.w[i]}, {task.points.response[i]}, {task.points.weight[i]}};
        const double cost = weighted_cost(lower.model, one);
        if (cost > worst) {
            worst = cost;
            where = task.points.w[i];
        }
    }
    constexpr double damping = 0.02;
    const int missing = order - static_cast<int>(poles.size());
    if (missing % 2 == 1)
        poles.emplace_back(-where, 0.0);
    for (int i = 0; i < missing / 2; ++i) {
        poles.emplace_back(-damping * where, where);
        poles.emplace_back(-damping * where, -where);
    }
    return poles;
}

void take_better(std::optional<Candidate>& best, Candidate trial) {
    if (!best || trial.cost < best->cost)
        best = std::move(trial);
}

/// The best of several starts at one dead time.
Candidate best_start(const SearchTask& task, int order, double delay, const Candidate* lower) {
    const double low = task.points.w.front();
    const double high = task.points.w.back();
    const auto from = [&](ComplexVector poles) {
        FactoredModel model =
            relocate(task.points, std::move(poles), delay, task.stable, relocation_rounds);
        const double cost = weighted_cost(model, task.points);
        return rated(task, std::move(model), cost);
    };
    std::vector<Candidate> starts{from(spread_pairs(low, high, order))};
    if (!is_exact(task, starts.front()))
        starts.push_back(from(spread_real(low, high, order)));
    if (lower && !is_exact(task, starts.front()) && degree_of(lower->model.poles) < order)
        starts.push_back(from(grown_poles(task, *lower, order)));
    std::sort(starts.begin(), starts.end(),
              [](const Candidate& a, const Candidate& b) { return a.cost < b.cost; });
    // A start within a twentieth of the best one is most often the same valley.
    constexpr double same_valley = 1.05;
    std::optional<Candidate> best = refined(task, starts.front().model);
    for (std::size_t i = 1; i < starts.size() && !is_exact(task, *best); ++i) {
        if (starts[i].cost > same_valley * starts.front().cost)
            take_better(best, refined(task, starts[i].model));
    }
    return *best;
}

/// The grid's dead times whose quick fits are best: local minima of the cost, best first.
std::vector<double> likely_dead_times(const SearchTask& task, int order) {
    constexpr std::size_t quick_points = 160;
    constexpr int quick_rounds = 4;
    constexpr std::size_t kept = 3;
    const FitPoints quick = thinned(task.points, quick_points);
    const std::vector<double> grid = dead_time_grid(task.points);
    std::vector<std::pair<double, double>> tried;
    for (const double delay : grid) {
        const ComplexVector start = spread_pairs(quick.w.front(), quick.w.back(), order);
        const FactoredModel model = relocate(quick, start, delay, task.stable, quick_rounds);
        tried.emplace_back(weighted_cost(model, quick), delay);
    }
    std::vector<std::pair<double, double>> minima;
    for (std::size_t i = 0; i < tried.size(); ++i) {
        const bool below_left = i == 0 || tried[i].first <= tried[i - 1].first;
        const bool below_right = i + 1 == tried.size() || tried[i].first <= tried[i + 1].first;
        if (below_left && below_right)
            minima.push_back(tried[i]);
    }
    std::sort(minima.begin(), minima.end());
    std::vector<double> likely;
    for (std::size_t i = 0; i < std::min(kept, minima.size()); ++i)
        likely.push_back(minima[i].second);
    return likely;
}

Candidate with_found_dead_time(const SearchTask& task, int order, const Candidate* lower) {
    std::vector<double> delays = likely_dead_times(task, order);
    if (lower)
        delays.push_back(lower->model.dead_time_s);
    std::optional<Candidate> best;
    for (const double delay : delays)
        take_better(best, tidied(task, best_start(task, order, delay, lower)));

    SearchTask without = task;
    without.dead_time = 0.0;
    Candidate plain = tidied(without, best_start(without, order, 0.0, lower));
    return plain.criterion <= best->criterion ? plain : *best;
}

} // namespace

std::vector<double> dead_time_grid(const FitPoints& points) {
    // Steps of the phase at the upper end small enough for the refinement to find its valley.
    constexpr double phase_step = 0.7;
    constexpr int most_steps = 200;
    double turn = 0.0;
    for (std::size_t i = 1; i < points.w.size(); ++i)
        turn += std::arg(points.response[i] / points.response[i - 1]);
    const double lag = std::max(0.0, -turn) + 2.0 * std::numbers::pi;
    const int steps = std::min(most_steps, static_cast<int>(std::ceil(lag / phase_step)));
    std::vector<double> grid;
    for (int i = 0; i <= steps; ++i)
        grid.push_back(lag / points.w.back() * i / steps);
    return grid;
}

Candidate fit_order(const SearchTask& task, int order, const Candidate* lower) {
    if (!task.dead_time)
        return with_found_dead_time(task, order, lower);
    return tidied(task, best_start(task, order, *task.dead_time, lower));
}

Candidate settled(const SearchTask& task, const Candidate& found) {
    constexpr int rounds = 3;
    constexpr double most = 10.0;
    Candidate best = found;
    for (int round = 0; round < rounds && !is_exact(task, best); ++round) {
        SearchTask reweighted = task;
        if (task.dead_time)
            reweighted.dead_time = best.model.dead_time_s;
        for (std::size_t i = 0; i < task.points.w.size(); ++i) {
            const double ratio = std::abs(task.points.response[i]) /
                                 std::abs(response_at(best.model, task.points.w[i]));
            reweighted.points.weight[i] *= std::clamp(ratio, 1.0 / most, most);
        }
        best = refined(reweighted, best.model);
        if (round + 1 == rounds)
            best = tidied(reweighted, std::move(best));
    }
    return best;
}

Candidate fit_best_order(const SearchTask& task, int highest_order,
                         const std::function<bool(double)>& proceed) {
    constexpr int patience = 4;
    std::optional<Candidate> best;
    int idle = 0;
    for (int order = 1; order <= highest_order && idle < patience; ++order) {
        if (proceed && !proceed((order - 1.0) / highest_order) && best)
            break;
        Candidate trial = fit_order(task, order, best ? &*best : nullptr);
        ++idle;
        if (!best || trial.criterion < best->criterion) {
            best = std::move(trial);
            idle = 0;
        }
        if (is_exact(task, *best))
            break;
    }
    return *best;
}

} // namespace cornerwright
