#include "core/project/object_reader.h"

#include "core/numerics/error.h"

#include <algorithm>
#include <array>
#include <cmath>
#include <numeric>

namespace cornerwright {
namespace {

/// Units that keys of the file carry, and others that people write in their place; longer ones
/// first, so that "_rad_s" is not taken for "_s".
constexpr std::array<std::string_view, 20> unit_suffixes{
    "_rad_per_s", "_seconds", "_percent", "_degrees", "_radians", "_rad_s", "_hertz",
    "_ratio",     "_khz",     "_mhz",     "_deg",     "_rad",     "_rps",   "_hz",
    "_db",        "_dB",      "_ms",      "_us",      "_s",       "_%"};

std::string_view without_unit(std::string_view key) {
    for (const std::string_view suffix : unit_suffixes)
        if (key.ends_with(suffix))
            return key.substr(0, key.size() - suffix.size());
    return key;
}

/// Letters to insert, delete or replace (Levenshtein) to make `right` of `left`.
std::size_t letters_between(std::string_view left, std::string_view right) {
    std::vector<std::size_t> row(right.size() + 1);
    std::iota(row.begin(), row.end(), std::size_t{0});
    for (std::size_t i = 0; i < left.size(); ++i) {
        std::size_t diagonal = row[0]++;
        for (std::size_t j = 0; j < right.size(); ++j) {
            const std::size_t replaced = diagonal + (left[i] == right[j] ? 0U : 1U);
            diagonal = row[j + 1];
            row[j + 1] = std::min({replaced, row[j] + 1, row[j + 1] + 1});
        }
    }
    return row.back();
}

std::string quoted(std::string_view word) {
    return "\"" + std::string(word) + "\"";
}

std::string quoted_list(const std::vector<std::string_view>& words) {
    std::string text;
    for (std::size_t i = 0; i < words.size(); ++i)
        text += (i == 0 ? "" : i + 1 == words.size() ? " or " : ", ") + quoted(words[i]);
    return text;
}

std::string_view words_of(NumberBound bound) {
    switch (bound) {
    case NumberBound::any:
        break;
    case NumberBound::not_zero:
        return " other than zero";
    case NumberBound::above_zero:
        return " above zero";
    case NumberBound::zero_or_above:
        return " of zero or above";
    }
    return "";
}

bool holds(NumberBound bound, double value) {
    switch (bound) {
    case NumberBound::any:
        break;
    case NumberBound::not_zero:
        return value != 0.0;
    case NumberBound::above_zero:
        return value > 0.0;
    case NumberBound::zero_or_above:
        return value >= 0.0;
    }
    return true;
}

} // namespace

std::string_view nearest_key(std::string_view key, const std::vector<std::string_view>& known) {
    for (const std::string_view candidate : known)
        if (without_unit(candidate) == without_unit(key))
            return candidate;
    constexpr std::size_t slip = 2; // letters
    std::string_view nearest;
    std::size_t least = slip + 1;
    for (const std::string_view candidate : known) {
        const std::size_t distance = letters_between(key, candidate);
        if (distance < least && distance < candidate.size()) {
            least = distance;
            nearest = candidate;
        }
    }
    return nearest;
}

ObjectReader::ObjectReader(const JsonNode& node, const std::string& file, std::string where,
                           const std::vector<std::string_view>& known)
    : node_(node), file_(file), where_(std::move(where)) {
    if (node.kind != JsonNode::Kind::object)
        throw InputError({file_, node.line, node.column}, "an object {...} as " + where_,
                         described(node));
    for (const JsonMember& member : node.members) {
        if (std::find(known.begin(), known.end(), member.key) != known.end())
            continue;
        const std::string_view meant = nearest_key(member.key, known);
        throw InputError({file_, member.line, member.column},
                         (meant.empty() ? known.empty() ? "no key" : "a key " + quoted_list(known)
                                        : "the key " + quoted(meant)) +
                             " in " + where_,
                         "the unknown key " + quoted(member.key));
    }
}

const JsonNode* ObjectReader::find(std::string_view key) const {
    const auto found = std::find_if(node_.members.begin(), node_.members.end(),
                                    [&](const JsonMember& member) { return member.key == key; });
    return found == node_.members.end() ? nullptr : &found->value;
}

const JsonNode& ObjectReader::require(std::string_view key) const {
    if (const JsonNode* found = find(key))
        return *found;
    refuse(node_, "the key " + quoted(key), "none");
}

void ObjectReader::refuse(const JsonNode& node, const std::string& expected,
                          const std::string& found) const {
    throw InputError({file_, node.line, node.column}, expected + " in " + where_, found);
}

double ObjectReader::checked_number(const JsonNode& node, std::string_view key,
                                    NumberBound bound) const {
    if (node.kind != JsonNode::Kind::number || !holds(bound, node.number))
        refuse(node, "a number" + std::string(words_of(bound)) + " for " + quoted(key),
               described(node));
    return node.number;
}

double ObjectReader::number(std::string_view key, NumberBound bound) const {
    return checked_number(require(key), key, bound);
}

std::optional<double> ObjectReader::optional_number(std::string_view key, NumberBound bound) const {
    const JsonNode* node = find(key);
    if (!node)
        return std::nullopt;
    return checked_number(*node, key, bound);
}

double ObjectReader::number_or(std::string_view key, NumberBound bound, double otherwise) const {
    return optional_number(key, bound).value_or(otherwise);
}

int ObjectReader::whole_number(std::string_view key, int low, int high) const {
    const JsonNode& node = require(key);
    if (node.kind != JsonNode::Kind::number || std::trunc(node.number) != node.number ||
        node.number < low || node.number > high)
        refuse(node,
               "a whole number from " + std::to_string(low) + " to " + std::to_string(high) +
                   " for " + quoted(key),
               described(node));
    return static_cast<int>(node.number);
}

int ObjectReader::whole_number_or(std::string_view key, int low, int high, int otherwise) const {
    return has(key) ? whole_number(key, low, high) : otherwise;
}

std::string ObjectReader::text(std::string_view key) const {
    const JsonNode& node = require(key);
    if (node.kind != JsonNode::Kind::string)
        refuse(node, "a text for " + quoted(key), described(node));
    return node.text;
}

std::string ObjectReader::text_or(std::string_view key, std::string otherwise) const {
    return has(key) ? text(key) : std::move(otherwise);
}

bool ObjectReader::boolean_or(std::string_view key, bool otherwise) const {
    const JsonNode* node = find(key);
    if (!node)
        return otherwise;
    if (node->kind != JsonNode::Kind::boolean)
        refuse(*node, "true or false for " + quoted(key), described(*node));
    return node->boolean;
}

const std::vector<JsonNode>& ObjectReader::list(std::string_view key) const {
    const JsonNode& node = require(key);
    if (node.kind != JsonNode::Kind::array)
        refuse(node, "a list [...] for " + quoted(key), described(node));
    return node.items;
}

std::vector<double> ObjectReader::numbers(std::string_view key) const {
    std::vector<double> values;
    for (const JsonNode& item : list(key))
        values.push_back(checked_number(item, key, NumberBound::any));
    return values;
}

std::size_t ObjectReader::word(std::string_view key,
                               const std::vector<std::string_view>& words) const {
    const JsonNode& node = require(key);
    const auto found = std::find(words.begin(), words.end(), node.text);
    if (node.kind != JsonNode::Kind::string || found == words.end())
        refuse(node, quoted_list(words) + " for " + quoted(key), described(node));
    return static_cast<std::size_t>(found - words.begin());
}

} // namespace cornerwright
