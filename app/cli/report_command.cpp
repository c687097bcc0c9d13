#include "app/cli/command.h"
#include "app/cli/window_program.h"
#include "core/engine/engine.h"
#include "core/handover/report.h"
#include "core/handover/report_plots.h"
#include "core/numerics/write_file.h"
#include "core/project/load_measurement.h"

#include <filesystem>
#include <iostream>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string file;
    std::string date;
};

void write_html(const Options& options) {
    const Project project = load_telling_notices(options.project);
    Engine engine;
    const auto assessment = engine.assess(project);
    std::shared_ptr<const RootLocus> locus;
    if (!assessment->cases.empty())
        locus = engine.locus(project, worst_case_of(*assessment));
    write_file(options.file, report_html({&project, assessment.get(), locus.get(),
                                          sha256_of_file(options.project), options.date}));
}

int write_pdf(const Options& options) {
    std::vector<std::string> arguments{"--report", options.file};
    if (!options.date.empty())
        arguments.insert(arguments.end(), {"--report-date", options.date});
    arguments.insert(arguments.end(), {"--", options.project});
    return run_window_program(arguments, "--to");
}

int write_report(const Options& options) {
    const auto suffix = std::filesystem::path(options.file).extension();
    int status = done;
    if (suffix == ".pdf")
        status = write_pdf(options);
    else if (suffix == ".html")
        write_html(options);
    else
        throw UsageError("--to: expected a name that ends in .html or .pdf, found \"" +
                         options.file + "\"");
    if (status == done)
        std::cout << options.file << '\n';
    return status;
}

} // namespace

void add_report(CLI::App& program, int& status) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "report", "Write the design review document: requirements on every case and loop, curves, "
                  "sections, coefficients, what was not determined, cautions");
    command->add_option("PROJECT", options->project, "project file")->required();
    command
        ->add_option("--to", options->file,
                     "file to write: NAME.html, one self-contained page, or NAME.pdf")
        ->required();
    command->add_option("--date", options->date,
                        "a date to print; without it the same project gives the same bytes");
    command->callback([options, &status] { status = write_report(*options); });
}

} // namespace cornerwright::cli
