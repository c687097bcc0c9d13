#include "core/handover/evidence.h"
#include "core/handover/handover_texts.h"
#include "core/handover/number_literals.h"
#include "core/handover/plain_comment.h"
#include "core/handover/step_text.h"
#include "core/handover/test_vectors.h"
#include "core/numerics/number_text.h"

#include <algorithm>

namespace cornerwright {
namespace {

/// IEC 61131-3 types: of the interface, and of states and sums.
struct Types {
    std::string signal;
    std::string sum;
};

Types types_of(const NumberFormat& format) {
    if (format.type == NumberFormat::Type::float64)
        return {"LREAL", "LREAL"};
    if (format.type == NumberFormat::Type::float32)
        return {"REAL", "REAL"};
    return format.word_bits == 16 ? Types{"INT", "DINT"} : Types{"DINT", "LINT"};
}

class StructuredText final : public Dialect {
  public:
    StructuredText(const NumberFormat& format, std::string name)
        : format_(format), name_(std::move(name)) {}

    std::string comment(const std::string& text) const override { return "(* " + text + " *)"; }
    std::string assign(const std::string& target, const std::string& value) const override {
        return target + " := " + value + ";";
    }
    std::string state(const std::string& name) const override { return name; }
    std::string store(const std::string& name, const std::string& value) const override {
        return assign(name, value);
    }
    std::string real(double value) const override {
        std::string text = real_literal(value, format_.type);
        std::ranges::replace(text, 'e', 'E');
        return text;
    }
    std::string shifted(const std::string& sum, int bits) const override {
        return name_ + "_shifted(" + sum + ", " + std::to_string(std::int64_t{1} << bits) + ")";
    }
    std::string saturated(const std::string& value) const override {
        return name_ + "_saturated(" + value + ")";
    }
    std::string word(const std::string& sum, int bits) const override {
        return saturated(shifted(sum, bits));
    }
    std::string both(const std::string& left, const std::string& right) const override {
        return "((" + left + ") AND (" + right + "))";
    }
    std::string either(const std::string& left, const std::string& right) const override {
        return left + " OR " + right;
    }
    std::string negated(const std::string& condition) const override {
        return "NOT (" + condition + ")";
    }
    std::string open_if(const std::string& condition) const override {
        return "IF " + condition + " THEN";
    }
    std::string open_else() const override { return "ELSE"; }
    std::string close_if() const override { return "END_IF;"; }

