#include "core/handover/evidence.h"
#include "core/handover/handover_texts.h"
#include "core/handover/number_literals.h"
#include "core/handover/report_tables.h"
#include "core/handover/test_vectors.h"
#include "core/realisation/section_coefficients.h"

#include <nlohmann/json.hpp>

namespace cornerwright {
namespace {

using Json = nlohmann::ordered_json;

Json format_json(const NumberFormat& format) {
    Json json{{"type", name_of(format.type)}};
    if (format.type == NumberFormat::Type::fixed) {
        json["word_bits"] = format.word_bits;
        json["fraction_bits"] = format.fraction_bits;
    }
    return json;
}

Json section_json(const DiscreteSection& section, const Realisation& realisation) {
    const bool delta = realisation.structure == Structure::delta;
    Json json{{"b", section.b}, {"a", section.a}};
    if (delta) {
        json["beta"] = section.beta;
        json["alpha"] = section.alpha;
    }
    if (realisation.number_format.type == NumberFormat::Type::fixed) {
        json[delta ? "beta_integers" : "b_integers"] = section.b_integers;
        json[delta ? "alpha_integers" : "a_integers"] = section.a_integers;
        json["shift"] = section.shift;
        if (delta)
            json["delta_shift"] = section.delta_shift;
    }
    return json;
}

Json roots_json(const ComplexVector& roots) {
    Json json = Json::array();
    for (const Complex& d : roots)
        json.push_back({1.0 + d.real(), d.imag()});
    return json;
}

Json vectors_json(const DifferenceEquation& equation) {
    const TestVectors vectors = test_vectors(equation);
    const auto columns = [](const std::vector<TestSample>& samples) {
        Json error = Json::array();
        Json output = Json::array();
        for (const TestSample& sample : samples) {
            error.push_back(sample.error);
            output.push_back(sample.output);
        }
        return Json{{"error", error}, {"output", output}};
    };
    Json restarted = columns(vectors.restarted);
    restarted["reset_to"] = vectors.restart_output;
    return {{"from_rest", columns(vectors.from_rest)}, {"restarted", restarted}};
}

Json requirements_json(const Assessment& assessment) {
    Json json = Json::array();
    for (const RequirementResult& result : assessment.verdict.requirements)
        json.push_back({{"measure", measure_words(result.requirement)},
                        {"limit", result.limit},
                        {"worst", figure_words(result.worst.value, 6)},
                        {"case", result.worst.case_name},
                        {"loop", name_of(result.worst.loop)},
                        {"state", name_of(result.worst.state)},
                        {"reason", result.worst.reason}});
    return json;
}

} // namespace

std::string json_text(const HandoverInput& input) {
    const Assessment& assessment = *input.assessment;
    const DifferenceEquation& equation = *assessment.equation;
    const Realisation& realisation = equation.realisation;
    Json json{{"cornerwright", 1},
              {"title", input.project->title},
              {"sample_period_s", equation.sample_period_s},
              {"method", name_of(realisation.method)},
              {"structure", name_of(realisation.structure)},
              {"number_format", format_json(realisation.number_format)}};
    if (realisation.output_limits)
        json["output_limits"] = {{"at_least", realisation.output_limits->at_least},
                                 {"at_most", realisation.output_limits->at_most}};
    for (const DiscreteSection& section : equation.sections)
        json["sections"].push_back(section_json(section, realisation));
    const RootForm roots = roots_in_z_minus_1(equation);
    json["compensator_zeros_z"] = roots_json(roots.zeros);
    json["compensator_poles_z"] = roots_json(roots.poles);
    json["gain"] = roots.gain;
    json["difference_equation"] = difference_equation_words(equation);
    json["notes"] = equation.notes;
    json["limits"] = limit_words(equation);
    json["project_sha256"] = input.project_sha256;
    json["verdict"] = name_of(assessment.verdict.state);
    json["verdict_in_words"] = verdict_sentence(assessment);
    json["requirements"] = requirements_json(assessment);
    json["caution"] = caution_text();
    json["evidence"] = evidence_lines(input);
    json["test_vectors"] = vectors_json(equation);
    return json.dump(2, ' ', false, Json::error_handler_t::replace) + "\n";
}

} // namespace cornerwright
