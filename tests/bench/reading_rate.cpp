// How fast a measurement file is read: `reading_rate FILE` prints megabytes, seconds of processor
// time (best of five) and points. reading_numpy.py runs it beside NumPy.

#include "core/measurement/read_measurement.h"

#include <algorithm>
#include <cmath>
#include <cstdio>
#include <ctime>
#include <filesystem>

int main(int argc, char** argv) {
    if (argc != 2) {
        std::fputs("usage: reading_rate FILE\n", stderr);
        return 1;
    }
    constexpr int runs = 5;
    constexpr double bytes_per_megabyte = 1e6;
    double best = HUGE_VAL;
    std::size_t points = 0;
    for (int i = 0; i < runs; ++i) {
        const std::clock_t begin = std::clock();
        points = cornerwright::read_measurement(argv[1]).response.w_rad_s.size();
        best = std::min(best, static_cast<double>(std::clock() - begin) / CLOCKS_PER_SEC);
    }
    const auto bytes = static_cast<double>(std::filesystem::file_size(argv[1]));
    std::printf("%.3f %.6f %zu\n", bytes / bytes_per_megabyte, best, points);
    return 0;
}
