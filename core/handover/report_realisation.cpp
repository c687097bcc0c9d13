#include "core/handover/report_realisation.h"

#include "core/handover/evidence.h"
#include "core/handover/markup.h"
#include "core/handover/realisation_study.h"
#include "core/handover/report_tables.h"
#include "core/numerics/error.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <numbers>

namespace cornerwright {
namespace {

constexpr int readable_digits = 12; // 0.0005 rather than 5e-04, and nothing rounded away

std::string sampling_words(const Sampling& sampling) {
    const double rate = 1.0 / sampling.sample_period_s;
    return "Sample period " + number_text(sampling.sample_period_s, readable_digits) + " s (" +
           number_text(rate, 6) + " Hz), computation delay " +
           number_text(sampling.computation_delay_s, readable_digits) + " s. " +
           (sampling.design_includes_hold
                ? "The design loop counts the hold and the computation delay; in its time "
                  "responses the hold is a delay of half a period."
                : "The design loop leaves hold and computation delay out.");
}

std::string equation_words(const DifferenceEquation& equation) {
    const Realisation& realisation = equation.realisation;
    std::string words = "Method <code>" + std::string(name_of(realisation.method)) + "</code>";
    if (realisation.method == Method::tustin_at)
        words += " exact at " + number_text(realisation.match_rad_s, 6) + " rad/s (" +
                 number_text(realisation.match_rad_s / (2.0 * std::numbers::pi), 6) + " Hz)";
    words += ", structure <code>" + std::string(name_of(realisation.structure)) +
             "</code>, numbers <code>" + std::string(name_of(realisation.number_format.type)) +
             "</code>";
    if (realisation.number_format.type == NumberFormat::Type::fixed)
        words += " of " + std::to_string(realisation.number_format.word_bits) + " bits with " +
                 std::to_string(realisation.number_format.fraction_bits) + " fraction bits";
    if (realisation.output_limits)
        words += ". Output limited to " + number_text(realisation.output_limits->at_least) +
                 " ... " + number_text(realisation.output_limits->at_most) +
                 " with conditional integration";
    return words + ".";
}

std::string form_words(const DifferenceEquation& equation) {
    return equation.realisation.structure == Structure::delta
               ? "Each section runs (beta0 d&sup2; + beta1 d + beta2)/(d&sup2; + alpha1 d + "
                 "alpha2) with d = z - 1; the output of one is the input of the next."
               : "Each section runs y = b0 x + b1 x&prime; + b2 x&Prime; - a1 y&prime; - a2 "
                 "y&Prime; (primes: one and two samples ago; a1 and a2 are subtracted); the "
                 "output of one is the input of the next. Values after rounding.";
}

std::string bound_table(const DifferenceEquation& equation) {
    std::vector<std::vector<std::string>> rows;
    for (const SignalBound& bound : signal_bounds(equation))
        rows.push_back({escaped(bound.signal), figure_words(bound.l1),
                        figure_words(bound.l_infinity), figure_words(bound.headroom_bits, 3)});
    if (rows.empty())
        return {};
    return html_paragraph("Largest size of every stored signal for an input of full scale (size "
                          "1.0): over all inputs (L1) and over all sine inputs (L-infinity). "
                          "Headroom: bits of the word that the L1 bound leaves free; a signal that "
                          "needs more saturates.") +
           html_table({"Signal", "L1 bound", "L-infinity bound", "Headroom, bits"}, rows);
}

std::string list_of(const std::vector<std::string>& lines) {
    std::string list = "<ul>\n";
    for (const std::string& line : lines)
        list += "<li>" + escaped(line) + "</li>\n";
    return list + "</ul>\n";
}

std::string settling_words(const LimitedStep& step) {
    if (step.settling_time_s == Figure::infinite())
        return "not within " + number_text(step.t_s.back(), 4) + " s";
    const std::string words = figure_words(step.settling_time_s);
    return step.settling_time_s.is_value() ? words + " s" : words;
}

std::string limited_step_table(const Project& project, const Assessment& assessment) {
    std::vector<std::vector<std::string>> rows;
    for (std::size_t i = 0; i < assessment.cases.size(); ++i) {
        if (!assessment.cases[i].realised)
            continue;
        LimitedStep step;
        try {
            step = limited_step(project, assessment, i);
        } catch (const InputError& unusable) {
            step.note = unusable.what();
        }
        const bool known = !step.t_s.empty();
        rows.push_back({escaped(assessment.cases[i].name),
                        known ? figure_words(step.overshoot_percent) + " %" : "not determined",
                        known ? settling_words(step) : "not determined",
                        known ? number_text(step.time_at_limit_s, 4) + " s" : "",
                        escaped(step.note)});
    }
    return html_paragraph(
               "Unit step on the reference with the output limits in force, the bit-true "
               "difference equation before the exactly sampled plant, at the sampling "
               "instants. Requirements are judged without the limits.") +
           html_table({"Case", "Overshoot", "Settling, 2 %", "Time at a limit", "Note"}, rows);
}

std::string equation_markup(const Project& project, const Assessment& assessment) {
    const DifferenceEquation& equation = *assessment.equation;
    std::string markup = html_paragraph(equation_words(equation)) +
                         html_paragraph(form_words(equation)) + coefficient_table(equation);
    for (const std::string& note : equation.notes)
        markup += html_paragraph(escaped(note));
    markup += html_heading(2, "What the number format costs") + bound_table(equation) +
              list_of(format_cost_lines(project, equation));
    if (equation.realisation.output_limits)
        markup +=
            html_heading(2, "Step with output limits") + limited_step_table(project, assessment);
    return markup;
}

} // namespace

std::string realisation_markup(const Project& project, const Assessment& assessment) {
    if (!project.sampling && !project.realisation)
        return {};
    std::string markup = html_heading(2, "Sampling and coefficients");
    if (project.sampling)
        markup += html_paragraph(sampling_words(*project.sampling));
    if (!assessment.realisation_problem.empty())
        markup += html_paragraph("There is no difference equation: " +
                                 escaped(assessment.realisation_problem));
    if (assessment.equation)
        markup += equation_markup(project, assessment);
    return markup;
}

} // namespace cornerwright
