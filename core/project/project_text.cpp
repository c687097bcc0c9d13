#include "core/numerics/write_file.h"
#include "core/project/json_text.h"
#include "core/project/project.h"

namespace cornerwright {
namespace {

void add_model(JsonLine& line, const PlantModel& model) {
    line.roots("zeros_rad_s", model.roots.zeros)
        .roots("poles_rad_s", model.roots.poles)
        .number("gain", model.roots.gain)
        .number("dead_time_s", model.dead_time_s);
}

struct AddSource {
    JsonLine& line;

    void operator()(const FormulaSource& source) const { line.text("formula", source.text); }
    void operator()(const RootsSource& source) const {
        JsonLine model;
        add_model(model, source.model);
        line.raw("model", model.str());
    }
    void operator()(const CoefficientsSource& source) const {
        line.raw("model", JsonLine()
                              .numbers("numerator", source.numerator)
                              .numbers("denominator", source.denominator)
                              .number("dead_time_s", source.dead_time_s)
                              .str());
    }
    void operator()(const MeasurementSource& source) const {
        JsonLine measurement;
        measurement.text("file", source.file);
        if (!source.sha256.empty())
            measurement.text("sha256", source.sha256);
        line.raw("measurement", measurement.str())
            .number("integrators", source.integrators)
            .number("unstable_poles", source.unstable_poles);
        if (!source.fit)
            return;
        JsonLine fit;
        add_model(fit, source.fit->model);
        line.raw("fit", fit.number("misfit_db", source.fit->misfit_db).str());
    }
};

std::string text_of(const PlantCase& plant_case) {
    JsonLine line;
    line.text("name", plant_case.name);
    std::visit(AddSource{line}, plant_case.source);
    return line.str();
}

std::string text_of(const Section& section) {
    JsonLine line;
    line.text("kind", name_of(section.kind));
    for (const SectionParameter& parameter : parameters_of(section.kind))
        line.number(parameter.key, section.*parameter.value);
    if (!section.label.empty())
        line.text("label", section.label);
    if (!section.enabled)
        line.boolean("enabled", false);
    if (section.locked)
        line.boolean("locked", true);
    return line.str();
}

std::string text_of(const Sampling& sampling) {
    return JsonLine()
        .number("sample_period_s", sampling.sample_period_s)
        .number("computation_delay_s", sampling.computation_delay_s)
        .boolean("design_includes_hold", sampling.design_includes_hold)
        .str();
}

std::string text_of(const NumberFormat& format) {
    JsonLine line;
    line.text("type", name_of(format.type));
    // Bits chosen earlier are kept while another type is tried.
    const bool fixed = format.type == NumberFormat::Type::fixed;
    const NumberFormat silent;
    if (fixed || format.word_bits != silent.word_bits)
        line.number("word_bits", format.word_bits);
    if (fixed || format.fraction_bits != silent.fraction_bits)
        line.number("fraction_bits", format.fraction_bits);
    return line.str();
}

std::string text_of(const Realisation& realisation) {
    JsonLine line;
    line.text("method", name_of(realisation.method));
    if (realisation.match_rad_s > 0.0)
        line.number("match_rad_s", realisation.match_rad_s);
    line.text("structure", name_of(realisation.structure))
        .raw("number_format", text_of(realisation.number_format));
    if (realisation.output_limits)
        line.raw("output_limits", JsonLine()
                                      .number("at_least", realisation.output_limits->at_least)
                                      .number("at_most", realisation.output_limits->at_most)
                                      .str());
    return line.str();
}

std::string text_of(const Requirement& requirement) {
    JsonLine line;
    line.text("measure", name_of(requirement.measure));
    if (requirement.measure == Measure::steady_state_error)
        line.text("input", name_of(requirement.input));
    if (requirement.measure == Measure::disturbance_rejection)
        line.number("up_to_rad_s", requirement.up_to_rad_s);
    if (requirement.measure == Measure::roll_off)
        line.number("from_rad_s", requirement.from_rad_s);
    const std::string suffix(key_suffix(unit_of(requirement.measure)));
    if (requirement.at_least)
        line.number("at_least" + suffix, *requirement.at_least);
    if (requirement.at_most)
        line.number("at_most" + suffix, *requirement.at_most);
    if (requirement.measure == Measure::settling_time)
        line.number("band_percent", requirement.band_percent);
    return line.str();
}

template <typename Item>
std::string list_of(const std::vector<Item>& items) {
    std::string text;
    for (const Item& item : items)
        text += (text.empty() ? "\n    " : ",\n    ") + text_of(item);
    return text.empty() ? "[]" : "[" + text + "\n  ]";
}

} // namespace

std::string to_text(const Project& project) {
    std::string text = "{\n  \"cornerwright\": 1";
    const auto add = [&text](std::string_view key, const std::string& json) {
        text += ",\n  " + json_string(key) + ": " + json;
    };
    add("title", json_string(project.title));
    if (!project.notes.empty())
        add("notes", json_string(project.notes));
    add("plant_cases", list_of(project.plant_cases));
    add("compensator", list_of(project.compensator));
    if (project.sampling)
        add("sampling", text_of(*project.sampling));
    if (project.realisation)
        add("realisation", text_of(*project.realisation));
    add("requirements", list_of(project.requirements));
    return text + "\n}\n";
}

void save_project(const Project& project, const std::filesystem::path& file) {
    write_file(file, to_text(project));
}

} // namespace cornerwright
