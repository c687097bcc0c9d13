#include "core/handover/report.h"

#include "core/handover/markup.h"
#include "core/handover/report_plots.h"
#include "core/handover/report_tables.h"
#include "core/numerics/number_text.h"

#include <numbers>

namespace cornerwright {
namespace {

ReportPart opening(const ReportInput& input) {
    const Project& project = *input.project;
    const Verdict& verdict = input.assessment->verdict;
    std::string markup = "<h1>" + escaped(project.title.empty() ? "Untitled" : project.title) +
                         "</h1>\n" +
                         html_paragraph("Design review of a feedback loop: what was required, what "
                                        "the loop reaches on every plant case, and the "
                                        "coefficients that will run.");
    markup += "<p class=\"verdict\">" + state_words(verdict.state) + " &middot; " +
              verdict_words(verdict) + "</p>\n";
    if (!project.notes.empty())
        markup += html_paragraph(escaped(project.notes));
    std::string facts = std::to_string(project.plant_cases.size()) + " plant cases, " +
                        std::to_string(project.compensator.size()) + " compensator sections";
    if (!input.project_sha256.empty())
        facts += ". Project file SHA-256 <code>" + escaped(input.project_sha256) + "</code>";
    if (!input.date.empty())
        facts += ". Printed " + escaped(input.date);
    return {markup + html_paragraph(facts + "."), ""};
}

ReportPart requirements_part(const ReportInput& input) {
    return {html_heading(2, "Requirements") +
                html_paragraph("Each requirement is judged on every plant case, on the design loop "
                               "(continuous compensator) and, where the project samples, on the "
                               "realised loop (the difference equation as it will run). The worst "
                               "stands for it. Headroom is the signed distance to the limit, "
                               "positive where it is met.") +
                requirement_table(*input.assessment),
            ""};
}

void append_plots(std::vector<ReportPart>& parts, const ReportInput& input) {
    const Assessment& assessment = *input.assessment;
    if (assessment.cases.empty())
        return;
    const std::size_t shown = worst_case_of(assessment);
    parts.push_back({html_heading(2, "Curves") +
                         html_paragraph("Drawn full: " + escaped(assessment.cases[shown].name) +
                                        ", the case with the least headroom. The margins marked "
                                        "are those of the realised loop where there is one."),
                     magnitude_plot(assessment, shown)});
    parts.push_back({"", phase_plot(assessment, shown)});
    parts.push_back({"", sensitivity_plot(assessment, shown)});
    parts.push_back({"", step_plot(assessment, shown)});
    if (input.locus)
        parts.push_back(
            {input.locus->note.empty() ? "" : html_paragraph(escaped(input.locus->note)),
             locus_plot(*input.locus, assessment.cases[shown].name)});
}

ReportPart figures_part(const ReportInput& input) {
    return {html_heading(2, "Figures of every case") + figure_table(*input.assessment) +
                html_heading(2, "Every requirement on every case and loop") +
                requirement_matrix(*input.assessment),
            ""};
}

ReportPart design_part(const ReportInput& input) {
    return {html_heading(2, "Plant cases") + plant_table(*input.project, *input.assessment) +
                html_heading(2, "Compensator") +
                html_paragraph("The product of these sections, in rad/s and s.") +
                section_table(*input.project),
            ""};
}

std::string sampling_words(const Sampling& sampling) {
    const double rate = 1.0 / sampling.sample_period_s;
    return "Sample period " + number_text(sampling.sample_period_s) + " s (" +
           number_text(rate, 6) + " Hz), computation delay " +
           number_text(sampling.computation_delay_s) + " s. " +
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

ReportPart realisation_part(const ReportInput& input) {
    const Project& project = *input.project;
    if (!project.sampling && !project.realisation)
        return {};
    std::string markup = html_heading(2, "Sampling and coefficients");
    if (project.sampling)
        markup += html_paragraph(sampling_words(*project.sampling));
    if (!input.assessment->realisation_problem.empty())
        markup += html_paragraph("There is no difference equation: " +
                                 escaped(input.assessment->realisation_problem));
    if (const auto& equation = input.assessment->equation) {
        markup += html_paragraph(equation_words(*equation));
        markup += html_paragraph(
            equation->realisation.structure == Structure::delta
                ? "Each section runs (beta0 d&sup2; + beta1 d + beta2)/(d&sup2; + alpha1 d + "
                  "alpha2) with d = z - 1; the output of one is the input of the next."
                : "Each section runs y = b0 x + b1 x&prime; + b2 x&Prime; - a1 y&prime; - a2 "
                  "y&Prime; (primes: one and two samples ago; a1 and a2 are subtracted); the "
                  "output of one is the input of the next. Values after rounding.");
        markup += coefficient_table(*equation);
        for (const std::string& note : equation->notes)
            markup += html_paragraph(escaped(note));
    }
    return {markup, ""};
}

ReportPart notes_part(const ReportInput& input) {
    const std::string table = undetermined_table(*input.assessment);
    return {html_heading(2, "What was not determined, and remarks") +
                (table.empty() ? html_paragraph("Every figure was determined.") : table),
            ""};
}

ReportPart definitions_part() {
    return {
        html_heading(2, "How the figures are defined") +
            html_paragraph(
                "L = C H P is the loop of compensator C, hold and delay H and plant P; S = 1/(1 + "
                "L), T = L/(1 + L). Phase margin: the smallest in size of 180&deg; + arg L over "
                "all frequencies with |L| = 1. Gain margin and gain reduction margin: the smallest "
                "rise and fall of gain that brings L to -1. Delay margin: the smallest added delay "
                "that does. Sensitivity peak: the largest |S|. Bandwidth: the lowest frequency at "
                "which |T| falls through |T(0)|/&radic;2. Overshoot, rise (10 to 90 %) and "
                "settling: of the unit step response. Margins mean nothing on an unstable loop: "
                "there every requirement is unmet.") +
            html_paragraph(
                "Textbook definitions, for instance K. J. &Aring;str&ouml;m, R. M. "
                "Murray, Feedback Systems; sampled plants after K. J. &Aring;str&ouml;m, "
                "B. Wittenmark, Computer-Controlled Systems (citations from memory)."),
        ""};
}

ReportPart cautions_part() {
    std::string list = html_heading(2, "Cautions") + "<ul>\n";
    for (const std::string& sentence : cautions())
        list += "<li>" + escaped(sentence) + "</li>\n";
    return {list + "</ul>\n", ""};
}

} // namespace

std::vector<std::string> cautions() {
    return {"Closing a loop on real equipment can move, heat or energise it without warning.",
            "First close it with limited effort, an independent stop, and nobody in reach.",
            "These figures rest on the plant data given and say nothing of saturation, faults or "
            "what was not measured.",
            "Local codes, the machine's risk assessment and licensed practice decide."};
}

std::vector<ReportPart> review_report(const ReportInput& input) {
    std::vector<ReportPart> parts{opening(input), requirements_part(input)};
    append_plots(parts, input);
    parts.push_back(figures_part(input));
    parts.push_back(design_part(input));
    parts.push_back(realisation_part(input));
    parts.push_back(notes_part(input));
    parts.push_back(definitions_part());
    parts.push_back(cautions_part());
    return parts;
}

std::string report_style() {
    return "body{font-family:Inter,'DejaVu Sans',Helvetica,sans-serif;font-size:14px;"
           "color:#1F2328;background:#FFFFFF;max-width:1000px;margin:32px auto;padding:0 24px}\n"
           "h1{font-size:24px}h2{font-size:17px;margin-top:32px}\n"
           "table{border-collapse:collapse;font-size:12px;width:100%;margin:8px 0}\n"
           "th,td{border-bottom:1px solid #DEDBD3;padding:4px 8px;text-align:left;"
           "vertical-align:top}\nth{color:#6B6F76;font-weight:normal}\n"
           "code{font-family:'DejaVu Sans Mono',monospace;font-size:11px;word-break:break-all}\n"
           ".verdict{font-size:16px}.met{color:#00785A}.unmet{color:#C2410C}.open{color:#6B6F76}\n"
           "svg{max-width:100%;height:auto;display:block;margin:12px 0}\n"
           "@media print{h2{page-break-after:avoid}svg,tr{page-break-inside:avoid}}\n";
}

std::string report_html(const ReportInput& input) {
    std::string html = "<!DOCTYPE html>\n<html lang=\"en\">\n<head>\n<meta charset=\"utf-8\">\n"
                       "<title>" +
                       escaped(input.project->title) + " &ndash; design review</title>\n<style>\n" +
                       report_style() + "</style>\n</head>\n<body>\n";
    for (const ReportPart& part : review_report(input))
        html += part.markup + part.svg;
    return html + "</body>\n</html>\n";
}

} // namespace cornerwright
