#include "core/compensator/chain.h"
#include "core/compensator/section.h"
#include "core/numerics/error.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <cmath>

namespace cornerwright {
namespace {

using testing::HasSubstr;

/// The transfer function as the table of the project-file format writes it.
Complex by_table(const Section& section, Complex s) {
    const double w = section.corner_rad_s;
    const Complex x = s / w;
    switch (section.kind) {
    case SectionKind::gain:
        return section.gain;
    case SectionKind::integrator:
        return 1.0 / s;
    case SectionKind::pi:
        return 1.0 + w / s;
    case SectionKind::lead:
    case SectionKind::lag:
        return (s / section.zero_rad_s + 1.0) / (s / section.pole_rad_s + 1.0);
    case SectionKind::real_zero:
        return s / section.zero_rad_s + 1.0;
    case SectionKind::real_pole:
        return 1.0 / (s / section.pole_rad_s + 1.0);
    case SectionKind::complex_zeros:
        return x * x + 2.0 * section.damping * x + 1.0;
    case SectionKind::complex_poles:
        return 1.0 / (x * x + 2.0 * section.damping * x + 1.0);
    case SectionKind::notch:
        return (x * x + 2.0 * section.zero_damping * x + 1.0) /
               (x * x + 2.0 * section.pole_damping * x + 1.0);
    case SectionKind::washout:
        return x / (x + 1.0);
    }
    return 0.0;
}

Section example(SectionKind kind) {
    Section section;
    section.kind = kind;
    section.gain = -3.5;
    section.corner_rad_s = 42.0;
    section.zero_rad_s = kind == SectionKind::lag ? 70.0 : 7.0;
    section.pole_rad_s = 35.0;
    section.damping = 0.3;
    return section;
}

TEST(Section, RootsGiveTheTransferFunctionOfTheTable) {
    for (const SectionKind kind : all_section_kinds()) {
        for (const double damping : {0.05, 0.99, 1.0, 3.0}) {
            Section section = example(kind);
            section.damping = damping;
            section.pole_damping = damping + 0.2;
            section.zero_damping = damping;
            for (const double w : {0.01, 7.0, 41.0, 1e5}) {
                const Complex s{0.3, w};
                const Complex expected = by_table(section, s);
                EXPECT_LT(std::abs(evaluate(roots_of(section), s) - expected),
                          1e-12 * std::abs(expected))
                    << name_of(kind) << " at " << w << ", damping " << damping;
            }
        }
    }
}

TEST(Section, ComplexRootsAreExactConjugates) {
    const RootForm form = roots_of(example(SectionKind::complex_poles));
    ASSERT_EQ(form.poles.size(), 2U);
    EXPECT_EQ(form.poles[0], std::conj(form.poles[1]));
}

TEST(Section, HeavilyDampedPairKeepsItsSlowRoot) {
    // Symptom of the naive formula: w * (damping - sqrt(damping^2 - 1)) is 0 for damping 1e9.
    Section section = example(SectionKind::complex_poles);
    section.damping = 1e9;
    const RootForm form = roots_of(section);
    EXPECT_NEAR(form.poles[1].real() * form.poles[0].real(), 42.0 * 42.0, 1e-9);
    EXPECT_NEAR(form.poles[1].real(), -42.0 / 2e9, 1e-18);
}

TEST(Section, ExamplesPassTheCheck) {
    for (const SectionKind kind : all_section_kinds())
        EXPECT_NO_THROW(check(example(kind))) << name_of(kind);
}

TEST(Section, RefusalNamesSectionValueAndBound) {
    Section section = example(SectionKind::lead);
    section.pole_rad_s = section.zero_rad_s;
    try {
        check(section);
        FAIL() << "a lead without a ratio passed";
    } catch (const InputError& error) {
        EXPECT_THAT(error.what(), HasSubstr("pole above the zero"));
        EXPECT_THAT(error.what(), HasSubstr("\"lead\""));
        EXPECT_THAT(error.what(), HasSubstr("found zero 7 and pole 7 rad/s"));
    }
}

TEST(Section, EveryNumberIsHeldToItsBound) {
    for (const SectionKind kind : all_section_kinds()) {
        for (const SectionParameter& parameter : parameters_of(kind)) {
            Section section = example(kind);
            section.*parameter.value = parameter.bound == ParameterBound::not_zero ? 0.0 : -1.0;
            EXPECT_THROW(check(section), InputError) << parameter.key << " of " << name_of(kind);
            section.*parameter.value = std::nan("");
            EXPECT_THROW(check(section), InputError) << parameter.key << " of " << name_of(kind);
        }
    }
}

TEST(Chain, IsTheProductOfTheEnabledSections) {
    Chain chain{example(SectionKind::gain), example(SectionKind::lead),
                example(SectionKind::notch)};
    chain[1].enabled = false;
    const Complex s{0.0, 12.0};
    const Complex expected = by_table(chain[0], s) * by_table(chain[2], s);
    EXPECT_LT(std::abs(evaluate(roots_of(chain), s) - expected), 1e-13 * std::abs(expected));
}

} // namespace
} // namespace cornerwright
