#pragma once

#include "core/fitting/factored_model.h"

#include <functional>
#include <optional>

namespace cornerwright {

/// What is held while a model is sought. Frequencies of the points are scaled to order 1.
struct SearchTask {
    FitPoints points;
    std::optional<double> dead_time; ///< in the scaled unit of time; empty: to be found
    bool stable = false;
};

struct Candidate {
    FactoredModel model;
    double cost = 0.0;
    double criterion = 0.0; ///< Bayesian information criterion, smaller is better
};

/// The best model with `order` poles. `lower` may hold the best one of a lower order as a start.
Candidate fit_order(const SearchTask& task, int order, const Candidate* lower);

/// The order with the smallest criterion, tried upwards from 1 until several in turn gain nothing.
/// (G. Schwarz, Estimating the dimension of a model, Annals of Statistics 6, 1978; from memory.)
Candidate fit_best_order(const SearchTask& task, int highest_order,
                         const std::function<bool(double)>& proceed);

/// The model refined and tidied once more with every error taken relative to the model in place of
/// the measured value, whose own scatter gives chance dips too much say where the coherence is low.
Candidate settled(const SearchTask& task, const Candidate& found);

/// Dead times worth a try in the task's unit: 0 up to what the total turn of the phase allows.
std::vector<double> dead_time_grid(const FitPoints& points);

} // namespace cornerwright
