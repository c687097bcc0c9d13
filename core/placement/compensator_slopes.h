#pragma once

#include "core/placement/free_parameters.h"
#include "core/placement/problem.h"

#include <vector>

namespace cornerwright {

/// How C moves with each free parameter, in the continuous and in the sampled form.
class CompensatorSlopes {
  public:
    /// Throws InputError where the sampled form cannot be made near `chain`.
    CompensatorSlopes(const PlacementProblem& problem, const Chain& chain,
                      const std::vector<FreeParameter>& parameters);

    /// d ln C(jw) / d ln(parameter), exact.
    ComplexVector design(double w_rad_s) const;

    /// The same of the difference equation at exp(jw Ts) before rounding, by central differences of
    /// its roots: relative error about 1e-9. Rounding makes steps, not slopes.
    ComplexVector realised(double w_rad_s) const;

  private:
    struct Neighbours {
        RootForm above;
        RootForm below;
    };

    const Chain* chain_;
    const std::vector<FreeParameter>* parameters_;
    double sample_period_s_ = 0.0;
    std::vector<Neighbours> neighbours_;
};

} // namespace cornerwright
