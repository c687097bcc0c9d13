#include "core/handover/evidence.h"
#include "core/handover/handover_texts.h"
#include "core/handover/number_literals.h"
#include "core/handover/plain_comment.h"
#include "core/handover/step_text.h"
#include "core/handover/test_vectors.h"
#include "core/numerics/number_text.h"

namespace cornerwright {
namespace {

/// The types of a number format: of signals and states, and of sums.
struct Types {
    std::string signal;
    std::string sum;
};

Types types_of(const NumberFormat& format) {
    if (format.type == NumberFormat::Type::float64)
        return {"double", "double"};
    if (format.type == NumberFormat::Type::float32)
        return {"float", "float"};
    return format.word_bits == 16 ? Types{"int16_t", "int32_t"} : Types{"int32_t", "int64_t"};
}

class C99 final : public Dialect {
  public:
    C99(const NumberFormat& format, std::string name) : format_(format), name_(std::move(name)) {}

    std::string comment(const std::string& text) const override { return "/* " + text + " */"; }
    std::string assign(const std::string& target, const std::string& value) const override {
        return target + " = " + value + ";";
    }
    std::string state(const std::string& name) const override { return "state->" + name; }
    std::string store(const std::string& name, const std::string& value) const override {
        const bool narrows = fixed() && value.rfind("state->", 0) != 0;
        return assign(state(name), narrows ? "(" + types_of(format_).signal + ")" + value : value);
    }
    std::string real(double value) const override {
        return real_literal(value, format_.type) +
               (format_.type == NumberFormat::Type::float32 ? "f" : "");
    }
    std::string shifted(const std::string& sum, int bits) const override {
        return name_ + "_shifted(" + sum + ", " + std::to_string(bits) + ")";
    }
    std::string saturated(const std::string& value) const override {
        return name_ + "_saturated(" + value + ")";
    }
    std::string word(const std::string& sum, int bits) const override {
        return saturated(shifted(sum, bits));
    }
    std::string both(const std::string& left, const std::string& right) const override {
        return "(" + left + " && " + right + ")";
    }
    std::string either(const std::string& left, const std::string& right) const override {
        return left + " || " + right;
    }
    std::string negated(const std::string& condition) const override {
        return "!(" + condition + ")";
    }
    std::string open_if(const std::string& condition) const override {
        return "if (" + condition + ") {";
    }
    std::string open_else() const override { return "} else {"; }
    std::string close_if() const override { return "}"; }

  private:
    bool fixed() const { return format_.type == NumberFormat::Type::fixed; }

