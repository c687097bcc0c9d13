#include "app/cli/command.h"
#include "app/cli/written_project.h"
#include "core/engine/placement_problem.h"
#include "core/numerics/error.h"
#include "core/placement/section_design.h"

#include <functional>
#include <iostream>
#include <map>
#include <memory>

namespace cornerwright::cli {
namespace {

struct Options {
    std::string project;
    std::string out;
    PhaseLift lift;
    double crossover_rad_s = 0.0;
    LowFrequencyHold hold;
    double rejection_db = -20.0;
    double up_to_rad_s = 0.0;
    ResonanceQuieting resonance;
    RollOff roll_off;
};

using Design = std::function<SectionProposal(const PlacementProblem&)>;

/// Adds one design to the command; it reads the project, tells what it does or why it cannot, and
/// writes the project with the new sections.
CLI::App* add(CLI::App& command, const std::shared_ptr<Options>& options, const char* name,
              const char* what, Design design) {
    CLI::App* one = command.add_subcommand(name, what);
    one->add_option("PROJECT", options->project, "project file")->required();
    one->add_option("--write", options->out,
                    "project file to write; may be PROJECT itself; silent: only tell");
    one->callback([options, design = std::move(design)] {
        Project project = load_telling_notices(options->project);
        const SectionProposal proposal = design(placement_problem_of(project));
        std::string words;
        for (const std::string& sentence : proposal.words)
            words += (words.empty() ? "" : "\n") + sentence;
        if (!proposal.possible)
            throw InputError({options->project, {}, {}}, "a loop for which this can be designed",
                             words);
        std::cout << words << '\n';
        if (options->out.empty())
            return;
        project.compensator = proposal.compensator;
        write_project(std::move(project), options->project, options->out);
    });
    return one;
}

void add_error_input(CLI::App& command, ErrorInput& input) {
    command.add_option("--input", input, "reference of the error: step, ramp or parabola")
        ->transform(CLI::CheckedTransformer(
            std::map<std::string, ErrorInput>{{"step", ErrorInput::step},
                                              {"ramp", ErrorInput::ramp},
                                              {"parabola", ErrorInput::parabola}}))
        ->default_str(std::string(name_of(input)));
}

} // namespace

void add_design(CLI::App& program, int&) {
    const auto options = std::make_shared<Options>();
    CLI::App* command = program.add_subcommand(
        "design", "Section design: ordinary sections worked out from what is wanted");
    command->require_subcommand(1);
    Options& o = *options;

    CLI::App* lift = add(*command, options, "lift-phase",
                         "One or two leads so that every case has the phase margin",
                         [options](const PlacementProblem& problem) {
                             PhaseLift wanted = options->lift;
                             if (options->crossover_rad_s > 0.0)
                                 wanted.crossover_rad_s = options->crossover_rad_s;
                             return lift_phase(problem, wanted);
                         });
    lift->add_option("--margin", o.lift.phase_margin_deg, "wanted phase margin, deg")
        ->capture_default_str();
    lift->add_option("--allowance", o.lift.allowance_deg,
                     "of the first cut, for the crossover that moves up, deg")
        ->capture_default_str();
    lift->add_option("--crossover", o.crossover_rad_s,
                     "wanted crossover, rad/s; silent: the gain stays")
        ->check(CLI::PositiveNumber);

    CLI::App* hold = add(*command, options, "hold-low-frequency",
                         "A lag, or a PI section, for the steady-state error",
                         [options](const PlacementProblem& problem) {
                             return hold_low_frequency(problem, options->hold);
                         });
    add_error_input(*hold, o.hold.input);
    hold->add_option("--error", o.hold.error, "largest error on any case; 0 asks for an integrator")
        ->check(CLI::NonNegativeNumber)
        ->required();
    hold->add_option("--spend", o.hold.phase_spent_deg, "most phase taken at crossover, deg")
        ->capture_default_str();

    CLI::App* reject =
        add(*command, options, "hold-rejection",
            "A lag for the rejection of disturbances at low frequencies",
            [options](const PlacementProblem& problem) {
                return hold_rejection(problem, options->rejection_db, options->up_to_rad_s,
                                      options->hold.phase_spent_deg);
            });
    reject->add_option("--rejection", o.rejection_db, "largest |S|, dB")->required();
    reject->add_option("--up-to", o.up_to_rad_s, "up to this frequency, rad/s")
        ->check(CLI::PositiveNumber)
        ->required();
    reject->add_option("--spend", o.hold.phase_spent_deg, "most phase taken at crossover, deg")
        ->capture_default_str();

    CLI::App* gain =
        add(*command, options, "gain-for-error",
            "The gain with which the largest steady-state error is the wanted one",
            [options](const PlacementProblem& problem) {
                return gain_for_error(problem, options->hold.input, options->hold.error);
            });
    add_error_input(*gain, o.hold.input);
    gain->add_option("--error", o.hold.error, "wanted error")
        ->check(CLI::PositiveNumber)
        ->required();

    CLI::App* quiet = add(*command, options, "quiet-resonance",
                          "A notch wide enough for the resonance of every case",
                          [options](const PlacementProblem& problem) {
                              return quiet_resonance(problem, options->resonance);
                          });
    quiet->add_option("--from", o.resonance.from_rad_s, "looked for from, rad/s")
        ->check(CLI::PositiveNumber)
        ->required();
    quiet->add_option("--to", o.resonance.to_rad_s, "to, rad/s")
        ->check(CLI::PositiveNumber)
        ->required();
    quiet->add_option("--below", o.resonance.below_db, "|L| wanted at every peak, dB")
        ->capture_default_str();

    CLI::App* roll =
        add(*command, options, "roll-off", "Poles for the attenuation at high frequencies",
            [options](const PlacementProblem& problem) {
                return roll_off(problem, options->roll_off);
            });
    roll->add_option("--from", o.roll_off.from_rad_s, "from this frequency, rad/s")
        ->check(CLI::PositiveNumber)
        ->required();
    roll->add_option("--below", o.roll_off.below_db, "|T| wanted from there, dB")->required();
    roll->add_flag("--pair", o.roll_off.complex_poles, "a complex pair in place of one real pole");
}

} // namespace cornerwright::cli
