#include "app/cli/command.h"
#include "core/engine/engine.h"
#include "core/handover/report.h"
#include "core/handover/report_plots.h"
#include "core/numerics/write_file.h"

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

void write_report(const Options& options) {
    const auto suffix = std::filesystem::path(options.file).extension();
    if (suffix == ".pdf")
        throw UsageError("--to: the window writes the report as PDF (its report button); expected "
                         "a name that ends in .html here, found \"" +
                         options.file + "\"");
    if (suffix != ".html")
        throw UsageError("--to: expected a name that ends in .html, found \"" + options.file +
                         "\"");
    const Project project = load_telling_notices(options.project);
    Engine engine;
    const auto assessment = engine.assess(project);
    std::shared_ptr<const RootLocus> locus;
    if (!assessment->cases.empty())
        locus = engine.locus(project, worst_case_of(*assessment));
    write_file(options.file, report_html({&project, assessment.get(), locus.get(),
                                          sha256_of_file(options.project), options.date}));
    std::cout << options.file << '\n';
}

} // namespace

void add_report(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "report", "Write the design review document: requirements on every case and loop, curves, "
                  "sections, coefficients, what was not determined, cautions");
    command->add_option("PROJECT", options->project, "project file")->required();
    command->add_option("--to", options->file, "file to write; one self-contained HTML page")
        ->required();
    command->add_option("--date", options->date,
                        "a date to print; without it the same project gives the same bytes");
    command->callback([options] { write_report(*options); });
}

} // namespace cornerwright::cli
