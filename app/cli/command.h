#pragma once

#include "core/project/project.h"

#include <CLI/CLI.hpp>

#include <stdexcept>
#include <string>
#include <vector>

namespace cornerwright::cli {

/// Exit statuses that scripts rely on.
enum ExitStatus {
    done = 0,
    requirement_unmet = 1,
    requirement_undetermined = 2,
    wrong_usage = 64,
    wrong_input = 65,
    failed_inside = 70, ///< a fault of the program itself, or no memory left
    cannot_write = 74,
};

/// The command line asks for something that the input does not have: exit status 64.
class UsageError : public std::runtime_error {
  public:
    using std::runtime_error::runtime_error;
};

/// Every command adds itself to the program and sets `status` when it runs.
void add_assess(CLI::App& program, int& status);
void add_curves(CLI::App& program, int& status);
void add_step(CLI::App& program, int& status);
void add_locus(CLI::App& program, int& status);
void add_read(CLI::App& program, int& status);
void add_estimate(CLI::App& program, int& status);
void add_fit(CLI::App& program, int& status);
void add_design(CLI::App& program, int& status);
void add_place(CLI::App& program, int& status);
void add_sensitivity(CLI::App& program, int& status);
void add_tolerance(CLI::App& program, int& status);
void add_fleet(CLI::App& program, int& status);
void add_handover(CLI::App& program, int& status);
void add_report(CLI::App& program, int& status);

/// Loads a project and tells its notices on standard error.
Project load_telling_notices(const std::string& file);

/// The plant case called `name`. Throws UsageError that lists the names there are.
const PlantCase& case_named(const Project& project, const std::string& name);

/// "design" or "realised", as an option of `command`; the variable holds "design" at first.
void add_loop_option(CLI::App& command, std::string& loop);

/// Numbers separated by commas, such as "1,2.5,1e3"; every one finite and above `above` (or equal
/// where `or_equal`). Throws UsageError naming the option.
std::vector<double> number_list(const std::string& text, const std::string& option, double above,
                                bool or_equal);

} // namespace cornerwright::cli
