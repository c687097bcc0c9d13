// What every exported form must hold and what must be refused.
#include "core/handover/cautions.h"
#include "core/numerics/error.h"
#include "tests/core/handover/handover_samples.h"
#include "tests/core/realisation/section_builders.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <fstream>
#include <sstream>

namespace cornerwright::test {
namespace {

namespace fs = std::filesystem;
using testing::HasSubstr;

std::vector<HandoverForm> all_forms() {
    return {HandoverForm::c99, HandoverForm::structured_text, HandoverForm::json,
            HandoverForm::csv};
}

SampleCompensator servo() {
    return {"servo",
            {gain_of(-0.8), pi_at(4.0), lead_of(60.0, 500.0), poles_at(900.0, 0.6)},
            OutputLimits{-0.4, 0.7}};
}

Realisation choice(Structure structure, const NumberFormat& format) {
    Realisation realisation;
    realisation.structure = structure;
    realisation.number_format = format;
    return realisation;
}

/// The servo in every structure and number format, named c0, c1, ...
std::vector<RealisedSample> servo_in_every_form() {
    std::vector<RealisedSample> all;
    for (const Structure structure : all_structures())
        for (const NumberFormat& format : all_formats())
            all.push_back(realised_sample(servo(), choice(structure, format),
                                          "c" + std::to_string(all.size())));
    return all;
}

RealisedSample one_servo() {
    return realised_sample(servo(), Realisation{}, "servo");
}

std::string read_text(const fs::path& file) {
    std::ifstream stream(file);
    std::ostringstream text;
    text << stream.rdbuf();
    return text.str();
}

void replace_text(const fs::path& file, const std::string& found, const std::string& by) {
    std::string text = read_text(file);
    const std::size_t place = text.find(found);
    ASSERT_NE(place, std::string::npos) << found;
    text.replace(place, found.size(), by);
    std::ofstream(file) << text;
}

/// Compiles the sources of one sample with its own main and runs it.
int status_of_selfcheck(const fs::path& folder, const std::string& name) {
    const std::string program = (folder / "check").string();
    const CommandResult compiled = run_command(
        "cd " + folder.string() +
        " && gcc -std=c99 -Wall -Wextra -Werror -pedantic -Wconversion -ffp-contract=off " + name +
        ".c " + name + "_selfcheck.c -o " + program);
    EXPECT_EQ(compiled.status, 0) << compiled.output;
    return run_command(program).status;
}

TEST(ExportedC, SelfCheckPassesAndSeesAWrongCoefficient) {
    for (const RealisedSample& sample : servo_in_every_form()) {
        const TemporaryFolder folder;
        write_handover(handover_files(sample.input(), HandoverForm::c99), folder.path());
        EXPECT_EQ(status_of_selfcheck(folder.path(), sample.name), 0)
            << words_of(sample.equation().realisation);
    }
    const TemporaryFolder folder;
    const RealisedSample sample = one_servo();
    write_handover(handover_files(sample.input(), HandoverForm::c99), folder.path());
    replace_text(folder.path() / "servo.c", " - ", " + ");
    EXPECT_NE(status_of_selfcheck(folder.path(), "servo"), 0);
}

TEST(ExportedC, CompilesAsCxxToo) {
    const TemporaryFolder folder;
    std::string all;
    for (const RealisedSample& sample : servo_in_every_form()) {
        write_handover(handover_files(sample.input(), HandoverForm::c99), folder.path());
        all += "#include \"" + sample.name + ".c\"\n";
    }
    std::ofstream(folder.path() / "all.cpp")
        << all << "int main() { c0_state s; c0_init(&s); return c0_step(&s, 0.0) != 0.0; }\n";
    for (const std::string compiler : {"g++", "clang++"}) {
        const std::string program = (folder.path() / compiler).string();
        const CommandResult compiled =
            run_command(compiler + " -std=c++17 -Wall -Wextra -Werror -pedantic -Wconversion " +
                        (folder.path() / "all.cpp").string() + " -o " + program);
        EXPECT_EQ(compiled.status, 0) << compiled.output;
        EXPECT_EQ(run_command(program).status, 0);
    }
}

/// A C++ program that links the source compiled as C.
TEST(ExportedC, LinksWithCxxAcrossLanguages) {
    const TemporaryFolder folder;
    const RealisedSample sample = one_servo();
    write_handover(handover_files(sample.input(), HandoverForm::c99), folder.path());
    std::ofstream(folder.path() / "main.cpp")
        << "#include \"servo.h\"\nint main() { servo_state s; servo_init(&s); "
           "return servo_step(&s, 0.0) != 0.0; }\n";
    const CommandResult result =
        run_command("cd " + folder.path().string() +
                    " && gcc -std=c99 -c servo.c -o servo.o && g++ main.cpp servo.o -o p && ./p");
    EXPECT_EQ(result.status, 0) << result.output;
}

TEST(ExportedC, NeedsNoLibrary) {
    for (const RealisedSample& sample : servo_in_every_form())
        for (const HandoverFile& file : handover_files(sample.input(), HandoverForm::c99)) {
            if (file.name.ends_with("_selfcheck.c"))
                continue;
            std::istringstream lines(file.bytes);
            for (std::string line; std::getline(lines, line);)
                if (line.starts_with("#include")) {
                    EXPECT_THAT(line, testing::AnyOf("#include <stdint.h>",
                                                     "#include \"" + sample.name + ".h\""));
                }
        }
}

TEST(EveryForm, GivesTheSameBytesForTheSameInput) {
    const RealisedSample sample = one_servo();
    for (const HandoverForm form : all_forms()) {
        const auto first = handover_files(sample.input(), form);
        const auto second = handover_files(sample.input(), form);
        ASSERT_EQ(first.size(), second.size());
        for (std::size_t i = 0; i < first.size(); ++i)
            EXPECT_EQ(first[i].bytes, second[i].bytes) << first[i].name;
    }
}

/// The files that hold coefficients; vectors and the self-check only repeat them.
bool holds_coefficients(const HandoverFile& file) {
    return file.name.find("_vectors") == std::string::npos &&
           file.name.find("_selfcheck") == std::string::npos && !file.name.ends_with(".c");
}

TEST(EveryForm, SaysPlainlyThatRequirementsAreUnmet) {
    RealisedSample sample = one_servo();
    sample.assessment.verdict.state = State::unmet;
    sample.assessment.verdict.requirements[0].worst.state = State::unmet;
    for (const HandoverForm form : all_forms())
        for (const HandoverFile& file : handover_files(sample.input(), form))
            if (holds_coefficients(file)) {
                EXPECT_THAT(file.bytes, HasSubstr("requirements are UNMET")) << file.name;
            }
    sample.assessment.verdict.state = State::met;
    for (const HandoverForm form : all_forms())
        for (const HandoverFile& file : handover_files(sample.input(), form))
            EXPECT_EQ(file.bytes.find("UNMET"), std::string::npos) << file.name;
}

TEST(EveryForm, CarriesCautionsHashAndLimits) {
    const RealisedSample sample = one_servo();
    for (const HandoverForm form : all_forms())
        for (const HandoverFile& file : handover_files(sample.input(), form)) {
            if (!holds_coefficients(file))
                continue;
            for (const std::string& sentence : cautions())
                EXPECT_THAT(file.bytes, HasSubstr(sentence)) << file.name;
            EXPECT_THAT(file.bytes, HasSubstr(sample.input().project_sha256)) << file.name;
            EXPECT_THAT(file.bytes, HasSubstr("conditional integration")) << file.name;
        }
}

/// Words of the user cannot end a comment, nor break a line of one.
TEST(EveryForm, KeepsTextOfTheUserInItsComment) {
    RealisedSample sample = one_servo();
    sample.project.title = "*/ int broken; /* *) broken (* \n broken ?\?/";
    sample.project.compensator[1].label = "*/ *)";
    const TemporaryFolder folder;
    write_handover(handover_files(sample.input(), HandoverForm::c99), folder.path());
    EXPECT_EQ(status_of_selfcheck(folder.path(), "servo"), 0);
}

TEST(EveryForm, RefusesANameThatNoFunctionCanCarry) {
    RealisedSample sample = one_servo();
    for (const char* name :
         {"", "1st", "two words", "a-b", "end_", "a__b", "if", "Array", "../x"}) {
        sample.name = name;
        for (const HandoverForm form : all_forms())
            EXPECT_THROW(handover_files(sample.input(), form), InputError) << name;
    }
}

TEST(EveryForm, NeedsADifferenceEquation) {
    RealisedSample sample = one_servo();
    sample.assessment.equation.reset();
    sample.assessment.realisation_problem = "expected a corner below pi/Ts, found 4000 rad/s";
    try {
        handover_files(sample.input(), HandoverForm::json);
        FAIL();
    } catch (const InputError& refused) {
        EXPECT_THAT(refused.what(), HasSubstr("found 4000 rad/s"));
    }
}

TEST(WriteHandover, MakesTheFolderOrLeavesNothing) {
    const TemporaryFolder place;
    const auto files = handover_files(one_servo().input(), HandoverForm::c99);
    write_handover(files, place.path() / "a" / "b");
    EXPECT_TRUE(fs::exists(place.path() / "a" / "b" / "servo_selfcheck.c"));

    // A folder stands where the last file should go: none of the three is written.
    const fs::path blocked = place.path() / "blocked";
    fs::create_directories(blocked / "servo_selfcheck.c");
    EXPECT_THROW(write_handover(files, blocked), WriteError);
    EXPECT_EQ(std::distance(fs::directory_iterator(blocked), fs::directory_iterator()), 1);

    // A file stands where the folder should be.
    std::ofstream(place.path() / "file") << "kept";
    EXPECT_THROW(write_handover(files, place.path() / "file" / "deeper"), WriteError);
    EXPECT_EQ(read_text(place.path() / "file"), "kept");
}

} // namespace
} // namespace cornerwright::test
