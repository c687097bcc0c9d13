#include "core/numerics/error.h"
#include "core/project/project.h"
#include "tests/core/project/temporary_folder.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace cornerwright {
namespace {

using testing::HasSubstr;

struct Bad {
    const char* name;
    const char* text;
    int line;
    int column;
    const char* expected;
    const char* found;
};

void PrintTo(const Bad& bad, std::ostream* out) {
    *out << bad.name;
}

class BadProject : public testing::TestWithParam<Bad> {};

TEST_P(BadProject, IsRefusedWithPlaceAndSentence) {
    const Bad& bad = GetParam();
    try {
        parse_project(bad.text, "axis.cornerwright.json", ".");
        FAIL() << "was accepted";
    } catch (const InputError& error) {
        EXPECT_EQ(error.place().file, "axis.cornerwright.json");
        EXPECT_EQ(error.place().line.value_or(0), bad.line) << error.what();
        EXPECT_EQ(error.place().column.value_or(0), bad.column) << error.what();
        EXPECT_THAT(error.expected(), HasSubstr(bad.expected));
        EXPECT_THAT(error.found(), HasSubstr(bad.found));
        EXPECT_EQ(std::string(error.what()).find('\n'), std::string::npos);
    }
}

constexpr Bad json_errors[]{
    {"Empty", "", 1, 1, "literal", "end of input"},
    {"NoJson", "hello", 1, 1, "valid JSON", "invalid literal at 'h'"},
    {"MissingComma", "{\"cornerwright\": 1\n \"title\": \"a\"}", 2, 8, "'}'", "string literal"},
    {"Truncated", "{\"cornerwright\": 1,\n\"title\": ", 2, 10, "literal", "end of input"},
    {"TrailingText", "{\"cornerwright\": 1} x", 1, 21, "end of input", "invalid literal"},
    {"KeyTwice", "{\"cornerwright\": 1,\n  \"title\": \"a\", \"title\": \"b\"}", 2, 17,
     "every key once", "\"title\" a second time"},
    {"NumberTooLarge",
     "{\"cornerwright\": 1, \"compensator\": [{\"kind\": \"gain\", \"gain\": 1e999}]}", 1, 66,
     "JSON", "1e999"},
    {"NotANumber", "{\"cornerwright\": NaN}", 1, 18, "", "invalid literal"},
    {"NotAnObject", "[1]", 1, 1, "a project", "a list"},
};
INSTANTIATE_TEST_SUITE_P(Json, BadProject, testing::ValuesIn(json_errors),
                         [](const auto& chosen) { return std::string(chosen.param.name); });

constexpr Bad key_errors[]{
    {"NoVersion", "{\"title\": \"a\"}", 1, 1, "\"cornerwright\"", "none"},
    {"NewerVersion", "{\"cornerwright\": 2, \"future\": []}", 1, 18, "version 1",
     "newer Cornerwright"},
    {"VersionAsText", "{\"cornerwright\": \"1\"}", 1, 18, "version 1", "the text \"1\""},
    {"UnknownTopKey", "{\"cornerwright\": 1,\n \"colour\": 3}", 2, 2, "\"title\"",
     "unknown key \"colour\""},
    {"SlipInKey", "{\"cornerwright\": 1, \"plant_case\": []}", 1, 21, "\"plant_cases\"",
     "\"plant_case\""},
    {"TitleIsNumber", "{\"cornerwright\": 1, \"title\": 7}", 1, 30, "text for \"title\"",
     "the number 7"},
    {"CasesNoList", "{\"cornerwright\": 1, \"plant_cases\": {}}", 1, 36, "list", "an object"},
    {"WrongUnit",
     "{\"cornerwright\": 1, \"compensator\": [\n {\"kind\": \"lead\", \"zero_hz\": 3, "
     "\"pole_rad_s\": 9}]}",
     2, 19, "\"zero_rad_s\" in compensator section 1 (lead)", "\"zero_hz\""},
    {"WrongUnitOfLimit",
     "{\"cornerwright\": 1, \"requirements\": [{\"measure\": \"phase_margin\", "
     "\"at_least_rad\": 1}]}",
     1, 66, "\"at_least_deg\"", "\"at_least_rad\""},
    {"UnitlessLimit",
     "{\"cornerwright\": 1, \"requirements\": [{\"measure\": \"phase_margin\", \"at_least\": 1}]}",
     1, 66, "\"at_least_deg\"", "\"at_least\""},
    {"KeyOfAnotherKind",
     "{\"cornerwright\": 1, \"compensator\": [{\"kind\": \"gain\", \"gain\": 1, "
     "\"corner_rad_s\": 2}]}",
     1, 65, "\"gain\"", "\"corner_rad_s\""},
};
INSTANTIATE_TEST_SUITE_P(Keys, BadProject, testing::ValuesIn(key_errors),
                         [](const auto& chosen) { return std::string(chosen.param.name); });

#define IN_CASES(text) "{\"cornerwright\": 1, \"plant_cases\": [\n" text "]}"
constexpr Bad plant_errors[]{
    {"FormulaError", IN_CASES("{\"name\": \"a\", \"formula\": \"42/(s (s + z))\"}"), 2, 12,
     "formula in plant case 1 (\"a\")", "\"z\""},
    {"ImproperFormula", IN_CASES("{\"name\": \"a\", \"formula\": \"s^2/(s + 1)\"}"), 2, 26,
     "no more zeros than poles", "2 zeros and 1 pole"},
    {"ImproperRoots",
     IN_CASES("{\"name\": \"a\", \"model\": {\"zeros_rad_s\": [[-1, 0]], \"poles_rad_s\": [], "
              "\"gain\": 1}}"),
     2, 24, "no more zeros than poles", "1 zero and 0 poles"},
    {"NoTwin",
     IN_CASES("{\"name\": \"a\", \"model\": {\"poles_rad_s\": [[-1, 2], [-1, -3]], \"gain\": 1}}"),
     2, 41, "conjugate pairs", "[-1, 2] without its twin"},
    {"RootNoPair",
     IN_CASES("{\"name\": \"a\", \"model\": {\"poles_rad_s\": [-1, 2], \"gain\": 1}}"), 2, 41,
     "[real part, imaginary part]", "the number -1"},
    {"BothForms",
     IN_CASES("{\"name\": \"a\", \"model\": {\"numerator\": [1], \"denominator\": [1, 0], "
              "\"gain\": 1}}"),
     2, 74, "either roots with a gain, or coefficients", "both"},
    {"NoSource", IN_CASES("{\"name\": \"a\"}"), 2, 1, "one of \"formula\"", "none"},
    {"TwoSources", IN_CASES("{\"name\": \"a\", \"formula\": \"1/s\", \"model\": {}}"), 2, 1,
     "one of \"formula\"", "2 of them"},
    {"SameName",
     IN_CASES("{\"name\": \"a\", \"formula\": \"1/s\"},\n{\"name\": \"a\", \"formula\": \"2/s\"}"),
     3, 1, "its own name", "\"a\" a second time"},
    {"NegativeDeadTime",
     IN_CASES("{\"name\": \"a\", \"model\": {\"poles_rad_s\": [[0, 0]], \"gain\": 1, "
              "\"dead_time_s\": -1}}"),
     2, 76, "zero or above for \"dead_time_s\"", "-1"},
    {"IntegratorsOfModel", IN_CASES("{\"name\": \"a\", \"formula\": \"1/s\", \"integrators\": 1}"),
     2, 33, "in plant case 1", "\"integrators\""},
    {"MissingMeasurement",
     IN_CASES("{\"name\": \"a\", \"measurement\": {\"file\": \"nowhere.csv\"}}"), 2, 39,
     "measurement file of plant case 1 (\"a\")", "nowhere.csv"},
    {"BadHash",
     IN_CASES("{\"name\": \"a\", \"measurement\": {\"file\": \"n.csv\", \"sha256\": \"12\"}}"), 2,
     58, "64 lower-case", "\"12\""},
};
INSTANTIATE_TEST_SUITE_P(Plants, BadProject, testing::ValuesIn(plant_errors),
                         [](const auto& chosen) { return std::string(chosen.param.name); });

#define IN_CHAIN(text) "{\"cornerwright\": 1, \"compensator\": [\n" text "]}"
#define IN_LIST(text) "{\"cornerwright\": 1, \"requirements\": [\n" text "]}"
#define IN_REALISATION(text) "{\"cornerwright\": 1, \"realisation\":\n{" text "}}"
constexpr Bad value_errors[]{
    {"UnknownKind", IN_CHAIN("{\"kind\": \"lift\"}"), 2, 10, "\"lead\"", "\"lift\""},
    {"ZeroGain", IN_CHAIN("{\"kind\": \"gain\", \"gain\": 0}"), 2, 26, "other than zero", "0"},
    {"NegativeCorner", IN_CHAIN("{\"kind\": \"pi\", \"corner_rad_s\": -3}"), 2, 32, "above zero",
     "-3"},
    {"CornerAsText", IN_CHAIN("{\"kind\": \"pi\", \"corner_rad_s\": \"3\"}"), 2, 32, "a number",
     "the text \"3\""},
    {"MissingCorner", IN_CHAIN("{\"kind\": \"pi\"}"), 2, 1, "\"corner_rad_s\"", "none"},
    {"LeadTurnedRound", IN_CHAIN("{\"kind\": \"lead\", \"zero_rad_s\": 9, \"pole_rad_s\": 3}"), 2,
     1, "section 1 (lead)", ""},
    {"LagTurnedRound", IN_CHAIN("{\"kind\": \"lag\", \"zero_rad_s\": 1, \"pole_rad_s\": 3}"), 2, 1,
     "section 1 (lag)", ""},
    {"EnabledAsNumber", IN_CHAIN("{\"kind\": \"integrator\", \"enabled\": 1}"), 2, 35,
     "true or false", "1"},
    {"UnknownMeasure", IN_LIST("{\"measure\": \"comfort\"}"), 2, 13, "\"phase_margin\"",
     "\"comfort\""},
    {"NoLimit", IN_LIST("{\"measure\": \"gain_margin\"}"), 2, 1, "\"at_least_db\"", "none"},
    {"LimitsCrossed",
     IN_LIST("{\"measure\": \"bandwidth\", \"at_least_rad_s\": 9, \"at_most_rad_s\": 3}"), 2, 1,
     "not above", "other way round"},
    {"NegativeTime", IN_LIST("{\"measure\": \"rise_time\", \"at_most_s\": -1}"), 2, 39,
     "zero or above", "-1"},
    {"NoFrequency", IN_LIST("{\"measure\": \"roll_off\", \"at_most_db\": -20}"), 2, 1,
     "\"from_rad_s\"", "none"},
    {"NegativePeriod", "{\"cornerwright\": 1, \"sampling\": {\"sample_period_s\": -1}}", 1, 53,
     "zero or above", "-1"},
    {"UnknownMethod", IN_REALISATION("\"method\": \"euler\""), 2, 12, "\"tustin\"", "\"euler\""},
    {"NoMatch", IN_REALISATION("\"method\": \"tustin_at\""), 2, 1, "\"match_rad_s\"", "none"},
    {"WordBits",
     IN_REALISATION("\"method\": \"tustin\", \"number_format\": {\"type\": \"fixed\", "
                    "\"word_bits\": 24, \"fraction_bits\": 8}"),
     2, 70, "16 or 32", "24"},
    {"FractionBits",
     IN_REALISATION("\"method\": \"tustin\", \"number_format\": {\"type\": \"fixed\", "
                    "\"word_bits\": 16, \"fraction_bits\": 16}"),
     2, 91, "from 0 to 15", "16"},
    {"LimitsOfOutput",
     IN_REALISATION("\"method\": \"tustin\", \"output_limits\": {\"at_least\": 2, \"at_most\": 2}"),
     2, 39, "\"at_least\" below \"at_most\"", "equal"},
};
INSTANTIATE_TEST_SUITE_P(Values, BadProject, testing::ValuesIn(value_errors),
                         [](const auto& chosen) { return std::string(chosen.param.name); });

TEST(BadProjectFile, DeepNestingIsRefused) {
    EXPECT_THROW(parse_project(std::string(100'000, '['), "p", "."), InputError);
    std::string objects;
    for (int i = 0; i < 100'000; ++i)
        objects += "{\"a\":";
    EXPECT_THROW(parse_project(objects, "p", "."), InputError);
}

TEST(BadProjectFile, ColumnsCountCharactersNotBytes) {
    try {
        parse_project("{\"cornerwright\": 1, \"title\": \"äöü\", \"colour\": 1}", "p", ".");
        FAIL();
    } catch (const InputError& error) {
        EXPECT_EQ(error.place().column, 37);
    }
}

TEST(BadProjectFile, EveryTruncationOfAGoodProjectIsRefused) {
    const std::string good = to_text(Project{});
    for (std::size_t size = 0; size + 2 < good.size(); ++size)
        EXPECT_THROW(parse_project(good.substr(0, size), "p", "."), InputError) << size;
}

TEST(BadProjectFile, AFolderOrNothingIsNoProject) {
    const TemporaryFolder folder;
    EXPECT_THROW(load_project(folder.path()), InputError);
    EXPECT_THROW(load_project(folder.path() / "none.json"), InputError);
}

} // namespace
} // namespace cornerwright
