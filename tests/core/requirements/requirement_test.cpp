#include "core/requirements/requirement.h"
#include "core/requirements/scale.h"

#include <gtest/gtest.h>

#include <cmath>
#include <set>
#include <string>

namespace cornerwright {
namespace {

TEST(Measures, EachHasANameOfItsOwn) {
    std::set<std::string_view> names;
    for (const Measure measure : all_measures())
        names.insert(name_of(measure));
    EXPECT_EQ(names.size(), all_measures().size());
    EXPECT_EQ(all_measures().size(), 17u);
}

TEST(Measures, UnitsGiveTheKeysOfTheProjectFile) {
    const auto key = [](Measure measure) {
        return "at_least" + std::string(key_suffix(unit_of(measure)));
    };
    EXPECT_EQ(key(Measure::phase_margin), "at_least_deg");
    EXPECT_EQ(key(Measure::gain_reduction_margin), "at_least_db");
    EXPECT_EQ(key(Measure::delay_margin), "at_least_s");
    EXPECT_EQ(key(Measure::bandwidth), "at_least_rad_s");
    EXPECT_EQ(key(Measure::overshoot), "at_least_percent");
    EXPECT_EQ(key(Measure::steady_state_error), "at_least");
}

TEST(Scale, DegreesAndDecibelsArePlainDifferences) {
    EXPECT_DOUBLE_EQ(headroom_above(50.0, 45.0, MeasureUnit::deg).value(), 5.0);
    EXPECT_DOUBLE_EQ(headroom_below(7.5, 6.0, MeasureUnit::db).value(), -1.5);
    EXPECT_DOUBLE_EQ(bit_of(45.0, MeasureUnit::deg), 10.0);
    EXPECT_DOUBLE_EQ(bit_of(6.0, MeasureUnit::db), 2.0);
}

TEST(Scale, PositiveQuantitiesAreToldAsLogarithms) {
    EXPECT_DOUBLE_EQ(headroom_above(80.0, 60.0, MeasureUnit::rad_s).value(), std::log(80.0 / 60.0));
    EXPECT_DOUBLE_EQ(headroom_below(0.3, 0.2, MeasureUnit::s).value(), std::log(0.2 / 0.3));
    EXPECT_DOUBLE_EQ(bit_of(60.0, MeasureUnit::rad_s), std::log(1.25));
}

TEST(Scale, ALimitOfZeroIsAPlainDifference) {
    EXPECT_DOUBLE_EQ(headroom_below(0.02, 0.0, MeasureUnit::plain).value(), -0.02);
    EXPECT_DOUBLE_EQ(headroom_below(0.0, 0.0, MeasureUnit::percent).value(), 0.0);
    EXPECT_DOUBLE_EQ(bit_of(0.0, MeasureUnit::plain), 1.0);
}

TEST(Scale, ZeroAndInfiniteValuesHaveInfiniteHeadroom) {
    EXPECT_EQ(headroom_below(0.0, 25.0, MeasureUnit::percent).kind(), Figure::Kind::infinite);
    EXPECT_EQ(headroom_above(0.0, 25.0, MeasureUnit::percent).kind(), Figure::Kind::minus_infinite);
    EXPECT_EQ(headroom_above(HUGE_VAL, 8.0, MeasureUnit::db).kind(), Figure::Kind::infinite);
    EXPECT_EQ(headroom_below(HUGE_VAL, 0.1, MeasureUnit::plain).kind(),
              Figure::Kind::minus_infinite);
}

} // namespace
} // namespace cornerwright
