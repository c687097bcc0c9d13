#include "tests/app/command_process.h"

#include <gmock/gmock.h>
#include <nlohmann/json.hpp>

#include <cmath>
#include <complex>
#include <numbers>

namespace cornerwright::process {
namespace {

using nlohmann::json;
using testing::ElementsAre;
using testing::HasSubstr;
using testing::IsEmpty;
using Complex = std::complex<double>;

/// L = 4/(s (s + 2)): the second-order prototype with w0 = 2 rad/s and damping 0.5. Its figures by
/// formula: for instance K. Ogata, Modern Control Engineering, second-order systems (from memory).
constexpr const char* prototype = R"json({"cornerwright": 1, "title": "Prototype",
 "plant_cases": [{"name": "nominal", "formula": "2/(s (s + 2))"}],
 "compensator": [{"kind": "gain", "gain": 2.0}],
 "requirements": [{"measure": "overshoot", "at_most_percent": 20.0}]
})json";

json with(const char* key, const json& value) {
    json changed = json::parse(prototype);
    changed[key] = value;
    return changed;
}

Complex complex_of(const json& pair) {
    return {pair[0].get<double>(), pair[1].get<double>()};
}

TEST(AssessCommand, ExitStatusIsTheVerdict) {
    const Folder folder;
    folder.write("met.json", prototype);
    folder.write(
        "unmet.json",
        with("requirements", {{{"measure", "overshoot"}, {"at_most_percent", 16.0}}}).dump());
    // Never reaches |L| = 1/sqrt 2 of a T(0) that is 0: the bandwidth is not determined.
    json washed = with("requirements", {{{"measure", "bandwidth"}, {"at_least_rad_s", 1.0}}});
    washed["compensator"] = {{{"kind", "washout"}, {"corner_rad_s", 1.0}}};
    washed["plant_cases"] = {{{"name", "nominal"}, {"formula", "1/(s + 2)"}}};
    folder.write("open.json", washed.dump());
    EXPECT_EQ(folder.run("assess met.json").status, 0);
    EXPECT_EQ(folder.run("assess unmet.json").status, 1);
    EXPECT_EQ(folder.run("assess open.json").status, 2);
}

TEST(AssessCommand, TableAndJsonSayTheSame) {
    const Folder folder;
    folder.write("axis.json", prototype);
    const Outcome table = folder.run("assess axis.json");
    for (const char* words : {"Prototype", "verdict: met", "overshoot", "16.3 %", "nominal"})
        EXPECT_THAT(table.out, HasSubstr(words));
    EXPECT_THAT(table.err, IsEmpty());
    const json result = json::parse(folder.run("assess axis.json --json").out);
    EXPECT_EQ(result["verdict"], "met");
    const json& loop = result["cases"][0]["loops"]["design"];
    const double overshoot = 100.0 * std::exp(-std::numbers::pi * 0.5 / std::sqrt(0.75));
    EXPECT_NEAR(loop["overshoot_percent"], overshoot, 1e-6);
    EXPECT_EQ(loop["gain_margin_db"], "infinite");
    EXPECT_EQ(result["cases"][0]["loops"].contains("realised"), false);
}

TEST(CurvesCommand, PrintsTheResponsesOfTheFormula) {
    const Folder folder;
    folder.write("axis.json", prototype);
    const Outcome outcome = folder.run("curves axis.json --case nominal --at 0.5,2,30 --json");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    const json points = json::parse(outcome.out)["points"];
    ASSERT_EQ(points.size(), 3U);
    for (const json& point : points) {
        const Complex s(0.0, point["w_rad_s"].get<double>());
        const Complex plant = 2.0 / (s * (s + 2.0));
        const Complex loop = 2.0 * plant;
        EXPECT_NEAR(std::abs(complex_of(point["P"]) / plant - 1.0), 0.0, 1e-13);
        EXPECT_NEAR(std::abs(complex_of(point["L"]) / loop - 1.0), 0.0, 1e-13);
        EXPECT_NEAR(std::abs(complex_of(point["S"]) * (1.0 + loop) - 1.0), 0.0, 1e-12);
        EXPECT_NEAR(std::abs(complex_of(point["T"]) + complex_of(point["S"]) - 1.0), 0.0, 1e-12);
    }
    EXPECT_THAT(folder.run("curves axis.json --case nominal --at 2").out, HasSubstr("deg"));
}

