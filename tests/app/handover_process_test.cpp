#include "tests/app/command_process.h"

#include <gmock/gmock.h>
#include <nlohmann/json.hpp>

namespace cornerwright::process {
namespace {

using nlohmann::json;
using testing::ElementsAre;
using testing::HasSubstr;
using testing::IsEmpty;
using testing::Not;
using testing::StartsWith;

constexpr const char* project = R"json({"cornerwright": 1, "title": "Gantry",
 "plant_cases": [{"name": "empty tray", "formula": "42 exp(-0.0008 s)/(s (s/31 + 1))"}],
 "compensator": [{"kind": "gain", "gain": 1.0},
                 {"kind": "lead", "zero_rad_s": 60.0, "pole_rad_s": 300.0}],
 "sampling": {"sample_period_s": 0.001, "computation_delay_s": 0.0002,
              "design_includes_hold": true},
 "realisation": {"method": "tustin", "structure": "direct_form_2_transposed",
                 "number_format": {"type": "float64"}},
 "requirements": [{"measure": "phase_margin", "at_least_deg": 50.0}]
})json";

/// Exit status of a shell in the folder.
int shell(const Folder& folder, const std::string& words) {
    return WEXITSTATUS(std::system(("cd '" + (folder / ".").string() + "' && " + words).c_str()));
}

std::vector<std::string> names_in(const fs::path& folder) {
    std::vector<std::string> names;
    for (const auto& entry : fs::directory_iterator(folder))
        names.push_back(entry.path().filename().string());
    std::sort(names.begin(), names.end());
    return names;
}

json with(const char* key, const json& value) {
    json changed = json::parse(project);
    changed[key] = value;
    return changed;
}

TEST(HandoverCommand, WritesTheFilesOfEveryForm) {
    const Folder folder;
    folder.write("axis.json", project);
    for (const std::string form : {"c99", "structured-text", "json", "csv"}) {
        const Outcome outcome = folder.run("handover axis.json --as " + form + " --to out");
        EXPECT_EQ(outcome.status, 0) << outcome.err;
        EXPECT_THAT(outcome.err, IsEmpty());
    }
    EXPECT_THAT(names_in(folder / "out"),
                ElementsAre("compensator.c", "compensator.csv", "compensator.h", "compensator.json",
                            "compensator.st", "compensator_selfcheck.c",
                            "compensator_vectors.csv"));
}

TEST(HandoverCommand, GeneratedCodeChecksItself) {
    const Folder folder;
    folder.write("axis.json", project);
    const Outcome outcome = folder.run("handover axis.json --as c99 --to out --name servo");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_EQ(outcome.out, "out/servo.h\nout/servo.c\nout/servo_selfcheck.c\n");
    const std::string build = "cc -std=c99 -Wall -Wextra -Werror -pedantic -ffp-contract=off -o "
                              "check out/servo.c out/servo_selfcheck.c && ./check";
    EXPECT_EQ(shell(folder, build), 0);
}

TEST(HandoverCommand, NamesTheHashOfTheProjectFile) {
    const Folder folder;
    folder.write("axis.json", project);
    ASSERT_EQ(folder.run("handover axis.json --as json --to out").status, 0);
    ASSERT_EQ(shell(folder, "sha256sum axis.json > hash"), 0);
    const json written = json::parse(text_of(folder / "out/compensator.json"));
    EXPECT_EQ(written["project_sha256"], text_of(folder / "hash").substr(0, 64));
    EXPECT_EQ(written["verdict"], "met");
}

TEST(HandoverCommand, UnmetRequirementsRefuseNothingButAreSaid) {
    const Folder folder;
    folder.write(
        "axis.json",
        with("requirements", {{{"measure", "phase_margin"}, {"at_least_deg", 89.0}}}).dump());
    const Outcome outcome = folder.run("handover axis.json --as json --to out");
    EXPECT_EQ(outcome.status, 0);
    EXPECT_THAT(outcome.err, HasSubstr("1 of 1 requirements unmet"));
    EXPECT_EQ(json::parse(text_of(folder / "out/compensator.json"))["verdict"], "unmet");
}

TEST(HandoverCommand, RefusesWhatCannotRunAndSaysWhy) {
    const Folder folder;
    json improper = json::parse(project);
    improper["compensator"].push_back({{"kind", "real_zero"}, {"zero_rad_s", 500.0}});
    folder.write("improper.json", improper.dump());
    json beyond = json::parse(project);
    beyond["compensator"].push_back({{"kind", "real_pole"}, {"pole_rad_s", 4000.0}});
    beyond["realisation"]["method"] = "tustin_at_corners";
    folder.write("beyond.json", beyond.dump());
    json narrow = json::parse(project);
    narrow["realisation"]["number_format"] = {
        {"type", "fixed"}, {"word_bits", 16}, {"fraction_bits", 15}};
    narrow["compensator"][0]["gain"] = 1e6;
    folder.write("narrow.json", narrow.dump());
    json unsampled = json::parse(project);
    unsampled.erase("realisation");
    folder.write("unsampled.json", unsampled.dump());
    const std::pair<const char*, const char*> refused[] = {{"improper", "no more zeros than poles"},
                                                           {"beyond", "below pi/Ts"},
                                                           {"narrow", "fraction bits"},
                                                           {"unsampled", "without a realisation"}};
    for (const auto& [name, words] : refused) {
        const Outcome outcome =
            folder.run(std::string("handover ") + name + ".json --as c99 --to out");
        EXPECT_EQ(outcome.status, 65) << name;
        EXPECT_THAT(outcome.err, StartsWith(std::string(name) + ".json: expected")) << name;
        EXPECT_THAT(outcome.err, HasSubstr(words)) << name;
        EXPECT_EQ(std::count(outcome.err.begin(), outcome.err.end(), '\n'), 1) << outcome.err;
        EXPECT_FALSE(fs::exists(folder / "out")) << name;
    }
}

