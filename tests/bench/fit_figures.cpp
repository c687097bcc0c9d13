// `fit_figures FILE ORDER` fits a measurement file (dead time 0) and prints seconds of processor
// time (best of three), gain, then poles and zeros as pairs, a line each. fit_against_scipy.py runs
// it beside a general-purpose optimiser.

#include "core/fitting/fit.h"
#include "core/measurement/read_measurement.h"

#include <algorithm>
#include <cmath>
#include <cstdio>
#include <cstdlib>
#include <ctime>

namespace {

void print_roots(const cornerwright::ComplexVector& roots) {
    for (const auto root : roots)
        std::printf("%.17g %.17g ", root.real(), root.imag());
    std::printf("\n");
}

} // namespace

int main(int argc, char** argv) {
    using namespace cornerwright;
    if (argc != 3) {
        std::fputs("usage: fit_figures FILE ORDER\n", stderr);
        return 1;
    }
    const MeasuredResponse measured = read_measurement(argv[1]).response;
    FitOptions options;
    options.order = std::atoi(argv[2]);
    constexpr int runs = 3;
    double best = HUGE_VAL;
    FitResult fit;
    for (int i = 0; i < runs; ++i) {
        const std::clock_t begin = std::clock();
        fit = fit_model(measured, options);
        best = std::min(best, static_cast<double>(std::clock() - begin) / CLOCKS_PER_SEC);
    }
    std::printf("%.6f\n%.17g\n", best, fit.model.roots.gain);
    print_roots(fit.model.roots.poles);
    print_roots(fit.model.roots.zeros);
    return 0;
}
