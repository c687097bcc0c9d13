#pragma once

#include "core/compensator/chain.h"
#include "core/loop/loop_assessment.h"
#include "core/plant/formula.h"
#include "core/plant/plant_case.h"

#include <gtest/gtest.h>

#include <string_view>
#include <utility>
#include <vector>

namespace cornerwright::outside {

/// A loop of a plant written as a formula and a chain of sections.
inline DesignLoop loop_of(std::string_view formula, const Chain& chain = {}) {
    DesignLoop loop;
    loop.compensator = roots_of(chain);
    loop.plant = parse_formula(formula);
    return loop;
}

inline LoopFigures figures_of(const DesignLoop& loop) {
    return assess_loop(loop, {}).figures;
}

inline LoopFigures figures_of(std::string_view formula, const Chain& chain = {}) {
    return figures_of(loop_of(formula, chain));
}

/// The loop whose closed loop is a0/(denominator), an all-pole low-pass: L = a0/(denominator - a0).
/// Coefficients highest power first, the last one is a0.
inline LoopFigures low_pass_figures(std::vector<double> denominator) {
    CoefficientsSource source;
    source.numerator = {denominator.back()};
    denominator.back() = 0.0;
    source.denominator = std::move(denominator);
    DesignLoop loop;
    loop.plant = *model_of(source);
    return figures_of(loop);
}

/// Equal to the last of the printed digits (ten unless said otherwise).
inline void expect_figure(const Figure& figure, double printed, double relative = 1e-9) {
    ASSERT_TRUE(figure.is_value()) << figure.reason();
    EXPECT_NEAR(figure.value(), printed, relative * std::abs(printed));
}

} // namespace cornerwright::outside
