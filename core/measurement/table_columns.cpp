#include "core/measurement/table_columns.h"

#include <algorithm>
#include <array>
#include <utility>

namespace cornerwright {
namespace {

constexpr std::array counting_meanings = {Meaning::frequency, Meaning::magnitude,
                                          Meaning::phase,     Meaning::real,
                                          Meaning::imaginary, Meaning::coherence};

std::string count_in_words(std::size_t count) {
    static constexpr std::array<std::string_view, 11> words = {
        "no", "one", "two", "three", "four", "five", "six", "seven", "eight", "nine", "ten"};
    return count < words.size() ? std::string(words[count]) : std::to_string(count);
}

class ColumnChooser {
  public:
    ColumnChooser(const TableLayout& layout, const ReadOptions& options,
                  const std::string& file_name, TableColumns& columns,
                  std::vector<OpenChoice>& choices)
        : layout_(layout),
          options_(options),
          file_name_(file_name),
          columns_(columns),
          choices_(choices),
          headings_(layout.headings),
          chosen_(std::max(layout.headings.size(), layout.row_fields), false) {}

    void run() {
        if (layout_.heading_line == 0)
            assume_headings();
        publish();
        for (const ColumnChoice& choice : options_.columns)
            apply(choice);
        settle_rivals();
        publish();
        take_foreign_frequency();
        drop_doubles();
        choose_pair();
        take_units();
        publish();
    }

  private:
    [[noreturn]] void refuse(std::optional<int> column, std::string expected,
                             std::string found) const {
        const int line = layout_.heading_line != 0 ? layout_.heading_line : layout_.first_row_line;
        throw InputError({file_name_, line, column}, std::move(expected), std::move(found));
    }

    void assume_headings() {
        const std::size_t count = layout_.row_fields;
        columns_.assumed = count == 3 || count == 4;
        static constexpr std::array<std::string_view, 4> assumed = {
            "Frequency (Hz)", "Magnitude (dB)", "Phase (deg)", "Coherence"};
        headings_.assign(count, Heading{});
        if (columns_.assumed) {
            for (std::size_t i = 0; i < count; ++i)
                headings_[i] = read_heading(assumed[i]);
            return;
        }
        if (!options_.columns.empty())
            return;
        choices_.push_back({OpenChoice::About::columns, 0, meanings(), "no heading"});
        publish();
        refuse({}, "a heading, or three or four columns (or --column NUMBER=MEANING)",
               count_in_words(count) + (count == 1 ? " column" : " columns") +
                   " without a heading");
    }

    static std::vector<std::string> meanings() {
        std::vector<std::string> names;
        for (const Meaning meaning : counting_meanings)
            names.emplace_back(name_of(meaning));
        names.emplace_back(name_of(Meaning::unused));
        return names;
    }

    void apply(const ColumnChoice& choice) {
        const auto bad = [&](const std::string& expected, const std::string& found) {
            throw InputError({file_name_, {}, choice.column}, expected, found);
        };
        const auto meaning = meaning_from_name(choice.meaning);
        if (!meaning || *meaning == Meaning::time)
            bad("a column's meaning (frequency, magnitude, phase, real, imaginary, coherence, "
                "unused)",
                quoted_in_message(choice.meaning));
        if (choice.column < 1 || static_cast<std::size_t>(choice.column) > headings_.size())
            bad("a column from 1 to " + std::to_string(headings_.size()),
                std::to_string(choice.column));
        const auto index = static_cast<std::size_t>(choice.column - 1);
        Heading& heading = headings_[index];
        if (heading.meaning != *meaning)
            heading.unit_if_silent = Unit::none;
        heading.meaning = *meaning;
        if (!choice.unit.empty()) {
            const auto unit = unit_from_text(choice.unit);
            if (!unit)
                bad(std::string(units_expected(*meaning)), quoted_in_message(choice.unit));
            heading.unit = *unit;
            heading.unit_text = choice.unit;
        } else if (!fitting_unit(*meaning, heading.unit, heading.unit_text)) {
            heading.unit = Unit::none;
        }
        chosen_[index] = true;
    }

