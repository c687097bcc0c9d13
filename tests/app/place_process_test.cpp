#include "tests/app/command_process.h"

#include <gmock/gmock.h>
#include <nlohmann/json.hpp>

namespace cornerwright::process {
namespace {

using nlohmann::json;
using testing::HasSubstr;

constexpr const char* project = R"json({"cornerwright": 1, "title": "Gantry",
 "plant_cases": [{"name": "empty", "formula": "42 exp(-0.0008 s)/(s (s/31 + 1))"
},
                 {"name": "loaded", "formula": "30 exp(-0.0008 s)/(s (s/22 + 1))"}],
 "compensator": [{"kind": "gain", "gain": 1.0},
                 {"kind": "lead", "zero_rad_s": 100.0, "pole_rad_s": 200.0}],
 "requirements": [{"measure": "phase_margin", "at_least_deg": 50.0},
                  {"measure": "bandwidth", "at_least_rad_s": 70.0}]
})json";

TEST(PlaceCommand, WritesAProjectThatIsMetAndSaysWhatBinds) {
    const Folder folder;
    folder.write("gantry.cornerwright.json", project);
    ASSERT_EQ(folder.run("assess gantry.cornerwright.json").status, 1);
    const Outcome outcome =
        folder.run("place gantry.cornerwright.json --write placed.cornerwright.json");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_THAT(outcome.out, HasSubstr("before"));
    EXPECT_THAT(outcome.out, HasSubstr("Binds: "));
    EXPECT_EQ(folder.run("assess placed.cornerwright.json").status, 0);
    EXPECT_EQ(text_of(folder / "gantry.cornerwright.json"), project);
}

TEST(PlaceCommand, GivesTheSameBytesForTheSameSeed) {
    const Folder folder;
    folder.write("gantry.cornerwright.json", project);
    folder.run("place gantry.cornerwright.json --seed 3 --write one.json");
    folder.run("place gantry.cornerwright.json --seed 3 --write two.json");
    ASSERT_TRUE(fs::exists(folder / "one.json"));
    EXPECT_EQ(text_of(folder / "one.json"), text_of(folder / "two.json"));
}

TEST(PlaceCommand, NamesMeasurementsFromTheFolderItWritesTo) {
    const Folder folder;
    folder.write("unit.csv", "w (rad/s),Magnitude (dB),Phase (deg)\n1,30,-92\n10,10,-100\n"
                             "100,-12,-150\n1000,-45,-200\n");
    json measured = json::parse(project);
    measured["plant_cases"] = json::array({{{"name", "unit"},
                                            {"measurement", {{"file", "unit.csv"}}},
                                            {"integrators", 1},
                                            {"unstable_poles", 0}}});
    measured["requirements"].erase(1);
    folder.write("gantry.cornerwright.json", measured.dump());
    fs::create_directory(folder / "out");
    const Outcome outcome =
        folder.run("place gantry.cornerwright.json --write out/placed.cornerwright.json");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_EQ(folder.run("assess out/placed.cornerwright.json").status, 0);
}

TEST(PlaceCommand, HasTheExitStatusesOfThePage) {
    const Folder folder;
    folder.write("gantry.cornerwright.json", project);
    EXPECT_EQ(folder.run("place gantry.cornerwright.json").status, 64);
    EXPECT_EQ(folder.run("place nowhere.json --write x.json").status, 65);
    EXPECT_EQ(folder.run("place gantry.cornerwright.json --write no/such/folder/x.json").status,
              74);
    json locked = json::parse(project);
    for (json& section : locked["compensator"])
        section["locked"] = true;
    folder.write("locked.cornerwright.json", locked.dump());
    const Outcome outcome = folder.run("place locked.cornerwright.json --write x.json");
    EXPECT_EQ(outcome.status, 65);
    EXPECT_THAT(outcome.err, HasSubstr("unlocked section"));
    EXPECT_FALSE(fs::exists(folder / "x.json"));
}

} // namespace
} // namespace cornerwright::process
