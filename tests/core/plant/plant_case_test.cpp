#include "core/numerics/error.h"
#include "core/plant/plant_case.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

namespace cornerwright {
namespace {

using testing::HasSubstr;

std::string refusal_of(const PlantSource& source) {
    try {
        model_of(source);
    } catch (const InputError& error) {
        return error.what();
    }
    return {};
}

TEST(PlantCase, CoefficientsBecomeRoots) {
    const auto model = model_of(CoefficientsSource{{18.0}, {0.2, 1.0, 0.0}, 0.01});
    ASSERT_TRUE(model);
    EXPECT_THAT(model->roots.poles, testing::UnorderedElementsAre(Complex(0.0), Complex(-5.0)));
    EXPECT_DOUBLE_EQ(model->roots.gain, 90.0);
    EXPECT_EQ(model->dead_time_s, 0.01);
}

TEST(PlantCase, LeadingZeroCoefficientsDoNotCount) {
    const auto model = model_of(CoefficientsSource{{0.0, 0.0, 4.0}, {0.0, 2.0, 8.0}, 0.0});
    ASSERT_TRUE(model);
    EXPECT_EQ(model->roots.poles, ComplexVector{Complex(-4.0)});
    EXPECT_EQ(model->roots.gain, 2.0);
}

TEST(PlantCase, ImproperPlantsAreRefusedInEveryForm) {
    EXPECT_THAT(refusal_of(FormulaSource{"(s + 1)^2/(s + 3)"}), HasSubstr("2 zeros and 1 pole"));
    EXPECT_THAT(refusal_of(CoefficientsSource{{1.0, 0.0}, {1.0}, 0.0}),
                HasSubstr("1 zero and 0 poles"));
    EXPECT_THAT(refusal_of(RootsSource{{{{-1.0}, {}, 1.0}, 0.0}}), HasSubstr("no more zeros"));
    EXPECT_EQ(refusal_of(RootsSource{{{{-1.0}, {-2.0}, 1.0}, 0.0}}), "");
}

TEST(PlantCase, ZeroIsNoPlant) {
    EXPECT_THAT(refusal_of(CoefficientsSource{{0.0}, {1.0}, 0.0}), HasSubstr("not zero"));
    EXPECT_THAT(refusal_of(CoefficientsSource{{1.0}, {0.0, 0.0}, 0.0}), HasSubstr("denominator"));
    EXPECT_THAT(refusal_of(CoefficientsSource{{1.0}, {}, 0.0}), HasSubstr("denominator"));
}

TEST(PlantCase, AMeasurementHasTheModelOfItsFitOrNone) {
    MeasurementSource source;
    EXPECT_FALSE(model_of(source));
    source.fit = FittedModel{{{{}, {-3.0}, 2.0}, 0.1}, 0.4};
    EXPECT_EQ(model_of(source), source.fit->model);
}

TEST(PlantCase, MeasurementsCompareByTheirPoints) {
    MeasurementSource left;
    MeasurementSource right;
    EXPECT_EQ(left, right);
    left.response = std::make_shared<MeasuredResponse>(MeasuredResponse{{1.0}, {1.0}, {}, 0.0});
    EXPECT_NE(left, right);
    right.response = std::make_shared<MeasuredResponse>(*left.response);
    EXPECT_EQ(left, right);
    right.response = std::make_shared<MeasuredResponse>(MeasuredResponse{{1.0}, {2.0}, {}, 0.0});
    EXPECT_NE(left, right);
}

} // namespace
} // namespace cornerwright
