#include "app/cli/command.h"
#include "core/numerics/error.h"

#include <iostream>

namespace {

using namespace cornerwright::cli;

int run(int argc, char** argv) {
    CLI::App program("Closing feedback loops on real equipment: judge, realise and hand over a "
                     "compensator.",
                     "cornerwright-cli");
    program.set_version_flag("--version", CORNERWRIGHT_VERSION);
    program.require_subcommand(1);
    int status = done;
    add_assess(program, status);
    add_curves(program, status);
    add_step(program, status);
    add_locus(program, status);
    add_read(program, status);
    add_estimate(program, status);
    add_fit(program, status);
    add_design(program, status);
    add_place(program, status);
    add_sensitivity(program, status);
    add_tolerance(program, status);
    add_fleet(program, status);
    add_handover(program, status);
    add_report(program, status);
    try {
        program.parse(argc, argv);
    } catch (const CLI::ParseError& error) {
        return program.exit(error) == 0 ? done : wrong_usage;
    }
    return status;
}

} // namespace

int main(int argc, char** argv) {
    std::ios::sync_with_stdio(false);
    int status = done;
    try {
        status = run(argc, argv);
    } catch (const UsageError& error) {
        std::cerr << error.what() << '\n';
        return wrong_usage;
    } catch (const cornerwright::InputError& error) {
        std::cerr << error.what() << '\n';
        return wrong_input;
    } catch (const cornerwright::WriteError& error) {
        std::cerr << error.what() << '\n';
        return cannot_write;
    } catch (const std::exception& error) {
        std::cerr << "the program failed: " << error.what() << '\n';
        return failed_inside;
    }
    std::cout.flush();
    if (!std::cout) {
        std::cerr << "could not write to standard output\n";
        return cannot_write;
    }
    return status;
}
