#include "tests/core/handover/handover_samples.h"

#include "core/numerics/error.h"
#include "core/realisation/run_plan.h"
#include "core/realisation/white_input.h"

#include <array>
#include <cstdio>
#include <cstdlib>
#include <stdexcept>
#include <sys/wait.h>

namespace cornerwright::test {

RealisedSample realised_sample(const SampleCompensator& sample, const Realisation& realisation,
                               const std::string& name) {
    RealisedSample result;
    result.name = name;
    result.project.title = sample.name;
    result.project.compensator = sample.chain;
    result.project.sampling = Sampling{sample_period_s, 0.0, true};
    result.project.realisation = realisation;
    result.project.realisation->output_limits = sample.limits;
    result.project.realisation->match_rad_s = 200.0;
    result.assessment.equation =
        discretise(sample.chain, *result.project.sampling, *result.project.realisation);
    RequirementResult requirement;
    requirement.requirement.at_least = 45.0;
    requirement.limit = "at least 45 deg";
    requirement.worst.case_name = "bench unit";
    requirement.worst.value = Figure::of(51.5);
    requirement.worst.headroom = Figure::of(6.5);
    requirement.worst.state = State::met;
    result.assessment.verdict = {State::met, {requirement}};
    return result;
}

std::vector<RealisedSample> realised_samples(const Realisation& realisation) {
    std::vector<RealisedSample> samples;
    for (const SampleCompensator& sample : sample_compensators()) {
        try {
            samples.push_back(
                realised_sample(sample, realisation, "c" + std::to_string(samples.size())));
        } catch (const InputError&) {
            continue; // the tests that run this count what is left
        }
    }
    return samples;
}

std::vector<double> long_input(const NumberFormat& format, int samples) {
    constexpr int stretch = 1000; // samples of one kind of input
    WhiteInput noise(1.0);
    std::vector<double> values;
    for (int i = 0; i < samples; ++i) {
        const double white = noise.next();
        switch (i / stretch % 5) {
        case 0:
            values.push_back(0.25 * white);
            break;
        case 1:
            values.push_back(0.05);
            break;
        case 2:
            values.push_back(white);
            break;
        case 3:
            values.push_back(0.0);
            break;
        default: // overdrive with changing sign
            values.push_back(i / 50 % 2 == 0 ? 3.0 + white : -3.0 + white);
        }
    }
    for (double& value : values)
        value = held_value(value, format);
    return values;
}

TemporaryFolder::TemporaryFolder() {
    std::string pattern = (std::filesystem::temp_directory_path() / "handover-XXXXXX").string();
    if (mkdtemp(pattern.data()) == nullptr)
        throw std::runtime_error("no temporary folder");
    path_ = pattern;
}

TemporaryFolder::~TemporaryFolder() {
    std::error_code ignored;
    std::filesystem::remove_all(path_, ignored);
}

CommandResult run_command(const std::string& command) {
    CommandResult result;
    FILE* pipe = popen((command + " 2>&1").c_str(), "r");
    if (pipe == nullptr)
        throw std::runtime_error("cannot run " + command);
    std::array<char, 4096> buffer{};
    while (const std::size_t size = fread(buffer.data(), 1, buffer.size(), pipe))
        result.output.append(buffer.data(), size);
    const int status = pclose(pipe);
    result.status = WIFEXITED(status) ? WEXITSTATUS(status) : 128;
    return result;
}

} // namespace cornerwright::test
