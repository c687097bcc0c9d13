// Lets another program optimise on the very figures that placement uses, without a process for each
// evaluation. Prints what placement reached on a problem of a seed, then answers each line of
// logarithms (free parameters, in order) with the smallest share there.
//
//   placement_figures SEED

#include "core/numerics/number_text.h"
#include "tests/core/placement/feasible_problems.h"

#include <chrono>
#include <iostream>
#include <sstream>
#include <string>

int main(int argc, char** argv) {
    using namespace cornerwright;
    if (argc != 2) {
        std::cerr << "placement_figures SEED\n";
        return 64;
    }
    const auto feasible = practice::ProblemMaker(std::stoull(argv[1])).make();
    const auto begin = std::chrono::steady_clock::now();
    const PlacementResult result = place(feasible.problem, {});
    const std::chrono::duration<double> took = std::chrono::steady_clock::now() - begin;

    const Chain& chain = feasible.problem.compensator;
    const auto parameters = free_parameters(chain);
    std::cout << number_text(result.merit) << ' ' << number_text(took.count()) << '\n';
    for (const double logarithm : logarithms_of(chain, parameters))
        std::cout << number_text(logarithm) << ' ';
    std::cout << std::endl;

    for (std::string line; std::getline(std::cin, line);) {
        std::istringstream numbers(line);
        std::vector<double> logarithms(parameters.size());
        for (double& logarithm : logarithms)
            numbers >> logarithm;
        double merit = -1e9;
        try {
            merit =
                evaluate(feasible.problem, with_logarithms(chain, parameters, logarithms)).merit;
        } catch (const std::exception&) {
            // Cannot be realised there: as bad as can be.
        }
        std::cout << number_text(merit) << std::endl;
    }
    return 0;
}
