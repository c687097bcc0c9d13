#include "core/measurement/random_error.h"

#include <cmath>

namespace cornerwright {

double random_error(double coherence, double averages) {
    return std::sqrt((1.0 - coherence) / (2.0 * averages * coherence));
}

std::vector<double> random_errors(const MeasuredResponse& measured) {
    std::vector<double> errors;
    if (!(measured.averages > 0.0))
        return errors;
    for (const double coherence : measured.coherence)
        errors.push_back(random_error(coherence, measured.averages));
    return errors;
}

} // namespace cornerwright
