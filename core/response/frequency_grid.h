#pragma once

#include <span>
#include <vector>

namespace cornerwright {

/// A place on the frequency axis that a grid must follow: a root's frequency and how wide what it
/// does there is (the distance of the root from the axis).
struct GridGuide {
    double w_rad_s = 0.0;
    double width_rad_s = 0.0;
};

/// Ascending frequencies in [low, high], both included: a fixed logarithmic lattice (the same
/// places whatever the ends, about 700 points over the span of the guides, sparse two decades
/// outside of it), and points around every guide whose spacing doubles from half its width up to
/// the spacing of the lattice. No two are nearer than 1e-12 of their size.
std::vector<double> guided_grid(double low_rad_s, double high_rad_s,
                                std::span<const GridGuide> guides);

/// Sorts and drops neighbours nearer than 1e-12 of their size.
void sort_and_thin(std::vector<double>& w_rad_s);

} // namespace cornerwright
