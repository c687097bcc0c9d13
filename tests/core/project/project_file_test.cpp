#include "core/numerics/error.h"
#include "core/numerics/sha256.h"
#include "core/project/project.h"
#include "tests/core/project/temporary_folder.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <random>

namespace cornerwright {
namespace {

using testing::ElementsAre;
using testing::HasSubstr;
using testing::IsEmpty;

/// Projects with every kind of content and numbers of every size.
class RandomProject {
  public:
    explicit RandomProject(unsigned seed) : random_(seed) {}

    Project make() {
        Project project;
        project.title = text();
        project.notes = text();
        for (int i = below(5); i > 0; --i)
            project.plant_cases.push_back({"case " + std::to_string(i) + text(), source()});
        for (int i = below(8); i > 0; --i)
            project.compensator.push_back(section());
        if (below(2))
            project.sampling = Sampling{size(), size(), below(2) == 1};
        if (below(2))
            project.realisation = realisation();
        for (int i = below(8); i > 0; --i)
            project.requirements.push_back(requirement());
        return project;
    }

  private:
    int below(int end) { return std::uniform_int_distribution<int>(0, end - 1)(random_); }
    double size() {
        return std::pow(10.0, std::uniform_real_distribution<double>(-12.0, 12.0)(random_));
    }
    double either_sign() { return below(2) ? size() : -size(); }
    std::string text() {
        const std::vector<std::string> parts{"Belt", " ", "µ", "\"", "\\", "\n", "\t", "€", "é"};
        std::string result;
        for (int i = below(12); i > 0; --i)
            result += parts[static_cast<std::size_t>(below(static_cast<int>(parts.size())))];
        return result;
    }
    ComplexVector roots(int count) {
        ComplexVector result;
        for (; count > 1; count -= 2) {
            result.emplace_back(either_sign(), size());
            result.push_back(std::conj(result.back()));
        }
        if (count == 1)
            result.emplace_back(either_sign());
        return result;
    }
    PlantModel model() {
        const int zeros = below(4);
        return {{roots(zeros), roots(zeros + below(4)), either_sign()}, below(2) ? size() : 0.0};
    }
    PlantSource source() {
        switch (below(3)) {
        case 0:
            return FormulaSource{"42 exp(-0.0008 s) / (s (s/31 + 1))"};
        case 1:
            return RootsSource{model()};
        default:
            return CoefficientsSource{{either_sign()}, {size(), either_sign(), 0.0}, size()};
        }
    }
    Section section() {
        const auto kinds = all_section_kinds();
        Section result;
        result.kind = kinds[static_cast<std::size_t>(below(static_cast<int>(kinds.size())))];
        for (const SectionParameter& parameter : parameters_of(result.kind))
            result.*parameter.value = size();
        if (result.kind == SectionKind::lead)
            result.pole_rad_s = result.zero_rad_s * 3.7;
        if (result.kind == SectionKind::lag)
            result.pole_rad_s = result.zero_rad_s / 3.7;
        if (result.kind == SectionKind::notch)
            result.zero_damping = result.pole_damping / 9.0;
        result.label = text();
        result.enabled = below(2);
        result.locked = below(2);
        return result;
    }
    Realisation realisation() {
        Realisation result;
        result.method = static_cast<Method>(below(6));
        if (result.method == Method::tustin_at)
            result.match_rad_s = size();
        result.structure = static_cast<Structure>(below(3));
        result.number_format.type = static_cast<NumberFormat::Type>(below(3));
        result.number_format.word_bits = below(2) ? 16 : 32;
        result.number_format.fraction_bits = below(result.number_format.word_bits);
        if (below(2))
            result.output_limits = OutputLimits{-size(), size()};
        return result;
    }
    Requirement requirement() {
        const auto measures = all_measures();
        Requirement result;
        result.measure =
            measures[static_cast<std::size_t>(below(static_cast<int>(measures.size())))];
        if (below(2))
            result.at_least = size();
        if (!result.at_least || below(2))
            result.at_most = result.at_least.value_or(0.0) + size();
        if (result.measure == Measure::settling_time)
            result.band_percent = size();
        if (result.measure == Measure::steady_state_error)
            result.input = static_cast<ErrorInput>(below(3));
        if (result.measure == Measure::disturbance_rejection)
            result.up_to_rad_s = size();
        if (result.measure == Measure::roll_off)
            result.from_rad_s = size();
        return result;
    }

