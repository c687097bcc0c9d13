#include "core/numerics/error.h"
#include "core/project/object_reader.h"
#include "core/project/read_parts.h"

#include <array>

namespace cornerwright {
namespace {

constexpr std::array methods{Method::tustin,         Method::tustin_at_corners,
                             Method::tustin_at,      Method::matched_roots,
                             Method::step_invariant, Method::ramp_invariant};
constexpr std::array structures{Structure::direct_form_1, Structure::direct_form_2_transposed,
                                Structure::delta};
constexpr std::array number_types{NumberFormat::Type::float64, NumberFormat::Type::float32,
                                  NumberFormat::Type::fixed};

template <typename Values>
auto one_of(const Values& values, const ObjectReader& reader, std::string_view key) {
    std::vector<std::string_view> names;
    for (const auto value : values)
        names.push_back(name_of(value));
    return values[reader.word(key, names)];
}

NumberFormat read_number_format(const JsonNode& node, const std::string& file) {
    const ObjectReader reader(node, file, "\"number_format\" of the realisation",
                              {"type", "word_bits", "fraction_bits"});
    NumberFormat format;
    format.type = one_of(number_types, reader, "type");
    const bool fixed = format.type == NumberFormat::Type::fixed;
    if (fixed || reader.has("word_bits")) {
        format.word_bits = reader.whole_number("word_bits", 16, 32);
        if (format.word_bits != 16 && format.word_bits != 32)
            reader.refuse(reader.require("word_bits"), "16 or 32 for \"word_bits\"",
                          std::to_string(format.word_bits));
    }
    if (fixed || reader.has("fraction_bits"))
        format.fraction_bits = reader.whole_number("fraction_bits", 0, format.word_bits - 1);
    return format;
}

OutputLimits read_output_limits(const JsonNode& node, const std::string& file) {
    const ObjectReader reader(node, file, "\"output_limits\" of the realisation",
                              {"at_least", "at_most"});
    const OutputLimits limits{reader.number("at_least", NumberBound::any),
                              reader.number("at_most", NumberBound::any)};
    if (limits.at_least >= limits.at_most)
        reader.refuse(node, "\"at_least\" below \"at_most\"", "them the other way round or equal");
    return limits;
}

} // namespace

Sampling read_sampling(const JsonNode& node, const std::string& file) {
    const ObjectReader reader(node, file, "\"sampling\"",
                              {"sample_period_s", "computation_delay_s", "design_includes_hold"});
    Sampling sampling;
    sampling.sample_period_s = reader.number("sample_period_s", NumberBound::zero_or_above);
    sampling.computation_delay_s =
        reader.number_or("computation_delay_s", NumberBound::zero_or_above, 0.0);
    sampling.design_includes_hold = reader.boolean_or("design_includes_hold", true);
    return sampling;
}

Realisation read_realisation(const JsonNode& node, const std::string& file) {
    const ObjectReader reader(
        node, file, "\"realisation\"",
        {"method", "match_rad_s", "structure", "number_format", "output_limits"});
    Realisation realisation;
    realisation.method = one_of(methods, reader, "method");
    if (realisation.method == Method::tustin_at || reader.has("match_rad_s"))
        realisation.match_rad_s = reader.number("match_rad_s", NumberBound::above_zero);
    if (reader.has("structure"))
        realisation.structure = one_of(structures, reader, "structure");
    if (const JsonNode* format = reader.find("number_format"))
        realisation.number_format = read_number_format(*format, file);
    if (const JsonNode* limits = reader.find("output_limits"))
        realisation.output_limits = read_output_limits(*limits, file);
    return realisation;
}

} // namespace cornerwright
