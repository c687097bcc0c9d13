#include "core/project/project.h"
#include "tests/app/command_process.h"

#include <gmock/gmock.h>
#include <nlohmann/json.hpp>

#include <set>

namespace cornerwright::process {
namespace {

using nlohmann::json;
using testing::HasSubstr;
using testing::IsEmpty;

fs::path demo_file(const std::string& name) {
    return fs::path(CORNERWRIGHT_DEMOS) / name / (name + ".cornerwright.json");
}

class EveryDemo : public testing::TestWithParam<const char*> {
  protected:
    Outcome run(const std::string& command, const std::string& options) const {
        return folder_.run(command + " '" + demo_file(GetParam()).string() + "' " + options);
    }
    Folder folder_;
};

TEST_P(EveryDemo, LoadsWithoutNoticesAndIsWrittenAsTheProgramSavesIt) {
    const LoadedProject loaded = load_project(demo_file(GetParam()));
    EXPECT_THAT(loaded.notices, IsEmpty());
    EXPECT_EQ(to_text(loaded.project), text_of(demo_file(GetParam())));
}

/// Limits that something falls short of, by case.
std::set<std::string> cases_that_fail(const json& project, const Folder& folder) {
    std::set<std::string> failing;
    for (const json& plant_case : project["plant_cases"]) {
        json alone = project;
        alone["plant_cases"] = json::array({plant_case});
        folder.write("alone.json", alone.dump());
        if (folder.run("assess alone.json").status == 1)
            failing.insert(plant_case["name"]);
    }
    return failing;
}

/// The one demo on whose every case every requirement holds.
constexpr const char* demo_that_holds = "germination-chamber";

TEST_P(EveryDemo, HoldsOnEveryCaseOrFailsByALittleOnOne) {
    json project = json::parse(text_of(demo_file(GetParam())));
    for (json& plant_case : project["plant_cases"]) {
        if (plant_case.contains("measurement")) {
            const std::string file = plant_case["measurement"]["file"];
            plant_case["measurement"]["file"] =
                (demo_file(GetParam()).parent_path() / file).string();
        }
    }
    const std::set<std::string> failing = cases_that_fail(project, folder_);
    const bool holds = GetParam() == std::string(demo_that_holds);
    EXPECT_EQ(failing.size(), holds ? 0U : 1U);
    EXPECT_GT(project["plant_cases"].size(), failing.size());

    const Outcome outcome = run("assess", "--json");
    EXPECT_EQ(outcome.status, holds ? 0 : 1);
    for (const json& requirement : json::parse(outcome.out)["requirements"]) {
        if (requirement["state"] == "unmet") {
            EXPECT_GT(requirement["share"], -0.5) << requirement;
        }
    }
}

TEST_P(EveryDemo, EveryLoopIsStable) {
    for (const json& plant_case : json::parse(run("assess", "--json").out)["cases"])
        for (const char* loop : {"design", "realised"})
            EXPECT_EQ(plant_case["loops"][loop]["stable"], true) << plant_case["name"] << loop;
}

TEST_P(EveryDemo, CanBeHandedOverAndReported) {
    for (const std::string form : {"c99", "structured-text", "json", "csv"})
        EXPECT_EQ(run("handover", "--as " + form + " --to out").status, 0) << form;
    EXPECT_EQ(run("report", "--to review.html").status, 0);
}

TEST_P(EveryDemo, PlacementMeetsWhatCanBeDetermined) {
    const Outcome outcome = run("place", "--write placed.json");
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_NE(folder_.run("assess placed.json").status, 1) << outcome.out;
}

INSTANTIATE_TEST_SUITE_P(Projects, EveryDemo,
                         testing::Values("seedling-gantry", "converter-48-12",
                                         "germination-chamber"),
                         [](const auto& tested) {
                             std::string name = tested.param;
                             std::erase(name, '-');
                             return name;
                         });

TEST(SeedlingGantry, HasFourMeasuredLoadsOfWhichOneHasNoFit) {
    const Project project = load_project(demo_file("seedling-gantry")).project;
    ASSERT_EQ(project.plant_cases.size(), 4U);
    EXPECT_EQ(project.compensator.size(), 6U);
    EXPECT_DOUBLE_EQ(project.sampling->sample_period_s, 1.0 / 2000.0);
    int fits = 0;
    for (const PlantCase& plant_case : project.plant_cases) {
        const auto& measurement = std::get<MeasurementSource>(plant_case.source);
        EXPECT_EQ(measurement.response->w_rad_s.size(), 800U);
        fits += measurement.fit.has_value();
    }
    EXPECT_EQ(fits, 3);
}

TEST(SeedlingGantry, WhatNeedsAModelOfTheFourthLoadIsNotDetermined) {
    const Folder folder;
    const json assessment = json::parse(
        folder.run("assess '" + demo_file("seedling-gantry").string() + "' --json").out);
    const json& loop = assessment["cases"][3]["loops"]["design"];
    EXPECT_TRUE(loop["overshoot_percent"].is_null());
    EXPECT_THAT(loop["notes"]["overshoot_percent"].get<std::string>(), HasSubstr("no fit"));
    EXPECT_TRUE(assessment["cases"][0]["loops"]["design"]["overshoot_percent"].is_number());
}

} // namespace
} // namespace cornerwright::process
