#include "core/project/json_document.h"

#include "core/numerics/error.h"
#include "core/numerics/number_text.h"

#include <nlohmann/json.hpp>

#include <algorithm>
#include <iterator>
#include <optional>

namespace cornerwright {
namespace {

/// A project nests six deep; more than this is no project and would only strain the call stack.
constexpr std::size_t deepest_nesting = 64;

struct Place {
    int line = 1;
    int column = 1;
};

bool continues_character(char c) {
    return (static_cast<unsigned char>(c) & 0xc0U) == 0x80U;
}

/// Lines and columns of byte offsets; offsets mostly ascend, so it counts on from the last one.
class Places {
  public:
    explicit Places(std::string_view text) : text_(text) {}

    Place at(std::size_t offset) {
        if (offset < counted_) {
            counted_ = 0;
            place_ = {};
        }
        for (const std::size_t end = std::min(offset, text_.size()); counted_ < end; ++counted_) {
            if (text_[counted_] == '\n')
                place_ = {place_.line + 1, 1};
            else if (!continues_character(text_[counted_]))
                ++place_.column;
        }
        return place_;
    }

  private:
    std::string_view text_;
    std::size_t counted_ = 0;
    Place place_;
};

/// Hands the text to the parser and tells how far it has read.
class CountingIterator {
  public:
    using iterator_category = std::input_iterator_tag;
    using value_type = char;
    using difference_type = std::ptrdiff_t;
    using pointer = const char*;
    using reference = const char&;

    CountingIterator(const char* place, const char** reached) : place_(place), reached_(reached) {}

    reference operator*() const { return *place_; }
    CountingIterator& operator++() {
        *reached_ = std::max(*reached_, ++place_);
        return *this;
    }
    CountingIterator operator++(int) {
        CountingIterator old = *this;
        ++*this;
        return old;
    }
    bool operator==(const CountingIterator& other) const { return place_ == other.place_; }

  private:
    const char* place_;
    const char** reached_;
};

struct Complaint {
    std::string expected = "valid JSON";
    std::string found;
};

/// Takes the library's sentence apart: "[...] ... at line 1, column 3: syntax error while parsing
/// object - unexpected ','; expected string literal".
Complaint parts_of(std::string_view sentence) {
    for (const std::string_view lead : {"] ", " - "})
        if (const auto end = sentence.find(lead); end != std::string_view::npos)
            sentence.remove_prefix(end + lead.size());
    Complaint complaint;
    while (!sentence.empty()) {
        const std::string_view part = sentence.substr(0, sentence.find("; "));
        sentence.remove_prefix(std::min(part.size() + 2, sentence.size()));
        if (part.starts_with("expected "))
            complaint.expected = part.substr(part.find(' ') + 1);
        else if (part.starts_with("unexpected "))
            complaint.found = part.substr(part.find(' ') + 1);
        else if (part.starts_with("last read: "))
            complaint.found += " at " + std::string(part.substr(part.find(": ") + 2));
        else
            complaint.found = part;
    }
    return complaint;
}

/// Builds the tree from the parser's events. The parser reads one character too many only behind a
/// number, so the place of every token follows from how far it has read.
class TreeBuilder : public nlohmann::json_sax<nlohmann::json> {
  public:
    TreeBuilder(std::string_view text, const std::string& file_name)
        : text_(text), file_(file_name), places_(text), reached_(text.data()) {}

    const char** reached() { return &reached_; }
    JsonNode take_root() { return std::move(root_); }

    bool null() override { return literal(JsonNode::Kind::null, "null", false); }
    bool boolean(bool value) override {
        return literal(JsonNode::Kind::boolean, value ? "true" : "false", value);
    }
    bool number_integer(number_integer_t) override { return number(); }
    bool number_unsigned(number_unsigned_t) override { return number(); }
    bool number_float(number_float_t, const string_t&) override { return number(); }
    bool string(string_t& value) override {
        JsonNode node = node_at(JsonNode::Kind::string, quote_begin());
        node.text = value;
        add(std::move(node));
        return true;
    }
    bool binary(binary_t&) override { return false; } // does not occur in text

    bool start_object(std::size_t) override { return open(JsonNode::Kind::object); }
    bool start_array(std::size_t) override { return open(JsonNode::Kind::array); }
    bool end_object() override { return close(); }
    bool end_array() override { return close(); }

    bool key(string_t& name) override {
        const Place place = places_.at(quote_begin());
        const auto& members = open_.back()->members;
        if (std::any_of(members.begin(), members.end(),
                        [&](const JsonMember& member) { return member.key == name; }))
            throw InputError({file_, place.line, place.column}, "every key once",
                             "\"" + name + "\" a second time");
        open_.back()->members.push_back({name, place.line, place.column, {}});
        return true;
    }

