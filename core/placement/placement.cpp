#include "core/placement/placement.h"

#include "core/numerics/error.h"
#include "core/placement/placement_step.h"
#include "core/placement/placement_words.h"

#include <algorithm>
#include <chrono>
#include <cmath>
#include <numbers>
#include <random>
#include <utility>

namespace cornerwright {
namespace {

/// Shares farther than this above the smallest one do not bind within a step.
constexpr double look_ahead = 8.0;
constexpr double first_radius = 0.3;
constexpr double widest_radius = 1.0;
constexpr double smallest_radius = 1e-4;
constexpr double negligible_gain = 1e-5;
constexpr int most_steps = 60;
/// Corners stay below this part of half the sample rate, where every method can follow.
constexpr double part_of_half_rate = 0.9;

/// One place of the search.
struct Place {
    std::vector<double> logarithms;
    Evaluation evaluation;
    std::vector<ShareGradient> gradients; ///< of the last step tried from here
    std::vector<double> weights;
};

class Search {
  public:
    Search(const PlacementProblem& problem, const PlacementOptions& options)
        : problem_(problem),
          options_(options),
          parameters_(free_parameters(problem.compensator)),
          room_(room_of(problem.compensator, parameters_, options.widest_factor, highest_corner())),
          random_(options.seed),
          started_(std::chrono::steady_clock::now()) {
        if (parameters_.empty())
            throw InputError({}, "an enabled, unlocked section with a value to move", "none");
        if (problem.requirements.empty() || problem.plants.empty())
            throw InputError({}, "a plant case and a requirement to place for", "none");
    }

    PlacementResult run() {
        const auto given = visit(logarithms_of(problem_.compensator, parameters_));
        if (!given)
            throw InputError({}, "a compensator that can be realised as the project asks",
                             "one that cannot");
        if (given->evaluation.merit == HUGE_VAL && given->evaluation.undetermined > 0)
            throw InputError({}, "a requirement that can be judged", "none that is determined");
        PlacementResult result;
        result.merit_before = given->evaluation.merit;
        Place best = climb(*given);
        for (int start = 1; start < options_.starts && may_go_on(start, best); ++start) {
            if (const auto varied = variation(best)) {
                Place found = climb(*varied);
                if (is_better(found.evaluation, best.evaluation))
                    best = std::move(found);
            }
        }
        result.stopped = stopped_;
        finish(result, best);
        return result;
    }

  private:
    double highest_corner() const {
        if (!problem_.realisation || !problem_.sampling ||
            problem_.sampling->sample_period_s <= 0.0)
            return HUGE_VAL;
        return part_of_half_rate * std::numbers::pi / problem_.sampling->sample_period_s;
    }

    Chain chain_at(const std::vector<double>& logarithms) const {
        return with_logarithms(problem_.compensator, parameters_, logarithms);
    }

    /// The place judged; nothing where its compensator cannot be realised.
    std::optional<Place> visit(std::vector<double> logarithms) const {
        try {
            Evaluation evaluation = evaluate(problem_, chain_at(logarithms));
            return Place{std::move(logarithms), std::move(evaluation), {}, {}};
        } catch (const InputError&) {
            return {};
        }
    }

    bool time_is_up() const {
        const std::chrono::duration<double> passed = std::chrono::steady_clock::now() - started_;
        return options_.time_limit_s > 0.0 && passed.count() > options_.time_limit_s;
    }

    /// Asks the caller, and looks at the clock, between two steps.
    bool proceed(int start, double part, const Place& at) {
        const double progress = (start + part) / options_.starts;
        if (!stopped_ && (time_is_up() ||
                          (options_.proceed && !options_.proceed(progress, at.evaluation.merit))))
            stopped_ = true;
        return !stopped_;
    }

    /// Further starts while something is unmet; one more try where all is met.
    bool may_go_on(int start, const Place& best) {
        start_ = start;
        return proceed(start, 0.0, best) && (best.evaluation.merit < 0.0 || start < 2);
    }

