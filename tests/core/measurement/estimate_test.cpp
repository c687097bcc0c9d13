#include "core/measurement/frequency_estimate.h"
#include "core/measurement/random_error.h"
#include "core/measurement/read_measurement.h"
#include "core/measurement/stepped_sine.h"
#include "core/measurement/time_record.h"
#include "core/measurement/write_response.h"
#include "tests/core/measurement/practice_record.h"

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include <algorithm>
#include <cmath>
#include <complex>
#include <filesystem>
#include <fstream>
#include <numbers>
#include <random>
#include <set>
#include <string>
#include <vector>

namespace cornerwright {
namespace {

const std::filesystem::path data =
    std::filesystem::path(CORNERWRIGHT_TEST_DATA) / "core/measurement/data/records";

class Record : public testing::TestWithParam<std::string> {};

/// Limits from the truths: 1.6 times the rms and 1.8 times the percentile that the same rule
/// reaches in an independent implementation, and 0.8 times its bands.
TEST_P(Record, EstimateMeetsItsTruth) {
    const auto truth = truth_of_record(GetParam());
    RecordOptions names;
    names.excitation = truth["excitation"].get<std::string>();
    names.response = truth["response"].get<std::string>();
    const TimeRecord record = read_time_record(data / GetParam(), names);
    EXPECT_EQ(record.excitation.size(), truth["rows"].get<std::size_t>());
    EXPECT_NEAR(1.0 / record.sample_period_s / truth["sample_rate_hz"].get<double>(), 1.0, 1e-9);

    EstimateOptions options;
    options.averages = truth["averages"].get<int>();
    const MeasuredResponse estimate = estimate_response(record, options).response;
    const auto& required = truth["required"];
    const EstimateError error = estimate_error(truth, estimate);
    EXPECT_LE(error.rms, required["rms_relative_error_at_most"].get<double>());
    EXPECT_LE(error.percentile_95, required["p95_relative_error_at_most"].get<double>());
    EXPECT_GE(error.covered_bands, required["covered_bands_at_least"].get<std::size_t>());
    RecordProperty("rms", std::to_string(error.rms));
    RecordProperty("p95", std::to_string(error.percentile_95));
    RecordProperty("bands", std::to_string(error.covered_bands));
}

std::string name_of_record(const testing::TestParamInfo<std::string>& info) {
    std::string name = info.param;
    std::replace_if(
        name.begin(), name.end(),
        [](char c) { return std::isalnum(static_cast<unsigned char>(c)) == 0; }, '_');
    return name;
}

INSTANTIATE_TEST_SUITE_P(Files, Record, testing::ValuesIn(practice_records()), name_of_record);

/// A record of white noise through y[n] = 0.5 y[n-1] + u[n], with noise of a known share on the
/// response.
TimeRecord first_order_record(std::size_t rows, double noise, unsigned seed) {
    std::mt19937 random(seed);
    std::normal_distribution<double> normal;
    TimeRecord record;
    record.sample_period_s = 1e-3;
    double state = 0.0;
    for (std::size_t n = 0; n < rows; ++n) {
        const double u = normal(random);
        state = 0.5 * state + u;
        record.excitation.push_back(u);
        record.response.push_back(state + noise * normal(random));
    }
    return record;
}

Complex first_order(double w, double period) {
    return 1.0 / (1.0 - 0.5 * std::exp(Complex{0.0, -w * period}));
}

/// The scatter of an estimate follows the random error of Bendat and Piersol (Random Data, chapter
/// 9) within the scatter of the scatter.
TEST(RandomError, TellsTheScatterOfTheEstimate) {
    const TimeRecord record = first_order_record(400'000, 1.0, 7);
    EstimateOptions options;
    options.averages = 399;
    const MeasuredResponse estimate = estimate_response(record, options).response;
    const auto errors = random_errors(estimate);
    ASSERT_EQ(errors.size(), estimate.w_rad_s.size());
    double magnitude = 0.0;
    double phase = 0.0;
    for (std::size_t i = 0; i < errors.size(); ++i) {
        const Complex ratio =
            estimate.response[i] / first_order(estimate.w_rad_s[i], record.sample_period_s);
        magnitude += std::pow((std::abs(ratio) - 1.0) / errors[i], 2);
        phase += std::pow(std::arg(ratio) / errors[i], 2);
    }
    const auto count = static_cast<double>(errors.size());
    // Half-overlapping Hann pieces are worth 1/(1 + 2/36) of as many separate ones (Welch, 1967),
    // and neighbouring bins go together, which widens the scatter of the mean: 15 % holds both.
    EXPECT_NEAR(std::sqrt(magnitude / count), 1.0, 0.15);
    EXPECT_NEAR(std::sqrt(phase / count), 1.0, 0.15);
}

TEST(RandomError, IsNotKnownWithoutAverages) {
    MeasuredResponse measured{{1.0, 2.0}, {1.0, 1.0}, {0.9, 0.8}, 0.0};
    EXPECT_TRUE(random_errors(measured).empty());
    measured.averages = 10.0;
    EXPECT_DOUBLE_EQ(random_errors(measured)[1], std::sqrt(0.2 / (2.0 * 10.0 * 0.8)));
}

/// Noise on the excitation makes H1 small by S_uu/(S_uu + S_nn) and leaves H2 in its place; noise
/// on the response does the reverse (Bendat and Piersol, Random Data, chapter 6).
TEST(Estimate, H1AndH2AreBiasedByNoiseOnTheirOwnSideOnly) {
    TimeRecord record = first_order_record(200'000, 0.0, 3);
    std::mt19937 random(11);
    std::normal_distribution<double> normal;
    for (double& value : record.excitation)
        value += normal(random);
    EstimateOptions options;
    options.averages = 199;
    const auto mean_ratio = [&](EstimateOptions::Method method) {
        options.method = method;
        const MeasuredResponse estimate = estimate_response(record, options).response;
        Complex sum = 0.0;
        for (std::size_t i = 0; i < estimate.w_rad_s.size(); ++i)
            sum += estimate.response[i] / first_order(estimate.w_rad_s[i], record.sample_period_s);
        return std::abs(sum) / static_cast<double>(estimate.w_rad_s.size());
    };
    EXPECT_NEAR(mean_ratio(EstimateOptions::Method::h1), 0.5, 0.02);
    EXPECT_NEAR(mean_ratio(EstimateOptions::Method::h2), 1.0, 0.02);
}

TEST(Estimate, TakesLinesOffSoThatDriftDoesNotMatter) {
    const TimeRecord quiet = first_order_record(8'000, 0.0, 5);
    TimeRecord drifting = quiet;
    for (std::size_t n = 0; n < drifting.response.size(); ++n)
        drifting.response[n] += 40.0 + 0.01 * static_cast<double>(n);
    const auto a = estimate_response(quiet).response;
    const auto b = estimate_response(drifting).response;
    ASSERT_EQ(a.w_rad_s, b.w_rad_s);
    for (std::size_t i = 0; i < a.response.size(); ++i)
        EXPECT_LE(std::abs(a.response[i] - b.response[i]), 1e-9 * std::abs(a.response[i]));
}

/// Pieces of 2 rows/(N + 1) samples, rounded down to even.
TEST(Estimate, CutsThePiecesAsDocumented) {
    const TimeRecord record = first_order_record(6'143, 0.0, 9);
    EstimateOptions options;
    options.averages = 11;
    const Estimate estimate = estimate_response(record, options);
    EXPECT_EQ(estimate.piece_length, 1022U);
    EXPECT_EQ(estimate.response.averages, 11.0);
    EXPECT_NEAR(estimate.response.w_rad_s.front(), 2.0 * std::numbers::pi / (1022 * 1e-3), 1e-9);
}

TEST(Estimate, RefusesRecordsThatAreTooShortOrSilent) {
    EstimateOptions options;
    options.averages = 100;
    EXPECT_THROW(estimate_response(first_order_record(300, 0.0, 1), options), InputError);
    options.averages = 0;
    EXPECT_THROW(estimate_response(first_order_record(300, 0.0, 1), options), InputError);
    TimeRecord silent = first_order_record(3'000, 0.0, 1);
    std::fill(silent.excitation.begin(), silent.excitation.end(), 2.5);
    EXPECT_THROW(estimate_response(silent), InputError);
}

/// Stepped sine through a first-order lag: after settling the response at each tone is exact but
/// for noise.
TEST(SteppedSine, MeasuresEachToneOfAStair) {
    const std::vector<double> tones_hz = {5.0, 8.0, 13.0, 21.0, 34.0, 55.0};
    TimeRecord record;
    record.sample_period_s = 1e-3;
    double state = 0.0;
    double phase = 0.0;
    std::mt19937 random(2);
    std::normal_distribution<double> normal;
    std::vector<double> tones;
    for (const double tone : tones_hz) {
        const double w = 2.0 * std::numbers::pi * tone;
        tones.push_back(w);
        const auto samples = static_cast<int>(std::lround(24.0 / tone / record.sample_period_s));
        for (int n = 0; n < samples; ++n) {
            const double u = std::sin(phase);
            phase += w * record.sample_period_s;
            state = 0.5 * state + u;
            record.excitation.push_back(0.3 + u + 0.01 * normal(random));
            record.response.push_back(2.0 + state + 0.01 * normal(random));
        }
    }
    EstimateOptions options;
    options.method = EstimateOptions::Method::tones;
    for (const bool named : {false, true}) {
        options.tones_rad_s = named ? tones : std::vector<double>{};
        const MeasuredResponse estimate = estimate_response(record, options).response;
        ASSERT_EQ(estimate.w_rad_s.size(), tones.size());
        for (std::size_t i = 0; i < tones.size(); ++i) {
            EXPECT_NEAR(estimate.w_rad_s[i] / tones[i], 1.0, 1e-3);
            const Complex expected = first_order(estimate.w_rad_s[i], record.sample_period_s);
            EXPECT_LE(std::abs(estimate.response[i] / expected - 1.0), 0.01) << tones_hz[i];
            EXPECT_GT(estimate.coherence[i], 0.99);
        }
        EXPECT_GE(estimate.averages, 2.0);
    }
}

TEST(TimeRecordReader, FindsColumnsByHeadingByBareNameAndByNumber) {
    const std::string text = "Time (ms);Torque (N m);Speed (rad/s)\n0;1,5;2\n2;1,25;3\n4;1;4\n";
    for (const char* name : {"Torque (N m)", "torque", "TORQUE (n M)", "2"}) {
        RecordOptions options;
        options.excitation = name;
        options.response = "speed";
        const TimeRecord record = read_time_record_bytes(text, "r.csv", options);
        EXPECT_EQ(record.excitation, (std::vector<double>{1.5, 1.25, 1.0})) << name;
        EXPECT_EQ(record.response, (std::vector<double>{2.0, 3.0, 4.0}));
        EXPECT_DOUBLE_EQ(record.sample_period_s, 2e-3);
        EXPECT_EQ(record.excitation_name, "Torque (N m)");
    }
}

/// Every word for rate and interval that the preamble may use, with its units.
TEST(TimeRecordReader, TakesTheSampleRateFromThePreamble) {
    const std::vector<std::pair<std::string, double>> cases = {{"Sample rate: 200 kHz", 5e-6},
                                                               {"# sampling rate = 2 MHz", 5e-7},
                                                               {"fs = 500", 2e-3},
                                                               {"Abtastrate (kHz): 4", 2.5e-4},
                                                               {"% Abtastfrequenz: 250 Hz", 4e-3},
                                                               {"sample interval: 0.5 ms", 5e-4},
                                                               {"Sampling period [us] = 20", 2e-5},
                                                               {"dt=0.001", 1e-3},
                                                               {"! Ts: 25 \xC2\xB5s", 2.5e-5},
                                                               {"Abtastzeit: 0.01 s", 1e-2},
                                                               {"sampling frequency: 1e3 Hz", 1e-3},
                                                               {"Sample time = 2ms", 2e-3}};
    for (const auto& [line, period] : cases) {
        const std::string text =
            "Recorder: bench\nTime: 10:22:31\n" + line + "\nu (V)\ty (m)\n1\t2\n-1\t3\n2\t5\n";
        RecordOptions options;
        options.excitation = "u";
        options.response = "y";
        const TimeRecord record = read_time_record_bytes(text, "r.txt", options);
        EXPECT_NEAR(record.sample_period_s / period, 1.0, 1e-12) << line;
        EXPECT_EQ(record.response.size(), 3U);
    }
}

TEST(TimeRecordReader, RefusesWhatItCannotPlaceOrTime) {
    RecordOptions options;
    options.excitation = "u";
    options.response = "y";
    const auto refusal = [&](const std::string& text) -> std::string {
        try {
            (void)read_time_record_bytes(text, "r.csv", options);
        } catch (const InputError& error) {
            return error.what();
        }
        return "read";
    };
    EXPECT_EQ(refusal("t,u,y\n0,1,2\n1,2,3\n2,3,4\n3.2,1,2\n4,1,1\n"),
              "r.csv, line 5, column 1: expected even time steps of 1, found a step of 1.2");
    EXPECT_EQ(
        refusal("u,y\n1,2\n2,3\n"),
        "r.csv: expected a sample rate in the preamble (sample rate: ... Hz, dt = ... s) or a "
        "time column, found neither");
    EXPECT_EQ(
        refusal("t,u,y\n0,1,2\n1,NaN,3\n2,3,4\n"),
        "r.csv, line 3, column 2: expected a number in every row of a time record, found NaN");
    EXPECT_EQ(refusal("t (min),u,y\n0,1,2\n1,2,3\n2,3,4\n"),
              "r.csv, line 1, column 1: expected a unit of time (s, ms or us), found min");
    EXPECT_EQ(refusal("t,torque,y\n0,1,2\n1,2,3\n"),
              "r.csv, line 1: expected a column for the excitation (t, torque, y; or a number from "
              "1), found u");
}

/// What is written reads back: frequencies to a rounding of the factor 2 pi, all else exactly.
TEST(WriteResponse, IsReadBack) {
    EstimateOptions options;
    options.averages = 7;
    const MeasuredResponse written =
        estimate_response(first_order_record(4'000, 0.3, 21), options).response;
    const auto file = std::filesystem::path(testing::TempDir()) / "written-response.csv";
    write_response(written, file, {"estimated in a test"});
    const ReadResult result = read_measurement(file);
    std::filesystem::remove(file);
    EXPECT_EQ(result.response.response, written.response);
    EXPECT_EQ(result.response.coherence, written.coherence);
    EXPECT_EQ(result.response.averages, 7.0);
    ASSERT_EQ(result.response.w_rad_s.size(), written.w_rad_s.size());
    for (std::size_t i = 0; i < written.w_rad_s.size(); ++i)
        EXPECT_NEAR(result.response.w_rad_s[i] / written.w_rad_s[i], 1.0, 4e-16);
    EXPECT_TRUE(result.warnings.empty());
}

} // namespace
} // namespace cornerwright