    std::mt19937 random_;
};

TEST(ProjectFile, WhatIsWrittenReadsBackEqual) {
    for (unsigned seed = 0; seed < 500; ++seed) {
        const Project project = RandomProject(seed).make();
        const std::string text = to_text(project);
        const Project again = parse_project(text, "p", ".").project;
        ASSERT_EQ(again, project) << text;
        ASSERT_EQ(to_text(again), text);
    }
}

TEST(ProjectFile, ReadsEveryDocumentedKey) {
    const TemporaryFolder folder;
    const std::string csv =
        "frequency_hz,magnitude_db,phase_deg\n1,-3,-90\n2,-9,-100\n3,-12,-120\n";
    folder.write("measurements/unit7.csv", csv);
    const std::string text = R"json({
  "cornerwright": 1, "title": "Seedling gantry", "notes": "free text",
  "plant_cases": [
    {"name": "empty tray", "formula": "42 exp(-0.0008 s) / (s (s/31 + 1))"},
    {"name": "half load", "model": {"zeros_rad_s": [[-120, 900], [-120, -900]],
     "poles_rad_s": [[0, 0], [-28, 0], [-15, 780], [-15, -780]], "gain": 1170.0,
     "dead_time_s": 0.0008}},
    {"name": "bench unit", "model": {"numerator": [18.0], "denominator": [0.2, 1.0, 0.0],
     "dead_time_s": 0.0}},
    {"name": "unit 7", "measurement": {"file": "measurements/unit7.csv", "sha256": ")json" +
                             sha256_hex(csv) + R"json("}, "integrators": 1, "unstable_poles": 0,
     "fit": {"zeros_rad_s": [], "poles_rad_s": [], "gain": 1.0, "dead_time_s": 0.0,
     "misfit_db": 0.4}}],
  "compensator": [
    {"kind": "gain", "gain": 12.0}, {"kind": "integrator"}, {"kind": "pi", "corner_rad_s": 3.0},
    {"kind": "lead", "zero_rad_s": 20.0, "pole_rad_s": 100.0, "label": "phase lift", "enabled": true, "locked": false},
    {"kind": "lag", "zero_rad_s": 2.0, "pole_rad_s": 1.0}, {"kind": "real_zero", "zero_rad_s": 5},
    {"kind": "real_pole", "pole_rad_s": 500}, {"kind": "complex_zeros", "corner_rad_s": 7, "damping": 0},
    {"kind": "complex_poles", "corner_rad_s": 900, "damping": 0.7},
    {"kind": "notch", "corner_rad_s": 80, "zero_damping": 0.1, "pole_damping": 0.7},
    {"kind": "washout", "corner_rad_s": 0.1}],
  "sampling": {"sample_period_s": 0.0005, "computation_delay_s": 0.00025, "design_includes_hold": true},
  "realisation": {"method": "tustin_at_corners", "structure": "direct_form_2_transposed",
                  "number_format": {"type": "fixed", "word_bits": 32, "fraction_bits": 28}},
  "requirements": [
    {"measure": "bandwidth", "at_least_rad_s": 60.0, "at_most_rad_s": 200.0},
    {"measure": "settling_time", "at_most_s": 0.25, "band_percent": 5.0},
    {"measure": "steady_state_error", "input": "ramp", "at_most": 0.05},
    {"measure": "disturbance_rejection", "up_to_rad_s": 6.0, "at_most_db": -20.0},
    {"measure": "roll_off", "from_rad_s": 600, "at_most_db": -20.0}]
})json";
    const LoadedProject loaded = parse_project(text, "p", folder.path());
    EXPECT_THAT(loaded.notices, IsEmpty());
    const Project& project = loaded.project;
    ASSERT_EQ(project.plant_cases.size(), 4U);
    const auto& measured = std::get<MeasurementSource>(project.plant_cases[3].source);
    ASSERT_TRUE(measured.response);
    EXPECT_EQ(measured.response->w_rad_s.size(), 3U);
    EXPECT_EQ(measured.integrators, 1);
    ASSERT_TRUE(measured.fit);
    EXPECT_EQ(measured.fit->misfit_db, 0.4);
    ASSERT_EQ(project.compensator.size(), 11U);
    EXPECT_EQ(project.compensator[3].label, "phase lift");
    EXPECT_EQ(project.sampling, (Sampling{0.0005, 0.00025, true}));
    ASSERT_TRUE(project.realisation);
    EXPECT_EQ(project.realisation->number_format.fraction_bits, 28);
    ASSERT_EQ(project.requirements.size(), 5U);
    EXPECT_EQ(project.requirements[1].band_percent, 5.0);
    EXPECT_EQ(project.requirements[2].input, ErrorInput::ramp);
    EXPECT_EQ(parse_project(to_text(project), "p", folder.path()).project, project);
}

