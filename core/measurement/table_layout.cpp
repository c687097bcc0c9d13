#include "core/measurement/table_layout.h"

#include "core/measurement/number_field.h"

#include <algorithm>
#include <map>
#include <optional>
#include <utility>

namespace cornerwright {
namespace {

constexpr std::size_t head_bytes = std::size_t{1} << 20;

struct HeadLine {
    int number;
    std::string text; ///< UTF-8
};

bool is_blank(std::string_view line) {
    return trimmed(line).empty();
}

/// A line that begins with a number, quoted or not.
bool begins_with_number(std::string_view line) {
    line = trimmed(line);
    const bool quoted = line.starts_with('"');
    if (quoted)
        line = trimmed(line.substr(1));
    double value = 0.0;
    const char* end = line.data() + line.size();
    for (const char decimal : {'.', ','}) {
        const char* stop = parse_number(line.data(), end, decimal, value);
        if (stop != line.data() &&
            (stop == end || std::string_view("\t;, \"").find(*stop) != std::string_view::npos))
            return true;
    }
    return false;
}

bool is_number(std::string_view field, char decimal) {
    double value = 0.0;
    field = unquoted(field);
    const char* end = field.data() + field.size();
    return !field.empty() && parse_number(field.data(), end, decimal, value) == end;
}

bool has_outside_quotes(std::string_view line, char wanted) {
    bool quoted = false;
    for (const char c : line) {
        quoted ^= c == '"';
        if (c == wanted && !quoted)
            return true;
    }
    return false;
}

/// Split at spaces, every field is a number whose commas are decimal: "1,5 -3,25 80".
bool is_spaced_with_decimal_commas(std::string_view line) {
    const auto fields = split_fields(line, ' ');
    return fields.size() > 1 && std::all_of(fields.begin(), fields.end(), [](auto field) {
               return !field.ends_with(',') && (is_number(field, ',') || is_number(field, '.'));
           });
}

char judge_separator(const std::vector<std::string_view>& rows) {
    const auto in_most_rows = [&](auto predicate) {
        const auto count = std::count_if(rows.begin(), rows.end(), predicate);
        return 2 * static_cast<std::size_t>(count) > rows.size();
    };
    for (const char separator : {'\t', ';'})
        if (in_most_rows([&](auto row) { return has_outside_quotes(trimmed(row), separator); }))
            return separator;
    if (in_most_rows(is_spaced_with_decimal_commas))
        return ' ';
    return in_most_rows([](auto row) { return has_outside_quotes(row, ','); }) ? ',' : ' ';
}

struct DecimalSign {
    char sign;
    bool seen;
};

DecimalSign judge_decimal(const std::vector<std::string_view>& rows, char separator) {
    if (separator == ',')
        return {'.', true};
    std::size_t commas = 0;
    std::size_t points = 0;
    for (const auto row : rows)
        for (const auto field : split_fields(row, separator)) {
            if (field.find(',') != std::string_view::npos && is_number(field, ','))
                ++commas;
            else if (field.find('.') != std::string_view::npos && is_number(field, '.'))
                ++points;
        }
    return {commas > points ? ',' : '.', commas + points > 0};
}

std::size_t without_empty_end(const std::vector<std::string_view>& fields) {
    std::size_t count = fields.size();
    while (count > 0 && unquoted(fields[count - 1]).empty())
        --count;
    return count;
}

/// A way to split a line that may be the heading.
struct Candidate {
    std::size_t index = 0; ///< of the line in the head
    bool comment = false;
    std::vector<Heading> headings;
    std::size_t fields = 0;
    bool fits_rows = false;  ///< as many fields as most rows
    bool names_kind = false; ///< names what a table of this kind must name
};

class LayoutJudge {
  public:
    LayoutJudge(std::vector<HeadLine> head, TableKind kind) : head_(std::move(head)), kind_(kind) {}

    TableLayout judge() {
        judge_dialect();
        if (const auto chosen = choose_heading())
            take_heading(*chosen);
        finish();
        return std::move(layout_);
    }

