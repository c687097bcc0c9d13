#include "core/measurement/preview_measurement.h"
#include "core/measurement/read_measurement.h"

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include <algorithm>
#include <complex>
#include <filesystem>
#include <fstream>
#include <string>
#include <vector>

namespace cornerwright {
namespace {

const std::filesystem::path data =
    std::filesystem::path(CORNERWRIGHT_TEST_DATA) / "core/measurement/data";

std::vector<std::filesystem::path> measurement_files() {
    std::vector<std::filesystem::path> files;
    for (const auto& entry : std::filesystem::directory_iterator(data))
        if (entry.is_regular_file() && entry.path().extension() != ".json")
            files.push_back(entry.path());
    std::sort(files.begin(), files.end());
    return files;
}

nlohmann::json truth_of(const std::filesystem::path& file) {
    std::ifstream stream(file.string() + ".truth.json");
    return nlohmann::json::parse(stream);
}

std::string name_of_file(const testing::TestParamInfo<std::filesystem::path>& info) {
    std::string name = info.param.filename().string();
    std::replace_if(
        name.begin(), name.end(),
        [](char c) { return std::isalnum(static_cast<unsigned char>(c)) == 0; }, '_');
    return name;
}

/// The truths were made together with the files (invented plants with known noise); they say what a
/// reader must have understood, point by point.
class Truth : public testing::TestWithParam<std::filesystem::path> {};

void expect_points(const MeasuredResponse& read, const nlohmann::json& truth) {
    const auto& w = truth["w_rad_s"];
    const auto& response = truth["response"];
    ASSERT_EQ(read.w_rad_s.size(), w.size());
    ASSERT_EQ(read.response.size(), response.size());
    for (std::size_t i = 0; i < w.size(); ++i) {
        const double expected_w = w[i].get<double>();
        const Complex expected{response[i][0].get<double>(), response[i][1].get<double>()};
        EXPECT_LE(std::abs(read.w_rad_s[i] - expected_w), 1e-9 * expected_w) << "point " << i;
        EXPECT_LE(std::abs(read.response[i] - expected), 1e-9 * std::abs(expected))
            << "point " << i;
    }
    if (truth["coherence"].is_null()) {
        EXPECT_TRUE(read.coherence.empty());
        return;
    }
    ASSERT_EQ(read.coherence.size(), truth["coherence"].size());
    for (std::size_t i = 0; i < read.coherence.size(); ++i)
        EXPECT_NEAR(read.coherence[i], truth["coherence"][i].get<double>(), 1e-9) << "point " << i;
}

void expect_columns(const std::vector<ColumnInfo>& read, const nlohmann::json& truth) {
    ASSERT_EQ(read.size(), truth.size());
    for (std::size_t i = 0; i < truth.size(); ++i) {
        EXPECT_EQ(read[i].meaning, truth[i]["meaning"].get<std::string>());
        if (truth[i].contains("heading")) {
            EXPECT_EQ(read[i].column, truth[i]["column"].get<int>());
            EXPECT_EQ(read[i].heading, truth[i]["heading"].get<std::string>());
        }
        // One truth leaves the unit to the option line of its file.
        if (truth[i]["unit"] != "from the option line") {
            EXPECT_EQ(read[i].unit, truth[i]["unit"].get<std::string>()) << "column " << i + 1;
        }
    }
}

TEST_P(Truth, IsReadPointByPoint) {
    const auto truth = truth_of(GetParam());
    const ReadResult result = read_measurement(GetParam());
    expect_points(result.response, truth);
    expect_columns(result.columns, truth["columns"]);
    EXPECT_EQ(result.rows, truth["count"].get<std::size_t>());
    ASSERT_EQ(result.skipped.size(), truth["skipped"].size());
    for (std::size_t i = 0; i < result.skipped.size(); ++i) {
        EXPECT_EQ(result.skipped[i].line, truth["skipped"][i]["line"].get<int>());
        EXPECT_EQ(result.skipped[i].why, truth["skipped"][i]["why"].get<std::string>());
    }
    for (const auto& expected : truth["warnings"])
        EXPECT_TRUE(std::any_of(result.warnings.begin(), result.warnings.end(),
                                [&](const std::string& warning) {
                                    return warning.find(expected.get<std::string>()) !=
                                           std::string::npos;
                                }))
            << expected;
}

TEST_P(Truth, IsTheSameFromBytesInMemory) {
    std::ifstream stream(GetParam(), std::ios::binary);
    const std::string bytes(std::istreambuf_iterator<char>(stream), {});
    const ReadResult from_file = read_measurement(GetParam());
    const ReadResult from_bytes = read_measurement_bytes(bytes, GetParam().filename().string());
    EXPECT_EQ(from_file.response, from_bytes.response);
    EXPECT_EQ(from_file.warnings, from_bytes.warnings);
}

TEST_P(Truth, IsTheSameThroughThePreview) {
    const Preview preview = preview_measurement(GetParam());
    ASSERT_TRUE(preview.result.has_value());
    EXPECT_FALSE(preview.problem.has_value());
    EXPECT_TRUE(preview.choices.empty());
    EXPECT_EQ(preview.result->response, read_measurement(GetParam()).response);
    EXPECT_FALSE(preview.lines.empty());
}

INSTANTIATE_TEST_SUITE_P(Files, Truth, testing::ValuesIn(measurement_files()), name_of_file);

} // namespace
} // namespace cornerwright