    bool is_chosen(Meaning meaning) const {
        for (std::size_t i = 0; i < headings_.size(); ++i)
            if (chosen_[i] && headings_[i].meaning == meaning)
                return true;
        return false;
    }

    void give_up_unchosen(Meaning meaning) {
        for (std::size_t i = 0; i < headings_.size(); ++i)
            if (!chosen_[i] && headings_[i].meaning == meaning)
                headings_[i].meaning = Meaning::unused;
    }

    /// What the user named stands above what the heading says.
    void settle_rivals() {
        for (const Meaning meaning : counting_meanings)
            if (is_chosen(meaning))
                give_up_unchosen(meaning);
        if (is_chosen(Meaning::magnitude) || is_chosen(Meaning::phase)) {
            give_up_unchosen(Meaning::real);
            give_up_unchosen(Meaning::imaginary);
        }
    }

    Heading* find(Meaning meaning) {
        const auto found =
            std::find_if(headings_.begin(), headings_.end(),
                         [&](const Heading& heading) { return heading.meaning == meaning; });
        return found == headings_.end() ? nullptr : &*found;
    }

    int column_of(const Heading& heading) const {
        return static_cast<int>(&heading - headings_.data()) + 1;
    }

    /// Where no heading names a frequency, a column in rpm or the like is one in a unit that is
    /// not converted.
    void take_foreign_frequency() {
        if (find(Meaning::frequency) != nullptr)
            return;
        for (Heading& heading : headings_)
            if (heading.meaning == Meaning::unused && heading.unit == Unit::foreign)
                refuse_unit(heading, Meaning::frequency);
        refuse({}, "a column of frequencies", "none");
    }

    static Unit unit_to_compare(const Heading& heading) {
        const Unit unit =
            fitting_unit(heading.meaning, heading.unit, heading.unit_text).value_or(heading.unit);
        if (unit != Unit::none)
            return unit;
        return heading.unit_if_silent;
    }

    void drop_doubles() {
        for (const Meaning meaning : counting_meanings) {
            Heading* left = find(meaning);
            if (left == nullptr)
                continue;
            for (Heading& other : headings_) {
                if (&other <= left || other.meaning != meaning)
                    continue;
                if (unit_to_compare(other) == unit_to_compare(*left)) {
                    choices_.push_back({OpenChoice::About::columns, column_of(other), meanings(),
                                        "a second column of the same meaning and unit"});
                    refuse(column_of(other),
                           "one column for the " + std::string(name_of(meaning)) +
                               " (or --column NUMBER=unused)",
                           "a second one");
                }
                columns_.warnings.push_back("column " + std::to_string(column_of(other)) + " (" +
                                            other.text + ") left out: column " +
                                            std::to_string(column_of(*left)) + " gives the " +
                                            std::string(name_of(meaning)));
                other.meaning = Meaning::unused;
            }
        }
    }

    void choose_pair() {
        columns_.real_imaginary =
            find(Meaning::real) != nullptr && find(Meaning::imaginary) != nullptr;
        const bool polar = find(Meaning::magnitude) != nullptr && find(Meaning::phase) != nullptr;
        if (!columns_.real_imaginary && !polar) {
            const bool one = find(Meaning::magnitude) != nullptr ||
                             find(Meaning::phase) != nullptr || find(Meaning::real) != nullptr ||
                             find(Meaning::imaginary) != nullptr;
            choices_.push_back({OpenChoice::About::columns, 0, meanings(), "half a response"});
            refuse({}, "magnitude and phase, or real and imaginary part",
                   one ? "only one of them" : "neither");
        }
        const auto unused = columns_.real_imaginary ? std::array{Meaning::magnitude, Meaning::phase}
                                                    : std::array{Meaning::real, Meaning::imaginary};
        for (Heading& heading : headings_)
            if (std::find(unused.begin(), unused.end(), heading.meaning) != unused.end())
                heading.meaning = Meaning::unused;
    }

