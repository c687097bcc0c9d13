#include "app/cli/reading_options.h"

#include "app/cli/command.h"
#include "core/numerics/number_text.h"

#include <cmath>

namespace cornerwright::cli {
namespace {

ColumnChoice column_choice(const std::string& text) {
    const auto equals = text.find('=');
    const auto number = parse_number(text.substr(0, equals));
    constexpr double highest_column = 1e6;
    if (equals == std::string::npos || !number || *number < 1.0 || *number > highest_column ||
        std::trunc(*number) != *number)
        throw UsageError("--column: expected NUMBER=MEANING or NUMBER=MEANING:UNIT, found \"" +
                         text + "\"");
    const std::string rest = text.substr(equals + 1);
    const auto colon = rest.find(':');
    return {static_cast<int>(*number), rest.substr(0, colon),
            colon == std::string::npos ? std::string() : rest.substr(colon + 1)};
}

} // namespace

void add_reading_options(CLI::App& command, ReadingOptions& options) {
    ReadOptions& settled = options.settled;
    command
        .add_option("--frequency-unit", settled.frequency_unit,
                    "unit of the frequency column, whatever its heading says")
        ->check(CLI::IsMember({"mHz", "Hz", "kHz", "MHz", "GHz", "rad/s", "krad/s"}));
    command.add_option("--magnitude-unit", settled.magnitude_unit, "dB or linear")
        ->check(CLI::IsMember({"dB", "linear"}));
    command.add_option("--phase-unit", settled.phase_unit, "deg or rad")
        ->check(CLI::IsMember({"deg", "rad"}));
    command.add_option("--column", options.columns,
                       "what a column means, as NUMBER=MEANING or NUMBER=MEANING:UNIT; meanings: "
                       "frequency, magnitude, phase, real, imaginary, coherence, unused");
    command.add_option("--parameter", settled.parameter,
                       "network parameter of a Touchstone file, such as S21");
    command.add_flag("--flip-sign", settled.flip_sign, "multiply the response by -1");
    command.add_option("--remove-delay", settled.remove_delay_s,
                       "seconds of dead time to take out of the response");
}

ReadOptions read_options_of(const ReadingOptions& options) {
    ReadOptions settled = options.settled;
    for (const std::string& column : options.columns)
        settled.columns.push_back(column_choice(column));
    return settled;
}

} // namespace cornerwright::cli
