#include "core/project/read_plant_cases.h"

#include "core/numerics/error.h"
#include "core/plant/formula.h"
#include "core/project/load_measurement.h"
#include "core/project/object_reader.h"

#include <algorithm>
#include <array>

namespace cornerwright {
namespace {

/// More of them than any plant has; a bound on what a typing slip can ask for.
constexpr int most_declared_poles = 100;

ComplexVector read_roots(const ObjectReader& reader, std::string_view key) {
    ComplexVector roots;
    for (const JsonNode& item : reader.list(key)) {
        const bool is_pair = item.kind == JsonNode::Kind::array && item.items.size() == 2 &&
                             item.items[0].kind == JsonNode::Kind::number &&
                             item.items[1].kind == JsonNode::Kind::number;
        if (!is_pair)
            reader.refuse(item,
                          "a root as [real part, imaginary part] for \"" + std::string(key) + "\"",
                          described(item));
        roots.emplace_back(item.items[0].number, item.items[1].number);
    }
    const std::vector<JsonNode>& items = reader.list(key);
    for (std::size_t i = 0; i < roots.size(); ++i)
        if (std::count(roots.begin(), roots.end(), roots[i]) !=
            std::count(roots.begin(), roots.end(), std::conj(roots[i])))
            reader.refuse(items[i],
                          "complex roots in conjugate pairs for \"" + std::string(key) + "\"",
                          "[" + items[i].items[0].text + ", " + items[i].items[1].text +
                              "] without its twin");
    return roots;
}

PlantModel read_roots_model(const ObjectReader& reader) {
    PlantModel model;
    if (reader.has("zeros_rad_s"))
        model.roots.zeros = read_roots(reader, "zeros_rad_s");
    model.roots.poles = read_roots(reader, "poles_rad_s");
    model.roots.gain = reader.number("gain", NumberBound::not_zero);
    model.dead_time_s = reader.number_or("dead_time_s", NumberBound::zero_or_above, 0.0);
    return model;
}

PlantSource read_model(const JsonNode& node, const std::string& file, const std::string& where) {
    const ObjectReader reader(
        node, file, "the model of " + where,
        {"zeros_rad_s", "poles_rad_s", "gain", "dead_time_s", "numerator", "denominator"});
    const bool by_coefficients = reader.has("numerator") || reader.has("denominator");
    if (!by_coefficients)
        return RootsSource{read_roots_model(reader)};
    for (const std::string_view key : {"zeros_rad_s", "poles_rad_s", "gain"})
        if (const JsonNode* other = reader.find(key))
            reader.refuse(*other, "either roots with a gain, or coefficients", "both");
    return CoefficientsSource{reader.numbers("numerator"), reader.numbers("denominator"),
                              reader.number_or("dead_time_s", NumberBound::zero_or_above, 0.0)};
}

FittedModel read_fit(const JsonNode& node, const std::string& file, const std::string& where) {
    const ObjectReader reader(node, file, "the fit of " + where,
                              {"zeros_rad_s", "poles_rad_s", "gain", "dead_time_s", "misfit_db"});
    return {read_roots_model(reader),
            reader.number_or("misfit_db", NumberBound::zero_or_above, 0.0)};
}

MeasurementSource read_measurement_source(const ObjectReader& plant_case, const std::string& file,
                                          MeasurementLookup& lookup) {
    const JsonNode& node = plant_case.require("measurement");
    const ObjectReader reader(node, file, "the measurement of " + plant_case.where(),
                              {"file", "sha256"});
    MeasurementSource source;
    source.file = reader.text("file");
    source.sha256 = reader.text_or("sha256", {});
    const bool is_hash = source.sha256.empty() ||
                         (source.sha256.size() == 64 &&
                          source.sha256.find_first_not_of("0123456789abcdef") == std::string::npos);
    if (!is_hash)
        reader.refuse(reader.require("sha256"), "64 lower-case hexadecimal digits for \"sha256\"",
                      described(reader.require("sha256")));
    source.integrators = plant_case.whole_number_or("integrators", 0, most_declared_poles, 0);
    source.unstable_poles = plant_case.whole_number_or("unstable_poles", 0, most_declared_poles, 0);
    if (const JsonNode* fit = plant_case.find("fit"))
        source.fit = read_fit(*fit, file, plant_case.where());
    const JsonNode& name_node = reader.require("file");
    load_measurement(source, {file, name_node.line, name_node.column}, plant_case.where(), lookup);
    return source;
}

/// The model errors of core/plant know no file; here they learn where they stand.
void check_model(const PlantSource& source, const JsonNode& node, const ObjectReader& plant_case) {
    try {
        model_of(source);
    } catch (const InputError& error) {
        if (!error.place().column)
            plant_case.refuse(node, error.expected(), error.found());
        JsonNode in_formula = node;
        in_formula.column = *error.place().column;
        plant_case.refuse(in_formula, error.expected() + " at that character of the formula",
                          error.found());
    }
}

PlantCase read_plant_case(const JsonNode& node, const std::string& file, std::string where,
                          MeasurementLookup& lookup) {
    constexpr std::array<std::string_view, 3> sources{"formula", "model", "measurement"};
    const bool measured = std::any_of(node.members.begin(), node.members.end(),
                                      [](const auto& m) { return m.key == "measurement"; });
    std::vector<std::string_view> known{"name", "formula", "model", "measurement"};
    if (measured)
        known.insert(known.end(), {"integrators", "unstable_poles", "fit"});

    PlantCase plant_case;
    plant_case.name = ObjectReader(node, file, where, known).text("name");
    if (!plant_case.name.empty())
        where += " (\"" + plant_case.name + "\")";
    const ObjectReader reader(node, file, where, known);
    if (plant_case.name.empty())
        reader.refuse(reader.require("name"), "a name that is not empty", "an empty one");
    const auto given = std::count_if(sources.begin(), sources.end(),
                                     [&](std::string_view key) { return reader.has(key); });
    if (given != 1)
        reader.refuse(node, R"(one of "formula", "model" and "measurement")",
                      given == 0 ? "none" : std::to_string(given) + " of them");

    if (reader.has("formula"))
        plant_case.source = FormulaSource{reader.text("formula")};
    else if (const JsonNode* model = reader.find("model"))
        plant_case.source = read_model(*model, file, where);
    else
        plant_case.source = read_measurement_source(reader, file, lookup);

    const JsonNode* described_by = reader.find("formula");
    if (!described_by)
        described_by = reader.find("model");
    if (!described_by)
        described_by = reader.find("fit");
    check_model(plant_case.source, described_by ? *described_by : node, reader);
    return plant_case;
}

} // namespace

std::vector<PlantCase> read_plant_cases(const std::vector<JsonNode>& items, const std::string& file,
                                        MeasurementLookup& lookup) {
    std::vector<PlantCase> cases;
    for (const JsonNode& item : items) {
        const std::string where = "plant case " + std::to_string(cases.size() + 1);
        PlantCase next = read_plant_case(item, file, where, lookup);
        for (std::size_t i = 0; i < cases.size(); ++i)
            if (cases[i].name == next.name)
                throw InputError({file, item.line, item.column},
                                 "every plant case under its own name",
                                 "\"" + next.name + "\" a second time, first in plant case " +
                                     std::to_string(i + 1));
        cases.push_back(std::move(next));
    }
    return cases;
}

} // namespace cornerwright