    bool parse_error(std::size_t position, const std::string&,
                     const nlohmann::detail::exception& error) override {
        const Place place = places_.at(position == 0 ? 0 : position - 1);
        const auto [expected, found] = parts_of(error.what());
        throw InputError({file_, place.line, place.column}, expected, found);
    }

  private:
    std::size_t offset() const { return static_cast<std::size_t>(reached_ - text_.data()); }

    /// Where the string begins whose closing quote was read last: no quote inside a string stands
    /// without a backslash, and no backslash stands before its opening quote.
    std::size_t quote_begin() const {
        std::size_t begin = offset() - 2;
        const auto backslashes_before = [this](std::size_t place) {
            std::size_t count = 0;
            while (count < place && text_[place - 1 - count] == '\\')
                ++count;
            return count;
        };
        while (text_[begin] != '"' || backslashes_before(begin) % 2 == 1)
            --begin;
        return begin;
    }

    JsonNode node_at(JsonNode::Kind kind, std::size_t begin) {
        const Place place = places_.at(begin);
        JsonNode node;
        node.kind = kind;
        node.line = place.line;
        node.column = place.column;
        return node;
    }

    JsonNode* add(JsonNode node) {
        if (open_.empty()) {
            root_ = std::move(node);
            return &root_;
        }
        JsonNode& parent = *open_.back();
        if (parent.kind == JsonNode::Kind::object) {
            parent.members.back().value = std::move(node);
            return &parent.members.back().value;
        }
        parent.items.push_back(std::move(node));
        return &parent.items.back();
    }

    bool literal(JsonNode::Kind kind, std::string_view word, bool value) {
        JsonNode node = node_at(kind, offset() - word.size());
        node.boolean = value;
        node.text = word;
        add(std::move(node));
        return true;
    }

    bool number() {
        constexpr std::string_view letters = "+-.0123456789eE";
        std::size_t end = offset();
        if (letters.find(text_[end - 1]) == std::string_view::npos)
            --end;
        std::size_t begin = end;
        while (begin > 0 && letters.find(text_[begin - 1]) != std::string_view::npos)
            --begin;
        JsonNode node = node_at(JsonNode::Kind::number, begin);
        node.text = text_.substr(begin, end - begin);
        const auto value = parse_number(node.text);
        if (!value)
            throw InputError({file_, node.line, node.column},
                             "a number of a size that can be computed with", node.text);
        node.number = *value;
        add(std::move(node));
        return true;
    }

    bool open(JsonNode::Kind kind) {
        JsonNode node = node_at(kind, offset() - 1);
        if (open_.size() == deepest_nesting)
            throw InputError({file_, node.line, node.column},
                             std::to_string(deepest_nesting) + " levels of nesting at most",
                             "more of them");
        open_.push_back(add(std::move(node)));
        return true;
    }

    bool close() {
        open_.pop_back();
        return true;
    }

    std::string_view text_;
    const std::string& file_;
    Places places_;
    const char* reached_;
    JsonNode root_;
    std::vector<JsonNode*> open_; ///< a parent grows only while it is the innermost
};

/// A message is one line, whatever stands in the file.
std::string shortened(const std::string& text) {
    constexpr std::size_t longest = 40;
    std::size_t end = std::min(text.size(), text.find('\n'));
    if (end <= longest)
        return text.substr(0, end) + (end < text.size() ? "..." : "");
    end = longest;
    while (end > 0 && continues_character(text[end]))
        --end;
    return text.substr(0, end) + "...";
}

} // namespace

JsonNode read_json(std::string_view text, const std::string& file_name) {
    TreeBuilder builder(text, file_name);
    const CountingIterator begin(text.data(), builder.reached());
    const CountingIterator end(text.data() + text.size(), builder.reached());
    nlohmann::json::sax_parse(begin, end, &builder);
    return builder.take_root();
}

std::string described(const JsonNode& node) {
    switch (node.kind) {
    case JsonNode::Kind::null:
        return "null";
    case JsonNode::Kind::boolean:
        return node.text;
    case JsonNode::Kind::number:
        return "the number " + shortened(node.text);
    case JsonNode::Kind::string:
        return "the text \"" + shortened(node.text) + "\"";
    case JsonNode::Kind::array:
        return "a list";
    case JsonNode::Kind::object:
        break;
    }
    return "an object";
}

} // namespace cornerwright
