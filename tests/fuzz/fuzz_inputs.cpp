#include "tests/fuzz/fuzz_inputs.h"

#include "core/measurement/frequency_estimate.h"
#include "core/measurement/preview_measurement.h"
#include "core/measurement/read_measurement.h"
#include "core/measurement/time_record.h"
#include "core/numerics/error.h"
#include "core/project/project.h"

#include <cmath>
#include <stdexcept>
#include <string>

namespace cornerwright::fuzzing {
namespace {

void require(bool kept, const char* promise) {
    if (!kept)
        throw std::logic_error(promise);
}

void require_promises(const MeasuredResponse& response) {
    const auto& w = response.w_rad_s;
    require(w.size() >= 2 && w.size() == response.response.size(), "a response for each frequency");
    require(response.coherence.empty() || response.coherence.size() == w.size(),
            "a coherence for each frequency");
    for (std::size_t i = 0; i < w.size(); ++i) {
        require(std::isfinite(w[i]) && w[i] > (i == 0 ? 0.0 : w[i - 1]), "rising frequencies");
        const Complex value = response.response[i];
        require(value != 0.0 && std::isfinite(value.real()) && std::isfinite(value.imag()),
                "finite responses that are not zero");
    }
    for (const double value : response.coherence)
        require(value >= 0.0 && value <= 1.0, "coherences from 0 to 1");
}

void feed_measurement(std::string_view bytes, const std::string& name) {
    const Preview preview = preview_measurement_bytes(bytes, name);
    require(preview.result.has_value() != preview.problem.has_value(), "a result or a problem");
    if (preview.result)
        require_promises(preview.result->response);
    // The words of the user on top: other columns and units than the file says.
    ReadOptions options;
    options.columns = {{1, "frequency", "rad/s"}, {2, "real", ""}, {3, "imaginary", ""}};
    options.parameter = "22";
    options.flip_sign = true;
    try {
        require_promises(read_measurement_bytes(bytes, name, options).response);
    } catch (const InputError&) {
    }
}

void feed_record(std::string_view bytes) {
    RecordOptions options;
    options.excitation = "2";
    options.response = "3";
    EstimateOptions estimate;
    estimate.averages = 2;
    try {
        const TimeRecord record = read_time_record_bytes(bytes, "record.csv", options);
        require(record.sample_period_s > 0.0 && record.excitation.size() == record.response.size(),
                "two channels and a rate");
        require_promises(estimate_response(record, estimate).response);
        estimate.method = EstimateOptions::Method::tones;
        require_promises(estimate_response(record, estimate).response);
    } catch (const InputError&) {
    }
}

void feed_project(std::string_view bytes) {
    try {
        const LoadedProject loaded = parse_project(std::string(bytes), "fuzzed.cornerwright.json",
                                                   "no-such-folder", MissingFiles::are_notices);
        const std::string text = to_text(loaded.project);
        const LoadedProject again = parse_project(text, "written.cornerwright.json",
                                                  "no-such-folder", MissingFiles::are_notices);
        require(again.project == loaded.project, "a project that reads back as it was written");
    } catch (const InputError&) {
    }
}

} // namespace

void feed(Input input, std::string_view bytes) {
    switch (input) {
    case Input::text_table:
        feed_measurement(bytes, "fuzzed.csv");
        break;
    case Input::touchstone:
        feed_measurement(bytes, "fuzzed.s2p");
        feed_measurement(bytes, "fuzzed.s1p");
        break;
    case Input::universal_file:
        feed_measurement(bytes, "fuzzed.uff");
        break;
    case Input::time_record:
        feed_record(bytes);
        break;
    case Input::project:
        feed_project(bytes);
        break;
    }
}

} // namespace cornerwright::fuzzing
