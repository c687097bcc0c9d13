#pragma once

#include <string>
#include <vector>

namespace cornerwright::cli {

/// Runs the window program, which stands beside this one where both are installed and in the folder
/// `window` next door where both were built, and gives back its exit status. What needs fonts and
/// painting, such as a PDF file, is its work. Throws UsageError that begins with `option` where the
/// window program is not there.
int run_window_program(const std::vector<std::string>& arguments, const std::string& option);

} // namespace cornerwright::cli
