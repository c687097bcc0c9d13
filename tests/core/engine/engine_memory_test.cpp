// An engine that remembers must answer like one that was born a moment ago.

#include "core/engine/engine.h"
#include "tests/core/engine/practice_project.h"

#include <gtest/gtest.h>

namespace cornerwright {
namespace {

/// Told apart part by part, so that a failure says which part of the answer was stale.
void expect_same(const Assessment& remembered, const Assessment& fresh) {
    ASSERT_EQ(remembered.cases.size(), fresh.cases.size());
    for (std::size_t i = 0; i < fresh.cases.size(); ++i) {
        SCOPED_TRACE(fresh.cases[i].name);
        EXPECT_EQ(remembered.cases[i].design.figures, fresh.cases[i].design.figures);
        EXPECT_EQ(remembered.cases[i].design, fresh.cases[i].design);
        EXPECT_EQ(remembered.cases[i].realised, fresh.cases[i].realised);
        EXPECT_EQ(remembered.cases[i], fresh.cases[i]);
    }
    EXPECT_EQ(remembered.verdict, fresh.verdict);
    EXPECT_EQ(remembered, fresh);
}

TEST(EngineMemory, EqualsAFreshEngineOverAThousandRandomEdits) {
    constexpr int edits = 1000;
    std::mt19937 random(20);
    Project project = practice::mixed_project();
    Engine engine;
    for (int i = 0; i < edits; ++i) {
        SCOPED_TRACE(i);
        expect_same(*engine.assess(project), *Engine().assess(project));
        if (HasFailure())
            return;
        project = practice::edited(project, random);
    }
}

TEST(EngineMemory, LocusEqualsThatOfAFreshEngine) {
    constexpr int edits = 100;
    std::mt19937 random(21);
    Project project = practice::mixed_project();
    Engine engine;
    for (int i = 0; i < edits; ++i) {
        SCOPED_TRACE(i);
        const std::size_t index = static_cast<std::size_t>(i) % project.plant_cases.size();
        const auto remembered = engine.locus(project, index);
        const auto fresh = Engine().locus(project, index);
        EXPECT_EQ(remembered->factors, fresh->factors);
        EXPECT_EQ(remembered->closed_loop_poles, fresh->closed_loop_poles);
        ASSERT_EQ(remembered->branches.size(), fresh->branches.size());
        for (std::size_t b = 0; b < fresh->branches.size(); ++b)
            EXPECT_EQ(remembered->branches[b].poles, fresh->branches[b].poles);
        project = practice::edited(project, random);
    }
}

TEST(EngineMemory, AnEditChangesWhatItShould) {
    const Project before = practice::mixed_project();
    Project after = before;
    after.compensator[2].zero_rad_s *= 1.2;
    Engine engine;
    const auto first = engine.assess(before);
    const auto second = engine.assess(after);
    for (std::size_t i = 0; i < before.plant_cases.size(); ++i)
        EXPECT_NE(first->cases[i].design.figures.frequency,
                  second->cases[i].design.figures.frequency);
}

TEST(EngineMemory, ALimitMovesNoFigure) {
    const Project before = practice::mixed_project();
    Project after = before;
    *after.requirements[0].at_least += 5.0;
    Engine engine;
    const auto first = engine.assess(before);
    const auto second = engine.assess(after);
    EXPECT_EQ(first->cases, second->cases);
    EXPECT_NE(first->verdict, second->verdict);
}

TEST(Engine, SaysWhyACaseWithoutItsFileIsNotDetermined) {
    Project project = practice::mixed_project();
    std::get<MeasurementSource>(project.plant_cases[1].source).response.reset();
    const auto assessment = Engine().assess(project);
    EXPECT_NE(assessment->cases[1].unusable.find("loaded.csv"), std::string::npos);
    EXPECT_FALSE(assessment->cases[1].design.figures.frequency.phase_margin_deg.is_determined());
    EXPECT_TRUE(assessment->cases[0].design.figures.frequency.phase_margin_deg.is_determined());
}

TEST(Engine, SaysWhyThereIsNoDifferenceEquation) {
    Project project = practice::mixed_project();
    project.compensator[4].corner_rad_s = 1.1 * 3.14159265 / project.sampling->sample_period_s;
    const auto assessment = Engine().assess(project);
    EXPECT_FALSE(assessment->equation);
    EXPECT_FALSE(assessment->realisation_problem.empty());
    ASSERT_TRUE(assessment->cases[0].realised);
    EXPECT_FALSE(assessment->cases[0].realised->figures.stability.stable);
}

} // namespace
} // namespace cornerwright
