#include "core/fitting/tidy.h"

#include <algorithm>
#include <cmath>

namespace cornerwright {
namespace {

constexpr int refine_steps = 40;

Candidate refined(const SearchTask& task, const FactoredModel& start) {
    Refined result = refine(start, task.points, !task.dead_time, refine_steps);
    return rated(task, std::move(result.model), result.cost);
}

/// A few steps first, the rest only where they bring the cost near that of `best`: a model without
/// a root that the data speak for creeps along far above and is not worth the time.
Candidate refined_if_near(const SearchTask& task, const FactoredModel& start,
                          const Candidate& best) {
    constexpr int first_steps = 8;
    constexpr double near = 2.0;
    Refined result = refine(start, task.points, !task.dead_time, first_steps);
    if (result.cost < near * best.cost)
        result = refine(result.model, task.points, !task.dead_time, refine_steps);
    return rated(task, std::move(result.model), result.cost);
}

/// Without the zero that lies farthest out (its twin as well, if complex).
std::optional<FactoredModel> without_farthest_zero(const FactoredModel& model) {
    ComplexVector zeros = roots_of(model.zeros);
    if (zeros.empty())
        return {};
    const auto farthest = std::max_element(
        zeros.begin(), zeros.end(), [](Complex a, Complex b) { return std::abs(a) < std::abs(b); });
    const Complex zero = *farthest;
    FactoredModel result = model;
    std::erase_if(zeros, [&](Complex z) { return z == zero || z == std::conj(zero); });
    result.gain *= zero.imag() == 0.0 ? -zero.real() : std::norm(zero);
    result.zeros = factors_of(zeros);
    return result.gain == 0.0 ? std::nullopt : std::optional(result);
}

Candidate with_fewer_zeros(const SearchTask& task, Candidate best) {
    // Two in turn may cost and the third still gain: of three zeros that are only noise, none
    // stands alone.
    constexpr int patience = 2;
    FactoredModel model = best.model;
    for (int idle = 0; idle <= patience;) {
        const auto fewer = without_farthest_zero(model);
        if (!fewer)
            break;
        Candidate trial = refined_if_near(task, *fewer, best);
        model = trial.model;
        ++idle;
        if (trial.criterion <= best.criterion) {
            best = std::move(trial);
            idle = 0;
        }
    }
    return best;
}

/// The slowest real pole at the origin, where it lies so far below the band that it acts like one.
Candidate with_integrator(const SearchTask& task, const Candidate& best) {
    constexpr double below_band = 0.1;
    ComplexVector poles = roots_of(best.model.poles);
    const auto slowest = std::min_element(
        poles.begin(), poles.end(), [](Complex a, Complex b) { return std::abs(a) < std::abs(b); });
    if (slowest == poles.end() || slowest->imag() != 0.0 || *slowest == 0.0 ||
        std::abs(*slowest) > below_band * task.points.w.front())
        return best;
    poles.erase(slowest);
    FactoredModel model = best.model;
    model.poles = factors_of(poles);
    model.poles.push_back({1, 0.0, 0.0, true});
    Candidate trial = refined(task, model);
    return trial.criterion <= best.criterion ? trial : best;
}

bool is_right(Complex pole) {
    return pole.real() > 0.0;
}

/// Poles right of the axis reflected. What the data truly show unstable costs far more than the
/// slack; a pole without weight in the band does not.
Candidate with_stable_poles(const SearchTask& task, const Candidate& best) {
    ComplexVector poles = roots_of(best.model.poles);
    if (std::none_of(poles.begin(), poles.end(), is_right))
        return best;
    const auto fixed = std::find_if(best.model.poles.begin(), best.model.poles.end(),
                                    [](const Factor& factor) { return factor.fixed; });
    std::erase(poles, Complex(0.0));
    for (Complex& pole : poles)
        pole.real(-std::abs(pole.real()));
    FactoredModel model = best.model;
    model.poles = factors_of(poles);
    if (fixed != best.model.poles.end())
        model.poles.push_back(*fixed);
    Candidate trial = refined(task, model);
    const ComplexVector moved = roots_of(trial.model.poles);
    const double slack = 2.0 * std::log(2.0 * static_cast<double>(task.points.w.size()));
    const bool stable = std::none_of(moved.begin(), moved.end(), is_right);
    return stable && (task.stable || trial.criterion <= best.criterion + slack) ? trial : best;
}

} // namespace

Candidate rated(const SearchTask& task, FactoredModel model, double cost) {
    // Below this mean relative error squared all models count as exact and the smallest wins.
    constexpr double exact = 1e-18;
    const double count = 2.0 * static_cast<double>(task.points.w.size());
    int numbers = 1 + degree_of(model.zeros) + (task.dead_time ? 0 : 1);
    for (const Factor& factor : model.poles)
        numbers += factor.fixed ? 0 : factor.degree;
    const double mean = std::max(cost / count, exact);
    const double criterion = count * std::log(mean) + numbers * std::log(count);
    return {std::move(model), cost, criterion};
}

Candidate tidied(const SearchTask& task, Candidate candidate) {
    candidate = with_fewer_zeros(task, std::move(candidate));
    candidate = with_integrator(task, candidate);
    return with_stable_poles(task, candidate);
}

} // namespace cornerwright
