#include "core/numerics/error.h"
#include "core/project/object_reader.h"
#include "core/project/read_parts.h"

namespace cornerwright {
namespace {

NumberBound bound_of(ParameterBound bound) {
    switch (bound) {
    case ParameterBound::not_zero:
        return NumberBound::not_zero;
    case ParameterBound::above_zero:
        return NumberBound::above_zero;
    case ParameterBound::zero_or_above:
        break;
    }
    return NumberBound::zero_or_above;
}

/// The kind decides which keys are known, so it is looked for before the keys are judged.
SectionKind kind_of(const JsonNode& node, const std::string& file, const std::string& where) {
    std::vector<std::string_view> every_key;
    for (const JsonMember& member : node.members)
        every_key.push_back(member.key);
    const ObjectReader reader(node, file, where, every_key);
    std::vector<std::string_view> names;
    for (const SectionKind kind : all_section_kinds())
        names.push_back(name_of(kind));
    return all_section_kinds()[reader.word("kind", names)];
}

Section read_section(const JsonNode& node, const std::string& file, std::string where) {
    Section section;
    section.kind = kind_of(node, file, where);
    where += " (" + std::string(name_of(section.kind)) + ")";
    std::vector<std::string_view> known{"kind"};
    for (const SectionParameter& parameter : parameters_of(section.kind))
        known.push_back(parameter.key);
    known.insert(known.end(), {"label", "enabled", "locked"});

    const ObjectReader reader(node, file, where, known);
    for (const SectionParameter& parameter : parameters_of(section.kind))
        section.*parameter.value = reader.number(parameter.key, bound_of(parameter.bound));
    section.label = reader.text_or("label", {});
    section.enabled = reader.boolean_or("enabled", true);
    section.locked = reader.boolean_or("locked", false);
    try {
        check(section);
    } catch (const InputError& error) {
        throw InputError({file, node.line, node.column}, error.expected() + ", " + where,
                         error.found());
    }
    return section;
}

} // namespace

Chain read_compensator(const std::vector<JsonNode>& items, const std::string& file) {
    Chain chain;
    for (const JsonNode& item : items)
        chain.push_back(
            read_section(item, file, "compensator section " + std::to_string(chain.size() + 1)));
    return chain;
}

} // namespace cornerwright
