#pragma once

#include "core/measurement/text_lines.h"
#include "core/measurement/units.h"

#include <string>
#include <vector>

namespace cornerwright {

/// One function of a universal file: the records 6 to 11, and the values of record 12 if wanted.
struct Dataset58 {
    enum class Function { frequency_response = 4, coherence = 6, other = 0 };

    int first_line = 0; ///< of the dataset: the line "58"
    Function function = Function::other;
    bool complex = false;
    bool double_precision = false;
    bool even = true;
    long pairs = 0; ///< number of values; of pairs where the spacing is uneven
    double first = 0.0;
    double step = 0.0;
    std::string abscissa_unit;
    std::vector<double> abscissa;     ///< uneven spacing only
    std::vector<double> ordinate;     ///< real and imaginary part in turn where complex
    std::vector<int> lines_of_values; ///< line of each ordinate value's pair
    std::vector<std::string> identification;
};

/// Reads a dataset whose line "58" was read last, up to and with its closing "-1". Values are kept
/// for frequency responses with complex and for coherences with real ordinate. Throws InputError.
Dataset58 read_dataset_58(TextLines& lines);

/// A line that opens or closes a dataset.
bool is_dataset_mark(std::string_view line);

} // namespace cornerwright
