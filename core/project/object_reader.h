#pragma once

#include "core/project/json_document.h"

#include <optional>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// What a number in the project file may be.
enum class NumberBound { any, not_zero, above_zero, zero_or_above };

/// Takes the members of one JSON object apart. Every refusal is an InputError that names file, line
/// and column, the key, and the object by `where` ("plant case 2").
class ObjectReader {
  public:
    /// Refuses what is not an object, and any key that is not in `known`: a wrong unit or a typing
    /// slip is answered with the key that was meant.
    ObjectReader(const JsonNode& node, const std::string& file, std::string where,
                 const std::vector<std::string_view>& known);

    const std::string& where() const { return where_; }
    bool has(std::string_view key) const { return find(key) != nullptr; }
    /// Null where the key does not stand.
    const JsonNode* find(std::string_view key) const;
    /// Refuses where the key does not stand.
    const JsonNode& require(std::string_view key) const;

    double number(std::string_view key, NumberBound bound) const;
    double number_or(std::string_view key, NumberBound bound, double otherwise) const;
    std::optional<double> optional_number(std::string_view key, NumberBound bound) const;
    int whole_number(std::string_view key, int low, int high) const;
    int whole_number_or(std::string_view key, int low, int high, int otherwise) const;
    std::string text(std::string_view key) const;
    std::string text_or(std::string_view key, std::string otherwise) const;
    bool boolean_or(std::string_view key, bool otherwise) const;
    std::vector<double> numbers(std::string_view key) const;
    const std::vector<JsonNode>& list(std::string_view key) const;

    /// A word out of `words`, as its index.
    std::size_t word(std::string_view key, const std::vector<std::string_view>& words) const;

    /// Throws InputError at the place of `node`; `expected` is completed by `where`.
    [[noreturn]] void refuse(const JsonNode& node, const std::string& expected,
                             const std::string& found) const;

  private:
    double checked_number(const JsonNode& node, std::string_view key, NumberBound bound) const;

    const JsonNode& node_;
    const std::string& file_;
    std::string where_;
};

/// The member of `known` that was probably meant by `key`: the same word with another unit, or one
/// or two letters away; empty if none is near.
std::string_view nearest_key(std::string_view key, const std::vector<std::string_view>& known);

} // namespace cornerwright
