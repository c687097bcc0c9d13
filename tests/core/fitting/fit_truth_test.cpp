// Responses of known rational models, with and without noise, and what a fit of each must reach.

#include "core/numerics/error.h"
#include "tests/core/fitting/practice_fit.h"

#include <gtest/gtest.h>
#include <nlohmann/json.hpp>

#include <cmath>
#include <filesystem>
#include <fstream>
#include <sstream>

namespace cornerwright {
namespace {

using nlohmann::json;

const std::filesystem::path data_folder = CORNERWRIGHT_TEST_DATA "/core/fitting/data";

MeasuredResponse read_points(const std::filesystem::path& file) {
    std::ifstream stream(file);
    MeasuredResponse measured;
    std::string line;
    std::getline(stream, line);
    std::getline(stream, line);
    const bool has_coherence = line.find("Coherence") != std::string::npos;
    while (std::getline(stream, line)) {
        std::istringstream fields(line);
        std::vector<double> numbers;
        for (std::string field; std::getline(fields, field, ',');)
            numbers.push_back(std::stod(field));
        measured.w_rad_s.push_back(numbers.at(0));
        measured.response.emplace_back(numbers.at(1), numbers.at(2));
        if (has_coherence)
            measured.coherence.push_back(numbers.at(3));
    }
    return measured;
}

class FitTruth : public testing::TestWithParam<std::string> {};

TEST_P(FitTruth, EveryRunReachesWhatItMust) {
    const std::string name = GetParam();
    const MeasuredResponse measured = read_points(data_folder / (name + ".csv"));
    ASSERT_GT(measured.w_rad_s.size(), 100U);
    json truth;
    std::ifstream(data_folder / (name + ".truth.json")) >> truth;
    const PlantModel plant = plant_in(truth.at("plant"));

    for (const json& run : truth.at("runs")) {
        SCOPED_TRACE(run.dump());
        FitOptions options;
        options.dead_time_s = asked(run.at("dead_time"));
        if (const auto order = asked(run.at("order")))
            options.order = static_cast<int>(*order);
        const FitResult fit = fit_model(measured, options);

        EXPECT_LE(fit.model.roots.zeros.size(), fit.model.roots.poles.size());
        EXPECT_EQ(static_cast<int>(fit.model.roots.poles.size()), fit.order);
        EXPECT_EQ(unstable_poles_of(fit.model, measured.w_rad_s.front()),
                  unstable_poles_of(plant, measured.w_rad_s.front()));
        EXPECT_NEAR(fit.misfit_db, misfit_db(fit.model, measured), 1e-12);
        if (options.order)
            EXPECT_EQ(fit.order, *options.order);
        else
            EXPECT_LE(fit.order, run.at("order_at_most").get<int>());

        if (run.contains("relative_error_at_most")) {
            for (const double w : measured.w_rad_s)
                ASSERT_LT(std::abs(response_of(fit.model, w) / response_of(plant, w) - 1.0),
                          run.at("relative_error_at_most").get<double>());
        } else {
            const double averages = truth.at("averages").get<double>();
            const double floor = misfit_in_sigma(plant, plant, measured, averages);
            EXPECT_NEAR(floor, truth.at("floor").get<double>(), 1e-6 * floor);
            EXPECT_LE(misfit_in_sigma(fit.model, plant, measured, averages), 1.1 * floor);
        }
    }
}

std::vector<std::string> truth_names() {
    std::vector<std::string> names;
    for (const auto& entry : std::filesystem::directory_iterator(data_folder)) {
        if (entry.path().extension() == ".csv")
            names.push_back(entry.path().stem().string());
    }
    std::sort(names.begin(), names.end());
    return names;
}

INSTANTIATE_TEST_SUITE_P(Practice, FitTruth, testing::ValuesIn(truth_names()),
                         [](const auto& parameter) {
                             std::string name = parameter.param;
                             std::replace_if(
                                 name.begin(), name.end(),
                                 [](char c) { return c == '-' || c == '.'; }, '_');
                             return name;
                         });

TEST(Fit, RefusesAnOrderThatThePointsCannotTell) {
    const MeasuredResponse three{{1.0, 2.0, 3.0}, {{1.0, 0.0}, {0.9, -0.1}, {0.8, -0.2}}, {}, 0.0};
    FitOptions options;
    options.order = 8;
    EXPECT_THROW(fit_model(three, options), InputError);
    options.order = 0;
    EXPECT_THROW(fit_model(three, options), InputError);
}

} // namespace
} // namespace cornerwright
