#pragma once

#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

struct JsonMember;

/// A JSON value with the place where it begins (line and column from 1, columns in characters).
struct JsonNode {
    enum class Kind { null, boolean, number, string, array, object };

    Kind kind = Kind::null;
    bool boolean = false;
    double number = 0.0; ///< finite
    std::string text;    ///< of a string; of a number as it is written
    std::vector<JsonNode> items;
    std::vector<JsonMember> members; ///< in the order of the file, no key twice
    int line = 1;
    int column = 1;
};

struct JsonMember {
    std::string key;
    int line = 1;
    int column = 1;
    JsonNode value;
};

/// Reads a whole JSON text. Throws InputError with `file_name`, line and column for broken JSON, a
/// key that stands twice in one object, and absurdly deep nesting.
JsonNode read_json(std::string_view text, const std::string& file_name);

/// "the text \"abc\"", "the number 3", "a list", ... for messages.
std::string described(const JsonNode& node);

} // namespace cornerwright
