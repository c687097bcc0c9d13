#pragma once

#include <string_view>

namespace cornerwright::fuzzing {

/// The readers that are given arbitrary bytes.
enum class Input { text_table, touchstone, universal_file, time_record, project };

/// Gives `bytes` to a reader. A refusal (InputError) is a good end; so is a result that keeps the
/// promises of its type. Anything else throws std::logic_error, crashes or hangs.
void feed(Input input, std::string_view bytes);

} // namespace cornerwright::fuzzing
