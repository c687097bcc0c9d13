#include "app/cli/text_table.h"

#include "core/numerics/number_text.h"

#include <algorithm>
#include <ostream>

namespace cornerwright::cli {
namespace {

constexpr int digits_for_people = 4;

/// Characters that a terminal shows, of UTF-8 text without combining marks.
std::size_t width_of(const std::string& text) {
    return static_cast<std::size_t>(std::count_if(text.begin(), text.end(), [](char c) {
        return (static_cast<unsigned char>(c) & 0xc0U) != 0x80U;
    }));
}

} // namespace

void TextTable::print(std::ostream& out) const {
    std::vector<std::size_t> widths(rows_.front().size(), 0);
    for (const auto& row : rows_)
        for (std::size_t i = 0; i < row.size(); ++i)
            widths[i] = std::max(widths[i], width_of(row[i]));
    for (const auto& row : rows_) {
        std::string line;
        for (std::size_t i = 0; i < row.size(); ++i)
            line += row[i] + std::string(widths[i] - width_of(row[i]) + 2, ' ');
        line.erase(line.find_last_not_of(' ') + 1);
        out << line << '\n';
    }
}

std::string people_text(const Figure& figure, std::string_view unit) {
    switch (figure.kind()) {
    case Figure::Kind::undetermined:
        return "not determined";
    case Figure::Kind::infinite:
        return "infinite";
    case Figure::Kind::minus_infinite:
        return "-infinite";
    case Figure::Kind::value:
        break;
    }
    std::string text = number_text(figure.value(), digits_for_people);
    if (figure.standard_deviation() > 0.0)
        text += " ± " + number_text(figure.standard_deviation(), 2);
    return unit.empty() ? text : text + " " + std::string(unit);
}

} // namespace cornerwright::cli
