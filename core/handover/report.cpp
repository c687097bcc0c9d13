#include "core/handover/report.h"

#include "core/handover/cautions.h"
#include "core/handover/markup.h"
#include "core/handover/report_plots.h"
#include "core/handover/report_realisation.h"
#include "core/handover/report_tables.h"
#include "core/numerics/number_text.h"

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
                               "positive where it is met; for times, frequencies and "
                               "percentages a factor, above 1 where it is met.") +
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

std::vector<ReportPart> review_report(const ReportInput& input) {
    std::vector<ReportPart> parts{opening(input), requirements_part(input)};
    append_plots(parts, input);
    parts.push_back(figures_part(input));
    parts.push_back(design_part(input));
    parts.push_back({realisation_markup(*input.project, *input.assessment), ""});
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
