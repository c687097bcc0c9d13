#include "core/project/object_reader.h"
#include "core/project/read_parts.h"

#include <array>

namespace cornerwright {
namespace {

constexpr std::array inputs{ErrorInput::step, ErrorInput::ramp, ErrorInput::parabola};

Measure measure_of(const JsonNode& node, const std::string& file, const std::string& where) {
    std::vector<std::string_view> every_key;
    for (const JsonMember& member : node.members)
        every_key.push_back(member.key);
    const ObjectReader reader(node, file, where, every_key);
    std::vector<std::string_view> names;
    for (const Measure measure : all_measures())
        names.push_back(name_of(measure));
    return all_measures()[reader.word("measure", names)];
}

/// Angles and decibels have both signs; everything else is a size.
NumberBound limit_bound(Measure measure) {
    const MeasureUnit unit = unit_of(measure);
    return unit == MeasureUnit::deg || unit == MeasureUnit::db ? NumberBound::any
                                                               : NumberBound::zero_or_above;
}

void read_extra(const ObjectReader& reader, Requirement& requirement) {
    switch (requirement.measure) {
    case Measure::settling_time:
        requirement.band_percent =
            reader.number_or("band_percent", NumberBound::above_zero, requirement.band_percent);
        break;
    case Measure::steady_state_error:
        if (reader.has("input")) {
            std::vector<std::string_view> names;
            for (const ErrorInput input : inputs)
                names.push_back(name_of(input));
            requirement.input = inputs[reader.word("input", names)];
        }
        break;
    case Measure::disturbance_rejection:
        requirement.up_to_rad_s = reader.number("up_to_rad_s", NumberBound::above_zero);
        break;
    case Measure::roll_off:
        requirement.from_rad_s = reader.number("from_rad_s", NumberBound::above_zero);
        break;
    default:
        break;
    }
}

std::vector<std::string_view> extra_keys(Measure measure) {
    switch (measure) {
    case Measure::settling_time:
        return {"band_percent"};
    case Measure::steady_state_error:
        return {"input"};
    case Measure::disturbance_rejection:
        return {"up_to_rad_s"};
    case Measure::roll_off:
        return {"from_rad_s"};
    default:
        return {};
    }
}

Requirement read_requirement(const JsonNode& node, const std::string& file, std::string where) {
    Requirement requirement;
    requirement.measure = measure_of(node, file, where);
    where += " (" + std::string(name_of(requirement.measure)) + ")";
    const std::string suffix(key_suffix(unit_of(requirement.measure)));
    const std::string at_least = "at_least" + suffix;
    const std::string at_most = "at_most" + suffix;
    std::vector<std::string_view> known{"measure", at_least, at_most};
    for (const std::string_view key : extra_keys(requirement.measure))
        known.push_back(key);

    const ObjectReader reader(node, file, where, known);
    const NumberBound bound = limit_bound(requirement.measure);
    requirement.at_least = reader.optional_number(at_least, bound);
    requirement.at_most = reader.optional_number(at_most, bound);
    if (!requirement.at_least && !requirement.at_most)
        reader.refuse(node, "a limit \"" + at_least + "\" or \"" + at_most + "\"", "none");
    if (requirement.at_least && requirement.at_most && *requirement.at_least > *requirement.at_most)
        reader.refuse(node, "\"" + at_least + "\" not above \"" + at_most + "\"",
                      "them the other way round");
    read_extra(reader, requirement);
    return requirement;
}

} // namespace

std::vector<Requirement> read_requirements(const std::vector<JsonNode>& items,
                                           const std::string& file) {
    std::vector<Requirement> requirements;
    for (const JsonNode& item : items)
        requirements.push_back(
            read_requirement(item, file, "requirement " + std::to_string(requirements.size() + 1)));
    return requirements;
}

} // namespace cornerwright
