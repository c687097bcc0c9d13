#pragma once

#include <string>
#include <string_view>
#include <vector>

namespace cornerwright {

/// `text` with the characters that mean something to HTML and SVG written as entities.
std::string escaped(std::string_view text);

/// A table: first row the headings. Cells are markup already (escape user text before).
std::string html_table(const std::vector<std::string>& headings,
                       const std::vector<std::vector<std::string>>& rows);

std::string html_paragraph(const std::string& markup);
std::string html_heading(int level, const std::string& text);

} // namespace cornerwright
