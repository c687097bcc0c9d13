// design, sensitivity and tolerance as processes.

#include "tests/app/command_process.h"

#include <gmock/gmock.h>
#include <nlohmann/json.hpp>

#include <cmath>

namespace cornerwright::process {
namespace {

using nlohmann::json;
using testing::HasSubstr;

// K. Ogata, Modern Control Engineering, 5th ed., ch. 7: 4/(s(s+2)), Kv = 20, 50 deg (citation from
// memory).
constexpr const char* project = R"json({"cornerwright": 1, "title": "Stage",
 "plant_cases": [{"name": "stage", "formula": "4/(s (s + 2))"}],
 "compensator": [{"kind": "gain", "gain": 1.0}],
 "requirements": [{"measure": "gain_margin", "at_least_db": 6.0}]
})json";

TEST(DesignCommand, GainForErrorAndLiftPhaseReachTheTextbookSpecification) {
    const Folder folder;
    folder.write("stage.cornerwright.json", project);
    const Outcome gain = folder.run(
        "design gain-for-error stage.cornerwright.json --input ramp --error 0.05 --write "
        "stage.cornerwright.json");
    ASSERT_EQ(gain.status, 0) << gain.err;
    const Outcome lead = folder.run(
        "design lift-phase stage.cornerwright.json --margin 50 --write stage.cornerwright.json");
    ASSERT_EQ(lead.status, 0) << lead.err;
    EXPECT_THAT(lead.out, HasSubstr("allowance of 10 deg"));
    const json assessed = json::parse(folder.run("assess stage.cornerwright.json --json").out);
    const json& loop = assessed["cases"][0]["loops"]["design"];
    EXPECT_NEAR(loop["phase_margin_deg"].get<double>(), 50.0, 0.01);
    EXPECT_NEAR(loop["steady_state_error"]["ramp"].get<double>(), 0.05, 1e-9);
}

TEST(DesignCommand, WhatCannotBeIsSaidAndNothingIsWritten) {
    const Folder folder;
    folder.write("stage.cornerwright.json", project);
    const Outcome outcome = folder.run(
        "design quiet-resonance stage.cornerwright.json --from 10 --to 100 --write new.json");
    EXPECT_EQ(outcome.status, 65);
    EXPECT_THAT(outcome.err, HasSubstr("No case has a resonance peak"));
    EXPECT_EQ(folder.run("assess new.json").status, 65);
    EXPECT_EQ(folder.run("design roll-off stage.cornerwright.json").status, 64);
}

TEST(SensitivityCommand, TellsHowFarTheGainMayRise) {
    // K/(s(s+1)(s+2)) is stable for K < 6 (Ogata, as above, ch. 5; citation from memory): 6 dB of
    // gain margin are left up to 6/10^(6/20).
    const Folder folder;
    folder.write("third.cornerwright.json", R"json({"cornerwright": 1, "title": "Third",
 "plant_cases": [{"name": "p", "formula": "1/(s (s + 1) (s + 2))"}],
 "compensator": [{"kind": "gain", "gain": 1.0}],
 "requirements": [{"measure": "gain_margin", "at_least_db": 6.0}]
})json");
    const json told = json::parse(folder.run("sensitivity third.cornerwright.json --json").out);
    ASSERT_EQ(told["values"].size(), 1U);
    EXPECT_NEAR(told["values"][0]["up"]["factor"].get<double>(), 6.0 / std::pow(10.0, 0.3), 1e-5);
    EXPECT_EQ(told["values"][0]["up"]["measure"], "gain_margin");
    EXPECT_EQ(told["values"][0]["down"]["end"], "nothing fails");
}

TEST(ToleranceCommand, KeepsTheWorstSampleAsACaseThatStandsAsBadly) {
    const Folder folder;
    folder.write("stage.cornerwright.json", R"json({"cornerwright": 1, "title": "Stage",
 "plant_cases": [{"name": "stage", "formula": "40 exp(-0.01 s)/(s (s + 2))"}],
 "compensator": [{"kind": "lead", "zero_rad_s": 5.0, "pole_rad_s": 40.0}],
 "requirements": [{"measure": "phase_margin", "at_least_deg": 40.0}]
})json");
    const std::string run = "tolerance stage.cornerwright.json --plant-gain 20 --plant-corners 10 "
                            "--components 5 --samples 50 --json --keep-worst kept.json";
    const Outcome outcome = folder.run(run);
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    const json told = json::parse(outcome.out);
    EXPECT_EQ(told["smallest_shares"].size(), 50U);
    EXPECT_EQ(folder.run(run + " --workers 1").out, outcome.out);
    const json kept = json::parse(folder.run("assess kept.json --json").out);
    ASSERT_EQ(kept["cases"].size(), 2U);
    EXPECT_EQ(kept["cases"][1]["name"], "worst sample of stage");
    EXPECT_NEAR(kept["requirements"][0]["share"].get<double>(),
                told["worst"]["smallest_share"].get<double>(), 1e-6);
    EXPECT_EQ(folder.run("tolerance stage.cornerwright.json").status, 65);
}

} // namespace
} // namespace cornerwright::process
