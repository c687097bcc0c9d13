#pragma once

#include "core/measurement/number_field.h"
#include "core/measurement/table_layout.h"

#include <array>
#include <string_view>
#include <vector>

namespace cornerwright {

/// Takes the fields that count out of the rows of a text table.
class TableRows {
  public:
    static constexpr std::size_t most_counting = 4;
    using Values = std::array<double, most_counting>;

    /// A row judged field by field.
    struct Row {
        Values values{};
        std::array<FieldKind, most_counting> kinds{};
    };

    /// `counting[k]`: the column (from 1) of value k; 0 where there is none. `fields`: columns a
    /// row must have; empty ones may follow, and text too up to `most_fields`.
    TableRows(TableDialect dialect, const std::array<int, most_counting>& counting,
              std::size_t fields, std::size_t most_fields);

    /// Fills `values` where the row is whole, without quotes, and every field that counts is a
    /// number; false leaves the row to `judge`.
    bool take(std::string_view line, Values& values) const;

    /// Judges a row. Throws InputError for a wrong number of fields and for text where a number is
    /// due.
    Row judge(std::string_view line, const TextLines& lines) const;

    /// True where a field that counts is a number only if the decimal sign is the other one.
    bool has_other_decimal_sign(std::string_view line) const;

  private:
    TableDialect dialect_;
    std::vector<int> value_of_field_; ///< -1: not used
    std::size_t most_fields_;
};

} // namespace cornerwright
