#include "tests/app/command_process.h"

#include <gmock/gmock.h>
#include <nlohmann/json.hpp>

namespace cornerwright::process {
namespace {

using nlohmann::json;
using testing::AllOf;
using testing::HasSubstr;
using testing::IsEmpty;
using testing::Matcher;
using testing::StartsWith;

constexpr const char* good = R"json({
  "cornerwright": 1,
  "title": "Axis",
  "plant_cases": [
    {"name": "nominal", "formula": "2/(s (s + 2))"}
  ],
  "compensator": [
    {"kind": "gain", "gain": 2.0}
  ],
  "requirements": [
    {"measure": "phase_margin", "at_least_deg": 45.0}
  ]
})json";

/// A slip in a good project: what is replaced, by what, and what the sentence must say.
struct Slip {
    const char* name;
    std::string from;
    std::string to;
    Matcher<std::string> sentence;
};

std::string after(const Slip& slip) {
    std::string text = good;
    const std::size_t at = text.find(slip.from);
    EXPECT_NE(at, std::string::npos) << slip.name;
    return text.replace(at, slip.from.size(), slip.to);
}

const Slip slips[] = {
    {"BrokenJson", R"("gain": 2.0})", R"("gain": 2.0 "locked": true})",
     AllOf(HasSubstr("line 8, column "), HasSubstr("expected"))},
    {"UnknownKey", R"("gain": 2.0)", R"("gian": 2.0)",
     AllOf(HasSubstr("line 8"), HasSubstr("gian"))},
    {"WrongUnitKey", "at_least_deg", "at_least_rad",
     AllOf(HasSubstr("line 11"), HasSubstr("at_least_rad"))},
    {"ImproperPlant", "2/(s (s + 2))", "(s^2 + 1)/(s + 2)",
     AllOf(HasSubstr("line 5"), HasSubstr("zeros"))},
    {"FormulaError", "2/(s (s + 2))", "2/(s (s + q))",
     AllOf(HasSubstr("line 5"), HasSubstr("column "), HasSubstr("q"))},
    {"AmbiguousFormula", "2/(s (s + 2))", "1/2 s", HasSubstr("line 5")},
    {"MissingMeasurement", R"json("formula": "2/(s (s + 2))")json",
     R"("measurement": {"file": "nowhere.csv"})", HasSubstr("nowhere.csv")},
    {"TextCell", R"json("formula": "2/(s (s + 2))")json", R"("measurement": {"file": "text.csv"})",
     AllOf(HasSubstr("text.csv"), HasSubstr("line 4, column 2"))},
    {"NewerVersion", R"("cornerwright": 1)", R"("cornerwright": 2)",
     AllOf(HasSubstr("line 2"), HasSubstr("2"))},
    {"UnknownKind", R"("kind": "gain")", R"("kind": "gian")",
     AllOf(HasSubstr("line 8"), HasSubstr("gian"))},
    {"ValueOutOfBounds", R"("gain": 2.0)", R"("gain": 0.0)", HasSubstr("line 8")},
    {"NotANumber", R"("gain": 2.0)", R"("gain": NaN)", HasSubstr("line 8")},
    {"TooLargeANumber", R"("gain": 2.0)", R"("gain": 1e999)", HasSubstr("line 8")},
    {"TwoCasesOfOneName", R"json({"name": "nominal", "formula": "2/(s (s + 2))"})json",
     R"json({"name": "nominal", "formula": "1/s"}, {"name": "nominal", "formula": "1/s"})json",
     HasSubstr("nominal")},
};

class BadProject : public testing::TestWithParam<Slip> {};

TEST_P(BadProject, IsRefusedInOneSentenceByEveryCommand) {
    const Folder folder;
    folder.write("axis.json", after(GetParam()));
    folder.write("text.csv", "Frequency (Hz),Magnitude (dB),Phase (deg)\n1,2,3\n2,1,-3\n"
                             "3,broken,-5\n4,0,-8\n5,-1,-9\n");
    for (const std::string command :
         {"assess axis.json", "curves axis.json --case nominal --at 1",
          "step axis.json --case nominal --until 1", "locus axis.json --case nominal --factors 1",
          "place axis.json --write out.json", "handover axis.json --as json --to out",
          "report axis.json --to out.html"}) {
        const Outcome outcome = folder.run(command);
        EXPECT_EQ(outcome.status, 65) << command;
        EXPECT_THAT(outcome.err, GetParam().sentence) << command;
        EXPECT_EQ(std::count(outcome.err.begin(), outcome.err.end(), '\n'), 1) << outcome.err;
        EXPECT_THAT(outcome.out, IsEmpty()) << command;
    }
    EXPECT_EQ(text_of(folder / "axis.json"), after(GetParam()));
    for (const char* written : {"out", "out.json", "out.html"})
        EXPECT_FALSE(fs::exists(folder / written)) << written;
}

INSTANTIATE_TEST_SUITE_P(Slips, BadProject, testing::ValuesIn(slips),
                         [](const auto& slip) { return std::string(slip.param.name); });

TEST(BadProject, OneWithoutASlipIsTaken) {
    const Folder folder;
    folder.write("axis.json", good);
    EXPECT_EQ(folder.run("assess axis.json").status, 0);
}

TEST(BadTarget, AProjectThatCannotBeWrittenStaysAsItWas) {
    const Folder folder;
    folder.write("axis.json", good);
    // Root may write a read-only file, so a folder stands where the file would go.
    fs::create_directory(folder / "taken.json");
    const Outcome outcome = folder.run("place axis.json --write taken.json");
    EXPECT_EQ(outcome.status, 74);
    EXPECT_THAT(outcome.err, AllOf(HasSubstr("taken.json"), HasSubstr("write")));
    EXPECT_EQ(std::count(outcome.err.begin(), outcome.err.end(), '\n'), 1) << outcome.err;
    EXPECT_TRUE(fs::is_empty(folder / "taken.json"));
    EXPECT_EQ(text_of(folder / "axis.json"), good);
}

TEST(BadTarget, AFullDiskKeepsTheOldFileAndLeavesNothingBeside) {
    const Folder folder;
    folder.write("axis.json", good);
    folder.write("old.html", "the old report");
    const std::string run = "bash -c \"ulimit -f 1; trap '' XFSZ; '" CORNERWRIGHT_CLI
                            "' report axis.json --to old.html\"";
    const std::string place = "cd '" + (folder / ".").string() + "' && ";
    EXPECT_EQ(WEXITSTATUS(std::system((place + run + " 2> said > /dev/null").c_str())), 74);
    EXPECT_THAT(text_of(folder / "said"), AllOf(HasSubstr("old.html"), HasSubstr("large")));
    EXPECT_EQ(text_of(folder / "old.html"), "the old report");
    int files = 0;
    for ([[maybe_unused]] const auto& entry : fs::directory_iterator(folder / "."))
        ++files;
    EXPECT_EQ(files, 3) << "axis.json, old.html and said";
}

} // namespace
} // namespace cornerwright::process
