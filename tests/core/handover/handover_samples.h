#pragma once

#include "core/handover/handover.h"
#include "tests/core/realisation/sample_compensators.h"

#include <filesystem>
#include <memory>
#include <string>
#include <vector>

namespace cornerwright::test {

/// A compensator realised, with all that a handover is made from. `assessment` holds an equation
/// and one requirement, met.
struct RealisedSample {
    std::string name; ///< an identifier
    Project project;
    Assessment assessment;

    HandoverInput input() const { return {&project, &assessment, std::string(64, 'a'), name}; }
    const DifferenceEquation& equation() const { return *assessment.equation; }
};

/// Every sample compensator that the realisation accepts (the invariant methods refuse improper
/// sections), named c0, c1, ...
std::vector<RealisedSample> realised_samples(const Realisation& realisation);

/// One compensator as a whole.
RealisedSample realised_sample(const SampleCompensator& sample, const Realisation& realisation,
                               const std::string& name);

/// Steps, white noise and overdrive, as the number format holds them.
std::vector<double> long_input(const NumberFormat& format, int samples);

/// A folder of its own that goes when the object goes.
class TemporaryFolder {
  public:
    TemporaryFolder();
    ~TemporaryFolder();
    TemporaryFolder(const TemporaryFolder&) = delete;
    TemporaryFolder& operator=(const TemporaryFolder&) = delete;

    const std::filesystem::path& path() const { return path_; }

  private:
    std::filesystem::path path_;
};

/// Runs a shell command; gives its exit status and what it printed.
struct CommandResult {
    int status = 0;
    std::string output;
};
CommandResult run_command(const std::string& command);

} // namespace cornerwright::test
