#pragma once

#include "core/numerics/figure.h"

#include <iosfwd>
#include <string>
#include <string_view>
#include <vector>

namespace cornerwright::cli {

/// Rows of text under a heading, columns aligned by their widest cell.
class TextTable {
  public:
    explicit TextTable(std::vector<std::string> heading) : rows_{std::move(heading)} {}

    void add(std::vector<std::string> row) { rows_.push_back(std::move(row)); }
    void print(std::ostream& out) const;

  private:
    std::vector<std::vector<std::string>> rows_;
};

/// For people: four significant digits and the unit, "infinite", "not determined".
std::string people_text(const Figure& figure, std::string_view unit);

} // namespace cornerwright::cli
