#include "core/handover/evidence.h"

#include "core/handover/cautions.h"
#include "core/handover/realisation_study.h"
#include "core/handover/report_tables.h"
#include "core/handover/transfer_function_words.h"
#include "core/numerics/number_text.h"
#include "core/realisation/precision.h"
#include "core/realisation/run_plan.h"

#include <numbers>

namespace cornerwright {
namespace {

using Lines = std::vector<std::string>;

constexpr int readable_digits = 15; // 0.0005 rather than 5e-04, and nothing rounded away

void append(Lines& lines, Lines more) {
    if (!lines.empty() && !more.empty())
        lines.emplace_back();
    lines.insert(lines.end(), more.begin(), more.end());
}

std::string with_unit(const Figure& figure, MeasureUnit unit) {
    const std::string words = figure_words(figure, 5);
    const std::string symbol(symbol_of(unit));
    return figure.is_value() && !symbol.empty() ? words + " " + symbol : words;
}

Lines requirement_lines(const Assessment& assessment) {
    Lines lines{"Requirements, the worst of every case and loop:"};
    for (const RequirementResult& result : assessment.verdict.requirements) {
        const Judgement& worst = result.worst;
        std::string line = "  " + std::string(name_of(worst.state)) + ": ";
        line += measure_words(result.requirement) + " " + result.limit + "; ";
        line += with_unit(worst.value, unit_of(result.requirement.measure));
        line += " (" + worst.case_name + ", " + std::string(name_of(worst.loop)) + " loop)";
        if (!worst.reason.empty())
            line += "; " + worst.reason;
        lines.push_back(line);
    }
    if (lines.size() == 1)
        lines.emplace_back("  none are stated in the project");
    return lines;
}

Lines rate_lines(const HandoverInput& input, const DifferenceEquation& equation) {
    const double period = equation.sample_period_s;
    const Realisation& realisation = equation.realisation;
    Lines lines{"Sample period " + number_text(period, readable_digits) + " s (" +
                number_text(1.0 / period, 8) + " Hz, " +
                number_text(2.0 * std::numbers::pi / period, 8) + " rad/s)"};
    if (input.project->sampling)
        lines.push_back("Computation delay " +
                        number_text(input.project->sampling->computation_delay_s) + " s");
    std::string method = "Method " + std::string(name_of(realisation.method));
    if (realisation.method == Method::tustin_at)
        method += ", exact at " + number_text(realisation.match_rad_s) + " rad/s";
    lines.push_back(method);
    lines.push_back("Structure " + std::string(name_of(realisation.structure)));
    std::string format = "Number format " + std::string(name_of(realisation.number_format.type));
    if (realisation.number_format.type == NumberFormat::Type::fixed)
        format += ", words of " + std::to_string(realisation.number_format.word_bits) +
                  " bits with " + std::to_string(realisation.number_format.fraction_bits) +
                  " fraction bits";
    lines.push_back(format);
    return lines;
}

Lines bound_lines(const DifferenceEquation& equation) {
    Lines lines;
    for (const SignalBound& bound : signal_bounds(equation))
        lines.push_back("  " + bound.signal + ": L1 bound " + figure_words(bound.l1) +
                        ", L-infinity bound " + figure_words(bound.l_infinity) + ", headroom " +
                        figure_words(bound.headroom_bits, 3) + " bits");
    if (!lines.empty())
        lines.insert(lines.begin(), "Largest signals for an input of full scale (size 1.0):");
    return lines;
}

Lines noise_lines(const DifferenceEquation& equation) {
    Lines lines;
    const RoundingNoise noise = rounding_noise(equation);
    lines.push_back("Rounding noise at the output: " + number_text(noise.simulated_rms, 3) +
                    " rms over " + std::to_string(noise.samples) +
                    " samples of white input of size " + number_text(noise.input_size, 3));
    if (noise.theory_rms.is_determined())
        lines.push_back(
            "  by theory " + figure_words(noise.theory_rms, 3) + " rms" +
            (noise.theory_rms.note().empty() ? "" : " (" + noise.theory_rms.note() + ")"));
    const ZeroInputCycle cycle = zero_input_cycle(equation);
    if (!cycle.amplitude.is_value())
        lines.push_back("Zero-input limit cycle: not determined, " + cycle.amplitude.reason());
    else if (cycle.period == 0)
        lines.emplace_back("Zero-input limit cycle: none found");
    else
        lines.push_back("Zero-input limit cycle: found, amplitude " +
                        number_text(cycle.amplitude.value(), 4) + ", period " +
                        std::to_string(cycle.period) + " samples");
    const Figure smallest = smallest_integrated_error(equation);
    if (smallest.is_determined())
        lines.push_back("Smallest constant error that the integrator still integrates: " +
                        figure_words(smallest, 4));
    return lines;
}

Lines hash_lines(const HandoverInput& input) {
    Lines lines{"Project file SHA-256: " +
                (input.project_sha256.empty() ? std::string("not saved") : input.project_sha256)};
    for (const PlantCase& plant_case : input.project->plant_cases) {
        const auto* measured = std::get_if<MeasurementSource>(&plant_case.source);
        if (measured)
            lines.push_back("Measurement of " + plant_case.name + ": " + measured->file +
                            ", SHA-256 " +
                            (measured->sha256.empty() ? "not pinned" : measured->sha256));
    }
    return lines;
}

} // namespace

std::vector<std::string> format_cost_lines(const Project& project,
                                           const DifferenceEquation& equation) {
    Lines lines = noise_lines(equation);
    const Realisation& realisation = equation.realisation;
    if (project.sampling) {
        const Lines poles =
            pole_error_words(pole_errors(project.compensator, *project.sampling, realisation));
        lines.insert(lines.end(), poles.begin(), poles.end());
    }
    if (realisation.number_format.type == NumberFormat::Type::fixed) {
        const auto to_the_end = [] { return true; };
        lines.push_back(fraction_bits_words(
            smallest_fraction_bits(project, realisation.number_format.word_bits, to_the_end)));
    }
    return lines;
}

std::string verdict_sentence(const Assessment& assessment) {
    if (assessment.verdict.requirements.empty())
        return "WARNING: the project states no requirement; nothing was judged.";
    switch (assessment.verdict.state) {
    case State::met:
        return "Every requirement is met on every case and loop.";
    case State::unmet:
        return "WARNING: requirements are UNMET; this compensator is not what was asked for.";
    case State::undetermined:
        break;
    }
    return "WARNING: not every requirement could be determined.";
}

std::string caution_text() {
    std::string text;
    for (const std::string& sentence : cautions())
        text += (text.empty() ? "" : " ") + sentence;
    return text;
}

std::vector<std::string> limit_words(const DifferenceEquation& equation) {
    const RunPlan plan = run_plan(equation);
    Lines lines;
    if (equation.realisation.output_limits)
        lines.push_back("Output limited to " + number_text(plan.limits->at_least) + " ... " +
                        number_text(plan.limits->at_most) +
                        "; where the output has reached a limit and the error drives it further, "
                        "the integrating sections keep their state (conditional integration).");
    else if (plan.limits)
        lines.emplace_back("Where the output has reached the end of the word and the error drives "
                           "it further, the integrating sections keep their state.");
    else
        lines.emplace_back("No output limits are set: the code does not know of the actuator's.");
    lines.push_back(plan.restart_section
                        ? "Bumpless start: reset puts the last integrator at a given output and "
                          "everything else at rest."
                        : "No integrator to start from: reset puts everything at rest whatever "
                          "output is given.");
    return lines;
}

std::vector<std::string> difference_equation_words(const DifferenceEquation& equation) {
    Lines lines{"Sections run one after the other; the input of the first is the error r - y, the "
                "output of each is the input x of the next, the output y of the last is the "
                "controller output."};
    if (equation.realisation.structure == Structure::delta) {
        lines.emplace_back("Each section, with d = z - 1 (signs: alpha enters with a minus):");
        lines.emplace_back("  y[n] = beta0 x[n] + w1[n]");
        lines.emplace_back("  w1[n+1] = w1[n] + beta1 x[n] - alpha1 y[n] + w2[n]");
        lines.emplace_back("  w2[n+1] = w2[n] + beta2 x[n] - alpha2 y[n]");
        lines.emplace_back("  which is (beta0 d^2 + beta1 d + beta2)/(d^2 + alpha1 d + alpha2)");
    } else {
        lines.emplace_back("Each section (signs: a1 and a2 enter with a minus):");
        lines.emplace_back("  y[n] = b0 x[n] + b1 x[n-1] + b2 x[n-2] - a1 y[n-1] - a2 y[n-2]");
        lines.emplace_back("  which is (b0 + b1 z^-1 + b2 z^-2)/(1 + a1 z^-1 + a2 z^-2)");
    }
    if (equation.realisation.structure == Structure::direct_form_2_transposed)
        lines.emplace_back("  run as y = b0 x + w1, w1' = b1 x - a1 y + w2, w2' = b2 x - a2 y");
    if (equation.realisation.number_format.type == NumberFormat::Type::fixed) {
        const std::string bits = std::to_string(equation.realisation.number_format.fraction_bits);
        lines.push_back("  Error, output and states are words in steps of 2^-" + bits +
                        ". Coefficients are integers over 2^(" + bits +
                        " - shift of the section). Products are added up at twice the width, "
                        "shifted back to the nearest word (ties away from zero) and saturated.");
    }
    return lines;
}

std::vector<std::string> evidence_lines(const HandoverInput& input) {
    const Assessment& assessment = *input.assessment;
    const DifferenceEquation& equation = *assessment.equation;
    Lines lines{input.project->title.empty() ? std::string("Untitled project")
                                             : input.project->title,
                verdict_sentence(assessment)};
    append(lines, transfer_function_words(input.project->compensator));
    append(lines, rate_lines(input, equation));
    append(lines, difference_equation_words(equation));
    lines.insert(lines.end(), equation.notes.begin(), equation.notes.end());
    append(lines, limit_words(equation));
    append(lines, bound_lines(equation));
    append(lines, format_cost_lines(*input.project, equation));
    append(lines, requirement_lines(assessment));
    append(lines, hash_lines(input));
    append(lines, {"Caution:"});
    for (const std::string& sentence : cautions())
        lines.push_back("  " + sentence);
    return lines;
}

} // namespace cornerwright