    NumberFormat format_;
    std::string name_;
};

std::string upper(std::string text) {
    for (char& c : text)
        if (c >= 'a' && c <= 'z')
            c = static_cast<char>(c - 'a' + 'A');
    return text;
}

std::string indented(const std::vector<std::string>& lines) {
    std::string text;
    for (const std::string& line : lines)
        text += "    " + line + "\n";
    return text;
}

std::string comment_block(const std::vector<std::string>& lines) {
    std::string text = "/*\n";
    for (const std::string& line : lines)
        text += line.empty() ? " *\n" : " * " + plain_comment(line) + "\n";
    return text + " */\n";
}

std::string header_text(const HandoverInput& input, const StepText& step, const Types& types) {
    const std::string& name = input.name;
    const DifferenceEquation& equation = *input.assessment->equation;
    const NumberFormat& format = equation.realisation.number_format;
    const bool fixed = format.type == NumberFormat::Type::fixed;
    std::string text = comment_block(evidence_lines(input));
    text += "#ifndef CORNERWRIGHT_" + upper(name) + "_H\n#define CORNERWRIGHT_" + upper(name) +
            "_H\n\n";
    if (fixed)
        text += "#include <stdint.h>\n\n";
    text += "#ifdef __cplusplus\nextern \"C\" {\n#endif\n\n";
    text += "/* One call of " + name + "_step every " + number_text(equation.sample_period_s) +
            " s. */\n";
    if (fixed)
        text += "/* Error and output are integers in steps of 2^-" +
                std::to_string(format.fraction_bits) + ". */\n#define " + upper(name) +
                "_FRACTION_BITS " + std::to_string(format.fraction_bits) + "\n";
    text += "\ntypedef struct {\n";
    for (const std::string& state : step.states)
        text += "    " + types.signal + " " + state + ";\n";
    if (step.states.empty())
        text += "    char nothing_to_remember;\n";
    text += "} " + name + "_state;\n\n";
    text += "/* Everything at rest. */\nvoid " + name + "_init(" + name + "_state *state);\n\n";
    text += "/* " + plain_comment(limit_words(equation).back()) + " */\nvoid " + name + "_reset(" +
            name + "_state *state, " + types.signal + " output);\n\n";
    text += "/* The error r - y of this sample in, the controller output out. */\n" + types.signal +
            " " + name + "_step(" + name + "_state *state, " + types.signal + " error);\n\n";
    return text + "#ifdef __cplusplus\n}\n#endif\n\n#endif\n";
}

/// Shift and saturation, where the statements use them.
std::string helper_text(const std::string& name, const NumberFormat& format, const Types& types) {
    if (format.type != NumberFormat::Type::fixed)
        return "";
    const std::string top = std::to_string((std::int64_t{1} << (format.word_bits - 1)) - 1);
    return "/* sum / 2^bits to the nearest integer, ties away from zero */\nstatic " + types.sum +
           " " + name + "_shifted(" + types.sum + " sum, int bits)\n{\n    const " + types.sum +
           " half = bits > 0 ? (" + types.sum +
           ")1 << (bits - 1) : 0;\n\n    return sum >= 0 ? (sum + half) >> bits : -((half - sum) "
           ">> bits);\n}\n\n/* cut to the word */\nstatic " +
           types.sum + " " + name + "_saturated(" + types.sum + " value)\n{\n    const " +
           types.sum + " top = " + top +
           ";\n\n    return value > top ? top : (value < -top - 1 ? -top - 1 : value);\n}\n\n";
}

/// Contraction of a*b + c would change the last bit.
std::string contraction_text(const NumberFormat& format) {
    if (format.type == NumberFormat::Type::fixed)
        return "";
    return "/* Outputs agree with the test vectors bit for bit where the compiler rounds every\n"
           " * product: no fused multiply-add (-ffp-contract=off), no excess precision, no\n"
           " * fast-math. */\n#if defined(__clang__)\n#pragma STDC FP_CONTRACT OFF\n#endif\n\n";
}

enum class Constants { all, of_reset };

/// Constants stand inside the functions, so that nothing but the interface has a name outside.
std::string constant_text(const std::vector<TextConstant>& constants, const Types& types,
                          Constants which) {
    std::string text;
    for (const TextConstant& constant : constants)
        if (which == Constants::all || constant.of_limits)
            text += "    static const " + types.sum + " " + constant.name + " = " + constant.value +
                    ";\n";
    return text;
}

std::string source_text(const HandoverInput& input, const StepText& step, const Types& types) {
    const std::string& name = input.name;
    const NumberFormat& format = input.assessment->equation->realisation.number_format;
    const bool fixed = format.type == NumberFormat::Type::fixed;
    std::string text = "/* " + plain_comment(verdict_sentence(*input.assessment)) +
                       "\n * The evidence stands in " + name + ".h. */\n#include \"" + name +
                       ".h\"\n\n" + contraction_text(format);
    text += helper_text(name, format, types);

    const std::string zero = fixed ? "0" : C99(format, name).real(0.0);
    text += "void " + name + "_init(" + name + "_state *state)\n{\n";
    for (const std::string& state : step.states)
        text += "    state->" + state + " = " + zero + ";\n";
    if (step.states.empty())
        text += "    state->nothing_to_remember = 0;\n";
    text +=
        "}\n\nvoid " + name + "_reset(" + name + "_state *state, " + types.signal + " output)\n{\n";
    if (!step.reset.empty())
        text += constant_text(step.constants, types, Constants::of_reset) + "    " + types.sum +
                " y = output;\n\n";
    text += "    " + name + "_init(state);\n";
    text += step.reset.empty() ? "    (void)output;\n" : indented(step.reset);

    text += "}\n\n" + types.signal + " " + name + "_step(" + name + "_state *state, " +
            types.signal + " error)\n{\n" + constant_text(step.constants, types, Constants::all) +
            "    " + types.sum + " x = error;\n    " + types.sum + " y;\n";
    for (const std::string& local : step.locals)
        text += "    " + types.sum + " " + local + ";\n";
    text += "\n";
    if (step.states.empty())
        text += "    (void)state;\n";
    return text + indented(step.step) + "    return " + (fixed ? "(" + types.signal + ")" : "") +
           "y;\n}\n";
}

std::string vector_text(const std::string& what, const std::vector<TestSample>& samples,
                        const Types& types, const NumberFormat& format) {
    const C99 c(format, "");
    const auto literal = [&](double value) {
        return format.type == NumberFormat::Type::fixed ? word_literal(value, format)
                                                        : c.real(value);
    };
    std::string text = "static const " + types.signal + " " + what + "[" +
                       std::to_string(samples.size()) + "][2] = {\n";
    for (const TestSample& sample : samples)
        text += "    {" + literal(sample.error) + ", " + literal(sample.output) + "},\n";
    return text + "};\n\n";
}

std::string selfcheck_text(const HandoverInput& input, const Types& types) {
    const std::string& name = input.name;
    const DifferenceEquation& equation = *input.assessment->equation;
    const NumberFormat& format = equation.realisation.number_format;
    const TestVectors vectors = test_vectors(equation);
    const std::string restart = format.type == NumberFormat::Type::fixed
                                    ? word_literal(vectors.restart_output, format)
                                    : C99(format, name).real(vectors.restart_output);
    std::string text =
        "/* " + plain_comment(verdict_sentence(*input.assessment)) + "\n * Runs " + name +
        "_step over its test vectors; exit status 0 when every output is equal,\n * else 1. */\n"
        "#include \"" +
        name + ".h\"\n\n#include <stdio.h>\n\n/* {error, expected output} a sample */\n";
    text += vector_text("from_rest", vectors.from_rest, types, format);
    text += vector_text("restarted", vectors.restarted, types, format);
    text += "static int check(const char *what, " + name + "_state *state, const " + types.signal +
            " (*samples)[2], int count)\n{\n    int wrong = 0;\n    int i;\n\n"
            "    for (i = 0; i < count; ++i) {\n        const " +
            types.signal + " output = " + name +
            "_step(state, samples[i][0]);\n\n        if (output != samples[i][1]) {\n"
            "            printf(\"%s, sample %d: expected %.17g, got %.17g\\n\", what, i,\n"
            "                   (double)samples[i][1], (double)output);\n            ++wrong;\n"
            "        }\n    }\n    return wrong;\n}\n\n";
    text += "int main(void)\n{\n    " + name + "_state state;\n    int wrong;\n\n    " + name +
            "_init(&state);\n    wrong = check(\"from rest\", &state, from_rest, (int)(sizeof "
            "from_rest / sizeof from_rest[0]));\n    " +
            name + "_reset(&state, " + restart +
            ");\n    wrong += check(\"restarted\", &state, restarted, (int)(sizeof restarted / "
            "sizeof restarted[0]));\n    return wrong == 0 ? 0 : 1;\n}\n";
    return text;
}

} // namespace

std::vector<HandoverFile> c99_files(const HandoverInput& input) {
    const DifferenceEquation& equation = *input.assessment->equation;
    const NumberFormat& format = equation.realisation.number_format;
    const Types types = types_of(format);
    const StepText step = step_text(equation, C99(format, input.name));
    return {{input.name + ".h", header_text(input, step, types)},
            {input.name + ".c", source_text(input, step, types)},
            {input.name + "_selfcheck.c", selfcheck_text(input, types)}};
}

} // namespace cornerwright
