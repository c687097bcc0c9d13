#include "core/response/frequency_grid.h"

#include <algorithm>
#include <array>
#include <cmath>

namespace cornerwright {
namespace {

constexpr double wanted_points = 700.0;
/// Lattices from which one is taken, so that a moved corner seldom moves the lattice.
constexpr std::array<int, 5> points_a_decade{200, 130, 90, 60, 40};
constexpr int sparse_points_a_decade = 10;
constexpr double lattice_margin_decades = 2.0; ///< dense lattice beyond the outermost guide

int lattice_for(double decades) {
    for (const int density : points_a_decade)
        if (density * decades <= wanted_points)
            return density;
    return points_a_decade.back();
}

void add_lattice(std::vector<double>& grid, double low, double high, int density) {
    const int first = static_cast<int>(std::ceil(std::log10(low) * density));
    const int last = static_cast<int>(std::floor(std::log10(high) * density));
    for (int k = first; k <= last; ++k)
        grid.push_back(std::pow(10.0, static_cast<double>(k) / density));
}

void add_around(std::vector<double>& grid, const GridGuide& guide, double low, double high) {
    constexpr double coarsest = 0.06; // of the frequency: the lattice takes over
    constexpr double finest = 1e-7;   // an undamped pair has no width of its own
    const double w = guide.w_rad_s;
    const auto add = [&](double place) {
        if (place > low && place < high)
            grid.push_back(place);
    };
    add(w);
    for (double step = std::max(0.5 * guide.width_rad_s, finest * w); step < coarsest * w;
         step *= 1.7) {
        add(w - step);
        add(w + step);
    }
}

} // namespace

void sort_and_thin(std::vector<double>& w_rad_s) {
    std::sort(w_rad_s.begin(), w_rad_s.end());
    const auto too_near = [](double a, double b) { return b - a <= 1e-12 * b; };
    w_rad_s.erase(std::unique(w_rad_s.begin(), w_rad_s.end(), too_near), w_rad_s.end());
}

std::vector<double> guided_grid(double low_rad_s, double high_rad_s,
                                std::span<const GridGuide> guides) {
    double dense_low = high_rad_s;
    double dense_high = low_rad_s;
    for (const GridGuide& guide : guides) {
        dense_low = std::min(dense_low, guide.w_rad_s);
        dense_high = std::max(dense_high, guide.w_rad_s);
    }
    const double margin = std::pow(10.0, lattice_margin_decades);
    dense_low = std::max(low_rad_s, dense_low / margin);
    dense_high = std::min(high_rad_s, dense_high * margin);
    std::vector<double> grid{low_rad_s, high_rad_s};
    if (dense_low < dense_high) {
        add_lattice(grid, low_rad_s, dense_low, sparse_points_a_decade);
        add_lattice(grid, dense_low, dense_high, lattice_for(std::log10(dense_high / dense_low)));
        add_lattice(grid, dense_high, high_rad_s, sparse_points_a_decade);
    } else {
        add_lattice(grid, low_rad_s, high_rad_s, lattice_for(std::log10(high_rad_s / low_rad_s)));
    }
    for (const GridGuide& guide : guides)
        add_around(grid, guide, low_rad_s, high_rad_s);
    sort_and_thin(grid);
    return grid;
}

} // namespace cornerwright
