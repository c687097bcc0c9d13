#include "app/cli/command.h"
#include "app/cli/json.h"
#include "core/measurement/frequency_estimate.h"
#include "core/measurement/random_error.h"
#include "core/measurement/time_record.h"
#include "core/measurement/write_response.h"
#include "core/numerics/number_text.h"

#include <filesystem>
#include <iostream>
#include <map>
#include <memory>
#include <numbers>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string file;
    RecordOptions record;
    EstimateOptions estimate;
    std::string tones_hz;
    std::string out;
    bool json = false;
};

using Method = EstimateOptions::Method;
using Window = EstimateOptions::Window;
using Detrend = EstimateOptions::Detrend;

const std::map<std::string, Method> methods = {
    {"h1", Method::h1}, {"h2", Method::h2}, {"tones", Method::tones}};
const std::map<std::string, Window> windows = {{"hann", Window::hann},
                                               {"hamming", Window::hamming},
                                               {"blackman", Window::blackman},
                                               {"rectangular", Window::rectangular}};
const std::map<std::string, Detrend> trends = {
    {"line", Detrend::line}, {"mean", Detrend::mean}, {"none", Detrend::none}};

/// An option whose value is one of the names of `choices`.
template <class Value>
void add_choice(CLI::App& command, const std::string& name, Value& value,
                const std::map<std::string, Value>& choices, const std::string& words) {
    command
        .add_option_function<std::string>(
            name, [&value, &choices](const std::string& text) { value = choices.at(text); }, words)
        ->check(CLI::IsMember(choices));
}

Json estimate_json(const TimeRecord& record, const Estimate& estimate) {
    const MeasuredResponse& response = estimate.response;
    const auto errors = random_errors(response);
    return {{"w_rad_s", response.w_rad_s},
            {"response", to_json(response.response)},
            {"coherence", response.coherence},
            {"averages", response.averages},
            {"random_error", errors.empty() ? Json(nullptr) : Json(errors)},
            {"excitation", record.excitation_name},
            {"response_column", record.response_name},
            {"sample_period_s", record.sample_period_s},
            {"rows", record.excitation.size()},
            {"piece_length", estimate.piece_length},
            {"warnings", estimate.warnings}};
}

/// How the response was made, for the head of its table.
std::vector<std::string> remarks_of(const TimeRecord& record, const Estimate& estimate,
                                    const std::string& file) {
    std::vector<std::string> remarks = {
        "frequency response from \"" + record.excitation_name + "\" to \"" + record.response_name +
            "\" of the time record " + std::filesystem::path(file).filename().string(),
        std::to_string(record.excitation.size()) + " samples, one every " +
            number_text(record.sample_period_s) + " s"};
    remarks.insert(remarks.end(), estimate.warnings.begin(), estimate.warnings.end());
    return remarks;
}

void run(const Options& options) {
    EstimateOptions how = options.estimate;
    if (!options.tones_hz.empty()) {
        how.method = Method::tones;
        how.tones_rad_s = number_list(options.tones_hz, "--tones", 0.0, false);
        for (double& tone : how.tones_rad_s)
            tone *= 2.0 * std::numbers::pi;
    }
    const TimeRecord record = read_time_record(options.file, options.record);
    Estimate estimate;
    try {
        estimate = estimate_response(record, how);
    } catch (const InputError& error) {
        throw error.in_file(options.file);
    }
    const auto remarks = remarks_of(record, estimate, options.file);
    if (!options.out.empty()) {
        write_response(estimate.response, options.out, remarks);
        for (const std::string& warning : estimate.warnings)
            std::cerr << warning << '\n';
    }
    if (options.json)
        std::cout << estimate_json(record, estimate).dump() << '\n';
    else if (options.out.empty())
        std::cout << response_table(estimate.response, remarks);
}

} // namespace

void add_estimate(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "estimate", "Frequency response with coherence from a sampled time record; a table on "
                    "standard output unless --json or --out is given");
    command->add_option("RECORD", options->file, "time record: a text table")->required();
    command
        ->add_option("--excitation", options->record.excitation,
                     "heading of the column, or its number from 1")
        ->required();
    command
        ->add_option("--response", options->record.response,
                     "heading of the column, or its number from 1")
        ->required();
    command
        ->add_option("--averages", options->estimate.averages,
                     "pieces that overlap by half; the more, the less scatter and the coarser the "
                     "frequencies")
        ->check(CLI::PositiveNumber)
        ->capture_default_str();
    add_choice(*command, "--method", options->estimate.method, methods,
               "h1: noise on the response (default); h2: noise on the excitation; tones: stepped "
               "sine, each tone correlated by itself");
    command->add_option("--tones", options->tones_hz,
                        "frequencies of a stepped sine in Hz, separated by commas; found in the "
                        "excitation if silent");
    add_choice(*command, "--window", options->estimate.window, windows,
               "laid over each piece (default hann)");
    add_choice(*command, "--detrend", options->estimate.detrend, trends,
               "taken off each piece (default line)");
    command
        ->add_option("--sample-period", options->record.sample_period_s,
                     "seconds, whatever the file says")
        ->check(CLI::PositiveNumber);
    command->add_flag("--json", options->json, "print JSON");
    command->add_option("--out", options->out, "table to write, which `read` takes");
    command->callback([options] { run(*options); });
}

} // namespace cornerwright::cli
