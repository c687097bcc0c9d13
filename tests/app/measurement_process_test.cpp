// The commands read, estimate and fit as processes, on files with known truth.

#include "tests/app/command_process.h"
#include "tests/core/fitting/practice_fit.h"
#include "tests/core/measurement/practice_record.h"

#include <gmock/gmock.h>
#include <nlohmann/json.hpp>

#include <algorithm>
#include <cmath>

namespace cornerwright::process {
namespace {

using nlohmann::json;
using testing::HasSubstr;

const fs::path measurements = fs::path(CORNERWRIGHT_TEST_DATA) / "core/measurement/data";
const fs::path fits = fs::path(CORNERWRIGHT_TEST_DATA) / "core/fitting/data";

json json_file(const fs::path& file) {
    return json::parse(text_of(file));
}

std::vector<std::string> data_files(const fs::path& folder, const std::string& suffix) {
    std::vector<std::string> names;
    for (const auto& entry : fs::directory_iterator(folder)) {
        const std::string name = entry.path().filename().string();
        if (name.size() > suffix.size() && name.ends_with(suffix))
            names.push_back(name.substr(0, name.size() - suffix.size()));
    }
    std::sort(names.begin(), names.end());
    return names;
}

std::string quoted(const fs::path& file) {
    return "'" + file.string() + "'";
}

MeasuredResponse response_in(const json& printed) {
    MeasuredResponse response;
    response.w_rad_s = printed.at("w_rad_s").get<std::vector<double>>();
    for (const json& value : printed.at("response"))
        response.response.emplace_back(value.at(0).get<double>(), value.at(1).get<double>());
    if (!printed.at("coherence").is_null())
        response.coherence = printed.at("coherence").get<std::vector<double>>();
    return response;
}

void expect_same_points(const MeasuredResponse& read, const MeasuredResponse& truth) {
    ASSERT_EQ(read.w_rad_s.size(), truth.w_rad_s.size());
    ASSERT_EQ(read.coherence.size(), truth.coherence.size());
    for (std::size_t i = 0; i < truth.w_rad_s.size(); ++i) {
        EXPECT_LE(std::abs(read.w_rad_s[i] - truth.w_rad_s[i]), 1e-9 * truth.w_rad_s[i]);
        EXPECT_LE(std::abs(read.response[i] - truth.response[i]),
                  1e-9 * std::abs(truth.response[i]));
    }
    for (std::size_t i = 0; i < truth.coherence.size(); ++i)
        EXPECT_NEAR(read.coherence[i], truth.coherence[i], 1e-9);
}

TEST(ReadCommand, PrintsTheTruthOfEveryFile) {
    const Folder folder;
    const auto names = data_files(measurements, ".truth.json");
    ASSERT_EQ(names.size(), 28U);
    for (const std::string& name : names) {
        SCOPED_TRACE(name);
        const Outcome outcome = folder.run("read --json " + quoted(measurements / name));
        ASSERT_EQ(outcome.status, 0) << outcome.err;
        const json printed = json::parse(outcome.out);
        const json truth = json_file(measurements / (name + ".truth.json"));
        expect_same_points(response_in(printed), response_in(truth));
        EXPECT_EQ(printed["rows"], truth["count"]);
        EXPECT_EQ(printed["skipped"].size(), truth["skipped"].size());
    }
}

TEST(ReadCommand, RefusesEveryBrokenFileInOneSentence) {
    const Folder folder;
    const json expected = json_file(measurements / "bad/expected.json");
    ASSERT_EQ(expected.size(), 26U);
    for (const json& refusal : expected) {
        const std::string name = refusal["file"].get<std::string>();
        SCOPED_TRACE(name);
        const Outcome outcome = folder.run("read --json " + quoted(measurements / "bad" / name));
        EXPECT_EQ(outcome.status, 65);
        EXPECT_EQ(outcome.out, "");
        EXPECT_EQ(std::count(outcome.err.begin(), outcome.err.end(), '\n'), 1);
        EXPECT_THAT(outcome.err, HasSubstr(name));
        EXPECT_THAT(outcome.err, HasSubstr("expected "));
        EXPECT_THAT(outcome.err, HasSubstr(refusal["expected"].get<std::string>()));
        EXPECT_THAT(outcome.err, HasSubstr(", found "));
        EXPECT_THAT(outcome.err, HasSubstr(refusal["found"].get<std::string>()));
        if (refusal["line"].is_number()) {
            EXPECT_THAT(outcome.err, HasSubstr("line " + refusal["line"].dump()));
        }
        if (refusal["column"].is_number()) {
            EXPECT_THAT(outcome.err, HasSubstr("column " + refusal["column"].dump() + ":"));
        }
    }
}

TEST(ReadCommand, AnAmbiguousFileIsRefusedWithItsChoicesAndReadOnceSettled) {
    const Folder folder;
    const std::string gain = quoted(measurements / "bad/gain-ambiguous.csv");
    const std::string phase = quoted(measurements / "bad/phase-ambiguous.csv");
    EXPECT_THAT(folder.run("read " + gain).err, HasSubstr("--magnitude-unit"));
    EXPECT_THAT(folder.run("read " + phase).err, HasSubstr("--phase-unit"));
    const auto size_at_first = [&](const std::string& arguments) {
        const Outcome outcome = folder.run("read --json " + arguments);
        EXPECT_EQ(outcome.status, 0) << outcome.err;
        return std::abs(response_in(json::parse(outcome.out)).response.front());
    };
    const double linear = size_at_first("--magnitude-unit linear " + gain);
    const double decibel = size_at_first("--magnitude-unit dB " + gain);
    EXPECT_NEAR(decibel, std::pow(10.0, linear / 20.0), 1e-12 * decibel);
    EXPECT_EQ(size_at_first("--phase-unit rad " + phase),
              size_at_first("--phase-unit deg " + phase));
}

class EstimateCommand : public testing::TestWithParam<std::string> {};

TEST_P(EstimateCommand, MeetsTheTruth) {
    const Folder folder;
    const json truth = truth_of_record(GetParam());
    const Outcome outcome = folder.run(
        "estimate --json " + quoted(measurements / "records" / GetParam()) + " --excitation '" +
        truth["excitation"].get<std::string>() + "' --response '" +
        truth["response"].get<std::string>() + "' --averages " + truth["averages"].dump());
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    const EstimateError error = estimate_error(truth, response_in(json::parse(outcome.out)));
    const json& required = truth["required"];
    EXPECT_LE(error.rms, required["rms_relative_error_at_most"].get<double>());
    EXPECT_LE(error.percentile_95, required["p95_relative_error_at_most"].get<double>());
    EXPECT_GE(error.covered_bands, required["covered_bands_at_least"].get<std::size_t>());
}

INSTANTIATE_TEST_SUITE_P(Records, EstimateCommand, testing::ValuesIn(practice_records()),
                         [](const auto& parameter) {
                             std::string name = parameter.param;
                             std::replace_if(
                                 name.begin(), name.end(),
                                 [](char c) { return c == '-' || c == '.'; }, '_');
                             return name;
                         });

const std::string sweep = "estimate " + quoted(measurements / "records/belt-sweep.csv") +
                          " --excitation Torque --response Speed --averages 11 ";

TEST(EstimateOutput, TheTableItWritesIsReadBackWithItsAverages) {
    const Folder folder;
    const MeasuredResponse printed = response_in(json::parse(folder.run(sweep + "--json").out));
    const Outcome outcome = folder.run(sweep + "--out response.csv");
    ASSERT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_EQ(outcome.out, "");
    const Outcome read = folder.run("read --json response.csv");
    ASSERT_EQ(read.status, 0) << read.err;
    expect_same_points(response_in(json::parse(read.out)), printed);
    EXPECT_THAT(text_of(folder / "response.csv"), HasSubstr("# averages: 11\n"));
    EXPECT_EQ(folder.run(sweep).out, text_of(folder / "response.csv"));
}

TEST(EstimateOutput, TellsTheRandomErrorOfEveryPoint) {
    const Folder folder;
    const json printed = json::parse(folder.run(sweep + "--json").out);
    ASSERT_EQ(printed["random_error"].size(), printed["w_rad_s"].size());
    const double coherence = printed["coherence"][20].get<double>();
    EXPECT_NEAR(printed["random_error"][20].get<double>(),
                std::sqrt((1.0 - coherence) / (22.0 * coherence)), 1e-12);
}

TEST(EstimateOutput, RefusesWhatItCannotEstimate) {
    const Folder folder;
    const std::string record = quoted(measurements / "records/belt-sweep.csv");
    const Outcome unknown =
        folder.run("estimate " + record + " --excitation Force --response Speed");
    EXPECT_EQ(unknown.status, 65);
    EXPECT_THAT(unknown.err, HasSubstr("belt-sweep.csv, line "));
    EXPECT_THAT(unknown.err, HasSubstr("found Force"));
    const Outcome crowded =
        folder.run("estimate " + record + " --excitation Torque --response Speed --averages 5000");
    EXPECT_EQ(crowded.status, 65);
    EXPECT_THAT(crowded.err, HasSubstr("belt-sweep.csv: expected at least "));
    EXPECT_EQ(folder.run("estimate " + record + " --excitation Torque").status, 64);
    EXPECT_EQ(folder.run(sweep + "--averages 0").status, 64);
    EXPECT_EQ(folder.run(sweep + "--window triangle").status, 64);
    EXPECT_EQ(folder.run(sweep + "--out no/such/folder/response.csv").status, 74);
    const Outcome a_response = folder.run("estimate " + quoted(measurements / "belt-plain.csv") +
                                          " --excitation 1 --response 2");
    EXPECT_EQ(a_response.status, 65);
    const Outcome a_record = folder.run("read " + record);
    EXPECT_EQ(a_record.status, 65);
    EXPECT_THAT(a_record.err, HasSubstr("estimate"));
}

/// 50/(s (0.01 s + 1)), measured with coherence 0.9 and 4 averages: 0.118 of its size, or 6.75 deg,
/// of random error (Bendat and Piersol). Its phase margin is 65.5 deg at 45.5 rad/s; there the
/// phase falls 0.322 times as fast as the magnitude, so that the error of the crossover makes it
/// 6.75 sqrt(1 + 0.322^2) = 7.1 deg.
std::string scattered_table() {
    std::ostringstream text;
    text.precision(12);
    text << "# averages: 4\nw (rad/s),Real,Imaginary,Coherence\n";
    for (int i = 0; i < 100; ++i) {
        const double w = std::pow(1000.0, i / 99.0);
        const Complex s(0.0, w);
        const Complex p = 50.0 / (s * (0.01 * s + 1.0));
        text << w << ',' << p.real() << ',' << p.imag() << ",0.9\n";
    }
    return text.str();
}

TEST(AssessCommand, ShowsTheUncertaintyOfAMeasuredMarginAndSaysWhereItIsThin) {
    const Folder folder;
    folder.write("unit.csv", scattered_table());
    folder.write("axis.cornerwright.json", R"json({"cornerwright": 1, "title": "Axis",
 "plant_cases": [{"name": "unit", "measurement": {"file": "unit.csv"}, "integrators": 1}],
 "compensator": [{"kind": "gain", "gain": 1.0}],
 "requirements": [{"measure": "phase_margin", "at_least_deg": 60.0},
                  {"measure": "phase_margin", "at_least_deg": 40.0}]})json");
    const Outcome outcome = folder.run("assess axis.cornerwright.json");
    EXPECT_EQ(outcome.status, 0) << outcome.err;
    EXPECT_THAT(outcome.out, testing::ContainsRegex("met +phase margin .* ± 7\\.1 deg"));
    const std::string remark = "met by less than two standard deviations of the measurement";
    const auto first = outcome.out.find(remark);
    EXPECT_NE(first, std::string::npos) << outcome.out;
    EXPECT_EQ(outcome.out.find(remark, first + 1), std::string::npos)
        << "40 deg are met by far more";
}

class FitCommand : public testing::TestWithParam<std::string> {};

std::string text_or_number(const json& value) {
    return value.is_string() ? value.get<std::string>() : value.dump();
}

/// Every run of the truth: without noise the error to the true model, with noise the misfit over
/// the one that the true model has.
TEST_P(FitCommand, ReachesWhatTheTruthAsks) {
    const Folder folder;
    const std::string csv = quoted(fits / (GetParam() + ".csv"));
    const json truth = json_file(fits / (GetParam() + ".truth.json"));
    const PlantModel plant = plant_in(truth["plant"]);
    const MeasuredResponse measured =
        response_in(json::parse(folder.run("read --json " + csv).out));
    for (const json& run : truth["runs"]) {
        SCOPED_TRACE(run.dump());
        const Outcome outcome =
            folder.run("fit --json " + csv + " --order " + text_or_number(run["order"]) +
                       " --dead-time " + text_or_number(run["dead_time"]));
        ASSERT_EQ(outcome.status, 0) << outcome.err;
        const json printed = json::parse(outcome.out);
        const PlantModel model = plant_in(printed);
        EXPECT_EQ(printed["order"], model.roots.poles.size());
        EXPECT_LE(printed["order"].get<int>(), run.contains("order_at_most")
                                                   ? run["order_at_most"].get<int>()
                                                   : static_cast<int>(*asked(run["order"])));
        EXPECT_LE(model.roots.zeros.size(), model.roots.poles.size());
        EXPECT_NEAR(printed["misfit_db"].get<double>(), misfit_db(model, measured), 1e-9);
        EXPECT_EQ(unstable_poles_of(model, measured.w_rad_s.front()),
                  unstable_poles_of(plant, measured.w_rad_s.front()));
        if (run.contains("relative_error_at_most")) {
            for (const double w : measured.w_rad_s)
                ASSERT_LE(std::abs(response_of(model, w) / response_of(plant, w) - 1.0),
                          run["relative_error_at_most"].get<double>());
        } else {
            const double averages = truth["averages"].get<double>();
            EXPECT_LE(misfit_in_sigma(model, plant, measured, averages),
                      1.1 * misfit_in_sigma(plant, plant, measured, averages));
        }
    }
}

INSTANTIATE_TEST_SUITE_P(Truths, FitCommand, testing::ValuesIn(data_files(fits, ".truth.json")),
                         [](const auto& parameter) {
                             std::string name = parameter.param;
                             std::replace_if(
                                 name.begin(), name.end(),
                                 [](char c) { return c == '-' || c == '.'; }, '_');
                             return name;
                         });

TEST(FitOutput, TellsWrongUsageAndWrongInput) {
    const Folder folder;
    const std::string csv = quoted(fits / "exact-order-02.csv");
    for (const char* wrong : {"--order 0", "--order 2.5", "--order many", "--order 41",
                              "--dead-time -1", "--dead-time some"})
        EXPECT_EQ(folder.run("fit " + csv + " " + wrong).status, 64) << wrong;
    folder.write("short.csv", "Frequency (Hz),Magnitude (dB),Phase (deg)\n1,-1,-10\n2,-2,-20\n");
    const Outcome few = folder.run("fit short.csv --order 4");
    EXPECT_EQ(few.status, 65);
    EXPECT_EQ(few.err, "short.csv: expected at least 6 points for this order, found 2\n");
    EXPECT_EQ(folder.run("fit nowhere.csv").status, 65);
}

} // namespace
} // namespace cornerwright::process
