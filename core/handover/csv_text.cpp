#include "core/handover/evidence.h"
#include "core/handover/handover_texts.h"
#include "core/handover/number_literals.h"
#include "core/handover/test_vectors.h"
#include "core/realisation/run_plan.h"

namespace cornerwright {
namespace {

/// A field as RFC 4180 has it: in quotes where it holds a comma, a quote or a line break.
std::string field(const std::string& text) {
    if (text.find_first_of(",\"\r\n") == std::string::npos)
        return text;
    std::string quoted = "\"";
    for (const char c : text)
        quoted += c == '"' ? std::string("\"\"") : std::string(1, c);
    return quoted + "\"";
}

/// kind, place (section or sample, counted from 1), name, value, integer that the word holds.
std::string row(const std::string& kind, std::size_t place, const std::string& name,
                const std::string& value, const std::string& integer = "") {
    return kind + "," + (place > 0 ? std::to_string(place) : "") + "," + name + "," + field(value) +
           "," + integer + "\n";
}

std::string coefficient_rows(const DifferenceEquation& equation) {
    const Realisation& realisation = equation.realisation;
    const bool fixed = realisation.number_format.type == NumberFormat::Type::fixed;
    const bool delta = realisation.structure == Structure::delta;
    std::string text;
    for (std::size_t i = 0; i < equation.sections.size(); ++i) {
        const DiscreteSection& section = equation.sections[i];
        const auto rows = [&](const std::string& letter, const std::array<double, 3>& values,
                              const std::array<std::int64_t, 3>& integers) {
            for (std::size_t k = 0; k < 3; ++k)
                text += row("coefficient", i + 1, letter + std::to_string(k),
                            real_literal(values[k], realisation.number_format.type),
                            fixed ? std::to_string(integers[k]) : "");
        };
        rows(delta ? "beta" : "b", running_numerator(section, realisation.structure),
             section.b_integers);
        rows(delta ? "alpha" : "a", running_denominator(section, realisation.structure),
             section.a_integers);
        if (fixed)
            text += row("coefficient", i + 1, "shift", std::to_string(section.shift));
        if (fixed && delta)
            text += row("coefficient", i + 1, "delta_shift", std::to_string(section.delta_shift));
    }
    return text;
}

std::string sample_rows(const std::string& kind, const std::vector<TestSample>& samples,
                        const NumberFormat& format) {
    const auto integer = [&format](double value) {
        return format.type == NumberFormat::Type::fixed ? word_literal(value, format) : "";
    };
    std::string text;
    for (std::size_t i = 0; i < samples.size(); ++i) {
        text += row(kind, i + 1, "error", real_literal(samples[i].error, format.type),
                    integer(samples[i].error));
        text += row(kind, i + 1, "output", real_literal(samples[i].output, format.type),
                    integer(samples[i].output));
    }
    return text;
}

} // namespace

std::string csv_text(const HandoverInput& input) {
    const DifferenceEquation& equation = *input.assessment->equation;
    const NumberFormat& format = equation.realisation.number_format;
    std::string text = "kind,place,name,value,integer\n";
    text += row("verdict", 0, "state", std::string(name_of(input.assessment->verdict.state)));
    for (const std::string& line : evidence_lines(input))
        if (!line.empty())
            text += row("evidence", 0, "", line);
    text += row("realisation", 0, "sample_period_s",
                real_literal(equation.sample_period_s, NumberFormat::Type::float64));
    text += coefficient_rows(equation);
    const TestVectors vectors = test_vectors(equation);
    text += sample_rows("from_rest", vectors.from_rest, format);
    text +=
        row("restarted", 0, "reset_to", real_literal(vectors.restart_output, format.type),
            format.type == NumberFormat::Type::fixed ? word_literal(vectors.restart_output, format)
                                                     : "");
    text += sample_rows("restarted", vectors.restarted, format);
    return text;
}

} // namespace cornerwright
