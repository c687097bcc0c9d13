#include "core/handover/handover.h"

#include "core/handover/handover_texts.h"
#include "core/numerics/error.h"

#include <algorithm>
#include <array>

namespace cornerwright {
namespace {

bool is_letter(char c) {
    return (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z');
}

/// An identifier of C and of IEC 61131-3 alike: letters, digits and single underscores, a letter
/// first, no underscore last.
bool names_a_function(const std::string& name) {
    if (name.empty() || !is_letter(name.front()) || name.back() == '_')
        return false;
    if (name.find("__") != std::string::npos)
        return false;
    return std::ranges::all_of(
        name, [](char c) { return is_letter(c) || (c >= '0' && c <= '9') || c == '_'; });
}

/// Words that IEC 61131-3 keeps for itself; a function block cannot carry them.
bool is_reserved(std::string name) {
    constexpr std::array words{
        "and",    "array",   "bool", "by",    "case", "constant", "dint",  "do",
        "else",   "elsif",   "exit", "false", "for",  "function", "if",    "int",
        "lint",   "lreal",   "mod",  "not",   "of",   "or",       "real",  "repeat",
        "return", "then",    "to",   "true",  "type", "until",    "var",   "while",
        "xor",    "program", "step", "task",  "with", "resource", "action"};
    std::ranges::transform(name, name.begin(), [](char c) {
        return c >= 'A' && c <= 'Z' ? static_cast<char>(c - 'A' + 'a') : c;
    });
    return std::ranges::find(words, name) != words.end();
}

} // namespace

std::string_view name_of(HandoverForm form) {
    switch (form) {
    case HandoverForm::c99:
        return "c99";
    case HandoverForm::structured_text:
        return "structured-text";
    case HandoverForm::json:
        return "json";
    case HandoverForm::csv:
        break;
    }
    return "csv";
}

void check_handover_name(const std::string& name) {
    if (!names_a_function(name) || is_reserved(name))
        throw InputError({},
                         "a name of letters, digits and single underscores that starts with a "
                         "letter, ends without an underscore and is no reserved word",
                         "\"" + name + "\"");
}

std::vector<HandoverFile> handover_files(const HandoverInput& input, HandoverForm form) {
    check_handover_name(input.name);
    if (!input.assessment->equation)
        throw InputError({}, "a project with a difference equation to hand over",
                         input.assessment->realisation_problem.empty()
                             ? "one without a realisation"
                             : "one that cannot be realised (" +
                                   input.assessment->realisation_problem + ")");
    switch (form) {
    case HandoverForm::c99:
        return c99_files(input);
    case HandoverForm::structured_text:
        return structured_text_files(input);
    case HandoverForm::json:
        return {{input.name + ".json", json_text(input)}};
    case HandoverForm::csv:
        break;
    }
    return {{input.name + ".csv", csv_text(input)}};
}

} // namespace cornerwright
