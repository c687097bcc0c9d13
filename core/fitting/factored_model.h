#pragma once

#include "core/numerics/complex.h"
#include "core/plant/plant_case.h"

#include <vector>

namespace cornerwright {

/// A real factor of a polynomial: s + c0 (degree 1) or s^2 + c1 s + c0 (degree 2). A factor of
/// degree 2 passes smoothly from a complex pair to two real roots.
struct Factor {
    int degree = 1;
    double c0 = 0.0;
    double c1 = 0.0;
    bool fixed = false; ///< not moved by the refinement: an integrator kept at the origin
};

/// gain * prod(zero factors) / prod(pole factors) * exp(-s dead_time).
struct FactoredModel {
    double gain = 1.0;
    std::vector<Factor> zeros;
    std::vector<Factor> poles;
    double dead_time_s = 0.0;
};

/// The response at s = jw.
Complex response_at(const FactoredModel& model, double w);

int degree_of(const std::vector<Factor>& factors);

/// Roots in conjugate pairs become one factor; real ones are joined two by two, neighbours in size.
std::vector<Factor> factors_of(const ComplexVector& roots);
/// The roots, complex ones as exact conjugates.
ComplexVector roots_of(const std::vector<Factor>& factors);

PlantModel plant_model_of(const FactoredModel& model);

/// Points to be met: s = jw, the response there, and the weight of its relative error.
struct FitPoints {
    std::vector<double> w;
    ComplexVector response;
    std::vector<double> weight;
};

/// Sum over the points of |weight (model/response - 1)|^2.
double weighted_cost(const FactoredModel& model, const FitPoints& points);

struct Refined {
    FactoredModel model;
    double cost = 0.0;
};

/// Levenberg-Marquardt on all factors that are not fixed, the size of the gain, and the dead time
/// if `with_dead_time`. The cost never grows. Source: D. W. Marquardt, An algorithm for
/// least-squares estimation of nonlinear parameters, J. SIAM 11 (1963) (citation from memory).
Refined refine(const FactoredModel& start, const FitPoints& points, bool with_dead_time,
               int most_steps);

} // namespace cornerwright