TEST(HandoverCommand, WritesNothingWhereItCannotWriteAll) {
    const Folder folder;
    folder.write("axis.json", project);
    folder.write("file", "not a folder");
    const Outcome file = folder.run("handover axis.json --as c99 --to file");
    EXPECT_EQ(file.status, 74);
    EXPECT_THAT(file.err, HasSubstr("file"));
    EXPECT_EQ(text_of(folder / "file"), "not a folder");

    // The second file of three cannot take its place: the first must not stay behind.
    fs::create_directories(folder / "out/compensator.c");
    const Outcome folder_in_the_way = folder.run("handover axis.json --as c99 --to out");
    EXPECT_EQ(folder_in_the_way.status, 74);
    EXPECT_THAT(folder_in_the_way.err, HasSubstr("compensator.c"));
    EXPECT_THAT(names_in(folder / "out"), ElementsAre("compensator.c"));
}

TEST(HandoverCommand, AFullDiskLeavesNoPartOfAFile) {
    const Folder folder;
    folder.write("axis.json", project);
    // A limit on the size of any file a process writes ends a write as a full disk does.
    const std::string run = "ulimit -f 1; trap '' XFSZ; '" CORNERWRIGHT_CLI
                            "' handover axis.json --as c99 --to out 2> said";
    EXPECT_EQ(shell(folder, "bash -c \"" + run + "\""), 74);
    EXPECT_THAT(text_of(folder / "said"), HasSubstr("File too large"));
    if (fs::exists(folder / "out")) {
        EXPECT_THAT(names_in(folder / "out"), IsEmpty());
    }
}

TEST(HandoverCommand, TellsWrongUsage) {
    const Folder folder;
    folder.write("axis.json", project);
    EXPECT_EQ(folder.run("handover axis.json --to out").status, 64);
    EXPECT_EQ(folder.run("handover axis.json --as c99").status, 64);
    const Outcome form = folder.run("handover axis.json --as rust --to out");
    EXPECT_EQ(form.status, 64);
    EXPECT_THAT(form.err, HasSubstr("rust"));
    for (const std::string name : {"if", "9lives", "a-b", "a__b", "''"}) {
        const Outcome outcome = folder.run("handover axis.json --as c99 --to out --name " + name);
        EXPECT_EQ(outcome.status, 64) << name;
        EXPECT_THAT(outcome.err, StartsWith("--name: expected a name")) << name;
    }
    EXPECT_FALSE(fs::exists(folder / "out"));
}

TEST(ReportCommand, WritesOnePageThatNeedsNothingElse) {
    const Folder folder;
    folder.write("axis.json", project);
    const Outcome outcome = folder.run("report axis.json --to review.html");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    const std::string page = text_of(folder / "review.html");
    EXPECT_THAT(page, StartsWith("<!DOCTYPE html>"));
    for (const char* words : {"<svg", "empty tray", "licensed practice", "Phase margin"})
        EXPECT_THAT(page, HasSubstr(words));
    for (const char* fetched : {"src=\"http", "href=\"http", "@import", "<script"})
        EXPECT_THAT(page, Not(HasSubstr(fetched)));
}

TEST(ReportCommand, SameProjectSameBytesUnlessADateIsAsked) {
    const Folder folder;
    folder.write("axis.json", project);
    folder.run("report axis.json --to one.html");
    folder.run("report axis.json --to two.html");
    folder.run("report axis.json --to dated.html --date '1 March 2031'");
    EXPECT_EQ(text_of(folder / "one.html"), text_of(folder / "two.html"));
    EXPECT_THAT(text_of(folder / "dated.html"), HasSubstr("1 March 2031"));
    EXPECT_THAT(text_of(folder / "one.html"), Not(HasSubstr("Printed")));
}

TEST(ReportCommand, WritesPdfThroughTheWindowProgram) {
    const Folder folder;
    folder.write("axis.json", project);
    const Outcome outcome = folder.run("report axis.json --to one.pdf");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_EQ(outcome.out, "one.pdf\n");
    EXPECT_THAT(text_of(folder / "one.pdf"), StartsWith("%PDF-"));
    folder.run("report axis.json --to two.pdf");
    EXPECT_EQ(text_of(folder / "one.pdf"), text_of(folder / "two.pdf"));

    folder.write("broken.json", "{");
    const Outcome broken = folder.run("report broken.json --to broken.pdf");
    EXPECT_EQ(broken.status, 65);
    EXPECT_THAT(broken.err, HasSubstr("broken.json, line 1"));
    EXPECT_EQ(folder.run("report axis.json --to no/such/folder/one.pdf").status, 74);
    EXPECT_FALSE(fs::exists(folder / "broken.pdf"));
}

TEST(ReportCommand, HasTheExitStatusesOfThePage) {
    const Folder folder;
    folder.write("axis.json", project);
    EXPECT_EQ(folder.run("report axis.json").status, 64);
    const Outcome suffix = folder.run("report axis.json --to review.docx");
    EXPECT_EQ(suffix.status, 64);
    EXPECT_THAT(suffix.err, HasSubstr("review.docx"));
    EXPECT_EQ(folder.run("report nowhere.json --to review.html").status, 65);
    EXPECT_EQ(folder.run("report axis.json --to no/such/folder/review.html").status, 74);
    EXPECT_FALSE(fs::exists(folder / "review.html"));
}

} // namespace
} // namespace cornerwright::process
