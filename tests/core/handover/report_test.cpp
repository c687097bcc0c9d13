// The review report as a document: valid, complete, the same bytes for the same input.
#include "core/engine/engine.h"
#include "core/handover/cautions.h"
#include "core/handover/report.h"
#include "core/handover/report_plots.h"
#include "tests/core/handover/handover_samples.h"
#include "tests/core/realisation/section_builders.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <fstream>

namespace cornerwright::test {
namespace {

using testing::HasSubstr;
using testing::Not;

Requirement at_least(Measure measure, double limit) {
    Requirement requirement;
    requirement.measure = measure;
    requirement.at_least = limit;
    return requirement;
}

Project gantry(const NumberFormat& format) {
    Project project;
    project.title = "Gantry <traverse> & \"lift\"";
    project.notes = "Invented figures.";
    project.plant_cases = {{"light", FormulaSource{"60 exp(-0.0008 s)/(s (s/30 + 1))"}},
                           {"heavy & slow", FormulaSource{"40/(s (s/20 + 1))"}}};
    project.compensator = {gain_of(0.9), pi_at(2.0), lead_of(25.0, 300.0),
                           notch_at(500.0, 0.05, 0.5)};
    project.compensator[2].label = "<b>lift</b>";
    project.sampling = Sampling{0.001, 0.0002, true};
    project.realisation = Realisation{};
    project.realisation->number_format = format;
    project.realisation->output_limits = OutputLimits{-2.0, 2.0};
    project.requirements = {at_least(Measure::phase_margin, 45.0),
                            at_least(Measure::gain_margin, 60.0)};
    return project;
}

std::string report_of(const Project& project, const std::string& date = "") {
    Engine engine;
    const auto assessment = engine.assess(project);
    std::shared_ptr<const RootLocus> locus;
    if (!project.plant_cases.empty())
        locus = engine.locus(project, worst_case_of(*assessment));
    return report_html({&project, assessment.get(), locus.get(), std::string(64, 'a'), date});
}

std::vector<Project> projects() {
    Project bare;
    Project design_only = gantry({});
    design_only.sampling.reset();
    design_only.realisation.reset();
    Project refused = gantry({});
    refused.compensator.push_back(pole_at(9000.0));
    Project unstable = gantry({});
    unstable.compensator[0].gain = 500.0;
    return {bare,     design_only, refused,
            unstable, gantry({}),  gantry({NumberFormat::Type::fixed, 32, 20})};
}

/// By the validator of the Debian package `tidy`: no error and no warning.
TEST(Report, IsValidHtml) {
    if (run_command("tidy -v").status != 0)
        GTEST_SKIP() << "the HTML validator tidy is not installed";
    for (const Project& project : projects()) {
        const TemporaryFolder folder;
        const auto file = folder.path() / "report.html";
        std::ofstream(file) << report_of(project);
        const CommandResult result = run_command("tidy -q -e " + file.string());
        EXPECT_EQ(result.status, 0) << result.output;
    }
    const TemporaryFolder folder; // and it does find fault
    const auto file = folder.path() / "broken.html";
    std::ofstream(file) << "<!DOCTYPE html><html><body><p>a<table></p></body>";
    EXPECT_NE(run_command("tidy -q -e " + file.string()).status, 0);
}

TEST(Report, IsTheSameForTheSameInputAndTellsADateOnlyWhereGiven) {
    const Project project = gantry({});
    EXPECT_EQ(report_of(project), report_of(project));
    EXPECT_THAT(report_of(project), Not(HasSubstr("Printed")));
    EXPECT_THAT(report_of(project, "2026-12-01"), HasSubstr("Printed 2026-12-01"));
}

TEST(Report, StandsAlone) {
    for (const Project& project : projects()) {
        const std::string report = report_of(project);
        for (const char* outside : {"<script", "<link", "<img", "src=", "url(", "@import"})
            EXPECT_THAT(report, Not(HasSubstr(outside)));
    }
}

TEST(Report, TellsVerdictCautionsCostsAndLimits) {
    const std::string report = report_of(gantry({NumberFormat::Type::fixed, 32, 20}));
    EXPECT_THAT(report, HasSubstr("1 of 2 requirements unmet"));
    for (const std::string& sentence : cautions()) {
        if (sentence.find('\'') == std::string::npos) {
            EXPECT_THAT(report, HasSubstr(sentence));
        }
    }
    for (const char* part :
         {"L1 bound", "Rounding noise", "limit cycle", "Largest relative pole error",
          "Smallest fraction_bits", "Step with output limits", "Time at a limit"})
        EXPECT_THAT(report, HasSubstr(part));
}

TEST(Report, WritesTextOfTheUserAsText) {
    const std::string report = report_of(gantry({}));
    EXPECT_THAT(report, HasSubstr("Gantry &lt;traverse&gt; &amp; &quot;lift&quot;"));
    EXPECT_THAT(report, Not(HasSubstr("<b>lift</b>")));
}

} // namespace
} // namespace cornerwright::test
