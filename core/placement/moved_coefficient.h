#pragma once

#include "core/realisation/difference_equation.h"

#include <cstddef>
#include <string>
#include <vector>

namespace cornerwright {

/// One number of a difference equation as it runs.
struct CoefficientName {
    std::size_t section = 0;
    bool is_numerator = true;
    std::size_t power = 0; ///< index into b or a (direct forms), beta or alpha (delta)
};

/// Every coefficient that runs and is not zero; a[0] and alpha[0] are 1 and no coefficients.
std::vector<CoefficientName> coefficients_of(const DifferenceEquation& equation);

double coefficient(const DifferenceEquation& equation, const CoefficientName& name);

/// The equation with that coefficient at `value`; the form that does not run is kept equal. The
/// integers of fixed point stay as they were: the result is for judging, not for running.
DifferenceEquation with_coefficient(DifferenceEquation equation, const CoefficientName& name,
                                    double value);

/// "b1", "alpha2".
std::string text_of(const CoefficientName& name, const DifferenceEquation& equation);

} // namespace cornerwright