  private:
    void judge_dialect() {
        std::vector<std::string_view> rows;
        for (std::size_t i = 0; i < head_.size(); ++i)
            if (begins_with_number(head_[i].text)) {
                rows.push_back(head_[i].text);
                number_lines_.push_back(i);
            }
        auto judged = rows;
        if (judged.empty())
            for (const auto& line : head_)
                if (!is_blank(line.text) && !is_comment(line.text, ' '))
                    judged.push_back(line.text);
        layout_.dialect.separator = judge_separator(judged);
        const auto [sign, seen] = judge_decimal(judged, layout_.dialect.separator);
        layout_.dialect.decimal = sign;
        layout_.decimal_seen = seen;
        std::map<std::size_t, std::size_t> full;
        std::map<std::size_t, std::size_t> core;
        for (const auto row : rows) {
            const auto fields = split_fields(row, layout_.dialect.separator);
            ++full[fields.size()];
            ++core[without_empty_end(fields)];
        }
        usual_full_ = most_frequent(full);
        usual_core_ = most_frequent(core);
        layout_.row_fields = usual_core_;
    }

    static std::size_t most_frequent(const std::map<std::size_t, std::size_t>& counts) {
        const auto most =
            std::max_element(counts.begin(), counts.end(),
                             [](const auto& a, const auto& b) { return a.second < b.second; });
        return most == counts.end() ? 0 : most->first;
    }

    bool fits_rows(std::size_t full, std::size_t core) const {
        return full == usual_full_ || full == usual_core_ || core == usual_core_ ||
               core == usual_full_;
    }

    bool names_kind(const std::vector<Heading>& headings) const {
        const auto has = [&](auto predicate) {
            return std::any_of(headings.begin(), headings.end(), predicate);
        };
        const auto means = [](Meaning meaning) {
            return [meaning](const Heading& heading) { return heading.meaning == meaning; };
        };
        if (kind_ == TableKind::time_record)
            return has(means(Meaning::time));
        const bool more = has([](const Heading& heading) {
            return heading.meaning != Meaning::unused && heading.meaning != Meaning::frequency &&
                   heading.meaning != Meaning::time;
        });
        const bool foreign = has([](const Heading& heading) {
            return heading.meaning == Meaning::unused && heading.unit == Unit::foreign;
        });
        return more && (has(means(Meaning::frequency)) || foreign);
    }

    Candidate candidate(std::size_t index, const std::vector<std::string>& fields,
                        bool comment) const {
        Candidate result;
        result.index = index;
        result.comment = comment;
        result.fields = fields.size();
        for (const auto& field : fields)
            result.headings.push_back(read_heading(field));
        std::size_t core = fields.size();
        while (core > 0 && result.headings[core - 1].text.empty())
            --core;
        result.fits_rows = fits_rows(fields.size(), core);
        result.names_kind = names_kind(result.headings);
        return result;
    }

    /// The ways a line can be split into a heading: as the rows are; where spaces separate, also
    /// with a bracket kept with the word before it, and at two spaces or more; a comment mark may
    /// be the heading of the first column ("#" for a running number).
    std::vector<std::vector<std::string>> splittings(const std::string& line, bool comment) const;

    /// The best candidate of a line, if any of its splittings is one.
    std::optional<Candidate> best_candidate(std::size_t index) const {
        const std::string& line = head_[index].text;
        if (is_blank(line) || begins_with_number(line))
            return std::nullopt;
        const bool comment = is_comment(line, layout_.dialect.separator);
        std::optional<Candidate> best;
        for (const auto& fields : splittings(line, comment)) {
            Candidate found = candidate(index, fields, comment);
            const auto rank = [](const Candidate& c) { return 2 * c.names_kind + c.fits_rows; };
            if (!best || rank(found) > rank(*best))
                best = std::move(found);
        }
        if (!best || (!best->names_kind && kind_ == TableKind::frequency_response))
            return std::nullopt;
        // "Time: 10:22" in the preamble is no heading of a record.
        if (kind_ == TableKind::time_record && !best->fits_rows)
            return std::nullopt;
        // A sentence in a comment may name frequency and gain without being a heading.
        const bool all_named =
            std::all_of(best->headings.begin(), best->headings.end(),
                        [](const Heading& heading) { return heading.meaning != Meaning::unused; });
        if (comment && !best->fits_rows && !all_named)
            return std::nullopt;
        return best;
    }