  private:
    NumberFormat format_;
    std::string name_;
};

std::string indented(const std::vector<std::string>& lines) {
    std::string text;
    for (const std::string& line : lines)
        text += "    " + line + "\n";
    return text;
}

std::string comment_block(const std::vector<std::string>& lines) {
    std::string text = "(*\n";
    for (const std::string& line : lines)
        text += line.empty() ? "\n" : "  " + plain_comment(line) + "\n";
    return text + "*)\n\n";
}

/// Shift and saturation as functions of their own. Division of integers cuts towards zero, so that
/// adding half of the divisor away from zero rounds to nearest, ties away from zero.
std::string helper_text(const std::string& name, const NumberFormat& format, const Types& types) {
    if (format.type != NumberFormat::Type::fixed)
        return "";
    const std::int64_t top = (std::int64_t{1} << (format.word_bits - 1)) - 1;
    const std::string high = std::to_string(top);
    const std::string low = std::to_string(-top - 1);
    const std::string shifted = name + "_shifted";
    const std::string saturated = name + "_saturated";
    return "(* sum / divisor to the nearest integer, ties away from zero *)\nFUNCTION " + shifted +
           " : " + types.sum + "\nVAR_INPUT\n    sum : " + types.sum +
           ";\n    divisor : " + types.sum + ";\nEND_VAR\n    IF sum >= 0 THEN\n        " +
           shifted + " := (sum + divisor / 2) / divisor;\n    ELSE\n        " + shifted +
           " := (sum - divisor / 2) / divisor;\n    END_IF;\nEND_FUNCTION\n\n"
           "(* cut to the word *)\nFUNCTION " +
           saturated + " : " + types.sum + "\nVAR_INPUT\n    wanted : " + types.sum +
           ";\nEND_VAR\n    " + saturated + " := wanted;\n    IF wanted > " + high +
           " THEN\n        " + saturated + " := " + high + ";\n    END_IF;\n    IF wanted < " +
           low + " THEN\n        " + saturated + " := " + low + ";\n    END_IF;\nEND_FUNCTION\n\n";
}

std::string declarations(const StepText& step, const Types& types, const std::string& zero) {
    std::string text = "VAR_INPUT\n    error : " + types.signal +
                       "; (* r - y of this sample *)\n    restart : BOOL; (* bumpless start before "
                       "this sample *)\n    restart_output : " +
                       types.signal + ";\nEND_VAR\nVAR_OUTPUT\n    output : " + types.signal +
                       ";\nEND_VAR\n";
    if (!step.states.empty()) {
        text += "VAR\n";
        for (const std::string& state : step.states)
            text += "    " + state + " : " + types.sum + " := " + zero + ";\n";
        text += "END_VAR\n";
    }
    text += "VAR_TEMP\n    x : " + types.sum + ";\n    y : " + types.sum + ";\n";
    for (const std::string& local : step.locals)
        text += "    " + local + " : " + types.sum + ";\n";
    text += "END_VAR\n";
    if (step.constants.empty())
        return text;
    text += "VAR CONSTANT\n";
    for (const TextConstant& constant : step.constants)
        text += "    " + constant.name + " : " + types.sum + " := " + constant.value + ";\n";
    return text + "END_VAR\n";
}

std::string block_text(const HandoverInput& input) {
    const std::string& name = input.name;
    const DifferenceEquation& equation = *input.assessment->equation;
    const NumberFormat& format = equation.realisation.number_format;
    const bool fixed = format.type == NumberFormat::Type::fixed;
    const Types types = types_of(format);
    const StructuredText dialect(format, name);
    const StepText step = step_text(equation, dialect);
    const std::string zero = fixed ? "0" : "0.0";
    const auto widened = [&](const std::string& signal) {
        return fixed ? types.signal + "_TO_" + types.sum + "(" + signal + ")" : signal;
    };
    std::string text = comment_block(evidence_lines(input));
    if (!fixed)
        text += "(* Outputs agree with the test vectors bit for bit where every product is rounded "
                "to\n   " +
                types.sum + ": no fused multiply-add, no excess precision. *)\n\n";
    text += helper_text(name, format, types);
    text += "(* Call once every " + number_text(equation.sample_period_s) + " s. *)\n";
    text += "FUNCTION_BLOCK " + name + "\n" + declarations(step, types, zero) + "\n";
    text += "    IF restart THEN\n";
    std::vector<std::string> reset;
    for (const std::string& state : step.states)
        reset.push_back(dialect.assign(state, zero));
    if (!step.reset.empty())
        reset.push_back(dialect.assign("y", widened("restart_output")));
    reset.insert(reset.end(), step.reset.begin(), step.reset.end());
    if (reset.empty())
        reset.emplace_back("; (* nothing to remember *)");
    for (const std::string& line : reset)
        text += "        " + line + "\n";
    text += "    END_IF;\n    x := " + widened("error") + ";\n" + indented(step.step);
    text += "    output := " + (fixed ? types.sum + "_TO_" + types.signal + "(y)" : "y") + ";\n";
    return text + "END_FUNCTION_BLOCK\n";
}

/// One row a call: restart, restart_output, error, output.
std::string vector_text(const HandoverInput& input) {
    const DifferenceEquation& equation = *input.assessment->equation;
    const NumberFormat& format = equation.realisation.number_format;
    const TestVectors vectors = test_vectors(equation);
    const std::string nothing = signal_literal(0.0, format);
    std::string text = "restart,restart_output,error,output\n";
    const auto append = [&](const TestSample& sample, bool restart) {
        text += (restart ? "1," + signal_literal(vectors.restart_output, format) : "0," + nothing) +
                "," + signal_literal(sample.error, format) + "," +
                signal_literal(sample.output, format) + "\n";
    };
    for (const TestSample& sample : vectors.from_rest)
        append(sample, false);
    for (std::size_t i = 0; i < vectors.restarted.size(); ++i)
        append(vectors.restarted[i], i == 0);
    return text;
}

} // namespace

std::vector<HandoverFile> structured_text_files(const HandoverInput& input) {
    return {{input.name + ".st", block_text(input)},
            {input.name + "_vectors.csv", vector_text(input)}};
}

} // namespace cornerwright
