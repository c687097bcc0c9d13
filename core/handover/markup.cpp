#include "core/handover/markup.h"

namespace cornerwright {

std::string escaped(std::string_view text) {
    std::string result;
    for (const char c : text) {
        switch (c) {
        case '&':
            result += "&amp;";
            break;
        case '<':
            result += "&lt;";
            break;
        case '>':
            result += "&gt;";
            break;
        case '"':
            result += "&quot;";
            break;
        default:
            result += c;
        }
    }
    return result;
}

std::string html_table(const std::vector<std::string>& headings,
                       const std::vector<std::vector<std::string>>& rows) {
    std::string table = "<table>\n<tr>";
    for (const std::string& heading : headings)
        table += "<th>" + heading + "</th>";
    table += "</tr>\n";
    for (const std::vector<std::string>& row : rows) {
        table += "<tr>";
        for (const std::string& cell : row)
            table += "<td>" + cell + "</td>";
        table += "</tr>\n";
    }
    return table + "</table>\n";
}

std::string html_paragraph(const std::string& markup) {
    return "<p>" + markup + "</p>\n";
}

std::string html_heading(int level, const std::string& text) {
    const std::string tag = "h" + std::to_string(level);
    return "<" + tag + ">" + escaped(text) + "</" + tag + ">\n";
}

} // namespace cornerwright
