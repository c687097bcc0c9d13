#pragma once

#include "core/measurement/preview_measurement.h"
#include "core/measurement/table_layout.h"

#include <optional>
#include <string>
#include <vector>

namespace cornerwright {

/// A column that makes points.
struct CountingColumn {
    int column = 0;         ///< field number from 1
    Unit unit = Unit::none; ///< none: not said (magnitude, phase), or there is none
};

/// Which columns of a text table count, and what every column was understood to be.
struct TableColumns {
    CountingColumn frequency;
    bool real_imaginary = false;
    CountingColumn first;  ///< real part or magnitude
    CountingColumn second; ///< imaginary part or phase
    std::optional<CountingColumn> coherence;
    std::vector<ColumnInfo> infos;
    std::vector<std::string> warnings;
    bool assumed = false; ///< no heading: Hz, dB, deg, to be confirmed by the values
};

/// Chooses the columns from heading and options. What is open is added to `choices` before the
/// InputError is thrown; `infos` are filled as far as understood.
void choose_columns(const TableLayout& layout, const ReadOptions& options,
                    const std::string& file_name, TableColumns& columns,
                    std::vector<OpenChoice>& choices);

} // namespace cornerwright