    /// A seeded scatter around the best place, the best of several.
    std::optional<Place> variation(const Place& best) {
        constexpr int tries = 8;
        constexpr double spread = 0.7;
        std::normal_distribution<> normal(0.0, spread);
        std::optional<Place> chosen;
        for (int i = 0; i < tries; ++i) {
            std::vector<double> logarithms = best.logarithms;
            for (double& logarithm : logarithms)
                logarithm += normal(random_);
            auto place = visit(inside(room_, std::move(logarithms)));
            if (place && (!chosen || is_better(place->evaluation, chosen->evaluation)))
                chosen = std::move(place);
        }
        return chosen;
    }

    /// Where some loop is unstable no share can be climbed: scatter, wider and wider, and keep what
    /// is less unstable.
    Place stabilised(Place at) {
        constexpr int rounds = 40;
        for (int round = 0; round < rounds && at.evaluation.merit <= unstable_merit; ++round) {
            std::normal_distribution<> normal(0.0, 0.3 + 0.04 * round);
            for (int i = 0; i < 4; ++i) {
                std::vector<double> logarithms = at.logarithms;
                for (double& logarithm : logarithms)
                    logarithm += normal(random_);
                const auto place = visit(inside(room_, std::move(logarithms)));
                if (place && is_better(place->evaluation, at.evaluation))
                    at = *place;
            }
            if (!proceed(start_, 0.0, at))
                break;
        }
        return at;
    }

    Place climb(Place at) {
        at = stabilised(std::move(at));
        if (at.evaluation.merit <= unstable_merit)
            return at;
        double radius = first_radius;
        bool fresh = true;
        for (int step = 0; step < most_steps && radius > smallest_radius; ++step) {
            if (!proceed(start_, static_cast<double>(step) / most_steps, at))
                break;
            if (fresh)
                at.gradients = share_gradients(problem_, chain_at(at.logarithms), parameters_,
                                               at.evaluation, at.evaluation.merit + look_ahead);
            const auto move = best_step(at.gradients, room_, at.logarithms, radius);
            if (!move)
                break;
            at.weights = move->weights;
            const double predicted = move->predicted - at.evaluation.merit;
            if (predicted < negligible_gain)
                break;
            auto next = visit(inside(room_, sum(at.logarithms, move->move)));
            const double gained = next ? next->evaluation.merit - at.evaluation.merit : -HUGE_VAL;
            const bool lost = next && next->evaluation.undetermined > at.evaluation.undetermined;
            radius = next_radius(radius, lost ? -HUGE_VAL : gained / predicted);
            fresh = next && is_better(next->evaluation, at.evaluation);
            if (fresh) {
                next->weights = at.weights;
                next->gradients = std::move(at.gradients);
                at = std::move(*next);
            }
        }
        return at;
    }

    static double next_radius(double radius, double ratio) {
        if (ratio > 0.75)
            return std::min(2.0 * radius, widest_radius);
        return ratio < 0.25 ? radius / 3.0 : radius;
    }

    static std::vector<double> sum(std::vector<double> a, const std::vector<double>& b) {
        for (std::size_t i = 0; i < a.size(); ++i)
            a[i] += b[i];
        return a;
    }

    void finish(PlacementResult& result, const Place& best) const {
        result.compensator = chain_at(best.logarithms);
        result.merit = best.evaluation.merit;
        result.binding = bindings_of(best.evaluation, best.gradients, best.weights);
        result.words = placement_words(problem_, result, best.gradients, best.weights);
    }

    const PlacementProblem& problem_;
    const PlacementOptions& options_;
    std::vector<FreeParameter> parameters_;
    ParameterRoom room_;
    std::mt19937_64 random_;
    std::chrono::steady_clock::time_point started_;
    int start_ = 0;
    bool stopped_ = false;
};

} // namespace

PlacementResult place(const PlacementProblem& problem, const PlacementOptions& options) {
    return Search(problem, options).run();
}

std::vector<double> headroom_slopes(const PlacementProblem& problem) {
    const std::vector<FreeParameter> parameters = free_parameters(problem.compensator);
    const Evaluation evaluation = evaluate(problem, problem.compensator);
    if (evaluation.merit <= unstable_merit)
        return std::vector<double>(parameters.size(), 0.0);
    constexpr double only_the_smallest = 1e-9;
    const std::vector<ShareGradient> gradients = share_gradients(
        problem, problem.compensator, parameters, evaluation, evaluation.merit + only_the_smallest);
    return gradients.empty() ? std::vector<double>(parameters.size(), 0.0)
                             : gradients.front().slope;
}

} // namespace cornerwright
