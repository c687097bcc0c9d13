#pragma once

#include "core/engine/assessment.h"
#include "core/loop/loop.h"
#include "core/project/project.h"

#include <memory>

namespace cornerwright {

/// A pure function with memory: the same answer, bit for bit, as a fresh engine on the same
/// project, but what the last edit left alone is not computed again. Not thread-safe; one engine a
/// thread.
class Engine {
  public:
    Engine();
    ~Engine();
    Engine(Engine&&) noexcept;
    Engine& operator=(Engine&&) noexcept;

    /// Judges everything. Bad values come as notes in the assessment, not as exceptions: a case
    /// that cannot be used says why and leaves its requirements undetermined.
    std::shared_ptr<const Assessment> assess(const Project& project);

    /// The root locus of one case (by index), with memory of the last one as a start.
    std::shared_ptr<const RootLocus> locus(const Project& project, std::size_t case_index,
                                           const LocusWindow* window = nullptr);

  private:
    struct Memory;
    std::unique_ptr<Memory> memory_;
};

/// The design loop of one case, as the contract defines it (hold and computation delay as the
/// project's sampling says). Throws InputError where the case has no usable plant.
DesignLoop design_loop_of(const Project& project, const PlantCase& plant_case);

/// The realised loop of one case; needs sampling and realisation. Throws InputError.
RealisedLoop realised_loop_of(const Project& project, const PlantCase& plant_case,
                              const DifferenceEquation& equation);

} // namespace cornerwright