TEST(StepCommand, PrintsTheStepOfThePrototype) {
    const Folder folder;
    folder.write("axis.json", prototype);
    const Outcome outcome =
        folder.run("step axis.json --case nominal --until 6 --points 61 --json");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    const json curves = json::parse(outcome.out);
    ASSERT_EQ(curves["t_s"].size(), 61U);
    const double swing = 2.0 * std::sqrt(0.75);
    for (std::size_t i = 0; i < 61; ++i) {
        const double t = 0.1 * static_cast<double>(i);
        const double y = 1.0 - std::exp(-t) * (std::cos(swing * t) + std::sin(swing * t) / swing);
        EXPECT_NEAR(curves["t_s"][i], t, 1e-12);
        EXPECT_NEAR(curves["y"][i], y, 1e-9);
        EXPECT_NEAR(curves["u"][i], 2.0 * (1.0 - y), 1e-8);
    }
    EXPECT_EQ(curves["y_disturbance"].size(), 61U);
}

TEST(LocusCommand, PrintsTheRootsOfTheCharacteristicPolynomial) {
    const Folder folder;
    folder.write("axis.json", prototype);
    const Outcome outcome = folder.run("locus axis.json --case nominal --factors 0,0.25,1 --json");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    const json points = json::parse(outcome.out)["points"];
    ASSERT_EQ(points.size(), 3U);
    for (const json& point : points) {
        ASSERT_EQ(point["poles_rad_s"].size(), 2U);
        for (const json& pole : point["poles_rad_s"]) {
            const Complex s = complex_of(pole);
            const Complex rest = s * (s + 2.0) + 4.0 * point["factor"].get<double>();
            EXPECT_LT(std::abs(rest), 1e-7) << point;
        }
    }
}

TEST(LoopCommands, RealisedLoopNeedsARealisation) {
    const Folder folder;
    folder.write("axis.json", prototype);
    for (const std::string command : {"curves axis.json --case nominal --loop realised --at 1",
                                      "step axis.json --case nominal --loop realised --until 1"}) {
        const Outcome outcome = folder.run(command);
        EXPECT_TRUE(outcome.status == 64 || outcome.status == 65) << outcome.status;
        EXPECT_THAT(outcome.err, HasSubstr("realis")) << command;
        EXPECT_THAT(outcome.out, IsEmpty());
    }
}

TEST(LoopCommands, TellWrongUsage) {
    const Folder folder;
    folder.write("axis.json", prototype);
    for (const std::string arguments :
         {"", "frobnicate", "assess", "curves axis.json --at 1", "curves axis.json --case nominal",
          "curves axis.json --case nominal --at 1,x", "curves axis.json --case nominal --at 0",
          "curves axis.json --case nominal --at -1", "curves axis.json --case nominal --at 1e999",
          "curves axis.json --case nominal --loop third --at 1", "step axis.json --case nominal",
          "step axis.json --case nominal --until 0",
          "step axis.json --case nominal --until 1 --points 1",
          "locus axis.json --case nominal --factors -1", "assess axis.json --jsonn"}) {
        const Outcome outcome = folder.run(arguments);
        EXPECT_EQ(outcome.status, 64) << arguments;
        EXPECT_NE(outcome.err, "") << arguments;
        EXPECT_THAT(outcome.out, IsEmpty()) << arguments;
    }
    const Outcome other = folder.run("curves axis.json --case loaded --at 1");
    EXPECT_EQ(other.status, 64);
    EXPECT_THAT(other.err, HasSubstr("expected \"nominal\", found \"loaded\""));
}

TEST(EveryCommand, HasHelp) {
    const Folder folder;
    for (const std::string command :
         {"assess", "curves", "step", "locus", "read", "estimate", "fit", "place", "design",
          "sensitivity", "tolerance", "handover", "report", "fleet"}) {
        const Outcome outcome = folder.run(command + " --help");
        EXPECT_EQ(outcome.status, 0) << command;
        EXPECT_THAT(outcome.out, HasSubstr("--help")) << command;
        EXPECT_THAT(folder.run("--help").out, HasSubstr(command));
    }
    EXPECT_EQ(folder.run("--version").status, 0);
}

TEST(EveryCommand, AClosedStandardOutputIsNotDone) {
    const Folder folder;
    folder.write("axis.json", prototype);
    const Outcome outcome = folder.run("assess axis.json --json > /dev/full");
    EXPECT_EQ(outcome.status, 74);
    EXPECT_THAT(outcome.err, HasSubstr("could not write to standard output"));
}

} // namespace
} // namespace cornerwright::process
