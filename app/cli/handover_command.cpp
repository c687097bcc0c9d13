#include "app/cli/command.h"
#include "core/engine/engine.h"
#include "core/handover/handover.h"
#include "core/handover/report_tables.h"
#include "core/numerics/error.h"
#include "core/project/load_measurement.h"

#include <array>
#include <filesystem>
#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string form;
    std::string folder;
    std::string name = "compensator";
};

constexpr std::array forms{HandoverForm::c99, HandoverForm::structured_text, HandoverForm::json,
                           HandoverForm::csv};

std::vector<std::string> form_names() {
    std::vector<std::string> names;
    names.reserve(forms.size());
    for (const HandoverForm form : forms)
        names.emplace_back(name_of(form));
    return names;
}

HandoverForm form_named(const std::string& name) {
    for (const HandoverForm form : forms)
        if (name_of(form) == name)
            return form;
    throw UsageError("--as: expected c99, structured-text, json or csv, found \"" + name + "\"");
}

void check_name(const std::string& name) {
    try {
        check_handover_name(name);
    } catch (const InputError& error) {
        throw UsageError("--name: " + std::string(error.what()));
    }
}

std::vector<HandoverFile> files_of(const Options& options, const Project& project,
                                   const Assessment& assessment) {
    try {
        return handover_files(
            {&project, &assessment, sha256_of_file(options.project), options.name},
            form_named(options.form));
    } catch (const InputError& error) {
        throw error.in_file(options.project);
    }
}

void hand_over(const Options& options) {
    check_name(options.name);
    const Project project = load_telling_notices(options.project);
    Engine engine;
    const auto assessment = engine.assess(project);
    const auto files = files_of(options, project, *assessment);
    write_handover(files, options.folder);
    for (const HandoverFile& file : files)
        std::cout << (std::filesystem::path(options.folder) / file.name).string() << '\n';
    if (assessment->verdict.state != State::met)
        std::cerr << "handed over all the same, and said so in every file: "
                  << verdict_words(assessment->verdict) << '\n';
}

} // namespace

void add_handover(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "handover", "Write the difference equation as firmware receives it, with its evidence and "
                    "test vectors. Unmet requirements refuse nothing; every file says so");
    command->add_option("PROJECT", options->project, "project file")->required();
    command->add_option("--as", options->form, "c99, structured-text, json or csv")
        ->required()
        ->check(CLI::IsMember(form_names()));
    command->add_option("--to", options->folder, "folder to write into; made where it is missing")
        ->required();
    command->add_option("--name", options->name, "name of the files and functions")
        ->capture_default_str();
    command->callback([options] { hand_over(*options); });
}

} // namespace cornerwright::cli
