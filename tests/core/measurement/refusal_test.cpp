#include "core/measurement/preview_measurement.h"
#include "core/measurement/read_measurement.h"

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include <algorithm>
#include <cctype>
#include <filesystem>
#include <fstream>
#include <string>
#include <vector>

namespace cornerwright {
namespace {

const std::filesystem::path data =
    std::filesystem::path(CORNERWRIGHT_TEST_DATA) / "core/measurement/data/bad";

std::vector<nlohmann::json> refusals() {
    std::ifstream stream(data / "expected.json");
    return nlohmann::json::parse(stream);
}

std::string name_of_refusal(const testing::TestParamInfo<nlohmann::json>& info) {
    std::string name = info.param["file"];
    std::replace_if(
        name.begin(), name.end(),
        [](char c) { return std::isalnum(static_cast<unsigned char>(c)) == 0; }, '_');
    return name;
}

/// Each broken file with the place, the expectation and the finding that a good message names.
class Refusal : public testing::TestWithParam<nlohmann::json> {};

TEST_P(Refusal, NamesPlaceExpectedAndFound) {
    const auto& expected = GetParam();
    const auto file = data / expected["file"].get<std::string>();
    try {
        (void)read_measurement(file);
        FAIL() << "read without complaint";
    } catch (const InputError& error) {
        SCOPED_TRACE(error.what());
        EXPECT_EQ(error.place().file, file.string());
        const auto& line = expected["line"];
        if (line.is_array()) {
            ASSERT_TRUE(error.place().line.has_value());
            EXPECT_GE(*error.place().line, line[0].get<int>());
            EXPECT_LE(*error.place().line, line[1].get<int>());
        } else if (!line.is_null()) {
            EXPECT_EQ(error.place().line, line.get<int>());
        }
        if (!expected["column"].is_null()) {
            EXPECT_EQ(error.place().column, expected["column"].get<int>());
        }
        EXPECT_NE(error.expected().find(expected["expected"].get<std::string>()),
                  std::string::npos);
        EXPECT_NE(error.found().find(expected["found"].get<std::string>()), std::string::npos);
    }
}

TEST_P(Refusal, ComesBackAsDataInThePreview) {
    const auto file = data / GetParam()["file"].get<std::string>();
    const Preview preview = preview_measurement(file);
    EXPECT_FALSE(preview.result.has_value());
    ASSERT_TRUE(preview.problem.has_value());
}

INSTANTIATE_TEST_SUITE_P(Files, Refusal, testing::ValuesIn(refusals()), name_of_refusal);

} // namespace
} // namespace cornerwright