    [[noreturn]] void refuse_unit(const Heading& heading, Meaning meaning) {
        const int column = column_of(heading);
        const auto about = meaning == Meaning::frequency   ? OpenChoice::About::frequency_unit
                           : meaning == Meaning::magnitude ? OpenChoice::About::magnitude_unit
                           : meaning == Meaning::phase     ? OpenChoice::About::phase_unit
                                                           : OpenChoice::About::columns;
        choices_.push_back({about, column, unit_names(meaning),
                            "the unit " + heading.unit_text + " is not converted"});
        if (heading.unit == Unit::mega_or_milli)
            refuse(column, "MHz or mHz (or --frequency-unit MHz, mHz)",
                   heading.unit_text + ", which could be either");
        refuse(column, std::string(units_expected(meaning)), quoted_in_message(heading.unit_text));
    }

    static std::vector<std::string> unit_names(Meaning meaning) {
        switch (meaning) {
        case Meaning::frequency:
            return {"Hz", "kHz", "MHz", "GHz", "mHz", "rad/s", "krad/s"};
        case Meaning::magnitude:
            return {"dB", "linear"};
        case Meaning::phase:
            return {"deg", "rad"};
        default:
            return {};
        }
    }

    /// The unit of a counting column: the option's, or the heading's.
    CountingColumn counting(Meaning meaning, const std::string& option) {
        Heading& heading = *find(meaning);
        if (!option.empty()) {
            const auto unit = unit_from_text(option);
            const auto fits = unit ? fitting_unit(meaning, *unit, option) : std::nullopt;
            if (!fits || *fits == Unit::none)
                throw InputError({file_name_, {}, column_of(heading)},
                                 std::string(units_expected(meaning)), quoted_in_message(option));
            heading.unit = *fits;
            heading.unit_text = option;
        }
        const auto fits = fitting_unit(meaning, heading.unit, heading.unit_text);
        if (!fits)
            refuse_unit(heading, meaning);
        heading.unit = *fits == Unit::none ? heading.unit_if_silent : *fits;
        if (meaning == Meaning::frequency && *fits == Unit::none) {
            if (heading.unit == Unit::none)
                heading.unit = Unit::hertz;
            columns_.warnings.push_back("unit assumed: frequency in " +
                                        std::string(name_of(heading.unit)) + " (column " +
                                        std::to_string(column_of(heading)) + " gives no unit)");
        }
        return {column_of(heading), heading.unit};
    }

    void take_units() {
        columns_.frequency = counting(Meaning::frequency, options_.frequency_unit);
        if (columns_.real_imaginary) {
            columns_.first = counting(Meaning::real, {});
            columns_.second = counting(Meaning::imaginary, {});
        } else {
            columns_.first = counting(Meaning::magnitude, options_.magnitude_unit);
            columns_.second = counting(Meaning::phase, options_.phase_unit);
        }
        if (find(Meaning::coherence) != nullptr)
            columns_.coherence = counting(Meaning::coherence, {});
        const bool told = !options_.columns.empty() ||
                          (!options_.magnitude_unit.empty() && !options_.phase_unit.empty());
        columns_.assumed = columns_.assumed && !told;
    }

    void publish() {
        columns_.infos.clear();
        for (const Heading& heading : headings_) {
            const bool counts =
                heading.meaning != Meaning::unused && heading.meaning != Meaning::time;
            columns_.infos.push_back(
                {column_of(heading), heading.text,
                 std::string(name_of(counts ? heading.meaning : Meaning::unused)),
                 std::string(counts ? name_of(heading.unit) : "")});
        }
    }

    const TableLayout& layout_;
    const ReadOptions& options_;
    const std::string& file_name_;
    TableColumns& columns_;
    std::vector<OpenChoice>& choices_;
    std::vector<Heading> headings_;
    std::vector<bool> chosen_; ///< by the user
};

} // namespace

void choose_columns(const TableLayout& layout, const ReadOptions& options,
                    const std::string& file_name, TableColumns& columns,
                    std::vector<OpenChoice>& choices) {
    ColumnChooser(layout, options, file_name, columns, choices).run();
}

} // namespace cornerwright
