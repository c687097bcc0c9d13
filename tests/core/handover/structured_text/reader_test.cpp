// The reader of structured text itself: what it must compute and what it must refuse.
#include "tests/core/handover/structured_text/machine.h"

#include <gtest/gtest.h>

namespace cornerwright::test::st {
namespace {

/// The value of an expression of type LINT in a block with inputs a = 7, b = -7.
std::int64_t value_of(const std::string& expression) {
    const Program program = read_program(
        "FUNCTION twice : LINT VAR_INPUT v : LINT; END_VAR twice := 2 * v; END_FUNCTION\n"
        "FUNCTION_BLOCK block VAR_INPUT a : LINT; b : LINT; END_VAR VAR_OUTPUT out : LINT; END_VAR "
        "(* one line *) out := " +
        expression + "; END_FUNCTION_BLOCK");
    BlockInstance block(program, "block");
    block.set_integer(0, 7);
    block.set_integer(1, -7);
    block.call();
    return block.integer(2);
}

std::string refusal(const std::string& declarations, const std::string& body) {
    try {
        const Program program = read_program("FUNCTION_BLOCK block " + declarations + " " + body +
                                             " END_FUNCTION_BLOCK");
        BlockInstance(program, "block").call();
    } catch (const TextError& refused) {
        return refused.what();
    }
    return "accepted";
}

TEST(StructuredTextReader, KnowsPrecedenceAndIntegerDivision) {
    EXPECT_EQ(value_of("1 + 2 * 3"), 7);
    EXPECT_EQ(value_of("(1 + 2) * 3"), 9);
    EXPECT_EQ(value_of("a - 2 - 3"), 2);
    EXPECT_EQ(value_of("b / 2"), -3); // towards zero
    EXPECT_EQ(value_of("a / 2"), 3);
    EXPECT_EQ(value_of("b MOD 4"), -3);
    EXPECT_EQ(value_of("-a * 2"), -14);
    EXPECT_EQ(value_of("twice(twice(a) + twice(b + 1))"), 2 * (14 - 12));
}

TEST(StructuredTextReader, ChoosesTheFirstTrueBranch) {
    const auto chosen = [](const std::string& condition) {
        const Program program = read_program(
            "FUNCTION_BLOCK block VAR_OUTPUT out : INT; END_VAR IF " + condition +
            " THEN out := 1; ELSIF TRUE THEN out := 2; ELSE out := 3; END_IF; END_FUNCTION_BLOCK");
        BlockInstance block(program, "block");
        block.call();
        return block.integer(0);
    };
    EXPECT_EQ(chosen("1 < 2 AND NOT (3 > 4)"), 1);
    EXPECT_EQ(chosen("1 > 2 OR 2.0 >= 2.5"), 2);
    EXPECT_EQ(chosen("FALSE XOR TRUE"), 1);
}

TEST(StructuredTextReader, RoundsRealToSinglePrecision) {
    const Program program = read_program(
        "FUNCTION_BLOCK block VAR_OUTPUT out : REAL; wide : LREAL; END_VAR VAR third : REAL := "
        "0.1; END_VAR out := third * third; wide := 0.1 * 0.1; END_FUNCTION_BLOCK");
    BlockInstance block(program, "block");
    block.call();
    EXPECT_EQ(block.real(0), static_cast<double>(0.1f * 0.1f));
    EXPECT_EQ(block.real(1), 0.1 * 0.1);
}

TEST(StructuredTextReader, KeepsVariablesButNotTemporaries) {
    const Program program = read_program(
        "FUNCTION_BLOCK block VAR_OUTPUT out : DINT; END_VAR VAR kept : DINT := 5; END_VAR "
        "VAR_TEMP t : DINT; END_VAR t := t + 1; kept := kept + t; out := kept; "
        "END_FUNCTION_BLOCK");
    BlockInstance block(program, "block");
    block.call();
    block.call();
    EXPECT_EQ(block.integer(0), 7);
}

TEST(StructuredTextReader, RefusesWhatTheStandardRefuses) {
    EXPECT_EQ(refusal("VAR a : INT; b : DINT; END_VAR", "b := a;"),
              "line 1: expected dint, found int");
    EXPECT_EQ(refusal("VAR a : INT; END_VAR", "a := 1.0;"), "line 1: expected int, found lreal");
    EXPECT_EQ(refusal("VAR a : REAL; END_VAR", "a := a + 1;"), "line 1: expected real, found lint");
    EXPECT_EQ(refusal("VAR a : INT; END_VAR", "a := 40000;"), "line 1: a number beyond int");
    EXPECT_EQ(refusal("VAR a : INT; A : INT; END_VAR", ""), "line 1: a second variable a");
    EXPECT_EQ(refusal("VAR CONSTANT a : INT := 1; END_VAR", "a := 2;"),
              "line 1: an assignment to a, which may not change");
    EXPECT_EQ(refusal("VAR a__b : INT; END_VAR", ""),
              "line 1: the name a__b with underscores that the standard refuses");
    EXPECT_EQ(refusal("", "(* a (* b *) *)"),
              "line 1: a comment within a comment, which not every edition knows");
    EXPECT_EQ(refusal("VAR a : INT; END_VAR", "IF a THEN a := 1; END_IF;"),
              "line 1: expected bool, found int");
    EXPECT_EQ(refusal("VAR a : INT; END_VAR", "a := missing;"), "no variable missing in block");
}

TEST(StructuredTextReader, RefusesOverflow) {
    EXPECT_EQ(refusal("VAR a : INT := 32767; END_VAR", "a := a + 1;"), "an overflow of int");
    EXPECT_EQ(refusal("VAR a : LINT := 9223372036854775807; END_VAR", "a := a + 1;"),
              "an overflow of lint");
    EXPECT_EQ(refusal("VAR a : DINT; END_VAR", "a := 1 / a;"), "a division by zero");
}

} // namespace
} // namespace cornerwright::test::st
