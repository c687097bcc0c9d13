#include "tests/app/command_process.h"

#include <gmock/gmock.h>
#include <nlohmann/json.hpp>

#include <cmath>
#include <complex>
#include <numbers>

namespace cornerwright::process {
namespace {

using nlohmann::json;
using testing::HasSubstr;

constexpr const char* project = R"json({"cornerwright": 1, "title": "Belt axis",
 "plant_cases": [{"name": "nominal", "formula": "50/(s (0.01 s + 1))"
}],
 "compensator": [{"kind": "gain", "gain": 1.0}],
 "sampling": {"sample_period_s": 0.001, "computation_delay_s": 0.0, "design_includes_hold": true},
 "realisation": {"method": "tustin", "structure": "direct_form_1",
                 "number_format": {"type": "float64"}},
 "requirements": [{"measure": "phase_margin", "at_least_deg": 60.0},
                  {"measure": "gain_margin", "at_least_db": 6.0}]
})json";

/// k/(s (0.01 s + 1)) from 0.5 to 400 Hz.
std::string unit(double k) {
    std::ostringstream text;
    text.precision(12);
    text << "Frequency (Hz),Magnitude (dB),Phase (deg)\n";
    for (int i = 0; i < 120; ++i) {
        const double f = 0.5 * std::pow(800.0, i / 119.0);
        const std::complex<double> s(0.0, 2.0 * std::numbers::pi * f);
        const std::complex<double> p = k / (s * (0.01 * s + 1.0));
        text << f << ',' << 20.0 * std::log10(std::abs(p)) << ','
             << std::arg(p) * 180.0 / std::numbers::pi << '\n';
    }
    return text.str();
}

/// Nine units whose gain rises, and one broken file.
void write_fleet(const Folder& folder) {
    folder.write("axis.cornerwright.json", project);
    for (int i = 1; i <= 9; ++i)
        folder.write("units/unit-" + std::to_string(i) + ".csv", unit(10.0 * i));
    folder.write("units/unit-5b.csv", "Frequency (Hz),Magnitude (dB),Phase (deg)\n1.0,2.0\n");
    folder.write("units/notes.md", "not a measurement");
}

TEST(FleetCommand, JudgesEveryUnitAndListsTheBrokenOne) {
    const Folder folder;
    write_fleet(folder);
    const Outcome outcome = folder.run("fleet axis.cornerwright.json units --json");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    const json result = json::parse(outcome.out);
    EXPECT_EQ(result["counts"]["units"], 10);
    EXPECT_EQ(result["counts"]["unreadable"], 1);
    EXPECT_EQ(result["units"][5]["file"], "unit-5b.csv");
    EXPECT_THAT(result["units"][5]["problem"].get<std::string>(), HasSubstr("unit-5b.csv"));
    EXPECT_THAT(result["units"][5]["problem"].get<std::string>(), HasSubstr("expected"));
    // More gain, less phase margin: the last unit is the worst, and unmet ones come before met.
    EXPECT_EQ(result["worst_units"][0]["file"], "unit-9.csv");
    EXPECT_EQ(result["requirements"][0]["worst_file"], "unit-9.csv");
    EXPECT_EQ(result["units"][0]["verdict"], "met");
    EXPECT_EQ(result["units"][9]["verdict"], "unmet");
    EXPECT_EQ(result["verdict"], "unmet");
}

TEST(FleetCommand, QuantilesAreFiguresOfUnits) {
    const Folder folder;
    write_fleet(folder);
    const json result = json::parse(folder.run("fleet axis.cornerwright.json units --json").out);
    const json& spread = result["spread"][0];
    ASSERT_EQ(spread["figure"], "phase_margin_deg");
    ASSERT_EQ(spread["determined"], 9);
    // Rank ceil(0.5 * 9) = 5 of the ascending margins: the fifth highest gain.
    ASSERT_EQ(result["quantiles"][4], 0.5);
    EXPECT_EQ(spread["quantiles"][4], result["units"][4]["design"]["phase_margin_deg"]);
    EXPECT_EQ(spread["quantiles"][0], result["units"][9]["design"]["phase_margin_deg"]);
    EXPECT_EQ(spread["quantiles"][8], result["units"][0]["design"]["phase_margin_deg"]);
}

TEST(FleetCommand, AUnitHasTheFiguresThatTheAssessmentOfItsFileHas) {
    const Folder folder;
    write_fleet(folder);
    json alone = json::parse(project);
    alone["plant_cases"] = json::array({{{"name", "unit"},
                                         {"measurement", {{"file", "units/unit-3.csv"}}},
                                         {"integrators", 1},
                                         {"unstable_poles", 0}}});
    folder.write("alone.cornerwright.json", alone.dump());
    const json assessed = json::parse(folder.run("assess alone.cornerwright.json --json").out);
    const json fleet = json::parse(folder.run("fleet axis.cornerwright.json units --json").out);
    for (const char* loop : {"design", "realised"})
        for (const auto& [figure, value] : fleet["units"][2][loop].items())
            EXPECT_EQ(value, assessed["cases"][0]["loops"][loop][figure]) << loop << figure;
}

TEST(FleetCommand, ShardsMergedAreTheBytesOfOneRun) {
    const Folder folder;
    write_fleet(folder);
    std::string merge = " --merge";
    for (const std::string shard : {"3", "1", "2"}) {
        const Outcome part =
            folder.run("fleet axis.cornerwright.json units --workers 1 --shard " + shard + "/3");
        ASSERT_EQ(part.status, 0) << part.err;
        folder.write("part" + shard, part.out);
        merge += " part" + shard;
    }
    for (const std::string form : {" --json", ""}) {
        const Outcome one = folder.run("fleet axis.cornerwright.json units" + form);
        const Outcome together = folder.run("fleet axis.cornerwright.json" + form + merge);
        EXPECT_EQ(together.status, 0) << together.err;
        EXPECT_EQ(together.out, one.out);
    }
}

TEST(FleetCommand, RefusesShardsThatDoNotMakeOneFleet) {
    const Folder folder;
    write_fleet(folder);
    for (const std::string shard : {"1", "2"})
        folder.write("part" + shard,
                     folder.run("fleet axis.cornerwright.json units --shard " + shard + "/2").out);
    EXPECT_EQ(folder.run("fleet axis.cornerwright.json --merge part1").status, 64);
    EXPECT_EQ(folder.run("fleet axis.cornerwright.json --merge part1 part1").status, 65);
    folder.write("other", "{}");
    EXPECT_EQ(folder.run("fleet axis.cornerwright.json --merge part1 other").status, 65);
    json edited = json::parse(project);
    edited["compensator"][0]["gain"] = 2.0;
    folder.write("edited.cornerwright.json", edited.dump());
    EXPECT_EQ(folder.run("fleet edited.cornerwright.json --merge part1 part2").status, 65);
}

TEST(FleetCommand, TellsWrongUsageAndEmptyFolders) {
    const Folder folder;
    write_fleet(folder);
    for (const std::string shard : {"0/2", "3/2", "1", "a/b", "1.5/2"})
        EXPECT_EQ(folder.run("fleet axis.cornerwright.json units --shard " + shard).status, 64)
            << shard;
    EXPECT_EQ(folder.run("fleet axis.cornerwright.json").status, 64);
    EXPECT_EQ(folder.run("fleet axis.cornerwright.json nowhere").status, 65);
    fs::create_directory(folder / "empty");
    EXPECT_EQ(folder.run("fleet axis.cornerwright.json empty").status, 65);
}

} // namespace
} // namespace cornerwright::process
