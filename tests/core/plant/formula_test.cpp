#include "core/numerics/error.h"
#include "core/plant/formula.h"

#include <gmock/gmock.h>
#include <gtest/gtest.h>

#include <random>

namespace cornerwright {
namespace {

using testing::HasSubstr;
using testing::UnorderedElementsAre;

Complex at(const std::string& formula, Complex s) {
    const PlantModel model = parse_formula(formula);
    return evaluate(model.roots, s) * std::exp(-s * model.dead_time_s);
}

void expect_near(Complex value, Complex expected, double relative = 1e-13) {
    EXPECT_LE(std::abs(value - expected), relative * std::abs(expected))
        << value << " for " << expected;
}

TEST(Formula, KeepsFactorsAsExactRoots) {
    const PlantModel model = parse_formula("42 exp(-0.0008 s) / (s (s/31 + 1))");
    EXPECT_TRUE(model.roots.zeros.empty());
    EXPECT_THAT(model.roots.poles, UnorderedElementsAre(Complex(0.0), Complex(-31.0)));
    EXPECT_EQ(model.roots.gain, 42.0 * 31.0);
    EXPECT_EQ(model.dead_time_s, 0.0008);
}

TEST(Formula, SolvesARootExactlyForEveryWholeCorner) {
    for (int corner = 1; corner <= 3000; ++corner) {
        const PlantModel model = parse_formula("1/(s/" + std::to_string(corner) + " + 1)");
        ASSERT_EQ(model.roots.poles, ComplexVector{Complex(-corner)});
        ASSERT_EQ(model.roots.gain, corner);
    }
}

TEST(Formula, GivesConjugatePairsExactly) {
    const PlantModel model = parse_formula("1/(s^2/90000 + 0.00002 s + 1)");
    ASSERT_EQ(model.roots.poles.size(), 2U);
    EXPECT_EQ(model.roots.poles[0], std::conj(model.roots.poles[1]));
    // s^2 + 1.8 s + 90000 = 0
    EXPECT_DOUBLE_EQ(model.roots.poles[0].real(), -0.9);
    EXPECT_DOUBLE_EQ(std::abs(model.roots.poles[0]), 300.0);
}

TEST(Formula, SeesADoubleRootWrittenInDecimals) {
    const PlantModel model = parse_formula("1/(s^2 + 0.2 s + 0.01)");
    EXPECT_THAT(model.roots.poles, UnorderedElementsAre(Complex(-0.1), Complex(-0.1)));
}

TEST(Formula, JuxtapositionGoesFromLeftToRightBehindAParenthesis) {
    const Complex s(0.3, 1.7);
    expect_near(at("3/(s + 1) (s + 2)", s), 3.0 / (s + 1.0) * (s + 2.0));
    expect_near(at("3/(s + 1)^2 (s + 2)", s), 3.0 / ((s + 1.0) * (s + 1.0)) * (s + 2.0));
    expect_near(at("(1/2) s", s), s / 2.0);
    expect_near(at("1/(2 s)", s), 0.5 / s);
    expect_near(at("100/s * (s + 1)", s), 100.0 / s * (s + 1.0));
    expect_near(at("2s(s+1) 3.5e-1", s), 0.7 * s * (s + 1.0));
}

TEST(Formula, PowersAndSigns) {
    const Complex s(0.4, -0.9);
    expect_near(at("-s^2", s), -s * s);
    expect_near(at("s^-2", s), 1.0 / (s * s));
    expect_near(at("(s + 1)^(-3)", s), 1.0 / std::pow(s + 1.0, 3));
    expect_near(at("2 - -3 s", s), 2.0 + 3.0 * s);
    expect_near(at("4 * -s", s), -4.0 * s);
    expect_near(at("1 - s/120", s), 1.0 - s / 120.0);
    expect_near(at("(2^3) s^0", s), 8.0);
}

TEST(Formula, SumsOfFractionsComeOverTheLeastCommonDenominator) {
    const Complex s(-0.2, 2.0);
    expect_near(at("1/(s + 1) + 2/(s + 3)", s), 1.0 / (s + 1.0) + 2.0 / (s + 3.0));
    const PlantModel same = parse_formula("1/(s + 1) + 2/(s + 1)");
    EXPECT_EQ(same.roots.poles, ComplexVector{Complex(-1.0)});
    EXPECT_DOUBLE_EQ(same.roots.gain, 3.0);
    const PlantModel modes = parse_formula("1/s^2 + 1/(s^2 + 4) + 1/(s^2 + 9)");
    EXPECT_EQ(modes.roots.poles.size(), 6U);
    EXPECT_EQ(modes.roots.zeros.size(), 4U);
}

TEST(Formula, SharedFactorsOfASumStayExact) {
    const PlantModel model = parse_formula("(s^3 + 2 s^2)/((s + 7)^3 (s + 0.1))");
    EXPECT_THAT(model.roots.zeros, UnorderedElementsAre(Complex(0.0), Complex(0.0), Complex(-2.0)));
}

TEST(Formula, CancelledTermsVanishAndCancelledFactorsStay) {
    EXPECT_TRUE(parse_formula("(s + 1) - s").roots.zeros.empty());
    EXPECT_TRUE(parse_formula("0.1 s + 0.2 s - 0.3 s + 5").roots.zeros.empty());
    const PlantModel hidden = parse_formula("(s - 1)/((s - 1) (s + 2))");
    EXPECT_EQ(hidden.roots.zeros.size(), 1U);
    EXPECT_EQ(hidden.roots.poles.size(), 2U);
}

TEST(Formula, DeadTimesAddUp) {
    EXPECT_DOUBLE_EQ(parse_formula("exp(-0.1 s) exp(-s/4)/(s + 1)").dead_time_s, 0.35);
    EXPECT_DOUBLE_EQ(parse_formula("exp(-2 s)^2/(s + 1)").dead_time_s, 4.0);
    EXPECT_DOUBLE_EQ(parse_formula("(exp(-s) + 2 exp(-s))/(s + 1)").dead_time_s, 1.0);
    EXPECT_EQ(parse_formula("exp(-0 s)/(s + 1)").dead_time_s, 0.0);
}

TEST(Formula, ReadsRandomProductsAsWritten) {
    std::mt19937 random(7);
    std::uniform_real_distribution<double> exponent(-3.0, 5.0);
    std::uniform_int_distribution<int> count(0, 6);
    for (int round = 0; round < 300; ++round) {
        const Complex s = std::polar(std::pow(10.0, exponent(random)), 1.3);
        Complex expected = 1.0;
        std::string numerator = "1";
        std::string denominator = "(1";
        for (int i = count(random); i > 0; --i) {
            const std::string corner = std::to_string(std::pow(10.0, exponent(random)));
            numerator += " (s/" + corner + " + 1)";
            expected *= s / std::stod(corner) + 1.0;
        }
        for (int i = count(random); i > 0; --i) {
            const std::string corner = std::to_string(std::pow(10.0, exponent(random)));
            denominator += " (s^2/" + corner + "^2 + 0.02 s/" + corner + " + 1)";
            const Complex x = s / std::stod(corner);
            expected /= x * x + 0.02 * x + 1.0;
        }
        expect_near(at(numerator + "/" + denominator + ")", s), expected, 1e-12);
    }
}

struct Refusal {
    const char* formula;
    int column;
    const char* words;
};

class FormulaRefuses : public testing::TestWithParam<Refusal> {};

TEST_P(FormulaRefuses, WithColumnAndSentence) {
    const Refusal& refusal = GetParam();
    try {
        parse_formula(refusal.formula);
        FAIL() << "was accepted";
    } catch (const InputError& error) {
        ASSERT_TRUE(error.place().column);
        EXPECT_EQ(*error.place().column, refusal.column) << error.what();
        EXPECT_THAT(error.what(), HasSubstr(refusal.words));
    }
}

INSTANTIATE_TEST_SUITE_P(
    Wrong, FormulaRefuses,
    testing::Values(Refusal{"", 1, "nothing"}, Refusal{"   ", 4, "nothing"},
                    Refusal{"1/2 s", 5, "(1/2) s or 1/(2 s)"}, Refusal{"1/s exp(-s)", 5, "1/(2 s)"},
                    Refusal{"1/s (s + 1)", 5, "1/(2 s)"}, Refusal{"1/s^2 (s + 1)", 7, "1/(2 s)"},
                    Refusal{"42/(s (s + 1)", 14, "\")\" for the \"(\" at character 4"},
                    Refusal{"42/(s + 1))", 11, "end of the formula"},
                    Refusal{"42//s", 4, "found \"/\""}, Refusal{"42/", 4, "end of the formula"},
                    Refusal{"0,5/s", 2, "comma"}, Refusal{"s^1.5", 3, "whole number"},
                    Refusal{"s^s", 3, "whole number"}, Refusal{"s^2^3", 4, "power of a power"},
                    Refusal{"1/s^61", 5, "60 at most"}, Refusal{"10 z/(s + 1)", 4, "\"z\""},
                    Refusal{"ω/(s + 1)", 1, "\"ω\""}, Refusal{"1/(µ + 1)", 4, "\"µ\""},
                    Refusal{"1/(ä s + % 1)", 4, "\"ä\""}, Refusal{"1/exp(-s)", 3, "numerator only"},
                    Refusal{"exp(-s)^-1", 1, "numerator only"},
                    Refusal{"exp(0.5 s)", 4, "minus sign"}, Refusal{"exp(-s^2)", 4, "-T s"},
                    Refusal{"exp(-s - 1)", 4, "-T s"}, Refusal{"exp -s", 5, "\"(\" behind exp"},
                    Refusal{"exp(-s) + 1", 9, "dead time"}, Refusal{"1/(s - s)", 3, "not zero"},
                    Refusal{"s2", 2, "operator before a number"},
                    Refusal{"0/(s + 1)", 1, "not zero"}, Refusal{"1e999/s", 1, "size"},
                    Refusal{"(s + 1)^40 (s + 2)^40", 12, "order"}, Refusal{"nan/s", 1, "\"nan\""},
                    Refusal{"1/(s + .)", 8, "a number"}));

TEST(Formula, SurvivesAbsurdDepthAndLength) {
    EXPECT_THROW(parse_formula(std::string(100'000, '(')), InputError);
    EXPECT_THROW(parse_formula(std::string(19'000, '(')), InputError);
    EXPECT_THROW(parse_formula(std::string(19'999, 's')), InputError);
    std::string sum = "1";
    for (int i = 0; i < 4000; ++i)
        sum += "+s";
    EXPECT_THROW(parse_formula(sum), InputError);
    EXPECT_NO_THROW(parse_formula(std::string(19'000, '-') + "s"));
}

TEST(Formula, SurvivesRandomCharacters) {
    std::mt19937 random(11);
    const std::string letters = "s0123456789.e+-*/^() exp(-s)";
    std::uniform_int_distribution<std::size_t> letter(0, letters.size() - 1);
    std::uniform_int_distribution<int> length(1, 40);
    int accepted = 0;
    for (int round = 0; round < 20'000; ++round) {
        std::string text;
        for (int i = length(random); i > 0; --i)
            text += letters[letter(random)];
        try {
            const PlantModel model = parse_formula(text);
            ++accepted;
            for (const ComplexVector* roots : {&model.roots.zeros, &model.roots.poles})
                for (const Complex root : *roots)
                    ASSERT_TRUE(std::isfinite(root.real()) && std::isfinite(root.imag())) << text;
            ASSERT_TRUE(std::isfinite(model.roots.gain) && model.roots.gain != 0.0) << text;
        } catch (const InputError&) {
        }
    }
    EXPECT_GT(accepted, 100);
}

} // namespace
} // namespace cornerwright