TEST(ProjectFile, AChangedMeasurementIsTold) {
    const TemporaryFolder folder;
    folder.write("a.csv", "frequency_hz,magnitude_db,phase_deg\n1,-3,-90\n2,-9,-100\n");
    const std::string text =
        R"({"cornerwright": 1, "plant_cases": [{"name": "unit", "measurement":
        {"file": "a.csv", "sha256": ")" +
        std::string(64, '0') + R"("}}]})";
    const LoadedProject loaded = parse_project(text, "p", folder.path());
    EXPECT_THAT(loaded.notices, ElementsAre(HasSubstr("\"a.csv\" has changed")));
    const auto& source = std::get<MeasurementSource>(loaded.project.plant_cases[0].source);
    EXPECT_TRUE(source.response);
    EXPECT_EQ(source.sha256, std::string(64, '0')) << "the pin is the user's to renew";
}

TEST(ProjectFile, AMissingMeasurementKeepsItsPlaceWhereThatIsWanted) {
    const std::string text =
        R"({"cornerwright": 1, "plant_cases": [{"name": "unit", "measurement":
        {"file": "gone.csv"}, "integrators": 2}]})";
    EXPECT_THROW(parse_project(text, "p", "."), InputError);
    const LoadedProject loaded = parse_project(text, "p", ".", MissingFiles::are_notices);
    EXPECT_THAT(loaded.notices, ElementsAre(HasSubstr("gone.csv")));
    const auto& source = std::get<MeasurementSource>(loaded.project.plant_cases[0].source);
    EXPECT_FALSE(source.response);
    EXPECT_EQ(source.integrators, 2);
    EXPECT_THAT(to_text(loaded.project), HasSubstr("gone.csv"));
}

TEST(ProjectFile, AnErrorInAMeasurementNamesThatFile) {
    const TemporaryFolder folder;
    folder.write("a.csv", "frequency_hz,magnitude_db,phase_deg\n1,-3,-90\n2,minus three,-100\n");
    const std::string text =
        R"({"cornerwright": 1, "plant_cases": [{"name": "unit", "measurement":
        {"file": "a.csv"}}]})";
    try {
        parse_project(text, "p", folder.path());
        FAIL();
    } catch (const InputError& error) {
        EXPECT_THAT(error.what(), HasSubstr("a.csv, line 3, column 2"));
        EXPECT_THAT(error.what(), HasSubstr("minus three"));
    }
}

TEST(ProjectFile, NumbersAreWrittenInTheirShortestForm) {
    Project project;
    Section gain;
    gain.gain = 0.1;
    project.compensator = {gain};
    EXPECT_THAT(to_text(project), HasSubstr("{\"kind\": \"gain\", \"gain\": 0.1}"));
}

TEST(ProjectFile, SavesAndLoads) {
    const TemporaryFolder folder;
    const auto file = folder.path() / "axis.cornerwright.json";
    const Project project = RandomProject(3).make();
    save_project(project, file);
    EXPECT_EQ(load_project(file).project, project);
}

} // namespace
} // namespace cornerwright