    std::optional<Candidate> choose_heading() const;
    void take_heading(const Candidate& chosen);
    void take_units();
    void finish();

    std::vector<HeadLine> head_;
    TableKind kind_;
    TableLayout layout_;
    std::vector<std::size_t> number_lines_; ///< indices of lines that begin with a number
    std::size_t usual_full_ = 0;
    std::size_t usual_core_ = 0;
    std::size_t after_heading_ = 0; ///< index of the first line that may be a row
};

std::string_view without_comment_mark(std::string_view line) {
    line = trimmed(line);
    if (line.starts_with("//"))
        return line.substr(2);
    while (!line.empty() && std::string_view("#%!;").find(line.front()) != std::string_view::npos)
        line.remove_prefix(1);
    return line;
}

std::vector<std::string> owned(const std::vector<std::string_view>& fields) {
    return {fields.begin(), fields.end()};
}

std::vector<std::string> with_brackets_kept(const std::vector<std::string_view>& fields) {
    std::vector<std::string> result;
    for (const auto field : fields) {
        const bool bracket = field.starts_with('(') || field.starts_with('[');
        const bool inside =
            !result.empty() && std::count(result.back().begin(), result.back().end(), '(') >
                                   std::count(result.back().begin(), result.back().end(), ')');
        if ((bracket || inside) && !result.empty())
            result.back().append(" ").append(field);
        else
            result.emplace_back(field);
    }
    return result;
}

std::vector<std::string> split_at_wide_gaps(std::string_view line) {
    std::vector<std::string> result;
    line = trimmed(line);
    while (!line.empty()) {
        const std::size_t gap = std::min(line.find("  "), line.size());
        result.emplace_back(line.substr(0, gap));
        line = trimmed(line.substr(gap));
    }
    return result;
}

std::vector<std::vector<std::string>> LayoutJudge::splittings(const std::string& line,
                                                              bool comment) const {
    const char separator = layout_.dialect.separator;
    std::vector<std::vector<std::string>> result;
    if (!comment) {
        const auto fields = split_fields(line, separator);
        result.push_back(owned(fields));
        if (separator == ' ') {
            result.push_back(with_brackets_kept(fields));
            result.push_back(split_at_wide_gaps(line));
        }
        return result;
    }
    const std::string_view rest = without_comment_mark(line);
    const auto fields = split_fields(trimmed(rest), separator);
    result.push_back(owned(fields));
    if (separator == ' ') {
        result.push_back(with_brackets_kept(fields));
        result.push_back(split_at_wide_gaps(rest));
    }
    // The mark is a heading of its own where a separator follows it.
    const std::string_view mark =
        trimmed(line).substr(0, static_cast<std::size_t>(rest.data() - trimmed(line).data()));
    const auto behind = separator == ' ' ? fields : split_fields(rest, separator);
    if (separator == ' ' || unquoted(behind.front()).empty()) {
        auto with_mark = owned(behind);
        if (separator == ' ')
            with_mark.insert(with_mark.begin(), std::string(mark));
        else
            with_mark.front() = std::string(mark);
        result.push_back(std::move(with_mark));
    }
    return result;
}

std::optional<Candidate> LayoutJudge::choose_heading() const {
    std::optional<Candidate> last;       // above the rows looked at so far
    std::optional<Candidate> last_words; // time record: the nearest line of words that fits
    std::optional<Candidate> fallback;
    std::size_t next = 0;
    const auto look_above = [&](std::size_t row) {
        for (; next < row; ++next)
            if (auto found = best_candidate(next)) {
                if (found->names_kind)
                    last = std::move(found);
                else if (found->fits_rows && !found->comment)
                    last_words = std::move(found);
            }
    };
    for (const std::size_t row : number_lines_) {
        const std::size_t before = next;
        look_above(row);
        next = row + 1;
        if (!last)
            continue;
        // Only rows that follow the heading directly belong to it; numbers further up are preamble.
        const bool directly_above = last->index >= before;
        if (directly_above && last->fits_rows)
            return last;
        if (directly_above)
            fallback = last;
    }
    if (number_lines_.empty())
        look_above(head_.size());
    if (fallback)
        return fallback;
    return last ? last : last_words;
}

void LayoutJudge::take_heading(const Candidate& chosen) {
    layout_.heading_line = head_[chosen.index].number;
    layout_.headings = chosen.headings;
    layout_.heading_fields = chosen.fields;
    while (!layout_.headings.empty() && layout_.headings.back().text.empty())
        layout_.headings.pop_back();
    after_heading_ = chosen.index + 1;
    for (std::size_t i = 0; i < chosen.index; ++i)
        layout_.preamble.emplace_back(without_comment_mark(head_[i].text));

    take_units();
}

/// A line of units stands directly below the heading: fields that are units (or, beside units,
/// unknown text); a comment only where every field is a unit.
void LayoutJudge::take_units() {
    if (after_heading_ >= head_.size() || is_blank(head_[after_heading_].text))
        return;
    const HeadLine& below = head_[after_heading_];
    const bool comment = is_comment(below.text, layout_.dialect.separator);
    const std::string_view text = comment ? trimmed(without_comment_mark(below.text)) : below.text;
    if (begins_with_number(text))
        return;
    const auto fields = split_fields(text, layout_.dialect.separator);
    bool some_unit = false;
    for (const auto field : fields) {
        std::string unit_text;
        double value = 0.0;
        const auto unit = read_unit_field(field, unit_text);
        const FieldKind judged = judge_field(field, layout_.dialect.decimal, value);
        if (!unit && (judged == FieldKind::number || (comment && !unquoted(field).empty())))
            return;
        const bool of_time = kind_ == TableKind::time_record && judged == FieldKind::text;
        some_unit |= of_time || (unit && unquoted(field) != "-" && unquoted(field) != "1");
    }
    if (!some_unit || (comment && fields.size() != layout_.heading_fields))
        return;
    layout_.units_line = below.number;
    layout_.units_fields = fields.size();
    for (std::size_t i = 0; i < std::min(fields.size(), layout_.headings.size()); ++i) {
        Heading& heading = layout_.headings[i];
        if (heading.unit != Unit::none)
            continue;
        heading.unit = read_unit_field(fields[i], heading.unit_text).value_or(Unit::none);
        if (heading.unit_text.empty())
            heading.unit_text = std::string(unquoted(fields[i]));
    }
    ++after_heading_;
}

void LayoutJudge::finish() {
    for (const auto& line : head_)
        layout_.has_text |= !is_blank(line.text);
    const auto first = std::find_if(number_lines_.begin(), number_lines_.end(),
                                    [&](std::size_t i) { return i >= after_heading_; });
    if (first != number_lines_.end())
        layout_.first_row_line = head_[*first].number;
    if (layout_.heading_line == 0 && first != number_lines_.end())
        for (std::size_t i = 0; i < *first; ++i)
            layout_.preamble.emplace_back(without_comment_mark(head_[i].text));
}

} // namespace

bool is_comment(std::string_view line, char separator) {
    while (!line.empty() && (line.front() == ' ' || (line.front() == '\t' && separator != '\t')))
        line.remove_prefix(1);
    if (line.empty())
        return false;
    const char first = line.front();
    return first == '#' || first == '%' || first == '!' || (first == ';' && separator != ';') ||
           line.starts_with("//");
}

std::vector<std::string_view> split_fields(std::string_view line, char separator) {
    std::vector<std::string_view> fields;
    bool quoted = false;
    std::size_t begin = 0;
    const bool runs = separator == ' ';
    if (runs)
        line = trimmed(line);
    for (std::size_t i = 0; i < line.size(); ++i) {
        quoted ^= line[i] == '"';
        if (quoted || (line[i] != separator && !(runs && line[i] == '\t')))
            continue;
        if (!runs || i > begin)
            fields.push_back(line.substr(begin, i - begin));
        begin = i + 1;
    }
    if (!runs || begin < line.size())
        fields.push_back(line.substr(begin));
    return fields;
}

TableLayout judge_layout(TextLines& lines, TableKind kind) {
    lines.rewind();
    std::vector<HeadLine> head;
    std::size_t bytes = 0;
    std::string_view line;
    while (bytes < head_bytes && lines.next(line)) {
        bytes += line.size() + 1;
        head.push_back({lines.line_number(), readable(line)});
    }
    lines.rewind();
    return LayoutJudge(std::move(head), kind).judge();
}

} // namespace cornerwright
