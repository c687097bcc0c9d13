#include "core/placement/placement_words.h"

#include "core/numerics/number_text.h"

#include <algorithm>
#include <cmath>
#include <numeric>
#include <optional>
#include <utility>

namespace cornerwright {
namespace {

/// Multipliers below this part of the whole are the interior point's remainder, not a pull.
constexpr double least_weight = 0.01;

std::string merit_words(double merit) {
    return merit <= unstable_merit ? "not stable" : number_text(merit, 3);
}

std::string measure_words(const Requirement& requirement) {
    std::string words(name_of(requirement.measure));
    std::replace(words.begin(), words.end(), '_', ' ');
    return words;
}

std::string binding_words(const PlacementProblem& problem, const Binding& binding) {
    std::string words = measure_words(problem.requirements[binding.requirement]) + " on " +
                        binding.case_name + ", " + std::string(name_of(binding.loop));
    if (binding.at_rad_s.is_value())
        words += ", at " + number_text(binding.at_rad_s.value(), 4) + " rad/s";
    return words;
}

double cosine(const std::vector<double>& a, const std::vector<double>& b) {
    const double product = std::inner_product(a.begin(), a.end(), b.begin(), 0.0);
    const double size = std::sqrt(std::inner_product(a.begin(), a.end(), a.begin(), 0.0) *
                                  std::inner_product(b.begin(), b.end(), b.begin(), 0.0));
    return size > 0.0 ? product / size : 0.0;
}

/// The two requirements whose slopes oppose each other most, among those that bind.
std::optional<std::pair<std::size_t, std::size_t>>
conflict_of(const std::vector<ShareGradient>& gradients, const std::vector<double>& weights) {
    std::optional<std::pair<std::size_t, std::size_t>> pair;
    double most_opposed = 0.0;
    for (std::size_t i = 0; i < gradients.size() && i < weights.size(); ++i) {
        for (std::size_t j = i + 1; j < gradients.size() && j < weights.size(); ++j) {
            if (gradients[i].requirement == gradients[j].requirement ||
                std::min(weights[i], weights[j]) < least_weight)
                continue;
            const double opposed = cosine(gradients[i].slope, gradients[j].slope);
            if (opposed < most_opposed) {
                most_opposed = opposed;
                pair = {gradients[i].requirement, gradients[j].requirement};
            }
        }
    }
    return pair;
}

} // namespace

std::vector<Binding> bindings_of(const Evaluation& evaluation,
                                 const std::vector<ShareGradient>& gradients,
                                 const std::vector<double>& weights) {
    std::vector<Binding> bindings;
    for (std::size_t i = 0; i < gradients.size() && i < weights.size(); ++i) {
        if (weights[i] < least_weight)
            continue;
        const ShareGradient& gradient = gradients[i];
        const Judgement& judgement =
            evaluation.verdict.requirements[gradient.requirement].all[gradient.loop];
        bindings.push_back(
            {gradient.requirement, judgement.case_name, judgement.loop, judgement.at_rad_s,
             judgement.share.is_determined() ? judgement.share.value() : 0.0, weights[i]});
    }
    std::stable_sort(bindings.begin(), bindings.end(),
                     [](const Binding& a, const Binding& b) { return a.weight > b.weight; });
    return bindings;
}

std::vector<std::string> placement_words(const PlacementProblem& problem,
                                         const PlacementResult& result,
                                         const std::vector<ShareGradient>& gradients,
                                         const std::vector<double>& weights) {
    std::vector<std::string> words{
        "Smallest share of headroom: " + merit_words(result.merit_before) + " before, " +
        merit_words(result.merit) + " now."};
    if (result.merit >= 0.0)
        words.emplace_back("All requirements that could be determined are met.");
    for (const Binding& binding : result.binding)
        words.push_back("Binds: " + binding_words(problem, binding) + ".");
    if (result.merit < 0.0) {
        if (const auto pair = conflict_of(gradients, weights))
            words.push_back("These two pull against each other: " +
                            measure_words(problem.requirements[pair->first]) + " and " +
                            measure_words(problem.requirements[pair->second]) + ".");
    }
    if (result.stopped)
        words.emplace_back("Stopped before the search was through; this is the best so far.");
    return words;
}

} // namespace cornerwright
