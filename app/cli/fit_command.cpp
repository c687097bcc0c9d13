#include "app/cli/command.h"
#include "app/cli/json.h"
#include "app/cli/reading_options.h"
#include "app/cli/text_table.h"
#include "core/fitting/fit.h"
#include "core/numerics/number_text.h"

#include <cmath>
#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string measurement;
    ReadingOptions reading;
    std::string order = "auto";
    std::string dead_time = "0";
    bool stable = false;
    bool json = false;
};

/// The number, or nothing for "auto".
std::optional<double> number_or_auto(const std::string& text, const std::string& option,
                                     const std::string& expected) {
    if (text == "auto")
        return {};
    const auto value = parse_number(text);
    if (!value || *value < 0.0)
        throw UsageError(option + ": expected " + expected + " or auto, found \"" + text + "\"");
    return value;
}

FitOptions fit_options_of(const Options& options) {
    FitOptions fit;
    const std::string orders = "a whole number from 1 to " + std::to_string(highest_fit_order);
    if (const auto order = number_or_auto(options.order, "--order", orders)) {
        if (std::trunc(*order) != *order || *order < 1.0 || *order > highest_fit_order)
            throw UsageError("--order: expected " + orders + " or auto, found \"" + options.order +
                             "\"");
        fit.order = static_cast<int>(*order);
    }
    fit.dead_time_s = number_or_auto(options.dead_time, "--dead-time", "seconds from 0");
    fit.stable = options.stable;
    return fit;
}

void print_json(const FitResult& fit) {
    const PlantModel& model = fit.model;
    Json json = {{"zeros_rad_s", to_json(model.roots.zeros)},
                 {"poles_rad_s", to_json(model.roots.poles)},
                 {"gain", model.roots.gain},
                 {"dead_time_s", model.dead_time_s},
                 {"misfit_db", fit.misfit_db},
                 {"order", fit.order}};
    if (!fit.notes.empty())
        json["notes"] = fit.notes;
    std::cout << json.dump() << '\n';
}

std::string root_text(Complex root) {
    std::string text = number_text(root.real());
    if (root.imag() != 0.0)
        text += (root.imag() < 0.0 ? " - " : " + ") + number_text(std::abs(root.imag())) + "j";
    return text;
}

void print_for_people(const FitResult& fit) {
    std::cout << "order " << fit.order << ", misfit "
              << people_text(Figure::of(fit.misfit_db), "dB") << '\n'
              << "gain " << number_text(fit.model.roots.gain) << ", dead time "
              << number_text(fit.model.dead_time_s) << " s\n\n";
    TextTable table({"", "rad/s"});
    for (const Complex pole : fit.model.roots.poles)
        table.add({"pole", root_text(pole)});
    for (const Complex zero : fit.model.roots.zeros)
        table.add({"zero", root_text(zero)});
    table.print(std::cout);
    for (const std::string& note : fit.notes)
        std::cout << note << '\n';
}

void run(const Options& options) {
    const FitOptions how = fit_options_of(options);
    const ReadResult measured =
        read_measurement(options.measurement, read_options_of(options.reading));
    for (const std::string& warning : measured.warnings)
        std::cerr << warning << '\n';
    try {
        const FitResult fit = fit_model(measured.response, how);
        options.json ? print_json(fit) : print_for_people(fit);
    } catch (const InputError& error) {
        throw error.in_file(options.measurement);
    }
}

} // namespace

void add_fit(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "fit", "Rational model with dead time of a measured frequency response");
    command->add_option("MEASUREMENT", options->measurement, "measurement file")->required();
    command->add_option("--order", options->order, "number of poles, or auto")
        ->capture_default_str();
    command
        ->add_option("--dead-time", options->dead_time,
                     "seconds, or auto to find it together with the roots")
        ->capture_default_str();
    command->add_flag("--stable", options->stable, "no poles right of the axis");
    add_reading_options(*command, options->reading);
    command->add_flag("--json", options->json, "print JSON");
    command->callback([options] { run(*options); });
}

} // namespace cornerwright::cli
