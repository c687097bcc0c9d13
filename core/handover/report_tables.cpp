#include "core/handover/report_tables.h"

#include "core/handover/markup.h"
#include "core/numerics/number_text.h"

#include <algorithm>
#include <array>
#include <cctype>
#include <cmath>
#include <numbers>
#include <utility>

namespace cornerwright {
namespace {

using Row = std::vector<std::string>;

std::string spaced(std::string_view name) {
    std::string words(name);
    std::replace(words.begin(), words.end(), '_', ' ');
    if (!words.empty())
        words[0] = static_cast<char>(std::toupper(static_cast<unsigned char>(words[0])));
    return words;
}

std::string with_unit(const Figure& figure, MeasureUnit unit) {
    std::string text = figure_words(figure);
    if (!figure.is_value())
        return text;
    if (figure.standard_deviation() > 0.0)
        text += " &plusmn; " + number_text(figure.standard_deviation(), 2);
    const std::string symbol(symbol_of(unit));
    return symbol.empty() ? text : text + " " + symbol;
}

std::string both_units(double w) {
    return number_text(w, 5) + " rad/s (" + number_text(w / (2.0 * std::numbers::pi), 5) + " Hz)";
}

std::string place_words(const Judgement& judgement) {
    std::string text = escaped(judgement.case_name) + ", " + std::string(name_of(judgement.loop));
    if (judgement.at_rad_s.is_value() && judgement.at_rad_s.value() > 0.0)
        text += ", at " + both_units(judgement.at_rad_s.value());
    return text;
}

std::string root_list(const ComplexVector& roots) {
    if (roots.empty())
        return "none";
    std::string text;
    for (const Complex& root : roots) {
        if (root.imag() < 0.0)
            continue;
        text += (text.empty() ? "" : ", ") + number_text(root.real(), 5);
        if (root.imag() > 0.0)
            text += " &plusmn; j" + number_text(root.imag(), 5);
    }
    return text;
}

std::string model_words(const PlantModel& model) {
    std::string text = "zeros " + root_list(model.roots.zeros) + "; poles " +
                       root_list(model.roots.poles) + "; gain " + number_text(model.roots.gain, 6);
    if (model.dead_time_s > 0.0)
        text += "; dead time " + number_text(model.dead_time_s, 5) + " s";
    return text;
}

std::string coefficient_list(const std::vector<double>& coefficients) {
    std::string text;
    for (const double coefficient : coefficients)
        text += (text.empty() ? "" : ", ") + number_text(coefficient, 6);
    return text;
}

struct SourceWords {
    std::string operator()(const FormulaSource& source) const {
        return "formula: <code>" + escaped(source.text) + "</code>";
    }
    std::string operator()(const RootsSource& source) const {
        return "roots: " + model_words(source.model);
    }
    std::string operator()(const CoefficientsSource& source) const {
        std::string text = "coefficients, highest power first: (" +
                           coefficient_list(source.numerator) + ") / (" +
                           coefficient_list(source.denominator) + ")";
        if (source.dead_time_s > 0.0)
            text += "; dead time " + number_text(source.dead_time_s, 5) + " s";
        return text;
    }
    std::string operator()(const MeasurementSource& source) const {
        std::string text = "measurement <code>" + escaped(source.file) + "</code>";
        if (source.response)
            text += ", " + std::to_string(source.response->w_rad_s.size()) + " points, " +
                    both_units(source.response->w_rad_s.front()) + " to " +
                    both_units(source.response->w_rad_s.back());
        text += "; integrators declared: " + std::to_string(source.integrators) +
                ", unstable poles declared: " + std::to_string(source.unstable_poles);
        text += source.sha256.empty() ? "; not pinned by a hash"
                                      : "; SHA-256 <code>" + escaped(source.sha256) + "</code>";
        if (source.fit)
            text += ".<br>Fitted model for poles and step, misfit " +
                    number_text(source.fit->misfit_db, 3) +
                    " dB: " + model_words(source.fit->model);
        return text;
    }
};

std::string parameter_words(const Section& section) {
    std::string text;
    for (const SectionParameter& parameter : parameters_of(section.kind)) {
        std::string name(parameter.key);
        if (parameter.is_frequency)
            name = name.substr(0, name.find("_rad_s"));
        std::replace(name.begin(), name.end(), '_', ' ');
        const double value = section.*parameter.value;
        text += (text.empty() ? "" : "<br>") + name + " " +
                (parameter.is_frequency ? both_units(value) : number_text(value, 6));
    }
    return text.empty() ? "no parameters" : text;
}

std::string formula_words(SectionKind kind) {
    static constexpr std::array<std::pair<SectionKind, const char*>, 11> formulas{{
        {SectionKind::gain, "k"},
        {SectionKind::integrator, "1/s"},
        {SectionKind::pi, "1 + w/s"},
        {SectionKind::lead, "(s/z + 1)/(s/p + 1)"},
        {SectionKind::lag, "(s/z + 1)/(s/p + 1)"},
        {SectionKind::real_zero, "s/z + 1"},
        {SectionKind::real_pole, "1/(s/p + 1)"},
        {SectionKind::complex_zeros, "s&sup2;/w&sup2; + 2&zeta;s/w + 1"},
        {SectionKind::complex_poles, "1/(s&sup2;/w&sup2; + 2&zeta;s/w + 1)"},
        {SectionKind::notch,
         "(s&sup2; + 2&zeta;z w s + w&sup2;)/(s&sup2; + 2&zeta;p w s + w&sup2;)"},
        {SectionKind::washout, "(s/w)/(s/w + 1)"},
    }};
    const auto found = std::find_if(formulas.begin(), formulas.end(),
                                    [&](const auto& entry) { return entry.first == kind; });
    return found->second;
}

std::string stability_words(const Stability& stability) {
    if (!stability.stable)
        return "not determined";
    return *stability.stable ? "stable" : "not stable";
}

Row figure_row(const std::string& case_name, const char* loop, const LoopFigures& figures) {
    const FrequencyFigures& f = figures.frequency;
    return {escaped(case_name),
            loop,
            stability_words(figures.stability),
            with_unit(f.phase_margin_deg, MeasureUnit::deg),
            with_unit(f.gain_margin_db, MeasureUnit::db),
            with_unit(f.gain_reduction_margin_db, MeasureUnit::db),
            with_unit(f.delay_margin_s, MeasureUnit::s),
            with_unit(f.sensitivity_peak_db, MeasureUnit::db),
            with_unit(f.bandwidth_rad_s, MeasureUnit::rad_s),
            with_unit(figures.time.overshoot_percent, MeasureUnit::percent),
            with_unit(figures.time.settling_time_s, MeasureUnit::s)};
}

void append_reasons(std::vector<Row>& rows, const std::string& case_name, const char* loop,
                    const LoopFigures& figures) {
    const auto add = [&](const char* what, const std::string& why) {
        if (!why.empty())
            rows.push_back({escaped(case_name), loop, what, escaped(why)});
    };
    if (figures.stability.stable != true)
        add("stability", figures.stability.reason);
    const FrequencyFigures& f = figures.frequency;
    const std::array<std::pair<const char*, const Figure*>, 14> named{{
        {"phase margin", &f.phase_margin_deg},
        {"gain margin", &f.gain_margin_db},
        {"gain reduction margin", &f.gain_reduction_margin_db},
        {"delay margin", &f.delay_margin_s},
        {"sensitivity peak", &f.sensitivity_peak_db},
        {"complementary peak", &f.complementary_peak_db},
        {"control effort peak", &f.control_effort_peak_db},
        {"bandwidth", &f.bandwidth_rad_s},
        {"overshoot", &figures.time.overshoot_percent},
        {"rise time", &figures.time.rise_time_s},
        {"settling time", &figures.time.settling_time_s},
        {"control peak", &figures.time.control_peak},
        {"disturbance peak", &figures.time.disturbance_peak},
        {"steady-state error", &figures.steady_state_error.step},
    }};
    for (const auto& [name, figure] : named) {
        if (!figure->is_determined())
            add(name, figure->reason());
        else
            add(name, figure->note());
    }
    add("closed-loop poles", figures.closed_loop_poles_note);
    for (const std::string& remark : figures.remarks)
        add("remark", remark);
}

} // namespace

std::string figure_words(const Figure& figure, int digits) {
    switch (figure.kind()) {
    case Figure::Kind::value:
        return number_text(figure.value(), digits);
    case Figure::Kind::infinite:
        return "infinite";
    case Figure::Kind::minus_infinite:
        return "-infinite";
    case Figure::Kind::undetermined:
        break;
    }
    return "not determined";
}

std::string state_words(State state) {
    switch (state) {
    case State::met:
        return "<span class=\"met\">&#10003; met</span>";
    case State::unmet:
        return "<span class=\"unmet\">&#10007; unmet</span>";
    case State::undetermined:
        break;
    }
    return "<span class=\"open\">? not determined</span>";
}

std::string verdict_words(const Verdict& verdict) {
    std::size_t unmet = 0;
    std::size_t open = 0;
    for (const RequirementResult& result : verdict.requirements) {
        unmet += result.worst.state == State::unmet ? 1U : 0U;
        open += result.worst.state == State::undetermined ? 1U : 0U;
    }
    const std::string of = " of " + std::to_string(verdict.requirements.size()) + " requirements ";
    if (unmet > 0)
        return std::to_string(unmet) + of + "unmet";
    if (open > 0)
        return std::to_string(open) + of + "not determined, none unmet";
    return "all " + std::to_string(verdict.requirements.size()) + " requirements met";
}

std::string measure_words(const Requirement& requirement) {
    std::string words = spaced(name_of(requirement.measure));
    if (requirement.measure == Measure::settling_time)
        words += " (" + number_text(requirement.band_percent) + " % band)";
    if (requirement.measure == Measure::steady_state_error)
        words += " (" + std::string(name_of(requirement.input)) + ")";
    if (requirement.measure == Measure::disturbance_rejection)
        words += " up to " + both_units(requirement.up_to_rad_s);
    if (requirement.measure == Measure::roll_off)
        words += " from " + both_units(requirement.from_rad_s);
    return words;
}

std::string requirement_table(const Assessment& assessment) {
    std::vector<Row> rows;
    for (const RequirementResult& result : assessment.verdict.requirements) {
        const MeasureUnit unit = unit_of(result.requirement.measure);
        // Beside a limit of 0 there is no ratio, only a difference.
        const bool logarithmic = unit != MeasureUnit::db && unit != MeasureUnit::deg &&
                                 result.requirement.at_least.value_or(1.0) != 0.0 &&
                                 result.requirement.at_most.value_or(1.0) != 0.0;
        std::string headroom = figure_words(result.worst.headroom, 3);
        if (result.worst.headroom.is_value() && logarithmic)
            headroom = "a factor of " + number_text(std::exp(result.worst.headroom.value()), 3);
        else if (result.worst.headroom.is_value())
            headroom.append(" ").append(symbol_of(unit));
        rows.push_back(
            {escaped(measure_words(result.requirement)), escaped(result.limit),
             with_unit(result.worst.value, unit), place_words(result.worst), headroom,
             state_words(result.worst.state) +
                 (result.worst.reason.empty() ? "" : "<br>" + escaped(result.worst.reason))});
    }
    return html_table({"Requirement", "Limit", "Worst value", "Where", "Headroom", "State"}, rows);
}

std::string requirement_matrix(const Assessment& assessment) {
    std::vector<Row> rows;
    for (const RequirementResult& result : assessment.verdict.requirements) {
        for (const Judgement& judgement : result.all)
            rows.push_back({escaped(measure_words(result.requirement)), escaped(result.limit),
                            escaped(judgement.case_name), std::string(name_of(judgement.loop)),
                            with_unit(judgement.value, unit_of(result.requirement.measure)),
                            state_words(judgement.state)});
    }
    return html_table({"Requirement", "Limit", "Case", "Loop", "Value", "State"}, rows);
}

std::string figure_table(const Assessment& assessment) {
    std::vector<Row> rows;
    for (const CaseAssessment& plant_case : assessment.cases) {
        rows.push_back(figure_row(plant_case.name, "design", plant_case.design.figures));
        if (plant_case.realised)
            rows.push_back(figure_row(plant_case.name, "realised", plant_case.realised->figures));
    }
    return html_table({"Case", "Loop", "Stability", "Phase margin", "Gain margin",
                       "Gain reduction margin", "Delay margin", "Sensitivity peak", "Bandwidth",
                       "Overshoot", "Settling, 2 %"},
                      rows);
}

std::string plant_table(const Project& project, const Assessment& assessment) {
    std::vector<Row> rows;
    for (std::size_t i = 0; i < project.plant_cases.size(); ++i) {
        std::string words = std::visit(SourceWords{}, project.plant_cases[i].source);
        if (i < assessment.cases.size() && !assessment.cases[i].unusable.empty())
            words += "<br>Not used: " + escaped(assessment.cases[i].unusable);
        rows.push_back({escaped(project.plant_cases[i].name), words});
    }
    return html_table({"Plant case", "Known from"}, rows);
}

std::string section_table(const Project& project) {
    std::vector<Row> rows;
    std::size_t number = 0;
    for (const Section& section : project.compensator) {
        ++number;
        std::string name = section.kind == SectionKind::pi ? "PI" : spaced(name_of(section.kind));
        if (!section.label.empty())
            name += " &ldquo;" + escaped(section.label) + "&rdquo;";
        if (!section.enabled)
            name += " (switched off, not part of the compensator)";
        rows.push_back(
            {std::to_string(number), name, formula_words(section.kind), parameter_words(section)});
    }
    return html_table({"", "Section", "Transfer function", "Values"}, rows);
}

std::string coefficient_table(const DifferenceEquation& equation) {
    const bool delta = equation.realisation.structure == Structure::delta;
    std::vector<Row> rows;
    std::size_t number = 0;
    for (const DiscreteSection& section : equation.sections) {
        ++number;
        Row row{std::to_string(number)};
        for (const double b : delta ? section.beta : section.b)
            row.push_back(number_text(b));
        row.push_back(number_text(delta ? section.alpha[1] : section.a[1]));
        row.push_back(number_text(delta ? section.alpha[2] : section.a[2]));
        rows.push_back(std::move(row));
    }
    if (delta)
        return html_table({"Section", "beta0", "beta1", "beta2", "alpha1", "alpha2"}, rows);
    return html_table({"Section", "b0", "b1", "b2", "a1", "a2"}, rows);
}

std::string undetermined_table(const Assessment& assessment) {
    std::vector<Row> rows;
    for (const CaseAssessment& plant_case : assessment.cases) {
        append_reasons(rows, plant_case.name, "design", plant_case.design.figures);
        if (plant_case.realised)
            append_reasons(rows, plant_case.name, "realised", plant_case.realised->figures);
    }
    return rows.empty() ? std::string() : html_table({"Case", "Loop", "What", "Note"}, rows);
}

} // namespace cornerwright
