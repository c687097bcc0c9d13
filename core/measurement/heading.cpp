#include "core/measurement/heading.h"

#include "core/measurement/characters.h"
#include "core/measurement/number_field.h"

#include <algorithm>
#include <array>

namespace cornerwright {
namespace {

struct Word {
    std::u32string_view word; ///< lower case
    Meaning meaning;
    Unit unit_if_silent = Unit::none;
    bool only_first = false; ///< counts as the first word of the heading only
};

constexpr std::array<Word, 55> words = {{
    {U"f", Meaning::frequency, Unit::hertz, true},
    {U"freq", Meaning::frequency, Unit::hertz},
    {U"frequency", Meaning::frequency, Unit::hertz},
    {U"frequenz", Meaning::frequency, Unit::hertz},
    {U"fr\u00E9quence", Meaning::frequency, Unit::hertz},
    {U"frequence", Meaning::frequency, Unit::hertz},
    {U"w", Meaning::frequency, Unit::rad_per_s, true},
    {U"omega", Meaning::frequency, Unit::rad_per_s},
    {U"\u03C9", Meaning::frequency, Unit::rad_per_s},
    {U"angular frequency", Meaning::frequency, Unit::rad_per_s},
    {U"kreisfrequenz", Meaning::frequency, Unit::rad_per_s},
    {U"pulsation", Meaning::frequency, Unit::rad_per_s},
    {U"amplitude ratio", Meaning::magnitude, Unit::linear},
    {U"ratio", Meaning::magnitude, Unit::linear},
    {U"modulus", Meaning::magnitude, Unit::linear},
    {U"abs", Meaning::magnitude, Unit::linear},
    {U"mag", Meaning::magnitude},
    {U"magnitude", Meaning::magnitude},
    {U"gain", Meaning::magnitude},
    {U"amp", Meaning::magnitude},
    {U"amplitude", Meaning::magnitude},
    {U"betrag", Meaning::magnitude},
    {U"amplitudengang", Meaning::magnitude},
    {U"verst\u00E4rkung", Meaning::magnitude},
    {U"module", Meaning::magnitude},
    {U"phase", Meaning::phase},
    {U"ph", Meaning::phase, Unit::none, true},
    {U"phi", Meaning::phase},
    {U"\u03C6", Meaning::phase},
    {U"arg", Meaning::phase},
    {U"argument", Meaning::phase},
    {U"angle", Meaning::phase},
    {U"phasengang", Meaning::phase},
    {U"phasenwinkel", Meaning::phase},
    {U"winkel", Meaning::phase},
    {U"re", Meaning::real, Unit::none, true},
    {U"real", Meaning::real},
    {U"realteil", Meaning::real},
    {U"partie r\u00E9elle", Meaning::real},
    {U"im", Meaning::imaginary, Unit::none, true},
    {U"imag", Meaning::imaginary},
    {U"imaginary", Meaning::imaginary},
    {U"imagin\u00E4rteil", Meaning::imaginary},
    {U"partie imaginaire", Meaning::imaginary},
    {U"coh", Meaning::coherence},
    {U"coherence", Meaning::coherence},
    {U"\u03B3\u00B2", Meaning::coherence},
    {U"gamma2", Meaning::coherence},
    {U"gamma^2", Meaning::coherence},
    {U"koh\u00E4renz", Meaning::coherence},
    {U"coh\u00E9rence", Meaning::coherence},
    {U"t", Meaning::time, Unit::none, true},
    {U"time", Meaning::time},
    {U"zeit", Meaning::time},
    {U"temps", Meaning::time},
}};

bool is_word_character(char32_t c) {
    if (c < 0x80)
        return (c >= '0' && c <= '9') || (c >= 'a' && c <= 'z') || (c >= 'A' && c <= 'Z');
    // No-break space, degree and middle dot, and the marks of general punctuation, part words.
    return c != 0xA0 && c != 0xB0 && c != 0xB7 && !(c >= 0x2000 && c < 0x2070);
}

/// The word of the list that decides: leftmost, and the longest at that place.
const Word* deciding_word(const std::u32string& text) {
    std::size_t first = text.size();
    for (std::size_t at = 0; at < text.size(); ++at) {
        if (!is_word_character(text[at]) || (at > 0 && is_word_character(text[at - 1])))
            continue;
        first = std::min(first, at);
        const Word* best = nullptr;
        for (const Word& word : words) {
            const std::size_t behind = at + word.word.size();
            if (text.compare(at, word.word.size(), word.word) != 0 ||
                (behind < text.size() && is_word_character(text[behind])) ||
                (word.only_first && at != first))
                continue;
            if (best == nullptr || word.word.size() > best->word.size())
                best = &word;
        }
        if (best != nullptr)
            return best;
    }
    return nullptr;
}

/// |G|, |H(jw)|: the sign of a modulus at the very start.
bool is_modulus(std::string_view text) {
    return text.starts_with('|') && text.find('|', 1) != std::string_view::npos;
}

void find_meaning(std::string_view rest, Heading& heading) {
    if (is_modulus(rest)) {
        heading.meaning = Meaning::magnitude;
        heading.unit_if_silent = Unit::linear;
        return;
    }
    std::u32string text = folded(rest);
    std::replace(text.begin(), text.end(), U'_', U' ');
    if (const Word* word = deciding_word(text)) {
        heading.meaning = word->meaning;
        heading.unit_if_silent = word->unit_if_silent;
    }
}

/// Start of the bracket that closes at the end of the text, or npos.
std::size_t closing_bracket_start(std::string_view text) {
    if (text.empty() || (text.back() != ')' && text.back() != ']'))
        return std::string_view::npos;
    const char close = text.back();
    const char open = close == ')' ? '(' : '[';
    int depth = 0;
    for (std::size_t i = text.size(); i-- > 0;) {
        depth += text[i] == close ? 1 : text[i] == open ? -1 : 0;
        if (depth == 0)
            return i;
    }
    return std::string_view::npos;
}

/// Splits a unit without brackets off the end. It must fit the meaning of what is left, or be a
/// unit that nobody writes for anything else.
bool split_bare_unit(std::string_view text, Heading& heading) {
    for (std::size_t at = text.find_last_of("/,_ "); at != std::string_view::npos && at > 0;
         at = text.find_last_of("/,_ ", at - 1)) {
        const std::string_view written = trimmed(text.substr(at + 1));
        const auto unit = unit_from_text(written);
        if (written.empty() || !unit)
            continue;
        Heading split = heading;
        find_meaning(trimmed(text.substr(0, at)), split);
        const bool plain = *unit == Unit::linear;
        if (split.meaning == Meaning::unused ||
            (plain && !fitting_unit(split.meaning, *unit, written)))
            continue;
        heading = split;
        heading.unit = *unit;
        heading.unit_text = std::string(written);
        return true;
    }
    return false;
}

} // namespace

std::optional<Unit> read_unit_field(std::string_view field, std::string& unit_text) {
    field = unquoted(field);
    const std::size_t bracket = closing_bracket_start(field);
    if (bracket == 0)
        field = trimmed(field.substr(1, field.size() - 2));
    const auto unit = field.empty() ? std::nullopt : unit_from_text(field);
    unit_text = unit ? std::string(field) : std::string();
    return unit;
}

Heading read_heading(std::string_view field) {
    Heading heading;
    const std::string_view text = unquoted(field);
    heading.text = std::string(text);
    if (const std::size_t bracket = closing_bracket_start(text);
        bracket != std::string_view::npos && bracket > 0) {
        const auto unit = read_unit_field(text.substr(bracket), heading.unit_text);
        if (unit) {
            heading.unit = *unit;
            find_meaning(trimmed(text.substr(0, bracket)), heading);
            return heading;
        }
    }
    if (!split_bare_unit(text, heading))
        find_meaning(text, heading);
    return heading;
}

} // namespace cornerwright
